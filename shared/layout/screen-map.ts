import { z } from 'zod';
import { label, words, address } from './primitives';

/** One plane of the picture. Planes that share an address differ by their bits, others by base or register. */
export const plane = z.strictObject({
  name: words(40),
  colour: z.enum(['red', 'green', 'blue', 'intensity', 'white', 'amber']).default('white'),
  base: address.optional().describe('The address of the first unit of this plane. Left out: that of the screen.'),
  register: z.strictObject({ name: label, value: address }).optional(),
  bits: z
    .array(z.number().int().min(0).max(71))
    .min(1)
    .max(72)
    .describe('The bits of a word that make its pixels, the leftmost pixel first.'),
});

export const screenMap = z.strictObject({
  width: z.number().int().min(1).max(8192).describe('Pixels of a line.'),
  height: z.number().int().min(1).max(8192),
  base: address.describe('The address of the first unit of the first line.'),
  unitsPerLine: z.number().int().min(1).max(8192).describe('Addresses, one after the other, that make a line.'),
  pixelsPerUnit: z.number().int().min(1).max(72),
  lineWeights: z
    .array(address)
    .min(1)
    .max(14)
    .describe(
      'For each bit of the line number, lowest first, how far it moves the address. 32, 64, 128 ... is a picture stored line after line.',
    ),
  planes: z.array(plane).min(1).max(8),
  turn: z
    .union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)])
    .default(0)
    .describe('Quarter turns clockwise from the memory to the glass.'),
});
