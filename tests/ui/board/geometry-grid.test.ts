import { findAxes } from '@/components/board/geometry-grid';
import { buildScene } from '@/components/board/geometry-scene';
import type { SketchView } from '@/components/board/sketch-types';
import { board, boardOf, boards, lies } from './boards';

const axesOf = (slug: string, lie: Pick<SketchView, 'turn' | 'solderSide'> = { turn: 0, solderSide: false }) =>
  findAxes(board(slug), buildScene(board(slug), lie).sockets);
const texts = (axis: { names: readonly { text: string }[] } | null) => axis?.names.map(({ text }) => text);

describe('names along the sides', () => {
  test('banks stand beside the rows and bits above the columns of a grid', () => {
    const { rows, columns, untold } = axesOf('tarnvall-t-64-rev-b');
    expect([rows?.kind, texts(rows)]).toEqual(['bank', ['A', 'B', 'C', 'D']]);
    expect([columns?.kind, texts(columns)]).toEqual(['bit', ['0', '1', '2', '3', '4', '5', '6', '7']]);
    expect(untold.every(({ bank, bit }) => !bank && !bit)).toBe(true);
  });

  test('they change sides when the board is turned, and run the other way when it is turned over', () => {
    const { rows, columns } = axesOf('tarnvall-t-64-rev-b', { turn: 1, solderSide: false });
    expect([rows?.kind, texts(rows)?.[0]]).toEqual(['bit', '0']);
    expect([columns?.kind, texts(columns)]).toEqual(['bank', ['D', 'C', 'B', 'A']]);
    expect(texts(axesOf('tarnvall-t-64-rev-b', { turn: 0, solderSide: true }).columns)?.[0]).toBe('7');
  });

  test('a board that names its bits otherwise is shown in its own words', () => {
    expect(texts(axesOf('ferrow-hy-128-mod-6').columns)?.at(-1)).toBe('P');
  });

  test('a bank that fills two rows is named twice, and its bits are told on the sockets', () => {
    const { rows, columns, untold } = axesOf('skarvik-ladle-16-rev-e');
    expect(texts(rows)).toEqual(['X', 'X', 'Y', 'Y']);
    expect(columns).toBeNull();
    expect(untold.every(({ bank, bit }) => !bank && bit)).toBe(true);
  });

  test('blocks that lie between one another get no names at the side', () => {
    const { rows, columns } = axesOf('vossberg-praestant-iii-1-2');
    expect([rows, columns]).toEqual([null, null]);
  });

  test('chips that hold a whole word tell their bank alone', () => {
    const { untold } = axesOf('corvane-six-a1');
    expect(untold).toEqual([1, 2, 3, 4].map(() => ({ bank: true, bit: false })));
  });

  test('every name holds for every socket of its line', () => {
    for (const index of [...boards.values(), boardOf({ banks: 3, bits: 8, parity: 1, chipWidth: 4 })])
      for (const lie of lies) {
        const { sockets } = buildScene(index, lie);
        const { rows, columns } = findAxes(index, sockets);
        for (const [axis, side, across] of [
          [rows, 'y', 'height'],
          [columns, 'x', 'width'],
        ] as const)
          for (const { at, text } of axis?.names ?? [])
            for (const { box, at: n } of sockets) {
              if (Math.abs(box[side] - at) > box[across] / 4) continue;
              const holds = index.document.sockets[n]!.holds;
              const named = text.match(/^[^–]+$/) && axis?.kind === 'bank';
              if (named) expect(new Set(holds.map(({ bank }) => bank))).toEqual(new Set(text.split(' ')));
            }
      }
  });
});
