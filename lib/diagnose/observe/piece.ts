import type { Finding, Measurement, ReadEvidence, Sign } from '@/shared';
import type { Lane } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import type { AddressMap } from '../../place/address';
import type { Tally } from '../../readings/tally';
import type { CompiledFormat } from '../../report/meaning';

/** One way to understand a piece of evidence. */
export interface Choice {
  readonly failing: readonly Lane[];
  readonly passed: readonly Lane[];
  /** What single readings showed beside it; null for evidence that speaks of whole lanes. */
  readonly tally: Tally | null;
  /** Pairs of address bits that lead to one cell, as bits of the word number inside the chip; empty for none. */
  readonly aliased: readonly number[];
  /** Which conventions it takes, in words. Empty where none is open. */
  readonly takes: readonly string[];
}

/** A piece of evidence with the ways to understand it. */
export interface Piece {
  readonly run: number;
  /** Pieces with the same question take the same answer: the format, or the ways of an open reading. */
  readonly question: string | null;
  readonly after: 'stops' | 'lists-lanes' | 'lists-banks' | null;
  /** The test stops at the first failure, and the layout does not say in which order it tests. */
  readonly unordered: boolean;
  readonly choices: readonly Choice[];
  /** It says outright that lanes passed, against which no other code of the run counts. */
  readonly passesOutright: boolean;
  readonly sign: Sign | null;
  readonly measurement: Measurement | null;
  readonly finding: Finding | null;
}

export type Read = { piece: Piece; shown: ReadEvidence } | { piece: null; shown: ReadEvidence };

/** Where a piece of evidence stands, and what reading it needs. */
export interface Where {
  readonly index: LayoutIndex;
  readonly map: AddressMap;
  readonly formats: ReadonlyMap<string, CompiledFormat>;
  readonly run: number;
  readonly at: number;
}

/** A choice that says nothing yet. */
export const noChoice: Choice = { failing: [], passed: [], tally: null, aliased: [], takes: [] };

/** A piece without choices, for evidence that names no lane. */
export function emptyPiece(where: Where): Piece {
  return {
    run: where.run,
    question: null,
    after: null,
    unordered: false,
    choices: [noChoice],
    passesOutright: false,
    sign: null,
    measurement: null,
    finding: null,
  };
}

/** What is shown of a piece of evidence before it is known how it reads. */
export function shownOf(where: Where, text: string): ReadEvidence {
  return {
    run: where.run,
    index: where.at,
    text,
    ok: true,
    readAs: null,
    notes: [],
    reason: null,
    failing: [],
    words: [],
    passed: 0,
    alternatives: 1,
  };
}

/** A piece that cannot be read, with the reason and what is allowed. */
export function refuse(where: Where, text: string, reason: string): Read {
  return { piece: null, shown: { ...shownOf(where, text), ok: false, reason } };
}

/** Bank and bit of a lane, as evidence names them. */
export function laneName(index: LayoutIndex, lane: Lane): { bank: string; bit: number } {
  return {
    bank: index.document.memory.banks[index.bankOf(lane)]?.id ?? '',
    bit: index.bitOf(lane) as number,
  };
}
