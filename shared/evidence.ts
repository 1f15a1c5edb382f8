import { z } from 'zod';
import { limits } from './limits';
import { bitNumber } from './layout/memory';
import { address, label, slug, words } from './layout/primitives';
import { picture } from './picture';
import { log, readings } from './readings';
import { alias, finding, measurement, sign } from './signs';

export const laneName = z.strictObject({ bank: label, bit: bitNumber });

const code = z.strictObject({
  kind: z.literal('code'),
  format: slug.describe('The id of one of the report formats of the layout.'),
  text: z.string().min(1).max(limits.reportText).describe('The code as the machine showed it.'),
  doubts: z
    .array(z.enum(['first', 'order']))
    .max(2)
    .optional()
    .describe(
      'What of the layout the technician does not take for granted. first: whether the machine counts from 0 or 1. order: which end is bit 0. Each is then left open.',
    ),
});

const lanes = z.strictObject({
  kind: z.literal('lanes'),
  failing: z.array(laneName).max(1024),
  passed: z
    .union([z.literal('rest'), z.literal('none'), z.array(laneName).max(20_000)])
    .default('none')
    .describe('The lanes that were tested and passed; "rest" means all others.'),
});

const mask = z.strictObject({
  kind: z.literal('mask'),
  bank: label,
  mask: address.describe(
    'The failing bits of the bank: bit n of the mask is data bit n. Widest 40 bits; use lanes for more.',
  ),
});

const pass = z.strictObject({
  kind: z.literal('pass'),
  banks: z.array(label).max(limits.banks).optional().describe('The banks that passed. Left out: all.'),
});

const plainKinds = [code, lanes, mask, pass, readings, log, picture, sign, measurement, alias, finding] as const;
const plain = z.discriminatedUnion('kind', plainKinds);

/** One thing that can be understood in several ways: octal or hexadecimal, five or six flashes, which byte came first. */
const either = z.strictObject({
  kind: z.literal('either'),
  ways: z
    .array(
      z.strictObject({
        takes: words(80).describe('What this way takes, such as "the log is octal".'),
        evidence: plain,
      }),
    )
    .min(2)
    .max(8),
});

/** One thing that the technician saw. */
export const evidence = z.discriminatedUnion('kind', [...plainKinds, either]);

/** One thing that was done to the board between two runs. */
export const change = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('swap'), sockets: z.tuple([label, label]) }),
  z.strictObject({
    kind: z.literal('replace'),
    socket: label,
    with: z.enum(['known-good', 'untested']).default('known-good'),
    family: slug.optional().describe('The chip family that was fitted, where it is not the one of the socket.'),
  }),
  z.strictObject({ kind: z.literal('reseat'), socket: label }),
]);

/** One pass of the test with the chips in known positions. */
export const run = z.strictObject({
  changes: z.array(change).max(limits.changesPerRun).default([]).describe('What was done just before this run.'),
  evidence: z.array(evidence).max(limits.evidencePerRun).default([]),
  complete: z
    .boolean()
    .default(true)
    .describe(
      'For machines that list every failure: the whole list is here, so what is not on it passed. False: there was more.',
    ),
});

export const runs = z.array(run).max(limits.runs);

export type LaneName = z.output<typeof laneName>;
export type PlainEvidence = z.output<typeof plain>;
export type Evidence = z.output<typeof evidence>;
export type Change = z.output<typeof change>;
export type Run = z.output<typeof run>;
export type RunInput = z.input<typeof run>;
