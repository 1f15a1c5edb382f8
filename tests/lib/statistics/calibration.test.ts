import fc from 'fast-check';
import { brierScore, expectedCalibrationError, reliabilityCurve } from '@/lib';

const said = (probability: number, happened: number, count: number) =>
  Array.from({ length: count }, (_, at) => ({ probability, happened: at < happened }));

const predictions = fc.array(
  fc.record({ probability: fc.double({ min: 0, max: 1, noNaN: true }), happened: fc.boolean() }),
  { minLength: 1, maxLength: 200 },
);

describe('the Brier score', () => {
  it('is 0 for what was said for certain and came so, 1 for what did not, a quarter for an even chance', () => {
    expect(brierScore([{ probability: 1, happened: true }])).toBe(0);
    expect(brierScore([{ probability: 1, happened: false }])).toBe(1);
    expect(brierScore(said(0.5, 3, 10))).toBeCloseTo(0.25, 12);
    expect(brierScore([])).toBeNull();
  });

  /** A. H. Murphy, A new vector partition of the probability score, J. Appl. Meteor. 12 (1973) 595-600. */
  it('parts into reliability, resolution and uncertainty where each bin holds one stated value', () => {
    const all = [...said(0.15, 4, 20), ...said(0.55, 9, 15), ...said(0.95, 30, 31)];
    const base = 43 / 66;
    const bins = reliabilityCurve(all).filter(({ count }) => count > 0);
    const reliability = bins.reduce((sum, b) => sum + b.count * (b.stated! - b.seen!) ** 2, 0) / 66;
    const resolution = bins.reduce((sum, b) => sum + b.count * (b.seen! - base) ** 2, 0) / 66;
    expect(brierScore(all)).toBeCloseTo(reliability - resolution + base * (1 - base), 12);
  });
});

describe('the reliability curve', () => {
  it('counts what came to be of what was stated in each tenth', () => {
    const curve = reliabilityCurve([...said(0.05, 1, 10), ...said(0.72, 6, 8), ...said(1, 4, 4)]);
    expect(curve).toHaveLength(10);
    expect(curve[0]).toMatchObject({ from: 0, to: 0.1, count: 10, seen: 0.1 });
    expect(curve[7]!.stated).toBeCloseTo(0.72, 12);
    expect(curve[7]!.seen).toBe(0.75);
    expect(curve[9]).toMatchObject({ count: 4, stated: 1, seen: 1 });
    expect(curve[4]).toMatchObject({ count: 0, stated: null, seen: null, interval: { low: 0, high: 1 } });
  });

  it('loses no prediction, and keeps the stated mean inside its bin', () => {
    fc.assert(
      fc.property(predictions, fc.integer({ min: 1, max: 30 }), (all, bins) => {
        const curve = reliabilityCurve(all, bins);
        expect(curve.reduce((sum, { count }) => sum + count, 0)).toBe(all.length);
        for (const { from, to, stated } of curve)
          if (stated !== null) {
            expect(stated).toBeGreaterThanOrEqual(from - 1e-12);
            expect(stated).toBeLessThanOrEqual(to + 1e-12);
          }
      }),
    );
  });

  it('refuses numbers that are no probability', () => {
    expect(() => reliabilityCurve([{ probability: 1.2, happened: true }])).toThrow(RangeError);
    expect(() => brierScore([{ probability: Number.NaN, happened: true }])).toThrow(RangeError);
    expect(() => reliabilityCurve([], 0)).toThrow(RangeError);
  });
});

describe('the expected calibration error', () => {
  it('is the weighted distance of stated and seen share', () => {
    // 10 at 0.9 of which 7 came, 30 at 0.2 of which 6 came: 10/40 x 0.2 + 30/40 x 0.
    expect(expectedCalibrationError([...said(0.9, 7, 10), ...said(0.2, 6, 30)])).toBeCloseTo(0.05, 12);
    expect(expectedCalibrationError([])).toBeNull();
  });

  it('is 0 where every bin came as stated, and never more than 1', () => {
    expect(expectedCalibrationError([...said(0.25, 5, 20), ...said(0.75, 15, 20)])).toBeCloseTo(0, 12);
    fc.assert(
      fc.property(predictions, (all) => {
        const error = expectedCalibrationError(all)!;
        expect(error).toBeGreaterThanOrEqual(0);
        expect(error).toBeLessThanOrEqual(1);
      }),
    );
  });
});
