import { ColumnReader, lineEnd as endOfLine, markOf as markOfRole, roles, slotOf as slotOfRole } from './column-reader';
import { hasDash } from './line-labels';
import { LineMould, type MouldField } from './line-mould';
import { type Outcome, marks, outcomes } from './line-reader';
import { separator } from './numbers';

// Bundlers turn what is imported into look-ups in another module; this file is run for every line of a log.
const { address, written, mask, register } = roles;
const lineEnd = endOfLine;
const markOf = markOfRole;
const slotOf = slotOfRole;
const isRead = outcomes.read;
const registerMark = marks.register;

/** Reads lines by columns, the faster where one line has the form of the one before. It reads every line alike. */
export class MouldedReader extends ColumnReader {
  private readonly mould = new LineMould();

  override line(bytes: Uint8Array, at: number): Outcome {
    const end = this.mould.fit(bytes, at);
    if (end >= 0) return this.moulded(bytes, end);
    const outcome = super.line(bytes, at);
    if (outcome === isRead && this.simple && this.has === this.all && this.to < 0 && this.mould.open)
      this.makeMould(bytes, at);
    return outcome;
  }

  /** Takes the values of a line that fits the form of the one before. */
  private moulded(bytes: Uint8Array, end: number): Outcome {
    const { codes, all, values, mould } = this;
    const found = mould.values;
    let p = end;
    while (codes[bytes[p]!] !== lineEnd) p++;
    this.next = p + 1;
    this.has = all;
    this.to = -1;
    this.step = 1;
    this.address = found[address]! >>> 0;
    this.register = (all & registerMark) === 0 ? -1 : found[register]! >>> 0;
    for (let role: number = written; role <= mask; role++) {
      if ((all & markOf[role]!) === 0) continue;
      const slot = slotOf[role]!;
      values[slot] = found[role]!;
      values[slot + 1] = 0;
      values[slot + 2] = 0;
    }
    return isRead;
  }

  private makeMould(bytes: Uint8Array, at: number): void {
    const { starts, ends, bitsOf, all } = this;
    // A dash after the address could make a run of the next line.
    let gap = ends[address]!;
    while (this.codes[bytes[gap]!] === separator) gap++;
    if (hasDash(bytes, ends[address]!, gap)) return;
    const fields: MouldField[] = [];
    for (let role: number = address; role <= register; role++) {
      if ((all & markOf[role]!) === 0) continue;
      fields.push({ from: starts[role]! - at, to: ends[role]! - at, bits: bitsOf[role]!, role });
    }
    this.mould.take(
      bytes,
      at,
      fields.sort((a, b) => a.from - b.from),
    );
  }
}
