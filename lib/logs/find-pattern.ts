import type { LayoutIndex } from '../layout/layout-index';
import { type AddressMap, addressMapOf } from '../place/address';
import { type FormatHint, formatHints } from './format-hints';
import type { ColumnPattern, LinePattern, LogNotation } from './line-pattern';
import { type LineShape, shapesOf } from './line-shapes';
import { type PatternTrial, type Sample, hintFor, isPlausible, openTrial, scoreOf } from './pattern-score';

const notationsTried: readonly LogNotation[] = ['hexadecimal', 'octal', 'decimal'];

interface Try {
  readonly shape: LineShape;
  readonly pattern: ColumnPattern;
}

interface Scored {
  readonly pattern: LinePattern;
  readonly score: number;
  readonly content: string;
}

/** The meanings that numbers of this board can have. */
function formsOf(map: AddressMap): Pick<ColumnPattern, 'unit' | 'shows'>[] {
  const wide = map.windows.some((window) => window.steps > 1);
  if (!wide) return [{ unit: 'address', shows: 'address' }];
  return [
    { unit: 'address', shows: 'address' },
    { unit: 'address', shows: 'word' },
    { unit: 'word', shows: 'word' },
  ];
}

function patternsOf(shape: LineShape, map: AddressMap): ColumnPattern[] {
  return formsOf(map).flatMap((form) =>
    notationsTried.flatMap((notation): ColumnPattern[] => {
      const plain = { ...shape.columns, ...form, notation };
      const others = (['hexadecimal', 'binary'] as const).filter((values) => values !== notation);
      return [plain, ...others.map((values): ColumnPattern => ({ ...plain, values }))];
    }),
  );
}

function reasonOf({ read, lines, placed, fits }: Sample, shape: LineShape, hint: FormatHint | undefined): string {
  const told = {
    words: 'The words of the line say what is what',
    heading: 'The heading says what is what',
    order: 'Nothing in the line says what is what; this is the usual order',
    'other order': 'Nothing in the line says what is what; this is not the usual order',
  }[shape.told];
  const count = (n: number) => (n === read ? 'all' : `${n}`);
  const own = hint === undefined ? '' : ` The numbers are those of this board's “${hint.name}”.`;
  return `${told}.${own} ${read} of ${lines} lines read, ${count(placed)} of them inside the board's memory, ${count(fits)} with values that fit it.`;
}

const mostSample = 64;
/** Patterns that are tried with all lines, and lines that are enough to choose them. */
const mostTried = 96;
const fewLines = 8;
const mostCandidates = 8;
const leastShare = 0.01;

/** Many columns make many patterns: all are tried with a few of the lines, and the best of them with the others. */
function worthTrying(trial: PatternTrial, texts: readonly string[], tries: readonly Try[]): readonly Try[] {
  if (tries.length <= mostTried || texts.length <= fewLines) return tries;
  const few = texts.filter((_, at) => at % Math.ceil(texts.length / fewLines) === 0);
  const small = openTrial(trial.map, few, trial.hints);
  const scored = tries.map((each) => ({ each, score: scoreOf(small, each).score }));
  return scored
    .sort((a, b) => b.score - a.score)
    .slice(0, mostTried)
    .map(({ each }) => each);
}

/** Formats that columns cannot express. A board's own words count for more than any guess. */
function formatPatterns(hints: readonly FormatHint[], scored: readonly Scored[]): Scored[] {
  const best = Math.max(0.1, ...scored.map(({ score }) => score));
  return hints
    .filter(({ numbers }) => numbers === null)
    .map(({ format, name, share }) => ({
      pattern: { format, unit: 'address', shows: 'word', reason: `The lines are worded as this board's “${name}”.` },
      score: best * 4 * share,
      content: `format ${format}`,
    }));
}

/**
 * Line patterns that a sample of lines can have on a board, the likeliest first; none where the lines hold no
 * readings. Their scores add up to 1. Looks at up to 64 lines that are not blank. `formats: 'too'`: report formats of
 * the layout that columns cannot express are among them; they are for logs and not for typed readings.
 */
export function findLinePatterns(
  index: LayoutIndex,
  lines: readonly string[],
  options: { readonly formats?: 'too' | 'no' } = {},
): LinePattern[] {
  const texts = lines.filter((line) => /[0-9A-Za-z]/.test(line)).slice(0, mostSample);
  const map = addressMapOf(index);
  const hints = formatHints(index, texts);
  const registers = [...new Set(index.document.addressMap.windows.flatMap(({ register }) => register?.name ?? []))];
  const trial = openTrial(map, texts, hints);
  const tries = shapesOf(texts, registers)
    .filter((shape) => isPlausible(trial, shape))
    .flatMap((shape) => patternsOf(shape, map).map((pattern): Try => ({ shape, pattern })));
  const scored: Scored[] = worthTrying(trial, texts, tries).flatMap(({ shape, pattern }) => {
    const { score, sample } = scoreOf(trial, { shape, pattern });
    if (score === 0) return [];
    const reason = reasonOf(sample, shape, hintFor(hints, pattern));
    return [{ pattern: { ...pattern, reason }, score, content: sample.content }];
  });
  if (options.formats === 'too') scored.push(...formatPatterns(hints, scored));
  scored.sort((a, b) => b.score - a.score);
  const seen = new Set<string>();
  const distinct = scored.filter(({ content }) => !seen.has(content) && seen.add(content));
  const kept = distinct.slice(0, mostCandidates).filter(({ score }) => score >= distinct[0]!.score * leastShare);
  const total = kept.reduce((sum, { score }) => sum + score, 0);
  return kept.map(({ pattern, score }) => ({ ...pattern, score: score / total }));
}
