import { stopRunning } from './run.mjs';

/** How often it is looked whether npm, which started us, is still there; in milliseconds. */
const watch = 500;

/**
 * Collects what has to be stopped and stops it, the last first: on Ctrl-C, on SIGTERM and SIGHUP, and when npm, which
 * started us, was killed.
 */
export const stopList = () => {
  const stops = [];
  let stopping;
  const stopAll = () => {
    stopping ??= (async () => {
      stopRunning();
      for (const stop of stops.reverse()) await Promise.resolve(stop()).catch(() => {});
    })();
    return stopping;
  };
  const leave = (code) => void stopAll().then(() => process.exit(code));
  for (const [signal, code] of [
    ['SIGINT', 0],
    ['SIGTERM', 0],
    ['SIGHUP', 0],
  ])
    process.on(signal, () => leave(code));
  const parent = process.ppid;
  if (process.env.npm_lifecycle_event) {
    setInterval(() => {
      if (process.ppid !== parent) leave(0);
    }, watch).unref();
  }
  return {
    /** Adds something to stop; what is added while stopping is stopped at once. */
    add: (stop) => (stopping ? void Promise.resolve(stop()).catch(() => {}) : void stops.push(stop)),
    stopAll,
    isStopping: () => stopping !== undefined,
  };
};
