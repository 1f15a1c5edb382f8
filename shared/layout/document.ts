import { z } from 'zod';
import { limits } from '../limits';
import { addressMap, memory, multiplexing } from './memory';
import { chipFamily, rail, sharedPart, socket } from './parts';
import { words, type label } from './primitives';
import { reportFormat, workedExample } from './report-format';
import { screenMap } from './screen-map';

export const boardKinds = [
  'computer',
  'terminal',
  'controller',
  'instrument',
  'recorder',
  'display',
  'musical instrument',
  'transmitter',
  'game cabinet',
  'other',
] as const;

export const board = z.strictObject({
  maker: words(60),
  name: words(60),
  revision: words(30).describe('As marked on the board. A technician is asked to compare it before a socket is named.'),
  kind: z.enum(boardKinds).default('other'),
  year: z.number().int().min(1950).max(2100).optional(),
  notes: words(2000).optional(),
  marks: z
    .array(words(120))
    .max(16)
    .default([])
    .describe('What to look for on the copper, the silk screen and stickers to know this revision.'),
  view: z
    .strictObject({
      side: z.enum(['component', 'solder']).default('component'),
      edge: z.enum(['top', 'right', 'bottom', 'left']).default('bottom'),
      edgeName: words(40).default('connector'),
    })
    .prefault({})
    .describe('Which side the sketch is drawn from, and which edge to hold it by.'),
});

export const source = z.strictObject({
  title: words(200),
  kind: z
    .enum(['schematic', 'service manual', 'silk screen', 'continuity', 'pull test', 'repair', 'other'])
    .default('other'),
  author: words(100).optional(),
  year: z.number().int().min(1950).max(2100).optional(),
  page: words(40).optional(),
  proves: words(300).optional().describe('Which facts of the layout come from it.'),
});

/**
 * The description of one board revision's memory array, whole: everything that turns what the machine
 * reports into the socket to pull. Order of the banks is their number; bits are numbered from 0.
 */
export const layoutDocument = z.strictObject({
  format: z.literal('rowcall.layout/1'),
  board,
  memory,
  addressMap: addressMap.prefault({}),
  multiplexing: multiplexing.optional(),
  families: z
    .array(chipFamily)
    .max(32)
    .default([])
    .describe('Chip families of this board that the built-in list does not have.'),
  sockets: z.array(socket).min(1).max(limits.sockets),
  sharedParts: z.array(sharedPart).max(limits.sharedParts).default([]),
  rails: z.array(rail).max(16).default([]),
  reportFormats: z.array(reportFormat).max(limits.reportFormats).default([]),
  screenMap: screenMap.optional(),
  sources: z.array(source).max(limits.sources).default([]),
  examples: z.array(workedExample).max(limits.examples).default([]),
});

/** A layout document after parsing: defaults filled in, numbers as numbers. */
export type LayoutDocument = z.output<typeof layoutDocument>;
/** A layout document as a person or a script writes it. */
export type LayoutDocumentInput = z.input<typeof layoutDocument>;
export type Bank = LayoutDocument['memory']['banks'][number];
export type AddressWindow = LayoutDocument['addressMap']['windows'][number];
export type Socket = LayoutDocument['sockets'][number];
export type Held = Socket['holds'][number];
export type SharedPart = LayoutDocument['sharedParts'][number];
export type ChipFamily = LayoutDocument['families'][number];
export type ReportFormat = LayoutDocument['reportFormats'][number];
export type FormatField = Extract<ReportFormat['parts'][number], { field: string }>;
export type ScreenMap = NonNullable<LayoutDocument['screenMap']>;
export type WorkedExample = LayoutDocument['examples'][number];
export type BoardLabel = z.output<typeof label>;
