import { sum } from 'd3-array';
import type { CheckAction, Finding, NextCheck } from '@/shared';
import { expectedInformation, outcomeShares } from './information';
import type { Beliefs, State } from './states';

/** What an outcome looks like, and what it means. */
interface OutcomeWords {
  readonly sees: string;
  readonly means: string;
  /** What to enter where this is found, for checks made without a run of the test. */
  readonly finding?: Finding;
}

/** What a check can show. */
export interface CandidateOutcome {
  /** Made only for checks that are listed. */
  readonly words: () => OutcomeWords;
  /** Probability by answer, in the order of the beliefs. */
  readonly likelihood: readonly number[];
}

/** A check that could be made next, weighed. */
export interface Candidate {
  readonly action: CheckAction;
  readonly label: string | (() => string);
  readonly sockets: readonly string[];
  readonly minutes: number;
  /** Expected information about which part is at fault. */
  readonly bits: number;
  readonly outcomes: readonly CandidateOutcome[];
}

interface Seen extends OutcomeWords {
  /** Probability that a state shows this; null stands for what the model does not name. */
  readonly given: (state: State | null) => number;
}

/** What is said of a check, before it is weighed. */
export type Said = Pick<Candidate, 'action' | 'label' | 'sockets' | 'minutes'>;

/** The mean of a likelihood over the states of each answer. */
export function byAnswer({ states, answers }: Beliefs, given: (state: State | null) => number): number[] {
  const means = new Array<number>(answers.length).fill(0);
  for (const state of states) {
    const whole = answers[state.answer]?.share ?? 0;
    if (whole > 0) means[state.answer] = (means[state.answer] as number) + (state.share / whole) * given(state);
  }
  means[answers.length - 1] = given(null);
  return means;
}

/** Weighs a check whose outcomes are told state by state. */
export function weighSeen(beliefs: Beliefs, said: Said, seen: readonly Seen[]): Candidate {
  const outcomes = seen.map(({ sees, means, finding, given }) => ({
    words: () => ({ sees, means, ...(finding ? { finding } : {}) }),
    likelihood: byAnswer(beliefs, given),
  }));
  return weighOutcomes(beliefs, said, outcomes);
}

/** Weighs a check whose outcomes are told answer by answer. */
export function weighOutcomes(beliefs: Beliefs, said: Said, outcomes: readonly CandidateOutcome[]): Candidate {
  const prior = beliefs.answers.map((answer) => answer.share);
  const bits = expectedInformation(
    prior,
    outcomes.map((outcome) => outcome.likelihood),
  );
  return { ...said, bits, outcomes };
}

/** As the answer lists it: outcomes with the probability that the beliefs give them, adding up to 1. */
export function asNextCheck(
  beliefs: Beliefs,
  { action, label, sockets, minutes, bits, outcomes }: Candidate,
): NextCheck {
  const prior = beliefs.answers.map((answer) => answer.share);
  const shares = outcomeShares(
    prior,
    outcomes.map((outcome) => outcome.likelihood),
  );
  const total = sum(shares);
  return {
    action,
    label: typeof label === 'string' ? label : label(),
    sockets: [...sockets],
    minutes,
    bits,
    outcomes: outcomes.map(({ words }, o) => ({
      ...words(),
      probability: total > 0 ? Math.min(1, (shares[o] as number) / total) : 0,
    })),
  };
}

/** What a check at the bench found of a part. */
export function foundOf(check: Finding['check'], about: string): { bad: Finding; good: Finding } {
  return {
    bad: { kind: 'finding', check, about, found: 'bad' },
    good: { kind: 'finding', check, about, found: 'good' },
  };
}
