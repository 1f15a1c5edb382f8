import type { LayoutDocumentInput } from '@/shared';
import { labels, rowOfChips, upTo } from './rows';

const family = 'dynamic-64k-1';
const high = upTo(8).map((n) => n + 8);
const lanes = [high, upTo(8)];

/** 16-bit bus, 256 KB, two banks of 64K × 1 chips, the high byte at the even address. */
export const boardC: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: { maker: 'Test Works', name: 'Board C', revision: '1' },
  memory: {
    dataBits: 16,
    banks: [
      { id: '0', words: 0x10000 },
      { id: '1', words: 0x10000 },
    ],
  },
  addressMap: {
    digits: 6,
    windows: [
      { range: { from: 0x000000, to: 0x01ffff }, banks: ['0'], lanes },
      { range: { from: 0x020000, to: 0x03ffff }, banks: ['1'], lanes },
    ],
  },
  sockets: [
    ...rowOfChips({ labels: labels('J', { first: 1, count: 16 }), bank: '0', family, row: 0 }),
    ...rowOfChips({ labels: labels('K', { first: 1, count: 16 }), bank: '1', family, row: 1 }),
  ],
  reportFormats: [
    {
      id: 'octal',
      name: 'Octal word log',
      parts: [
        { text: 'AT ' },
        { field: 'address', notation: 'octal', shift: 1, digits: { min: 6, max: 6 } },
        { text: ' WANT ' },
        { field: 'written', notation: 'octal', digits: { min: 6, max: 6 } },
        { text: ' GOT ' },
        { field: 'read', notation: 'octal', digits: { min: 6, max: 6 } },
      ],
      after: 'lists-lanes',
    },
  ],
};
