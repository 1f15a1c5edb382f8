import type { LayoutDocumentInput } from '@/shared';
import { labelled, lineOfSockets, numbers } from './place';

/** Tide recorder: one bank of eight bits, bit 0 next to the supply. */
export const sandvoeTg3: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Sandvoe Marine Instruments',
    name: 'TG-3 tide recorder',
    revision: 'issue 2',
    kind: 'recorder',
    year: 1979,
    notes:
      'Keeps 40 days of water levels between visits. One bank of 16 KB. The −5 V comes from a small converter that is the first thing to die in a damp gauge hut: measure it before a chip is fitted.',
    marks: [
      'Brass plate on the card guide: "TG3 / 2"',
      'Green converter block marked DC-2 at the left end of the array',
    ],
    view: { side: 'component', edge: 'left', edgeName: 'float encoder connector' },
  },
  memory: { dataBits: 8, banks: [{ id: 'STORE', name: 'level store', words: '0x4000' }] },
  addressMap: { digits: 4, windows: [{ range: { from: '0x8000', to: '0xBFFF' }, banks: ['STORE'] }] },
  multiplexing: { row: [6, 5, 4, 3, 2, 1, 0], column: [7, 8, 9, 10, 11, 12, 13] },
  sockets: lineOfSockets({
    labels: labelled(
      'IC',
      // The odd numbers between are resistor packs.
      numbers(0, 7).map((bit) => 32 + bit * 2),
    ),
    start: { x: 0, y: 0 },
    step: { x: 10, y: 0 },
    socket: { family: 'dynamic-16k-1-three-rail' },
    holds: (place) => [{ bank: 'STORE', bit: place }],
  }),
  sharedParts: [
    {
      label: 'DC-2',
      name: 'supply converter',
      role: 'supply',
      x: 3,
      y: 13,
      width: 14,
      height: 8,
      serves: {},
    },
    { label: 'IC16', name: 'data buffer', role: 'data-buffer', x: 25, y: 12, width: 22, serves: {} },
    {
      label: 'IC17',
      name: 'row and column strobe',
      role: 'strobe-driver',
      x: 58,
      y: 12,
      width: 24,
      channels: 'none',
      serves: {},
    },
    {
      label: 'IC14',
      name: 'multiplexer, A0 to A3',
      role: 'multiplexer',
      x: 25,
      y: 21,
      width: 22,
      channels: 'address-bit',
      serves: { addressBits: [3, 4, 5, 6, 7, 8, 9, 10] },
    },
    {
      label: 'IC15',
      name: 'multiplexer, A4 to A6',
      role: 'multiplexer',
      x: 58,
      y: 21,
      width: 24,
      channels: 'address-bit',
      serves: { addressBits: [0, 1, 2, 11, 12, 13] },
    },
  ],
  rails: [
    { name: '−5 V', volts: -5, pins: [1], sharedPart: 'DC-2' },
    { name: '+12 V', volts: 12, pins: [8], sharedPart: 'DC-2' },
    { name: '+5 V', volts: 5, tolerancePercent: 5, pins: [9] },
  ],
  reportFormats: [
    {
      id: 'display',
      name: 'Display code',
      where: 'The level display, in place of the metres, about 20 seconds after the battery is connected.',
      parts: [{ text: 'E-' }, { field: 'bit' }],
      bank: 'STORE',
      after: 'stops',
      testOrder: { bits: 'ascending' },
      notes: 'E-8 and E-9 belong to the float encoder and have no place in this array.',
    },
    {
      id: 'strip',
      name: 'Strip print',
      where: 'The last line of the paper strip after TEST is pressed with the lid switch open.',
      parts: [{ text: 'MEM ' }, { field: 'mask', notation: 'binary', digits: { min: 8, max: 8 } }],
      bank: 'STORE',
      after: 'lists-banks',
      notes: 'A 1 is a bad bit. The rightmost figure is bit 0.',
    },
  ],
  sources: [
    {
      title: 'TG-3 circuit 3-118',
      kind: 'schematic',
      author: 'Sandvoe Marine Instruments',
      year: 1979,
      page: 'sheet 2',
      proves: 'Data bits, buffer and multiplexers.',
    },
    {
      title: "TG-3 keeper's handbook",
      kind: 'service manual',
      author: 'Sandvoe Marine Instruments',
      year: 1980,
      page: '31',
      proves: 'The display code and the strip print.',
    },
    { title: 'Pull test, IC32 and IC46', kind: 'pull test', year: 2018, proves: 'Bit 0 and bit 7.' },
  ],
  examples: [
    { format: 'display', text: 'E-3', sockets: ['IC38'], source: 'Repair of the harbour gauge at pier 2, 2018.' },
    {
      format: 'strip',
      text: 'MEM 01000001',
      sockets: ['IC32', 'IC44'],
      source: 'Strip kept with a recorder that had lost its −5 V, 2020. Both chips were spoilt.',
    },
  ],
};
