import fc from 'fast-check';
import { placesOf } from '@/lib/screen/extent';
import { columnsOf, fromGlass, glassSize, linesOf, markInMemory, markOnGlass, toGlass } from '@/lib/screen/turn';
import type { PictureMark, ScreenMap } from '@/shared';

const mapOf = (width: number, height: number, turn: ScreenMap['turn']): ScreenMap => ({
  width,
  height,
  turn,
  base: 0,
  unitsPerLine: width,
  pixelsPerUnit: 1,
  lineWeights: [1],
  planes: [{ name: 'all', colour: 'white', bits: [0] }],
});
const anyMap = fc
  .tuple(fc.integer({ min: 1, max: 24 }), fc.integer({ min: 1, max: 24 }), fc.constantFrom(0, 1, 2, 3))
  .map(([width, height, turn]) => mapOf(width, height, turn as ScreenMap['turn']));

const pixelsOf = (mark: PictureMark, { width, height }: { width: number; height: number }) =>
  placesOf(linesOf(mark), height).flatMap((y) => placesOf(columnsOf(mark), width).map((x) => ({ x, y })));
const key = ({ x, y }: { x: number; y: number }) => `${x},${y}`;

describe('a turned picture', () => {
  it('has its first pixel where the quarter turns clockwise take it', () => {
    const corner = (turn: ScreenMap['turn']) => toGlass(mapOf(8, 5, turn), { x: 0, y: 0 });
    expect(corner(0)).toEqual({ x: 0, y: 0 });
    expect(corner(1)).toEqual({ x: 4, y: 0 });
    expect(corner(2)).toEqual({ x: 7, y: 4 });
    expect(corner(3)).toEqual({ x: 0, y: 7 });
    expect(glassSize(mapOf(8, 5, 1))).toEqual({ width: 5, height: 8 });
  });

  it('gives each pixel back from the glass', () => {
    fc.assert(
      fc.property(anyMap, fc.nat(), fc.nat(), (map, a, b) => {
        const pixel = { x: a % map.width, y: b % map.height };
        const seen = toGlass(map, pixel);
        const glass = glassSize(map);
        expect(seen.x >= 0 && seen.x < glass.width && seen.y >= 0 && seen.y < glass.height).toBe(true);
        expect(fromGlass(map, seen)).toEqual(pixel);
      }),
    );
  });

  it('carries a mark to exactly the pixels of the glass that it covers, and back', () => {
    const span = fc.tuple(fc.nat(30), fc.nat(30)).map(([a, b]): [number, number] => [Math.min(a, b), Math.max(a, b)]);
    const every = fc.constantFrom(1, 2, 3, 7, 8);
    const anyMark = fc.record(
      {
        looks: fc.constant('wrong' as const),
        x: span,
        everyX: every,
        untilX: fc.nat(30),
        y: span,
        everyY: every,
        untilY: fc.nat(30),
      },
      { requiredKeys: ['looks', 'x', 'y'] },
    );
    fc.assert(
      fc.property(anyMap, anyMark, (map, mark) => {
        const wanted = pixelsOf(mark, map).map((at) => key(toGlass(map, at)));
        const seen = markOnGlass(map, mark).flatMap((each) => pixelsOf(each, glassSize(map)).map(key));
        expect(seen.sort()).toEqual(wanted.sort());
        const back = markOnGlass(map, mark).flatMap((each) => markInMemory(map, each));
        expect(back.flatMap((each) => pixelsOf(each, map).map(key)).sort()).toEqual(
          pixelsOf(mark, map).map(key).sort(),
        );
      }),
      { numRuns: 300 },
    );
  });
});
