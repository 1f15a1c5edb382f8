import fc from 'fast-check';
import { validateLayout } from '@/lib/layout/validate';
import { type LayoutDocument, type LayoutDocumentInput, layoutDocument } from '@/shared';
import { type LayoutOptions, buildLayout, buildLayoutInput, formatKinds } from '@/tests/factories/layout';

type Change = (document: LayoutDocument) => void;

function found(
  options: LayoutOptions,
  change: Change,
): { code: string; pointer: string; severity: string; message: string }[] {
  const document = structuredClone(buildLayout(options));
  change(document);
  return validateLayout(layoutDocument.parse(document));
}

/** The only problem, as "code pointer". */
function only(options: LayoutOptions, change: Change): string {
  return found(options, change)
    .map(({ code, pointer }) => `${code} ${pointer}`)
    .join('; ');
}

describe('a layout without fault', () => {
  it.each<[string, LayoutOptions]>([
    ['four banks of one-bit chips', {}],
    ['one bank', { banks: 1 }],
    ['four-bit chips', { chipWidth: 4, bits: 8 }],
    ['eight-bit chips two deep', { chipWidth: 8, bits: 16, deep: 2 }],
    ['interleave and byte lanes', { banks: 4, bits: 16, interleave: true, byteLanes: 'little-endian' }],
    ['parity, counted from 1', { parity: 1, first: 1, formats: ['code', 'lane-number', 'socket', 'flashes'] }],
    ['conventions unknown', { first: 'unknown', bitOrder: 'unknown' }],
  ])('has no problem: %s', (_, options) => {
    expect(validateLayout(buildLayout(options))).toEqual([]);
  });
});

describe('lanes', () => {
  it('held by no chip', () => {
    expect(only({ formats: ['code'] }, (d) => void (d.sockets[3]!.holds[0]!.bit = 2))).toBe(
      'lane-unheld /memory/banks/0; lane-twice /sockets/3/holds/0',
    );
  });

  it('held by two chips are named with both', () => {
    const [problem] = found(
      { formats: ['code'] },
      (d) => void d.sockets.push({ ...d.sockets[0]!, label: 'X1', x: 500 }),
    );
    expect(problem).toMatchObject({ code: 'lane-twice', severity: 'error', pointer: '/sockets/32/holds/0' });
    expect(problem!.message).toContain('two chips, U10 and X1');
  });

  it('with a gap or an overlap of word ranges', () => {
    const deep = { banks: 1, deep: 2, formats: ['code'] as const };
    expect(only(deep, (d) => void (d.sockets[8]!.holds[0]!.words = { from: 70_000, to: 131_071 }))).toBe(
      'words-gap /memory/banks/0; family-half-used /sockets/8/family',
    );
    expect(only(deep, (d) => void (d.sockets[8]!.holds[0]!.words = { from: 65_535, to: 131_070 }))).toBe(
      'words-overlap /sockets/8/holds/0; words-gap /memory/banks/0',
    );
    expect(only(deep, (d) => void (d.sockets[0]!.holds[0]!.words = { from: 100, to: 65_535 }))).toContain(
      'words-gap /memory/banks/0',
    );
  });

  it('beyond the bank, the word or the bits of the bank', () => {
    expect(only({ formats: ['code'] }, (d) => void (d.sockets[0]!.holds[0]!.bank = 'Q'))).toContain(
      'unknown-bank /sockets/0/holds/0/bank',
    );
    expect(only({ formats: ['code'] }, (d) => void (d.sockets[0]!.holds[0]!.bit = 9))).toContain(
      'bit-out-of-range /sockets/0/holds/0/bit',
    );
    expect(only({ formats: ['code'] }, (d) => void (d.memory.banks[0]!.bits = [1, 2, 3, 4, 5, 6, 7]))).toContain(
      'bit-not-in-bank /sockets/0/holds/0/bit',
    );
    expect(
      only({ formats: ['code'] }, (d) => void (d.sockets[0]!.holds[0]!.words = { from: 0, to: 65_536 })),
    ).toContain('words-out-of-range /sockets/0/holds/0/words');
  });
});

