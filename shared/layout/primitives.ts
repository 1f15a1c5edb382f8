import { z } from 'zod';

/** Words that a person reads: no control characters, no leading or trailing space. */
export const words = (max: number) =>
  z
    .string()
    .trim()
    .min(1, 'Write at least one character.')
    .max(max, `At most ${max} characters.`)
    .regex(/^[^\u0000-\u0008\u000b-\u001f\u007f]*$/, 'Control characters are not allowed.');

/** A label as printed on the board, such as U14, IC3 or 7C. */
export const label = words(24).regex(/^\S(.*\S)?$/, 'A label neither starts nor ends with a space.');

/** A short name that other parts of the document refer to: letters, digits, dot, dash, underscore. */
export const slug = z
  .string()
  .min(1)
  .max(64)
  .regex(/^[A-Za-z0-9][A-Za-z0-9._-]*$/, 'Letters, digits, dot, dash and underscore only, and no dash at the start.');

/**
 * A whole number of at least 0 written as a JSON number or as text such as "0x4000" (hexadecimal),
 * "0o40000" (octal) or "16384". It is kept as a number.
 */
export const count = (max: number) =>
  z
    .union([
      z.number(),
      z
        .string()
        .max(24)
        .regex(/^(0[xX][0-9A-Fa-f]+|0[oO][0-7]+|[0-9]+)$/, 'Write 16384, "0x4000" or "0o40000".')
        .transform(Number),
    ])
    .pipe(z.number().int('Whole numbers only.').min(0, 'Not below 0.').max(max, `At most ${max}.`));

/** A CPU address or a word number: below 2^40, so every sum of two stays exact. */
export const address = count(2 ** 40 - 1);

/** A place or a size on the sketch, in sketch units. */
export const sketchUnit = z.number().min(-100_000).max(100_000);

/** Quarter turns clockwise. */
export const quarterTurn = z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]);

/** An inclusive range of numbers. */
export const range = z
  .strictObject({ from: address, to: address })
  .refine((r) => r.from <= r.to, { message: 'The end of a range is not before its start.', path: ['to'] });
