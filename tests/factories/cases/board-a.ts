import type { LayoutDocumentInput } from '@/shared';
import { addressLog, labels, rowOfChips } from './rows';

const family = 'dynamic-16k-1-three-rail';

/** 8-bit bus, 32 KB, two banks of 16K × 1 chips with three supplies on one shared set of data lines. */
export const boardA: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Test Works',
    name: 'Board A',
    revision: '1',
    view: { side: 'component', edge: 'bottom', edgeName: 'edge connector' },
  },
  memory: {
    dataBits: 8,
    banks: [
      { id: '0', words: 0x4000, dataLines: 'RD' },
      { id: '1', words: 0x4000, dataLines: 'RD' },
    ],
  },
  addressMap: {
    digits: 4,
    windows: [
      { range: { from: 0x0000, to: 0x3fff }, banks: ['0'] },
      { range: { from: 0x4000, to: 0x7fff }, banks: ['1'] },
    ],
  },
  multiplexing: { row: [0, 1, 2, 3, 4, 5, 6], column: [7, 8, 9, 10, 11, 12, 13] },
  sockets: [
    ...rowOfChips({ labels: labels('U', { first: 10, count: 8 }), bank: '0', family, row: 0 }),
    ...rowOfChips({ labels: labels('U', { first: 20, count: 8 }), bank: '1', family, row: 1 }),
  ],
  sharedParts: [
    { label: 'U30', name: 'data transceiver', role: 'data-buffer', channels: 'bit', serves: {} },
    {
      label: 'U31',
      name: 'bank decoder, /CAS0 and /CAS1, enables U30',
      role: 'decoder',
      channels: 'bank',
      serves: {},
    },
    {
      label: 'U32',
      name: 'multiplexer MA0 to MA3',
      role: 'multiplexer',
      channels: 'address-bit',
      serves: { addressBits: [0, 1, 2, 3, 7, 8, 9, 10] },
    },
    {
      label: 'U33',
      name: 'multiplexer MA4 to MA6',
      role: 'multiplexer',
      channels: 'address-bit',
      serves: { addressBits: [4, 5, 6, 11, 12, 13] },
    },
    { label: 'U34', name: '/RAS and /WE drivers', role: 'strobe-driver', channels: 'none', serves: {} },
    { label: 'U35', name: '7-bit refresh row counter', role: 'refresh-counter', serves: {} },
  ],
  rails: [
    { name: '-5 V', volts: -5, tolerancePercent: 10, pins: [1] },
    { name: '+12 V', volts: 12, tolerancePercent: 10, pins: [8] },
    { name: '+5 V', volts: 5, tolerancePercent: 10, pins: [9] },
  ],
  reportFormats: [addressLog(4)],
};
