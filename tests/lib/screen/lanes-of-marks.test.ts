import fc from 'fast-check';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { lanesOfMarks } from '@/lib/screen/lanes-of-marks';
import { type LayoutDocument, layoutDocument, type Picture, type PictureMark } from '@/shared';
import { buildLayout, buildLayoutInput } from '@/tests/factories/layout';
import { anyScreen, plainPlace } from './plain-screen';

const mark = (given: Partial<PictureMark>): PictureMark => ({ looks: 'wrong', x: [0, 0], y: [0, 0], ...given });
const pictureWith = (marks: PictureMark[], rest: Picture['rest'] = 'right'): Picture => ({
  kind: 'picture',
  marks,
  rest,
});

/** Two planes by base address: bank A holds the green dots, bank B the red ones. 64 by 32 dots. */
const twoPlanes = (): LayoutDocument =>
  layoutDocument.parse({
    ...buildLayoutInput({ banks: 2 }),
    screenMap: {
      width: 64,
      height: 32,
      base: 0,
      unitsPerLine: 8,
      pixelsPerUnit: 8,
      lineWeights: [8, 16, 32, 64, 128],
      planes: [
        { name: 'green', colour: 'green', bits: [0, 1, 2, 3, 4, 5, 6, 7] },
        { name: 'red', colour: 'red', base: 0x10000, bits: [0, 1, 2, 3, 4, 5, 6, 7] },
      ],
    },
  });
const read = (picture: Picture) => lanesOfMarks(buildLayoutIndex(twoPlanes()), picture);
const oneChip = { failingSegments: 0, rightSegments: 0 };
const eighthColumn = { x: [2, 2] as [number, number], everyX: 8, y: [0, 31] as [number, number] };

