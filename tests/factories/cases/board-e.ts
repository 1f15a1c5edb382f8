import type { LayoutDocumentInput } from '@/shared';
import { addressLog } from './rows';

const holds = (bits: readonly number[]) => bits.map((bit, pin) => ({ pin, bank: '0', bit }));

/** 8-bit bus, 64 KB, one bank of two 64K × 4 chips wired to alternate bits. */
export const boardE: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: { maker: 'Test Works', name: 'Board E', revision: '1' },
  memory: { dataBits: 8, banks: [{ id: '0', words: 0x10000 }] },
  addressMap: { digits: 4, windows: [{ range: { from: 0x0000, to: 0xffff }, banks: ['0'] }] },
  sockets: [
    { label: 'U7', x: 0, y: 0, family: 'dynamic-64k-4', holds: holds([0, 2, 4, 6]) },
    { label: 'U8', x: 12, y: 0, family: 'dynamic-64k-4', holds: holds([1, 3, 5, 7]) },
  ],
  reportFormats: [addressLog(4)],
};
