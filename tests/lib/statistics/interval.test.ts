import fc from 'fast-check';
import { jStat } from 'jstat';
import { wilsonInterval } from '@/lib';

/** Worked by hand with Wilson's formula (JASA 22, 1927, 209-212): 31 of 214 gives 0.10397 to 0.19828 at 95 %. */
it('holds 31 of 214 between 10.40 % and 19.83 %', () => {
  const { low, high } = wilsonInterval(31, 214);
  expect(31 / 214).toBeCloseTo(0.1449, 4);
  expect(low).toBeCloseTo(0.10397, 5);
  expect(high).toBeCloseTo(0.19828, 5);
});

it('has as ends the shares from which the count lies just at the edge of chance', () => {
  const count = fc
    .integer({ min: 1, max: 5000 })
    .chain((n) => fc.tuple(fc.integer({ min: 0, max: n }), fc.constant(n)));
  fc.assert(
    fc.property(count, fc.constantFrom(0.8, 0.95, 0.99), ([k, n], confidence) => {
      const { low, high } = wilsonInterval(k, n, confidence);
      const z = jStat.normal.inv(0.5 + confidence / 2, 0, 1);
      expect(low).toBeLessThanOrEqual(k / n);
      expect(high).toBeGreaterThanOrEqual(k / n);
      for (const end of [low, high]) {
        if (end === 0 || end === 1) continue;
        // The score test: (share - end)^2 = z^2 end (1 - end) / n.
        expect((k / n - end) ** 2).toBeCloseTo((z * z * end * (1 - end)) / n, 9);
      }
    }),
  );
});

it('ends at 0 and 1 where nothing or everything failed, and says nothing of no trials', () => {
  expect(wilsonInterval(0, 10).low).toBe(0);
  expect(wilsonInterval(0, 10).high).toBeCloseTo(0.2775, 4);
  expect(wilsonInterval(10, 10).high).toBe(1);
  expect(wilsonInterval(0, 0)).toEqual({ low: 0, high: 1 });
});

it('refuses what is no count', () => {
  expect(() => wilsonInterval(3, 2)).toThrow(RangeError);
  expect(() => wilsonInterval(-1, 2)).toThrow(RangeError);
  expect(() => wilsonInterval(1, 2, 1)).toThrow(RangeError);
});
