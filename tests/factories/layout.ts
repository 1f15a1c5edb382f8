import { type LayoutDocument, type LayoutDocumentInput, layoutDocument } from '@/shared';

type FormatInput = NonNullable<LayoutDocumentInput['reportFormats']>[number];
type SocketInput = LayoutDocumentInput['sockets'][number];

/** Ways in which an invented machine words a failure. */
export const formatKinds = [
  'code',
  'lane-number',
  'mask',
  'address-mask',
  'log',
  'read-only',
  'socket',
  'flashes',
] as const;
export type FormatKind = (typeof formatKinds)[number];

export interface LayoutOptions {
  banks?: number;
  /** Data bits of a word without the check bits. */
  bits?: number;
  /** Check bits after the data bits. */
  parity?: number;
  chipWidth?: 1 | 4 | 8;
  /** Chips behind one another in a bank. */
  deep?: number;
  bankNames?: 'letters' | 'numbers' | 'numbers-from-1';
  /** How codes count banks that are numbers, bits and lanes. */
  first?: 0 | 1 | 'unknown';
  bitOrder?: 'low-first' | 'high-first' | 'unknown';
  /** Banks take turns, address by address. The number of banks is then a power of two. */
  interleave?: boolean;
  /** Each address carries 8 bits of a wider word. */
  byteLanes?: 'big-endian' | 'little-endian';
  sharedParts?: boolean;
  formats?: readonly FormatKind[];
  after?: 'stops' | 'lists-lanes' | 'lists-banks';
  testOrder?: FormatInput['testOrder'];
  /** The banks lie on data lines of their own. */
  ownLines?: boolean;
}

type Settings = Required<Omit<LayoutOptions, 'byteLanes' | 'testOrder'>> &
  Pick<LayoutOptions, 'byteLanes' | 'testOrder'>;

const chipOfWidth = {
  1: { family: 'dynamic-64k-1', words: 65_536, addressPins: 8 },
  4: { family: 'dynamic-64k-4', words: 65_536, addressPins: 8 },
  8: { family: 'static-32k-8', words: 32_768, addressPins: 0 },
} as const;

const upTo = (n: number) => Array.from({ length: n }, (_, i) => i);

function settingsOf(options: LayoutOptions): Settings {
  return {
    banks: 4,
    bits: 8,
    parity: 0,
    chipWidth: 1,
    deep: 1,
    bankNames: (options.banks ?? 4) > 26 ? 'numbers' : 'letters',
    first: 0,
    bitOrder: 'low-first',
    interleave: false,
    sharedParts: true,
    formats: ['code', 'mask', 'log'],
    after: 'stops',
    ownLines: false,
    ...options,
  };
}

function bankIds({ banks, bankNames }: Settings): string[] {
  if (bankNames === 'letters') return upTo(banks).map((n) => String.fromCharCode(65 + n));
  return upTo(banks).map((n) => String(bankNames === 'numbers' ? n : n + 1));
}

function socketsOf(settings: Settings, ids: readonly string[]): SocketInput[] {
  const { bits, parity, chipWidth, deep } = settings;
  const chip = chipOfWidth[chipWidth];
  const parityChip = chipOfWidth[chipWidth === 8 ? 1 : chipWidth];
  const groups: { bits: number[]; family: string; words: number }[] = [];
  for (let bit = 0; bit < bits; bit += chipWidth) {
    groups.push({
      bits: upTo(Math.min(chipWidth, bits - bit)).map((n) => bit + n),
      family: chip.family,
      words: chip.words,
    });
  }
  const step = chipWidth === 4 ? 4 : 1;
  for (let bit = bits; bit < bits + parity; bit += step) {
    groups.push({
      bits: upTo(Math.min(step, bits + parity - bit)).map((n) => bit + n),
      family: parityChip.family,
      words: chip.words,
    });
  }
  return ids.flatMap((bank, b) =>
    upTo(deep).flatMap((d) =>
      groups.map((group, column): SocketInput => {
        const row = b * deep + d;
        const number = 10 + row * groups.length + column;
        const words = { from: d * chip.words, to: (d + 1) * chip.words - 1 };
        return {
          label: `U${number}`,
          x: column * 12,
          y: row * 14,
          family: group.family,
          holds: group.bits.map((bit, pin) => ({ pin, bank, bit, ...(deep > 1 ? { words } : {}) })),
        };
      }),
    ),
  );
}

