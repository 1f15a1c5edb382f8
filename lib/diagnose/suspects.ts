import type { FaultMode, Place, Suspect, SuspectMode } from '@/shared';
import { maxIndex, sum } from 'd3-array';
import type { Lane, SocketIndex } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { sentenceCase } from '../layout/words';
import type { Cause, Part } from './cause-types';
import { lanesWords } from './lane-words';
import type { RunObservation } from './observe/observations';
import { probabilityOf, type Posterior } from './posterior';
import { labelOf } from './timeline';

/** What the words about a suspect are made from. */
export interface Findings {
  readonly index: LayoutIndex;
  readonly parts: readonly Part[];
  readonly posterior: Posterior;
  readonly runs: readonly RunObservation[];
  /** For each run, the lanes that failed in any of the ways to understand the evidence. */
  readonly everFailing: readonly ReadonlySet<Lane>[];
  /** Each piece of evidence as typed, with its run and the lanes that it says failed. */
  readonly said: readonly { readonly run: number; readonly text: string; readonly failing: readonly Lane[] }[];
}

/** Suspects below this are not listed, unless fewer than `leastListed` would be. */
const worthListing = 0.005;
const leastListed = 3;
/** Below this a mode explains nothing worth a word. */
const least = 1e-5;
/** From here the overlap of chip and contact is worth a second sum. */
const countedTwiceFrom = 0.3;
const mostListed = 24;

/**
 * The parts by probability, with reasons. A part that explains nothing of what failed is no suspect, however
 * little it was tested.
 */
export function listSuspects(findings: Findings): Suspect[] {
  const { parts, posterior } = findings;
  return parts
    .map((part, at) => ({
      part,
      at,
      probability: probabilityOf(posterior, at),
      explains: explaining(findings, at),
    }))
    .filter(({ explains }) => explains > 0)
    .sort((a, b) => likelier(b.explains, a.explains) || a.at - b.at)
    .filter(({ explains }, i) => i < mostListed && (explains >= worthListing || i < leastListed))
    .sort((a, b) => likelier(b.probability, a.probability) || a.at - b.at)
    .map(({ part, at, probability }, i) => describe(findings, { part, at, probability, rank: i + 1 }));
}

/** Probability of the modes of a part that spoil anything that failed. */
function explaining({ parts, posterior, everFailing }: Findings, at: number): number {
  let total = 0;
  parts[at]?.causes.forEach((cause, c) =>
    cause.kinds.forEach((kind, k) => {
      const own = posterior.kinds[at]?.[c]?.[k] ?? 0;
      if (own < least) return;
      const reaches = kind.scopes.some((scope, r) => scope?.lanes.some((lane) => everFailing[r]?.has(lane)));
      if (reaches) total += own;
    }),
  );
  return total;
}

/** Difference of two probabilities, 0 where only the last digits of a double differ. */
function likelier(a: number, b: number): number {
  return Math.abs(a - b) < 1e-9 ? 0 : a - b;
}

function leadingCause(findings: Findings, { part, at }: { part: Part; at: number }): { cause: Cause; at: number } {
  const best = maxIndex(findings.posterior.kinds[at] ?? [], (kinds) => sum(kinds));
  return { cause: part.causes[Math.max(0, best)] as Cause, at: Math.max(0, best) };
}

function describe(findings: Findings, of: { part: Part; at: number; probability: number; rank: number }): Suspect {
  const { index } = findings;
  const { part } = of;
  const { cause } = leadingCause(findings, of);
  const socketLabel = (socket: SocketIndex | null) => (socket === null ? null : labelOf(index, socket));
  const now = cause.kinds[0]?.scopes.at(-1) ?? null;
  const evidence = weighEvidence(findings, cause);
  return {
    rank: of.rank,
    kind: part.kind,
    id: part.id,
    label: part.label,
    socket: socketLabel(part.socket),
    cameFrom: part.cameFrom === part.socket ? null : socketLabel(part.cameFrom),
    sharedPart: part.sharedPart,
    channel: cause.mode === 'channel' ? cause.where : null,
    probability: of.probability,
    modes: modesOf(findings, of),
    lanes: (now?.lanes ?? []).map((lane) => ({
      bank: index.document.memory.banks[index.bankOf(lane)]?.id ?? '',
      bit: index.bitOf(lane) as number,
    })),
    reasons: reasonsFor(findings, { ...of, cause }),
    explains: evidence.explains,
    contradicts: evidence.contradicts,
  };
}

/** How a mode is said. */
export function modeWords(mode: FaultMode, where: string | null): string {
  switch (mode) {
    case 'dead':
      return 'bad for its own lanes';
    case 'dead-bit':
      return `bad at ${where ?? 'one data pin'}`;
    case 'holds-line':
      return where ? `never lets go of its data line at ${where}` : 'never lets go of its data line';
    case 'holds-strobe':
      return 'holds the strobe of its bank';
    case 'holds-address':
      return 'holds an address line';
    case 'open':
      return 'no contact';
    case 'open-bit':
      return `no contact at ${where ?? 'one data pin'}`;
    case 'fitting':
      return 'bent leg or chip turned round since it was handled';
    case 'channel':
      return where ? `its channel for ${where}` : 'the line itself';
    case 'whole':
      return 'as a whole';
    case 'short':
      return 'the two lines joined';
    case 'wrong-part':
      return 'not made for this socket';
    case 'supply':
      return 'out of its limits';
  }
}

