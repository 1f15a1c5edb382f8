import type { Lane, SocketIndex } from '../../brand';
import type { Cause, Kind, Part } from '../cause-types';
import type { Findings } from '../suspects';
import type { Weighed } from '../verdict';
import { largerFirst } from './information';
import { sortOf } from '../sort-of';
import type { Sort } from './likelihoods';

/** One way in which what failed can have come about: a part in a mode, of one kind. */
export interface State {
  readonly part: Part;
  readonly cause: Cause;
  readonly kind: Kind;
  readonly sort: Sort;
  /** Which of `answers` it belongs to. */
  readonly answer: number;
  /** Of 1, all states and the rest together. */
  readonly share: number;
  /** What it spoils now, as far as it showed; its whole reach where it showed nothing of it. Empty where it was cured. */
  readonly lanes: readonly Lane[];
  /** What it can spoil now, tested or not. */
  readonly reach: readonly Lane[];
  /** What failed in the last run and is none of its lanes. */
  readonly others: readonly Lane[];
}

/** Who is at fault, as far as a repair is concerned: a part, or null for what the model does not name. */
export interface Answer {
  readonly part: Part | null;
  readonly share: number;
}

/** The single-fault view of the posterior that the checks are weighed on. */
export interface Beliefs {
  readonly findings: Findings;
  readonly states: readonly State[];
  /** The last one is the rest. */
  readonly answers: readonly Answer[];
  /** What failed in the last run that showed anything, and what passed in it. */
  readonly failing: readonly Lane[];
  readonly passed: ReadonlySet<Lane>;
  /** What failed when it last failed: differs from `failing` where it went away. */
  readonly failed: readonly Lane[];
}

const mostStates = 40;
/** A state below this share of the leading one is left to the rest. */
const least = 1e-4;
/** The rest never counts for less: no model is whole. */
const leastRest = 0.005;

interface Found {
  readonly part: Part;
  readonly cause: Cause;
  readonly kind: Kind;
  readonly probability: number;
}

/**
 * The leading ways to explain what the likeliest one explains; with two faults at once, those of the
 * likelier; where the evidence can mean several things, those of every meaning. Null where nothing failed or
 * nothing explains it.
 */
export function believe({ findings, lastRun, interpretations }: Weighed): Beliefs | null {
  const { runs } = findings;
  const shown = lastFailingRun(runs, lastRun);
  if (shown === null) return null;
  const found = explaining(findings, shown);
  const [first] = found;
  if (!first) return null;
  const ever = findings.everFailing[shown] ?? new Set<Lane>();
  const focus =
    interpretations.length > 1 ? ever : new Set(lanesIn(first.kind, shown).filter((lane) => ever.has(lane)));
  const about = found.filter(
    ({ kind, probability }) =>
      probability >= first.probability * least && lanesIn(kind, shown).some((lane) => focus.has(lane)),
  );
  const kept = about.slice(0, mostStates);
  const told = about.reduce((total, each) => total + each.probability, 0);
  const held = kept.reduce((total, each) => total + each.probability, 0);
  const rest = Math.max(leastRest, 1 - held / Math.max(1, told));
  const scale = (1 - rest) / held;
  const answers: { part: Part | null; share: number }[] = [];
  const numberOf = new Map<Part, number>();
  const failing = runs[shown]?.failing ?? new Set<Lane>();
  const last = lastRun === null ? undefined : runs[lastRun];
  const failsNow = [...(last?.failing ?? [])].sort((a, b) => a - b);
  const states = kept.map(({ part, cause, kind, probability }): State => {
    const share = probability * scale;
    const answer = numberOf.get(part) ?? answers.push({ part, share: 0 }) - 1;
    numberOf.set(part, answer);
    (answers[answer] as { share: number }).share += share;
    const reach = kind.scopes.at(-1)?.lanes ?? [];
    const showed = reach.filter((lane) => failing.has(lane));
    const lanes = showed.length > 0 ? showed : reach;
    return {
      part,
      cause,
      kind,
      sort: sortOf(part, cause),
      answer,
      share,
      lanes,
      reach,
      others: failsNow.filter((lane) => !lanes.includes(lane)),
    };
  });
  return {
    findings,
    states,
    answers: [...answers, { part: null, share: rest }],
    failing: failsNow,
    passed: last?.passed ?? new Set<Lane>(),
    failed: [...failing],
  };
}

function lastFailingRun(runs: Findings['runs'], from: number | null): number | null {
  for (let r = from ?? -1; r >= 0; r--) if ((runs[r]?.failing.size ?? 0) > 0) return r;
  return null;
}

const lanesIn = (kind: Kind, run: number): readonly Lane[] => kind.scopes[run]?.lanes ?? [];

/** Every kind of every cause that reaches something that failed in the run, the likeliest first. */
function explaining({ parts, posterior, everFailing }: Findings, run: number): Found[] {
  const failing = everFailing[run] ?? new Set<Lane>();
  const found: Found[] = [];
  parts.forEach((part, p) =>
    part.causes.forEach((cause, c) =>
      cause.kinds.forEach((kind, k) => {
        const probability = posterior.kinds[p]?.[c]?.[k] ?? 0;
        if (probability < 1e-6) return;
        if (lanesIn(kind, run).some((lane) => failing.has(lane))) found.push({ part, cause, kind, probability });
      }),
    ),
  );
  return found.sort((a, b) => largerFirst(a.probability, b.probability));
}

/** A place with what is believed of its chip and its contact, the likeliest first. */
export interface Place {
  readonly socket: SocketIndex;
  readonly chip: number;
  readonly contact: number;
}

/** The sockets that the answers name. */
export function placesOf({ answers }: Beliefs): Place[] {
  const places = new Map<SocketIndex, { socket: SocketIndex; chip: number; contact: number }>();
  for (const { part, share } of answers) {
    if (!part || part.socket === null || (part.kind !== 'chip' && part.kind !== 'position')) continue;
    const place = places.get(part.socket) ?? { socket: part.socket, chip: 0, contact: 0 };
    if (part.kind === 'chip') place.chip += share;
    else place.contact += share;
    places.set(part.socket, place);
  }
  return [...places.values()].sort((a, b) => largerFirst(a.chip + a.contact, b.chip + b.contact));
}