function addressMapOf(settings: Settings, ids: readonly string[], words: number): LayoutDocumentInput['addressMap'] {
  const { bits, byteLanes, interleave } = settings;
  const ascending = upTo(Math.ceil(bits / 8)).map((byte) =>
    upTo(Math.min(8, bits - byte * 8)).map((n) => byte * 8 + n),
  );
  const lanes = byteLanes === undefined ? undefined : byteLanes === 'big-endian' ? ascending.reverse() : ascending;
  const steps = lanes?.length ?? 1;
  const common = lanes === undefined ? {} : { lanes };
  if (interleave) {
    const lowest = Math.log2(steps);
    const select = upTo(Math.log2(ids.length)).map((n) => [lowest + n]);
    return {
      windows: [
        { range: { from: 0, to: words * steps * ids.length - 1 }, banks: [...ids], interleave: select, ...common },
      ],
    };
  }
  return {
    windows: ids.map((bank, n) => ({
      range: { from: n * words * steps, to: (n + 1) * words * steps - 1 },
      banks: [bank],
      ...common,
    })),
  };
}

function formatOf(kind: FormatKind, settings: Settings, word: readonly number[]): FormatInput {
  const { bankNames, first, bitOrder, after, testOrder, byteLanes } = settings;
  const bank: FormatInput['parts'][number] =
    bankNames === 'letters' ? { field: 'bank', notation: 'letter' } : { field: 'bank', notation: 'names' };
  const all = [...word];
  const shown = byteLanes === undefined ? {} : { digits: { min: 2, max: 2 } };
  const parts: Record<FormatKind, FormatInput['parts']> = {
    code: [bank, { text: '-' }, { field: 'bit', first, bitOrder, bits: all }],
    'lane-number': [{ text: 'E' }, { field: 'lane', first, bitOrder, bits: all }],
    mask: [bank, { text: ' ' }, { field: 'mask', notation: 'hexadecimal', bitOrder, bits: all }],
    'address-mask': [
      { field: 'address', notation: 'hexadecimal' },
      { text: ' ' },
      { field: 'mask', notation: 'hexadecimal', bitOrder, ...shown },
    ],
    log: [
      { field: 'address', notation: 'hexadecimal' },
      { text: ' W ' },
      { field: 'written', notation: 'hexadecimal', ...shown },
      { text: ' R ' },
      { field: 'read', notation: 'hexadecimal', ...shown },
    ],
    'read-only': [bank, { text: ' GOT ' }, { field: 'read', notation: 'decimal', bits: all }],
    socket: [{ text: 'CHECK ' }, { field: 'socket', notation: 'names' }],
    flashes: [
      { field: 'bank', notation: 'flashes', first: 1 },
      { text: ' LONG ' },
      { field: 'bit', notation: 'flashes', first: 1, bitOrder, bits: all },
      { text: ' SHORT' },
    ],
  };
  const written = kind === 'read-only' ? { written: 85 } : {};
  return {
    id: kind,
    name: `${kind} format`,
    parts: parts[kind],
    after,
    ...written,
    ...(testOrder === undefined ? {} : { testOrder }),
  };
}

/** A layout document as a person would write it, of any size, without a problem in it, the same for the same options. */
export function buildLayoutInput(options: LayoutOptions = {}): LayoutDocumentInput {
  const settings = settingsOf(options);
  const { bits, parity, deep, chipWidth, ownLines } = settings;
  const ids = bankIds(settings);
  const chip = chipOfWidth[chipWidth];
  const words = chip.words * deep;
  const word = upTo(bits + parity);
  const half = Math.log2(chip.words) / 2;
  const shared: LayoutDocumentInput['sharedParts'] = [
    ...upTo(Math.ceil(bits / 8)).map((n) => ({
      label: `B${n + 1}`,
      role: 'data-buffer' as const,
      serves: { bits: word.slice(n * 8, Math.min(bits, n * 8 + 8)) },
    })),
    { label: 'S1', role: 'strobe-driver', serves: {} },
  ];
  return {
    format: 'rowcall.layout/1',
    board: { maker: 'Test Works', name: `Bench ${ids.length}x${bits + parity}`, revision: 'A' },
    memory: {
      dataBits: bits + parity,
      checkBits: word.slice(bits),
      banks: ids.map((id) => ({ id, words, ...(ownLines ? { dataLines: `lines ${id}` } : {}) })),
    },
    addressMap: addressMapOf(settings, ids, words),
    ...(chip.addressPins === 0 ? {} : { multiplexing: { row: upTo(half), column: upTo(half).map((n) => n + half) } }),
    sockets: socketsOf(settings, ids),
    sharedParts: settings.sharedParts ? shared : [],
    reportFormats: settings.formats.map((kind) => formatOf(kind, settings, word)),
  };
}

/** The same as a parsed document. */
export function buildLayout(options: LayoutOptions = {}): LayoutDocument {
  return layoutDocument.parse(buildLayoutInput(options));
}
