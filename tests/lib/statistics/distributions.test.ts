import fc from 'fast-check';
import { jStat } from 'jstat';
import { betaQuantile, betaShareBelow } from '@/lib/statistics/beta';
import { normalQuantile } from '@/lib/statistics/normal';

const closeTo = (value: number, other: number, relative: number) =>
  expect(Math.abs(value - other)).toBeLessThanOrEqual(relative * Math.max(Math.abs(other), 1e-300));

describe('the normal quantile', () => {
  // Tables of the normal distribution: 95 % two-sided, 99 % two-sided, one in a thousand.
  it.each([
    [0.975, 1.959963984540054],
    [0.995, 2.5758293035489004],
    [0.001, -3.0902323061678132],
    [0.5, 0],
  ])('at %p is %p', (p, value) => {
    expect(normalQuantile(p)).toBeCloseTo(value, 14);
  });

  it('agrees with jStat from one in a billion up', () => {
    fc.assert(
      fc.property(fc.double({ min: -9, max: -0.302, noNaN: true }), (exponent) => {
        const p = 10 ** exponent;
        closeTo(normalQuantile(p), jStat.normal.inv(p, 0, 1), 1e-9);
      }),
      { numRuns: 3000 },
    );
  });

  it('is odd about a half', () => {
    for (const p of [0.01, 0.1, 0.3, 0.49]) expect(normalQuantile(1 - p)).toBeCloseTo(-normalQuantile(p), 13);
  });

  it('has no value outside 0 to 1 and reaches without end at both', () => {
    expect([normalQuantile(0), normalQuantile(1)]).toEqual([-Infinity, Infinity]);
    expect(() => normalQuantile(1.1)).toThrow(RangeError);
    expect(() => normalQuantile(Number.NaN)).toThrow(RangeError);
  });
});

describe('the beta distribution', () => {
  const shape = fc.double({ min: 0.5, max: 400, noNaN: true });

  it('has the share below a value that jStat gives', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 0.999, noNaN: true }), shape, shape, (x, a, b) => {
        expect(betaShareBelow(x, a, b)).toBeCloseTo(jStat.beta.cdf(x, a, b), 7);
      }),
      { numRuns: 3000 },
    );
  });

  /** The binomial sum, exact: I_x(k, n - k + 1) is the chance of k or more in n (DLMF 8.17.5). */
  it('is the binomial tail where both shapes are whole', () => {
    const tail = (x: number, k: number, n: number) => {
      let sum = 0;
      let choose = 1;
      for (let j = 0; j <= n; j++) {
        if (j >= k) sum += choose * x ** j * (1 - x) ** (n - j);
        choose = (choose * (n - j)) / (j + 1);
      }
      return sum;
    };
    for (const [x, k, n] of [
      [0.03, 1, 20],
      [0.5, 7, 14],
      [0.9, 18, 20],
    ] as const)
      expect(betaShareBelow(x, k, n - k + 1)).toBeCloseTo(tail(x, k, n), 13);
  });

  it('has quantiles that lead back to their share', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-4, max: 0.9999, noNaN: true }), shape, shape, (p, a, b) => {
        expect(betaShareBelow(betaQuantile(p, a, b), a, b)).toBeCloseTo(p, 9);
      }),
      { numRuns: 500 },
    );
  });

  it('has the quantiles of jStat', () => {
    for (const [p, a, b] of [
      [0.025, 2, 30],
      [0.975, 2, 30],
      [0.5, 0.5, 20.5],
      [0.9, 120, 4],
    ] as const)
      expect(betaQuantile(p, a, b)).toBeCloseTo(jStat.beta.inv(p, a, b), 7);
  });

  it('refuses shapes that are not above 0', () => {
    expect(() => betaShareBelow(0.5, 0, 1)).toThrow(RangeError);
    expect(() => betaQuantile(0.5, 1, -1)).toThrow(RangeError);
    expect(() => betaQuantile(2, 1, 1)).toThrow(RangeError);
  });
});
