import { z } from 'zod';
import { limits } from '../limits';
import { address, count, label, range, words } from './primitives';

export const bitNumber = z
  .number()
  .int()
  .min(0)
  .max(limits.dataBits - 1);

export const bank = z.strictObject({
  id: label.describe(
    'What the rest of the document, the evidence and the screens call this bank, such as "A", "0" or "UPPER".',
  ),
  name: words(60).optional().describe('Longer words for the bank where the id is not enough.'),
  words: count(2 ** 40)
    .pipe(z.number().min(1))
    .describe('Words in the bank.'),
  bits: z
    .array(bitNumber)
    .min(1)
    .max(limits.dataBits)
    .optional()
    .describe('The bits that this bank has. Left out: all of them.'),
  dataLines: label
    .optional()
    .describe(
      'Banks with the same text share their data lines, so a chip that never lets go of a line spoils that bit in all of them. Left out: one set of lines for the board.',
    ),
});

export const memory = z.strictObject({
  dataBits: z
    .number()
    .int()
    .min(1)
    .max(limits.dataBits)
    .describe('Bits of a word, parity and check bits included; they are numbered from 0.'),
  checkBits: z
    .array(bitNumber)
    .max(limits.dataBits)
    .default([])
    .describe('Which of the bits are parity or check bits.'),
  bitNames: z
    .array(label)
    .max(limits.dataBits)
    .optional()
    .describe('Names of the bits from bit 0 up, where they are not simply 0, 1, 2.'),
  banks: z.array(bank).min(1).max(limits.banks),
});

/**
 * One bit of the number of the bank that answers: the exclusive-or of the named CPU address bits.
 * The first named bit is the one that the rest of the address is closed up over.
 */
const selectBit = z.array(z.number().int().min(0).max(39)).min(1).max(16);

export const addressWindow = z.strictObject({
  range: range.describe('CPU addresses, both ends included.'),
  register: z
    .strictObject({ name: label, value: address })
    .optional()
    .describe('The window is there only while this page or bank register holds this value.'),
  lanes: z
    .array(z.array(bitNumber).min(1).max(limits.dataBits))
    .min(1)
    .max(16)
    .optional()
    .describe(
      'Byte lanes: for each address step within a word, the bits of the word that this address carries, lowest first. [[8,9,10,11,12,13,14,15],[0,1,2,3,4,5,6,7]] is a 16-bit word with the high byte at the even address. Left out: one address is one whole word.',
    ),
  banks: z
    .array(label)
    .min(1)
    .max(limits.banks)
    .describe('The bank behind the window, or with interleave the banks in the order of their number.'),
  interleave: z
    .array(selectBit)
    .max(8)
    .default([])
    .describe('The bits of the bank number, lowest first, each the exclusive-or of CPU address bits. Empty: one bank.'),
  firstWord: address.default(0).describe('The word of the bank at the first address of the window.'),
});

export const addressMap = z.strictObject({
  notation: z
    .enum(['hexadecimal', 'octal', 'decimal'])
    .default('hexadecimal')
    .describe('How this machine writes addresses.'),
  digits: z.number().int().min(1).max(16).optional(),
  windows: z.array(addressWindow).max(limits.windows).default([]),
  elsewhere: z
    .array(z.strictObject({ range, means: words(120) }))
    .max(64)
    .default([])
    .describe('Addresses that belong to something that is not on this board, and what that is.'),
});

export const multiplexing = z.strictObject({
  row: z
    .array(z.number().int().min(0).max(39))
    .max(40)
    .describe('Bits of the word number inside the chip that reach its row inputs, row input 0 first.'),
  column: z
    .array(z.number().int().min(0).max(39))
    .max(40)
    .describe('Bits of the word number inside the chip that reach its column inputs, column input 0 first.'),
});
