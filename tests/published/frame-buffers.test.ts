import { bankIndex } from '@/lib/brand';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { validateLayout } from '@/lib/layout/validate';
import { pixelToPlaces, placeToPixels } from '@/lib/screen/pixels';
import { screenOf } from '@/lib/screen/screen';
import { layoutDocument } from '@/shared';
import { buildLayoutInput } from '@/tests/factories/layout';
import { apple, appleFormula, spectrum, spectrumAddressBits } from './frame-buffers';

const upTo = (n: number) => Array.from({ length: n }, (_, i) => i);

/** A plain board of eight chips whose screen is stored as the machine stores it. */
function boardOf(machine: typeof spectrum, lineWeights: readonly number[], bits: readonly number[]) {
  const document = layoutDocument.parse({
    ...buildLayoutInput({ banks: 1 }),
    screenMap: {
      width: machine.width,
      height: machine.height,
      base: machine.base,
      unitsPerLine: machine.width / machine.pixelsPerByte,
      pixelsPerUnit: machine.pixelsPerByte,
      lineWeights: [...lineWeights],
      planes: [{ name: 'picture', bits: [...bits] }],
    },
  });
  return { document, index: buildLayoutIndex(document) };
}

// The weight of line bit n is the place of y_n in the source's row of address bits.
const spectrumWeights = upTo(8).map((n) => {
  const names = spectrumAddressBits.split(' ');
  return 2 ** (names.length - 1 - names.indexOf(`y${n}`));
});
const appleWeights = upTo(8).map((n) => appleFormula(0, 2 ** n) - appleFormula(0, 0));

const named = ({ sources }: typeof spectrum) =>
  sources.map(({ title, author, year, page, read }) => `${title}; ${author}; ${year}; ${page}; ${read}`).join(' and ');

describe.each([
  { ...spectrum, source: named(spectrum), weights: spectrumWeights, bits: [7, 6, 5, 4, 3, 2, 1, 0] },
  { ...apple, source: named(apple), weights: appleWeights, bits: [0, 1, 2, 3, 4, 5, 6] },
])('the screen of the $machine ($source)', (machine) => {
  const { document, index } = boardOf(machine, machine.weights, machine.bits);
  const screen = screenOf(index)!;

  it('is a screen map without a problem', () => {
    expect(validateLayout(document).filter(({ pointer }) => pointer.startsWith('/screenMap'))).toEqual([]);
  });

  it.each(machine.worked)(
    'has pixel $x, $y at the address and bit of the source, both ways',
    ({ x, y, address, bit }) => {
      const wanted = bit ?? machine.leftmostBit;
      const [place] = pixelToPlaces(screen, x, y);
      expect(place).toMatchObject({ address, kept: { bank: 0, word: address, bit: wanted } });
      expect(placeToPixels(screen, { bank: bankIndex(0), word: address, bit: wanted })).toEqual([{ plane: 0, x, y }]);
    },
  );
});

describe('the formula of the source', () => {
  it('of the Spectrum holds for every byte of the display file', () => {
    const screen = screenOf(boardOf(spectrum, spectrumWeights, [7, 6, 5, 4, 3, 2, 1, 0]).index)!;
    for (let y = 0; y < 192; y++)
      for (let x = 0; x < 256; x += 8) {
        const binary = spectrumAddressBits.replace(/[xy]\d/g, (name) => {
          const from = name[0] === 'x' ? x : y;
          return String((from >> Number(name[1])) & 1);
        });
        expect(pixelToPlaces(screen, x, y)[0]!.address).toBe(parseInt(binary.replaceAll(' ', ''), 2));
      }
  });

  it('of the Apple II holds for every byte, and the 8 bytes after each three lines show nowhere', () => {
    const screen = screenOf(boardOf(apple, appleWeights, [0, 1, 2, 3, 4, 5, 6]).index)!;
    for (let y = 0; y < 192; y++)
      for (let x = 0; x < 280; x += 7) expect(pixelToPlaces(screen, x, y)[0]!.address).toBe(appleFormula(x, y));
    const unused = upTo(64).flatMap((row) => upTo(8).map((n) => 0x2000 + row * 0x80 + 0x78 + n));
    for (const word of unused) expect(placeToPixels(screen, { bank: bankIndex(0), word, bit: 0 })).toEqual([]);
  });
});
