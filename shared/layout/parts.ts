import { z } from 'zod';
import { limits } from '../limits';
import { bitNumber } from './memory';
import { address, count, label, quarterTurn, range, sketchUnit, slug, words } from './primitives';

export const pinFunctions = [
  'supply',
  'ground',
  'address',
  'data',
  'data-in',
  'data-out',
  'row-strobe',
  'column-strobe',
  'write-enable',
  'chip-select',
  'output-enable',
  'refresh',
  'none',
] as const;

export const chipPin = z.strictObject({
  pin: z.number().int().min(1).max(64),
  name: label,
  does: z.enum(pinFunctions),
  index: z.number().int().min(0).max(63).optional().describe('Which address or data pin this is, counted from 0.'),
  volts: z.number().min(-50).max(50).optional().describe('The supply that the pin wants, in volts against 0 V.'),
  tolerancePercent: z.number().min(0).max(100).optional(),
});

export const chipFamily = z.strictObject({
  id: slug,
  name: words(80),
  alsoCalled: z.array(label).max(24).default([]).describe('Generic type numbers that the trade uses for the family.'),
  kind: z.enum(['dynamic', 'static']),
  words: count(2 ** 40)
    .pipe(z.number().min(1))
    .describe('Words in one chip.'),
  width: z.number().int().min(1).max(72).describe('Data bits of one chip.'),
  pins: z.array(chipPin).max(64).default([]),
  rows: z.number().int().min(1).optional().describe('Rows that a refresh must reach.'),
  refreshMs: z.number().positive().optional(),
  gradesNs: z
    .array(z.number().positive().max(10_000))
    .max(16)
    .optional()
    .describe('Access times in nanoseconds with which the family was usually sold, the fastest first.'),
  stackable: z
    .boolean()
    .default(false)
    .describe('A good chip may be laid on top for a test: its output floats while it is not selected.'),
  source: words(400).optional(),
});

/** What one data pin of the chip in a socket stands for. */
export const held = z.strictObject({
  pin: z.number().int().min(0).max(71).default(0).describe('Data pin of the chip, counted from 0.'),
  bank: label,
  bit: bitNumber,
  words: range.optional().describe('The words of the bank that this chip holds. Left out: all.'),
  at: address.default(0).describe('The word inside the chip where they begin.'),
});

export const socket = z.strictObject({
  label,
  x: sketchUnit.describe('Centre on the sketch, to the right.'),
  y: sketchUnit.describe('Centre on the sketch, downwards.'),
  turn: quarterTurn.default(0).describe('Quarter turns clockwise from upright.'),
  width: z.number().positive().max(1000).default(8),
  height: z.number().positive().max(1000).default(10),
  family: slug,
  pin1: z
    .enum(['top-left', 'top-right', 'bottom-left', 'bottom-right'])
    .default('top-left')
    .describe('The corner of pin 1 before the turn.'),
  soldered: z.boolean().default(false).describe('The chip is soldered in, so moving it costs about ten times as much.'),
  holds: z.array(held).min(1).max(1024),
});

export const sharedPartRoles = [
  'data-buffer',
  'multiplexer',
  'strobe-driver',
  'write-driver',
  'decoder',
  'refresh-counter',
  'parity',
  'shift-register',
  'supply',
  'connector',
  'other',
] as const;

export const sharedPart = z.strictObject({
  label,
  name: words(80).optional(),
  role: z.enum(sharedPartRoles),
  x: sketchUnit.optional(),
  y: sketchUnit.optional(),
  turn: quarterTurn.default(0),
  width: z.number().positive().max(1000).default(20),
  height: z.number().positive().max(1000).default(6),
  serves: z
    .strictObject({
      bits: z.array(bitNumber).max(limits.dataBits).optional(),
      banks: z.array(label).max(limits.banks).optional(),
      sockets: z.array(label).max(limits.sockets).optional(),
      addressBits: z
        .array(z.number().int().min(0).max(39))
        .max(40)
        .optional()
        .describe('Bits of the word number that pass through it.'),
    })
    .describe('Each list left out means all of them. Sockets narrow it down to the lanes that those sockets hold.'),
  channels: z
    .enum(['bit', 'bank', 'address-bit', 'none'])
    .optional()
    .describe('What one of its channels carries, each of which can fail alone. Left out: what is usual for the role.'),
});

export const rail = z.strictObject({
  name: label,
  volts: z.number().min(-50).max(50),
  tolerancePercent: z.number().min(0).max(100).default(10),
  pins: z
    .array(z.number().int().min(1).max(64))
    .min(1)
    .max(16)
    .describe('The pins of every socket where it is measured.'),
  sockets: z.array(label).max(limits.sockets).optional(),
  sharedPart: label.optional().describe('The shared part that makes or carries it.'),
});
