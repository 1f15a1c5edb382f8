import { codeOf as codeOfByte } from './numbers';

// Bundlers turn what is imported into look-ups in another module; this file is run for every byte of a log.
const codeOf = codeOfByte;
const longest = 256;
/** So many more lines that do not fit than do, and the mould is given up. */
const patience = 1000;

/** A number in the mould: its place in the line, the bits of a digit, and where its value goes. */
export interface MouldField {
  readonly from: number;
  readonly to: number;
  readonly bits: number;
  readonly role: number;
}

/**
 * The form of the last line that was read: the same bytes at the same places but for the digits of its fields. Machines
 * print one line after the other in one form, which is told from the bytes much faster than word by word.
 */
export class LineMould {
  /** The values of the fields of the last line that fitted, by role. */
  readonly values = new Int32Array(8);
  private readonly form = new Uint8Array(longest);
  private readonly from = new Int32Array(8);
  private readonly to = new Int32Array(8);
  private readonly bits = new Int32Array(8);
  private readonly roles = new Int32Array(8);
  private count = 0;
  private misses = 0;

  /** Whether another line may still be taken for the mould. */
  get open(): boolean {
    return this.misses < patience;
  }

  /** Takes the form of a line whose fields are these, in the order of the line. */
  take(bytes: Uint8Array, at: number, fields: readonly MouldField[]): void {
    const end = fields.at(-1)?.to ?? 0;
    this.count = 0;
    if (end > longest) return;
    this.form.set(bytes.subarray(at, at + end));
    fields.forEach(({ from, to, bits, role }, n) => {
      this.from[n] = from;
      this.to[n] = to;
      this.bits[n] = bits;
      this.roles[n] = role;
    });
    this.count = fields.length;
  }

  /** The place after the last field of a line that fits; -1 for one that does not. */
  fit(bytes: Uint8Array, at: number): number {
    const { form, from, to, bits, roles, values, count } = this;
    if (count === 0) return -1;
    let place = 0;
    for (let n = 0; n < count; n++) {
      for (const start = from[n]!; place < start; place++) if (bytes[at + place] !== form[place]) return this.miss();
      const width = bits[n]!;
      let value = 0;
      let bad = 0;
      for (const end = to[n]!; place < end; place++) {
        const code = codeOf[bytes[at + place]!]!;
        bad |= code >> width;
        value = (value << width) | code;
      }
      if (bad !== 0) return this.miss();
      values[roles[n]!] = value;
    }
    // The last number could go on.
    if (codeOf[bytes[at + place]!]! < 37) return this.miss();
    if (this.misses > 0) this.misses--;
    return at + place;
  }

  private miss(): number {
    if (++this.misses >= patience) this.count = 0;
    return -1;
  }
}
