import { normalQuantile } from './normal';

/** A range of shares or rates. */
export interface Interval {
  readonly low: number;
  readonly high: number;
}

/**
 * Range in which a share lies when `successes` of `trials` were seen, 95 % unless said otherwise; from 0 to 1 where
 * nothing was tried. E. B. Wilson, Probable inference, the law of succession, and statistical inference, JASA 22
 * (1927) 209-212. Throws RangeError where the counts are not 0 <= successes <= trials or the confidence not between
 * 0 and 1.
 */
export function wilsonInterval(successes: number, trials: number, confidence = 0.95): Interval {
  if (!(successes >= 0 && successes <= trials && Number.isFinite(trials)))
    throw new RangeError(`${successes} of ${trials} is no count.`);
  if (!(confidence > 0 && confidence < 1)) throw new RangeError('A confidence lies between 0 and 1.');
  if (trials === 0) return { low: 0, high: 1 };
  const z = normalQuantile(0.5 + confidence / 2);
  const share = successes / trials;
  const scale = 1 + (z * z) / trials;
  const centre = (share + (z * z) / (2 * trials)) / scale;
  const half = (z * Math.sqrt((share * (1 - share)) / trials + (z * z) / (4 * trials * trials))) / scale;
  // Rounding must not leave a sliver beyond a share of exactly 0 or 1.
  return {
    low: successes === 0 ? 0 : Math.max(0, centre - half),
    high: successes === trials ? 1 : Math.min(1, centre + half),
  };
}
