import { z } from 'zod';
import { laneName } from './evidence';
import { finding } from './signs';

const probability = z.number().min(0).max(1);

/** How a part is thought to have failed. */
export const faultModes = [
  'dead', // a chip that is bad for all its own lanes
  'dead-bit', // one data pin of a chip that has several
  'holds-line', // a chip that never lets go of its data line
  'holds-strobe', // a chip that holds the strobe of its bank
  'holds-address', // a chip that holds an address line
  'open', // a position without contact, for all its lanes
  'open-bit', // one data contact of a position that has several
  'fitting', // a leg bent or a chip turned round when it was last handled
  'channel', // one channel of a shared part
  'whole', // the whole shared part
  'short', // two neighbouring data lines joined
  'wrong-part', // a chip of a family that the socket's supply destroys
  'supply', // a rail out of its limits
] as const;

export const partKinds = ['chip', 'position', 'shared-part', 'short', 'rail'] as const;

export const suspectMode = z.strictObject({
  mode: z.enum(faultModes),
  intermittent: z.boolean(),
  words: z.string(),
  prior: probability,
  probability,
});

export const suspect = z.strictObject({
  rank: z.number().int().min(1),
  kind: z.enum(partKinds),
  id: z
    .string()
    .describe(
      'Stable within one diagnosis: chip:U25, chip:U25#2 (fitted later), position:U25, shared:U30, short:main/2-3.',
    ),
  label: z.string().describe('In words, by where it is now: "chip now in U24 (came from U25)".'),
  socket: z
    .string()
    .nullable()
    .describe(
      'The socket where a chip is now, or of a position. Null for a chip that was taken out and for what has no socket.',
    ),
  cameFrom: z.string().nullable().describe('The socket where a moved chip was at first.'),
  sharedPart: z.string().nullable(),
  channel: z.string().nullable().describe('Which channel of a shared part, in words, where one leads.'),
  probability: probability.describe('That this part has failed: the sum over its modes.'),
  modes: z.array(suspectMode),
  lanes: z.array(laneName).describe('The lanes that its leading mode spoils, as the chips lie now.'),
  reasons: z.array(z.string()).describe('Sentences: what it explains and what speaks against it.'),
  explains: z.array(z.string()).describe('Evidence that it explains, as typed.'),
  contradicts: z.array(z.string()).describe('Evidence that speaks against it.'),
});

export const place = z.strictObject({
  socket: z.string(),
  probability: probability.describe('That the fault sits at this place: its chip or its contacts.'),
  chip: probability,
  contact: probability,
});

export const laneState = z.strictObject({
  bank: z.string(),
  bit: z.number().int(),
  state: z
    .enum(['failed', 'passed', 'untested', 'mixed'])
    .describe('In the last run; mixed: it both failed and passed there.'),
});

/** How one piece of evidence was read. */
export const readEvidence = z.strictObject({
  run: z.number().int().min(0),
  index: z.number().int().min(0),
  text: z.string(),
  ok: z.boolean(),
  readAs: z.string().nullable().describe('The text that it was taken for, where that differs from what was typed.'),
  notes: z.array(z.string()),
  reason: z.string().nullable().describe('Why it could not be read, and what is allowed.'),
  failing: z.array(laneName),
  words: z
    .array(
      z.strictObject({
        address: z.number().int(),
        bank: z.string(),
        word: z.number().int().describe('Number of the word in its bank.'),
        row: z.number().int().nullable().describe('Row inside the chip, null where the layout does not say.'),
        column: z.number().int().nullable(),
        mask: z.number().int().describe('The failing bits of the word, as far as bits 0 to 39.'),
      }),
    )
    .max(64)
    .default([])
    .describe('Where the first readings lead.'),
  passed: z.number().int().min(0).describe('How many lanes it says passed.'),
  alternatives: z.number().int().min(1).describe('How many readings remain where a convention is unknown.'),
});

export const caution = z.strictObject({ id: z.string(), text: z.string() });

export const pair = z.strictObject({
  parts: z.array(z.string()).length(2),
  labels: z.array(z.string()).length(2),
  probability,
});

export const group = z.strictObject({
  members: z.array(z.strictObject({ id: z.string(), label: z.string(), share: probability })),
  probability,
  why: z.string(),
  check: z.string().nullable().describe('What would tell the members apart.'),
});

