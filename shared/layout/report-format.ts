import { z } from 'zod';
import { limits } from '../limits';
import { bitNumber } from './memory';
import { address, label, slug, words } from './primitives';

export const fieldMeanings = [
  'bank',
  'bit',
  'mask',
  'address',
  'written',
  'read',
  'lane',
  'socket',
  'count',
  'syndrome',
  'ignored',
] as const;

export const notations = [
  'decimal',
  'hexadecimal',
  'octal',
  'binary',
  'letter',
  'one-hot',
  'flashes',
  'names',
  'words',
] as const;

/**
 * One line of a table of words: the text that the machine shows, and what it stands for. It stands in
 * place of the arithmetic of the notation, and beside it for single exceptions.
 */
export const tableEntry = z.strictObject({
  text: words(40),
  value: address.optional().describe('The number that the field would have.'),
  bank: label.optional(),
  bits: z
    .array(bitNumber)
    .max(limits.dataBits)
    .optional()
    .describe('The bits that fail. Together with a field for the bank.'),
  means: words(120).optional().describe('Words for a text that names no lane, such as "memory on the expansion card".'),
});

/** A code that corrects errors, so that a syndrome leads to the wrong bit by arithmetic. */
export const fieldCode = z.strictObject({
  kind: z
    .enum(['hamming', 'sec-ded'])
    .describe('hamming: corrects one wrong bit. sec-ded: corrects one and detects two.'),
  columns: z
    .array(z.number().int().min(0).max(0xffff))
    .min(1)
    .max(limits.dataBits)
    .describe(
      'The matrix of the code by columns: for each bit of the field, data and check bits alike, the syndrome that this bit alone gives.',
    ),
});

export const formatField = z.strictObject({
  field: z.enum(fieldMeanings),
  notation: z
    .enum(notations)
    .default('decimal')
    .describe(
      'decimal, hexadecimal, octal, binary: digits. letter: A, B, C. one-hot: a mask in binary with just one 1. flashes: a number that the person counted. names: the id of the bank, the name of the bit or the label of the socket. words: only what the table lists.',
    ),
  first: z
    .union([z.literal(0), z.literal(1), z.literal('unknown')])
    .default(0)
    .describe('The number of the first bank, bit or lane as this machine counts, or "unknown".'),
  bitOrder: z
    .enum(['low-first', 'high-first', 'unknown'])
    .default('low-first')
    .describe(
      'low-first: the number 0 (or 1) and the lowest place of a mask are bit 0. high-first: they are the highest bit. For binary and one-hot the lowest place is the rightmost digit.',
    ),
  bits: z
    .array(bitNumber)
    .min(1)
    .max(limits.dataBits)
    .optional()
    .describe(
      'The bits of the word that the field counts or shows, the first or lowest first. Left out: all bits that are no check bits, or all bits where the mask is wide enough or the field has a code.',
    ),
  digits: z
    .strictObject({ min: z.number().int().min(1).max(72), max: z.number().int().min(1).max(72) })
    .refine((d) => d.min <= d.max, { message: 'The most digits are not fewer than the least.', path: ['max'] })
    .optional()
    .describe('How many digits the machine prints. Left out: as many as the number needs, leading zeros allowed.'),
  shift: z
    .number()
    .int()
    .min(0)
    .max(39)
    .default(0)
    .describe('For an address: how many of its low bits the machine leaves out.'),
  order: z
    .enum(['bank-first', 'bit-first'])
    .default('bank-first')
    .describe('For a lane number: bank-first counts all bits of one bank, then the next.'),
  table: z.array(tableEntry).max(limits.tableEntries).default([]),
  code: fieldCode
    .optional()
    .describe('For a syndrome in digits: the code that gives it. Lines of the table count before it.'),
});

export const formatText = z.strictObject({ text: z.string().min(1).max(60) });

export const reportFormat = z.strictObject({
  id: slug,
  name: words(60).describe('What a technician calls it, such as "Lamp code".'),
  where: words(200).optional().describe('Where the machine shows it.'),
  parts: z
    .array(z.union([formatText, formatField]))
    .min(1)
    .max(limits.formatParts)
    .describe('The code from left to right: fixed text and fields.'),
  written: address.optional().describe('What the test wrote, where the code shows only what was read.'),
  bank: label.optional().describe('The bank that the code speaks of, where it names none.'),
  after: z
    .enum(['stops', 'lists-lanes', 'lists-banks'])
    .describe(
      'What the machine does after a failure. stops: it ends at the first, so what comes later was not tested. lists-lanes: it reports every failing lane. lists-banks: it reports every failing bank once, with all its failing bits.',
    ),
  testOrder: z
    .strictObject({
      banks: z
        .array(label)
        .max(limits.banks)
        .optional()
        .describe('The banks in the order of the test. Left out: as listed in the layout.'),
      bits: z
        .enum(['together', 'ascending', 'descending'])
        .default('together')
        .describe('together: the word is tested as a whole.'),
      outer: z.enum(['bank', 'bit']).default('bank').describe('bank: all of one bank before the next.'),
    })
    .optional(),
  notes: words(600).optional(),
});

export const workedExample = z.strictObject({
  format: slug,
  text: words(limits.reportText),
  sockets: z.array(label).min(1).max(72).describe('The sockets that the code blames.'),
  source: words(400).optional().describe('Where the example was seen: a repair, a manual, a drawing.'),
});
