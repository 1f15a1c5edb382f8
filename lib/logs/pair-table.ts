/** Of a pair: its key, then written and read in three limbs each. */
const wide = 7;
const capacity = 1 << 13;
const most = (capacity * 3) / 4;

/** A pair of values with how often it came. */
export interface Pair {
  readonly site: number;
  /** mask: what was written is not known; the failing bits stand in place of what was read. */
  readonly kind: 'pair' | 'mask';
  /** Written and read, three limbs each. */
  readonly limbs: Int32Array;
  readonly count: number;
}

/** The key of a site's pairs, or of its masks. */
export function pairKey(site: number, kind: Pair['kind']): number {
  return site * 2 + (kind === 'mask' ? 1 : 0);
}

/**
 * Counts how often each pair of values came at each site. Holds a bounded number of pairs; when it is full they are
 * handed over and it begins anew.
 */
export class PairTable {
  private readonly keys = new Int32Array(capacity * wide);
  private readonly counts = new Float64Array(capacity);
  private used = 0;
  private last = -1;

  constructor(private readonly give: (pair: Pair) => void) {}

  /** Counts readings. `values` holds written and read in three limbs each; of a mask the second three. */
  add(values: Int32Array, key: number, count: number): void {
    const { counts } = this;
    if (this.last >= 0 && this.same(this.last, values, key)) {
      counts[this.last]! += count;
      return;
    }
    let hash = Math.imul(key + 1, 0x9e3779b1) ^ Math.imul(values[0]!, 0x85ebca6b) ^ Math.imul(values[3]!, 0xc2b2ae35);
    if ((values[1]! | values[2]! | values[4]! | values[5]!) !== 0) {
      hash ^= Math.imul(values[1]!, 0x27d4eb2f) ^ Math.imul(values[2]!, 0x165667b1);
      hash ^= Math.imul(values[4]!, 0x9e3779b1) ^ Math.imul(values[5]!, 0x85ebca77);
    }
    hash ^= hash >>> 15;
    hash = Math.imul(hash, 0x2c1b3c6d);
    hash ^= hash >>> 13;
    let slot = hash & (capacity - 1);
    while (counts[slot] !== 0 && !this.same(slot, values, key)) slot = (slot + 1) & (capacity - 1);
    if (counts[slot] === 0) {
      if (this.used >= most) {
        this.flush();
        slot = hash & (capacity - 1);
      }
      this.used++;
      const at = slot * wide;
      this.keys[at] = key;
      for (let n = 0; n < 6; n++) this.keys[at + 1 + n] = values[n]!;
    }
    counts[slot]! += count;
    this.last = slot;
  }

  /** Hands over every pair and empties the table. */
  flush(): void {
    for (let slot = 0; slot < capacity; slot++) {
      const count = this.counts[slot]!;
      if (count === 0) continue;
      const at = slot * wide;
      const key = this.keys[at]!;
      this.give({
        site: key >> 1,
        kind: (key & 1) === 0 ? 'pair' : 'mask',
        limbs: this.keys.slice(at + 1, at + 7),
        count,
      });
    }
    this.counts.fill(0);
    this.used = 0;
    this.last = -1;
  }

  private same(slot: number, values: Int32Array, key: number): boolean {
    const { keys } = this;
    const at = slot * wide;
    return (
      keys[at + 1] === values[0] &&
      keys[at + 4] === values[3] &&
      keys[at] === key &&
      keys[at + 2] === values[1] &&
      keys[at + 3] === values[2] &&
      keys[at + 5] === values[4] &&
      keys[at + 6] === values[5]
    );
  }
}
