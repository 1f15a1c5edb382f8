import type { LayoutDocumentInput } from '@/shared';
import { itemAt, lineOfSockets } from './place';

/** Bit at each data pin, from pin 0: the tracks were drawn for the shortest way, not for order. */
const upperBits = [5, 3, 1, 7];
const lowerBits = [0, 6, 2, 4];
const banks = ['P0', 'P1', 'P2', 'P3'];

const chipRow = (labels: readonly string[], y: number, bits: readonly number[]) =>
  lineOfSockets({
    labels,
    start: { x: 0, y },
    step: { x: 16, y: 0 },
    socket: { family: 'static-1k-4', width: 10, height: 14, pin1: 'top-right' },
    holds: (place) => bits.map((bit, pin) => ({ pin, bank: itemAt(banks, place), bit })),
  });

/** Transmitter: four pages, each two chips of four bits, seen from the solder side. */
export const hallebroSx40: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Hallebro Radio',
    name: 'SX-40 exciter control',
    revision: '04',
    kind: 'transmitter',
    year: 1980,
    notes:
      'Frequency and power tables of a short-wave exciter. Four pages of 1 KB. Each chip holds four bits in mixed order, so one chip shows as up to four bits that do not lie side by side. The card can only be reached from the solder side. Anode voltage is near: earth the stage first.',
    marks: ['Stamp in red ink on the solder side: "SX40-04"', 'Eight 18-pin chips in two rows under the shield'],
    view: { side: 'solder', edge: 'right', edgeName: 'ribbon to the synthesiser' },
  },
  memory: { dataBits: 8, banks: banks.map((id, page) => ({ id, name: `page ${page}`, words: 1024 })) },
  addressMap: {
    digits: 3,
    windows: banks.map((bank, page) => ({ range: { from: page * 1024, to: page * 1024 + 1023 }, banks: [bank] })),
  },
  sockets: [
    ...chipRow(['Q-27', 'Q-25', 'Q-23', 'Q-21'], 0, upperBits),
    ...chipRow(['Q-28', 'Q-26', 'Q-24', 'Q-22'], 18, lowerBits),
  ],
  sharedParts: [
    { label: 'Q-31', name: 'data buffer', role: 'data-buffer', x: 7, y: 32, width: 22, serves: {} },
    { label: 'Q-32', name: 'page decoder', role: 'decoder', x: 34, y: 32, width: 22, channels: 'bank', serves: {} },
    {
      label: 'PL-2',
      name: 'ribbon to the synthesiser',
      role: 'connector',
      x: 60,
      y: 9,
      turn: 1,
      width: 30,
      serves: {},
    },
  ],
  rails: [{ name: '+5 V', volts: 5, tolerancePercent: 5, pins: [18] }],
  reportFormats: [
    {
      id: 'meter',
      name: 'Meter panel code',
      where: 'The four-place display above the plate meter, with the mode switch at CHECK.',
      parts: [
        { field: 'bank', notation: 'names' },
        { text: '.' },
        { field: 'mask', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
      ],
      after: 'lists-banks',
      notes: 'Each bad page shows for two seconds, then the next.',
    },
    {
      id: 'lamps',
      name: 'Two lamp groups',
      where: 'The four page lamps and the eight bit lamps on the card edge. Write a lit lamp as 1, from the left.',
      parts: [
        { field: 'bank', notation: 'one-hot', digits: { min: 4, max: 4 } },
        { text: ' ' },
        { field: 'bit', notation: 'one-hot', digits: { min: 8, max: 8 } },
      ],
      after: 'stops',
      testOrder: { bits: 'descending', outer: 'bank' },
      notes: 'The right lamp of each group is page 0 or bit 0. The test begins with bit 7.',
    },
    {
      id: 'console',
      name: 'Console line',
      where: 'The maintenance console, after CHK R.',
      parts: [
        { field: 'address', notation: 'hexadecimal', digits: { min: 3, max: 3 } },
        { text: ' ' },
        { field: 'written', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
        { text: '>' },
        { field: 'read', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
      ],
      after: 'lists-lanes',
    },
  ],
  sources: [
    {
      title: 'Exciter SX-40, diagram 4-2207',
      kind: 'schematic',
      author: 'Hallebro Radio',
      year: 1980,
      page: 'sheet 6',
      proves: 'Pages, decoder, buffer.',
    },
    {
      title: 'Continuity from each data pin to Q-31',
      kind: 'continuity',
      year: 2021,
      proves: 'Bit at every data pin of both rows.',
    },
    {
      title: 'Pull test, Q-21 and Q-28',
      kind: 'pull test',
      year: 2021,
      proves: 'Which end is page 0 and which row holds bit 7.',
    },
  ],
  examples: [
    {
      format: 'meter',
      text: 'P2.0A',
      sockets: ['Q-23'],
      source: 'Repair of the coast station spare, 2021: bits 1 and 3, one chip.',
    },
    { format: 'lamps', text: '0001 01000000', sockets: ['Q-28'], source: 'Pull test, pin of bit 6 lifted at Q-28.' },
    { format: 'console', text: 'F18 55>00', sockets: ['Q-22'], source: 'Q-22 replaced after this line, 2021.' },
  ],
};
