import type { Piece, Spot } from './match-types';
import { alike, fold, isSeparator } from './typed-text';

const separatorsOf = (text: string, from: number) => {
  let to = from;
  while (to < text.length && isSeparator(text[to]!)) to++;
  return to;
};

/** Where a fixed text ends when its signs may be other ones and its letters may be written otherwise; -1 for no match. */
function endOf(fixed: string, { typed, at, tolerance }: Spot): number {
  const wanted = tolerance.alike ? alike(fixed) : fold(fixed);
  const given = tolerance.alike ? typed.alike : typed.folded;
  let from = 0;
  let to = at;
  while (from < fixed.length) {
    if (isSeparator(fixed[from]!)) {
      const next = separatorsOf(typed.raw, to);
      if (next === to && !tolerance.loose) return -1;
      to = next;
      from = separatorsOf(fixed, from);
    } else {
      if (wanted[from] !== given[to]) return -1;
      from++;
      to++;
    }
  }
  return to;
}

function noteFor(fixed: string, given: string): string[] {
  if (given === fixed) return [];
  const shown = fixed.trim() === '' ? 'a space' : `"${fixed.trim()}"`;
  if (given.trim() === '' && fixed.trim() !== '') return [`${shown} added`];
  if (given.replace(/\s+/g, '') === fixed.replace(/\s+/g, '')) return ['spaces put right'];
  return given.trim() === '' ? [`${shown} added`] : [`"${given.trim()}" read as ${shown}`];
}

/** The pieces of a typed text, at one place, that can be a fixed text. */
export function matchFixedText(fixed: string, spot: Spot): Piece[] {
  const { typed, at, tolerance } = spot;
  if (!tolerance.fold)
    return typed.raw.startsWith(fixed, at) ? [{ end: at + fixed.length, text: fixed, notes: [] }] : [];
  const pieces: Piece[] = [];
  const end = endOf(fixed, spot);
  if (end >= 0) pieces.push({ end, text: fixed, notes: noteFor(fixed, typed.raw.slice(at, end)) });
  if (tolerance.dropped && end !== at) pieces.push({ end: at, text: fixed, notes: noteFor(fixed, '') });
  return pieces;
}
