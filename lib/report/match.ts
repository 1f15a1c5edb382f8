import type { FormatContext, Part } from './format-context';
import { matchField } from './match-field';
import { matchFixedText } from './match-fixed-text';
import type { FieldMatch, Match, Piece, Stop, Tolerance } from './match-types';
import { type TypedText, isSpace } from './typed-text';

export interface MatchResult {
  readonly matches: readonly Match[];
  /** There were more than were kept. */
  readonly more: boolean;
  readonly stop: Stop;
}

/** Beyond this a text has so many meanings that it has none. */
const mostMatches = 64;

function piecesOf(part: Part, typed: TypedText, at: number, tolerance: Tolerance): readonly Piece[] {
  return part.kind === 'text'
    ? matchFixedText(part.text, typed, at, tolerance)
    : matchField(part, typed, at, tolerance);
}

function skipSpaces(raw: string, at: number): number {
  let to = at;
  while (to < raw.length && isSpace(raw[to]!)) to++;
  return to;
}

const spacesLeftOut = 'spaces left out';

class Matcher {
  readonly matches: Match[] = [];
  more = false;
  stop: Stop = { part: 0, at: 0 };
  private readonly dead = new Set<number>();

  constructor(
    private readonly context: FormatContext,
    private readonly typed: TypedText,
    private readonly tolerance: Tolerance,
  ) {}

  /** Follows the parts from one on. Remembers dead ends, so each place is tried once for each part. */
  follow(part: number, from: number, found: readonly { piece: Piece; start: number; part: Part }[]): boolean {
    const { raw } = this.typed;
    const gap = this.tolerance.loose || (this.tolerance.fold && (part === 0 || part === this.context.parts.length));
    const at = gap ? skipSpaces(raw, from) : from;
    if (at > this.stop.at || (at === this.stop.at && part >= this.stop.part)) this.stop = { part, at };
    const current = this.context.parts[part];
    if (current === undefined) return at === raw.length && this.keep(found);
    const key = part * (raw.length + 1) + at;
    if (this.dead.has(key)) return false;
    let any = false;
    for (const piece of piecesOf(current, this.typed, at, this.tolerance)) {
      if (this.matches.length >= mostMatches) {
        this.more = true;
        return true;
      }
      if (this.follow(part + 1, piece.end, [...found, { piece, start: at, part: current }])) any = true;
    }
    if (!any) this.dead.add(key);
    return any;
  }

  private keep(found: readonly { piece: Piece; start: number; part: Part }[]): true {
    const fields: FieldMatch[] = [];
    const notes = new Set<string>();
    let text = '';
    let end = 0;
    for (const { piece, start, part } of found) {
      if (start > end) notes.add(spacesLeftOut);
      for (const note of piece.notes) notes.add(note);
      text += piece.text;
      end = piece.end;
      if (part.kind === 'field') fields.push({ part, text: piece.text, start, entry: piece.entry ?? null });
    }
    if (end < this.typed.raw.length) notes.add(spacesLeftOut);
    this.matches.push({ fields, text, notes: [...notes] });
    return true;
  }
}

/**
 * Every way to read a text as the parts of a format, within a tolerance. Time grows with the length of the text and
 * the number of parts only: no place is tried twice for the same part unless it leads to the end.
 */
export function matchText(context: FormatContext, typed: TypedText, tolerance: Tolerance): MatchResult {
  const matcher = new Matcher(context, typed, tolerance);
  matcher.follow(0, 0, []);
  return { matches: matcher.matches, more: matcher.more, stop: matcher.stop };
}