describe('faults marked on the picture', () => {
  it('name the lane whose dots they cover, and pass the others that are seen beside them', () => {
    const { failing, passed, problems } = read(pictureWith([mark({ ...eighthColumn, planes: ['green'] })]));
    expect(problems).toEqual([]);
    expect(failing).toEqual([{ lane: 2, reads: 'unknown', words: 256, shown: 256, ...oneChip }]);
    expect(passed).toEqual([0, 1, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15]);
  });

  it('without planes are in all planes', () => {
    expect(read(pictureWith([mark(eighthColumn)])).failing.map(({ lane }) => lane)).toEqual([2, 10]);
  });

  it('that are missing read 0, that are lit read 1, and both together leave it open', () => {
    const reads = (...looks: PictureMark['looks'][]) =>
      read(pictureWith(looks.map((each) => mark({ ...eighthColumn, planes: ['red'], looks: each })))).failing[0]!.reads;
    expect(reads('missing')).toBe('zero');
    expect(reads('lit')).toBe('one');
    expect(reads('missing', 'lit')).toBe('unknown');
    expect(reads('missing', 'wrong')).toBe('unknown');
  });

  it('in a band of lines cover only a share of the words', () => {
    const { failing } = read(pictureWith([mark({ ...eighthColumn, y: [8, 15], planes: ['green'] })]));
    expect(failing).toEqual([{ lane: 2, reads: 'unknown', words: 64, shown: 256, ...oneChip }]);
  });

  it('pass nothing while the rest of the picture was not looked at', () => {
    expect(read(pictureWith([mark(eighthColumn)], 'unknown')).passed).toEqual([]);
  });

  it('in a plane that the board has not are told, and nothing passes by silence', () => {
    const { failing, passed, problems } = read(pictureWith([mark({ ...eighthColumn, planes: ['Green', 'blue'] })]));
    expect(failing.map(({ lane }) => lane)).toEqual([2]);
    expect(passed).toEqual([]);
    expect(problems).toEqual(['Mark 1 names "blue"; the picture of this board has the planes green and red.']);
  });

  it('outside the picture are told, and nothing passes by silence', () => {
    const { failing, passed, problems } = read(pictureWith([mark({ x: [64, 70] })]));
    expect([failing, passed]).toEqual([[], []]);
    expect(problems).toEqual(['Mark 1 lies outside the picture, which has 64 columns and 32 lines.']);
  });

  it('on a board without a screen map say so', () => {
    expect(lanesOfMarks(buildLayoutIndex(buildLayout()), pictureWith([mark({})])).problems).toEqual([
      'This board has no screen map to read a picture with.',
    ]);
  });

  it('name the chip where a lane has several, also in a line that begins in one and ends in the next', () => {
    const index = buildLayoutIndex(
      layoutDocument.parse({
        ...buildLayoutInput({ banks: 1, deep: 2 }),
        screenMap: {
          width: 256,
          height: 192,
          base: 0x10000 - 95 * 32 - 16,
          unitsPerLine: 32,
          pixelsPerUnit: 8,
          lineWeights: [32, 64, 128, 256, 512, 1024, 2048, 4096],
          planes: [{ name: 'all', bits: [0, 1, 2, 3, 4, 5, 6, 7] }],
        },
      }),
    );
    const chips = (given: Partial<PictureMark>, rest: Picture['rest'] = 'right') => {
      const { failing } = lanesOfMarks(index, pictureWith([mark(given)], rest));
      return failing.map(({ failingSegments, rightSegments }) => [failingSegments, rightSegments]);
    };
    expect(chips({ x: [2, 2], everyX: 8, y: [0, 94] })).toEqual([[0b01, 0b10]]);
    expect(chips({ x: [2, 2], everyX: 8, y: [96, 191] })).toEqual([[0b10, 0b01]]);
    expect(chips({ x: [2, 2], everyX: 8, y: [0, 191] })).toEqual([[0b11, 0]]);
    expect(chips({ x: [2, 2], everyX: 8, untilX: 127, y: [95, 95] })).toEqual([[0b01, 0b10]]);
    expect(chips({ x: [130, 130], everyX: 8, y: [95, 95] })).toEqual([[0b10, 0b01]]);
    expect(chips({ x: [2, 2], everyX: 8, y: [0, 94] }, 'unknown')).toEqual([[0b01, 0]]);
  });

  it('agree with a count over every pixel by a plain formula', () => {
    const span = (most: number) =>
      fc.tuple(fc.nat(most), fc.nat(most)).map(([a, b]): [number, number] => [Math.min(a, b), Math.max(a, b)]);
    const anyMark = fc.record(
      {
        looks: fc.constantFrom('missing', 'lit', 'wrong'),
        planes: fc.constantFrom(['first'], undefined),
        x: span(20),
        everyX: fc.constantFrom(undefined, 1, 3, 8),
        untilX: fc.constantFrom(undefined, 4, 17),
        y: span(12),
        everyY: fc.constantFrom(undefined, 2, 4, 5),
        untilY: fc.constantFrom(undefined, 6),
      },
      { requiredKeys: ['looks', 'x', 'y'] },
    ) as fc.Arbitrary<PictureMark>;
    fc.assert(
      fc.property(anyScreen, fc.array(anyMark, { minLength: 1, maxLength: 4 }), (document, marks) => {
        const index = buildLayoutIndex(document);
        const found = lanesOfMarks(index, pictureWith(marks));
        const expected = byEveryPixel(document, marks);
        expect(found.failing.map(({ lane, words, shown }) => ({ lane, words, shown }))).toEqual(expected.failing);
        if (found.problems.length === 0) expect(found.passed).toEqual(expected.passed);
      }),
      { numRuns: 300 },
    );
  });

  it('are read within a second on the largest screen that a layout may have', () => {
    const input = buildLayoutInput({ banks: 2, interleave: true });
    const weights = Array.from({ length: 13 }, (_, n) => 1024 << n);
    const bits = [0, 1, 2, 3, 4, 5, 6, 7];
    input.memory.banks.forEach((bank) => (bank.words = 2 ** 22));
    input.addressMap = {
      windows: [{ range: { from: 0, to: 2 ** 23 - 1 }, banks: ['A', 'B'], interleave: [[3, 15, 20]] }],
    };
    const document = layoutDocument.parse({
      ...input,
      screenMap: {
        width: 8192,
        height: 8192,
        base: 0,
        unitsPerLine: 1024,
        pixelsPerUnit: 8,
        lineWeights: weights,
        planes: [{ name: 'all', bits }],
      },
    });
    const index = buildLayoutIndex(document);
    const begin = performance.now();
    const { failing } = lanesOfMarks(index, pictureWith([mark({ x: [2, 2], everyX: 8, y: [0, 8191] })]));
    expect(performance.now() - begin).toBeLessThan(1000);
    expect(failing).toEqual([
      { lane: 2, reads: 'unknown', words: 2 ** 22, shown: 2 ** 22, ...oneChip },
      { lane: 10, reads: 'unknown', words: 2 ** 22, shown: 2 ** 22, ...oneChip },
    ]);
  });
});

