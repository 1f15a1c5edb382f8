import type { LayoutDocumentInput } from '@/shared';
import { itemAt, lineOfSockets, numbers } from './place';

/** From the left as the chips stand: six check bits and the top of the word, then the rest of it. */
const upperRow = numbers(21, 11);
const lowerRow = numbers(10, 0);

/** The syndrome of each bit: three ones for a data bit, one for a check bit. The order is this maker's own. */
const syndromes = [
  ...[0x26, 0x0b, 0x31, 0x1c, 0x0d, 0x32, 0x29, 0x16, 0x23, 0x1a, 0x34, 0x0e, 0x25, 0x19, 0x2c, 0x13],
  ...[0x01, 0x02, 0x04, 0x08, 0x10, 0x20],
];

const wordRow = ({ row, bank, y }: { row: number; bank: string; y: number }) =>
  lineOfSockets({
    labels: [...'ABCDEFGHJKL'].map((column) => `${row}-${column}`),
    start: { x: 0, y },
    step: { x: 9.8, y: 0 },
    socket: { family: 'dynamic-64k-1' },
    holds: (place) => [{ bank, bit: itemAt(row % 2 === 1 ? upperRow : lowerRow, place) }],
  });

/** Ropeway supervisor: words with six check bits, whose log gives the syndrome that was corrected. */
export const brathvikHs3: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Brathvik Ropeways',
    name: 'HS-3 haul store',
    revision: 'F',
    kind: 'controller',
    year: 1987,
    notes:
      'Store of the supervisor that watches rope speed and grips. Each word of 16 bits has six check bits: one wrong bit is put right and logged, two stop the ropeway. A chip can be dead for weeks before anybody notices, so read the log at every inspection. Never work on it while the rope can move.',
    marks: ['Foil label on the edge: "HS3 F"', 'Four rows of eleven sockets, rows 1 and 2 under a red bar'],
    view: { side: 'component', edge: 'left', edgeName: 'two plugs of 64 ways' },
  },
  memory: {
    dataBits: 22,
    checkBits: numbers(16, 21),
    bitNames: [...numbers(0, 15).map(String), ...numbers(0, 5).map((check) => `C${check}`)],
    banks: [
      { id: 'L', name: 'lower half', words: '0x10000' },
      { id: 'U', name: 'upper half', words: '0x10000' },
    ],
  },
  addressMap: {
    digits: 5,
    windows: [
      { range: { from: '0x00000', to: '0x0FFFF' }, banks: ['L'] },
      { range: { from: '0x10000', to: '0x1FFFF' }, banks: ['U'] },
    ],
    elsewhere: [{ range: { from: '0x20000', to: '0x23FFF' }, means: 'program store of the supervisor' }],
  },
  multiplexing: { row: [7, 6, 5, 4, 3, 2, 1, 0], column: [8, 9, 10, 11, 12, 13, 14, 15] },
  sockets: [
    wordRow({ row: 1, bank: 'L', y: 0 }),
    wordRow({ row: 2, bank: 'L', y: 12.5 }),
    wordRow({ row: 3, bank: 'U', y: 28 }),
    wordRow({ row: 4, bank: 'U', y: 40.5 }),
  ].flat(),
  sharedParts: [
    {
      label: '5.01',
      name: 'data transceiver, bits 0 to 7',
      role: 'data-buffer',
      x: 7,
      y: 53,
      width: 22,
      serves: { bits: numbers(0, 7) },
    },
    {
      label: '5.02',
      name: 'data transceiver, bits 8 to 15',
      role: 'data-buffer',
      x: 33,
      y: 53,
      width: 22,
      serves: { bits: numbers(8, 15) },
    },
    {
      label: '5.03',
      name: 'check bit generator',
      role: 'parity',
      x: 59,
      y: 53,
      width: 22,
      serves: { bits: numbers(16, 21) },
    },
    {
      label: '5.04',
      name: 'row strobes L and U',
      role: 'strobe-driver',
      x: 85,
      y: 53,
      width: 22,
      channels: 'bank',
      serves: {},
    },
    {
      label: '6.01',
      name: 'multiplexer, A0 to A3',
      role: 'multiplexer',
      x: 7,
      y: 62,
      width: 22,
      channels: 'address-bit',
      serves: { addressBits: [4, 5, 6, 7, 8, 9, 10, 11] },
    },
    {
      label: '6.02',
      name: 'multiplexer, A4 to A7',
      role: 'multiplexer',
      x: 33,
      y: 62,
      width: 22,
      channels: 'address-bit',
      serves: { addressBits: [0, 1, 2, 3, 12, 13, 14, 15] },
    },
    {
      label: '6.03',
      name: 'write enable driver',
      role: 'write-driver',
      x: 59,
      y: 62,
      width: 22,
      channels: 'none',
      serves: {},
    },
    { label: '6.04', name: 'refresh counter', role: 'refresh-counter', x: 85, y: 62, width: 22, serves: {} },
  ],
  rails: [{ name: '+5 V', volts: 5, tolerancePercent: 5, pins: [8] }],
  reportFormats: [
    {
      id: 'check-log',
      name: 'Check log',
      where: 'The handset, INSPECT page 4: one line for each syndrome that was put right since the log was cleared.',
      parts: [
        { field: 'bank', notation: 'names' },
        { text: ' SYN ' },
        {
          field: 'syndrome',
          notation: 'hexadecimal',
          digits: { min: 2, max: 2 },
          code: { kind: 'sec-ded', columns: syndromes },
        },
        { text: ' TIMES ' },
        { field: 'count', digits: { min: 1, max: 5 } },
      ],
      after: 'lists-lanes',
      notes:
        'A syndrome of two wrong bits stops the ropeway and stands in the log all the same: it names no chip. Then run the bare test.',
    },
    {
      id: 'bare-test',
      name: 'Bare test',
      where: 'The handset, INSPECT page 9, with the check switched off and the rope brake set.',
      parts: [
        { field: 'address', notation: 'hexadecimal', digits: { min: 5, max: 5 } },
        { text: ' PUT ' },
        { field: 'written', notation: 'hexadecimal', digits: { min: 6, max: 6 }, bits: numbers(0, 21) },
        { text: ' GOT ' },
        { field: 'read', notation: 'hexadecimal', digits: { min: 6, max: 6 }, bits: numbers(0, 21) },
      ],
      after: 'lists-lanes',
      notes: 'All 22 bits as they stand in the chips: the lowest four figures are the data, the rest the check bits.',
    },
  ],
  sources: [
    {
      title: 'Haul store HS-3, drawing B-2207-F',
      kind: 'schematic',
      author: 'Brathvik Ropeways',
      year: 1987,
      page: 'sheets 1 to 4',
      proves: 'Rows, banks, multiplexers and drivers.',
    },
    {
      title: 'Supervisor inspection book',
      kind: 'service manual',
      author: 'Brathvik Ropeways',
      year: 1988,
      page: '6-11 to 6-14',
      proves: 'Both report formats and the table of syndromes.',
    },
    {
      title: 'Pull test, 1-A, 1-F, 2-L and 4-B',
      kind: 'pull test',
      year: 2022,
      proves: 'C5 is at the left end of rows 1 and 3, bit 0 at the right end of rows 2 and 4.',
    },
  ],
  examples: [
    { format: 'check-log', text: 'U SYN 1A TIMES 118', sockets: ['4-B'], source: 'Pull test, 4-B out.' },
    {
      format: 'check-log',
      text: 'L SYN 04 TIMES 3',
      sockets: ['1-D'],
      source: 'Inspection of the valley station, 2021. A check bit alone: C2.',
    },
    {
      format: 'bare-test',
      text: '1A004 PUT 000000 GOT 000200',
      sockets: ['4-B'],
      source: 'Pull test, 4-B out, check switched off.',
    },
  ],
};