function modesOf({ posterior }: Findings, { part, at }: { part: Part; at: number }): SuspectMode[] {
  const modes = part.causes.flatMap((cause, c) =>
    [false, true].flatMap((intermittent): SuspectMode[] => {
      let prior = 0;
      let probability = 0;
      cause.kinds.forEach((kind, k) => {
        if (kind.intermittent !== intermittent) return;
        prior += kind.prior;
        probability += posterior.kinds[at]?.[c]?.[k] ?? 0;
      });
      if (prior === 0) return [];
      const words = modeWords(cause.mode, cause.where) + (intermittent ? ', comes and goes' : '');
      return [
        { mode: cause.mode, intermittent, words, prior: Math.min(1, prior), probability: Math.min(1, probability) },
      ];
    }),
  );
  return modes.filter((mode) => mode.probability >= 0.0005).sort((a, b) => b.probability - a.probability);
}

function weighEvidence({ said, runs }: Findings, cause: Cause): { explains: string[]; contradicts: string[] } {
  const explains = new Set<string>();
  const contradicts = new Set<string>();
  for (const piece of said) {
    const scope = cause.kinds[0]?.scopes[piece.run];
    const lanes = new Set(scope?.lanes);
    if (piece.failing.some((lane) => lanes.has(lane))) explains.add(piece.text);
    else if (scope?.lanes.some((lane) => runs[piece.run]?.passed.has(lane))) contradicts.add(piece.text);
  }
  return { explains: [...explains], contradicts: [...contradicts] };
}

const kindWords: Partial<Record<FaultMode, string>> = {
  'holds-line': 'A chip that never lets go of its data line spoils the bit in every bank on that line.',
  'holds-strobe': 'A chip that holds the strobe of its bank spoils all bits of the bank.',
  'holds-address': 'A chip that holds an address line spoils every lane.',
  'wrong-part': 'The supply pins of this socket break a chip of the family that was fitted.',
  fitting: 'It was handled just before: look for a folded leg or a chip turned round.',
};

function reasonsFor(findings: Findings, of: { part: Part; at: number; cause: Cause }): string[] {
  const { index, runs, posterior } = findings;
  const { cause, part } = of;
  const reasons: string[] = [];
  const many = runs.filter((run) => run.failing.size + run.passed.size > 0).length > 1;
  const spoiled = (r: number): readonly Lane[] => cause.kinds.find((kind) => kind.scopes[r])?.scopes[r]?.lanes ?? [];
  const general = kindWords[cause.mode];
  if (general) reasons.push(general);
  runs.forEach((run, r) => {
    const lanes = spoiled(r);
    const inRun = many ? ` in run ${r + 1}` : '';
    const explained = lanes.filter((lane) => run.failing.has(lane));
    const passed = lanes.filter((lane) => run.passed.has(lane));
    const own = new Set(lanes);
    const others = [...run.failing].filter((lane) => !own.has(lane));
    if (run.failing.size > 0 && explained.length === 0) {
      reasons.push(`It does not explain ${lanesWords(index, run.failing)}${inRun}.`);
    } else if (explained.length > 0 && others.length === 0) {
      reasons.push(`It explains all that failed${inRun}: ${lanesWords(index, explained)}.`);
    } else if (explained.length > 0) {
      reasons.push(`It explains ${lanesWords(index, explained)}${inRun}, but not ${lanesWords(index, others)}.`);
    }
    if (passed.length > 0) {
      const would = cause.mode === 'whole' || cause.mode === 'channel' ? 'would fail too' : 'would have failed';
      reasons.push(`${sentenceCase(lanesWords(index, passed))} ${would}${inRun}, and passed.`);
    }
  });
  if (part.kind === 'chip' && part.socket !== null && part.cameFrom !== part.socket && part.cameFrom !== null) {
    reasons.push(`It came from ${labelOf(index, part.cameFrom)}.`);
  }
  const own = posterior.kinds[of.at]?.[part.causes.indexOf(cause)];
  const share = (wanted: (kind: Cause['kinds'][number]) => boolean) => {
    let sum = 0;
    let all = 0;
    cause.kinds.forEach((kind, k) => {
      const p = own?.[k] ?? 0;
      all += p;
      if (wanted(kind)) sum += p;
    });
    return all > 0 ? sum / all : 0;
  };
  if (share((kind) => kind.cured !== null) > 0.5 && cause.mode !== 'fitting')
    reasons.push('Handling it may have cured the contact for a time.');
  else if (share((kind) => kind.intermittent) > 0.5) reasons.push('It fits best as a fault that comes and goes.');
  return reasons;
}

/** Every place by the probability that the fault sits there: the chip that lies there now, or its contacts. */
export function listPlaces(findings: Findings): Place[] {
  const { index, parts, posterior } = findings;
  const perSocket = new Map<SocketIndex, { chip: number; contact: number; parts: Set<number> }>();
  parts.forEach((part, at) => {
    if (part.socket === null) return;
    const entry = perSocket.get(part.socket) ?? { chip: 0, contact: 0, parts: new Set<number>() };
    entry.parts.add(at);
    if (part.kind === 'chip') entry.chip = probabilityOf(posterior, at);
    else entry.contact = probabilityOf(posterior, at);
    perSocket.set(part.socket, entry);
  });
  const sorted = [...perSocket]
    .map(([socket, entry]) => ({ socket, ...entry, sum: Math.min(1, entry.chip + entry.contact) }))
    .sort((a, b) => likelier(b.sum, a.sum) || a.socket - b.socket)
    .filter(({ sum }, i) => i < mostListed && (sum >= worthListing || i < leastListed));
  return sorted.map(({ socket, chip, contact, parts: both, sum }, i) => ({
    socket: labelOf(index, socket),
    // Chip and contact may be bad together; the sum of the two would count that twice.
    probability: i < 4 && sum > countedTwiceFrom ? posterior.anyOf(both) : sum,
    chip,
    contact,
  }));
}