describe('a screen whose lines lie outside the memory', () => {
  it('is read as far as it goes, however large, and what was not read is told', () => {
    const document = layoutDocument.parse({
      ...buildLayoutInput({ banks: 1 }),
      screenMap: {
        width: 8192,
        height: 8192,
        base: 0xff00,
        unitsPerLine: 8192,
        pixelsPerUnit: 1,
        lineWeights: Array.from({ length: 13 }, (_, n) => 8192 << n),
        planes: [{ name: 'all', bits: [0] }],
      },
    });
    const begin = performance.now();
    const { failing, problems } = lanesOfMarks(
      buildLayoutIndex(document),
      pictureWith([mark({ x: [0, 9], y: [0, 8191] })]),
    );
    expect(performance.now() - begin).toBeLessThan(5000);
    expect(failing).toEqual([{ lane: 0, reads: 'unknown', words: 10, shown: 256, ...oneChip }]);
    expect(problems).toEqual([
      'The lines of the plane all lie too irregularly in memory; they are read down to line 61.',
    ]);
  });
});

function byEveryPixel(document: LayoutDocument, marks: readonly PictureMark[]) {
  const { width, height, planes } = document.screenMap!;
  const shown = new Map<number, Set<number>>();
  const bad = new Map<number, Set<number>>();
  const inSpan = (of: { span: [number, number]; every?: number; until?: number }, at: number) => {
    const {
      span: [from, to],
      every,
      until,
    } = of;
    if (every !== undefined && until !== undefined && at > until) return false;
    for (let shift = 0; shift <= at; shift += every ?? at + 1) if (at - shift >= from && at - shift <= to) return true;
    return false;
  };
  const add = (to: Map<number, Set<number>>, lane: number, word: number) =>
    to.set(lane, (to.get(lane) ?? new Set<number>()).add(word));
  planes.forEach(({ name }, plane) => {
    for (let y = 0; y < height; y++)
      for (let x = 0; x < width; x++) {
        const { bank, word, bit } = plainPlace(document, plane, { x, y })!;
        const lane = bank * document.memory.dataBits + bit;
        add(shown, lane, word);
        const covered = marks.some(
          (each) =>
            (each.planes?.includes(name) ?? true) &&
            inSpan({ span: each.x, every: each.everyX, until: each.untilX }, x) &&
            inSpan({ span: each.y, every: each.everyY, until: each.untilY }, y),
        );
        if (covered) add(bad, lane, word);
      }
  });
  const lanes = [...shown.keys()].sort((a, b) => a - b);
  return {
    failing: lanes.flatMap((lane) =>
      bad.has(lane) ? [{ lane, words: bad.get(lane)!.size, shown: shown.get(lane)!.size }] : [],
    ),
    passed: lanes.filter((lane) => !bad.has(lane)),
  };
}
