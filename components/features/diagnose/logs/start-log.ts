import { failureWords } from './failure-words';
import type { LogMessage, LogProgress, LogResult, LogTask } from './log-task';
import { openLogWorker } from './log-worker';
import { runLog } from './run-log';

interface LogHandlers {
  readonly onProgress: (progress: LogProgress) => void;
  readonly onDone: (result: LogResult) => void;
  readonly onFailed: (reason: string) => void;
  /** The browser gives no worker: it is read in slices between which the screen is drawn. */
  readonly onForeground: () => void;
}

const breathe = () => new Promise<void>((resolve) => setTimeout(resolve));

function readHere(task: LogTask, { onProgress, onDone, onFailed, onForeground }: LogHandlers): () => void {
  let cancelled = false;
  onForeground();
  runLog(task, { onProgress, breathe, cancelled: () => cancelled })
    .then((result) => {
      if (result !== null) onDone(result);
    })
    .catch((error: unknown) => {
      if (!cancelled) onFailed(failureWords(error));
    });
  return () => {
    cancelled = true;
  };
}

/** Begins to read a log in a worker, or here where there is none. Gives the way to cancel it. */
export function startLog(task: LogTask, handlers: LogHandlers): () => void {
  const worker = openLogWorker();
  if (worker === null) return readHere(task, handlers);
  let stop = () => worker.terminate();
  let spoke = false;
  worker.onmessage = ({ data }: MessageEvent<LogMessage>) => {
    spoke = true;
    if (data.kind === 'progress') return handlers.onProgress(data.progress);
    worker.terminate();
    if (data.kind === 'done') handlers.onDone(data.result);
    else handlers.onFailed(data.reason);
  };
  worker.onerror = () => {
    worker.terminate();
    // The worker's own file could not be loaded, as without a network before it was kept.
    if (!spoke) stop = readHere(task, handlers);
    else handlers.onFailed('The log could not be read to its end.');
  };
  worker.postMessage(task);
  return () => stop();
}