export const checkActions = [
  'swap',
  'replace',
  'reseat',
  'stack', // a good chip laid on top
  'pull-in-turn',
  'measure', // with the power off: continuity, or from line to line
  'rails', // the supply at a socket
  'feel', // with the power on: a chip hotter than its neighbours
  'probe', // a signal with a scope
  'pattern', // write given values and read them back
  'test-whole', // run the test over all of the memory
  'soak',
  'feel', // for a chip hotter than its neighbours
  'read-again',
  'ask', // settle how the machine counts
] as const;

export const nextCheck = z.strictObject({
  action: z.enum(checkActions),
  label: z.string().describe('What to do, in one short sentence.'),
  sockets: z.array(z.string()).describe('The sockets that it handles, in the order of the words; two for a swap.'),
  minutes: z.number().positive(),
  bits: z.number().min(0).describe('Expected information.'),
  outcomes: z.array(
    z.strictObject({
      sees: z.string(),
      means: z.string(),
      probability,
      finding: finding
        .optional()
        .describe('What to enter as evidence where this is what was found, for checks made without a run of the test.'),
    }),
  ),
});

/** How failures lie inside a chip, or between lines. */
export const shapes = ['cell', 'row', 'column', 'block', 'scattered', 'whole', 'follows-neighbour'] as const;

/** A pattern in the readings that speaks for some causes and against others. */
export const signature = z.strictObject({
  shape: z.enum(shapes),
  words: z.string().describe('In one sentence: "All 128 failing words lie in row 53."'),
  lanes: z.array(laneName),
  row: z.number().int().nullable(),
  column: z.number().int().nullable(),
  count: z.number().int().nullable().describe('Failing words that were seen.'),
});

/** A question whose answer would rule out readings of the evidence. */
export const question = z.strictObject({
  ask: z.string(),
  answers: z.array(z.strictObject({ words: z.string(), share: probability, sockets: z.array(z.string()) })),
  settles: z.string().describe('What would settle it, where nobody knows the answer.'),
});

/** The whole answer. Everything that the workspace shows is here, and nothing that it computes by itself. */
export const diagnosis = z.strictObject({
  outcome: z
    .enum(['supply', 'place', 'group', 'shared', 'not-shown', 'unexplained', 'no-evidence'])
    .describe(
      'supply: a rail comes first and no chip is named. place: one socket leads. group: several parts that the evidence cannot tell apart. shared: a shared part leads and no chip is to be pulled. not-shown: everything tested passed. unexplained: no cause in the model fits well. no-evidence: nothing that names a lane yet.',
    ),
  headline: z.string().describe('What to do, in one short sentence.'),
  sure: z.enum(['sure', 'strong', 'likely', 'not sure', 'no reading']),
  probability: probability.nullable().describe('Of the place, the group or the shared part that the headline names.'),
  sentences: z.array(z.string()).describe('Why, and what is not known, the most important first.'),
  suspects: z.array(suspect),
  places: z.array(place),
  groups: z.array(group),
  pairs: z.array(pair),
  unexplained: z.array(laneName).describe('Failing lanes that no cause of the model explains well.'),
  untested: z.array(laneName),
  lanes: z.array(laneState),
  evidence: z.array(readEvidence),
  signatures: z.array(signature).default([]),
  questions: z.array(question).default([]),
  nextChecks: z.array(nextCheck).describe('The best first: most information for the minutes that it costs.'),
  cautions: z.array(caution),
  exact: z
    .boolean()
    .describe(
      'The probabilities are those of the whole model. False: combinations of many faults at once were left out.',
    ),
  leftOut: probability.describe('An upper bound of the share of probability that was left out.'),
});

export type FaultMode = (typeof faultModes)[number];
export type PartKind = (typeof partKinds)[number];
export type Suspect = z.output<typeof suspect>;
export type SuspectMode = z.output<typeof suspectMode>;
export type Place = z.output<typeof place>;
export type SuspectGroup = z.output<typeof group>;
export type LaneState = z.output<typeof laneState>;
export type ReadEvidence = z.output<typeof readEvidence>;
export type Diagnosis = z.output<typeof diagnosis>;
export type CheckAction = (typeof checkActions)[number];
export type Shape = (typeof shapes)[number];
export type Signature = z.output<typeof signature>;
export type Question = z.output<typeof question>;
export type NextCheck = z.output<typeof nextCheck>;
export type Caution = z.output<typeof caution>;
