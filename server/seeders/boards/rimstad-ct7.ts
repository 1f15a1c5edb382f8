import type { LayoutDocumentInput } from '@/shared';
import { labelled, lineOfSockets, numbers } from './place';

const family = 'dynamic-16k-1-single-rail';

/** What a row of the card holds, from the top: the fixed store is two chips deep. */
const rows = [
  { bank: 'FIX', words: { from: '0x0000', to: '0x3FFF' }, y: 0 },
  { bank: 'FIX', words: { from: '0x4000', to: '0x7FFF' }, y: 12.5 },
  { bank: 'PG0', words: undefined, y: 29 },
  { bank: 'PG1', words: undefined, y: 41.5 },
];

const storeRow = ({ bank, words, y }: (typeof rows)[number], row: number) =>
  lineOfSockets({
    // The silk screen numbers the sockets down the columns, four to a column.
    labels: labelled(
      'E',
      numbers(0, 7).map((bit) => bit * 4 + row + 1),
      2,
    ),
    start: { x: 0, y },
    step: { x: 10, y: 0 },
    socket: { family, soldered: bank === 'FIX' },
    holds: (bit) => [{ bank, bit, words }],
  });

/** Cold-store terminal: a bank two chips deep that is also the picture of a tube on its side, and two banks behind a page register. */
export const rimstadCt7: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Rimstad Cold Chain',
    name: 'CT-7 cold-store terminal',
    revision: '3',
    kind: 'terminal',
    year: 1984,
    notes:
      'Door terminal that logs pallet temperatures. The fixed store is 32 KB, two chips deep for each bit and soldered; the amber tube, which stands upright in the door post, shows 20 KB from the middle of it. The log pages of 16 KB share one address range and sit in sockets. Let a cold card warm up in its bag, or it will dew.',
    marks: ['Sticker by the relay: "7-113 REV 3"', 'Two soldered rows above, two socketed rows below'],
    view: { side: 'component', edge: 'right', edgeName: 'door cable' },
  },
  memory: {
    dataBits: 8,
    banks: [
      { id: 'FIX', name: 'fixed store', words: '0x8000' },
      { id: 'PG0', name: 'log page 0', words: '0x4000' },
      { id: 'PG1', name: 'log page 1', words: '0x4000' },
    ],
  },
  addressMap: {
    digits: 4,
    windows: [
      { range: { from: '0x0000', to: '0x7FFF' }, banks: ['FIX'] },
      { range: { from: '0x8000', to: '0xBFFF' }, register: { name: 'PAGE', value: 0 }, banks: ['PG0'] },
      { range: { from: '0x8000', to: '0xBFFF' }, register: { name: 'PAGE', value: 1 }, banks: ['PG1'] },
    ],
    elsewhere: [{ range: { from: '0xC000', to: '0xFFFF' }, means: 'program store of the terminal' }],
  },
  multiplexing: { row: [0, 1, 2, 3, 4, 5, 6], column: [13, 12, 11, 10, 9, 8, 7] },
  families: [
    {
      id: family,
      name: '16K x 1 dynamic, +5 V only',
      kind: 'dynamic',
      words: '0x4000',
      width: 1,
      pins: [
        { pin: 2, name: 'D', does: 'data-in', index: 0 },
        { pin: 3, name: '/W', does: 'write-enable' },
        { pin: 4, name: '/RAS', does: 'row-strobe' },
        { pin: 8, name: '+5 V', does: 'supply', volts: 5, tolerancePercent: 10 },
        { pin: 14, name: 'Q', does: 'data-out', index: 0 },
        { pin: 15, name: '/CAS', does: 'column-strobe' },
        { pin: 16, name: '0 V', does: 'ground' },
      ],
      rows: 128,
      refreshMs: 2,
      stackable: true,
      source: 'Common practice for this package; check the data sheet of the chip that you fit.',
    },
  ],
  sockets: rows.flatMap(storeRow),
  sharedParts: [
    {
      label: 'E41',
      name: 'data buffer, bits 0 to 3',
      role: 'data-buffer',
      x: 8,
      y: 54,
      width: 24,
      serves: { bits: [0, 1, 2, 3] },
    },
    {
      label: 'E42',
      name: 'data buffer, bits 4 to 7',
      role: 'data-buffer',
      x: 35,
      y: 54,
      width: 24,
      serves: { bits: [4, 5, 6, 7] },
    },
    {
      label: 'E43',
      name: 'row strobes of the fixed store',
      role: 'strobe-driver',
      x: 62,
      y: 54,
      width: 24,
      channels: 'none',
      serves: { banks: ['FIX'] },
    },
    {
      label: 'E44',
      name: 'address multiplexer',
      role: 'multiplexer',
      x: 8,
      y: 63,
      width: 24,
      channels: 'address-bit',
      serves: { addressBits: numbers(0, 13) },
    },
    {
      label: 'E45',
      name: 'page register and decoder',
      role: 'decoder',
      x: 35,
      y: 63,
      width: 24,
      channels: 'bank',
      serves: { banks: ['PG0', 'PG1'] },
    },
    { label: 'E46', name: 'refresh counter', role: 'refresh-counter', x: 62, y: 63, width: 24, serves: {} },
    { label: 'J7', name: 'door cable', role: 'connector', x: 85, y: 24, turn: 1, width: 40, serves: {} },
  ],
  rails: [{ name: '+5 V', volts: 5, tolerancePercent: 5, pins: [8] }],
  reportFormats: [
    {
      id: 'socket-line',
      name: 'Socket on the display',
      where: 'The door display after three wrong PINs and the star key.',
      parts: [{ text: 'BAD ' }, { field: 'socket', notation: 'names' }],
      after: 'lists-lanes',
      notes:
        'This terminal names the socket itself. It cannot know that a buffer is bad, and then lists four or eight.',
    },
    {
      id: 'keys',
      name: 'Key lamps',
      where: 'The keypad lamps, where the display is dark: one letter key and one figure key are lit.',
      parts: [
        {
          field: 'bank',
          notation: 'words',
          table: [
            { text: 'F', bank: 'FIX' },
            { text: 'M', bank: 'PG0' },
            { text: 'N', bank: 'PG1' },
          ],
        },
        { field: 'bit' },
      ],
      after: 'stops',
      testOrder: { bits: 'ascending', outer: 'bank' },
      notes:
        'F is the fixed store, M and N are the log pages. In the fixed store the lamps do not tell the upper chip from the lower; the tube does, since each draws its own part of it.',
    },
    {
      id: 'dump',
      name: 'Dump line',
      where: 'The serial socket behind the front plate.',
      parts: [
        { field: 'bank', notation: 'names' },
        { text: ' ' },
        { field: 'address', notation: 'hexadecimal', digits: { min: 4, max: 4 } },
        { text: ' W' },
        { field: 'written', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
        { text: ' R' },
        { field: 'read', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
      ],
      after: 'lists-lanes',
    },
  ],
  screenMap: {
    width: 512,
    height: 320,
    base: '0x2000',
    unitsPerLine: 64,
    pixelsPerUnit: 8,
    lineWeights: [64, 128, 256, 512, 1024, 2048, 4096, 8192, 16384],
    planes: [{ name: 'amber', colour: 'amber', bits: numbers(7, 0) }],
    turn: 1,
  },
  sources: [
    {
      title: 'CT-7 terminal, card 7-113',
      kind: 'schematic',
      author: 'Rimstad Cold Chain',
      year: 1984,
      page: 'sheet 2',
      proves: 'Depth of the fixed store, page register, buffers.',
    },
    {
      title: 'Silk screen of card 7-113 rev 3',
      kind: 'silk screen',
      year: 2020,
      proves: 'Numbers run down the columns.',
    },
    {
      title: 'Pull test, E03, E04, E31 and E32',
      kind: 'pull test',
      year: 2020,
      proves: 'Pages 0 and 1, bits 0 and 7.',
    },
    {
      title: 'CT-7 door tube, adjustment sheet 4',
      kind: 'service manual',
      author: 'Rimstad Cold Chain',
      year: 1984,
      page: '2',
      proves: 'Points and lines of the tube, where they are kept, and that bit 7 is drawn first.',
    },
  ],
  examples: [
    { format: 'socket-line', text: 'BAD E15', sockets: ['E15'], source: 'Repair of door 3 at a fish hall, 2020.' },
    {
      format: 'keys',
      text: 'F3',
      sockets: ['E13', 'E14'],
      source: 'Drawing 7-113: bit 3 of the fixed store is two chips.',
    },
    { format: 'keys', text: 'N7', sockets: ['E32'], source: 'Pull test, E32 out.' },
    { format: 'dump', text: 'PG1 9A40 W55 R54', sockets: ['E04'], source: 'Pull test, E04 out.' },
  ],
};
