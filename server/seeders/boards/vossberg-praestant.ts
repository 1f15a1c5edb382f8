import type { LayoutDocumentInput } from '@/shared';
import { static4kBy1 } from './families';
import { labelled, lineOfSockets, numbers } from './place';

interface Block {
  readonly bank: string;
  readonly firstLabel: number;
  readonly x: number;
  readonly y: number;
}

/** Two rows of four. The first lamp, at the left of the upper row, is the highest bit. */
const block = ({ bank, firstLabel, x, y }: Block) =>
  [0, 1].flatMap((row) =>
    lineOfSockets({
      labels: labelled('Z', numbers(firstLabel + row * 4, firstLabel + row * 4 + 3)),
      start: { x, y: y + row * 12.5 },
      step: { x: 10, y: 0 },
      socket: { family: static4kBy1.id, width: 8, height: 10 },
      holds: (place) => [{ bank, bit: 7 - (row * 4 + place) }],
    }),
  );

/** Organ: its memory of combinations, with bits counted from the highest. */
export const vossbergPraestant: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Vossberg & Lind Orgelbau',
    name: 'Praestant III combination memory',
    revision: '1.2',
    kind: 'musical instrument',
    year: 1982,
    notes:
      'Holds the stop combinations of three divisions. The maker numbers everything from the high end: lamp 1 is bit 7. The array is kept alive by a cell while the blower is off, so lift the cell link before a chip is moved.',
    marks: ['Silk screen beside the cell: "V&L 3-KOMB 1.2"', 'Two blocks of eight at the top, one below'],
    view: { side: 'component', edge: 'top', edgeName: 'console ribbon' },
  },
  memory: {
    dataBits: 8,
    banks: [
      { id: 'GT', name: 'Great', words: 4096 },
      { id: 'SW', name: 'Swell', words: 4096 },
      { id: 'PD', name: 'Pedal', words: 4096 },
    ],
  },
  addressMap: {
    digits: 4,
    windows: [
      { range: { from: '0x4000', to: '0x4FFF' }, banks: ['PD'] },
      { range: { from: '0x5000', to: '0x5FFF' }, banks: ['SW'] },
      { range: { from: '0x6000', to: '0x6FFF' }, banks: ['GT'] },
    ],
  },
  families: [static4kBy1],
  sockets: [
    block({ bank: 'GT', firstLabel: 11, x: 0, y: 0 }),
    block({ bank: 'SW', firstLabel: 21, x: 48, y: 0 }),
    block({ bank: 'PD', firstLabel: 31, x: 24, y: 30 }),
  ].flat(),
  sharedParts: [
    {
      label: 'Z41',
      name: 'data buffer, lamps 1 to 4',
      role: 'data-buffer',
      x: 5,
      y: 33,
      width: 22,
      serves: { bits: [4, 5, 6, 7] },
    },
    {
      label: 'Z42',
      name: 'data buffer, lamps 5 to 8',
      role: 'data-buffer',
      x: 5,
      y: 42,
      width: 22,
      serves: { bits: [0, 1, 2, 3] },
    },
    { label: 'Z43', name: 'division decoder', role: 'decoder', x: 73, y: 33, width: 22, channels: 'bank', serves: {} },
    { label: 'Z44', name: 'supply switch to the cell', role: 'supply', x: 73, y: 42, width: 22, serves: {} },
  ],
  rails: [{ name: '+5 V kept', volts: 5, pins: [18], sharedPart: 'Z44' }],
  reportFormats: [
    {
      id: 'division',
      name: 'Division and lamp',
      where: 'The setter display, when the General Cancel piston is held at switch-on.',
      parts: [{ field: 'bank', notation: 'names' }, { text: ' ' }, { field: 'bit', first: 1, bitOrder: 'high-first' }],
      after: 'lists-lanes',
      testOrder: { banks: ['PD', 'SW', 'GT'], bits: 'together' },
      notes: 'Press Next for the following entry until END shows. The lamp number counts from the highest bit.',
    },
    {
      id: 'lamps',
      name: 'Row of lamps',
      where: 'The eight piston lamps of the division named on the display. A lit lamp is a 1; lamp 1 is at the left.',
      parts: [
        { field: 'bank', notation: 'names' },
        { text: ' ' },
        { field: 'mask', notation: 'binary', digits: { min: 8, max: 8 } },
      ],
      after: 'lists-banks',
      testOrder: { banks: ['PD', 'SW', 'GT'] },
    },
  ],
  sources: [
    {
      title: 'Setzer Praestant III, drawing 82-K4',
      kind: 'schematic',
      author: 'Vossberg & Lind Orgelbau',
      year: 1982,
      page: 'sheet 4',
      proves: 'Numbering from the high end, decoder, buffers.',
    },
    {
      title: 'Pull test, Z11, Z18, Z21 and Z38',
      kind: 'pull test',
      year: 2017,
      proves: 'Lamp 1 is the highest bit in every division.',
    },
  ],
  examples: [
    {
      format: 'division',
      text: 'SW 3',
      sockets: ['Z23'],
      source: 'Repair in a parish church, 2017: stop 3 of every Swell combination came back off.',
    },
    { format: 'division', text: 'PD 8', sockets: ['Z38'], source: 'Pull test, Z38 out.' },
    { format: 'lamps', text: 'GT 10000001', sockets: ['Z11', 'Z18'], source: 'Pull test, Z11 and Z18 out.' },
  ],
};
