const thin = '\u202f';

/** "12 345 678": a count with thin spaces. */
export const counted = (count: number): string => Math.round(count).toLocaleString('en').replaceAll(',', thin);

/** "12 lines", "1 line". */
export const countedOf = (count: number, noun: string): string => `${counted(count)} ${noun}${count === 1 ? '' : 's'}`;

/** "1.4 GB": bytes in decimal units, as files are listed. */
export function byteWords(bytes: number): string {
  const units = ['bytes', 'kB', 'MB', 'GB'];
  let [value, unit] = [bytes, 0];
  while (value >= 1000 && unit < units.length - 1) [value, unit] = [value / 1000, unit + 1];
  return `${unit === 0 || value >= 100 ? Math.round(value) : value.toFixed(1)} ${units[unit]}`;
}

/** "4.2 million lines a second". */
export function speedWords(lines: number, seconds: number): string {
  if (seconds <= 0) return '';
  const each = lines / seconds;
  return each >= 1e6 ? `${(each / 1e6).toFixed(1)} million lines a second` : `${counted(each)} lines a second`;
}
