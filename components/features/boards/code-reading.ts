import type { Bench, BenchFormat } from '@/components/features/diagnose/bench';
import { lanesWords } from '@/lib';
import { addressMapOf } from '@/lib/place/address';
import { blamedSockets } from '@/lib/report/blamed-sockets';
import { sentenceCase } from '@/lib/layout/words';

/** One way to understand a code. */
export interface MeaningReading {
  readonly sockets: readonly string[];
  /** "Bit 5 of bank C". */
  readonly words: string;
  /** Which open convention it takes; empty where none is open. */
  readonly takes: string;
}

/** What a code means on a board, or why it is none. */
export type Meaning =
  | { readonly ok: true; readonly readings: readonly MeaningReading[]; readonly notes: readonly string[] }
  | { readonly ok: false; readonly reason: string };

/** Reads a code and names the sockets that it blames. */
export function meaningOf({ index }: Bench, { compiled }: BenchFormat, text: string): Meaning {
  const read = compiled.read(text);
  if (!read.ok) return { ok: false, reason: read.reason };
  const map = addressMapOf(index);
  return {
    ok: true,
    // As they are: a capital in front would spoil "c read as C".
    notes: read.notes,
    readings: read.readings.map((reading) => {
      const lanes = reading.failing.map(({ lane }) => lane);
      return {
        sockets: blamedSockets(index, map, reading).map((at) => index.document.sockets[at]?.label ?? ''),
        words: sentenceCase(lanesWords(index, lanes)) || 'No lane of this board',
        takes: reading.takes.join(', '),
      };
    }),
  };
}

/** How a worked example came out: the code read on this layout, beside what its source says. */
export interface ExampleOutcome {
  readonly passed: boolean;
  /** "names U31, as its source says" or what is wrong. */
  readonly words: string;
}

/** Runs a worked example. It passes if one way to understand its code names exactly its sockets. */
export function runExample(
  bench: Bench,
  { format: id, text, sockets }: { format: string; text: string; sockets: readonly string[] },
): ExampleOutcome {
  const format = bench.formats.find(({ definition }) => definition.id === id);
  if (format === undefined) return { passed: false, words: `There is no report format “${id}” that can be read.` };
  const meaning = meaningOf(bench, format, text);
  if (!meaning.ok) return { passed: false, words: meaning.reason };
  const wanted = new Set(sockets);
  const passed = meaning.readings.some(
    (reading) => reading.sockets.length === wanted.size && reading.sockets.every((label) => wanted.has(label)),
  );
  const found = meaning.readings.map((reading) => reading.sockets.join(', ') || 'no socket').join(', or ');
  return {
    passed,
    words: passed ? `Names ${found}, as its source says.` : `Names ${found}, not ${sockets.join(', ')}.`,
  };
}
