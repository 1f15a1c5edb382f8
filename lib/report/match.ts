import type { FormatContext, Part } from './format-context';
import { matchField } from './match-field';
import { matchFixedText } from './match-fixed-text';
import type { FieldMatch, Match, Piece, Spot, Stop, Tolerance } from './match-types';
import { type TypedText, isSeparator, isSpace } from './typed-text';

export interface MatchResult {
  readonly matches: readonly Match[];
  /** There were more than were kept. */
  readonly more: boolean;
  readonly stop: Stop;
}

/** Beyond this a text has so many meanings that it has none. */
const mostMatches = 64;

function piecesOf(part: Part, spot: Spot): readonly Piece[] {
  return part.kind === 'text' ? matchFixedText(part.text, spot) : matchField(part, spot);
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
  stopPart = 0;
  stopAt = 0;
  /** Places that lead nowhere, so that each is tried once for each part. */
  private dead: Set<number> | null = null;
  /** What the parts so far have taken, and where each begins. */
  private readonly pieces: Piece[] = [];
  private readonly starts: number[] = [];

  constructor(
    private readonly context: FormatContext,
    private readonly typed: TypedText,
    private readonly tolerance: Tolerance,
  ) {}

  follow(part: number, from: number): boolean {
    const { raw } = this.typed;
    const { parts } = this.context;
    const current = parts[part];
    const at = this.gapBefore(part) ? skipSpaces(raw, from) : from;
    if (at > this.stopAt || (at === this.stopAt && part >= this.stopPart)) {
      this.stopPart = part;
      this.stopAt = at;
    }
    if (current === undefined) return at === raw.length && this.keep();
    const key = part * (raw.length + 1) + at;
    if (this.dead?.has(key)) return false;
    let any = false;
    for (const piece of piecesOf(current, { typed: this.typed, at, tolerance: this.tolerance })) {
      if (this.matches.length >= mostMatches) {
        this.more = true;
        return true;
      }
      this.pieces.push(piece);
      this.starts.push(at);
      if (this.follow(part + 1, piece.end)) any = true;
      this.pieces.pop();
      this.starts.pop();
    }
    if (!any) (this.dead ??= new Set()).add(key);
    return any;
  }

  /** Whether spaces may stand before a part. Fixed text that begins with a space takes them itself. */
  private gapBefore(part: number): boolean {
    const { parts } = this.context;
    const current = parts[part];
    if (current === undefined || part === 0) return this.tolerance.fold;
    return this.tolerance.loose && (current.kind === 'field' || !isSeparator(current.text[0]!));
  }

  private keep(): true {
    const fields: FieldMatch[] = [];
    const notes: string[] = [];
    let text = '';
    let end = 0;
    for (let part = 0; part < this.pieces.length; part++) {
      const piece = this.pieces[part]!;
      const start = this.starts[part]!;
      if (start > end) notes.push(spacesLeftOut);
      if (piece.notes.length > 0) notes.push(...piece.notes);
      text += piece.text;
      end = piece.end;
      const current = this.context.parts[part]!;
      if (current.kind === 'field') fields.push({ part: current, text: piece.text, start, entry: piece.entry ?? null });
    }
    if (end < this.typed.raw.length) notes.push(spacesLeftOut);
    this.matches.push({ fields, text, notes: notes.length > 1 ? [...new Set(notes)] : notes });
    return true;
  }
}

/**
 * Every way to read a text as the parts of a format, within a tolerance. Time grows with the length of the text and
 * the number of parts only: no place is tried twice for the same part unless it leads to the end.
 */
export function matchText(context: FormatContext, typed: TypedText, tolerance: Tolerance): MatchResult {
  const matcher = new Matcher(context, typed, tolerance);
  matcher.follow(0, 0);
  return { matches: matcher.matches, more: matcher.more, stop: { part: matcher.stopPart, at: matcher.stopAt } };
}
