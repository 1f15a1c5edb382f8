import type { LayoutIndex } from '../layout/layout-index';
import { MouldedReader } from './moulded-reader';
import { type LinePattern, isFormatPattern } from './line-pattern';
import type { LineReader } from './line-reader';

/** The reader of a pattern. Throws RangeError where the layout has no report format of that id. */
export function openLineReader(_index: LayoutIndex, pattern: LinePattern, newline = 10): LineReader {
  if (isFormatPattern(pattern)) throw new RangeError(`There is no report format ${pattern.format}.`);
  return new MouldedReader(pattern, newline);
}
