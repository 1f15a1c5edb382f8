import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { openLogImport } from '@/lib/logs/log-import';
import { fileBytes } from './file-bytes';
import type { LogProgress, LogResult, LogTask } from './log-task';

interface LogWatch {
  readonly onProgress: (progress: LogProgress) => void;
  /** Lets others go on between two pieces of the file. */
  readonly breathe?: () => Promise<void>;
  /** True once nobody waits for the result any more. */
  readonly cancelled?: () => boolean;
}

/** Time in ms between two words of progress. */
const progressPause = 100;

/** Reads a whole log. Null where it was cancelled; rejects where the file cannot be read. */
export async function runLog(task: LogTask, { onProgress, breathe, cancelled }: LogWatch): Promise<LogResult | null> {
  const { document, pattern, source, name, rest } = task;
  const log = openLogImport(buildLayoutIndex(document), pattern, { name, rest });
  const began = performance.now();
  const seconds = () => (performance.now() - began) / 1000;
  let read = 0;
  let told = began;
  for await (const bytes of fileBytes(source, (so) => (read = so))) {
    if (cancelled?.() === true) return null;
    log.push(bytes);
    if (performance.now() - told >= progressPause) {
      told = performance.now();
      onProgress({ read, total: source.size, counts: log.counts(), seconds: seconds() });
    }
    await breathe?.();
  }
  if (cancelled?.() === true) return null;
  const evidence = log.finish();
  return { evidence, summary: log.summary(), seconds: seconds() };
}
