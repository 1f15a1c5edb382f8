import { type Interval, wilsonInterval } from './interval';

/** A probability that was stated, and whether the thing came to be. */
export interface Prediction {
  /** From 0 to 1. */
  readonly probability: number;
  readonly happened: boolean;
}

/** The predictions whose probability lies in one bin. */
export interface ReliabilityBin {
  /** Bounds of the probability; the upper one belongs to the next bin, but to the last one itself. */
  readonly from: number;
  readonly to: number;
  readonly count: number;
  /** Mean of the stated probabilities; null in an empty bin. */
  readonly stated: number | null;
  /** Share that came to be; null in an empty bin. */
  readonly seen: number | null;
  /** Wilson interval of that share, 95 %. */
  readonly interval: Interval;
}

const usualBins = 10;

function checkPredictions(predictions: readonly Prediction[]): void {
  for (const { probability } of predictions)
    if (!(probability >= 0 && probability <= 1)) throw new RangeError(`${probability} is no probability.`);
}

/**
 * Mean squared distance of stated probabilities from what came to be: 0 is perfect, 0.25 is what a half always said
 * gets. Null where nothing was predicted. G. W. Brier, Verification of forecasts expressed in terms of probability,
 * Monthly Weather Review 78 (1950) 1-3, in its form for two outcomes. Throws RangeError for a number that is no
 * probability.
 */
export function brierScore(predictions: readonly Prediction[]): number | null {
  checkPredictions(predictions);
  if (predictions.length === 0) return null;
  const sum = predictions.reduce(
    (total, { probability, happened }) => total + (probability - Number(happened)) ** 2,
    0,
  );
  return sum / predictions.length;
}

/**
 * What came to be against what was stated, in bins of equal width (10 unless said otherwise). A. H. Murphy, R. L.
 * Winkler, Reliability of subjective probability forecasts, Applied Statistics 26 (1977) 41-47. Throws RangeError for
 * a number that is no probability, or fewer than one bin.
 */
export function reliabilityCurve(predictions: readonly Prediction[], bins = usualBins): ReliabilityBin[] {
  checkPredictions(predictions);
  if (!(Number.isInteger(bins) && bins > 0)) throw new RangeError('A reliability curve has one bin or more.');
  const stated = new Float64Array(bins);
  const count = new Float64Array(bins);
  const seen = new Float64Array(bins);
  for (const { probability, happened } of predictions) {
    const at = Math.min(bins - 1, Math.floor(probability * bins));
    stated[at]! += probability;
    count[at]! += 1;
    seen[at]! += Number(happened);
  }
  return Array.from(count, (n, at) => ({
    from: at / bins,
    to: (at + 1) / bins,
    count: n,
    stated: n === 0 ? null : stated[at]! / n,
    seen: n === 0 ? null : seen[at]! / n,
    interval: wilsonInterval(seen[at]!, n),
  }));
}

/**
 * Expected calibration error: the distance between stated and seen share in each bin, weighted with its predictions;
 * null where nothing was predicted. M. P. Naeini, G. F. Cooper, M. Hauskrecht, Obtaining well calibrated
 * probabilities using Bayesian binning, AAAI (2015) 2901-2907. Chance alone makes it larger than 0 where bins hold
 * few predictions. Throws RangeError as `reliabilityCurve` does.
 */
export function expectedCalibrationError(predictions: readonly Prediction[], bins = usualBins): number | null {
  if (predictions.length === 0) return null;
  const sum = reliabilityCurve(predictions, bins).reduce(
    (total, { count, stated, seen }) => total + count * Math.abs((stated ?? 0) - (seen ?? 0)),
    0,
  );
  return sum / predictions.length;
}
