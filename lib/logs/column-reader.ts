import type { Column, ColumnPattern, LogNotation } from './line-pattern';
import { type Label, hasDash, isLabel, joiningWords, labelOf, looksLikeNumber, stepWords } from './line-labels';
import { type LineReader, type Outcome, marks, outcomes, slots } from './line-reader';
import { codeOf as codeOfByte, type Span, numberOfLimbs, readNumber, separator } from './numbers';

// Bundlers turn what is imported into look-ups in another module; this file is run for every byte of a log.
const codeOf = codeOfByte;
const between = separator;
const { blank, read: isRead, unread: isUnread } = outcomes;
const { address: addressMark, written: writtenMark, read: readMark, mask: maskMark } = marks;
const pairMarks = writtenMark | readMark;

export const roles = { none: 0, address: 1, written: 2, read: 3, mask: 4, register: 5, to: 6, step: 7 } as const;
type Role = (typeof roles)[keyof typeof roles];

const { none, address, written, mask } = roles;
export const markOf = Uint8Array.of(0, marks.address, marks.written, marks.read, marks.mask, marks.register, 0, 0);
export const slotOf = Uint8Array.of(0, 0, slots.written, slots.read, slots.mask, 0, 0, 0);
const bitsOfNotation: Readonly<Record<LogNotation | 'binary', number>> = {
  hexadecimal: 4,
  octal: 3,
  binary: 1,
  decimal: 0,
};
const radixOfNotation = { hexadecimal: 16, octal: 8, binary: 2, decimal: 10 } as const;
const mostColumns = 64;
export const lineEnd = 254;
const highest = 2 ** 40 - 1;

const [letterT, letterU] = [29, 30];

function roleColumns(pattern: ColumnPattern): (readonly [Role, Column])[] {
  const { address, written, read, mask, register } = pattern;
  const columns: [Role, Column | undefined][] = [
    [roles.address, address],
    [roles.written, written],
    [roles.read, read],
    [roles.mask, mask],
    [roles.register, register?.column],
  ];
  return columns.filter((entry): entry is [Role, Column] => entry[1] !== undefined);
}

const nouns = ['', 'address', 'value written', 'value read', 'mask of failing bits', 'register value', '', ''];

/** Reads lines by columns and by the words before the numbers. */
export class ColumnReader implements LineReader {
  address = 0;
  to = -1;
  step = 1;
  register = -1;
  has = 0;
  next = 0;
  readonly values = new Int32Array(9);
  protected readonly codes = codeOf.slice();
  private readonly roleAt = new Uint8Array(mostColumns + 1);
  private readonly labels: readonly Label[];
  private readonly labelStart = new Uint8Array(lineEnd);
  protected readonly all: number;
  protected readonly bitsOf = new Uint8Array(8);
  private readonly mostDigits = new Uint8Array(8);
  private readonly radixOf = new Uint8Array(8);
  /** A dash between two numbers of different length makes a run, which it cannot where columns are bare. */
  private readonly freeDash: boolean;
  private readonly number = new Int32Array(3);
  /** Where the numbers of the last line stood. */
  protected readonly starts = new Int32Array(8);
  protected readonly ends = new Int32Array(8);
  /** Whether the last line had nothing but plain short numbers, so that its form says all of it. */
  protected simple = false;
  private addressDigits = 0;
  private tooGreat: number = roles.none;

  constructor(
    private readonly pattern: ColumnPattern,
    newline = 10,
  ) {
    this.codes[newline] = lineEnd;
    const columns = roleColumns(pattern);
    const labels: Label[] = [];
    let all = 0;
    for (const [role, column] of columns) {
      all |= markOf[role]!;
      if (typeof column === 'string') {
        labels.push(labelOf(column, role));
        this.labelStart[labels.at(-1)!.codes[0] ?? 0] = 1;
      } else if (column >= 1 && column <= mostColumns) this.roleAt[column] = role;
    }
    this.all = all;
    this.freeDash = labels.length > 0;
    this.labels = labels;
    for (const role of Object.values(roles)) {
      const isValue = role === roles.written || role === roles.read || role === roles.mask;
      const notation = isValue ? (pattern.values ?? pattern.notation) : pattern.notation;
      const bits = bitsOfNotation[notation];
      this.bitsOf[role] = bits;
      this.mostDigits[role] = bits === 0 ? 0 : Math.floor(32 / bits);
      this.radixOf[role] = radixOfNotation[notation];
    }
  }

