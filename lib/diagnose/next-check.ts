import { sum } from 'd3-array';
import type { Change, Evidence, NextCheck, Place, Run } from '@/shared';
import type { Lane, SocketIndex } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { listWords } from '../layout/words';
import { listParts } from './causes';
import { compiledFormats } from './compiled-formats';
import { lanesWords } from './lane-words';
import { weighAll } from './mixture';
import type { RunObservation } from './observations';
import { probabilityOf } from './posterior';
import type { Priors } from './priors';
import { followChips, labelOf } from './timeline';
import { wentAway, type Verdict, type Weighed } from './verdict';

export interface CheckInput {
  readonly weighed: Weighed;
  readonly verdict: Verdict;
  readonly runs: readonly Run[];
  readonly priors: Priors;
}

/** Minutes with their risk (common practice, no source). */
const minutes = { swap: 8, pullInTurn: 12, probe: 10, measure: 6.5, soak: 480, readAgain: 2 };
/** From here on a swap has nothing left to tell. */
const provenFrom = 0.95;
/** Work on soldered chips costs about this many times as much (common practice, no source). */
const solderedFactor = 10;

/**
 * The check that fits the answer: a swap where a chip leads, its chips in turn where several could hold a
 * line, a look at the shared parts, a soak where the fault went away. Outcomes carry the probability that
 * the model gives them before the check is made.
 */
export function nextChecks(input: CheckInput): NextCheck[] {
  const { verdict, weighed } = input;
  switch (verdict.outcome) {
    case 'no-evidence':
    case 'not-shown':
      return [];
    case 'unexplained':
      return [readAgain()];
    case 'shared':
      return [probe(verdict)];
    case 'group': {
      if (wentAway(weighed)) return [soak(verdict)];
      if (weighed.interpretations.length > 1)
        return [{ ...readAgain(), label: verdict.groups[0]?.check ?? readAgain().label }];
      const inTurn = pullInTurn(input);
      return inTurn ? [inTurn] : [readAgain()];
    }
    case 'place': {
      if (wentAway(weighed)) return [soak(verdict)];
      if (verdict.refit) return [refit(verdict)];
      const [first] = weighed.places as [Place];
      if (first.contact > first.chip) return [measure(input, first)];
      if (first.chip >= provenFrom)
        return [substitute(first, { soldered: isSoldered(weighed.findings.index, first.socket) })];
      return [swapCheck(input)];
    }
  }
}

function readAgain(): NextCheck {
  return {
    action: 'read-again',
    label: 'Switch off and on, and read the report again.',
    sockets: [],
    minutes: minutes.readAgain,
    bits: 0,
    outcomes: [],
  };
}

function soak(verdict: Verdict): NextCheck {
  return {
    action: 'soak',
    label: `Clean the legs and contacts of ${listWords(verdict.sockets)}, then let the test run for eight hours, cold and warm.`,
    sockets: [...verdict.sockets],
    minutes: minutes.soak,
    bits: 0,
    outcomes: [],
  };
}

function refit(verdict: Verdict): NextCheck {
  const sockets = [...verdict.sockets];
  const label = `Power off, look at every leg in ${listWords(sockets)}, refit, and run again.`;
  return { action: 'reseat', label, sockets, minutes: minutes.swap, bits: 0, outcomes: [] };
}

/** A contact is measured to the leg of the chip: the socket alone would leave the contact out. */
function measure({ weighed }: CheckInput, place: Place): NextCheck {
  const { index } = weighed.findings;
  const socket = index.socketByLabel.get(place.socket);
  const neighbour = socket === undefined ? null : partnerFor(index, socket, { failing: new Set(), passed: new Set() });
  const from = neighbour === null ? 'the line' : `the same pin of ${labelOf(index, neighbour)}`;
  return {
    action: 'measure',
    label: `Power off, measure from ${from} to the leg of the chip in ${place.socket}, pin by pin; the data pins lead elsewhere.`,
    sockets: [place.socket],
    minutes: minutes.measure,
    bits: 0,
    outcomes: [
      { sees: 'open at a leg', means: `the contact or trace at ${place.socket}`, probability: place.contact },
      {
        sees: 'all joined',
        means: 'look further: the line, its driver, the chip',
        probability: Math.max(0, 1 - place.contact),
      },
    ],
  };
}

