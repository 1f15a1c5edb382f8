import type { Run } from '@/shared';
import type { Priors } from '../priors';
import type { Verdict, Weighed } from '../verdict';
import type { Candidate } from './candidate';
import type { Desk } from './desk';
import { largerFirst } from './information';
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
  const chips = verdict.outcome === 'shared' ? [] : worth.flatMap((place) => placeChecks(desk, place));
  return distinct([...(whole ? [whole] : []), ...sharedChecks(desk), ...chips]);
}

/** A swap is the same from either side. */
function distinct(list: readonly Candidate[]): Candidate[] {
  const seen = new Set<string>();
  return list.filter(({ action, sockets, label }) => {
    const key =
      action === 'swap' ? `swap ${[...sockets].sort().join(' ')}` : `${action} ${sockets.join(' ')} ${String(label)}`;
    return !seen.has(key) && seen.add(key);
  });
}

/** Chips are moved or pulled only after what they share was looked at, and moved only after one was pulled. */
const lateFor = { shared: ['pull-in-turn'], held: ['swap', 'replace', 'reseat', 'stack'] };

/**
 * The best first: expected information for its minutes. Such a greedy choice stays within a tenth of the minutes
 * that an exhaustive search over two steps takes (tests, small boards), so nothing deeper is searched.
 */
export function ranked(desk: Desk, list: readonly Candidate[]): Candidate[] {
  const late = desk.verdict.outcome === 'shared' ? lateFor.shared : isHeld(desk) ? lateFor.held : [];
  const tier = ({ action }: Candidate) => (late.includes(action) ? 1 : 0);
  return [...list].sort((a, b) => tier(a) - tier(b) || largerFirst(a.bits / a.minutes, b.bits / b.minutes));
}

/** A line that one of several chips may hold: a pull frees the others, where a swap only moves what is wrong. */
function isHeld({ beliefs: { states, answers }, verdict }: Desk): boolean {
  if (verdict.outcome !== 'group') return false;
  const holders = new Set(states.filter(({ sort }) => sort === 'holder').map(({ answer }) => answer));
  let held = 0;
  for (const answer of holders) held += answers[answer]?.share ?? 0;
  return holders.size > 1 && held >= 0.3;
}
