/** Longest line that is read; a longer one counts as unread. Keeps the memory of an import constant. */
export const longestLine = 65_536;

/** Why such a line is not read. */
export const tooLongWords = () => `The line is longer than ${longestLine} characters.`;

const [lineFeed, carriageReturn] = [10, 13];

/** Takes bytes that end with a line's end: whole lines, one or many. */
export type TakeLines = (bytes: Uint8Array, end: number) => void;

interface Takers {
  readonly lines: TakeLines;
  /** A line too long to be kept. */
  readonly tooLong: () => void;
}

/** Every second byte of text in 16-bit units; what is not ASCII becomes a byte that separates words. */
class Narrower {
  private low: number | null = null;

  constructor(private readonly lowFirst: boolean) {}

  narrow(bytes: Uint8Array): Uint8Array {
    const units = new Uint8Array((bytes.length + 1) >> 1);
    let count = 0;
    for (const byte of bytes) {
      if (this.low === null) {
        this.low = byte;
        continue;
      }
      const [low, high] = this.lowFirst ? [this.low, byte] : [byte, this.low];
      units[count++] = high === 0 && low < 128 ? low : 128;
      this.low = null;
    }
    return units.subarray(0, count);
  }
}

function narrowerFor(first: number | undefined, second: number | undefined): Narrower | null {
  if (first === 0xff && second === 0xfe) return new Narrower(true);
  if (first === 0xfe && second === 0xff) return new Narrower(false);
  return null;
}

function joined(a: Uint8Array, b: Uint8Array): Uint8Array {
  const both = new Uint8Array(a.length + b.length);
  both.set(a);
  both.set(b, a.length);
  return both;
}

/**
 * Cuts a stream of bytes into whole lines. Lines end with LF or CR LF, or with CR alone where the first line does.
 * 16-bit text with a mark at its start is read too. Keeps no more than one line between two pushes.
 */
export class LineFeed {
  /** The byte that ends a line; known once the first line has ended. */
  newline = lineFeed;
  private decided = false;
  private started = false;
  private narrower: Narrower | null = null;
  private head: Uint8Array = new Uint8Array(0);
  private readonly kept = new Uint8Array(longestLine + 1);
  private keptLength = 0;
  private skipping = false;

  constructor(private readonly takers: Takers) {}

  push(bytes: Uint8Array): void {
    let plain = bytes;
    if (!this.started) {
      plain = this.head = joined(this.head, bytes);
      if (plain.length < 2) return;
      this.started = true;
      this.head = new Uint8Array(0);
      this.narrower = narrowerFor(plain[0], plain[1]);
      if (this.narrower !== null) plain = plain.subarray(2);
    }
    this.pushPlain(this.narrower === null ? plain : this.narrower.narrow(plain));
  }

  /** Hands over what is left as a last line. */
  finish(): void {
    if (this.head.length > 0) this.follow(this.head);
    this.head = new Uint8Array(0);
    if (this.skipping) this.takers.tooLong();
    else if (this.keptLength > 0) this.giveKept();
    this.skipping = false;
    this.keptLength = 0;
  }

  private pushPlain(bytes: Uint8Array): void {
    if (this.decided) return this.follow(bytes);
    const all = this.head.length === 0 ? bytes : joined(this.head, bytes);
    this.decided = this.decide(all);
    // Only carriage returns so far: what follows them decides.
    if (!this.decided && all.length <= longestLine) {
      this.head = all.slice();
      return;
    }
    this.decided = true;
    this.head = new Uint8Array(0);
    this.follow(all);
  }

  private decide(bytes: Uint8Array): boolean {
    const returned = bytes.indexOf(carriageReturn);
    const fed = bytes.indexOf(lineFeed);
    if (fed < 0 && returned < 0) return false;
    if (returned < 0 || (fed >= 0 && fed < returned)) return true;
    let after = returned;
    while (bytes[after] === carriageReturn) after++;
    if (after === bytes.length) return false;
    if (bytes[after] !== lineFeed) this.newline = carriageReturn;
    return true;
  }

  private follow(bytes: Uint8Array): void {
    const last = bytes.lastIndexOf(this.newline);
    if (last < 0) return this.keep(bytes, 0);
    let from = 0;
    if (this.skipping || this.keptLength > 0) {
      from = bytes.indexOf(this.newline) + 1;
      if (this.skipping) this.takers.tooLong();
      else {
        this.keep(bytes.subarray(0, from - 1), 0);
        if (this.skipping) this.takers.tooLong();
        else this.giveKept();
      }
      this.skipping = false;
      this.keptLength = 0;
    }
    if (from <= last) this.takers.lines(from === 0 ? bytes : bytes.subarray(from), last + 1 - from);
    this.keep(bytes, last + 1);
  }

  private keep(bytes: Uint8Array, from: number): void {
    if (this.skipping) return;
    const more = bytes.length - from;
    if (this.keptLength + more > longestLine) {
      this.skipping = true;
      this.keptLength = 0;
      return;
    }
    this.kept.set(from === 0 ? bytes : bytes.subarray(from), this.keptLength);
    this.keptLength += more;
  }

  private giveKept(): void {
    this.kept[this.keptLength] = this.newline;
    this.takers.lines(this.kept, this.keptLength + 1);
  }
}
