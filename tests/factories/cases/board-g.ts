import type { LayoutDocumentInput } from '@/shared';
import { addressLog, labels, rowOfChips } from './rows';

const family = 'dynamic-64k-1';

/** 8-bit bus, 128 KB, two interleaved banks of 64K × 1 chips; A0 picks the bank. */
export const boardG: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: { maker: 'Test Works', name: 'Board G', revision: '1' },
  memory: {
    dataBits: 8,
    banks: [
      { id: 'E', words: 0x10000 },
      { id: 'O', words: 0x10000 },
    ],
  },
  addressMap: {
    digits: 5,
    windows: [{ range: { from: 0x00000, to: 0x1ffff }, banks: ['E', 'O'], interleave: [[0]] }],
  },
  sockets: [
    ...rowOfChips({ labels: labels('U', { first: 40, count: 8 }), bank: 'E', family, row: 0 }),
    ...rowOfChips({ labels: labels('U', { first: 50, count: 8 }), bank: 'O', family, row: 1 }),
  ],
  reportFormats: [addressLog(5)],
};
