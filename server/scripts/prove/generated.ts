import { layoutDocument, type LayoutDocument, type LayoutDocumentInput } from '@/shared';

/** The size of an invented board. */
export interface BoardSize {
  readonly banks: number;
  /** Data bits of a word. */
  readonly bits: number;
  /** Check bits after them, each in a chip of one bit. */
  readonly parity: number;
  /** Data bits of one chip. */
  readonly width: 1 | 4 | 8;
  /** The banks take turns, address by address. */
  readonly interleave: boolean;
  /** Whether the layout lists the shared parts. */
  readonly shared: boolean;
}

/** Words of a chip of the generated boards: few, so that every word is simulated. */
const wordsOfChip = 64;

const upTo = (count: number) => Array.from({ length: count }, (_, at) => at);

const family = (width: number) => ({
  id: `store-64-${width}`,
  name: `64 words of ${width}`,
  kind: 'dynamic' as const,
  words: wordsOfChip,
  width,
  rows: 8,
});

/** Chips of one bank: which bits each holds. */
const groupsOf = ({ bits, parity, width }: BoardSize) => [
  ...upTo(Math.ceil(bits / width)).map((chip) => ({
    width,
    bits: upTo(Math.min(width, bits - chip * width)).map((n) => chip * width + n),
  })),
  ...upTo(parity).map((n) => ({ width: 1, bits: [bits + n] })),
];

const sharedPartsOf = ({ bits, shared }: BoardSize): LayoutDocumentInput['sharedParts'] =>
  shared
    ? [
        ...upTo(Math.ceil(bits / 8)).map((byte) => ({
          label: `B${byte + 1}`,
          role: 'data-buffer' as const,
          serves: { bits: upTo(Math.min(8, bits - byte * 8)).map((n) => byte * 8 + n) },
        })),
        { label: 'S1', role: 'strobe-driver', serves: {} },
        { label: 'W1', role: 'write-driver', serves: {} },
        { label: 'M1', role: 'multiplexer', serves: { addressBits: [0, 1, 3, 4] } },
        { label: 'M2', role: 'multiplexer', serves: { addressBits: [2, 5] } },
      ]
    : [];

const formatsOf = (word: readonly number[]): LayoutDocumentInput['reportFormats'] => {
  const bank = { field: 'bank' as const, digits: { min: 2, max: 2 } };
  const address = { field: 'address' as const, notation: 'hexadecimal' as const, digits: { min: 4, max: 4 } };
  const value = (field: 'written' | 'read') => ({ field, notation: 'hexadecimal' as const, bits: [...word] });
  return [
    {
      id: 'first',
      name: 'Stops at the first',
      parts: [bank, { text: '-' }, { field: 'bit', bits: [...word] }],
      after: 'stops',
      testOrder: { bits: 'ascending', outer: 'bank' },
    },
    {
      id: 'list',
      name: 'Lists every lane',
      parts: [{ text: 'BAD ' }, bank, { text: '-' }, { field: 'bit', bits: [...word] }],
      after: 'lists-lanes',
    },
    {
      id: 'banks',
      name: 'Lists every bank',
      parts: [bank, { text: ' ' }, { field: 'mask', notation: 'hexadecimal', bits: [...word] }],
      after: 'lists-banks',
    },
    {
      id: 'log',
      name: 'Lists every word',
      parts: [address, { text: ' W ' }, value('written'), { text: ' R ' }, value('read')],
      after: 'lists-lanes',
    },
  ];
};

/** An invented board of a given size, the same for the same size. */
export function generateBoard(size: BoardSize): LayoutDocument {
  const { banks, bits, parity, width, interleave } = size;
  const ids = upTo(banks).map(String);
  const groups = groupsOf(size);
  const all = upTo(bits + parity);
  const reach = banks * wordsOfChip;
  return layoutDocument.parse({
    format: 'rowcall.layout/1',
    board: { maker: 'Proof Works', name: nameOf(size), revision: 'A' },
    memory: {
      dataBits: bits + parity,
      checkBits: all.slice(bits),
      banks: ids.map((id) => ({ id, words: wordsOfChip })),
    },
    addressMap: {
      windows: interleave
        ? [{ range: { from: 0, to: reach - 1 }, banks: ids, interleave: upTo(Math.log2(banks)).map((bit) => [bit]) }]
        : ids.map((id, n) => ({ range: { from: n * wordsOfChip, to: (n + 1) * wordsOfChip - 1 }, banks: [id] })),
    },
    multiplexing: { row: [0, 1, 2], column: [3, 4, 5] },
    families: [...new Set([width, 1])].map(family),
    sockets: ids.flatMap((bank, row) =>
      groups.map((group, column) => ({
        label: `U${row * groups.length + column + 1}`,
        x: column * 12,
        y: row * 14,
        family: `store-64-${group.width}`,
        holds: group.bits.map((bit, pin) => ({ pin, bank, bit })),
      })),
    ),
    sharedParts: sharedPartsOf(size),
    reportFormats: formatsOf(all),
  });
}

/** "64 sockets x1, 8 banks of 8" and what else is special. */
export function nameOf(size: BoardSize): string {
  const { banks, bits, parity, width, interleave, shared } = size;
  const sockets = banks * groupsOf(size).length;
  const special = [
    parity > 0 ? `${parity} parity` : '',
    interleave ? 'interleaved' : '',
    shared ? '' : 'nothing shared listed',
  ];
  return [`${sockets} sockets x${width}`, `${banks} banks of ${bits}`, ...special.filter((each) => each !== '')].join(
    ', ',
  );
}

const plain = { parity: 0, width: 1, interleave: false, shared: true } as const;

/** Boards of 8 to 256 sockets. */
export const generatedSizes: readonly BoardSize[] = [
  { ...plain, banks: 1, bits: 8 },
  { ...plain, banks: 2, bits: 4, shared: false },
  { ...plain, banks: 2, bits: 8 },
  { ...plain, banks: 2, bits: 8, parity: 1, interleave: true },
  { ...plain, banks: 4, bits: 8, shared: false },
  { ...plain, banks: 4, bits: 8, parity: 1 },
  { ...plain, banks: 4, bits: 16, width: 4 },
  { ...plain, banks: 8, bits: 8, width: 8 },
  { ...plain, banks: 8, bits: 8 },
  { ...plain, banks: 4, bits: 16, parity: 2, interleave: true },
  { ...plain, banks: 8, bits: 32, width: 4, interleave: true },
  { ...plain, banks: 16, bits: 16, width: 8 },
  { ...plain, banks: 8, bits: 16 },
  { ...plain, banks: 16, bits: 16 },
];

/** Boards small enough to be summed over whole by the reference. */
export const smallSizes: readonly BoardSize[] = [
  { ...plain, banks: 1, bits: 8 },
  { ...plain, banks: 2, bits: 4 },
  { ...plain, banks: 2, bits: 4, shared: false },
  { ...plain, banks: 3, bits: 3, parity: 1 },
  { ...plain, banks: 2, bits: 4, width: 4 },
];