function entropy(shares: readonly number[]): number {
  const total = sum(shares);
  return -sum(shares, (share) => (share > 0 ? (share / total) * Math.log2(share / total) : 0));
}

function probe(verdict: Verdict): NextCheck {
  const members = verdict.groups[0]?.members ?? [];
  return {
    action: 'probe',
    label: 'Measure the supply rails at a socket, then scope the shared parts in this order.',
    sockets: [],
    minutes: minutes.probe,
    bits: entropy(members.map((member) => member.share)),
    outcomes: members.map((member) => ({ sees: 'signal wrong', means: member.label, probability: member.share })),
  };
}

function pullInTurn({ verdict, weighed }: CheckInput): NextCheck | null {
  const { index } = weighed.findings;
  if (verdict.sockets.length === 0) return null;
  const soldered = verdict.sockets.some((label) => isSoldered(index, label));
  const members = verdict.groups[0]?.members ?? [];
  return {
    action: 'pull-in-turn',
    label: verdict.groups[0]?.check ?? `Take out ${listWords(verdict.sockets)} in turn, and run again each time.`,
    sockets: [...verdict.sockets],
    minutes: minutes.pullInTurn * (soldered ? solderedFactor : 1),
    bits: entropy(members.map((member) => member.share)),
    outcomes: members.map((member) => ({
      sees: verdict.sockets.includes(member.label)
        ? `better with ${member.label} out`
        : 'no change with any of them out',
      means: verdict.sockets.includes(member.label) ? `the chip of ${member.label}` : member.label,
      probability: member.share,
    })),
  };
}

function isSoldered(index: LayoutIndex, label: string): boolean {
  const socket = index.socketByLabel.get(label);
  return socket !== undefined && (index.document.sockets[socket]?.soldered ?? false);
}

/** A chip of the same family whose lanes passed: of the same bank if there is one, so that little else changes. */
function partnerFor(index: LayoutIndex, socket: SocketIndex, run: RunObservation): SocketIndex | null {
  const own = lanesOf(index, socket);
  const family = index.document.sockets[socket]?.family;
  const scored = index.document.sockets.flatMap((other, at) => {
    if (at === socket || other.family !== family || other.soldered) return [];
    const lanes = lanesOf(index, at as SocketIndex);
    if (lanes.length !== own.length || lanes.some((lane) => run.failing.has(lane))) return [];
    const tested = lanes.every((lane) => run.passed.has(lane)) ? 2 : 0;
    const sameBank = lanes.some((lane) => own.some((o) => index.bankOf(o) === index.bankOf(lane))) ? 1 : 0;
    return [{ at: at as SocketIndex, score: tested + sameBank - Math.abs(at - socket) / 1e6 }];
  });
  scored.sort((a, b) => b.score - a.score);
  return scored[0]?.at ?? null;
}

function lanesOf(index: LayoutIndex, socket: SocketIndex): Lane[] {
  return [...index.socketLanes.subarray(index.socketLaneStart[socket], index.socketLaneStart[socket + 1])] as Lane[];
}

/** What the lanes of one socket become when its chip is moved to another: pin by pin. */
function moved(
  index: LayoutIndex,
  lanes: Iterable<Lane>,
  { from, to }: { from: SocketIndex; to: SocketIndex },
): Set<Lane> {
  const own = lanesOf(index, from);
  const other = lanesOf(index, to);
  return new Set([...lanes].map((lane) => (own.includes(lane) ? (other[own.indexOf(lane)] as Lane) : lane)));
}

