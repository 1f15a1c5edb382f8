import type { LayoutIndex } from '@/lib';

const digits = { hexadecimal: /^[0-9a-f]+$/i, octal: /^[0-7]+$/, decimal: /^\d+$/ } as const;
const radixes = { hexadecimal: 16, octal: 8, decimal: 10 } as const;

/** An address as typed, in the notation of the board or with a mark of its own: 0x4C1A, $4C1A, 4C1Ah. Null where it is none. */
export function readAddress({ document: { addressMap } }: LayoutIndex, text: string): number | null {
  const plain = text.trim();
  const marked = /^(?:0x|\$)([0-9a-f]+)$/i.exec(plain)?.[1] ?? /^(\d[0-9a-f]*)h$/i.exec(plain)?.[1];
  const { notation } = addressMap;
  if (marked === undefined && !digits[notation].test(plain)) return null;
  const value = marked === undefined ? parseInt(plain, radixes[notation]) : parseInt(marked, 16);
  return value < 2 ** 40 ? value : null;
}
