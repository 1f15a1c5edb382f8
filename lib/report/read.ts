import type { Convention } from './conventions';
import type { FormatContext } from './format-context';
import { type MatchResult, matchText } from './match';
import type { Match, Stop, Tolerance } from './match-types';
import type { ReadResult, ReportReading } from './meaning';
import type { RawReading, Refusal } from './outcome';
import { stopReason } from './reasons';
import { resolve } from './resolve';
import type { Silence } from './silence';
import { typedText } from './typed-text';

/** Most characters of a code; the same figure as the limit that requests are held to. */
export const mostCharacters = 512;

/** What reading needs beside the text. */
export interface Reader {
  readonly context: FormatContext;
  readonly conventions: readonly Convention[];
  readonly silence: Silence;
}

interface Level extends Tolerance {
  /** What was typed is surely meant, so an impossible code is impossible and not a slip of the hand. */
  readonly sure: boolean;
}

const exact: Level = { fold: false, alike: false, loose: false, spaced: false, dropped: false, sure: true };
const folded: Level = { ...exact, fold: true };

/** From the machine's own form to what a tired hand types. The first level at which the text makes sense counts. */
const levels: readonly Level[] = [
  exact,
  folded,
  { ...folded, loose: true },
  { ...folded, alike: true, sure: false },
  { ...folded, alike: true, loose: true, sure: false },
  { ...folded, loose: true, spaced: true },
  { ...folded, loose: true, dropped: true },
  { ...folded, alike: true, loose: true, spaced: true, dropped: true, sure: false },
];

const keyOf = (reading: Omit<RawReading, 'takes'>) =>
  `${reading.failing.map(({ lane, reads }) => `${lane}${reads}`).join()}|${reading.shown.join()}|${reading.address}`;

/** The same meaning under several conventions is one reading, which takes only what all of them take. */
function merged(readings: readonly RawReading[]): RawReading[] {
  if (readings.length < 2) return [...readings];
  const byKey = new Map<string, RawReading>();
  for (const reading of readings) {
    const key = keyOf(reading);
    const before = byKey.get(key);
    const takes = before === undefined ? reading.takes : before.takes.filter((take) => reading.takes.includes(take));
    byKey.set(key, { ...reading, takes });
  }
  return [...byKey.values()];
}

interface Understood {
  readonly match: Match;
  readonly readings: readonly RawReading[];
  readonly refusal: Refusal | null;
}

function understand({ context, conventions }: Reader, match: Match): Understood {
  const readings: RawReading[] = [];
  let refusal: Refusal | null = null;
  for (const convention of conventions) {
    const resolved = resolve(context, match, convention);
    readings.push(...resolved.readings);
    refusal ??= resolved.refusal;
  }
  return { match, readings: merged(readings), refusal };
}

function finished({ silence }: Reader, { match, readings }: Understood): ReadResult {
  const done = readings.map((reading): ReportReading => ({
    failing: reading.failing,
    passed: silence.passed(reading),
    values: reading.values,
    address: reading.address,
    takes: reading.takes,
  }));
  return { ok: true, text: match.text, notes: match.notes, readings: done };
}

/** Fields of one match that another splits otherwise, in words. */
function splitWords(match: Match): string {
  return match.fields.map(({ text }) => text).join(', ');
}

/** One meaning, several of the same text, or the reason why none can be chosen. */
function choose(reader: Reader, understood: readonly Understood[]): ReadResult {
  const [first] = understood;
  if (first === undefined) throw new RangeError('There is nothing to choose from.');
  if (understood.length === 1) return finished(reader, first);
  const texts = [...new Set(understood.map(({ match }) => match.text))];
  if (texts.length === 1) {
    const all = understood.flatMap(({ match, readings }) =>
      readings.map((reading) => ({ ...reading, takes: [...reading.takes, `read as ${splitWords(match)}`] })),
    );
    const kept = merged(all);
    const plain = kept.length === 1 ? [{ ...kept[0]!, takes: first.readings[0]!.takes }] : kept;
    return finished(reader, { ...first, readings: plain });
  }
  const same = new Set(understood.map(({ readings }) => readings.map(keyOf).join('/')));
  if (same.size === 1) return finished(reader, first);
  const shown = texts.slice(0, 3).map((text) => `"${text}"`);
  const last = shown.pop();
  return {
    ok: false,
    reason: `This can be read as ${shown.join(', ')} or ${last}. Type it as the machine shows it.`,
    at: 0,
  };
}

function furthest(a: Stop, b: Stop): Stop {
  return b.at > a.at || (b.at === a.at && b.part > a.part) ? b : a;
}

/** Most codes are plain and have one meaning; they take this way. */
function readExactly(reader: Reader, { matches, more }: MatchResult): ReadResult | null {
  const [match] = matches;
  if (match === undefined || more || matches.length > 1) return null;
  const understood = understand(reader, match);
  return understood.readings.length === 0 ? null : finished(reader, understood);
}

function checkLength(text: string): ReadResult | null {
  if (text.length > mostCharacters) {
    return {
      ok: false,
      reason: `This is ${text.length} characters long; a code has at most ${mostCharacters}.`,
      at: mostCharacters,
    };
  }
  return text.trim() === '' ? { ok: false, reason: 'Nothing is typed yet.', at: 0 } : null;
}

/** Text to evidence: as the machine writes it, else as meant where only one meaning is possible, else the reason. */
export function readText(reader: Reader, text: string): ReadResult {
  const refused = checkLength(text);
  if (refused !== null) return refused;
  const typed = typedText(text);
  const plain = readExactly(reader, matchText(reader.context, typed, exact));
  if (plain !== null) return plain;
  let stop: Stop = { part: 0, at: 0 };
  for (const level of levels) {
    const found = matchText(reader.context, typed, level);
    if (!level.alike && !level.dropped && !level.spaced) stop = furthest(stop, found.stop);
    if (found.matches.length === 0) continue;
    const all = found.matches.map((match) => understand(reader, match));
    const possible = all.filter(({ readings }) => readings.length > 0);
    if (found.more && possible.length > 0)
      return { ok: false, reason: 'This can be read in too many ways. Type it as the machine shows it.', at: 0 };
    if (possible.length > 0) return choose(reader, possible);
    const refusal = all[0]?.refusal;
    if (level.sure && refusal !== null && refusal !== undefined)
      return { ok: false, reason: refusal.reason, at: refusal.at };
  }
  return { ok: false, reason: stopReason(reader.context, stop, text), at: stop.at };
}

/** True for a code that the layout knows and that names something other than a lane of this board. */
export function isKnownElsewhere(reader: Reader, text: string): boolean {
  const { matches } = matchText(reader.context, typedText(text), folded);
  return matches.some((match) => understand(reader, match).refusal?.known === true);
}