  line(bytes: Uint8Array, at: number): Outcome {
    this.simple = true;
    const outcome = this.follow(bytes, at, 'runs');
    if (outcome !== isUnread || this.to < 0 || this.freeDash) return outcome;
    // A dash that made a run may have stood between two columns. Another line of the same form may still be a run.
    const byColumns = this.follow(bytes, at, 'columns only');
    this.simple = false;
    return byColumns;
  }

  private follow(bytes: Uint8Array, at: number, dashes: 'runs' | 'columns only'): Outcome {
    const { codes, roleAt, labelStart, all, bitsOf, mostDigits, values, starts, ends } = this;
    let has = 0;
    this.has = 0;
    this.to = -1;
    this.step = 1;
    this.register = -1;
    this.tooGreat = roles.none;
    let p = at;
    let column = 0;
    let pending: number = none;
    let afterAddress = false;
    for (;;) {
      const gap = p;
      let code = codes[bytes[p]!]!;
      while (code === between) code = codes[bytes[++p]!]!;
      if (code === lineEnd) break;
      const start = p;
      if (afterAddress) {
        afterAddress = false;
        if (dashes === 'runs' && (code === letterT || code === letterU || hasDash(bytes, gap, start))) {
          const end = this.runEnd(bytes, gap, start);
          if (end > 0) {
            p = end;
            continue;
          }
        }
      }
      column++;
      let role: number = column <= mostColumns ? roleAt[column]! : none;
      const fixed = role !== none;
      if (!fixed) role = pending;
      if (role !== none) {
        const bits = bitsOf[role]!;
        let value = 0;
        let bad = 0;
        do {
          bad |= code >> bits;
          value = (value << bits) | code;
          code = codes[bytes[++p]!]!;
        } while (code < lineEnd);
        if (bad === 0 && p - start <= mostDigits[role]!) {
          const mark = markOf[role]!;
          if ((has & mark) === 0) {
            has |= mark;
            starts[role] = start;
            ends[role] = p;
            if (role >= written && role <= mask) {
              const slot = slotOf[role]!;
              values[slot] = value;
              values[slot + 1] = 0;
              values[slot + 2] = 0;
            } else this.keepShort(role, value, p - start);
          }
        } else {
          this.has = has;
          const kept = this.keepLong({ bytes, from: start, to: p }, role);
          has = this.has;
          if (!kept) {
            if (fixed) return this.leave(bytes, p);
            role = none;
          }
        }
        if (role !== none) {
          afterAddress = role === address;
          pending = none;
          if (!afterAddress && (has & all) === all && this.to < 0) break;
          continue;
        }
        p = start;
        code = codes[bytes[p]!]!;
      }
      // Few words begin like a label.
      if (labelStart[code] === 0 && this.to < 0) {
        do code = codes[bytes[++p]!]!;
        while (code < lineEnd);
        continue;
      }
      let hash = 0;
      do {
        hash = (Math.imul(hash, 37) + code) | 0;
        code = codes[bytes[++p]!]!;
      } while (code < lineEnd);
      const label = this.labelAt(bytes, start, { size: p - start, hash });
      if (label !== none) pending = label;
      if (pending === none) {
        this.has = has;
        pending = this.rareWord(bytes, start, p);
        has = this.has;
      }
      afterAddress = pending === address && (has & addressMark) !== 0;
      if (afterAddress) pending = none;
    }
    this.has = has;
    return this.leave(bytes, p, column);
  }

  private labelAt(bytes: Uint8Array, from: number, { size, hash }: { size: number; hash: number }): number {
    for (const label of this.labels) {
      if (label.hash === hash && label.codes.length === size && isLabel(bytes, from, label)) return label.role;
    }
    return none;
  }

