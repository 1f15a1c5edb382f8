import type { LayoutDocumentInput } from '@/shared';
import { labels, rowOfChips, upTo } from './rows';

const planes = [
  { letter: 'R', colour: 'red' },
  { letter: 'G', colour: 'green' },
  { letter: 'B', colour: 'blue' },
] as const;

/** Lines 0 to 95 of a plane are its upper bank, 96 to 191 its lower one; 32 bytes a line. */
const wordsOfHalf = 96 * 32;
const baseOf = (plane: number) => plane * 2 * wordsOfHalf;

/** Colour bitmap of 256 × 192 in three planes; D7 is the leftmost pixel of each byte. */
export const boardH: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: { maker: 'Test Works', name: 'Board H', revision: '1', kind: 'display' },
  memory: {
    dataBits: 8,
    banks: planes.flatMap(({ letter, colour }) => [
      { id: `${letter}U`, name: `${colour}, lines 0 to 95`, words: wordsOfHalf, dataLines: colour },
      { id: `${letter}L`, name: `${colour}, lines 96 to 191`, words: wordsOfHalf, dataLines: colour },
    ]),
  },
  addressMap: {
    digits: 4,
    windows: planes.flatMap(({ letter }, plane) =>
      ['U', 'L'].map((half, n) => ({
        range: { from: baseOf(plane) + n * wordsOfHalf, to: baseOf(plane) + (n + 1) * wordsOfHalf - 1 },
        banks: [letter + half],
      })),
    ),
  },
  families: [{ id: 'display-4k-1', name: '4K × 1 display chip', kind: 'static', words: 4096, width: 1 }],
  sockets: planes.flatMap(({ letter }, plane) =>
    ['U', 'L'].flatMap((half, n) =>
      rowOfChips({
        labels: labels(letter + half, { first: 0, count: 8 }),
        bank: letter + half,
        family: 'display-4k-1',
        row: plane * 2 + n,
      }),
    ),
  ),
  sharedParts: planes.map(({ letter, colour }) => ({
    label: `S${letter}`,
    name: `shift register, ${colour} plane`,
    role: 'shift-register',
    serves: { banks: [`${letter}U`, `${letter}L`] },
  })),
  reportFormats: [
    {
      id: 'map',
      name: 'Bank and mask',
      parts: [
        { field: 'bank', notation: 'names' },
        { text: ' ' },
        { field: 'mask', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
      ],
      after: 'lists-banks',
    },
  ],
  screenMap: {
    width: 256,
    height: 192,
    base: baseOf(0),
    unitsPerLine: 32,
    pixelsPerUnit: 8,
    lineWeights: upTo(8).map((n) => 32 * 2 ** n),
    planes: planes.map(({ colour }, plane) => ({
      name: colour,
      colour,
      base: baseOf(plane),
      bits: upTo(8).reverse(),
    })),
  },
};
