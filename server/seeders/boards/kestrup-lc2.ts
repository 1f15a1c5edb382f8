import type { LayoutDocumentInput } from '@/shared';
import { labelled, lineOfSockets } from './place';

const oddLabels = labelled('K3/', [1, 3, 5, 7, 9, 11, 13, 15]);
const evenLabels = labelled('K3/', [2, 4, 6, 8, 10, 12, 14, 16]);

const column = (bank: string, labels: readonly string[]) =>
  lineOfSockets({
    labels,
    start: { x: bank === '1' ? 0 : 13, y: 0 },
    step: { x: 0, y: 10 },
    socket: { family: 'static-1k-1', turn: 1, soldered: true },
    holds: (bit) => [{ bank, bit }],
  });

/** Lift cabinet: two banks that the flashing lamp counts from 1, as it counts the bits. */
export const kestrupLc2: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Kestrup Lift Works',
    name: 'LC-2 lift cabinet, card K3',
    revision: 'D',
    kind: 'controller',
    year: 1978,
    notes:
      'Car call memory of a six-floor lift. Two banks of 1 KB, every chip soldered. The cabinet carries mains on the contactor side. The lift is taken out of service and locked off before the door is opened.',
    marks: ['Etched on the solder side: "K3-D 78"', 'Two columns of chips lying on their sides, the lamp above them'],
    view: { side: 'component', edge: 'left', edgeName: 'edge connector' },
  },
  memory: {
    dataBits: 8,
    banks: [
      { id: '1', name: 'left column', words: 1024 },
      { id: '2', name: 'right column', words: 1024 },
    ],
  },
  addressMap: {
    digits: 4,
    windows: [
      { range: { from: '0x1000', to: '0x13FF' }, banks: ['1'] },
      { range: { from: '0x1400', to: '0x17FF' }, banks: ['2'] },
    ],
  },
  sockets: [...column('1', oddLabels), ...column('2', evenLabels)],
  sharedParts: [
    {
      label: 'K3/21',
      name: 'data buffer, bits 0 to 3',
      role: 'data-buffer',
      x: 28,
      y: 6,
      turn: 1,
      width: 22,
      serves: { bits: [0, 1, 2, 3] },
    },
    {
      label: 'K3/22',
      name: 'data buffer, bits 4 to 7',
      role: 'data-buffer',
      x: 28,
      y: 34,
      turn: 1,
      width: 22,
      serves: { bits: [4, 5, 6, 7] },
    },
    {
      label: 'K3/23',
      name: 'bank decoder',
      role: 'decoder',
      x: 28,
      y: 61,
      turn: 1,
      width: 22,
      channels: 'bank',
      serves: {},
    },
    {
      label: 'K3/24',
      name: 'write gate',
      role: 'write-driver',
      x: 38,
      y: 6,
      turn: 1,
      width: 22,
      channels: 'none',
      serves: {},
    },
    { label: 'K3/25', name: '+5 V regulator', role: 'supply', x: 38, y: 34, turn: 1, width: 22, serves: {} },
  ],
  rails: [{ name: '+5 V', volts: 5, tolerancePercent: 5, pins: [10], sharedPart: 'K3/25' }],
  reportFormats: [
    {
      id: 'flashes',
      name: 'Lamp flashes',
      where: 'The amber lamp on the card. A group of flashes, a pause, a second group, then dark for three seconds.',
      parts: [
        { field: 'bank', notation: 'flashes', first: 1 },
        { text: '-' },
        { field: 'bit', notation: 'flashes', first: 1 },
      ],
      after: 'stops',
      testOrder: { bits: 'ascending', outer: 'bit' },
      notes:
        'The first group is the column, the second the chip from the top. It tests a bit in both columns before the next. Count twice.',
    },
    {
      id: 'buzzer',
      name: 'Door buzzer',
      where: 'The landing buzzer, where the card sits behind a closed panel. Long for the column, short for the chip.',
      parts: [
        { field: 'bank', notation: 'flashes', first: 1 },
        { text: ' long ' },
        { field: 'bit', notation: 'flashes', first: 1 },
        { text: ' short' },
      ],
      after: 'stops',
      testOrder: { bits: 'ascending', outer: 'bit' },
    },
  ],
  sources: [
    {
      title: 'Cabinet LC-2, card K3, wiring book',
      kind: 'schematic',
      author: 'Kestrup Lift Works',
      year: 1978,
      page: 'leaf 17',
      proves: 'Columns, buffers and decoder.',
    },
    {
      title: "Fitter's pocket card LC-2",
      kind: 'service manual',
      author: 'Kestrup Lift Works',
      year: 1979,
      proves: 'Flashes and buzzer, counted from 1.',
    },
    {
      title: 'Continuity from each chip to K3/21 and K3/22',
      kind: 'continuity',
      year: 2016,
      proves: 'Bit of every chip.',
    },
  ],
  examples: [
    { format: 'flashes', text: '2-5', sockets: ['K3/10'], source: 'Repair 63 at the maltings lift, 2016.' },
    { format: 'flashes', text: '1-1', sockets: ['K3/1'], source: 'Data pin of K3/1 held low with a probe, 2016.' },
    {
      format: 'buzzer',
      text: '1 long 8 short',
      sockets: ['K3/15'],
      source: "Fitter's pocket card, example on the back.",
    },
  ],
};
