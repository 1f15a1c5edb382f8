/**
 * A probability (0 to 1) as whole per cent, "91 %".
 * Never says 0 % or 100 % of what is neither impossible nor certain.
 */
export function percentWords(probability: number): string {
  const percent = probability * 100;
  if (percent > 0 && percent < 1) return 'under 1 %';
  if (percent < 100 && percent > 99) return 'over 99 %';
  return `${Math.round(percent)} %`;
}

/** Tally strokes, 0 to 10, for a probability (0 to 1): one a tenth, and all ten only for what is as good as certain. */
export function tallyCount(probability: number): number {
  const tenths = Math.round(probability * 10);
  return probability < 0.995 ? Math.min(tenths, 9) : 10;
}
