/** Understands the lines of a log, by columns or by a report format, and notes what they say in a book. */
export interface LineTaker {
  /** Takes whole lines, each with its end. The byte that ends a line is always the same in one log. */
  readonly lines: (bytes: Uint8Array, end: number, newline: number) => void;
  /** Notes what was only gathered so far. */
  readonly finish: () => void;
}
