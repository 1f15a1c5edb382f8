import fc from 'fast-check';
import { lane } from '@/lib/brand';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { compileFormat } from '@/lib/report/compile-format';
import type { LayoutDocument } from '@/shared';
import { buildFormat } from '@/tests/factories/format';
import { type FormatKind, type LayoutOptions, buildLayout, formatKinds } from '@/tests/factories/layout';

function ready(document: LayoutDocument, id: string) {
  const index = buildLayoutIndex(document);
  const compiled = compileFormat(
    document.reportFormats.find((format) => format.id === id)!,
    index,
  );
  if (!compiled.ok) throw new Error(compiled.reasons.map(({ message }) => message).join(' '));
  return { index, format: compiled.format };
}

const boards: readonly (readonly [string, LayoutOptions])[] = [
  ['one bank of eight', { banks: 1 }],
  ['four banks named by letters', { banks: 4 }],
  ['twelve banks counted from 1, with parity', { banks: 12, bankNames: 'numbers-from-1', first: 1, parity: 1 }],
  ['bit 0 at the high end', { banks: 2, bitOrder: 'high-first' }],
  ['conventions unknown', { banks: 2, first: 'unknown', bitOrder: 'unknown' }],
  ['interleaved 16 bits in byte lanes', { banks: 2, bits: 16, interleave: true, byteLanes: 'big-endian' }],
  ['four-bit chips', { banks: 3, chipWidth: 4 }],
  ['eight-bit chips, two deep', { banks: 2, bits: 16, chipWidth: 8, deep: 2 }],
  ['a word of 72 bits', { banks: 2, bits: 64, parity: 8 }],
];

describe.each(boards)('a board with %s', (_, options) => {
  it.each(formatKinds)('says each lane in the %s format, and the text leads back to it', (kind) => {
    const { index, format } = ready(buildLayout({ ...options, formats: [kind] }), kind);
    let said = 0;
    for (const at of index.lanes) {
      const written = format.write([lane(at)]);
      if (!written.ok) continue;
      said++;
      const read = format.read(written.text);
      if (!read.ok) throw new Error(`${written.text}: ${read.reason}`);
      expect(read.notes).toEqual([]);
      expect(read.text).toBe(written.text);
      expect(read.readings.some(({ failing }) => failing.some((bad) => bad.lane === at))).toBe(true);
    }
    const dataOnly = (kind === 'address-mask' || kind === 'log') && (options.parity ?? 0) > 0;
    expect(said).toBe(dataOnly ? index.lanes.length - index.bankCount * (options.parity ?? 0) : index.lanes.length);
  });

  it.each(formatKinds)('lets every code of the %s format be typed key by key', (kind) => {
    const { index, format } = ready(buildLayout({ ...options, formats: [kind] }), kind);
    const step = Math.ceil(index.lanes.length / 12);
    for (let n = 0; n < index.lanes.length; n += step) {
      const at = index.lanes[n]!;
      const written = format.write([lane(at)]);
      if (!written.ok) continue;
      let typed = '';
      while (typed.length < written.text.length) {
        const prefix = format.next(typed);
        expect(prefix.reason).toBeNull();
        expect(prefix.possible).toContain(at);
        const rest = written.text.slice(typed.length);
        expect(prefix.fills === '' || rest.startsWith(prefix.fills)).toBe(true);
        const key = prefix.keys.find(({ text, enabled }) => enabled && rest.startsWith(text));
        if (prefix.fills === '' && key === undefined) throw new Error(`no key after "${typed}" of "${written.text}"`);
        typed += prefix.fills || key!.text;
      }
      const whole = format.next(typed);
      expect(whole.complete).toBe(true);
      expect(whole.possible).toContain(at);
    }
  });
});

describe('a mask', () => {
  it.each(['mask', 'address-mask', 'log', 'read-only'] as const)(
    'of several bits in the %s format comes back whole',
    (kind) => {
      const { format } = ready(buildLayout({ banks: 2, formats: [kind] }), kind);
      const written = format.write([lane(9), lane(12), lane(15)]);
      const read = format.read(written.ok ? written.text : '');
      expect(
        read.ok && read.readings.map(({ failing }) => failing.map((bad) => bad.lane as number).sort((a, b) => a - b)),
      ).toEqual([[9, 12, 15]]);
    },
  );
});

describe('any text at all', () => {
  const texts = fc.oneof(
    fc.string({ unit: 'binary', maxLength: 40 }),
    fc.string({ unit: fc.constantFrom(...'0123456789ABCDEFOSlI -WRLONGSHT８'), maxLength: 30 }),
    fc.string({ unit: fc.constantFrom('0', '1', ' ', '-'), minLength: 400, maxLength: 700 }),
  );
  const options = fc.record({
    banks: fc.constantFrom(1, 4, 12),
    parity: fc.constantFrom(0, 1),
    first: fc.constantFrom<0 | 1 | 'unknown'>(0, 1, 'unknown'),
  });

  it('is read, or refused with a reason, and never thrown at', () => {
    const made = new Map<string, ReturnType<typeof ready>>();
    fc.assert(
      fc.property(texts, fc.constantFrom<FormatKind>(...formatKinds), options, (text, kind, board) => {
        const key = JSON.stringify([kind, board]);
        if (!made.has(key))
          made.set(
            key,
            ready(
              buildLayout({ ...board, bankNames: board.banks === 12 ? 'numbers' : 'letters', formats: [kind] }),
              kind,
            ),
          );
        const { format } = made.get(key)!;
        const read = format.read(text);
        if (read.ok) expect(read.readings.length).toBeGreaterThan(0);
        else expect(read.reason).toMatch(/[.!?]$/);
        const prefix = format.next(text);
        expect(prefix.keys.map((k) => k.text)).toEqual(format.next('').keys.map((k) => k.text));
      }),
      { seed: 5, numRuns: 500 },
    );
  });
});

describe('a code of many numbers without a sign between them', () => {
  const counts = Array.from({ length: 30 }, () => ({ field: 'count' as const }));
  const glued = buildFormat({
    parts: [{ field: 'bank', notation: 'letter' }, ...counts, { field: 'bit', notation: 'octal' }],
  });

  it.each(['A' + '1'.repeat(40) + 'X', 'A' + '1'.repeat(511), 'A' + '1 '.repeat(250)])(
    'is refused or read without trying every split: %s',
    (text) => {
      // Every way to split 40 digits into 31 numbers would outlast the test by far.
      expect(glued.format.read(text).ok).toBe(false);
      expect(glued.format.next(text).possible).toBeDefined();
    },
  );
});
