import * as fc from 'fast-check';
import { distanceToBox, type Box } from '@/components/board/geometry';
import { directions, nearestTo, neighbourOf, readingOrder } from '@/components/board/geometry-nearest';
import { buildScene } from '@/components/board/geometry-scene';
import { board, boardOf, boards, lies } from './boards';

const box = fc.record({
  x: fc.integer({ min: -200, max: 200 }),
  y: fc.integer({ min: -200, max: 200 }),
  width: fc.integer({ min: 1, max: 30 }),
  height: fc.integer({ min: 1, max: 30 }),
});
const items = fc.array(box, { minLength: 1, maxLength: 30 }).map((boxes) => boxes.map((it: Box) => ({ box: it })));
const point = fc.record({ x: fc.integer({ min: -250, max: 250 }), y: fc.integer({ min: -250, max: 250 }) });

describe('what a finger means', () => {
  test('nothing lies nearer than what is picked, and what is out of reach is not picked', () => {
    fc.assert(
      fc.property(items, point, fc.integer({ min: 0, max: 100 }), (all, at, reach) => {
        const picked = nearestTo(all, at, reach);
        const nearest = Math.min(...all.map((item) => distanceToBox(at, item.box)));
        if (picked) expect(distanceToBox(at, picked.box)).toBe(nearest);
        else expect(nearest).toBeGreaterThan(reach);
      }),
    );
  });

  test('between two sockets the nearer one is meant', () => {
    const { sockets } = buildScene(board('tarnvall-t-64-rev-b'), { turn: 0, solderSide: false });
    const [first, second] = sockets;
    const gap = { x: (first!.box.x + second!.box.x) / 2 - 0.1, y: first!.box.y };
    expect(nearestTo(sockets, gap, 2)?.label).toBe(first!.label);
  });
});

describe('arrow keys', () => {
  const walk = (from: string, ...keys: (keyof typeof directions)[]) => {
    const { sockets } = buildScene(board('tarnvall-t-64-rev-b'), { turn: 0, solderSide: false });
    let at = sockets.find(({ label }) => label === from);
    for (const key of keys) at = (at && neighbourOf(sockets, at, directions[key])) ?? at;
    return at?.label;
  };

  test('go to the next socket in their direction and stop at the rim', () => {
    expect(walk('U10', 'ArrowRight')).toBe('U11');
    expect(walk('U10', 'ArrowDown')).toBe('U18');
    expect(walk('U10', 'ArrowLeft', 'ArrowUp')).toBe('U10');
    expect(walk('U17', 'ArrowRight')).toBe('U17');
  });

  test('to the right and back to the left is where one was, anywhere on a grid', () => {
    const { sockets } = buildScene(boardOf({ banks: 6, bits: 9, sharedParts: false }), { turn: 0, solderSide: false });
    for (const socket of sockets) {
      const right = neighbourOf(sockets, socket, directions.ArrowRight);
      if (right) expect(neighbourOf(sockets, right, directions.ArrowLeft)).toBe(socket);
    }
  });

  test('what they lead to lies in their direction', () => {
    fc.assert(
      fc.property(items, fc.constantFrom(...Object.values(directions)), (all, direction) => {
        const from = all[0]!;
        const to = neighbourOf(all, from, direction);
        const along = (item: { box: Box }) =>
          (item.box.x - from.box.x) * direction.x + (item.box.y - from.box.y) * direction.y;
        if (to) expect(along(to)).toBeGreaterThan(0);
        else expect(all.some((item) => along(item) > 0)).toBe(false);
      }),
    );
  });

  test.each([...boards])('reach every socket and every shared part of %s in every lie', (_, index) => {
    for (const lie of lies) {
      const { sockets, parts } = buildScene(index, lie);
      const all = [...sockets, ...parts];
      const seen = new Set([all[0]!]);
      for (const item of seen)
        for (const direction of Object.values(directions)) {
          const next = neighbourOf(all, item, direction);
          if (next) seen.add(next);
        }
      expect(all.filter((item) => !seen.has(item)).map(({ label }) => label)).toEqual([]);
    }
  });
});

test('reading order goes row by row in the view, and turns with the board', () => {
  const order = (turn: 0 | 2) =>
    readingOrder(buildScene(board('tarnvall-t-64-rev-b'), { turn, solderSide: false }).sockets).map(
      ({ label }) => label,
    );
  expect(order(0).slice(0, 9)).toEqual(['U10', 'U11', 'U12', 'U13', 'U14', 'U15', 'U16', 'U17', 'U18']);
  expect(order(2)).toEqual([...order(0)].reverse());
});
