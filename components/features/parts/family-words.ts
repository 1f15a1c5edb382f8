import type { ChipFamily } from '@/shared';
import { wordsCount } from '../boards/board-facts';

/** "64K × 1": words and data bits of one chip. */
export function organisationWords({ words, width }: ChipFamily): string {
  return `${wordsCount(words)} × ${width}`;
}

/** Pins of the package, 0 where the family does not list them. */
export function packageOf({ pins }: ChipFamily): number {
  return pins.reduce((most, { pin }) => Math.max(most, pin), 0);
}

/** "−5 V at pin 1, +12 V at pin 8": the supplies, 0 V last. */
export function supplyWords({ pins }: ChipFamily): string {
  const at = pins.filter(({ does }) => does === 'supply' || does === 'ground');
  if (at.length === 0) return 'not described';
  const ordered = [...at].sort((a, b) => Number(a.does === 'ground') - Number(b.does === 'ground'));
  return ordered.map(({ name, pin }) => `${name} at pin ${pin}`).join(', ');
}

/** "128 rows in 2 ms", or that it needs none. */
export function refreshWords({ kind, rows, refreshMs }: ChipFamily): string {
  if (kind === 'static') return 'none';
  if (rows === undefined) return 'not described';
  return refreshMs === undefined ? `${rows} rows` : `${rows} rows in ${refreshMs} ms`;
}

/** "150, 200, 250 ns": the usual access times. */
export function gradeWords({ gradesNs }: ChipFamily): string {
  return gradesNs === undefined ? 'not described' : `${gradesNs.join(', ')} ns`;
}

/** A family in a list to choose from: its name with the type numbers of the trade. */
export function familyChoice({ name, alsoCalled }: ChipFamily): string {
  return alsoCalled.length === 0 ? name : `${name} (${alsoCalled.join(', ')})`;
}
