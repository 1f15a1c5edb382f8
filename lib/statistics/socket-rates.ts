import { betaQuantile } from './beta';
import type { Interval } from './interval';

/** What the history says of one socket. */
export interface SocketCount {
  /** Reports in which the chip of the socket was the culprit. */
  readonly failed: number;
  /** Reports of boards in which the socket held a chip, whether it failed or not. */
  readonly boards: number;
}

/** The rate of one socket, drawn to the mean of its board as far as its own reports are few. */
export interface SocketRate {
  /** Mean of the posterior: failures per reported board. */
  readonly rate: number;
  /** Credible interval, 95 %. */
  readonly interval: Interval;
}

/** The rates of all sockets of a board. */
export interface BoardRates {
  /** Failures of a socket per reported board, over all sockets. */
  readonly mean: number;
  /** Reports that the mean of the board counts for against a socket's own; Infinity where the sockets do not differ. */
  readonly strength: number;
  readonly sockets: readonly SocketRate[];
}

/** What the board's mean counts for where the spread of the sockets cannot be estimated. */
const usualStrength = 20;
/** Few reports estimate the spread badly, so the board's mean never counts for less than this. */
const leastStrength = 10;
/** Sockets with reports that it takes to estimate a spread. */
const leastSockets = 4;

function checkCounts(counts: readonly SocketCount[]): void {
  for (const { failed, boards } of counts)
    if (!(failed >= 0 && failed <= boards && Number.isFinite(boards)))
      throw new RangeError(`${failed} of ${boards} is no count.`);
}

/**
 * How many reports the board's mean counts for: the method of moments for the beta-binomial distribution with weights
 * by size. J. C. Kleinman, Proportions with extraneous variance, JASA 68 (1973) 46-54 (from memory).
 */
function strengthOf(counts: readonly SocketCount[], mean: number): number {
  const seen = counts.filter(({ boards }) => boards > 0);
  if (seen.length < leastSockets || mean === 0 || mean === 1) return usualStrength;
  const total = seen.reduce((sum, { boards }) => sum + boards, 0);
  let spread = 0;
  let weights = 0;
  let chance = 0;
  for (const { failed, boards } of seen) {
    const weight = boards / total;
    spread += weight * (failed / boards - mean) ** 2;
    weights += weight * (1 - weight);
    chance += (weight * (1 - weight)) / boards;
  }
  if (weights - chance <= 0) return usualStrength;
  const correlation = (spread - mean * (1 - mean) * chance) / (mean * (1 - mean) * (weights - chance));
  if (correlation <= 0) return Infinity;
  return Math.max(leastStrength, 1 / correlation - 1);
}

/**
 * The failure rate of every socket of a board from its reports: a beta posterior for each, whose prior has the mean
 * of the board and counts for as many reports as the spread between the sockets tells (method of moments; 20 where
 * fewer than four sockets have reports, and never below 10). Throws RangeError for counts that are none.
 */
export function socketRates(counts: readonly SocketCount[]): BoardRates {
  checkCounts(counts);
  const total = counts.reduce((sum, { boards }) => sum + boards, 0);
  const mean = total === 0 ? 0 : counts.reduce((sum, { failed }) => sum + failed, 0) / total;
  const strength = strengthOf(counts, mean);
  // Half a failure and half a board without one keep a board where nothing or everything failed away from 0 and 1.
  const priorMean = (mean * total + 0.5) / (total + 1);
  const sockets = counts.map(({ failed, boards }): SocketRate => {
    if (strength === Infinity) return fixedRate(mean, total);
    const centre = mean === 0 || mean === 1 ? priorMean : mean;
    const a = centre * strength + failed;
    const b = (1 - centre) * strength + boards - failed;
    return { rate: a / (a + b), interval: { low: betaQuantile(0.025, a, b), high: betaQuantile(0.975, a, b) } };
  });
  return { mean, strength, sockets };
}

/** Where the sockets do not differ beyond chance, each has the rate of the board with what all reports say of it. */
function fixedRate(mean: number, total: number): SocketRate {
  const a = mean * total + 0.5;
  const b = (1 - mean) * total + 0.5;
  return { rate: mean, interval: { low: betaQuantile(0.025, a, b), high: betaQuantile(0.975, a, b) } };
}

/** What the history changes in the priors of `diagnose`. */
export interface HistoryPriors {
  /**
   * One factor a socket, in the order of the counts, for every chip prior of the chip that was in it at first
   * (`chipDead`, `chipHoldsLine`, `chipHoldsStrobe`, `chipHoldsAddress`). Their mean is 1 before the bounds.
   */
  readonly chipFactor: readonly number[];
}

const leastFactor = 0.2;
const mostFactor = 20;

/**
 * Factors on the chip priors of a layout from its failure history: the posterior rate of each socket over the mean of
 * all, from 0.2 to 20. Failure reports come from boards that had failed, so they tell which socket it is, not how
 * often chips fail: the level stays that of the priors. All 1 where nothing is known. A position keeps its own prior.
 * Throws RangeError for counts that are none.
 */
export function priorsFor(counts: readonly SocketCount[]): HistoryPriors {
  const { mean, sockets } = socketRates(counts);
  const level = sockets.reduce((sum, { rate }) => sum + rate, 0) / sockets.length;
  return {
    chipFactor: sockets.map(({ rate }) =>
      mean === 0 || level === 0 ? 1 : Math.min(mostFactor, Math.max(leastFactor, rate / level)),
    ),
  };
}
