import { benchCases } from './bench-cases';
import { readingProblems } from './expect-reading';
import { buildLayoutIndex, diagnose, findLinePatterns, type LayoutIndex, type LinePattern, parseReadings } from '@/lib';
import { diagnosis, layoutDocument, run } from '@/shared';

/**
 * What a technician pastes, one text a run, by the case that it belongs to. In case 17 he also marks that the rest of
 * the memory passed.
 */
const typed: Readonly<Record<string, readonly string[]>> = {
  '1': ['52A7 W 00 R 20'],
  '5': ['AT 013052 WANT 000000 GOT 000400'],
  '6a': ['1C00 W 00 R 14\n1C01 W 00 R 04\n1C02 W 00 R 10'],
  '6b': ['1C00 W 00 R 0C\n1D00 W 00 R 0C\n1E00 W FF R FF'],
  '8': ['0000 W 55 R 51\n0000 W AA R A2\n0000 W FF R FF\n0000 W 00 R 00\n4000 W 55 R 51\n4000 W AA R A2'],
  '10a': ['0035 W 00 R 01\n00B5 W 00 R 01\n0135 W 00 R 01\n... every 80 hex to 3FB5, 128 lines, bank 1 clean'],
  '10b': ['1A80 TO 1AFF W 00 R 01, 128 lines, rest clean'],
  '13': ['01001 W 00 R 10\n01003 W 00 R 10\n01007 W 00 R 10\n12A0B W 00 R 10\nNO EVEN ADDRESS FAILED'],
  '17a': ['BEFORE 4000-7FFF W 00 R 20', 'AFTER 4000-7FFF W 00 R 10'],
  '17b': ['BEFORE 4000-7FFF W 00 R 20', 'AFTER 4000-7FFF W 00 R 20'],
  '17c': ['BEFORE 4000-7FFF W 00 R 20', 'AFTER ALL PASS'],
  '17d': ['BEFORE 4000-7FFF W 00 R 20', 'AFTER 4000-7FFF W 00 R 30'],
};

/** What the technician says of the numbers of a log, where the board leaves it open. */
const declared: Readonly<Record<string, { unit: LinePattern['unit']; notation: 'octal' }>> = {
  '5': { unit: 'word', notation: 'octal' },
};

function patternOf(index: LayoutIndex, id: string, text: string): { pattern?: LinePattern } {
  const wanted = declared[id];
  if (wanted === undefined) return {};
  const pattern = findLinePatterns(index, [text]).find(
    (offered) =>
      'notation' in offered &&
      offered.unit === wanted.unit &&
      offered.notation === wanted.notation &&
      offered.values === undefined,
  );
  if (pattern === undefined) throw new Error(`the pattern of case ${id} is not offered`);
  return { pattern };
}

describe('readings pasted as text lead to the reading of the case', () => {
  it.each(Object.entries(typed))('%s', (id, texts) => {
    const of = benchCases.find((each) => each.id === id);
    if (of === undefined) throw new Error(`there is no case ${id}`);
    const index = buildLayoutIndex(layoutDocument.parse(of.board));
    const runs = texts.map((text, at) => {
      const parsed = parseReadings(index, text, patternOf(index, id, text));
      expect(parsed.unread).toEqual([]);
      if (parsed.evidence === null) throw new Error(`nothing was read of: ${text}`);
      const { evidence } = parsed;
      const marked = id.startsWith('17') && evidence.kind === 'readings' ? { ...evidence, rest: 'passed' } : evidence;
      return run.parse({ changes: of.runs[at]?.changes, evidence: [marked] });
    });
    expect(readingProblems(diagnosis.parse(diagnose(index, runs)), of.expect)).toEqual([]);
  });
});
