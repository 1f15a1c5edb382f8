import type { Diagnosis, LaneState, Run, Sign, Suspect } from '@/shared';
import type { Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { cautionsFor } from './cautions';
import { listParts } from './causes';
import { addressMapOf } from '../place/address';
import { compiledFormats } from './compiled-formats';
import { hintsOf } from './hints';
import { weighAll } from './mixture';
import { nextChecks } from './check/next-checks';
import { exactWithin } from './noisy-or';
import { observe, type RunObservation } from './observe/observations';
import { probabilityOf, type Posterior } from './posterior';
import { priors as defaultPriors, type Priors } from './priors';
import { openQuestions } from './questions';
import { railReading, type RailReading } from './rails';
import { tell } from './sentences';
import { Signals } from './signals';
import { listSignatures } from './signature-words';
import { deadBoardSuspects, loadedRails, railSuspects, supplyVerdict } from './supply';
import { listPlaces, listSuspects, type Findings } from './suspects';
import { followChips, type Timeline } from './timeline';
import { breakingSockets } from './wrong-part';
import { decide, laneNames, openMeaning, type Weighed } from './verdict';

/** A failing lane of which the model's causes explain less than this is told as unexplained. */
const explainedFrom = 0.3;
/** Two parts are told as a pair where both are needed with at least this probability. */
const pairFrom = 0.3;

/**
 * The whole answer: which place, which part, how sure, why, what was not tested, and what to check next.
 * Total on every input that the schema allows; evidence that cannot be read is told with its reason.
 * The probabilities are those of the noisy-OR model of `priors`; `exact` says whether all combinations of
 * causes were summed.
 */
export function diagnose(index: LayoutIndex, runs: readonly Run[], priors: Priors = defaultPriors): Diagnosis {
  const timeline = followChips(
    index,
    runs.map((run) => run.changes),
  );
  const observations = observe({ index, map: addressMapOf(index) }, runs, compiledFormats(index));
  const { interpretations, signs } = observations;
  const told = interpretations.map((each) => ({ ...each, signals: new Signals(index, each.runs, observations) }));
  const parts = listParts(index, timeline, { priors, hints: hintsOf(index, told) });
  const { posterior, best, shares } = weighAll(parts, told, priors);
  const rails = observations.measurements.flatMap((each) => railReading(index, each) ?? []);
  const findings: Findings = {
    index,
    parts,
    posterior,
    runs: best.runs,
    everFailing: runs.map((_, r) => new Set(interpretations.flatMap((each) => [...(each.runs[r]?.failing ?? [])]))),
    said: observations.evidence.flatMap((piece, i) =>
      piece.ok ? [{ run: piece.run, text: piece.text, failing: observations.failingOf[i] ?? [] }] : [],
    ),
  };
  const lastRun = findLast(best.runs, (run) => run.failing.size + run.passed.size > 0);
  const anyFailed = best.runs.some((run) => run.failing.size > 0);
  const supply = supplyVerdict(index, { rails, signs, runs: best.runs });
  const ranks = anyFailed && supply === null;
  const weighed: Weighed = {
    findings,
    signatures: listSignatures(index, best.signals, best.runs),
    signs,
    rails,
    breaking: breakingSockets(index, timeline.chips),
    suspects: ranks ? withLoadedRails(listSuspects(findings), index, timeline) : otherSuspects(index, rails, signs),
    places: ranks ? listPlaces(findings) : [],
    lastRun,
    interpretations,
    unreadable: observations.evidence.length > 0 && observations.evidence.every((piece) => !piece.ok),
    unexplained: anyFailed ? unexplainedLanes(findings, explainedFrom * Math.max(...shares)) : [],
  };
  const verdict = supply ?? decide(weighed);
  const last = lastRun === null ? undefined : best.runs[lastRun];
  const possible = new Set(
    interpretations.flatMap((each) => (lastRun === null ? [] : [...(each.runs[lastRun]?.failing ?? [])])),
  );
  const untested = last
    ? ([...index.lanes] as Lane[]).filter((lane) => !last.passed.has(lane) && !possible.has(lane))
    : [];
  const problems = timeline.problems.map(
    (problem) => `Run ${problem.run + 1}: ${problem.reason} The change was left out.`,
  );
  const leftOut = anyFailed ? posterior.leftOut : 0;
  return {
    outcome: verdict.outcome,
    headline: verdict.headline,
    sure: verdict.sure,
    probability: verdict.probability,
    sentences: tell({ weighed, verdict, observations, untested, leftOut, problems, chips: timeline.chips }),
    suspects: [...weighed.suspects],
    places: [...weighed.places],
    groups: [...verdict.groups],
    pairs: ranks ? pairsOf(findings, weighed) : [],
    unexplained: laneNames(findings, weighed.unexplained),
    untested: laneNames(findings, untested),
    lanes: laneStates(findings, last),
    evidence: [...observations.evidence],
    signatures: [...weighed.signatures],
    questions: openQuestions(index, interpretations, { shares, settles: openMeaning(weighed)?.check ?? '' }),
    nextChecks: nextChecks({ weighed, verdict, runs, priors }),
    cautions: cautionsFor(index, {
      outcome: verdict.outcome,
      failing: Math.max(0, ...best.runs.map((run) => run.failing.size)),
      sockets: verdict.sockets,
    }),
    exact: leftOut <= exactWithin,
    leftOut,
  };
}

function withLoadedRails(suspects: Suspect[], index: LayoutIndex, { chips }: Timeline): Suspect[] {
  return [...suspects, ...loadedRails(index, chips, suspects.length)];
}

function otherSuspects(index: LayoutIndex, rails: readonly RailReading[], signs: readonly Sign[]): Suspect[] {
  const measured = railSuspects(index, rails);
  if (measured.length > 0 || rails.length > 0) return measured;
  return signs.some(({ sign }) => sign === 'dead') ? deadBoardSuspects() : [];
}

function findLast<T>(list: readonly T[], wanted: (item: T) => boolean): number | null {
  for (let i = list.length - 1; i >= 0; i--) if (wanted(list[i] as T)) return i;
  return null;
}

/** Less than this of a cause does not decide whether a lane is explained. */
const worthCounting = 1e-5;

/** Where several interpretations remain, the causes of the likeliest hold only its share. */
function unexplainedLanes({ parts, posterior, runs }: Findings, enough: number): Lane[] {
  const explained = new Map<Lane, number>();
  const wanted = new Set(runs.flatMap((run) => [...run.failing]));
  parts.forEach((part, p) =>
    part.causes.forEach((cause, c) =>
      cause.kinds.forEach((kind, k) => {
        const own = posterior.kinds[p]?.[c]?.[k] ?? 0;
        if (own < worthCounting) return;
        const touched = new Set<Lane>();
        for (const scope of kind.scopes) for (const lane of scope?.lanes ?? []) if (wanted.has(lane)) touched.add(lane);
        for (const lane of touched) explained.set(lane, (explained.get(lane) ?? 0) + own);
      }),
    ),
  );
  return [...wanted].filter((lane) => (explained.get(lane) ?? 0) < enough).sort((a, b) => a - b);
}

function laneStates({ index, runs }: Findings, last: RunObservation | undefined): LaneState[] {
  if (runs.length === 0) return [];
  return ([...index.lanes] as Lane[]).map((lane) => {
    const failed = last?.failing.has(lane) ?? false;
    const passed = last?.passed.has(lane) ?? false;
    const state = failed ? (passed ? 'mixed' : 'failed') : passed ? 'passed' : 'untested';
    return { bank: index.document.memory.banks[index.bankOf(lane)]?.id ?? '', bit: index.bitOf(lane) as number, state };
  });
}

/** Two parts that are both likelier than not needed at once. */
function pairsOf({ parts, posterior }: Findings, { suspects }: Weighed): Diagnosis['pairs'] {
  const top = suspects.slice(0, 4);
  if (top.length < 2 || (top[0]?.probability ?? 0) + (top[1]?.probability ?? 0) < 1 + pairFrom / 2) return [];
  const numberOf = new Map(parts.map((part, p) => [part.id, p]));
  const found: Diagnosis['pairs'] = [];
  top.forEach((one, i) =>
    top.slice(i + 1).forEach((other) => {
      const probability = bothOf(posterior, numberOf.get(one.id) ?? -1, numberOf.get(other.id) ?? -1);
      if (probability >= pairFrom)
        found.push({ parts: [one.id, other.id], labels: [one.label, other.label], probability });
    }),
  );
  return found.sort((a, b) => b.probability - a.probability);
}

function bothOf(posterior: Posterior, one: number, other: number): number {
  const single = [probabilityOf(posterior, one), probabilityOf(posterior, other)] as const;
  if (Math.min(...single) < pairFrom) return 0;
  const both = single[0] + single[1] - posterior.anyOf(new Set([one, other]));
  return Math.min(1, Math.max(0, both));
}
