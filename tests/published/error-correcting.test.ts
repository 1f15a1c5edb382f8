import { buildLayoutIndex, classifySyndrome, compileFormat, syndromeOf, validateCode, type ErrorCode } from '@/lib';
import { lane } from '@/lib/brand';
import type { LayoutDocument } from '@/shared';
import { buildLayout } from '@/tests/factories/layout';
import { hamming74, mvmeSyndromes } from './error-correcting';

const { data, check, likelyMisprint } = mvmeSyndromes;
const hex = (text: string) => Number.parseInt(text, 16);
const mvme: ErrorCode = { kind: 'sec-ded', columns: [...data, ...check].map(hex) };

/** A board of 31 data bits and 7 check bits whose machine shows the bank and the syndrome of that manual. */
function mvmeFormat() {
  const board: LayoutDocument = buildLayout({ banks: 1, bits: 31, parity: 7 });
  const parts = [
    { text: 'SYN ' },
    {
      ...board.reportFormats[0]!.parts.find((part) => 'field' in part)!,
      field: 'syndrome' as const,
      notation: 'hexadecimal' as const,
      digits: { min: 2, max: 2 },
      table: [],
      code: { kind: mvme.kind, columns: [...mvme.columns] },
    },
  ];
  const index = buildLayoutIndex(board);
  const compiled = compileFormat({ ...board.reportFormats[0]!, parts, bank: 'A', after: 'lists-lanes' }, index);
  if (!compiled.ok) throw new Error(compiled.reasons.map(({ message }) => message).join(' '));
  return compiled.format;
}

describe("Motorola's MVME1X7P, Table 4-4", () => {
  const format = mvmeFormat();

  it.each(data.map((syndrome, bit) => [syndrome, bit] as const))('%s is data bit %i, and back', (syndrome, bit) => {
    expect(classifySyndrome(mvme, hex(syndrome))).toEqual({ kind: 'single', bit });
    expect(format.read(`SYN ${syndrome}`)).toMatchObject({ ok: true, readings: [{ failing: [{ lane: bit }] }] });
    expect(format.write([lane(bit)])).toEqual({ ok: true, text: `SYN ${syndrome}` });
  });

  it.each(check.map((syndrome, at) => [syndrome, at] as const))('%s is check bit %i, and back', (syndrome, at) => {
    const bit = data.length + at;
    expect(classifySyndrome(mvme, hex(syndrome))).toEqual({ kind: 'check-bit', bit });
    expect(format.read(`SYN ${syndrome}`)).toMatchObject({ ok: true, readings: [{ failing: [{ lane: bit }] }] });
    expect(format.write([lane(bit)])).toEqual({ ok: true, text: `SYN ${syndrome}` });
  });

  it('00 is no error', () => {
    expect(classifySyndrome(mvme, hex(mvmeSyndromes.none))).toEqual({ kind: 'none' });
    expect(format.read('SYN 00')).toMatchObject({ ok: false, reason: 'Syndrome 00 means that no bit is wrong.' });
  });

  it('takes none of the 703 pairs of wrong bits for a single one', () => {
    expect(validateCode(mvme)).toEqual([]);
    let pairs = 0;
    for (let a = 0; a < mvme.columns.length; a++)
      for (let b = a + 1; b < mvme.columns.length; b++, pairs++)
        expect(classifySyndrome(mvme, syndromeOf(mvme, [a, b])).kind).toBe('double');
    expect(pairs).toBe(703);
  });

  it('would take 30 double errors for single ones with the 77 that is printed for bit 31', () => {
    const printed: ErrorCode = { kind: 'sec-ded', columns: [...data, likelyMisprint.syndrome, ...check].map(hex) };
    expect(validateCode(printed).length).toBeGreaterThan(0);
    const wrong: number[][] = [];
    for (let a = 0; a < 39; a++)
      for (let b = a + 1; b < 39; b++) if (printed.columns.includes(syndromeOf(printed, [a, b]))) wrong.push([a, b]);
    expect(wrong).toHaveLength(30);
  });
});

describe("Hamming's code of 1950 for four bits", () => {
  const checks = ['p1', 'p2', 'p3'] as const;
  // Read as p3 p2 p1, the column of a position has a 1 for each check that covers it.
  const columns = hamming74.order.map((_, at) =>
    checks.reduce(
      (sum, name, row) => sum + ((hamming74.covers[name] as readonly number[]).includes(at + 1) ? 2 ** row : 0),
      0,
    ),
  );
  const code: ErrorCode = { kind: 'hamming', columns };

  it.each(hamming74.order.map((name, at) => [name, at + 1] as const))(
    'gives for a wrong %s its position %i as the syndrome',
    (name, position) => {
      expect(syndromeOf(code, [position - 1])).toBe(position);
      expect(classifySyndrome(code, position)).toEqual({
        kind: name.startsWith('p') ? 'check-bit' : 'single',
        bit: position - 1,
      });
    },
  );

  it('takes any two wrong bits for a third, as it detects one only', () => {
    expect(validateCode(code)).toEqual([]);
    expect(validateCode({ ...code, kind: 'sec-ded' }).length).toBeGreaterThan(0);
    expect(classifySyndrome(code, syndromeOf(code, [0, 1]))).toEqual({ kind: 'single', bit: 2 });
  });
});
