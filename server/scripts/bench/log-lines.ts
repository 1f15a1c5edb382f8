import { layoutDocument, type LayoutDocument } from '@/shared';
import type { LinePattern } from '@/lib';
import { seeded } from './measure';

const banks = ['A', 'B'];
const wordsOfBank = 65_536;
const upTo = (count: number) => Array.from({ length: count }, (_, at) => at);

/** An invented board of two banks of eight one-bit chips, the first from address 00000, the second from 10000. */
export const logBoard = (): LayoutDocument =>
  layoutDocument.parse({
    format: 'rowcall.layout/1',
    board: { maker: 'Bench Works', name: 'Two banks', revision: 'A' },
    memory: { dataBits: 8, banks: banks.map((id) => ({ id, words: wordsOfBank })) },
    addressMap: {
      windows: banks.map((bank, at) => ({
        range: { from: at * wordsOfBank, to: (at + 1) * wordsOfBank - 1 },
        banks: [bank],
      })),
    },
    multiplexing: { row: upTo(8), column: upTo(8).map((bit) => bit + 8) },
    sockets: banks.flatMap((bank, row) =>
      upTo(8).map((bit) => ({
        label: `U${row * 8 + bit + 1}`,
        x: bit * 12,
        y: row * 14,
        family: 'dynamic-64k-1',
        holds: [{ pin: 0, bank, bit }],
      })),
    ),
  });

/** How its lines are read. */
export const logPattern: LinePattern = {
  address: 1,
  written: 'W',
  read: 'R',
  notation: 'hexadecimal',
  unit: 'address',
  shows: 'address',
};

/** Bytes of a line of the log: "1A2F0 W 55 R 75" and its end. */
export const lineBytes = 16;

const digits = Uint8Array.from('0123456789ABCDEF', (digit) => digit.charCodeAt(0));
const blank = Uint8Array.from('00000 W 00 R 00\n', (letter) => letter.charCodeAt(0));

/**
 * Writes lines of a memory test, the same for the same seed: any address; `patterns` of writing; in the first bank bit
 * 5 wrong in most lines, in the second bit 2 in a few, and now and then two bits.
 */
export const logWriter = (seed: number, patterns: readonly number[]) => {
  const next = seeded(seed);
  return (into: Uint8Array): void => {
    for (let at = 0; at + lineBytes <= into.length; at += lineBytes) {
      const address = next(2 * wordsOfBank);
      const written = patterns[next(patterns.length)] ?? 0;
      const chance = next(64);
      const wrong = chance === 0 ? 0x24 : address < wordsOfBank ? (chance < 56 ? 0x20 : 0) : chance < 4 ? 0x04 : 0;
      into.set(blank, at);
      for (let digit = 0; digit < 5; digit++) into[at + digit] = digits[(address >> (16 - 4 * digit)) & 15]!;
      into[at + 8] = digits[written >> 4]!;
      into[at + 9] = digits[written & 15]!;
      into[at + 13] = digits[(written ^ wrong) >> 4]!;
      into[at + 14] = digits[(written ^ wrong) & 15]!;
    }
  };
};

/** What most tests write. */
export const usualPatterns = [0x00, 0xff, 0x55, 0xaa];
/** As many values as a byte has, so that there are far more pairs of written and read than are kept at once. */
export const anyPattern = upTo(256);
