const lanczos = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
  12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
] as const;

/**
 * Logarithm of the gamma function for x above 0. C. Lanczos, A precision approximation of the gamma function, SIAM
 * J. Numer. Anal. B 1 (1964) 86-96, with seven terms (coefficients from memory, held against another implementation).
 */
function logGamma(x: number): number {
  if (x < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * x)) - logGamma(1 - x);
  const z = x - 1;
  const t = z + 7.5;
  const series = lanczos.reduce((sum, c, i) => (i === 0 ? c : sum + c / (z + i)), 0);
  return 0.5 * Math.log(2 * Math.PI) + (z + 0.5) * Math.log(t) - t + Math.log(series);
}

const tiny = 1e-300;
const enough = 1e-16;
const mostTerms = 10_000;

/** The continued fraction of the incomplete beta function, by the modified method of Lentz. */
function continuedFraction(x: number, a: number, b: number): number {
  const kept = (value: number) => (Math.abs(value) < tiny ? tiny : value);
  let c = 1;
  let d = 1 / kept(1 - ((a + b) * x) / (a + 1));
  let product = d;
  for (let m = 1; m <= mostTerms; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / kept(1 + even * d);
    c = kept(1 + even / c);
    product *= c * d;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / kept(1 + odd * d);
    c = kept(1 + odd / c);
    product *= c * d;
    if (Math.abs(c * d - 1) < enough * 4) break;
  }
  return product;
}

function checkShape(a: number, b: number): void {
  if (!(a > 0 && b > 0 && Number.isFinite(a) && Number.isFinite(b)))
    throw new RangeError(`A beta distribution has two finite shapes above 0, not ${a} and ${b}.`);
}

/**
 * Share of a beta distribution with shapes a and b below x: the regularised incomplete beta function I_x(a, b). NIST
 * Digital Library of Mathematical Functions, 8.17(i) and the continued fraction 8.17.22. Throws RangeError where a
 * shape is not above 0.
 */
export function betaShareBelow(x: number, a: number, b: number): number {
  checkShape(a, b);
  if (!(x > 0)) return 0;
  if (x >= 1) return 1;
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x));
  return x < (a + 1) / (a + b + 2)
    ? (front * continuedFraction(x, a, b)) / a
    : 1 - (front * continuedFraction(1 - x, b, a)) / b;
}

/**
 * The value below which a share `p` of a beta distribution lies, found by halving to the last digit of a number
 * between 0 and 1. Throws RangeError where p is not from 0 to 1 or a shape not above 0.
 */
export function betaQuantile(p: number, a: number, b: number): number {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`A share lies from 0 to 1, not at ${p}.`);
  checkShape(a, b);
  if (p === 0 || p === 1) return p;
  let low = 0;
  let high = 1;
  for (let step = 0; step < 1100 && high - low > 1e-16 * high; step++) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (betaShareBelow(middle, a, b) < p) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
