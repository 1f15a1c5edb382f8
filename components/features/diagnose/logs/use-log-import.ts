import { useEffect, useRef, useState } from 'react';
import { findLinePatterns, type LayoutIndex, type LinePattern } from '@/lib';
import { failureWords } from './failure-words';
import type { LogProgress, LogResult } from './log-task';
import { readSample } from './read-sample';
import { startLog } from './start-log';

/** A file or pasted lines. */
export interface LogSource {
  readonly blob: Blob;
  readonly name: string;
}

/** Where the import of a log is. */
export type LogStage =
  | { readonly at: 'choose'; readonly problem: string | null }
  | { readonly at: 'looking'; readonly source: LogSource }
  | ({ readonly at: 'pattern' } & LogLook)
  | ({ readonly at: 'reading'; readonly progress: LogProgress | null; readonly foreground: boolean } & LogLook)
  | ({ readonly at: 'done'; readonly result: LogResult } & LogLook);

/** A log whose beginning was looked at. */
export interface LogLook {
  readonly source: LogSource;
  readonly sample: readonly string[];
  readonly candidates: readonly LinePattern[];
}

/** The steps of an import and how to go from one to the next. */
export interface LogImportModel {
  readonly stage: LogStage;
  readonly take: (source: LogSource) => void;
  readonly read: (how: { pattern: LinePattern; rest: 'unknown' | 'passed' }) => void;
  /** Stops reading and goes back to how the lines are read. */
  readonly cancel: () => void;
  readonly startOver: () => void;
}

const start: LogStage = { at: 'choose', problem: null };

/** Leads a log from its file through its pattern to what it says. */
export function useLogImport(index: LayoutIndex): LogImportModel {
  const [stage, setStage] = useState<LogStage>(start);
  /** What is under way. A newer one makes the answers of an older one count no more. */
  const work = useRef({ stop: () => undefined as void });
  useEffect(() => () => work.current.stop(), []);
  const begin = () => {
    work.current.stop();
    let current = true;
    const own = { stop: () => void (current = false) };
    work.current = own;
    return { own, isCurrent: () => current };
  };

  const take = (source: LogSource) => {
    const { isCurrent } = begin();
    if (source.blob.size === 0) {
      return setStage({ at: 'choose', problem: `${source.name} is empty.` });
    }
    setStage({ at: 'looking', source });
    readSample(source.blob)
      .then((sample) => {
        if (!isCurrent()) return;
        setStage({ at: 'pattern', source, sample, candidates: findLinePatterns(index, sample) });
      })
      .catch((error: unknown) => {
        if (isCurrent()) setStage({ at: 'choose', problem: `${source.name}: ${failureWords(error)}` });
      });
  };

  const read: LogImportModel['read'] = ({ pattern, rest }) => {
    if (stage.at !== 'pattern') return;
    const { source, sample, candidates } = stage;
    const look = { source, sample, candidates };
    const { own, isCurrent } = begin();
    setStage({ at: 'reading', progress: null, foreground: false, ...look });
    const whileReading = (next: (before: Extract<LogStage, { at: 'reading' }>) => LogStage) => {
      if (isCurrent()) setStage((before) => (before.at === 'reading' ? next(before) : before));
    };
    const task = { document: index.document, pattern, source: source.blob, name: source.name, rest };
    const stop = startLog(task, {
      onProgress: (progress) => whileReading((before) => ({ ...before, progress })),
      onForeground: () => whileReading((before) => ({ ...before, foreground: true })),
      onDone: (result) => whileReading(() => ({ at: 'done', result, ...look })),
      onFailed: (reason) => whileReading(() => ({ at: 'choose', problem: `${source.name}: ${reason}` })),
    });
    const forget = own.stop;
    own.stop = () => {
      forget();
      stop();
    };
  };

  return {
    stage,
    take,
    read,
    cancel: () => {
      work.current.stop();
      setStage((before) =>
        'sample' in before
          ? { at: 'pattern', source: before.source, sample: before.sample, candidates: before.candidates }
          : start,
      );
    },
    startOver: () => {
      work.current.stop();
      setStage(start);
    },
  };
}