describe('names', () => {
  it('used twice', () => {
    expect(only({}, (d) => void (d.sockets[1]!.label = 'U10'))).toContain('label-twice /sockets/1/label');
    expect(only({}, (d) => void (d.sharedParts[0]!.label = 'U10'))).toBe('label-twice /sharedParts/0/label');
    expect(only({}, (d) => void (d.memory.banks[1]!.id = 'A'))).toContain('id-twice /memory/banks/1/id');
    expect(only({ formats: ['code', 'mask'] }, (d) => void (d.reportFormats[1]!.id = 'code'))).toBe(
      'id-twice /reportFormats/1/id',
    );
  });

  it('of bits that are too few, alike or of no bit', () => {
    expect(only({ formats: ['code'] }, (d) => void (d.memory.bitNames = ['A', 'A']))).toBe(
      'bit-names-count /memory/bitNames; bit-name-twice /memory/bitNames/1',
    );
    expect(only({ formats: ['code'] }, (d) => void (d.memory.checkBits = [8]))).toBe(
      'bit-out-of-range /memory/checkBits/0',
    );
  });
});

describe('places', () => {
  it('that cover one another, also only once a socket is turned', () => {
    expect(only({}, (d) => void (d.sockets[1]!.x = 3))).toBe('sockets-cover /sockets/1');
    expect(only({}, (d) => void (d.sockets[1]!.x = 8))).toBe('');
    expect(only({}, (d) => ((d.sockets[1]!.x = 8), void (d.sockets[1]!.turn = 1)))).toBe('sockets-cover /sockets/1');
  });
});

describe('chips', () => {
  it('of a family that nobody knows', () => {
    const [problem] = found({ formats: ['code'] }, (d) => void (d.sockets[0]!.family = 'mystery'));
    expect(problem).toMatchObject({ code: 'unknown-family', pointer: '/sockets/0/family' });
  });

  it('that are too small, too narrow, or larger than what is used', () => {
    const family =
      (id: string): Change =>
      (d) =>
        d.sockets.forEach((socket) => void (socket.family = id));
    const codes = (change: Change) => [...new Set(found({ formats: ['code'] }, change).map(({ code }) => code))];
    expect(codes((d) => (family('dynamic-16k-1-three-rail')(d), void delete d.multiplexing))).toEqual(['family-size']);
    expect(codes((d) => (family('dynamic-256k-1')(d), void delete d.multiplexing))).toEqual(['family-half-used']);
    expect(codes((d) => void (d.sockets[0]!.holds[0]!.pin = 1))).toEqual(['family-width']);
  });

  it('one of whose pins stands for two bits', () => {
    expect(only({ chipWidth: 4, formats: ['code'] }, (d) => void (d.sockets[0]!.holds[1]!.pin = 0))).toBe(
      'pin-twice /sockets/0/holds/1',
    );
  });

  it('whose supply pins do not fit the rails', () => {
    const rails =
      (...list: [number, number][]): Change =>
      (d) =>
        void (d.rails = list.map(([volts, pin]) => ({ name: `R${pin}`, volts, tolerancePercent: 10, pins: [pin] })));
    expect(only({}, rails([5, 8], [0, 16]))).toBe('');
    expect(only({}, rails([12, 8]))).toBe('family-supply /rails/0/pins/0');
    expect(only({}, rails([5, 8], [5, 9]))).toBe('family-supply /rails/1/pins/0');
    expect(only({}, rails([5, 20], [5, 8]))).toBe('family-supply /rails/0/pins/0');
    expect(only({}, rails([0, 16]))).toBe('supply-without-rail /rails');
  });
});

describe('row and column', () => {
  it('bits that do not match the size of the chip', () => {
    expect(only({}, (d) => void d.multiplexing!.column.pop())).toBe('multiplexing-size /multiplexing');
    expect(only({}, (d) => void d.multiplexing!.column.push(16))).toBe('multiplexing-size /multiplexing/column/8');
    expect(only({}, (d) => void d.multiplexing!.column.push(0))).toBe('multiplexing-twice /multiplexing/column/8');
    expect(only({ chipWidth: 8 }, (d) => void (d.multiplexing = { row: [], column: [] }))).toBe(
      'multiplexing-static /multiplexing',
    );
  });
});

describe('shared parts', () => {
  it('that serve nothing, or what is not there', () => {
    expect(only({}, (d) => void (d.sharedParts[0]!.serves = { bits: [] }))).toBe(
      'part-serves-nothing /sharedParts/0/serves',
    );
    expect(only({}, (d) => void (d.sharedParts[0]!.serves = { banks: ['B'], sockets: ['U10'] }))).toBe(
      'part-serves-nothing /sharedParts/0/serves',
    );
    expect(only({}, (d) => void (d.sharedParts[0]!.serves = { sockets: ['Q1', 'U10'] }))).toBe(
      'unknown-socket /sharedParts/0/serves/sockets/0',
    );
    expect(only({}, (d) => void (d.sharedParts[0]!.serves = { bits: [0, 40] }))).toBe(
      'bit-out-of-range /sharedParts/0/serves/bits/1',
    );
    expect(only({}, (d) => void (d.sharedParts[0]!.serves = { addressBits: [16] }))).toBe(
      'address-bit-out-of-range /sharedParts/0/serves/addressBits/0',
    );
  });
});

