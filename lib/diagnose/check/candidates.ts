import type { Run } from '@/shared';
import type { Priors } from '../priors';
import type { Verdict, Weighed } from '../verdict';
import type { Candidate } from './candidate';
import type { Desk } from './desk';
import { meaningFor } from './meanings';
import { placeChecks } from './place-checks';
import { reporterFor } from './report-words';
import { sharedChecks } from './shared-checks';
import { believe, placesOf } from './states';
import { testWhole } from './whole-checks';

/** What the next checks are worked out from. */
export interface CheckInput {
  readonly weighed: Weighed;
  readonly verdict: Verdict;
  readonly runs: readonly Run[];
  readonly priors: Priors;
}

/** Places whose checks are weighed, and the least share of a second one beside the first. */
const mostPlaces = 2;
const leastBeside = 0.1;

/** Everything that the checks are proposed from; null where nothing explains what failed. */
export function deskFor({ weighed, verdict, runs, priors }: CheckInput): Desk | null {
  const beliefs = believe(weighed);
  if (!beliefs) return null;
  const { index } = weighed.findings;
  const [meaning, report] = [meaningFor(beliefs), reporterFor(index, runs)];
  return { index, weighed, verdict, runs, priors, beliefs, meaning, report };
}

/** Every check that fits what failed, weighed, in no order. */
export function candidates(desk: Desk): Candidate[] {
  const { verdict, beliefs } = desk;
  const whole = testWhole(desk);
  const places = placesOf(beliefs);
  const most = places[0] ? places[0].chip + places[0].contact : 0;
  const worth = places.filter(({ chip, contact }) => chip + contact >= leastBeside * most).slice(0, mostPlaces);
  // What many chips share is looked at before a chip is moved.
  const chips = verdict.outcome === 'shared' ? [] : worth.flatMap((place) => placeChecks(desk, place));
  const seen = new Set<string>();
  return [...(whole ? [whole] : []), ...sharedChecks(desk), ...chips].filter(
    ({ label }) => !seen.has(label) && seen.add(label),
  );
}
