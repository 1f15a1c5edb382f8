import type { LayoutDocumentInput } from '@/shared';
import { labelled, lineOfSockets, numbers } from './place';
import { tarnvallT64 } from './tarnvall-t64';

const bankRow = (bank: string, row: number) =>
  lineOfSockets({
    labels: labelled('U', numbers(10 + row * 8, 17 + row * 8)),
    start: { x: 0, y: row * 12.5 },
    step: { x: 10, y: 0 },
    socket: { family: 'dynamic-16k-1-three-rail' },
    holds: (bit) => [{ bank, bit }],
  });

/** Loom controller: four banks named by letters, every row of sockets from bit 0 at the left. */
export const tarnvallT64RevB: LayoutDocumentInput = {
  ...tarnvallT64,
  format: 'rowcall.layout/1',
  board: {
    maker: 'Tarnvall Textil',
    name: 'T-64 loom controller',
    revision: 'B',
    kind: 'controller',
    year: 1981,
    notes:
      'Pattern store of the T-64 dobby loom. 64 KB in four banks. Lint gets under the sockets: blow the board out before anything is moved. The cards were made in two revisions that look alike, so read the etch mark first.',
    marks: [
      'Copper, component side, beside U41: "TT 640-2 B"',
      'Two 4-bit data buffers U51 and U52 below the array',
      'White sticker with the loom number on U47',
    ],
    view: { side: 'component', edge: 'bottom', edgeName: 'loom harness plug' },
  },
  sockets: ['A', 'B', 'C', 'D'].flatMap(bankRow),
  sharedParts: [
    {
      label: 'U52',
      name: 'data buffer, bits 4 to 7',
      role: 'data-buffer',
      x: 8,
      y: 49,
      width: 24,
      serves: { bits: [4, 5, 6, 7] },
    },
    {
      label: 'U51',
      name: 'data buffer, bits 0 to 3',
      role: 'data-buffer',
      x: 35,
      y: 49,
      width: 24,
      serves: { bits: [0, 1, 2, 3] },
    },
    {
      label: 'U47',
      name: 'column strobes, banks A to D',
      role: 'strobe-driver',
      x: 62,
      y: 49,
      width: 24,
      channels: 'bank',
      serves: {},
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
      title: 'T-64 controller, drawing 640-2 issue B',
      kind: 'schematic',
      author: 'Tarnvall Textil',
      year: 1981,
      page: 'sheets 3 and 4',
      proves: 'Banks, data buffers, strobes and multiplexers.',
    },
    {
      title: 'Silk screen of card 640-2 B, photographed',
      kind: 'silk screen',
      year: 1998,
      proves: 'Socket labels and places.',
    },
    {
      title: 'Pull test on loom 14: U10, U18, U26, U34 and U17',
      kind: 'pull test',
      year: 2019,
      proves: 'Which row is which bank, and that bit 0 is at the left.',
    },
  ],
  examples: [
    {
      format: 'lamp',
      text: 'C5',
      sockets: ['U31'],
      source: 'Repair of loom 14, 2019: U31 was dead, the loom ran after it was changed.',
    },
    { format: 'lamp', text: 'A0', sockets: ['U10'], source: 'Pull test on loom 14, U10 out.' },
    {
      format: 'monitor',
      text: '4C1A wrote FF read F7',
      sockets: ['U21'],
      source: 'Printer roll kept with loom 9, 2021.',
    },
  ],
};
