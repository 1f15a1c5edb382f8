import { sum } from 'd3-array';
import type { Lane, SocketIndex } from '../../brand';
import type { Priors } from '../priors';
import { byAnswer, weighOutcomes, type Candidate, type CandidateOutcome, type Said } from './candidate';
import { outcomeShares, sharesAfter } from './information';
import { shows } from './likelihoods';
import type { Meaning } from './meanings';
import { afterMove } from './moved-lanes';
import type { Reporter } from './report-words';
import type { Beliefs, State } from './states';

/** What is done to the board before the test runs again. */
export interface Handling {
  /** Where the chip of a socket goes; null where it is taken off the board. */
  readonly moves: ReadonlyMap<SocketIndex, SocketIndex | null>;
  readonly handled: readonly SocketIndex[];
}

export interface Rerun {
  readonly beliefs: Beliefs;
  readonly priors: Priors;
  readonly report: Reporter;
  readonly meaning: Meaning;
}

/** One thing that the board can report, with the probability by answer. */
interface Report {
  readonly lanes: readonly Lane[];
  readonly likelihood: number[];
  /** Of each answer the state that most likely brings it about, with its weight. */
  readonly leads: ({ readonly state: State; readonly weight: number } | undefined)[];
  /** Probability that it comes from a fault that does not show. */
  silent: number;
}

const anythingElse = { sees: 'anything else', means: 'type it in as a new run' };
/** Reports less likely than this are told together as anything else. */
const worthTelling = 0.01;

/**
 * What the board will report after chips were handled, by the model itself: a chip takes what it spoils along,
 * a contact is cured with some chance, each handled place can be spoiled, a fault that comes and goes may not
 * show. A report stands for all that differ from it only in lanes that happen not to show.
 */
export function rerun(of: Rerun, said: Said, handling: Handling): Candidate {
  const { beliefs, priors } = of;
  const reports = new Map<string, Report>();
  const add = (lanes: readonly Lane[], by: { state: State | null; silent: boolean }, weight: number): void => {
    if (!(weight > 0)) return;
    const key = lanes.join(' ');
    let report = reports.get(key);
    if (!report) {
      report = { lanes, likelihood: beliefs.answers.map(() => 0), leads: [], silent: 0 };
      reports.set(key, report);
    }
    const { state } = by;
    const answer = state?.answer ?? beliefs.answers.length - 1;
    const share = beliefs.answers[answer]?.share ?? 0;
    report.likelihood[answer] = (report.likelihood[answer] as number) + (share > 0 ? weight / share : 0);
    if (by.silent) report.silent += weight;
    if (state && weight > (report.leads[answer]?.weight ?? 0)) report.leads[answer] = { state, weight };
  };
  const unharmed = (1 - priors.handlingHarms) ** handling.handled.length;
  for (const state of beliefs.states) {
    const { lanes, cured } = effectOf(of, state, handling);
    const { others } = state;
    const showing = lanes.length === 0 ? 0 : (1 - cured) * (1 - state.kind.miss ** lanes.length);
    const weight = unharmed * state.share;
    add(together(lanes, others), { state, silent: false }, weight * showing);
    add(others, { state, silent: true }, weight * (1 - showing));
  }
  const rest = beliefs.answers.at(-1)?.share ?? 0;
  add(together(beliefs.failing, []), { state: null, silent: false }, rest * shows.otherStays);
  add([], { state: null, silent: true }, rest * shows.otherClears);
  return weighOutcomes(beliefs, said, told(of, [...reports.values()], handling));
}

/** What a state spoils after the handling, and with which chance the handling itself puts it right. */
function effectOf({ beliefs, priors }: Rerun, state: State, { moves, handled }: Handling) {
  const { part, cause, lanes } = state;
  if (part.kind === 'chip' && part.socket !== null && moves.has(part.socket)) {
    const to = moves.get(part.socket) ?? null;
    const moved = to === null ? [] : afterMove(beliefs.findings.index, state, { from: part.socket, to });
    return { lanes: moved, cured: 0 };
  }
  if (part.kind === 'position' && part.socket !== null && handled.includes(part.socket)) {
    return { lanes, cured: cause.mode === 'fitting' ? 1 : priors.handlingCures };
  }
  return { lanes, cured: 0 };
}

/** Outcomes in words, the likeliest first, and a last one for everything else. */
function told(of: Rerun, reports: readonly Report[], handling: Handling): CandidateOutcome[] {
  const { beliefs, report, meaning } = of;
  const prior = beliefs.answers.map((answer) => answer.share);
  const probability = outcomeShares(
    prior,
    reports.map((each) => each.likelihood),
  );
  const order = reports.map((_, n) => n).sort((a, b) => (probability[b] as number) - (probability[a] as number));
  const kept = order.filter((n) => (probability[n] as number) >= worthTelling);
  const outcomes = kept.map((n): CandidateOutcome => {
    const { lanes, likelihood, leads, silent } = reports[n] as Report;
    const after = sharesAfter(prior, likelihood);
    const clears = silent > (probability[n] as number) / 2;
    const modeOf = (answer: number) => leads[answer]?.state.cause.mode ?? null;
    return {
      words: () => ({ sees: report(lanes), means: meaning({ after, clears, handling, modeOf }) }),
      likelihood,
    };
  });
  const left = byAnswer(beliefs, () => 1).map((one, answer) =>
    Math.max(0, one - sum(outcomes, (outcome) => outcome.likelihood[answer] as number)),
  );
  return [...outcomes, { words: () => anythingElse, likelihood: left }];
}

function together(one: readonly Lane[], other: readonly Lane[]): readonly Lane[] {
  if (other.length === 0) return one;
  return [...new Set([...one, ...other])].sort((a, b) => a - b);
}