  /** Goes to the line's end and says what the line was. */
  private leave(bytes: Uint8Array, at: number, column = 1): Outcome {
    let p = at;
    while (this.codes[bytes[p]!] !== lineEnd) p++;
    this.next = p + 1;
    if (column === 0) return blank;
    const { has } = this;
    const whole = (has & addressMark) !== 0 && ((has & pairMarks) === pairMarks || (has & maskMark) !== 0);
    return whole && this.tooGreat === roles.none ? isRead : isUnread;
  }

  /** Numbers other than values, of up to 32 bits. */
  private keepShort(role: number, value: number, digits: number): void {
    if (role === address) {
      this.address = value >>> 0;
      this.addressDigits = digits;
    } else if (role === roles.register) this.register = value >>> 0;
    else if (role === roles.step) this.step = Math.max(1, value >>> 0);
  }

  /** Numbers with marks of their base, decimal ones and those of more than 32 bits. */
  private keepLong(span: Span, role: number): boolean {
    this.simple = false;
    const digits = readNumber(span, this.radixOf[role]!, { limbs: this.number, at: 0 });
    if (digits === 0) return false;
    const mark = markOf[role]!;
    if ((this.has & mark) !== 0) return true;
    const slot = slotOf[role]!;
    if (role === roles.written || role === roles.read || role === roles.mask) {
      this.values.set(this.number, slot);
      this.has |= mark;
      return true;
    }
    const value = numberOfLimbs(this.number, 0);
    if (value > highest) this.tooGreat = role;
    this.has |= mark;
    if (role === roles.address) {
      this.address = value;
      this.addressDigits = digits;
    } else if (role === roles.register) this.register = value;
    else if (role === roles.step) this.step = Math.max(1, value);
    return true;
  }

  /** The end of a run that follows its first address: "1A80-1AFF", "1A80 TO 1AFF". 0 where there is none. */
  private runEnd(bytes: Uint8Array, gap: number, start: number): number {
    let from = start;
    let to = this.wordEnd(bytes, from);
    let freely = this.freeDash;
    if (joiningWords.some((word) => word.codes.length === to - from && isLabel(bytes, from, word))) {
      from = to;
      while (this.codes[bytes[from]!] === between) from++;
      to = this.wordEnd(bytes, from);
      freely = true;
    } else if (!hasDash(bytes, gap, start)) return 0;
    if (to === from) return 0;
    const digits = readNumber({ bytes, from, to }, this.radixOf[roles.address]!, { limbs: this.number, at: 0 });
    const value = numberOfLimbs(this.number, 0);
    if (digits === 0 || value < this.address || value > highest) return 0;
    if (!freely && digits !== this.addressDigits) return 0;
    this.to = value;
    return to;
  }

  private wordEnd(bytes: Uint8Array, at: number): number {
    let p = at;
    while (this.codes[bytes[p]!]! < lineEnd) p++;
    return p;
  }

  /** A word before the step of a run, or a label with its number at once, such as W00. */
  private rareWord(bytes: Uint8Array, from: number, to: number): Role {
    const size = to - from;
    if (this.to >= 0 && stepWords.some((word) => word.codes.length === size && isLabel(bytes, from, word)))
      return roles.step;
    for (const label of this.labels) {
      const cut = from + label.codes.length;
      if (cut >= to || !isLabel(bytes, from, label) || !looksLikeNumber(bytes, cut, to)) continue;
      if (this.keepLong({ bytes, from: cut, to }, label.role))
        return label.role === roles.address ? label.role : roles.none;
    }
    return roles.none;
  }

  reason(): string {
    if (this.tooGreat !== roles.none) return `The ${nouns[this.tooGreat]} has more digits than any board needs.`;
    const { pattern, has } = this;
    const wanted = roleColumns(pattern).filter(([role]) => role !== roles.register && role !== roles.mask);
    const lacking = wanted.find(([role]) => (has & markOf[role]!) === 0) ?? [roles.mask, pattern.mask ?? 0];
    const [role, column] = lacking;
    const where = typeof column === 'number' ? `word ${column} of the line` : `after ${column}`;
    const notation = role === roles.address ? pattern.notation : (pattern.values ?? pattern.notation);
    return `There is no ${nouns[role]} (${notation} number, ${where}).`;
  }
}
