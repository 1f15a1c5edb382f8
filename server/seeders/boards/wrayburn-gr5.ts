import type { LayoutDocumentInput } from '@/shared';
import { static4kBy1 } from './families';
import { labelled, lineOfSockets, numbers } from './place';

interface HalfRow {
  readonly bank: string;
  readonly firstLabel: number;
  readonly y: number;
  readonly firstBit: number;
}

/** Six sockets of a circle; numbers run in twos, since the even ones are decoupling capacitors. */
const halfRow = ({ bank, firstLabel, y, firstBit }: HalfRow) =>
  lineOfSockets({
    labels: labelled(
      'R',
      numbers(0, 5).map((place) => firstLabel + place * 2),
    ),
    start: { x: 0, y },
    step: { x: 11, y: 0 },
    socket: { family: static4kBy1.id, turn: 2, soldered: bank === 'HZ' },
    holds: (place) => [{ bank, bit: firstBit + place }],
  });

/** Survey instrument: twelve-bit circle readings, and a code whose first number nobody has settled. */
export const wrayburnGr5: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Wrayburn Geodetic',
    name: 'GR-5 field recorder',
    revision: '2b',
    kind: 'instrument',
    year: 1981,
    notes:
      'Stores horizontal and vertical circle readings of a theodolite, 12 bits each. The horizontal half is soldered, the vertical half was an option in sockets. Two books disagree whether the ERR number begins at 0 or at 1. If you know, confirm it.',
    marks: ['Ink stamp inside the lid: "GR5/2b"', 'Four rows of six chips, all with the notch downwards'],
    view: { side: 'component', edge: 'bottom', edgeName: 'battery contacts' },
  },
  memory: {
    dataBits: 12,
    banks: [
      { id: 'HZ', name: 'horizontal circle', words: 4096 },
      { id: 'VT', name: 'vertical circle', words: 4096, dataLines: 'vertical' },
    ],
  },
  addressMap: {
    notation: 'octal',
    digits: 5,
    windows: [
      { range: { from: 0, to: 4095 }, banks: ['HZ'] },
      { range: { from: 4096, to: 8191 }, banks: ['VT'] },
    ],
  },
  families: [static4kBy1],
  sockets: [
    halfRow({ bank: 'HZ', firstLabel: 301, y: 0, firstBit: 0 }),
    halfRow({ bank: 'HZ', firstLabel: 313, y: 12.5, firstBit: 6 }),
    halfRow({ bank: 'VT', firstLabel: 401, y: 29, firstBit: 0 }),
    halfRow({ bank: 'VT', firstLabel: 413, y: 41.5, firstBit: 6 }),
  ].flat(),
  sharedParts: [
    {
      label: 'R501',
      name: 'data buffer, horizontal',
      role: 'data-buffer',
      x: 6,
      y: 54,
      width: 20,
      serves: { banks: ['HZ'] },
    },
    {
      label: 'R502',
      name: 'data buffer, vertical',
      role: 'data-buffer',
      x: 28,
      y: 54,
      width: 20,
      serves: { banks: ['VT'] },
    },
    {
      label: 'R503',
      name: 'chip select of both circles',
      role: 'decoder',
      x: 50,
      y: 54,
      width: 20,
      channels: 'bank',
      serves: {},
    },
  ],
  rails: [{ name: '+5 V', volts: 5, pins: [18] }],
  reportFormats: [
    {
      id: 'err',
      name: 'ERR number',
      where: 'The angle display, after CLEAR is held for five seconds.',
      parts: [{ text: 'ERR ' }, { field: 'lane', first: 'unknown', order: 'bank-first', digits: { min: 2, max: 2 } }],
      after: 'stops',
      testOrder: { bits: 'ascending', outer: 'bank' },
      notes:
        'Counts the bits of the horizontal circle, then those of the vertical. It is not known whether the first is 00 or 01. ERR 00 or ERR 24 would settle it.',
    },
    {
      id: 'octal',
      name: 'Octal mask',
      where: 'The data collector cable, line 2 of the self-test record.',
      parts: [
        {
          field: 'bank',
          notation: 'words',
          table: [
            { text: 'H', bank: 'HZ' },
            { text: 'V', bank: 'VT' },
          ],
        },
        { text: ' ' },
        { field: 'mask', notation: 'octal', digits: { min: 4, max: 4 }, bitOrder: 'high-first' },
      ],
      after: 'lists-banks',
      notes: 'The circle encoder sends its highest bit first, so 0001 is bit 11 and 4000 is bit 0.',
    },
  ],
  sources: [
    {
      title: 'GR-5 recorder, plate 8',
      kind: 'schematic',
      author: 'Wrayburn Geodetic',
      year: 1981,
      proves: 'Circles, buffers and chip select.',
    },
    {
      title: 'GR-5 workshop book, first printing',
      kind: 'service manual',
      author: 'Wrayburn Geodetic',
      year: 1981,
      page: '19',
      proves: 'ERR number, with a first of 0.',
    },
    {
      title: 'GR-5 workshop book, second printing',
      kind: 'service manual',
      author: 'Wrayburn Geodetic',
      year: 1983,
      page: '21',
      proves: 'ERR number, with a first of 1.',
    },
    { title: 'Pull test, R401 and R423', kind: 'pull test', year: 2023, proves: 'Octal mask, V 4000 and V 0001.' },
  ],
  examples: [
    { format: 'octal', text: 'V 4000', sockets: ['R401'], source: 'Pull test, R401 out.' },
    { format: 'octal', text: 'V 0001', sockets: ['R423'], source: 'Pull test, R423 out.' },
    {
      format: 'err',
      text: 'ERR 24',
      sockets: ['R423'],
      source: 'Letter from a county survey office, 1984. The number exists only if the first is 01.',
    },
  ],
};
