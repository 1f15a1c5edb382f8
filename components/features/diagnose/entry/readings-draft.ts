import { parseReadings, type LayoutIndex, type ParsedReadings } from '@/lib';
import type { Evidence, PlainEvidence, Readings } from '@/shared';
import { readingText } from '../evidence-words';

/** Readings as they are being typed, and what was said of all of them. */
export interface ReadingsDraft {
  readonly text: string;
  /** Null: as the text itself says, else as it was chosen. */
  readonly rest: Readings['rest'] | null;
  readonly unit: Readings['unit'] | null;
  /** Which of several ways to read them was chosen; null while that is open. */
  readonly way: number | null;
  /** Seconds, as typed. */
  readonly waited: string;
}

/** Nothing typed yet. */
export const noReadings: ReadingsDraft = { text: '', rest: null, unit: null, way: null, waited: '' };

const rests = { passed: 'p', unknown: 'u' } as const;
const units = { word: 'w', address: 'a' } as const;

/** The draft as text of the link: what was said of all of them in the first line. */
export function writeReadingsDraft({ text, rest, unit, way, waited }: ReadingsDraft): string {
  const said = `${rest === null ? '' : rests[rest]}${unit === null ? '' : units[unit]}${way ?? ''}`;
  const head = waited === '' ? said : `${said} ${waited.replaceAll('\n', ' ')}`;
  return head === '' && text === '' ? '' : `${head}\n${text}`;
}

/** The draft of such a text. */
export function readReadingsDraft(draft: string): ReadingsDraft {
  const [head = '', ...lines] = draft.split('\n');
  const [, rest, unit, way, waited] = /^([pu]?)([wa]?)(\d?)(?: (.*))?$/.exec(head) ?? [];
  if (rest === undefined) return { ...noReadings, text: draft };
  return {
    text: lines.join('\n'),
    rest: rest === '' ? null : rest === 'p' ? 'passed' : 'unknown',
    unit: unit === '' ? null : unit === 'w' ? 'word' : 'address',
    way: way === '' ? null : Number(way),
    waited: waited ?? '',
  };
}

/** Readings that were entered before, as a draft to be changed. */
export function draftOfReadings(index: LayoutIndex, { lines, rest, unit, waited }: Readings): ReadingsDraft {
  return {
    text: lines.map((line) => readingText(index, line)).join('\n'),
    rest,
    unit,
    way: null,
    waited: waited === undefined ? '' : String(waited),
  };
}

/** More characters than this are not read at every key; some eight thousand lines. They are a log. */
const longestTyped = 100_000;

/** What typed readings come to. */
export interface TypedReadings {
  readonly parsed: ParsedReadings;
  /** There is more text than is read here. */
  readonly cut: boolean;
  /** The ways that remain, each with what it takes; one of them without words where nothing is open. */
  readonly ways: readonly { readonly takes: string; readonly evidence: PlainEvidence }[];
  readonly evidence: Evidence | null;
  /** What is said of all of them, be it by the text or by the technician. */
  readonly rest: Readings['rest'];
  readonly unit: Readings['unit'];
  /** Seconds that were waited; null where none are given, or the text is no number. */
  readonly waited: number | null;
}

/**
 * Reads the draft, with what was said of all of it put in the place of what the text lets open. `before`: the readings
 * that are being changed; as long as their lines are as they were, they are taken over and not read again.
 */
export function readTyped(index: LayoutIndex, draft: ReadingsDraft, before: Readings | null = null): TypedReadings {
  const cut = draft.text.length > longestTyped;
  const parsed = parse(index, cut ? { ...draft, text: wholeLines(draft.text) } : draft);
  const same = before !== null && draftOfReadings(index, before).text === draft.text;
  const found = same ? { ...before, unit: draft.unit ?? before.unit } : parsed.evidence;
  const waited = readSeconds(draft.waited);
  const plain = found === null ? [] : found.kind === 'either' ? found.ways : [{ takes: '', evidence: found }];
  const ways = plain.map(({ takes, evidence }) => ({
    takes,
    evidence:
      evidence.kind === 'readings'
        ? { ...evidence, rest: draft.rest ?? evidence.rest, waited: waited ?? undefined }
        : evidence,
  }));
  const chosen = draft.way === null ? undefined : ways[draft.way];
  const shown = (chosen ?? ways[0])?.evidence;
  return {
    parsed,
    cut,
    ways,
    evidence: evidenceOf(chosen === undefined ? ways : [chosen]),
    rest: draft.rest ?? (shown?.kind === 'readings' ? shown.rest : 'unknown'),
    unit: draft.unit ?? parsed.pattern?.unit ?? 'address',
    waited,
  };
}

const wholeLines = (text: string) => text.slice(0, text.lastIndexOf('\n', longestTyped) + 1 || longestTyped);

function parse(index: LayoutIndex, { text, unit }: ReadingsDraft): ParsedReadings {
  const parsed = parseReadings(index, text);
  if (unit === null || parsed.pattern === null || parsed.pattern.unit === unit) return parsed;
  const shows = unit === 'word' ? 'word' : parsed.pattern.shows;
  return parseReadings(index, text, { pattern: { ...parsed.pattern, unit, shows } });
}

function evidenceOf(ways: TypedReadings['ways']): Evidence | null {
  const [first] = ways;
  if (first === undefined) return null;
  return ways.length === 1 ? first.evidence : { kind: 'either', ways: [...ways] };
}

/** Seconds as typed; null where the field is empty or holds no number up to a day. */
export function readSeconds(text: string): number | null {
  const plain = text.trim().replace(',', '.');
  if (!/^\d+(\.\d+)?$/.test(plain)) return null;
  return Number(plain) <= 86_400 ? Number(plain) : null;
}