describe('address windows', () => {
  const two = { banks: 2, formats: ['code'] as const };
  const windows = (d: LayoutDocument) => d.addressMap.windows;

  it('that overlap, unless a register keeps them apart', () => {
    const shift: Change = (d) => void (windows(d)[1]!.range = { from: 0xff00, to: 0x1feff });
    expect(only(two, shift)).toBe('window-overlap /addressMap/windows/1/range');
    const pages =
      (a: [string, number], b: [string, number]): Change =>
      (d) => {
        shift(d);
        [a, b].forEach(([name, value], n) => void (windows(d)[n]!.register = { name, value }));
      };
    expect(only(two, pages(['page', 1], ['page', 2]))).toBe('');
    expect(only(two, pages(['page', 1], ['page', 1]))).toBe('window-overlap /addressMap/windows/1/range');
    expect(found(two, pages(['page', 1], ['bank', 2]))[0]).toMatchObject({
      code: 'window-overlap',
      severity: 'warning',
    });
  });

  it('where something else is said to be', () => {
    expect(
      only(two, (d) => void (d.addressMap.elsewhere = [{ range: { from: 0x1ffff, to: 0x2ffff }, means: 'the ROM' }])),
    ).toBe('window-overlap /addressMap/elsewhere/0/range');
  });

  it('that are larger than their bank, or leave words without an address', () => {
    expect(only(two, (d) => void (windows(d)[1]!.range.to = 0x20000))).toBe(
      'window-size /addressMap/windows/1/banks/0',
    );
    expect(only(two, (d) => void (windows(d)[1]!.range.to = 0x1fffe))).toBe('words-without-address /memory/banks/1');
  });

  it('whose interleave does not tell the banks apart', () => {
    const options = { banks: 4, interleave: true, formats: ['code'] as const };
    const interleave = (value: number[][]) => only(options, (d) => void (windows(d)[0]!.interleave = value));
    expect(interleave([[0], [1]])).toBe('');
    expect(interleave([[0], [1, 0]])).toBe('');
    expect(
      interleave([
        [0, 1],
        [1, 0],
      ]),
    ).toBe('window-interleave /addressMap/windows/0/interleave');
    expect(interleave([[0], [0]])).toBe('window-interleave /addressMap/windows/0/interleave');
    expect(interleave([[0]])).toContain('window-bank-count /addressMap/windows/0/banks');
  });

  it('whose byte lanes do not match the word', () => {
    const options = { banks: 1, bits: 16, byteLanes: 'big-endian', formats: ['code'] } as const;
    expect(only(options, (d) => void windows(d)[0]!.lanes![0]!.pop())).toBe(
      'byte-lane-missing /addressMap/windows/0/lanes',
    );
    expect(only(options, (d) => void windows(d)[0]!.lanes![0]!.push(0))).toBe(
      'byte-lane-twice /addressMap/windows/0/lanes/1/0',
    );
    expect(only(options, (d) => void (windows(d)[0]!.range.to -= 1))).toContain(
      'window-size /addressMap/windows/0/range',
    );
  });

  it('of a bank that is not there', () => {
    expect(only(two, (d) => void (windows(d)[1]!.banks = ['Z']))).toContain(
      'unknown-bank /addressMap/windows/1/banks/0',
    );
  });
});

