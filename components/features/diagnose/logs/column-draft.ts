import { isFormatPattern, type Column, type ColumnPattern, type LayoutIndex, type LinePattern } from '@/lib';

/** Columns as the person points at them: the number of a word, or nothing. */
export interface ColumnDraft {
  readonly address: Column | null;
  readonly written: Column | null;
  readonly read: Column | null;
  readonly mask: Column | null;
  readonly notation: ColumnPattern['notation'];
  readonly values: NonNullable<ColumnPattern['values']>;
  readonly unit: ColumnPattern['unit'];
  readonly shows: ColumnPattern['shows'];
}

export const columnFields = ['address', 'written', 'read', 'mask'] as const;
export type ColumnField = (typeof columnFields)[number];

/** What is pointed at when the person begins: what the best pattern says, else nothing. */
export function beginDraft(index: LayoutIndex, pattern: LinePattern | undefined): ColumnDraft {
  const { notation } = index.document.addressMap;
  if (pattern === undefined || isFormatPattern(pattern)) {
    const none = { address: null, written: null, read: null, mask: null };
    return { ...none, notation, values: notation, unit: 'address', shows: 'address' };
  }
  const { address, written = null, read = null, mask = null, unit, shows } = pattern;
  return {
    address,
    written,
    read,
    mask,
    notation: pattern.notation,
    values: pattern.values ?? pattern.notation,
    unit,
    shows,
  };
}

/** The pattern of a draft; words instead where something is missing yet. */
export function patternOfDraft(draft: ColumnDraft): ColumnPattern | string {
  const { address, written, read, mask, notation, values, unit, shows } = draft;
  if (address === null) return 'Say which word is the address.';
  const pair = written !== null && read !== null;
  if (!pair && mask === null)
    return 'Say which words are what was written and what was read, or which the failing bits.';
  const used = [address, written, read, mask].filter((column) => column !== null);
  if (new Set(used).size < used.length) return 'Two fields have the same word.';
  return {
    address,
    ...(written === null ? {} : { written }),
    ...(read === null ? {} : { read }),
    ...(mask === null ? {} : { mask }),
    notation,
    ...(values === notation ? {} : { values }),
    unit,
    shows,
  };
}
