import type { Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { type Segment, segmentsOf } from '../layout/segments';

/** Row or column of a chip with how many of the words met lie in it. */
export interface LineCount {
  readonly number: number;
  readonly words: number;
}

/** More rows or columns than 2 to the power of this are not counted. */
const mostLineBits = 20;
const half = 2 ** 20;
const highest = 2 ** 40 - 1;

class LineCounter {
  readonly counts: Uint32Array;

  constructor(private readonly bits: readonly number[]) {
    this.counts = new Uint32Array(2 ** bits.length);
  }

  add(low: number, high: number): void {
    let number = 0;
    for (let n = 0; n < this.bits.length; n++) {
      const bit = this.bits[n]!;
      number |= (bit < 20 ? (low >> bit) & 1 : (high >> (bit - 20)) & 1) << n;
    }
    this.counts[number]!++;
  }

  lines(): LineCount[] {
    const found: LineCount[] = [];
    this.counts.forEach((words, number) => {
      if (words > 0) found.push({ number, words });
    });
    return found;
  }
}

/** Draws together where inside the chips of one lane its failing words lie. */
export class ChipPlaces {
  private readonly segments: readonly Segment[];
  private readonly rowCounter: LineCounter | null;
  private readonly columnCounter: LineCounter | null;
  private met = false;
  private lowOnes = half - 1;
  private highOnes = half - 1;
  private lowAny = 0;
  private highAny = 0;

  constructor(index: LayoutIndex, lane: Lane) {
    this.segments = segmentsOf(index, lane);
    const { multiplexing } = index.document;
    const known = multiplexing !== undefined && multiplexing.row.length > 0 && multiplexing.column.length > 0;
    const counter = (bits: readonly number[]) => (known && bits.length <= mostLineBits ? new LineCounter(bits) : null);
    this.rowCounter = counter(multiplexing?.row ?? []);
    this.columnCounter = counter(multiplexing?.column ?? []);
  }

  /** A failing word of the bank. */
  add(word: number): void {
    for (const { from, to, at } of this.segments) {
      if (word < from || word > to) continue;
      const inside = word - from + at;
      const high = Math.floor(inside / half);
      const low = inside - high * half;
      this.met = true;
      this.lowOnes &= low;
      this.highOnes &= high;
      this.lowAny |= low;
      this.highAny |= high;
      this.rowCounter?.add(low, high);
      this.columnCounter?.add(low, high);
    }
  }

  /** Bits of the word number inside the chip that were 1 in every failing word. */
  get ones(): number {
    return this.met ? this.highOnes * half + this.lowOnes : 0;
  }

  /** Bits that were 0 in every failing word, of all 40 that a word number can have. */
  get zeros(): number {
    return this.met ? highest - (this.highAny * half + this.lowAny) : 0;
  }

  get rows(): LineCount[] {
    return this.rowCounter?.lines() ?? [];
  }

  get columns(): LineCount[] {
    return this.columnCounter?.lines() ?? [];
  }
}
