import { failureWords } from './failure-words';
import type { LogMessage, LogTask } from './log-task';
import { runLog } from './run-log';

const say = (message: LogMessage) => self.postMessage(message);

self.onmessage = ({ data }: MessageEvent<LogTask>) => {
  runLog(data, { onProgress: (progress) => say({ kind: 'progress', progress }) })
    .then((result) => {
      if (result !== null) say({ kind: 'done', result });
    })
    .catch((error: unknown) => say({ kind: 'failed', reason: failureWords(error) }));
};
