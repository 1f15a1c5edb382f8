import { sum } from 'd3-array';
import type { Evidence, Finding, Measurement, ReadEvidence, Run, Sign } from '@/shared';
import type { Lane } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import type { AddressMap } from '../../place/address';
import type { LaneSeen } from '../../readings/lane-seen';
import type { ValueSeen } from '../../readings/tally';
import type { CompiledFormat } from '../../report/meaning';
import type { Tried } from '../shapes';
import { consistentChoices } from './choices';
import { observeRun } from './observe-run';
import { emptyPiece, shownOf, type Piece, type Read, type Where } from './piece';
import { readCode } from './read-code';
import { readLanes, readMask, readPass } from './read-lanes';
import { readAlias, readFinding, readLog, readMeasurement, readPicture, readReadings, readSign } from './read-readings';

/** What one run showed of each lane that was tested in it. */
export interface RunObservation {
  readonly failing: ReadonlySet<Lane>;
  readonly passed: ReadonlySet<Lane>;
  /** What single readings showed; empty where the evidence speaks of whole lanes only. */
  readonly seen: ReadonlyMap<Lane, LaneSeen>;
  /** For lanes that passed in single readings: what was tried. Lanes that are not listed were tested as a whole. */
  readonly tried: ReadonlyMap<Lane, Tried>;
  /** The code names one of several failing lanes or banks, as if at random; null where it does not. */
  readonly picked: 'lane' | 'bank' | null;
  /** For failing lanes of banks that are several chips deep: the chips that hold a failing word, and those seen right. */
  readonly failingSegments: ReadonlyMap<Lane, number>;
  readonly rightSegments: ReadonlyMap<Lane, number>;
  readonly values: readonly ValueSeen[];
  /** Address bits of the chip that lead to one cell, by lane. */
  readonly aliased: ReadonlyMap<Lane, readonly number[]>;
  /** The whole memory was tested and every failure is known, with its words. */
  readonly whole: boolean;
}

/** One way to understand all the evidence together; several remain where a convention is unknown. */
export interface Interpretation {
  readonly runs: readonly RunObservation[];
  /** Which conventions it takes, in words. */
  readonly takes: readonly string[];
}

export interface Observations {
  readonly interpretations: readonly Interpretation[];
  readonly evidence: readonly ReadEvidence[];
  /** Lanes that each piece of evidence says failed, in the order of `evidence`. */
  readonly failingOf: readonly (readonly Lane[])[];
  /** For each run, why silence may not be taken for a pass, in words; null where nothing was left untested. */
  readonly silence: readonly (string | null)[];
  readonly notes: readonly string[];
  readonly signs: readonly (Sign & { readonly run: number })[];
  readonly measurements: readonly (Measurement & { readonly run: number })[];
  readonly findings: readonly Finding[];
}

/** More ways to understand all the evidence together than this are not followed, fewer where very many lanes fail. */
const mostInterpretations = 96;
const lanesTimesWays = 2000;

/**
 * Reads every piece of evidence of every run, and says for each lane whether it failed, passed or was not
 * tested. What cannot be read is told with its reason and left out.
 */
export function observe(
  of: { index: LayoutIndex; map: AddressMap },
  runs: readonly Run[],
  formats: ReadonlyMap<string, CompiledFormat>,
): Observations {
  const { index } = of;
  const read = runs.flatMap((run, r) =>
    run.evidence.map((each, i) => readPiece({ ...of, formats, run: r, at: i }, each)),
  );
  const pieces = read.flatMap(({ piece }) => (piece ? [piece] : []));
  const notes: string[] = [];
  const choices = consistentChoices(pieces);
  const lanes = Math.max(1, ...choices.slice(0, 8).map((choice) => sum(choice, (each) => each.failing.length)));
  const most = Math.max(4, Math.min(mostInterpretations, Math.floor(lanesTimesWays / lanes)));
  if (choices.length > most) {
    notes.push(`The evidence can be understood in ${choices.length} ways; the first ${most} are weighed.`);
  }
  const interpretations = choices.slice(0, most).map((choice) => ({
    runs: runs.map((run, r) =>
      observeRun(
        index,
        run,
        pieces.flatMap((piece, p) => {
          const chosen = choice[p];
          return piece.run === r && chosen ? [{ piece, choice: chosen }] : [];
        }),
      ),
    ),
    takes: [...new Set(choice.flatMap((each) => each.takes))],
  }));
  const ofRun = (r: number) => pieces.filter((piece) => piece.run === r);
  return {
    interpretations,
    evidence: read.map(({ shown }) => shown),
    failingOf: read.map(({ piece }) => [...new Set((piece?.choices ?? []).flatMap((choice) => choice.failing))]),
    silence: runs.map((run, r) => silenceWords(run, ofRun(r))),
    notes: [...notes, ...runs.flatMap((_, r) => twoStops(ofRun(r), r))],
    signs: pieces.flatMap(({ run, sign }) => (sign ? [{ ...sign, run }] : [])),
    measurements: pieces.flatMap(({ run, measurement }) => (measurement ? [{ ...measurement, run }] : [])),
    findings: pieces.flatMap(({ finding }) => (finding ? [finding] : [])),
  };
}

