import type { Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { ChipPlaces } from './chip-places';
import type { Site } from './address-finder';
import type { Pair } from './pair-table';
import { WordSet, bitsForEach } from './word-set';

/** A pair of whole words of a bank with how often it came. */
export interface ValueCount {
  readonly bank: number;
  readonly written: number;
  readonly read: number;
  count: number;
}

/** Distinct pairs of whole words that are counted; the rarest are forgotten beyond. */
const mostValues = 4096;

/** What is counted of each lane while a log is read. Its size depends on the board, not on the log. */
export class LaneCounts {
  readonly readsOne: Float64Array;
  readonly readsZero: Float64Array;
  readonly alone: Float64Array;
  readonly rightOnes: Float64Array;
  readonly rightZeros: Float64Array;
  readonly first: Float64Array;
  readonly last: Float64Array;
  readonly sets: (WordSet | null)[];
  /** Pairs were forgotten, so the list of the commonest is near and not exact. */
  valuesForgotten = false;
  private readonly places: (ChipPlaces | null)[];
  private readonly most: number;
  private readonly values = new Map<string, ValueCount>();

  constructor(private readonly index: LayoutIndex) {
    const counts = () => new Float64Array(index.laneCount);
    [this.readsOne, this.readsZero, this.alone] = [counts(), counts(), counts()];
    [this.rightOnes, this.rightZeros, this.first, this.last] = [counts(), counts(), counts(), counts()];
    this.sets = new Array<WordSet | null>(index.laneCount).fill(null);
    this.places = new Array<ChipPlaces | null>(index.laneCount).fill(null);
    this.most = bitsForEach(index.lanes.length);
  }

  /** A word of the bank failed in a lane, in a line of the log. */
  fails(lane: number, word: number, line: number): void {
    const set = this.sets[lane] ?? this.open(lane);
    if (this.first[lane] === 0) this.first[lane] = line;
    this.last[lane] = line;
    set.add(word);
    // What a set that is not exact no longer knows is drawn together at once.
    if (!set.exact) this.places[lane]!.add(word);
  }

  private open(lane: number): WordSet {
    const { memory } = this.index.document;
    const set = new WordSet(memory.banks[this.index.bankOf(lane as Lane)]!.words, this.most);
    this.sets[lane] = set;
    if (!set.exact) this.places[lane] = new ChipPlaces(this.index, lane as Lane);
    return set;
  }

  /** Where inside its chips a lane failed. */
  placesOf(lane: number): ChipPlaces {
    const known = this.places[lane];
    if (known) return known;
    const places = new ChipPlaces(this.index, lane as Lane);
    this.sets[lane]?.forEach((word) => places.add(word));
    return places;
  }

  /** Spreads a pair of values over the lanes of its site. */
  spread({ kind, limbs, count }: Pair, { bank, bits }: Site): void {
    const bitAt = (slot: number, bit: number) => (limbs[slot + (bit >> 5)]! >>> (bit & 31)) & 1;
    const failing = bits.filter((_, n) => (kind === 'mask' ? bitAt(3, n) === 1 : bitAt(0, n) !== bitAt(3, n)));
    let written = 0;
    let read = 0;
    bits.forEach((bit, n) => {
      const lane = bank * this.index.bitCount + bit;
      const fails = kind === 'mask' ? bitAt(3, n) === 1 : bitAt(0, n) !== bitAt(3, n);
      if (fails && failing.length === 1) this.alone[lane]! += count;
      if (kind === 'mask') {
        if (fails) return;
        // What was written is not known: one half of either.
        this.rightOnes[lane]! += Math.floor(count / 2);
        this.rightZeros[lane]! += Math.ceil(count / 2);
        return;
      }
      const [wrote, got] = [bitAt(0, n), bitAt(3, n)];
      if (bit < 40) {
        written += wrote * 2 ** bit;
        read += got * 2 ** bit;
      }
      const counter = fails
        ? got === 1
          ? this.readsOne
          : this.readsZero
        : wrote === 1
          ? this.rightOnes
          : this.rightZeros;
      counter[lane]! += count;
    });
    if (kind === 'pair') this.countValue({ bank, written, read, count });
  }

  private countValue(value: ValueCount): void {
    const key = `${value.bank} ${value.written} ${value.read}`;
    const before = this.values.get(key);
    if (before !== undefined) before.count += value.count;
    else this.values.set(key, value);
    if (this.values.size > mostValues * 2) this.forgetRarest();
  }

  private forgetRarest(): void {
    this.valuesForgotten = true;
    const kept = [...this.values].sort(([, a], [, b]) => b.count - a.count).slice(0, mostValues);
    this.values.clear();
    for (const [key, value] of kept) this.values.set(key, value);
  }

  /** The commonest pairs, the commonest first. */
  commonest(most: number): ValueCount[] {
    return [...this.values.values()]
      .sort((a, b) => b.count - a.count || a.bank - b.bank || a.written - b.written || a.read - b.read)
      .slice(0, most);
  }
}
