import type { LayoutDocument, LayoutProblem } from '@/shared';
import type { LayoutIndex } from '../layout-index';

/** What every check looks at. */
export interface Checked {
  readonly document: LayoutDocument;
  readonly index: LayoutIndex;
}

/** What a place in the document is called, and what is wrong with it. */
export interface Finding {
  readonly pointer: string;
  readonly code: string;
  readonly message: string;
}

/** Something that would mislead. */
export function error(finding: Finding): LayoutProblem {
  return { severity: 'error', ...finding };
}

/** Something to look at again. */
export function warning(finding: Finding): LayoutProblem {
  return { severity: 'warning', ...finding };
}

/** Places in a list that repeat an earlier item, with the place of that item. */
export function repeats<T>(items: readonly T[]): { at: number; first: number; item: T }[] {
  const seen = new Map<T, number>();
  return items.flatMap((item, at) => {
    const first = seen.get(item);
    if (first !== undefined) return [{ at, first, item }];
    seen.set(item, at);
    return [];
  });
}

/** "There is no bank "E": this board has banks A to D." and the like for a bit that does not exist. */
export function bitOutOfRange(pointer: string, bit: number, bitCount: number): LayoutProblem {
  const message = `There is no bit ${bit}: the word has ${bitCount === 1 ? 'only bit 0' : `bits 0 to ${bitCount - 1}`}.`;
  return error({ pointer, code: 'bit-out-of-range', message });
}