describe('report formats', () => {
  type Parts = NonNullable<LayoutDocumentInput['reportFormats']>[number]['parts'];
  const format = (parts: Parts, options: LayoutOptions = {}) => {
    const input = buildLayoutInput({ ...options, formats: [] });
    return validateLayout(
      layoutDocument.parse({ ...input, reportFormats: [{ id: 'f', name: 'F', after: 'stops', parts }] }),
    ).map(({ code, pointer, severity }) => `${severity} ${code} ${pointer}`);
  };

  it('that write two lanes alike', () => {
    const glued: Parts = [{ field: 'bank', notation: 'names' }, { field: 'bit' }];
    expect(format(glued, { banks: 12, bits: 16, bankNames: 'numbers' })).toEqual([
      'error format-alike /reportFormats/0',
    ]);
    expect(format(glued, { banks: 9, bits: 16, bankNames: 'numbers' })).toEqual([]);
  });

  it('that leave the bit open are pointed out', () => {
    expect(format([{ field: 'bank', notation: 'letter' }])).toEqual(['warning format-vague /reportFormats/0']);
  });

  it('that cannot say the parity bit are pointed out', () => {
    expect(format([{ field: 'bank', notation: 'letter' }, { field: 'bit' }], { parity: 1 })).toEqual([
      'warning format-cannot-say /reportFormats/0',
    ]);
  });

  it('that do not compile, with the place in the format', () => {
    expect(format([{ text: 'BAD RAM' }])).toEqual(['error format-names-nothing /reportFormats/0/parts']);
    expect(format([{ field: 'bank', notation: 'letter' }, { field: 'bank' }])).toEqual([
      'error format-field-twice /reportFormats/0/parts/1',
    ]);
    expect(format([{ field: 'address', notation: 'hexadecimal' }, { text: ' ' }, { field: 'read' }])).toEqual([
      'error format-written-missing /reportFormats/0/parts',
    ]);
    expect(format([{ field: 'bit', notation: 'words' }])).toEqual([
      'error format-notation /reportFormats/0/parts/0/notation',
    ]);
    expect(
      format(
        [
          {
            field: 'bit',
            table: [
              { text: 'P', bits: [8] },
              { text: 'P', bits: [1] },
            ],
          },
        ],
        { banks: 1 },
      ),
    ).toEqual([
      'error bit-out-of-range /reportFormats/0/parts/0/table/0/bits/0',
      'error format-table-twice /reportFormats/0/parts/0/table/1/text',
    ]);
  });

  it('that are not there at all', () => {
    expect(only({ formats: [] }, () => undefined)).toBe('no-formats /reportFormats');
  });

  it('whose test order names a bank that is not there', () => {
    expect(only({ formats: ['code'], testOrder: { banks: ['A', 'Q'] } }, () => undefined)).toBe(
      'unknown-bank /reportFormats/0/testOrder/banks/1',
    );
  });
});

describe('worked examples', () => {
  const example =
    (text: string, sockets: string[], format = 'code') =>
    (d: LayoutDocument) =>
      void (d.examples = [{ format, text, sockets }]);

  it('come out, or tell what comes out instead', () => {
    expect(only({ formats: ['code'] }, example('B-3', ['U21']))).toBe('');
    const [problem] = found({ formats: ['code'] }, example('B-3', ['U22']));
    expect(problem).toMatchObject({
      code: 'example-differs',
      pointer: '/examples/0/sockets',
      message: '"B-3" leads to U21, not to U22. Either the example or the layout is wrong.',
    });
  });

  it('of a code, a socket or a format that does not exist', () => {
    expect(only({ formats: ['code'] }, example('B-9', ['U21']))).toBe('example-unread /examples/0/text');
    expect(only({ formats: ['code'] }, example('B-3', ['Q21']))).toBe('unknown-socket /examples/0/sockets/0');
    expect(only({ formats: ['code'] }, example('B-3', ['U21'], 'nothing'))).toBe('unknown-format /examples/0/format');
  });

  it('with an address name only the chip that holds the word', () => {
    const deep = { banks: 1, deep: 2, formats: ['log'] as const };
    expect(only(deep, example('10001 W 00 R 02', ['U19'], 'log'))).toBe('');
    expect(only(deep, example('00001 W 00 R 02', ['U19'], 'log'))).toBe('example-differs /examples/0/sockets');
  });
});

describe('a screen map', () => {
  const screen =
    (change: Partial<LayoutDocument['screenMap'] & object> = {}): Change =>
    (d) =>
      void (d.screenMap = {
        width: 256,
        height: 192,
        base: 0x1000,
        unitsPerLine: 32,
        pixelsPerUnit: 8,
        lineWeights: Array.from({ length: 8 }, (_, n) => 32 << n),
        planes: [{ name: 'white', colour: 'white', bits: [7, 6, 5, 4, 3, 2, 1, 0] }],
        turn: 0,
        ...change,
      });

  it('that lies in the memory has no problem', () => expect(only({ banks: 1 }, screen())).toBe(''));

  it('that reaches outside every window, or does not add up', () => {
    expect(only({ banks: 1 }, screen({ base: 0xf000 }))).toBe('screen-outside /screenMap/planes/0');
    expect(only({ banks: 1 }, screen({ width: 257 }))).toBe('screen-width /screenMap/width');
    expect(only({ banks: 1 }, screen({ height: 300 }))).toBe('screen-lines /screenMap/lineWeights');
    expect(only({ banks: 1 }, screen({ pixelsPerUnit: 9 }))).toBe('screen-bits /screenMap/planes/0/bits');
  });
});