function swapCheck(input: CheckInput): NextCheck {
  const { weighed, runs, priors } = input;
  const { findings, places } = weighed;
  const { index } = findings;
  const [place] = places as [Place];
  const socket = index.socketByLabel.get(place.socket);
  const last = weighed.lastRun === null ? undefined : findings.runs[weighed.lastRun];
  if (socket === undefined || !last || last.failing.size === 0) return readAgain();
  const partner = partnerFor(index, socket, last);
  const soldered = isSoldered(index, place.socket);
  if (partner === null || soldered) return substitute(place, { soldered });
  const labels: [string, string] = [labelOf(index, socket), labelOf(index, partner)];
  const change: Change = { kind: 'swap', sockets: labels };
  const outcomes = [
    {
      failing: moved(index, last.failing, { from: socket, to: partner }),
      means: `the chip is bad: fit another in ${labels[1]}`,
    },
    { failing: new Set(last.failing), means: `the chip is good: look at socket ${labels[0]}, its solder and its line` },
    { failing: new Set<Lane>(), means: 'contact or a fault that comes and goes: clean, then soak' },
  ];
  const timeline = followChips(index, [...runs.map((run) => run.changes), [change]]);
  const parts = listParts(index, timeline, priors);
  const tested = new Set([...last.failing, ...last.passed, ...outcomes.flatMap((outcome) => [...outcome.failing])]);
  const before = findings.posterior.logEvidence;
  const now = shares(places, place);
  let expected = 0;
  let told = 0;
  const listed = outcomes.map((outcome) => {
    const passed = new Set([...tested].filter((lane) => !outcome.failing.has(lane)));
    const { posterior } = weighAll(
      parts,
      [{ runs: [...findings.runs, { failing: outcome.failing, passed }], takes: [] }],
      priors,
    );
    const probability = Math.min(1, Math.exp(posterior.logEvidence - before));
    const chip = parts.findIndex(
      (part) => part.kind === 'chip' && part.cameFrom === chipHome(weighed, socket) && part.socket === partner,
    );
    const contact = parts.findIndex((part) => part.kind === 'position' && part.socket === socket);
    const after = [probabilityOf(posterior, chip), probabilityOf(posterior, contact)];
    expected += probability * entropy([...after, Math.max(0, 1 - (after[0] ?? 0) - (after[1] ?? 0))]);
    told += probability;
    return { sees: reported(input, outcome.failing), means: outcome.means, probability };
  });
  const rest = Math.max(0, 1 - told);
  // Where most of the time the swap shows something else, it does not decide between chip and contact.
  if (rest > 0.5) return substitute(place, { soldered: false });
  return {
    action: 'swap',
    label: `Power off, swap ${labels[0]} with ${labels[1]}, run again.`,
    sockets: labels,
    minutes: minutes.swap,
    bits: Math.max(0, entropy(now) - expected - rest * entropy(now)),
    outcomes:
      rest > 0.005
        ? [...listed, { sees: 'anything else', means: 'type it in as a new run', probability: rest }]
        : listed,
  };
}

function chipHome({ findings }: Weighed, socket: SocketIndex): SocketIndex | null {
  return findings.parts.find((part) => part.kind === 'chip' && part.socket === socket)?.cameFrom ?? socket;
}

function shares(places: readonly Place[], place: Place): number[] {
  return [place.chip, place.contact, Math.max(0, 1 - place.chip - place.contact)];
}

function substitute(place: Place, { soldered }: { soldered: boolean }): NextCheck {
  return {
    action: 'replace',
    label: soldered
      ? `${place.socket} is soldered: scope its data pin against a good chip before you desolder it.`
      : `Fit a known good chip in ${place.socket} and run again.`,
    sockets: [place.socket],
    minutes: minutes.swap * (soldered ? solderedFactor : 1),
    bits: 0,
    outcomes: [],
  };
}

/** What the board will show: the code in the format that was used last, else the lanes in words. */
function reported({ runs, weighed }: CheckInput, failing: ReadonlySet<Lane>): string {
  const { index } = weighed.findings;
  if (failing.size === 0) return 'no failure';
  const codes = runs
    .flatMap((run) => run.evidence)
    .filter((each): each is Extract<Evidence, { kind: 'code' }> => each.kind === 'code');
  const format = compiledFormats(index).get(codes.at(-1)?.format ?? '');
  const written = format?.write([...failing]);
  return written?.ok ? written.text : lanesWords(index, failing);
}
