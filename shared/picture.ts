import { z } from 'zod';
import { words } from './layout/primitives';

const pixel = z.number().int().min(0).max(8191);
const span = z
  .tuple([pixel, pixel])
  .refine(([from, to]) => from <= to, { message: 'The end of a span is not before its start.' });

/** A part of the picture that is wrong, in pixels of the layout's screen before it is turned, both ends included. */
export const pictureMark = z.strictObject({
  looks: z
    .enum(['missing', 'lit', 'wrong'])
    .default('wrong')
    .describe('missing: dots are dark that should be lit. lit: dots are lit that should be dark. wrong: either.'),
  planes: z
    .array(words(40))
    .min(1)
    .max(8)
    .optional()
    .describe('The planes that are wrong there, by name. Left out: all planes of the screen.'),
  x: span,
  everyX: z
    .number()
    .int()
    .min(1)
    .max(8192)
    .optional()
    .describe('The span comes again every so many pixels to the right.'),
  untilX: pixel.optional().describe('The last column that the repeats reach. Left out: up to the edge.'),
  y: span,
  everyY: z.number().int().min(1).max(8192).optional().describe('The span comes again every so many lines down.'),
  untilY: pixel.optional().describe('The last line that the repeats reach. Left out: down to the edge.'),
});

/** Faults marked on the picture. */
export const picture = z.strictObject({
  kind: z.literal('picture'),
  marks: z.array(pictureMark).min(1).max(64),
  rest: z
    .enum(['right', 'unknown'])
    .default('right')
    .describe('right: the rest of the picture was looked at and is as it should be.'),
});

export type PictureMark = z.output<typeof pictureMark>;
export type Picture = z.output<typeof picture>;
