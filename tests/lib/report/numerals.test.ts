import fc from 'fast-check';
import { digitsOfOnes, lettersOf, numberOf, numberOfLetters, onesOf, onesOfNumber } from '@/lib/report/numerals';

const radix = fc.constantFrom(2, 8, 10, 16);

describe('numbers in a code', () => {
  it('have the same ones in every base, however long', () => {
    fc.assert(
      fc.property(radix, fc.bigInt({ min: 0n, max: 2n ** 72n }), (base, value) => {
        const ones = onesOf(value.toString(base).toUpperCase(), base);
        expect(ones).toEqual(onesOfNumber(value));
        expect(digitsOfOnes(ones, base)).toBe(value.toString(base).toUpperCase());
      }),
      { seed: 1 },
    );
  });

  it('are read as their value', () => {
    expect([numberOf('013052', 8), numberOf('52A7', 16), numberOf('0', 10)]).toEqual([0x162a, 0x52a7, 0]);
  });

  it('count in letters beyond Z', () => {
    expect([0, 25, 26, 701, 702].map(lettersOf)).toEqual(['A', 'Z', 'AA', 'ZZ', 'AAA']);
    fc.assert(
      fc.property(fc.nat({ max: 20_000 }), (n) => numberOfLetters(lettersOf(n)) === n),
      { seed: 2 },
    );
  });
});
