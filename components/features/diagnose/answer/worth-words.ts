import type { NextCheck } from '@/shared';

/** Expected information below this, in bits, is hardly worth the walk. */
const little = 0.05;

/** What a check is worth beside the others, in words; empty where there is nothing to say. */
export function worthWords(check: NextCheck, all: readonly NextCheck[]): string {
  if (check.bits === 0) return '';
  if (check.bits < little) return 'tells little';
  const rate = ({ bits, minutes }: NextCheck) => bits / minutes;
  if (all.every((other) => rate(other) <= rate(check))) return 'tells most for its time';
  if (all.every(({ bits }) => bits <= check.bits)) return 'tells most of all';
  return '';
}

/** "8 min", "3 h". */
export function minutesWords(minutes: number): string {
  if (minutes < 1) return 'under 1\u00a0min';
  return minutes < 120 ? `${Math.round(minutes)}\u00a0min` : `${Math.round(minutes / 60)}\u00a0h`;
}
