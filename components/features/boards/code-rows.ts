import type { Bench, BenchFormat } from '@/components/features/diagnose/bench';
import type { Lane } from '@/lib';
import { socketsOfLane } from '@/lib/layout/difference';
import { bankWords, bitWords, sentenceCase } from '@/lib/layout/words';

/** One line of the table of codes. */
export interface CodeRow {
  readonly lane: number;
  /** The code; null where the format cannot say this lane alone. */
  readonly text: string | null;
  readonly bank: string;
  readonly bit: string;
  readonly sockets: readonly string[];
}

/** The code of every lane of a board in one report format, bank by bank. */
export function codeRows({ index, document }: Bench, { compiled }: BenchFormat): CodeRow[] {
  return Array.from(index.lanes, (n): CodeRow => {
    const lane = n as Lane;
    const written = compiled.write([lane]);
    return {
      lane: n,
      text: written.ok ? written.text : null,
      bank: sentenceCase(bankWords(document.memory.banks[index.bankOf(lane)]?.id ?? '')),
      bit: bitWords(document.memory, index.bitOf(lane)),
      sockets: socketsOfLane(index, lane),
    };
  });
}
