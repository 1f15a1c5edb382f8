import { addressMapOf, lanesWords, tallyReadings, type LayoutIndex } from '@/lib';
import { sentenceCase } from '@/lib/layout/words';
import type { Reading, Readings } from '@/shared';
import { readingText } from '../evidence-words';

/** One reading with what it means on this board. */
export interface ReadingPlace {
  readonly text: string;
  /** "Bit 3 of bank C; row 12, column 26." */
  readonly means: string;
  /** It leads nowhere, or to bits that the word does not have. */
  readonly wrong: boolean;
}

/** What the first readings mean, one by one. */
export function readingPlaces(index: LayoutIndex, readings: Readings, most: number): ReadingPlace[] {
  const map = addressMapOf(index);
  return readings.lines.slice(0, most).map((line) => {
    const { ways, words, problems } = tallyReadings(map, { ...readings, lines: [line] });
    const text = readingText(index, line);
    const [problem] = problems;
    if (problem !== undefined) return { text, means: problem, wrong: true };
    const lanes = ways.flatMap(({ tally }) =>
      [...tally.lanes].flatMap(([lane, seen]) => (seen.readsOne + seen.readsZero + seen.words > 0 ? [lane] : [])),
    );
    if (lanes.length === 0) return { text, means: right(line), wrong: false };
    const [first] = words;
    const place =
      first?.row === undefined || first.row === null || line.to !== undefined
        ? ''
        : `; row ${first.row}, column ${first.column ?? '?'}`;
    return { text, means: `${sentenceCase(lanesWords(index, [...new Set(lanes)]))}${place}.`, wrong: false };
  });
}

const right = ({ to }: Reading) =>
  to === undefined ? 'Read what was written.' : 'All of these read what was written.';
