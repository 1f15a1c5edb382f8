import type { FaultMode } from '@/shared';
import type { SocketIndex } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import type { Part } from '../cause-types';
import { labelOf } from '../timeline';
import type { Handling } from './rerun';
import type { Beliefs } from './states';

interface Shown {
  /** Shares of the answers once the outcome is seen. */
  readonly after: readonly number[];
  /** Nothing fails any more. */
  readonly clears: boolean;
  readonly handling: Handling;
  /** In which mode an answer most likely brings the outcome about. */
  readonly modeOf: (answer: number) => FaultMode | null;
}

/** What an outcome of a run means, in words that name every chip by where it is then. */
export type Meaning = (shown: Shown) => string;

/** A second answer is told beside the first where it holds at least this share of it. */
const besideFirst = 0.3;
/** From here on one answer is told as if it were the only one. */
const plainly = 0.9;

/** Words for outcomes, by the answers that they leave likely. */
export function meaningFor({ answers, findings }: Beliefs): Meaning {
  return ({ after, clears, handling, modeOf }) => {
    const order = answers.map((_, n) => n).sort((a, b) => (after[b] ?? 0) - (after[a] ?? 0));
    const first = order[0] ?? 0;
    const second = order[1];
    const one = after[first] ?? 0;
    const beside = second !== undefined && one < plainly && (after[second] ?? 0) >= besideFirst * one;
    const named = [first, ...(beside ? [second] : [])].flatMap((n) => answers[n]?.part ?? []);
    if (named.length === 0) return 'something else: type it in as a new run';
    const removed = named[0]?.kind === 'chip' && movedOff(named[0], handling);
    if (clears) {
      if (removed)
        return `the chip taken out of ${socketOf(findings.index, named[0])} was bad: soak before you call it repaired`;
      const suspects = named.map((part) => suspectWords(findings.index, part, handling));
      return `not repaired yet: ${suspects.join(', or ')}; soak it`;
    }
    return [first, ...(beside ? [second] : [])]
      .flatMap((n) => {
        const part = answers[n]?.part;
        return part ? [blameWords(findings.index, part, { handling, mode: modeOf(n) })] : [];
      })
      .join('; or ');
  };
}

function movedOff({ socket }: Part, { moves }: Handling): boolean {
  return socket !== null && moves.has(socket) && moves.get(socket) === null;
}

function socketNow({ kind, socket }: Part, { moves }: Handling): SocketIndex | null {
  if (socket === null || kind !== 'chip') return socket;
  return moves.has(socket) ? (moves.get(socket) ?? null) : socket;
}

const socketOf = (index: LayoutIndex, part: Part | undefined) =>
  part?.socket === null || part === undefined ? '?' : labelOf(index, part.socket);

const holdsWords: Partial<Record<FaultMode, string>> = {
  'holds-line': 'holds the data line',
  'holds-strobe': 'holds the strobe of its bank',
  'holds-address': 'holds an address line',
};

/** What to do about the part. */
function blameWords(index: LayoutIndex, part: Part, how: { handling: Handling; mode: FaultMode | null }): string {
  const now = socketNow(part, how.handling);
  switch (part.kind) {
    case 'chip': {
      const wrong = (how.mode && holdsWords[how.mode]) ?? 'is bad';
      if (now === null) return `the chip taken out of ${socketOf(index, part)} ${wrong.replace(/^is/, 'was')}`;
      return `the chip that is ${now === part.socket ? '' : 'now '}in ${labelOf(index, now)} ${wrong}`;
    }
    case 'position':
      return `look at socket ${socketOf(index, part)}, its solder, its trace`;
    case 'short':
      return `look for a ${part.label}`;
    case 'rail':
      return `put ${part.label} right first`;
    default:
      return `look at ${part.label}`;
  }
}

function suspectWords(index: LayoutIndex, part: Part, handling: Handling): string {
  const now = socketNow(part, handling);
  if (part.kind === 'position') return `the contact at ${socketOf(index, part)}`;
  if (part.kind === 'chip' && now !== null)
    return `the chip ${now === part.socket ? '' : 'now '}in ${labelOf(index, now)} comes and goes`;
  return part.label;
}
