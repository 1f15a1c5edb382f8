/** Largest set of words that is kept exactly, in bits, and the sum of all sets of one import. */
const mostBits = 2 ** 26;
const allBits = 2 ** 29;
const leastBits = 2 ** 12;

/** Bits that each lane's set may have so that all together stay within bounds whatever the log holds. */
export function bitsForEach(lanes: number): number {
  return Math.max(leastBits, Math.min(mostBits, 2 ** Math.floor(Math.log2(allBits / Math.max(1, lanes)))));
}

/**
 * The different words of a bank that were met. Exact where the bank has no more words than it has bits; else each word
 * falls on one of the bits, and the count is a lower bound.
 */
export class WordSet {
  count = 0;
  readonly exact: boolean;
  private readonly bits: Int32Array;
  private readonly mask: number;

  constructor(words: number, most: number) {
    this.exact = words <= most;
    this.bits = new Int32Array(Math.ceil((this.exact ? words : most) / 32));
    this.mask = most - 1;
  }

  add(word: number): void {
    const at = this.exact ? word : this.fold(word);
    const place = at >>> 5;
    const before = this.bits[place]!;
    const after = before | (1 << (at & 31));
    if (after === before) return;
    this.bits[place] = after;
    this.count++;
  }

  /** The words met, ascending. Only where the set is exact. */
  forEach(take: (word: number) => void): void {
    if (!this.exact) throw new RangeError('A set of that many words only knows how many there are.');
    for (let place = 0; place < this.bits.length; place++) {
      let rest = this.bits[place]!;
      while (rest !== 0) {
        const bit = 31 - Math.clz32(rest & -rest);
        take(place * 32 + bit);
        rest &= rest - 1;
      }
    }
  }

  private fold(word: number): number {
    let hash = Math.imul(word | 0, 0x9e3779b1) ^ Math.imul(Math.floor(word / 2 ** 32), 0x85ebca6b);
    hash ^= hash >>> 15;
    hash = Math.imul(hash, 0x2c1b3c6d);
    hash ^= hash >>> 13;
    return hash & this.mask;
  }
}
