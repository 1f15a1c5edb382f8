import type { LayoutDocumentInput } from '@/shared';
import { labelled, lineOfSockets, numbers } from './place';
import { tarnvallT64 } from './tarnvall-t64';

interface BankRow {
  readonly bank: string;
  readonly firstLabel: number;
  readonly y: number;
  /** The bit at the left end of the row. */
  readonly leftBit: 0 | 7;
}

const bankRow = ({ bank, firstLabel, y, leftBit }: BankRow) =>
  lineOfSockets({
    labels: labelled('U', numbers(firstLabel, firstLabel + 7)),
    start: { x: 0, y },
    step: { x: 10, y: 0 },
    socket: { family: 'dynamic-16k-1-three-rail', turn: leftBit === 0 ? 0 : 2 },
    holds: (place) => [{ bank, bit: leftBit === 0 ? place : 7 - place }],
  });

/** The same loom controller laid out anew: the rows of banks B and D run from bit 7. */
export const tarnvallT64RevC: LayoutDocumentInput = {
  ...tarnvallT64,
  format: 'rowcall.layout/1',
  board: {
    maker: 'Tarnvall Textil',
    name: 'T-64 loom controller',
    revision: 'C',
    kind: 'controller',
    year: 1983,
    notes:
      'Made after the fire rules of 1983. The data lines run in a loop, so the chips of banks B and D lie the other way round and their bits run from 7 to 0. The lamp codes are the same as on revision B and mean other sockets.',
    marks: [
      'Copper, component side, beside U41: "TT 640-2 C"',
      'One 8-bit data buffer U53 where revision B has two',
      'The notches of U18 to U25 and U34 to U41 point to the plug',
    ],
    view: { side: 'component', edge: 'bottom', edgeName: 'loom harness plug' },
  },
  sockets: [
    bankRow({ bank: 'A', firstLabel: 10, y: 0, leftBit: 0 }),
    bankRow({ bank: 'B', firstLabel: 18, y: 12.5, leftBit: 7 }),
    bankRow({ bank: 'C', firstLabel: 26, y: 25, leftBit: 0 }),
    bankRow({ bank: 'D', firstLabel: 34, y: 37.5, leftBit: 7 }),
  ].flat(),
  sharedParts: [
    { label: 'U53', name: 'data buffer, all bits', role: 'data-buffer', x: 8, y: 49, width: 24, serves: {} },
    {
      label: 'U46',
      name: 'column strobes, banks A and B',
      role: 'strobe-driver',
      x: 35,
      y: 49,
      width: 24,
      channels: 'bank',
      serves: { banks: ['A', 'B'] },
    },
    {
      label: 'U47',
      name: 'column strobes, banks C and D',
      role: 'strobe-driver',
      x: 62,
      y: 49,
      width: 24,
      channels: 'bank',
      serves: { banks: ['C', 'D'] },
    },
    {
      label: 'U48',
      name: 'multiplexer, A0 to A3',
      role: 'multiplexer',
      x: 8,
      y: 58,
      width: 24,
      channels: 'address-bit',
      serves: { addressBits: [0, 1, 2, 3, 7, 8, 9, 10] },
    },
    {
      label: 'U49',
      name: 'multiplexer, A4 to A6',
      role: 'multiplexer',
      x: 35,
      y: 58,
      width: 24,
      channels: 'address-bit',
      serves: { addressBits: [4, 5, 6, 11, 12, 13] },
    },
    { label: 'VR3', name: 'three-rail supply for the array', role: 'supply', x: 62, y: 58, width: 24, serves: {} },
  ],
  sources: [
    {
      title: 'T-64 controller, drawing 640-2 issue C',
      kind: 'schematic',
      author: 'Tarnvall Textil',
      year: 1983,
      page: 'sheets 3 and 5',
      proves: 'Bit order of banks B and D, buffer U53, two strobe drivers.',
    },
    {
      title: 'Pull test on loom 31: U18, U25, U34 and U41',
      kind: 'pull test',
      year: 2022,
      proves: 'That banks B and D run from bit 7 at the left.',
    },
  ],
  examples: [
    {
      format: 'lamp',
      text: 'B5',
      sockets: ['U20'],
      source: 'Repair of loom 31, 2022. By the sheet of revision B the good chip in U23 was pulled first.',
    },
    { format: 'lamp', text: 'C5', sockets: ['U31'], source: 'Pull test on loom 31, U31 out.' },
    { format: 'monitor', text: 'D208 wrote 55 read 54', sockets: ['U41'], source: 'Pull test on loom 31, U41 out.' },
  ],
};
