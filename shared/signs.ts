import { z } from 'zod';
import { address, label } from './layout/primitives';
import { bitNumber } from './layout/memory';

/** What a board does besides naming lanes. */
export const signKinds = [
  'changes-each-pass', // other lanes fail in each pass of the test
  'grows-with-waiting', // more fails the longer the test waits between writing and reading
  'grows-with-warmth', // fails only warm, or more when warm
  'touch', // comes and goes when a place is pressed or the board is flexed
  'hot', // a chip is much hotter than its neighbours
  'writes-do-not-stick', // reads what was there before the writing
  'dead', // no picture, no sound, nothing runs
] as const;

export const sign = z.strictObject({
  kind: z.literal('sign'),
  sign: z.enum(signKinds),
  socket: label.optional().describe('The socket that is hot, or that was touched.'),
});

/** A supply measured at a pin of a socket, in volts against 0 V. */
export const measurement = z.strictObject({
  kind: z.literal('measurement'),
  socket: label,
  pin: z.number().int().min(1).max(64),
  volts: z.number().min(-100).max(100),
});

/** Two addresses that lead to the same cell: writing at one changes the other. */
export const alias = z.strictObject({
  kind: z.literal('alias'),
  addresses: z.tuple([address, address]),
  bits: z
    .array(bitNumber)
    .min(1)
    .max(72)
    .optional()
    .describe('The bits in which they do. Left out: all bits of the word.'),
});

/** What a check at the bench found, made without a run of the test. */
export const findingChecks = [
  'legs', // continuity to the legs of the chip in a socket: bad is a leg without contact
  'joined', // two data lines against each other, power off: bad is joined
  'output', // the output of a shared part on a scope: bad is missing or wrong
  'pin', // the data pin of a chip on a scope: bad is no clean level
  'stack', // a good chip laid on top: bad is that it got better, so the chip below is
  'pull', // the chip taken out: bad is that the others came back, so it held them
] as const;

export const finding = z.strictObject({
  kind: z.literal('finding'),
  check: z.enum(findingChecks),
  about: z
    .string()
    .min(1)
    .max(200)
    .describe(
      'The part that was checked, by its id in the answer: position:U25, chip:U25, shared:U30, short:2-3. Several with spaces between, where chips were taken out one after the other.',
    ),
  found: z.enum(['bad', 'good']),
});

export type Finding = z.output<typeof finding>;
export type SignKind = (typeof signKinds)[number];
export type Sign = z.output<typeof sign>;
export type Measurement = z.output<typeof measurement>;