function readPiece(where: Where, evidence: Evidence): Read {
  switch (evidence.kind) {
    case 'code':
      return readCode(where, evidence);
    case 'mask':
      return readMask(where, evidence);
    case 'lanes':
      return readLanes(where, evidence);
    case 'pass':
      return readPass(where, evidence);
    case 'readings':
      return readReadings(where, evidence);
    case 'log':
      return readLog(where, evidence);
    case 'picture':
      return readPicture(where, evidence);
    case 'alias':
      return readAlias(where, evidence);
    case 'sign':
      return readSign(where, evidence);
    case 'measurement':
      return readMeasurement(where, evidence);
    case 'finding':
      return readFinding(where, evidence);
    case 'either':
      return readEither(where, evidence);
  }
}

/** Evidence that can be understood in several ways; a way that leads nowhere is ruled out by that. */
function readEither(where: Where, evidence: Extract<Evidence, { kind: 'either' }>): Read {
  const ways = evidence.ways.map((way) => ({ takes: way.takes, read: readPiece(where, way.evidence) }));
  const fitting = ways.flatMap(({ takes, read }) =>
    read.piece ? [{ takes, piece: read.piece, shown: read.shown }] : [],
  );
  const [first] = fitting;
  if (!first) {
    const reasons = ways.map(({ takes, read }) => `${takes}: ${read.shown.reason ?? 'not read'}`);
    const text = ways[0]?.read.shown.text ?? '';
    return { piece: null, shown: { ...shownOf(where, text), ok: false, reason: reasons.join(' ') } };
  }
  const choices = fitting.flatMap(({ takes, piece }) =>
    piece.choices.map((choice) => ({ ...choice, takes: [takes, ...choice.takes] })),
  );
  const ruledOut = ways.flatMap(({ takes, read }) => (read.piece ? [] : [`Not ${takes}: ${read.shown.reason ?? ''}`]));
  const piece: Piece = {
    ...emptyPiece(where),
    question: `either ${evidence.ways
      .map((way) => way.takes)
      .sort()
      .join(' | ')}`,
    after: first.piece.after,
    unordered: fitting.every((way) => way.piece.unordered),
    choices,
    passesOutright: fitting.every((way) => way.piece.passesOutright),
  };
  const failing = fitting.flatMap((way) => way.shown.failing);
  return {
    piece,
    shown: {
      ...first.shown,
      notes: [...first.shown.notes, ...ruledOut],
      failing: failing.filter((lane, i) => failing.findIndex((o) => o.bank === lane.bank && o.bit === lane.bit) === i),
      words: fitting.flatMap((way) => way.shown.words).slice(0, 64),
      alternatives: choices.length,
    },
  };
}

function silenceWords(run: Run, pieces: readonly Piece[]): string | null {
  if (pieces.some((piece) => piece.after === 'stops')) return 'this self-test stops at the first failure';
  if (pieces.some((piece) => piece.after !== null) && !run.complete) return 'the list of failures was not complete';
  return pieces.length > 0 ? 'nothing was said of it' : null;
}

function twoStops(pieces: readonly Piece[], run: number): string[] {
  const stops = pieces.filter((piece) => piece.after === 'stops');
  const different = new Set(stops.map((piece) => (piece.choices[0]?.failing ?? []).join(' ')));
  if (different.size < 2) return [];
  return [
    `Run ${run + 1} holds ${different.size} different codes of a test that stops at the first failure: the fault changes from pass to pass, or they belong into separate runs.`,
  ];
}
