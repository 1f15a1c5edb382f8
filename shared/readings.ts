import { z } from 'zod';
import { limits } from './limits';
import { bitNumber } from './layout/memory';
import { address, count, label, words } from './layout/primitives';

const tallied = count(2 ** 40 - 1);

/** One word that was written and read back, or a run of addresses that all showed the same. */
export const reading = z
  .strictObject({
    address,
    to: address.optional().describe('The last address, where the line stands for a run of them.'),
    step: address.optional().describe('How far apart the addresses of the run lie. Left out: one after the other.'),
    written: address.optional(),
    read: address.optional(),
    mask: address.optional().describe('The failing bits, where the machine shows those in place of what it read.'),
    register: z
      .strictObject({ name: label, value: address })
      .optional()
      .describe('The page or bank register at the time, where the address alone is not enough.'),
  })
  .refine((line) => (line.mask === undefined) !== (line.read === undefined), {
    message: 'A reading has either a mask of failing bits or the value that was read.',
    path: ['read'],
  })
  .refine((line) => line.read === undefined || line.written !== undefined, {
    message: 'A value that was read needs the value that was written.',
    path: ['written'],
  })
  .refine((line) => line.to === undefined || line.to >= line.address, {
    message: 'The end of a run is not before its start.',
    path: ['to'],
  });

/** Readings of single words, typed or pasted. A reading that read what was written is evidence too. */
export const readings = z.strictObject({
  kind: z.literal('readings'),
  lines: z.array(reading).min(1).max(limits.readings),
  unit: z
    .enum(['address', 'word'])
    .default('address')
    .describe('What the addresses count. word: whole words of the memory, as many self-tests of wide machines do.'),
  shows: z
    .enum(['address', 'word'])
    .default('address')
    .describe(
      'What one value holds. address: the bits that this address carries. word: the whole word, also where one address carries only a part of it.',
    ),
  rest: z
    .enum(['unknown', 'passed'])
    .default('unknown')
    .describe('passed: the whole memory was tested and nothing else failed.'),
  waited: z
    .number()
    .min(0)
    .max(86_400)
    .optional()
    .describe('Seconds between writing and reading, where it was waited.'),
});

/** What a long list of readings said of one lane. */
export const laneTally = z.strictObject({
  bank: label,
  bit: bitNumber,
  readsOne: tallied.describe('How often it read 1 though 0 was written.'),
  readsZero: tallied.describe('How often it read 0 though 1 was written.'),
  alone: tallied.default(0).describe('How many of those readings failed in this bit only.'),
  words: tallied.describe('Different failing words.'),
  rows: tallied.default(0).describe('Different rows inside the chip; 0 where the layout does not say what a row is.'),
  columns: tallied.default(0),
  row: address.optional().describe('The row, where there is only one.'),
  column: address.optional().describe('The column, where there is only one.'),
  ones: address.describe('Bits of the word number inside the chip that were 1 in every failing word.'),
  zeros: address.describe('Bits of the word number inside the chip that were 0 in every failing word.'),
  first: address.describe('Number of the line where it failed first, from 1.'),
  last: address,
});

/** A log of a memory test, drawn together: the lines themselves stay on the device. */
export const log = z.strictObject({
  kind: z.literal('log'),
  name: words(120).describe('What the log is called, such as its file name.'),
  lines: tallied,
  readings: tallied.describe('Lines that were read as a reading.'),
  unread: tallied.describe('Lines that were not.'),
  outside: tallied.default(0).describe('Readings whose address leads to no word of this board.'),
  rest: z.enum(['unknown', 'passed']).default('unknown'),
  values: z
    .array(z.strictObject({ bank: label, written: address, read: address, count: tallied }))
    .max(limits.tallyValues)
    .default([])
    .describe('The commonest pairs of written and read, as whole words of the bank.'),
  lanes: z.array(laneTally).max(limits.tallyLanes),
  right: z
    .array(z.strictObject({ bank: label, bit: bitNumber, zeros: tallied, ones: tallied }))
    .max(limits.tallyLanes)
    .default([])
    .describe('How often a lane was seen to read 0 and 1 rightly in the same readings.'),
});

export type Reading = z.output<typeof reading>;
export type Readings = z.output<typeof readings>;
export type LaneTally = z.output<typeof laneTally>;
export type LogEvidence = z.output<typeof log>;
