import type { Finding, Sign } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import type { Part } from './cause-types';
import type { Interpretation } from './observe/observations';
import { weigh, type Posterior } from './posterior';
import type { Priors } from './priors';
import { Signals } from './signals';

export interface Mixture {
  readonly posterior: Posterior;
  /** The likeliest interpretation, whose lanes the words speak of. */
  readonly best: Interpretation;
  /** What the words and signs of the likeliest interpretation tell. */
  readonly signals: Signals;
  /** Share of each interpretation, adding up to 1. */
  readonly shares: readonly number[];
}

/** What an answer is weighed by, beside the causes and the evidence. */
export interface WeighedBy {
  readonly index: LayoutIndex;
  readonly priors: Priors;
  readonly signs: readonly Sign[];
  readonly findings: readonly Finding[];
}

/** Weighs every way to understand the evidence, each as likely beforehand as the others, and mixes the answers. */
export function weighAll(
  parts: readonly Part[],
  interpretations: readonly Interpretation[],
  { index, priors, signs, findings }: WeighedBy,
): Mixture {
  const told = interpretations.map((each) => new Signals(index, each.runs, { signs, findings }));
  const answers = interpretations.map((each, i) => weigh(parts, each.runs, { priors, signals: told[i] as Signals }));
  const most = Math.max(...answers.map((answer) => answer.logEvidence));
  const weights = answers.map((answer) => (most === -Infinity ? 1 : Math.exp(answer.logEvidence - most)));
  const total = weights.reduce((a, b) => a + b, 0);
  const shares = weights.map((weight) => weight / total);
  const leading = shares.indexOf(Math.max(...shares));
  const best = interpretations[leading] as Interpretation;
  const signals = told[leading] as Signals;
  if (answers.length === 1) return { posterior: answers[0] as Posterior, best, signals, shares };
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
  return { posterior, best, signals, shares };
}
