import { soakBound } from '@/lib';

/** Rule of three: J. A. Hanley, A. Lippman-Hand, JAMA 249 (1983) 1743-1745 (from memory). */
describe('a soak without a failure', () => {
  it('of 24 hours shows that failures are rarer than once in 8 hours', () => {
    expect(soakBound(24)!.rarerThanHours).toBe(8);
  });

  it.each([1, 8, 24, 72])('of %i hours bounds the chance in one hour by 1 - 0.05^(1/n)', (hours) => {
    const { mostPerHour, rarerThanHours } = soakBound(hours)!;
    expect(mostPerHour).toBeCloseTo(1 - 0.05 ** (1 / hours), 14);
    // So long a soak passes a board that bad just once in twenty times.
    expect((1 - mostPerHour) ** hours).toBeCloseTo(0.05, 12);
    expect(mostPerHour).toBeLessThanOrEqual(1 / rarerThanHours);
  });

  it('takes another confidence at its logarithm', () => {
    expect(soakBound(10, 0.9)!.rarerThanHours).toBeCloseTo(10 / Math.log(10), 12);
  });

  it('shows nothing when it did not run', () => {
    expect(soakBound(0)).toBeNull();
    expect(() => soakBound(-1)).toThrow(RangeError);
    expect(() => soakBound(1, 1)).toThrow(RangeError);
  });
});
