import type { LayoutDocumentInput } from '@/shared';
import { itemAt, lineOfSockets, numbers } from './place';

const banks = ['VOICE', 'SPLIT', 'SEQ', 'CART'];

/** Synthesiser: four eight-bit chips, one for each bank, and beeps that count the chips. */
export const corvaneSix: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Corvane Instruments',
    name: 'Six voice store',
    revision: 'A1',
    kind: 'musical instrument',
    year: 1984,
    notes:
      'Keeps the sounds of a six-voice synthesiser. Each bank is one chip of eight bits, so every bad bit of a bank means the same chip. All four wrong at once means the cell or its switch. The cell is lithium: never charge or heat it.',
    marks: ['Yellow silk screen: "SIX-VS A1"', 'Four wide chips in a square around the cell holder'],
    view: { side: 'component', edge: 'right', edgeName: 'panel cable' },
  },
  memory: { dataBits: 8, banks: banks.map((id) => ({ id, words: 2048 })) },
  addressMap: {
    digits: 4,
    windows: banks.map((id, bank) => ({
      range: { from: 0x6000 + bank * 2048, to: 0x67ff + bank * 2048 },
      banks: [id],
    })),
  },
  sockets: [0, 1].flatMap((row) =>
    lineOfSockets({
      labels: row === 0 ? ['VS1', 'VS2'] : ['VS3', 'VS4'],
      start: { x: 0, y: row * 38 },
      step: { x: 32, y: 0 },
      socket: { family: 'static-2k-8', width: 14, height: 26, turn: row === 0 ? 0 : 2 },
      holds: (place) => numbers(0, 7).map((bit) => ({ pin: bit, bank: itemAt(banks, row * 2 + place), bit })),
    }),
  ),
  sharedParts: [
    { label: 'BT1', name: 'cell and supply switch', role: 'supply', x: 16, y: 19, width: 22, height: 8, serves: {} },
    { label: 'VS7', name: 'data buffer', role: 'data-buffer', x: 50, y: 4, turn: 1, width: 24, serves: {} },
    {
      label: 'VS8',
      name: 'chip select',
      role: 'decoder',
      x: 50,
      y: 34,
      turn: 1,
      width: 24,
      channels: 'bank',
      serves: {},
    },
  ],
  rails: [{ name: '+5 V kept', volts: 5, pins: [24], sharedPart: 'BT1' }],
  reportFormats: [
    {
      id: 'panel',
      name: 'Panel code',
      where: 'The patch display, with keys STORE and 4 held at switch-on.',
      parts: [
        { text: 'r' },
        { field: 'bank', first: 1 },
        { text: '.' },
        { field: 'mask', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
      ],
      after: 'lists-banks',
      notes: 'The figure after r is the chip, the two places after the point are its bad bits.',
    },
    {
      id: 'beeps',
      name: 'Beeps',
      where:
        'The headphone socket, where the display stays dark. Count the high beeps after the long low one, then the short clicks.',
      parts: [
        { field: 'bank', notation: 'flashes', first: 1 },
        { text: ' beeps ' },
        { field: 'bit', notation: 'flashes', first: 1 },
        { text: ' clicks' },
      ],
      after: 'stops',
      testOrder: { banks: ['CART', 'SEQ', 'SPLIT', 'VOICE'], bits: 'ascending', outer: 'bank' },
      notes: 'The cartridge buffer is tested first and the voices last.',
    },
  ],
  sources: [
    {
      title: 'Six, circuit folder',
      kind: 'schematic',
      author: 'Corvane Instruments',
      year: 1984,
      page: 'fold 5',
      proves: 'Chip select, buffer, cell switch.',
    },
    { title: 'Pull test, VS1 to VS4', kind: 'pull test', year: 2022, proves: 'Which chip is which bank.' },
  ],
  examples: [
    {
      format: 'panel',
      text: 'r3.30',
      sockets: ['VS3'],
      source: 'Repair of a stage instrument, 2022: both bits, one chip.',
    },
    { format: 'beeps', text: '2 beeps 7 clicks', sockets: ['VS2'], source: 'Pull test, one leg of VS2 lifted.' },
  ],
};
