import fc from 'fast-check';
import { jStat } from 'jstat';
import { priorsFor, socketRates } from '@/lib';

const counts = (boards: number, ...failed: number[]) => failed.map((one) => ({ failed: one, boards }));

describe('rates of sockets', () => {
  it('lie between the own share of a socket and the mean of its board', () => {
    const any = fc.array(
      fc
        .integer({ min: 0, max: 60 })
        .chain((boards) => fc.record({ boards: fc.constant(boards), failed: fc.integer({ min: 0, max: boards }) })),
      { minLength: 1, maxLength: 40 },
    );
    fc.assert(
      fc.property(any, (all) => {
        const { mean, strength, sockets } = socketRates(all);
        expect(strength).toBeGreaterThanOrEqual(10);
        if (mean === 0 || mean === 1) return;
        for (const [at, { rate, interval }] of sockets.entries()) {
          const { failed, boards } = all[at]!;
          const own = boards === 0 ? mean : failed / boards;
          expect(rate).toBeGreaterThanOrEqual(Math.min(own, mean) - 1e-12);
          expect(rate).toBeLessThanOrEqual(Math.max(own, mean) + 1e-12);
          expect(interval.low).toBeLessThanOrEqual(interval.high);
        }
      }),
    );
  });

  it('are the posterior of a beta prior, with its quantiles', () => {
    const { mean, strength, sockets } = socketRates(counts(40, 12, 1, 2, 0, 1, 2, 1, 3));
    const a = mean * strength + 12;
    const b = (1 - mean) * strength + 28;
    expect(sockets[0]!.rate).toBeCloseTo(a / (a + b), 12);
    expect(sockets[0]!.interval.low).toBeCloseTo(jStat.beta.inv(0.025, a, b), 6);
    expect(sockets[0]!.interval.high).toBeCloseTo(jStat.beta.inv(0.975, a, b), 6);
  });

  it('find back the spread that made them, where there are many reports', () => {
    // Rates of 0.05 and 0.15 in equal shares: a beta prior of that mean and variance counts for 0.1 * 0.9 / 0.05^2 - 1 = 35.
    const { mean, strength } = socketRates(
      Array.from({ length: 64 }, (_, at) => ({ failed: at % 2 ? 5000 : 15_000, boards: 100_000 })),
    );
    expect(mean).toBeCloseTo(0.1, 12);
    expect(strength).toBeGreaterThan(33);
    expect(strength).toBeLessThan(37);
  });

  it('do not tell sockets apart that differ no more than by chance', () => {
    const { strength, sockets } = socketRates(counts(50, 2, 2, 2, 2, 2, 2, 2, 2));
    expect(strength).toBe(Infinity);
    expect(new Set(sockets.map(({ rate }) => rate))).toEqual(new Set([0.04]));
  });

  it('refuse more failures than boards', () => {
    expect(() => socketRates([{ failed: 2, boards: 1 }])).toThrow(RangeError);
  });
});

describe('priors from the history', () => {
  it('leave every chip as it was where nothing is known', () => {
    expect(priorsFor(counts(0, 0, 0, 0)).chipFactor).toEqual([1, 1, 1]);
    expect(priorsFor(counts(9, 0, 0, 0, 0)).chipFactor).toEqual([1, 1, 1, 1]);
    expect(priorsFor([]).chipFactor).toEqual([]);
  });

  it('raise the chip that failed most, lower the others, and keep their mean', () => {
    const { chipFactor } = priorsFor(counts(40, 12, 1, 2, 0, 1, 2, 1, 3));
    expect(chipFactor.indexOf(Math.max(...chipFactor))).toBe(0);
    expect(chipFactor[0]).toBeGreaterThan(2);
    expect(chipFactor[3]).toBeLessThan(1);
    expect(chipFactor.reduce((sum, one) => sum + one, 0) / 8).toBeCloseTo(1, 12);
  });

  it('move little for a single report', () => {
    const { chipFactor } = priorsFor(counts(1, 1, 0, 0, 0, 0, 0, 0, 0));
    expect(chipFactor[0]).toBeLessThan(1.5);
    expect(chipFactor[1]).toBeGreaterThan(0.9);
  });

  it('stay between a fifth and twenty times', () => {
    const { chipFactor } = priorsFor(counts(100_000, 90_000, ...Array.from({ length: 63 }, () => 10)));
    expect(Math.max(...chipFactor)).toBe(20);
    expect(Math.min(...chipFactor)).toBe(0.2);
  });
});
