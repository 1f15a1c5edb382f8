import type { LayoutDocumentInput } from '@/shared';

type SocketInput = LayoutDocumentInput['sockets'][number];
type FormatInput = NonNullable<LayoutDocumentInput['reportFormats']>[number];

/** The numbers from 0 up to below n. */
export const upTo = (n: number) => Array.from({ length: n }, (_, at) => at);

interface Row {
  /** Labels in order of the bits, bit 0 first. */
  labels: readonly string[];
  bank: string;
  family: string;
  /** Which row of the sketch, the upper one is 0. */
  row: number;
}

/** A row of one-bit chips that holds one bank, bit 0 at the left. */
export const rowOfChips = ({ labels, bank, family, row }: Row): SocketInput[] =>
  labels.map((label, bit) => ({ label, x: bit * 12, y: row * 14, family, holds: [{ bank, bit }] }));

/** Labels such as U10, U11 and so on. */
export const labels = (letters: string, { first, count }: { first: number; count: number }) =>
  upTo(count).map((n) => `${letters}${first + n}`);

/** A test that prints a line such as "52A7 W 00 R 20" for each failing word. */
export const addressLog = (digits: number): FormatInput => ({
  id: 'log',
  name: 'Test log',
  parts: [
    { field: 'address', notation: 'hexadecimal', digits: { min: digits, max: digits } },
    { text: ' W ' },
    { field: 'written', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
    { text: ' R ' },
    { field: 'read', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
  ],
  after: 'lists-lanes',
});
