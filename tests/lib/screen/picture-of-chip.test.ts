import fc from 'fast-check';
import { lane, socketIndex } from '@/lib/brand';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { placesOf } from '@/lib/screen/extent';
import { lanesOfMarks } from '@/lib/screen/lanes-of-marks';
import { pictureOfChip } from '@/lib/screen/picture-of-chip';
import { columnsOf, linesOf } from '@/lib/screen/turn';
import { layoutDocument, type LayoutDocumentInput } from '@/shared';
import { buildLayout, buildLayoutInput, type LayoutOptions } from '@/tests/factories/layout';
import { anyScreen, plainPlace } from './plain-screen';

type ScreenInput = NonNullable<LayoutDocumentInput['screenMap']>;

const upTo = (n: number) => Array.from({ length: n }, (_, i) => i);
const screen = (change: Partial<ScreenInput> = {}): ScreenInput => ({
  width: 256,
  height: 192,
  base: 0,
  unitsPerLine: 32,
  pixelsPerUnit: 8,
  lineWeights: upTo(8).map((n) => 32 << n),
  planes: [{ name: 'all', bits: upTo(8) }],
  ...change,
});
const boardWith = (options: LayoutOptions, change: Partial<ScreenInput> = {}) =>
  buildLayoutIndex(layoutDocument.parse({ ...buildLayoutInput(options), screenMap: screen(change) }));
const colours: ScreenInput['planes'] = [
  { name: 'green', colour: 'green', bits: upTo(8) },
  { name: 'red', colour: 'red', base: 0x10000, bits: upTo(8) },
  { name: 'blue', colour: 'blue', base: 0x20000, bits: upTo(8) },
];
const words = (index: ReturnType<typeof boardWith>, label: string) =>
  pictureOfChip(index, { socket: index.socketByLabel.get(label)! })!.words;

describe('the picture of a board with a dead chip', () => {
  it('has a column out of every eight in the colour that is left', () => {
    expect(words(boardWith({ banks: 3 }, { planes: colours }), 'U12')).toEqual([
      'every eighth column from column 2: magenta in place of white where they read 0, green in place of black where they read 1',
    ]);
  });

  it('is wrong in half of the lines where another chip holds the other half', () => {
    const index = boardWith({ banks: 1, deep: 2 }, { base: 0x10000 - 96 * 32 });
    expect(words(index, 'U12')).toEqual([
      'every eighth column from column 2, lines 0 to 95: dark in place of lit where they read 0, lit in place of dark where they read 1',
    ]);
    expect(words(index, 'U20')[0]).toMatch(/^every eighth column from column 2, lines 96 to 191:/);
  });

  it('is wrong in every second line where lines take turns between chips', () => {
    const index = boardWith({ banks: 2 }, { lineWeights: [0x10000, ...upTo(7).map((n) => 32 << n)] });
    expect(words(index, 'U13')[0]).toMatch(/^every eighth column from column 3, every second line from line 0:/);
    expect(words(index, 'U21')[0]).toMatch(/^every eighth column from column 3, every second line from line 1:/);
  });

  it('is told as it is seen on the glass where the tube stands on its side', () => {
    expect(words(boardWith({ banks: 1 }, { turn: 1 }), 'U12')[0]).toMatch(/^every eighth line from line 2:/);
    expect(words(boardWith({ banks: 1 }, { turn: 2 }), 'U12')[0]).toMatch(/^every eighth column from column 5:/);
  });

  it('has wide stripes where the chip holds four bits', () => {
    expect(words(boardWith({ banks: 1, chipWidth: 4 }), 'U11')[0]).toMatch(/^4 columns of every 8 from column 4:/);
  });

  it('is wrong all over where the chip holds every bit', () => {
    expect(words(boardWith({ banks: 1, chipWidth: 8 }), 'U10')[0]).toMatch(/^the whole picture:/);
  });

  it('is right where the screen shows nothing of the chip, and unknown without a screen map', () => {
    expect(pictureOfChip(boardWith({ banks: 2 }), { lane: lane(9) })).toEqual({ marks: [], dots: 0, words: [] });
    expect(pictureOfChip(buildLayoutIndex(buildLayout()), { lane: lane(0) })).toBeNull();
  });

  it('covers exactly the pixels that a plain formula finds', () => {
    fc.assert(
      fc.property(anyScreen, fc.nat(), (document, n) => {
        const index = buildLayoutIndex(document);
        const { width, height, planes } = document.screenMap!;
        const at = n % document.sockets.length;
        const held = document.sockets[at]!.holds;
        const { marks, dots } = pictureOfChip(index, { socket: socketIndex(at) })!;
        const expected = planes.flatMap(({ name }, plane) =>
          upTo(height).flatMap((y) =>
            upTo(width).flatMap((x) => {
              const place = plainPlace(document, plane, { x, y })!;
              const id = document.memory.banks[place.bank]!.id;
              return held.some(({ bank, bit }) => bank === id && bit === place.bit) ? [`${name} ${x} ${y}`] : [];
            }),
          ),
        );
        const found = marks.flatMap((mark) =>
          (mark.planes ?? planes.map(({ name }) => name)).flatMap((name) =>
            placesOf(linesOf(mark), height).flatMap((y) =>
              placesOf(columnsOf(mark), width).map((x) => `${name} ${x} ${y}`),
            ),
          ),
        );
        expect(found.sort()).toEqual(expected.sort());
        expect(dots).toBe(expected.length);
      }),
      { numRuns: 100 },
    );
  });

  it('marked as evidence names that lane alone, and passes every other that is seen', () => {
    fc.assert(
      fc.property(anyScreen, fc.nat(), (document, n) => {
        const index = buildLayoutIndex(document);
        const of = lane(index.lanes[n % index.lanes.length]!);
        const { marks } = pictureOfChip(index, { lane: of })!;
        if (marks.length === 0) return;
        const { failing, passed } = lanesOfMarks(index, { kind: 'picture', marks: [...marks], rest: 'right' });
        expect(failing.map((each) => each.lane)).toEqual([of]);
        expect(failing[0]!.words).toBe(failing[0]!.shown);
        expect(passed).not.toContain(of);
      }),
      { numRuns: 200 },
    );
  });
});
