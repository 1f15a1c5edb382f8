import { buildLayoutIndex } from '@/lib';
import { compareLayouts } from '@/lib/layout/difference';
import type { LayoutDocument } from '@/shared';
import { buildLayout } from '@/tests/factories/layout';

const compare = (before: LayoutDocument, after: LayoutDocument) =>
  compareLayouts(buildLayoutIndex(before), buildLayoutIndex(after));

/** The same board with the chips of two sockets drawn the other way round. */
function exchanged(document: LayoutDocument, a: number, b: number): LayoutDocument {
  const sockets = document.sockets.map((socket, at) => ({
    ...socket,
    holds: document.sockets[at === a ? b : at === b ? a : at]!.holds,
  }));
  return { ...document, sockets };
}

const board = buildLayout({ banks: 2, bits: 8, formats: ['code', 'log'] });

test('a layout does not differ from itself', () => {
  const difference = compare(board, board);
  expect(difference).toMatchObject({ lanes: [], sameLanes: 16, sockets: [], sharedParts: [], sections: [] });
  expect(difference.formats.map(({ state, codes, changed, reworded }) => [state, codes, changed, reworded])).toEqual([
    ['kept', 16, [], false],
    ['kept', 16, [], false],
  ]);
});

test('two sockets that change places change two lanes and two codes of each format', () => {
  const difference = compare(board, exchanged(board, 2, 3));
  expect(difference.lanes).toEqual([
    { bank: 'A', bit: 2, before: ['U12'], after: ['U13'] },
    { bank: 'A', bit: 3, before: ['U13'], after: ['U12'] },
  ]);
  expect(difference.sameLanes).toBe(14);
  const [codes, log] = difference.formats;
  expect(codes?.changed).toEqual([
    { text: 'A-2', before: ['U12'], after: ['U13'] },
    { text: 'A-3', before: ['U13'], after: ['U12'] },
  ]);
  expect(log?.changed).toHaveLength(2);
  expect(difference.sockets.map(({ label }) => label)).toEqual(['U12', 'U13']);
});

test('bits counted from the other end change codes and no lane', () => {
  const difference = compare(
    board,
    buildLayout({ banks: 2, bits: 8, formats: ['code', 'log'], bitOrder: 'high-first' }),
  );
  expect(difference.lanes).toEqual([]);
  const codes = difference.formats.find(({ id }) => id === 'code');
  expect(codes?.reworded).toBe(true);
  expect(codes?.changed).toHaveLength(16);
  expect(codes?.changed).toContainEqual({ text: 'A-0', before: ['U10'], after: ['U17'] });
});

test('a code that the other counting does not know names no socket there', () => {
  const difference = compare(board, buildLayout({ banks: 2, bits: 8, formats: ['code'], first: 1 }));
  const codes = difference.formats.find(({ id }) => id === 'code');
  expect(codes?.changed).toContainEqual({ text: 'A-0', before: ['U10'], after: [] });
  expect(codes?.changed).toContainEqual({ text: 'A-8', before: [], after: ['U17'] });
  expect(difference.formats.find(({ id }) => id === 'log')).toMatchObject({ state: 'gone', codes: 0, changed: [] });
});

test('a bank that was added brings lanes and sockets that were not there', () => {
  const difference = compare(board, buildLayout({ banks: 3, bits: 8, formats: ['code', 'log'] }));
  expect(difference.lanes).toHaveLength(8);
  expect(difference.lanes[0]).toEqual({ bank: 'C', bit: 0, before: [], after: ['U26'] });
  expect(difference.sockets).toContainEqual({ label: 'U26', words: 'is new' });
  expect(difference.sections).toEqual(['board', 'memory', 'addressMap']);
});

test('a socket that only moved on the sketch is said to have moved, and no code changes', () => {
  const moved = { ...board, sockets: board.sockets.map((socket, at) => (at === 5 ? { ...socket, y: 40 } : socket)) };
  const difference = compare(board, moved);
  expect(difference.sockets).toEqual([{ label: 'U15', words: 'has another place on the sketch' }]);
  expect(difference.formats.flatMap(({ changed }) => changed)).toEqual([]);
});

test('a shared part that serves other lanes is named', () => {
  const [buffer, ...others] = board.sharedParts;
  const after = { ...board, sharedParts: [{ ...buffer!, serves: { bits: [0, 1] } }, ...others.slice(0, 0)] };
  expect(compare(board, after).sharedParts).toEqual([
    { label: 'S1', words: 'is gone' },
    { label: 'B1', words: 'serves other lanes' },
  ]);
});
