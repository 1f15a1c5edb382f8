import type { LayoutDocumentInput } from '@/shared';
import { itemAt, lineOfSockets, numbers } from './place';

const banks = numbers(0, 7).map(String);
/** One letter a bit; I is left out, as it reads like a 1. J is parity. */
const columns = ['A', 'B', 'C', 'D', 'E', 'F', 'G', 'H', 'J'];

/** Rows count upwards from the connector, so row 1 is the lowest on the sketch. */
const storeRow = (bank: number) =>
  lineOfSockets({
    labels: columns.map((letter) => `${bank + 1}${letter}`),
    start: { x: 0, y: (7 - bank) * 12.5 },
    step: { x: 9.8, y: 0 },
    socket: { family: 'dynamic-16k-1-three-rail' },
    holds: (place) => [{ bank: itemAt(banks, bank), bit: place }],
  });

/** Marshalling yard: 72 sockets in eight banks of nine bits, reported by octal mask. */
export const ferrowHy128: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Ferrow Yard Control',
    name: 'HY-128 store card',
    revision: 'mod 6',
    kind: 'controller',
    year: 1980,
    notes:
      'Wagon list of a hump yard. Eight banks of 16 KB with parity, 72 chips. Sockets have no printed numbers: the row is counted from the plug, the column letter is on the stiffener bar. All the yard figures are octal. Cards before mod 5 have no column J.',
    marks: [
      'Punched plate on the stiffener: "HY128 MOD 6"',
      'Nine columns of sockets, letters A to J without I',
      'Three rails at the test posts TP1 to TP3',
    ],
    view: { side: 'component', edge: 'bottom', edgeName: 'rack plug' },
  },
  memory: {
    dataBits: 9,
    checkBits: [8],
    bitNames: [...numbers(0, 7).map(String), 'P'],
    banks: banks.map((id, bank) => ({ id, name: `row ${bank + 1}`, words: '0o40000' })),
  },
  addressMap: {
    notation: 'octal',
    digits: 6,
    windows: banks.map((id, bank) => ({ range: { from: bank * 16384, to: bank * 16384 + 16383 }, banks: [id] })),
  },
  multiplexing: { row: [1, 2, 3, 4, 5, 6, 0], column: [7, 8, 9, 10, 11, 12, 13] },
  sockets: numbers(7, 0).flatMap(storeRow),
  sharedParts: [
    {
      label: '0A',
      name: 'data buffer, bits 0 to 3',
      role: 'data-buffer',
      x: 7,
      y: 100,
      width: 22,
      serves: { bits: [0, 1, 2, 3] },
    },
    {
      label: '0D',
      name: 'data buffer, bits 4 to 7',
      role: 'data-buffer',
      x: 33,
      y: 100,
      width: 22,
      serves: { bits: [4, 5, 6, 7] },
    },
    {
      label: '0G',
      name: 'parity generator and check',
      role: 'parity',
      x: 59,
      y: 100,
      width: 22,
      serves: { bits: [8] },
    },
    {
      label: '0B',
      name: 'row strobes, banks 0 to 3',
      role: 'strobe-driver',
      x: 7,
      y: 109,
      width: 22,
      channels: 'bank',
      serves: { banks: banks.slice(0, 4) },
    },
    {
      label: '0E',
      name: 'row strobes, banks 4 to 7',
      role: 'strobe-driver',
      x: 33,
      y: 109,
      width: 22,
      channels: 'bank',
      serves: { banks: banks.slice(4) },
    },
    {
      label: '0H',
      name: 'write enable driver',
      role: 'write-driver',
      x: 59,
      y: 109,
      width: 22,
      channels: 'none',
      serves: {},
    },
    {
      label: '0C',
      name: 'multiplexer, A0 to A3',
      role: 'multiplexer',
      x: 7,
      y: 118,
      width: 22,
      channels: 'address-bit',
      serves: { addressBits: [1, 2, 3, 4, 7, 8, 9, 10] },
    },
    {
      label: '0F',
      name: 'multiplexer, A4 to A6',
      role: 'multiplexer',
      x: 33,
      y: 118,
      width: 22,
      channels: 'address-bit',
      serves: { addressBits: [0, 5, 6, 11, 12, 13] },
    },
    { label: '0J', name: 'refresh counter', role: 'refresh-counter', x: 59, y: 118, width: 22, serves: {} },
    { label: 'REG', name: 'three-rail regulator', role: 'supply', x: 78.5, y: 109, turn: 1, width: 24, serves: {} },
  ],
  rails: [
    { name: '−5 V', volts: -5, pins: [1], sharedPart: 'REG' },
    { name: '+12 V', volts: 12, pins: [8], sharedPart: 'REG' },
    { name: '+5 V', volts: 5, tolerancePercent: 5, pins: [9], sharedPart: 'REG' },
  ],
  reportFormats: [
    {
      id: 'tally',
      name: 'Tally print',
      where: 'The yard printer, at the end of each pass of STORE CHECK.',
      parts: [
        { text: 'PASS ' },
        { field: 'count', digits: { min: 1, max: 4 } },
        { text: ' ROW ' },
        { field: 'bank', first: 1 },
        { text: ' MASK ' },
        { field: 'mask', notation: 'octal', digits: { min: 3, max: 3 }, bits: numbers(0, 8) },
      ],
      after: 'lists-banks',
      notes:
        'A line for each bad row of chips, all its bits in one octal mask. 400 is the parity bit. The row counts from 1, as on the card.',
    },
    {
      id: 'post-lamps',
      name: 'Bank switch and lamps',
      where: 'The nine lamps on the card front, with the bank that the thumb-wheel shows when the check halts.',
      parts: [
        { field: 'bank' },
        { text: '/' },
        { field: 'bit', notation: 'one-hot', digits: { min: 9, max: 9 }, bits: numbers(0, 8) },
      ],
      after: 'stops',
      testOrder: { banks: [...banks].reverse(), bits: 'ascending', outer: 'bank' },
      notes:
        'Write a lit lamp as 1. The leftmost lamp is parity, the rightmost is bit 0. The check runs from bank 7 down. The thumb-wheel counts from 0, the tally print from 1.',
    },
    {
      id: 'trace',
      name: 'Trace line',
      where: "The maintainer's keyboard printer, STORE CHECK with key 3 down.",
      parts: [
        { field: 'address', notation: 'octal', digits: { min: 6, max: 6 } },
        { text: ' IN ' },
        { field: 'written', notation: 'octal', digits: { min: 3, max: 3 }, bits: numbers(0, 8) },
        { text: ' OUT ' },
        { field: 'read', notation: 'octal', digits: { min: 3, max: 3 }, bits: numbers(0, 8) },
      ],
      after: 'lists-lanes',
    },
  ],
  sources: [
    {
      title: 'Store card HY-128, drawing 55/2 mod 6',
      kind: 'schematic',
      author: 'Ferrow Yard Control',
      year: 1980,
      page: 'sheets 1 to 8',
      proves: 'Banks, strobes, parity and multiplexers.',
    },
    {
      title: 'Yard computer maintenance course, book 3',
      kind: 'service manual',
      author: 'Ferrow Yard Control',
      year: 1981,
      page: '44',
      proves: 'Tally print, lamps and trace.',
    },
    {
      title: 'Pull test, one chip in each row and 1A to 1J',
      kind: 'pull test',
      year: 2015,
      proves: 'Row 1 is bank 0, column A is bit 0, column J is parity.',
    },
  ],
  examples: [
    {
      format: 'tally',
      text: 'PASS 12 ROW 5 MASK 040',
      sockets: ['5F'],
      source: 'Repair of the spare card of the east yard, 2015.',
    },
    { format: 'tally', text: 'PASS 1 ROW 8 MASK 401', sockets: ['8A', '8J'], source: 'Course book 3, page 44.' },
    { format: 'post-lamps', text: '2/000001000', sockets: ['3D'], source: 'Pull test, 3D out.' },
    { format: 'trace', text: '271340 IN 252 OUT 212', sockets: ['6F'], source: 'Printer roll, 2016.' },
  ],
};
