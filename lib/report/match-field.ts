import type { FieldPart } from './format-context';
import type { Piece, Spot } from './match-types';
import { alike, alikeCharacter, fold, isSpace } from './typed-text';

interface Lexicon {
  readonly lengths: readonly number[];
  readonly exact: ReadonlySet<string>;
  readonly folded: ReadonlyMap<string, readonly string[]>;
  readonly alike: ReadonlyMap<string, readonly string[]>;
}

const lexicons = new WeakMap<FieldPart, Lexicon>();

function grouped(words: readonly string[], key: (word: string) => string): Map<string, string[]> {
  const groups = new Map<string, string[]>();
  for (const word of words) {
    const group = groups.get(key(word));
    if (group === undefined) groups.set(key(word), [word]);
    else group.push(word);
  }
  return groups;
}

function lexiconOf(part: FieldPart): Lexicon {
  const known = lexicons.get(part);
  if (known !== undefined) return known;
  const { words } = part;
  const lengths = [...new Set(words.map((word) => word.length))].sort((a, b) => b - a);
  const lexicon = { lengths, exact: new Set(words), folded: grouped(words, fold), alike: grouped(words, alike) };
  lexicons.set(part, lexicon);
  return lexicon;
}

const noNotes: readonly string[] = [];

/** "O read as 0" for each character that was taken otherwise. */
function notesFor(given: string, taken: string): string[] {
  if (given === taken) return [];
  const compact = given.replace(/\s+/g, '');
  const notes = compact === given ? [] : ['spaces left out'];
  if (compact.length !== taken.length) return [...notes, `${compact} read as ${taken}`];
  for (let at = 0; at < taken.length; at++)
    if (compact[at] !== taken[at]) notes.push(`${compact[at]} read as ${taken[at]}`);
  return notes;
}

function wordPieces(part: FieldPart, { typed, at, tolerance }: Spot): Piece[] {
  const { lengths, exact, folded, alike: alikes } = lexiconOf(part);
  const pieces: Piece[] = [];
  for (const length of lengths) {
    const end = at + length;
    if (end > typed.raw.length) continue;
    const given = typed.raw.slice(at, end);
    if (exact.has(given)) pieces.push({ end, text: given, notes: noNotes, entry: part.table.get(given) ?? null });
    else if (tolerance.fold) {
      const found = tolerance.alike ? alikes.get(typed.alike.slice(at, end)) : folded.get(typed.folded.slice(at, end));
      for (const text of found ?? [])
        pieces.push({ end, text, notes: notesFor(given, text), entry: part.table.get(text) ?? null });
    }
  }
  return pieces;
}

/** The digit that a typed character stands for; null for none. A digit of the base is always itself. */
function digitAt(alphabet: string, { typed, tolerance }: Spot, at: number): string | null {
  const raw = typed.raw[at]!;
  if (alphabet.includes(raw)) return raw;
  if (!tolerance.fold) return null;
  const folded = typed.folded[at]!;
  if (alphabet.includes(folded)) return folded;
  if (!tolerance.alike) return null;
  for (const digit of alphabet) if (alikeCharacter(digit) === typed.alike[at]) return digit;
  return null;
}

interface Run {
  readonly alphabet: string;
  readonly min: number;
  readonly max: number;
}

/** Every length of a run of digits or letters, the longest first. */
function runPieces({ alphabet, min, max }: Run, spot: Spot): Piece[] {
  const { typed, at, tolerance } = spot;
  const pieces: Piece[] = [];
  let text = '';
  for (let to = at; to < typed.raw.length && text.length < max; to++) {
    if (tolerance.spaced && text !== '' && isSpace(typed.raw[to]!)) continue;
    const digit = digitAt(alphabet, spot, to);
    if (digit === null) break;
    text += digit;
    if (text.length < min) continue;
    pieces.push({ end: to + 1, text, notes: tolerance.fold ? notesFor(typed.raw.slice(at, to + 1), text) : noNotes });
  }
  return pieces.reverse();
}

const nothing: readonly Piece[] = [];

const capitals = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ';

function freePieces({ typed, at }: Spot): Piece[] {
  let to = at;
  while (to < typed.raw.length && !isSpace(typed.raw[to]!)) to++;
  return to === at ? [] : [{ end: to, text: typed.raw.slice(at, to), notes: [] }];
}

/**
 * The pieces of a typed text, at one place, that can be a field: the words of its table and its names first, which
 * stand in place of the digits that look the same.
 */
export function matchField(part: FieldPart, spot: Spot): readonly Piece[] {
  const words = part.words.length === 0 ? nothing : wordPieces(part, spot);
  const runs =
    part.digits !== null
      ? runPieces(part.digits, spot)
      : part.letters > 0
        ? runPieces({ alphabet: capitals, min: 1, max: part.letters }, spot)
        : part.free
          ? freePieces(spot)
          : [];
  if (words.length === 0) return runs;
  return [...words, ...runs.filter((run) => !words.some((word) => word.text === run.text && word.end === run.end))];
}
