import * as fc from 'fast-check';
import { compose, edges, orient, orientBox, orientEdge, type Orientation } from '@/components/board/geometry';
import { buildScene, orientationOf, pin1Of, placeParts } from '@/components/board/geometry-scene';
import { board, boardOf, boards, lies } from './boards';

const coordinate = fc.integer({ min: -500, max: 500 });
const point = fc.record({ x: coordinate, y: coordinate });
const turn = fc.constantFrom(0, 1, 2, 3);
const orientation = fc.record({ turn, mirrored: fc.boolean() }) as fc.Arbitrary<Orientation>;
const quarter: Orientation = { turn: 1, mirrored: false };
const mirror: Orientation = { turn: 0, mirrored: true };
const asIs: Orientation = { turn: 0, mirrored: false };

describe('turning and mirroring a board', () => {
  test('a board that is turned four times lies as before', () => {
    fc.assert(
      fc.property(point, (p) => {
        expect([1, 2, 3, 4].reduce((at) => orient(quarter, at), p)).toEqual(p);
      }),
    );
    expect([1, 2, 3, 4].reduce((lie) => compose(lie, quarter), asIs)).toEqual(asIs);
  });

  test('a board that is turned over twice lies as before, however it lay', () => {
    fc.assert(
      fc.property(orientation, point, (lie, p) => {
        expect(orient(mirror, orient(mirror, p))).toEqual(p);
        expect(compose(compose(lie, mirror), mirror)).toEqual(lie);
      }),
    );
  });

  test('one quarter turn takes what is at the top to the right', () => {
    expect(orient(quarter, { x: 0, y: -1 })).toEqual({ x: 1, y: 0 });
  });

  test('two movements after each other are the one that they compose to', () => {
    fc.assert(
      fc.property(orientation, orientation, point, (first, second, p) => {
        expect(orient(compose(first, second), p)).toEqual(orient(second, orient(first, p)));
      }),
    );
  });

  test('the connector goes where its edge of the board goes', () => {
    const outward = { top: { x: 0, y: -1 }, right: { x: 1, y: 0 }, bottom: { x: 0, y: 1 }, left: { x: -1, y: 0 } };
    fc.assert(
      fc.property(orientation, fc.constantFrom(...edges), (lie, edge) => {
        expect(outward[orientEdge(lie, edge)]).toEqual(orient(lie, outward[edge]));
      }),
    );
  });
});

describe('pin 1', () => {
  const corner = fc.constantFrom('top-left', 'top-right', 'bottom-left', 'bottom-right') as fc.Arbitrary<
    'top-left' | 'top-right' | 'bottom-left' | 'bottom-right'
  >;
  const size = fc.integer({ min: 2, max: 40 });

  test('stays at the same corner of the chip, however the socket and the board are turned and mirrored', () => {
    fc.assert(
      fc.property(corner, turn, size, size, orientation, (pin1, own, width, height, lie) => {
        const socket = { pin1, turn: own as 0 | 1 | 2 | 3, width, height };
        // The place of the pin as a point of the board, moved like any other point.
        const upright = {
          x: (pin1.endsWith('left') ? -1 : 1) * (width / 2),
          y: (pin1.startsWith('top') ? -1 : 1) * (height / 2),
        };
        const pin = orient(lie, orient({ turn: socket.turn, mirrored: false }, upright));
        const box = orientBox(lie, orientBox({ turn: socket.turn, mirrored: false }, { x: 0, y: 0, width, height }));
        const drawn = pin1Of(socket, lie).pin1;
        expect({ x: (drawn.x * box.width) / 2, y: (drawn.y * box.height) / 2 }).toEqual(pin);
      }),
    );
  });

  test('is beside the notch, at one end of the chip', () => {
    fc.assert(
      fc.property(corner, turn, size, size, orientation, (pin1, own, width, height, lie) => {
        const { pin1: at, notch } = pin1Of({ pin1, turn: own as 0 | 1 | 2 | 3, width, height }, lie);
        expect(at.x * notch.x + at.y * notch.y).toBe(1);
      }),
    );
  });

  test('is at the upper right of a chip that was drawn at the upper left and is seen from the solder side', () => {
    const scene = buildScene(board('tarnvall-t-64-rev-b'), { turn: 0, solderSide: true });
    expect(scene.sockets.every(({ pin1 }) => pin1.x === 1 && pin1.y === -1)).toBe(true);
  });
});

describe('the board in a view', () => {
  test('a board that was drawn from its solder side is not mirrored there', () => {
    const hallebro = board('hallebro-sx-40-04');
    expect(orientationOf(hallebro, { turn: 0, solderSide: true }).mirrored).toBe(false);
    expect(orientationOf(hallebro, { turn: 0, solderSide: false }).mirrored).toBe(true);
  });

  test('the first bit changes sides when the board is turned over', () => {
    const from = (solderSide: boolean) =>
      buildScene(board('tarnvall-t-64-rev-b'), { turn: 0, solderSide }).sockets[1]?.box.x ?? 0;
    expect(from(true)).toBe(-from(false));
  });

  test.each([...boards])('every socket and part of %s lies within its bounds in every lie', (_, index) => {
    for (const lie of lies) {
      const { sockets, parts, bounds } = buildScene(index, lie);
      const outside = [...sockets, ...parts].filter(
        ({ box }) =>
          Math.abs(box.x - bounds.x) + box.width / 2 > bounds.width / 2 + 1e-6 ||
          Math.abs(box.y - bounds.y) + box.height / 2 > bounds.height / 2 + 1e-6,
      );
      expect(outside).toEqual([]);
    }
  });

  test('shared parts without a place stand under the sockets and not on one another', () => {
    const index = boardOf({ banks: 2, bits: 40 });
    const sockets = index.document.sockets.map(({ x, y, width, height }) => ({ x, y, width, height }));
    const boxes = placeParts(index.document.sharedParts, sockets);
    const lowest = Math.max(...sockets.map(({ y, height }) => y + height / 2));
    expect(boxes.length).toBeGreaterThan(3);
    boxes.forEach((box, n) => {
      expect(box.y - box.height / 2).toBeGreaterThan(lowest);
      for (const other of boxes.slice(n + 1)) {
        const apart =
          Math.abs(box.x - other.x) >= (box.width + other.width) / 2 ||
          Math.abs(box.y - other.y) >= (box.height + other.height) / 2;
        expect(apart).toBe(true);
      }
    });
  });
});
