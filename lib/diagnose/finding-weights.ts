import type { Finding } from '@/shared';
import type { Cause, Part } from './cause-types';
import { shows } from './check/likelihoods';
import { sortOf } from './sort-of';

/** The ids of the parts that a finding is about; a label may hold a space. */
export function askedAbout(about: string): string[] {
  return about.split(/ (?=(?:chip|position|shared|short|unlisted):)/);
}

/**
 * How likely what a check found is where a cause is at work, by the same table that says beforehand what the check is
 * worth; null stands for what the model does not name. Above 0, at most 1.
 */
export function findingWeight({ check, about, found }: Finding, of: { part: Part; cause: Cause } | null): number {
  const bad = badIs(check, about, of);
  return found === 'bad' ? bad : 1 - bad;
}

function badIs(check: Finding['check'], about: string, of: { part: Part; cause: Cause } | null): number {
  const sort = of ? sortOf(of.part, of.cause) : 'other';
  const asked = of !== null && askedAbout(about).includes(of.part.id);
  const atAPlace = of !== null && of.part.socket !== null;
  switch (check) {
    case 'legs':
      return asked || !atAPlace ? shows.openLeg[sort] : 0.02;
    case 'stack':
      return asked || !atAPlace ? shows.better[sort] : 0.02;
    case 'pin':
      return asked || !atAPlace ? shows.badPin[sort] : shows.badPin.other;
    case 'output':
      return (asked ? shows.badPart : shows.draggedPart)[sort];
    case 'joined':
      return asked ? shows.joined.short : shows.joined[sort === 'short' ? 'other' : sort];
    case 'pull':
      return asked && sort === 'holder' ? shows.freed : shows.freedByChance;
  }
}
