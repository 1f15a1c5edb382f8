import type { Bench, BenchFormat } from '@/components/features/diagnose/bench';
import type { Lane } from '@/lib';
import { socketsOfLane } from '@/lib/layout/difference';
import { sentenceCase } from '@/lib/layout/words';

/** One line of the table of codes. */
export interface CodeRow {
  readonly key: string;
  /** The code; null where the format cannot say this lane alone. */
  readonly text: string | null;
  /** "Bit 5 of bank C". */
  readonly lane: string;
  readonly sockets: readonly string[];
}

/** The code of every lane of a board in one report format, bank by bank. */
export function codeRows({ index }: Bench, { compiled }: BenchFormat): CodeRow[] {
  return Array.from(index.lanes, (n): CodeRow => {
    const lane = n as Lane;
    const written = compiled.write([lane]);
    return {
      key: String(n),
      text: written.ok ? written.text : null,
      lane: sentenceCase(index.laneWords(lane)),
      sockets: socketsOfLane(index, lane),
    };
  });
}
