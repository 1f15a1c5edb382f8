import type { Part } from './cause-types';
import type { Interpretation } from './observe/observations';
import { weigh, type Posterior } from './posterior';
import type { Priors } from './priors';
import type { Signals } from './signals';

/** A way to understand the evidence, with what it tells beside lanes. */
export interface Told extends Interpretation {
  readonly signals: Signals;
}

export interface Mixture {
  readonly posterior: Posterior;
  /** The likeliest interpretation, whose lanes the words speak of. */
  readonly best: Told;
  /** Share of each interpretation, adding up to 1. */
  readonly shares: readonly number[];
}

/** Weighs every way to understand the evidence, each as likely beforehand as the others, and mixes the answers. */
export function weighAll(parts: readonly Part[], interpretations: readonly Told[], priors: Priors): Mixture {
  const answers = interpretations.map(({ runs, signals }) => weigh(parts, runs, { priors, signals }));
  const most = Math.max(...answers.map((answer) => answer.logEvidence));
  const weights = answers.map((answer) => (most === -Infinity ? 1 : Math.exp(answer.logEvidence - most)));
  const total = weights.reduce((a, b) => a + b, 0);
  const shares = weights.map((weight) => weight / total);
  const best = interpretations[shares.indexOf(Math.max(...shares))] as Told;
  if (answers.length === 1) return { posterior: answers[0] as Posterior, best, shares };
  const mix = (pick: (answer: Posterior) => number) =>
    answers.reduce((sum, answer, i) => sum + (shares[i] as number) * pick(answer), 0);
  const posterior: Posterior = {
    logEvidence: most + Math.log(total / answers.length),
    kinds: parts.map((part, p) =>
      part.causes.map((cause, c) =>
        Float64Array.from(cause.kinds, (_, k) => mix((answer) => answer.kinds[p]?.[c]?.[k] ?? 0)),
      ),
    ),
    anyOf: (chosen) => mix((answer) => answer.anyOf(chosen)),
    leftOut: mix((answer) => answer.leftOut),
  };
  return { posterior, best, shares };
}
