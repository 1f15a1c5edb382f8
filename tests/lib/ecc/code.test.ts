import fc from 'fast-check';
import { type ErrorCode, classifySyndrome, highestSyndrome, syndromeOf, validateCode } from '@/lib';

const ones = (value: number) => value.toString(2).split('1').length - 1;

/** A random code of its kind: the check bits first, then any columns that the kind allows. */
const anyCode: fc.Arbitrary<ErrorCode> = fc
  .record({
    kind: fc.constantFrom('hamming' as const, 'sec-ded' as const),
    checks: fc.integer({ min: 4, max: 8 }),
    size: fc.integer({ min: 1, max: 64 }),
    seed: fc.infiniteStream(fc.nat()),
  })
  .map(({ kind, checks, size, seed }) => {
    const free = Array.from({ length: 2 ** checks - 1 }, (_, at) => at + 1).filter(
      (value) => ones(value) > 1 && (kind === 'hamming' || ones(value) % 2 === 1),
    );
    const data: number[] = [];
    while (data.length < size && free.length > 0)
      data.push(free.splice(Number(seed.next().value) % free.length, 1)[0]!);
    return { kind, columns: [...data, ...Array.from({ length: checks }, (_, at) => 2 ** at)] };
  });

/** Syndrome by the check equations one by one, without exclusive-or of columns: the parity of the flipped bits in each row. */
function byEquations(code: ErrorCode, flipped: readonly number[]): number {
  let syndrome = 0;
  for (let row = 0; row < 16; row++) {
    const inRow = flipped.filter((bit) => Math.floor(code.columns[bit]! / 2 ** row) % 2 === 1);
    syndrome += (inRow.length % 2) * 2 ** row;
  }
  return syndrome;
}

describe('a code that corrects errors', () => {
  it('leads from every single wrong bit back to that bit', () => {
    fc.assert(
      fc.property(anyCode, (code) => {
        expect(validateCode(code)).toEqual([]);
        for (let bit = 0; bit < code.columns.length; bit++) {
          const syndrome = syndromeOf(code, [bit]);
          expect(syndrome).toBe(byEquations(code, [bit]));
          const kind = ones(code.columns[bit]!) === 1 ? 'check-bit' : 'single';
          expect(classifySyndrome(code, syndrome)).toEqual({ kind, bit });
        }
      }),
      { numRuns: 60 },
    );
  });

  it('takes no pair of wrong bits for one where it detects two, and every pair for two', () => {
    fc.assert(
      fc.property(anyCode, (code) => {
        const seen = new Map<number, number>();
        for (let a = 0; a < code.columns.length; a++)
          for (let b = a + 1; b < code.columns.length; b++) {
            const syndrome = byEquations(code, [a, b]);
            expect(syndromeOf(code, [a, b])).toBe(syndrome);
            const { kind } = classifySyndrome(code, syndrome);
            seen.set(syndrome, (seen.get(syndrome) ?? 0) + 1);
            if (code.kind === 'sec-ded') expect(kind).toBe('double');
            else expect(kind).toBe(code.columns.includes(syndrome) ? classifySyndrome(code, syndrome).kind : 'double');
          }
        // Whatever no single or double flip gives is not correctable.
        for (let syndrome = 1; syndrome <= highestSyndrome(code); syndrome++) {
          if (seen.has(syndrome) || code.columns.includes(syndrome)) continue;
          expect(classifySyndrome(code, syndrome)).toEqual({ kind: 'not-correctable' });
        }
      }),
      { numRuns: 25 },
    );
  });

  it('says of 0 that nothing is wrong, and knows no syndrome beyond its check bits', () => {
    const code: ErrorCode = { kind: 'hamming', columns: [3, 5, 6, 7, 1, 2, 4] };
    expect(classifySyndrome(code, 0)).toEqual({ kind: 'none' });
    expect(highestSyndrome(code)).toBe(7);
    for (const beyond of [8, -1, 1.5, Number.NaN])
      expect(classifySyndrome(code, beyond)).toEqual({ kind: 'out-of-range' });
    expect(() => syndromeOf(code, [7])).toThrow(RangeError);
  });
});

describe('a matrix that is no code', () => {
  it('has a column of 0, or one twice', () => {
    expect(validateCode({ kind: 'hamming', columns: [3, 0, 5, 3] })).toEqual([
      { column: 1, kind: 'zero', others: [] },
      { column: 3, kind: 'twice', others: [0] },
    ]);
  });

  it('lets two wrong bits look like one where it should detect them', () => {
    const columns = [7, 11, 1, 2, 4, 8, 12];
    expect(validateCode({ kind: 'hamming', columns })).toEqual([]);
    // 12 is 7 and 11 together, and 4 and 8 as well.
    expect(validateCode({ kind: 'sec-ded', columns })).toEqual([{ column: 6, kind: 'pair', others: [0, 1] }]);
  });

  it('is found exactly where some two flips give no syndrome of their own', () => {
    const any = fc.record({
      kind: fc.constantFrom('hamming' as const, 'sec-ded' as const),
      columns: fc.array(fc.integer({ min: 0, max: 63 }), { minLength: 1, maxLength: 12 }),
    });
    fc.assert(
      fc.property(any, (code) => {
        const { columns, kind } = code;
        let good = columns.every((column, at) => column !== 0 && columns.indexOf(column) === at);
        if (kind === 'sec-ded')
          for (let a = 0; a < columns.length; a++)
            for (let b = 0; b < a; b++) if (columns.includes(byEquations(code, [a, b]))) good = false;
        expect(validateCode(code).length === 0).toBe(good);
      }),
      { numRuns: 2000 },
    );
  });

  it('need not have odd weights: a parity over all bits does as well', () => {
    // Hamming's code for four bits with a parity bit over the whole word as the highest row.
    expect(validateCode({ kind: 'sec-ded', columns: [11, 13, 14, 15, 9, 10, 12, 8] })).toEqual([]);
  });
});
