import type { Score } from './score';

/** What was stated, and whether it was so. */
export interface Stated {
  readonly probability: number;
  readonly right: boolean;
}

/** The scores of many faults together. */
export class Tally {
  cases = 0;
  first = 0;
  inThree = 0;
  chipFirst = 0;
  pulled = 0;
  setSize = 0;
  setHolds = 0;
  naiveFirst = 0;
  naivePulled = 0;
  readonly stated: Stated[] = [];

  add(score: Score, naive: { first: boolean; pulled: number }): void {
    this.cases++;
    if (score.first) this.first++;
    if (score.inThree) this.inThree++;
    if (score.chipFirst) this.chipFirst++;
    if (score.set.holds) this.setHolds++;
    if (naive.first) this.naiveFirst++;
    this.pulled += score.pulled;
    this.setSize += score.set.size;
    this.naivePulled += naive.pulled;
    if (score.stated) this.stated.push(score.stated);
  }
}

/**
 * Expected calibration error: the mean distance between what was stated and how often it was so, over ten equal bins
 * of the stated probability, weighted by how many fall into each (M. P. Naeini, G. F. Cooper, M. Hauskrecht,
 * Obtaining well calibrated probabilities using Bayesian binning, AAAI 2015; from memory). Null without a statement.
 */
export function calibrationError(stated: readonly Stated[]): number | null {
  if (stated.length === 0) return null;
  const bins = Array.from({ length: 10 }, () => ({ count: 0, stated: 0, right: 0 }));
  for (const { probability, right } of stated) {
    const bin = bins[Math.min(9, Math.floor(probability * 10))]!;
    bin.count++;
    bin.stated += probability;
    if (right) bin.right++;
  }
  return bins.reduce((sum, bin) => sum + Math.abs(bin.stated - bin.right), 0) / stated.length;
}

/** A share as a percentage with one digit. */
export const percent = (part: number, of: number): string => (of === 0 ? '–' : `${((100 * part) / of).toFixed(1)} %`);

/** A mean with two digits. */
export const mean = (sum: number, of: number): string => (of === 0 ? '–' : (sum / of).toFixed(2));

/** A number with three digits, or a dash. */
export const figure = (value: number | null): string => (value === null ? '–' : value.toFixed(3));
