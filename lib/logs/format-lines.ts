import { compiledFormats } from '../diagnose/compiled-formats';
import type { LayoutIndex } from '../layout/layout-index';
import { type AddressMap, addressMapOf, decodeAddress } from '../place/address';
import type { CompiledFormat, FailingLane } from '../report/meaning';
import type { LineTaker } from './line-taker';
import type { LogBook } from './log-book';

/** What a line that is worded as a report format says. */
type FormatLine =
  | { readonly ok: true; readonly failing: readonly FailingLane[]; readonly word: number }
  | { readonly ok: false; readonly reason: string };

/** Different lines that are remembered. Many logs say the same of a word again and again. */
const mostRemembered = 4096;
/** Characters that a report may have. */
const mostCharacters = 512;

/**
 * Takes lines as a report format of the layout words them: with bits in any order, tables of words and conventions.
 * Slower than columns by far, since a format may be worded in any way.
 */
export class FormatLines implements LineTaker {
  private readonly format: CompiledFormat;
  private readonly map: AddressMap;
  private known = new Map<string, FormatLine>();

  constructor(
    index: LayoutIndex,
    id: string,
    private readonly book: LogBook,
  ) {
    const format = compiledFormats(index).get(id);
    if (format === undefined) throw new RangeError(`This layout has no report format ${id} that can be read.`);
    this.format = format;
    this.map = addressMapOf(index);
  }

  finish = (): void => undefined;

  lines = (bytes: Uint8Array, end: number, newline: number): void => {
    let at = 0;
    while (at < end) {
      const next = bytes.indexOf(newline, at) + 1;
      this.book.line++;
      this.take(bytes.subarray(at, next - 1));
      at = next;
    }
  };

  private take(bytes: Uint8Array): void {
    const { book } = this;
    const text = textOf(bytes.subarray(0, mostCharacters + 1)).trim();
    if (text === '') {
      book.blank++;
      return;
    }
    const line = this.read(text);
    if (!line.ok) return book.refuse(bytes, () => line.reason);
    const { failing, word } = line;
    book.readings++;
    if (failing.length > 0) book.failing++;
    const { lanes } = book;
    for (const { lane, reads } of failing) {
      lanes.fails(lane, word, book.line);
      if (reads === 'one') lanes.readsOne[lane]!++;
      else if (reads === 'zero') lanes.readsZero[lane]!++;
      if (failing.length === 1) lanes.alone[lane]!++;
    }
  }

  private read(text: string): FormatLine {
    const before = this.known.get(text);
    if (before !== undefined) return before;
    const line = this.readNew(text);
    if (this.known.size >= mostRemembered) this.known = new Map();
    this.known.set(text, line);
    return line;
  }

  private readNew(text: string): FormatLine {
    const result = this.format.read(text);
    if (!result.ok) return { ok: false, reason: result.reason };
    const { failing, address } = result.readings[0]!;
    if (address === null) return { ok: false, reason: 'The line does not say at which word of the memory.' };
    const places = decodeAddress(this.map, address);
    const bank = failing[0] === undefined ? undefined : this.map.index.bankOf(failing[0].lane);
    const place = places.find((each) => bank === undefined || each.bank === bank);
    if (place === undefined) return { ok: false, reason: 'The bank of the line does not answer at its address.' };
    return { ok: true, failing, word: place.word };
  }
}

function textOf(bytes: Uint8Array): string {
  return String.fromCharCode(...bytes);
}
