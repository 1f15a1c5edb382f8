import { sum } from 'd3-array';

/** Entropy of shares in bits. They need not add up to 1; shares of 0 or less count nothing. */
export function entropyOf(shares: readonly number[]): number {
  const total = sum(shares);
  if (!(total > 0)) return 0;
  let bits = 0;
  for (const share of shares) if (share > 0) bits -= (share / total) * Math.log2(share / total);
  return Math.max(0, bits);
}

/** For sorting, the larger first; 0 where only the last digits of a double differ, so that ties keep their order. */
export function largerFirst(a: number, b: number): number {
  return Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b)) ? 0 : b - a;
}

/** Probability of each outcome: `likelihoods[outcome][hypothesis]` weighed by `prior`, which is normalised. */
export function outcomeShares(prior: readonly number[], likelihoods: readonly (readonly number[])[]): number[] {
  const total = sum(prior);
  if (!(total > 0)) return likelihoods.map(() => 0);
  return likelihoods.map((row) => sum(row, (likelihood, h) => (likelihood * (prior[h] ?? 0)) / total));
}

/** Shares of the hypotheses after an outcome with these likelihoods; those before where it cannot happen. */
export function sharesAfter(prior: readonly number[], likelihood: readonly number[]): number[] {
  const joint = prior.map((share, h) => share * (likelihood[h] ?? 0));
  const total = sum(joint);
  return total > 0 ? joint.map((each) => each / total) : [...prior];
}

/**
 * Expected information of a check in bits: the entropy of the hypotheses now less what remains on average
 * (mutual information of outcome and hypothesis). `likelihoods[outcome][hypothesis]`; the column of each
 * hypothesis adds up to 1.
 */
export function expectedInformation(prior: readonly number[], likelihoods: readonly (readonly number[])[]): number {
  const outcomes = outcomeShares(prior, likelihoods);
  const left = sum(likelihoods, (row, o) => (outcomes[o] as number) * entropyOf(sharesAfter(prior, row)));
  return Math.max(0, entropyOf(prior) - left);
}
