import type { LayoutDocumentInput } from '@/shared';

/** What every revision of the T-64 loom controller has in common. */
export const tarnvallT64 = {
  memory: {
    dataBits: 8,
    banks: [
      { id: 'A', words: '0x4000' },
      { id: 'B', words: '0x4000' },
      { id: 'C', words: '0x4000' },
      { id: 'D', words: '0x4000' },
    ],
  },
  addressMap: {
    digits: 4,
    windows: [
      { range: { from: '0x0000', to: '0x3FFF' }, banks: ['A'] },
      { range: { from: '0x4000', to: '0x7FFF' }, banks: ['B'] },
      { range: { from: '0x8000', to: '0xBFFF' }, banks: ['C'] },
      { range: { from: '0xC000', to: '0xFFFF' }, banks: ['D'] },
    ],
  },
  multiplexing: { row: [0, 1, 2, 3, 4, 5, 6], column: [7, 8, 9, 10, 11, 12, 13] },
  rails: [
    { name: '−5 V', volts: -5, pins: [1], sharedPart: 'VR3' },
    { name: '+12 V', volts: 12, pins: [8], sharedPart: 'VR3' },
    { name: '+5 V', volts: 5, tolerancePercent: 5, pins: [9], sharedPart: 'VR3' },
  ],
  reportFormats: [
    {
      id: 'lamp',
      name: 'Lamp code',
      where: 'The two characters above the warp stop lamps, after the mains key is turned with the pedal held down.',
      parts: [{ field: 'bank', notation: 'letter' }, { field: 'bit' }],
      after: 'stops',
      testOrder: { bits: 'ascending', outer: 'bank' },
      notes: 'The loom shows one code and halts. A second bad chip shows only after the first is put right.',
    },
    {
      id: 'monitor',
      name: 'Monitor line',
      where: 'The teleprinter on the 5-pin service socket, command M.',
      parts: [
        { field: 'address', notation: 'hexadecimal', digits: { min: 4, max: 4 } },
        { text: ' wrote ' },
        { field: 'written', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
        { text: ' read ' },
        { field: 'read', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
      ],
      after: 'lists-lanes',
      notes: 'It prints a line for each bad word, good bits and all. Stop it with the space bar, or the roll runs out.',
    },
  ],
} satisfies Partial<LayoutDocumentInput>;
