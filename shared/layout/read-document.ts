import { layoutDocument, type LayoutDocument } from './document';
import type { LayoutProblem } from './problem';
import { flattenIssues, pointerOf } from '../schema-issues';

/** A document that fits the schema, or all that does not fit and the document without those of its sections. */
export type ReadDocument =
  | { readonly ok: true; readonly document: LayoutDocument }
  | {
      readonly ok: false;
      readonly problems: readonly LayoutProblem[];
      /** What is left when the sections that do not fit are left out; undefined if that is too little. */
      readonly rest: { readonly document: LayoutDocument; readonly leftOut: readonly string[] } | undefined;
    };

/** Sections that a document can do without, and the sections that refer to each. */
const optionalSections: Readonly<Record<string, readonly string[]>> = {
  addressMap: ['reportFormats', 'examples', 'screenMap'],
  multiplexing: [],
  sharedParts: ['rails'],
  rails: [],
  reportFormats: ['examples'],
  screenMap: [],
  sources: [],
  examples: [],
};

/** Reads what somebody sent as a layout document; never throws. Every problem is of severity error. */
export const readLayoutDocument = (sent: unknown): ReadDocument => {
  const read = layoutDocument.safeParse(sent);
  if (read.success) return { ok: true, document: read.data };
  const issues = flattenIssues(read.error.issues);
  const problems = issues.map(({ path, code, message }) => ({
    pointer: pointerOf(path),
    severity: 'error' as const,
    code: `schema-${code.replaceAll('_', '-')}`,
    message,
  }));
  return { ok: false, problems, rest: readRest(sent, new Set(issues.map(({ path }) => String(path[0] ?? '')))) };
};

const readRest = (sent: unknown, spoilt: ReadonlySet<string>) => {
  if (typeof sent !== 'object' || sent === null || ![...spoilt].every((name) => name in optionalSections)) {
    return undefined;
  }
  const leftOut = [...new Set([...spoilt].flatMap((name) => [name, ...(optionalSections[name] ?? [])]))];
  const kept = Object.fromEntries(Object.entries(sent).filter(([name]) => !leftOut.includes(name)));
  const read = layoutDocument.safeParse(kept);
  return read.success ? { document: read.data, leftOut } : undefined;
};
