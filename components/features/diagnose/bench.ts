import { layoutDocument, type LayoutDocument, type ReportFormat } from '@/shared';
import { buildLayoutIndex, compileFormat, type CompiledFormat, type LayoutIndex } from '@/lib';

/** A report format that is ready to be typed. */
export interface BenchFormat {
  readonly definition: ReportFormat;
  readonly compiled: CompiledFormat;
  /** What the layout does not know of the format, each with its two answers in words. */
  readonly open: readonly (readonly [string, string])[];
}

/** One board made ready for look-ups. */
export interface Bench {
  readonly document: LayoutDocument;
  readonly index: LayoutIndex;
  readonly formats: readonly BenchFormat[];
  readonly formatName: (id: string) => string | null;
}

const made = new WeakMap<LayoutDocument, Bench | null>();

/**
 * Makes a board ready, once for each document. Null where the document is none: a copy that was kept by an older
 * version of the application, or cut off on its way.
 */
export function benchOf(given: LayoutDocument): Bench | null {
  const before = made.get(given);
  if (before !== undefined) return before;
  const parsed = layoutDocument.safeParse(given);
  const bench = parsed.success ? makeBench(parsed.data) : null;
  made.set(given, bench);
  return bench;
}

function makeBench(document: LayoutDocument): Bench {
  const index = buildLayoutIndex(document);
  const formats = document.reportFormats.flatMap((definition): BenchFormat[] => {
    const result = compileFormat(definition, index);
    return result.ok
      ? [{ definition, compiled: result.format, open: result.questions.map(({ answers }) => answers) }]
      : [];
  });
  const names = new Map(document.reportFormats.map(({ id, name }) => [id, name]));
  return { document, index, formats, formatName: (id) => names.get(id) ?? null };
}
