import { validateLayout } from '@/lib';
import type { LayoutDocument, LayoutProblem } from '@/shared';
import { limits } from '@/shared/limits';
import { readLayoutDocument } from '@/shared/layout/read-document';
import { readJson, type TextPlace } from './json-text';

/** A problem of the document with its place in the text. */
export interface PlacedProblem extends LayoutProblem {
  readonly place: TextPlace;
}

/** What the check says of a text while it is written. */
export interface CheckedText {
  readonly problems: readonly PlacedProblem[];
  readonly errors: number;
  /** The document to send; null while the text is no JSON. */
  readonly sent: unknown;
  /** The layout, as far as it can be read, for the preview. */
  readonly document: LayoutDocument | null;
  /** Sections that the preview leaves out because of their problems. */
  readonly leftOut: readonly string[];
}

const nothing: CheckedText = { problems: [], errors: 0, sent: null, document: null, leftOut: [] };

const start: TextPlace = { offset: 0, length: 0, line: 1 };

/** A text that cannot be read as a whole has one problem. */
const broken = (code: string, message: string, place: TextPlace = start): CheckedText => ({
  ...nothing,
  errors: 1,
  problems: [{ pointer: '', severity: 'error', code, message, place }],
});

const megabytes = (bytes: number) => `${(bytes / 1_000_000).toFixed(1)} MB`;

/** Why a text or a file of so many bytes is not read at all; null where it is. */
export function tooLarge(bytes: number): string | null {
  if (bytes <= limits.layoutBytes) return null;
  return `This is ${megabytes(bytes)}; a layout document has at most ${megabytes(limits.layoutBytes)}.`;
}

/** Everything that is wrong or doubtful in a text as a layout document, errors first, as the server would say it. */
export function checkText(text: string): CheckedText {
  if (text.trim() === '') return nothing;
  // Characters are at most bytes, so this refuses nothing that the server would take, and is quick.
  const large = tooLarge(text.length);
  if (large !== null) return broken('too-large', large);
  const json = readJson(text);
  if (!json.ok) return broken('no-json', json.reason, json.place);
  const read = readLayoutDocument(json.value);
  const document = read.ok ? read.document : (read.rest?.document ?? null);
  const leftOut = read.ok ? [] : (read.rest?.leftOut ?? []);
  // What follows from a section that was left out is not told.
  const beyond =
    document === null ? [] : validateLayout(document).filter(({ pointer }) => !leftOut.includes(sectionOf(pointer)));
  const all = [...(read.ok ? [] : read.problems), ...beyond];
  const isError = ({ severity }: LayoutProblem) => severity === 'error';
  const sorted = [...all.filter(isError), ...all.filter((problem) => !isError(problem))];
  return {
    problems: sorted.map((problem) => ({ ...problem, place: json.placeOf(problem.pointer) })),
    errors: all.filter(isError).length,
    sent: json.value,
    document,
    leftOut,
  };
}

const sectionOf = (pointer: string) => pointer.split('/')[1] ?? '';
