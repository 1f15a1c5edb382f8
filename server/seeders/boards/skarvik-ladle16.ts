import type { LayoutDocumentInput } from '@/shared';
import { itemAt, labelled, lineOfSockets, numbers } from './place';

interface ByteRow {
  readonly bank: string;
  readonly firstLabel: number;
  readonly y: number;
  /** From the left: eight data bits, then the parity bit of the byte. */
  readonly bits: readonly number[];
}

const highByte = [...numbers(15, 8), 17];
const lowByte = [...numbers(7, 0), 16];

const byteRow = ({ bank, firstLabel, y, bits }: ByteRow) =>
  lineOfSockets({
    labels: labelled('M', numbers(firstLabel, firstLabel + 8)),
    start: { x: 0, y },
    step: { x: 9.8, y: 0 },
    socket: { family: 'dynamic-64k-1' },
    holds: (place) => [{ bank, bit: itemAt(bits, place) }],
  });

/** Foundry controller: 16-bit words of two parity bytes, interleaved over two banks. */
export const skarvikLadle16: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Skarvik Foundry Controls',
    name: 'Ladle 16 memory card',
    revision: 'E',
    kind: 'controller',
    year: 1986,
    notes:
      '256 KB for the pour sequencer. Words alternate between banks X and Y, so a loop over ascending addresses uses both in turn. The high byte is at the even address. Metal dust is common: wipe the card before power.',
    marks: ['Copper, lower left: "LDL16-E"', 'A row of nine chips in four rows, the ninth of each with a white dot'],
    view: { side: 'component', edge: 'bottom', edgeName: 'backplane, 96 ways' },
  },
  memory: {
    dataBits: 18,
    checkBits: [16, 17],
    bitNames: [...labelled('', numbers(0, 15)), 'PL', 'PH'],
    banks: [
      { id: 'X', name: 'words at even places', words: '0x10000' },
      { id: 'Y', name: 'words at odd places', words: '0x10000' },
    ],
  },
  addressMap: {
    digits: 6,
    windows: [
      {
        range: { from: '0x000000', to: '0x03FFFF' },
        lanes: [
          [...numbers(8, 15), 17],
          [...numbers(0, 7), 16],
        ],
        banks: ['X', 'Y'],
        interleave: [[1]],
      },
    ],
    elsewhere: [{ range: { from: '0x040000', to: '0x07FFFF' }, means: 'the second memory card of the rack' }],
  },
  multiplexing: { row: [0, 1, 2, 3, 4, 5, 6, 7], column: [8, 9, 10, 11, 12, 13, 14, 15] },
  sockets: [
    byteRow({ bank: 'X', firstLabel: 101, y: 0, bits: highByte }),
    byteRow({ bank: 'X', firstLabel: 111, y: 12.5, bits: lowByte }),
    byteRow({ bank: 'Y', firstLabel: 121, y: 28, bits: highByte }),
    byteRow({ bank: 'Y', firstLabel: 131, y: 40.5, bits: lowByte }),
  ].flat(),
  sharedParts: [
    {
      label: 'M201',
      name: 'data transceiver, high byte',
      role: 'data-buffer',
      x: 7,
      y: 53,
      width: 22,
      serves: { bits: numbers(8, 15) },
    },
    {
      label: 'M202',
      name: 'data transceiver, low byte',
      role: 'data-buffer',
      x: 33,
      y: 53,
      width: 22,
      serves: { bits: numbers(0, 7) },
    },
    {
      label: 'M203',
      name: 'parity of both bytes',
      role: 'parity',
      x: 59,
      y: 53,
      width: 22,
      serves: { bits: [16, 17] },
    },
    {
      label: 'M204',
      name: 'row strobes X and Y',
      role: 'strobe-driver',
      x: 7,
      y: 62,
      width: 22,
      channels: 'bank',
      serves: {},
    },
    {
      label: 'M205',
      name: 'multiplexer, A0 to A3',
      role: 'multiplexer',
      x: 33,
      y: 62,
      width: 22,
      channels: 'address-bit',
      serves: { addressBits: [0, 1, 2, 3, 8, 9, 10, 11] },
    },
    {
      label: 'M206',
      name: 'multiplexer, A4 to A7',
      role: 'multiplexer',
      x: 59,
      y: 62,
      width: 22,
      channels: 'address-bit',
      serves: { addressBits: [4, 5, 6, 7, 12, 13, 14, 15] },
    },
    { label: 'M207', name: 'refresh counter', role: 'refresh-counter', x: 79, y: 57.5, turn: 1, width: 15, serves: {} },
  ],
  rails: [{ name: '+5 V', volts: 5, tolerancePercent: 5, pins: [8] }],
  reportFormats: [
    {
      id: 'printer',
      name: 'Printer line',
      where: 'The shift printer, when the memory test is called with key 7.',
      parts: [
        { field: 'address', notation: 'hexadecimal', digits: { min: 6, max: 6 } },
        { text: ' W ' },
        { field: 'written', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
        { text: ' R ' },
        {
          field: 'read',
          notation: 'hexadecimal',
          digits: { min: 2, max: 2 },
          table: [
            { text: 'PL', bits: [16] },
            { text: 'PH', bits: [17] },
          ],
        },
      ],
      after: 'lists-lanes',
      notes:
        'One line for each bad byte. PL or PH in place of the value means that the byte was right and the parity of the low or high byte was wrong.',
    },
    {
      id: 'display',
      name: 'Display code',
      where: 'The two right-hand figures of the ladle weight display after a cold start.',
      parts: [
        { field: 'bank', notation: 'names' },
        {
          field: 'bit',
          notation: 'hexadecimal',
          digits: { min: 1, max: 1 },
          table: [
            { text: 'L', bits: [16] },
            { text: 'H', bits: [17] },
          ],
        },
      ],
      after: 'stops',
      testOrder: { banks: ['X', 'Y'], bits: 'ascending', outer: 'bank' },
      notes: 'L and H are the parity chips of the low and the high byte. They are tested last in each bank.',
    },
  ],
  sources: [
    {
      title: 'Ladle 16 memory, drawing S-5510-E',
      kind: 'schematic',
      author: 'Skarvik Foundry Controls',
      year: 1986,
      page: 'sheets 1 to 3',
      proves: 'Bytes, parity, interleave and multiplexers.',
    },
    {
      title: 'Ladle 16 service binder',
      kind: 'service manual',
      author: 'Skarvik Foundry Controls',
      year: 1987,
      page: 'tab 9',
      proves: 'Both report formats.',
    },
    {
      title: 'Pull test, M101, M118, M121 and M139',
      kind: 'pull test',
      year: 2020,
      proves: 'Which byte is which, and that Y answers where address bit 1 is set.',
    },
  ],
  examples: [
    {
      format: 'printer',
      text: '0124C6 W A5 R 85',
      sockets: ['M123'],
      source: 'Printer roll of line 2, 2020. Even address: high byte. Address bit 1 set: bank Y.',
    },
    { format: 'printer', text: '03F001 W 00 R 01', sockets: ['M118'], source: 'Pull test, M118 out.' },
    { format: 'printer', text: '0200A3 W 3C R PL', sockets: ['M139'], source: 'Pull test, M139 out.' },
    { format: 'display', text: 'YB', sockets: ['M125'], source: 'Repair of line 4, 2021.' },
    { format: 'display', text: 'XH', sockets: ['M109'], source: 'Service binder, tab 9, worked case 2.' },
  ],
};
