import { caseBoards } from '../../factories/cases';
import { benchCases, type CaseEntry, entriesOf } from './bench-cases';
import { readingProblems } from './expect-reading';
import { moreCases } from './more-cases';
import { buildLayoutIndex, diagnose, validateLayout } from '@/lib';
import { diagnosis, layoutDocument, run, type LayoutDocumentInput } from '@/shared';

function problemsOf({ of, runs }: CaseEntry): string[] {
  const index = buildLayoutIndex(layoutDocument.parse(of.board));
  const answer = diagnose(
    index,
    runs.map((each) => run.parse(each)),
  );
  return readingProblems(diagnosis.parse(answer), of.expect);
}

describe('the reading of a bench case', () => {
  it.each(entriesOf(benchCases))('$title', (entry) => {
    expect(problemsOf(entry)).toEqual([]);
  });
});

describe('the reading that practice gives', () => {
  it.each(entriesOf(moreCases))('$title', (entry) => {
    expect(problemsOf(entry)).toEqual([]);
  });
});

/** The same board described by a contributor who leaves more, or less, open. */
const described: Readonly<Record<string, (board: LayoutDocumentInput) => LayoutDocumentInput>> = {
  'with what channels of its shared parts carry left to their role': (board) => ({
    ...board,
    sharedParts: board.sharedParts?.map(({ channels: _, ...part }) => part),
  }),
  'with the regulator that makes its rails': (board) => ({
    ...board,
    sharedParts: [...(board.sharedParts ?? []), { label: 'VR1', role: 'supply', serves: {} }],
    rails: board.rails?.map((rail) => ({ ...rail, sharedPart: 'VR1' })),
  }),
  'with one set of data lines taken for granted': (board) => ({
    ...board,
    memory: { ...board.memory, banks: board.memory.banks.map(({ dataLines: _, ...bank }) => bank) },
  }),
};

describe.each(Object.entries(described))('the reading on a board %s', (_, change) => {
  const onBoardA = benchCases.filter(({ board }) => board === caseBoards.A);
  it.each(onBoardA)('$id: $title', (of) => {
    const board = change(of.board);
    expect(problemsOf({ title: of.title, of: { ...of, board }, runs: of.runs })).toEqual([]);
  });
});

describe('the boards of the cases', () => {
  it.each(moreCases)('have no error: $id', ({ board }) => {
    const problems = validateLayout(layoutDocument.parse(board));
    expect(problems.filter(({ severity }) => severity === 'error')).toEqual([]);
  });
});