describe('validation', () => {
  it('lists all problems at once', () => {
    const codes = found({ formats: ['code'] }, (d) => {
      d.sockets[0]!.family = 'mystery';
      d.sockets[1]!.label = 'U10';
      d.sharedParts[0]!.serves = { bits: [] };
      d.addressMap.windows[0]!.banks = ['Q'];
      d.examples = [{ format: 'none', text: 'x', sockets: ['U11'] }];
    }).map(({ code }) => code);
    expect(codes).toEqual(
      expect.arrayContaining([
        'unknown-family',
        'label-twice',
        'part-serves-nothing',
        'unknown-bank',
        'unknown-format',
      ]),
    );
  });

  it('never throws, whatever a document that meets the schema refers to', () => {
    const base = buildLayoutInput({ banks: 2, bits: 8, deep: 2, formats: formatKinds });
    const bank = fc.constantFrom('A', 'B', 'Q');
    const bit = fc.integer({ min: 0, max: 71 });
    const place = fc.integer({ min: 0, max: 39 });
    const window = fc.record({
      range: fc
        .tuple(fc.nat({ max: 300_000 }), fc.nat({ max: 300_000 }))
        .map(([from, size]) => ({ from, to: from + size })),
      banks: fc.array(bank, { minLength: 1, maxLength: 4 }),
      interleave: fc.array(fc.array(place, { minLength: 1, maxLength: 3 }), { maxLength: 3 }),
      lanes: fc.option(fc.array(fc.array(bit, { minLength: 1, maxLength: 9 }), { minLength: 1, maxLength: 3 }), {
        nil: undefined,
      }),
      firstWord: fc.nat({ max: 200_000 }),
    });
    const holds = fc.array(fc.record({ pin: fc.nat({ max: 9 }), bank, bit, at: fc.nat({ max: 99_999 }) }), {
      minLength: 1,
      maxLength: 3,
    });
    const field = fc.record({
      field: fc.constantFrom(
        'bank',
        'bit',
        'mask',
        'address',
        'written',
        'read',
        'lane',
        'socket',
        'count',
        'syndrome',
        'ignored',
      ),
      notation: fc.constantFrom(
        'decimal',
        'hexadecimal',
        'octal',
        'binary',
        'letter',
        'one-hot',
        'flashes',
        'names',
        'words',
      ),
      first: fc.constantFrom(0, 1, 'unknown'),
      bitOrder: fc.constantFrom('low-first', 'high-first', 'unknown'),
      bits: fc.option(fc.array(bit, { minLength: 1, maxLength: 9 }), { nil: undefined }),
      shift: fc.nat({ max: 20 }),
      table: fc.array(
        fc.record({
          text: fc.constantFrom('0', 'P', '00'),
          value: fc.option(fc.nat({ max: 300 }), { nil: undefined }),
          bits: fc.option(fc.array(bit, { maxLength: 2 }), { nil: undefined }),
        }),
        { maxLength: 2 },
      ),
    });
    const documents = fc.record({
      sockets: fc.array(holds, { maxLength: 4 }),
      windows: fc.array(window, { maxLength: 3 }),
      parts: fc.array(fc.oneof(field, fc.record({ text: fc.constantFrom(' ', '-', 'ERR ') })), {
        minLength: 1,
        maxLength: 5,
      }),
      bankBits: fc.option(fc.array(bit, { minLength: 1, maxLength: 5 }), { nil: undefined }),
      written: fc.option(fc.nat({ max: 255 }), { nil: undefined }),
      text: fc.string({ unit: fc.constantFrom(...'01FA -P'), minLength: 1, maxLength: 8 }).map((text) => `0${text}0`),
    });
    let accepted = 0;
    fc.assert(
      fc.property(documents, ({ sockets, windows, parts, bankBits, written, text }) => {
        const parsed = layoutDocument.safeParse({
          ...base,
          memory: { ...base.memory, banks: [{ ...base.memory.banks[0], bits: bankBits }, base.memory.banks[1]] },
          sockets: base.sockets.map((socket, at) => ({ ...socket, holds: sockets[at] ?? socket.holds })),
          addressMap: { windows },
          reportFormats: [{ id: 'f', name: 'F', after: 'stops', parts, written }],
          examples: [{ format: 'f', text, sockets: ['U10'] }],
        });
        if (!parsed.success) return;
        accepted++;
        for (const problem of validateLayout(parsed.data)) expect(problem.message).toMatch(/[.?!]$/);
      }),
      { seed: 3, numRuns: 300 },
    );
    expect(accepted).toBeGreaterThan(200);
  });
});
