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

/** A log whose beginning was looked at. */
export interface LogLook {
  readonly source: LogSource;
  readonly sample: readonly string[];
  readonly candidates: readonly LinePattern[];
}

/** Where the import of a log is. */
export type LogStage =
  | { readonly at: 'choose'; readonly problem: string | null }
  | { readonly at: 'looking'; readonly source: LogSource }
  | ({ readonly at: 'pattern' } & LogLook)
  | ({ readonly at: 'reading'; readonly progress: LogProgress | null; readonly foreground: boolean } & LogLook)
  | ({ readonly at: 'done'; readonly result: LogResult } & LogLook);

/** How the lines of a log are to be read. */
export interface LogChoice {
  readonly pattern: LinePattern;
  readonly rest: 'unknown' | 'passed';
}

const start: LogStage = { at: 'choose', problem: null };

/** Time in ms after which an import that nobody looks at any more is stopped: turning a phone takes less. */
const unseenPause = 1500;

/**
 * The import of a log on one board. It stands outside the page, because turning a phone or widening a window builds
 * the page anew, and nothing may be lost by that.
 */
export class LogStore {
  private stage: LogStage = start;
  private readonly listeners = new Set<() => void>();
  private stopWork: () => void = () => undefined;
  /** Counts what was begun; the answers of what was begun before count no more. */
  private turn = 0;
  private unseen: ReturnType<typeof setTimeout> | undefined;

  constructor(private readonly index: LayoutIndex) {}

  current = (): LogStage => this.stage;

  subscribe = (changed: () => void): (() => void) => {
    clearTimeout(this.unseen);
    this.listeners.add(changed);
    return () => {
      this.listeners.delete(changed);
      if (this.listeners.size > 0) return;
      this.unseen = setTimeout(() => {
        if (this.stage.at === 'reading' || this.stage.at === 'looking') this.cancel();
      }, unseenPause);
    };
  };

  take = (source: LogSource): void => {
    const turn = this.begin();
    if (source.blob.size === 0) return this.become({ at: 'choose', problem: `${source.name} is empty.` });
    this.become({ at: 'looking', source });
    readSample(source.blob)
      .then((sample) => {
        if (turn !== this.turn) return;
        this.become({
          at: 'pattern',
          source,
          sample,
          candidates: findLinePatterns(this.index, sample, { formats: 'too' }),
        });
      })
      .catch((error: unknown) => {
        if (turn === this.turn) this.become({ at: 'choose', problem: `${source.name}: ${failureWords(error)}` });
      });
  };

  read = ({ pattern, rest }: LogChoice): void => {
    if (this.stage.at !== 'pattern') return;
    const { source, sample, candidates } = this.stage;
    const look = { source, sample, candidates };
    const turn = this.begin();
    this.become({ at: 'reading', progress: null, foreground: false, ...look });
    const whileReading = (next: (before: Extract<LogStage, { at: 'reading' }>) => LogStage) => {
      if (turn === this.turn && this.stage.at === 'reading') this.become(next(this.stage));
    };
    const task = { document: this.index.document, pattern, source: source.blob, name: source.name, rest };
    this.stopWork = startLog(task, {
      onProgress: (progress) => whileReading((before) => ({ ...before, progress })),
      onForeground: () => whileReading((before) => ({ ...before, foreground: true })),
      onDone: (result) => whileReading(() => ({ at: 'done', result, ...look })),
      onFailed: (reason) => whileReading(() => ({ at: 'choose', problem: `${source.name}: ${reason}` })),
    });
  };

  /** Stops reading, or goes back from what was read, to how the lines are read. */
  cancel = (): void => {
    const { stage } = this;
    this.begin();
    if (!('sample' in stage)) return this.become(start);
    this.become({ at: 'pattern', source: stage.source, sample: stage.sample, candidates: stage.candidates });
  };

  startOver = (): void => {
    this.begin();
    this.become(start);
  };

  private begin(): number {
    this.stopWork();
    this.stopWork = () => undefined;
    return ++this.turn;
  }

  private become(stage: LogStage): void {
    this.stage = stage;
    for (const changed of this.listeners) changed();
  }
}

const stores = new WeakMap<LayoutIndex, LogStore>();

/** The import of a log on a board; always the same one for the same board of a visit. */
export function logStoreOf(index: LayoutIndex): LogStore {
  const before = stores.get(index);
  if (before !== undefined) return before;
  const store = new LogStore(index);
  stores.set(index, store);
  return store;
}
