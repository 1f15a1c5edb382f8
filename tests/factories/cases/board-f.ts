import type { LayoutDocumentInput } from '@/shared';
import { labels, rowOfChips, upTo } from './rows';

/** 8-bit bus with parity, 256 KB, four banks of nine 64K × 1 chips; the test beeps bank and bit. */
export const boardF: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: { maker: 'Test Works', name: 'Board F', revision: '1' },
  memory: { dataBits: 9, checkBits: [8], banks: upTo(4).map((n) => ({ id: String(n), words: 0x10000 })) },
  addressMap: {
    digits: 5,
    windows: upTo(4).map((n) => ({ range: { from: n * 0x10000, to: n * 0x10000 + 0xffff }, banks: [String(n)] })),
  },
  sockets: upTo(4).flatMap((n) =>
    rowOfChips({
      labels: labels('U', { first: (n + 1) * 10, count: 9 }),
      bank: String(n),
      family: 'dynamic-64k-1',
      row: n,
    }),
  ),
  sharedParts: [{ label: 'U50', name: 'parity maker and checker', role: 'parity', serves: {} }],
  reportFormats: [
    {
      id: 'beeps',
      name: 'Beeps',
      parts: [
        { field: 'bank', notation: 'flashes', first: 1 },
        { text: ' LONG ' },
        { field: 'bit', notation: 'flashes', first: 1, bits: upTo(9) },
        { text: ' SHORT' },
      ],
      after: 'stops',
      notes: 'Long beeps count the bank from 1, short beeps the data bit from 1, D0 first. Nine short is parity.',
    },
  ],
};
