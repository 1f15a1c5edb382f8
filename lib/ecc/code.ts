/**
 * A linear code by its H matrix: one column a bit of the word, data and check bits alike, as a number whose bit r is
 * what row r (check equation r) has there. The column of a bit is the syndrome that this bit alone gives.
 */
export interface ErrorCode {
  /** hamming: corrects one wrong bit. sec-ded: corrects one and detects two. */
  readonly kind: 'hamming' | 'sec-ded';
  readonly columns: readonly number[];
}

/** What a syndrome says. Bits are places in the list of columns, from 0. */
export type SyndromeMeaning =
  | { readonly kind: 'none' }
  | { readonly kind: 'single'; readonly bit: number }
  /** A wrong bit whose column has a single 1: one of the check bits of the usual form of such a code. */
  | { readonly kind: 'check-bit'; readonly bit: number }
  /** Two wrong bits (or another even number), and nothing says which. */
  | { readonly kind: 'double' }
  /** More wrong bits than the code is made for. */
  | { readonly kind: 'not-correctable' }
  /** No such syndrome: it has ones beyond the check equations. */
  | { readonly kind: 'out-of-range' };

/** What is wrong with a matrix. */
export interface CodeProblem {
  /** The column that is wrong, from 0. */
  readonly column: number;
  /** zero: its bit is in no check equation. twice: same as an earlier one. pair: two earlier columns give it together. */
  readonly kind: 'zero' | 'twice' | 'pair';
  /** The other columns that it collides with; none for `zero`. */
  readonly others: readonly number[];
}

/** The highest syndrome that the check equations allow: all of them wrong. 0 for a code without columns. */
export function highestSyndrome({ columns }: ErrorCode): number {
  const all = columns.reduce((sum, column) => sum | column, 0);
  return all === 0 ? 0 : 2 ** (32 - Math.clz32(all)) - 1;
}

/** The syndrome of wrong bits: the exclusive-or of their columns. Throws RangeError for a bit that the code lacks. */
export function syndromeOf({ columns }: ErrorCode, flipped: readonly number[]): number {
  return flipped.reduce((sum, bit) => {
    const column = columns[bit];
    if (column === undefined) throw new RangeError(`The code has no bit ${bit}.`);
    return sum ^ column;
  }, 0);
}

function isPair(columns: readonly number[], syndrome: number): boolean {
  const known = new Set(columns);
  return columns.some((column) => known.has(column ^ syndrome));
}

/**
 * What a syndrome says under a code. A Hamming code takes two wrong bits for one other; only a SEC-DED code tells them
 * apart (M. Y. Hsiao, A class of optimal minimum odd-weight-column SEC-DED codes, IBM J. Res. Dev. 14 (1970) 395-401).
 * Of more wrong bits than that, no code here is sure.
 */
export function classifySyndrome(code: ErrorCode, syndrome: number): SyndromeMeaning {
  if (syndrome === 0) return { kind: 'none' };
  if (!Number.isInteger(syndrome) || syndrome < 0 || syndrome > highestSyndrome(code)) return { kind: 'out-of-range' };
  const bit = code.columns.indexOf(syndrome);
  if (bit >= 0) return { kind: (syndrome & (syndrome - 1)) === 0 ? 'check-bit' : 'single', bit };
  return { kind: isPair(code.columns, syndrome) ? 'double' : 'not-correctable' };
}

/**
 * Why a matrix is no code of its kind; empty where it is one. Each bit needs a column of its own that is not zero; in
 * a SEC-DED code no two columns together may give a third, or two wrong bits would look like one. Columns of odd weight
 * are the usual way to that, but not the only one.
 */
export function validateCode({ kind, columns }: ErrorCode): CodeProblem[] {
  const problems: CodeProblem[] = [];
  const first = new Map<number, number>();
  for (const [column, value] of columns.entries()) {
    const before = first.get(value);
    if (value === 0) problems.push({ column, kind: 'zero', others: [] });
    else if (before !== undefined) problems.push({ column, kind: 'twice', others: [before] });
    else {
      const pair = kind === 'sec-ded' ? pairBefore(first, value) : null;
      if (pair !== null) problems.push({ column, kind: 'pair', others: pair });
      first.set(value, column);
    }
  }
  return problems;
}

/** Two columns that give a value together. */
function pairBefore(first: ReadonlyMap<number, number>, value: number): readonly [number, number] | null {
  for (const [other, column] of first) {
    const partner = first.get(other ^ value);
    if (partner !== undefined && partner !== column) return column < partner ? [column, partner] : [partner, column];
  }
  return null;
}
