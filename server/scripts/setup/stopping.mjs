import { stopRunning } from './run.mjs';
import { giveUp } from './say.mjs';

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
  const leave = () => void stopAll().then(() => process.exit(0));
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, leave);
  const parent = process.ppid;
  if (process.env.npm_lifecycle_event) {
    setInterval(() => {
      if (process.ppid !== parent) leave();
    }, watch).unref();
  }
  return {
    /** Adds something to stop; what is added while stopping is stopped at once. */
    add: (stop) => {
      if (stopping) stopping = stopping.then(() => stop()).catch(() => {});
      else stops.push(stop);
    },
    stopAll,
    isStopping: () => stopping !== undefined,
  };
};

/**
 * Does `work` until it ends or is stopped, stops what it started, and ends the process: with 0 if it was stopped, with
 * one clear line if it gave up.
 *
 * @param {(stops: ReturnType<typeof stopList>) => Promise<void>} work
 */
export const untilStopped = async (work) => {
  const stops = stopList();
  try {
    await work(stops);
  } catch (error) {
    // What fails because it was told to stop is no failure.
    const stopped = stops.isStopping();
    await stops.stopAll();
    if (!stopped) giveUp(error);
  }
  await stops.stopAll();
  process.exit(0);
};
