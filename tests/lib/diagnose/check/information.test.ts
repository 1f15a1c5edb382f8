import { entropyOf, expectedInformation, sharesAfter } from '@/lib/diagnose/check/information';

/** Chip, contact or trace, data line, other: estimates of the trade, worked example for "one bit, one bank, whole range". */
const prior = [0.78, 0.15, 0.04, 0.03];
/** The other outcome of a check that either shows something or does not. */
const orNot = (shown: number[]) => [shown, shown.map((p) => 1 - p)];

const swap = {
  moved: [0.9, 0.02, 0.01, 0.05],
  stays: [0.02, 0.58, 0.95, 0.75],
  clears: [0.06, 0.37, 0.02, 0.15],
  worse: [0.02, 0.03, 0.02, 0.05],
};

/** Likelihoods, minutes with risk, gain in bits and per minute as printed: estimates, worked example. */
const actions: [string, number[][], { minutes: number; bits: string; perMinute: string }][] = [
  ['swap two chips', Object.values(swap), { minutes: 8, bits: '0.54', perMinute: '0.067' }],
  ['substitute a good chip', orNot([0.95, 0.4, 0.02, 0.2]), { minutes: 8, bits: '0.31', perMinute: '0.039' }],
  ['ohmmeter leg to leg', orNot([0.01, 0.55, 0.02, 0.3]), { minutes: 6.5, bits: '0.23', perMinute: '0.035' }],
  ['feel for a hot chip', orNot([0.15, 0.01, 0.01, 0.02]), { minutes: 1, bits: '0.03', perMinute: '0.033' }],
  ['reseat and clean', orNot([0.06, 0.45, 0.02, 0.1]), { minutes: 5, bits: '0.10', perMinute: '0.020' }],
  ['lay a chip on top', orNot([0.5, 0.15, 0.02, 0.05]), { minutes: 5, bits: '0.09', perMinute: '0.019' }],
  ['scope the data pin', orNot([0.75, 0.3, 0.6, 0.3]), { minutes: 10, bits: '0.09', perMinute: '0.009' }],
  ['freeze or heat', orNot([0.2, 0.2, 0.03, 0.05]), { minutes: 5, bits: '0.01', perMinute: '0.002' }],
];

describe('expected information', () => {
  it('starts from 1.03 bits (estimates, worked example)', () => {
    expect(entropyOf(prior).toFixed(2)).toBe('1.03');
  });

  it.each(actions)('of %s is as printed (estimates, worked example)', (_, likelihoods, printed) => {
    const gain = expectedInformation(prior, likelihoods);
    expect(gain.toFixed(2)).toBe(printed.bits);
    expect((gain / printed.minutes).toFixed(3)).toBe(printed.perMinute);
  });

  it('after a swap: moved is the chip, stays the contact before the line, cleared is not finished (worked example)', () => {
    const rounded = (shares: number[]) => shares.map((share) => share.toFixed(2));
    expect(rounded(sharesAfter(prior, swap.moved))[0]).toBe('0.99');
    expect(rounded(sharesAfter(prior, swap.stays))).toEqual(['0.10', '0.53', '0.23', '0.14']);
    expect(rounded(sharesAfter(prior, swap.clears)).slice(0, 2)).toEqual(['0.43', '0.52']);
  });

  it('is nothing for a check that shows the same whatever is at fault, and everything for one that names it', () => {
    expect(expectedInformation(prior, [[1, 1, 1, 1]])).toBeCloseTo(0, 12);
    expect(
      expectedInformation(prior, [
        [0.3, 0.3, 0.3, 0.3],
        [0.7, 0.7, 0.7, 0.7],
      ]),
    ).toBeCloseTo(0, 12);
    const naming = prior.map((_, n) => prior.map((_, h) => (h === n ? 1 : 0)));
    expect(expectedInformation(prior, naming)).toBeCloseTo(entropyOf(prior), 12);
  });

  it('is never negative, nor more than what is unknown', () => {
    expect(expectedInformation([1, 0, 0, 0], Object.values(swap))).toBe(0);
    expect(expectedInformation([0, 0], [[1, 1]])).toBe(0);
  });
});
