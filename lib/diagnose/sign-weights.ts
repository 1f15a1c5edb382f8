import type { SharedPart, SignKind } from '@/shared';
import type { Cause, Kind, Part } from './cause-types';

type Role = SharedPart['role'];

interface About {
  readonly part: Part;
  readonly cause: Cause;
  readonly kind: Kind;
  readonly role: Role | null;
  /** The sign speaks of this socket: true, of another: false, of none: null. */
  readonly here: boolean | null;
}

const ofChip = ({ part }: About) => part.kind === 'chip';
const ofPosition = ({ part }: About) => part.kind === 'position';

/**
 * How likely a sign is where a cause is at work, 0 to 1; only the ratios between causes count. Estimates of the trade
 * (common practice, no source).
 */
const weights: Record<SignKind, (about: About) => number> = {
  'changes-each-pass': ({ kind, role, cause }) => {
    if (kind.intermittent) return 0.8;
    // Multiplexers, refresh and supply give other failures in each pass (a machine's service manual says so of the first).
    if (role === 'multiplexer' || role === 'refresh-counter' || role === 'supply') return 0.6;
    return cause.mode === 'whole' ? 0.3 : 0.08;
  },
  'grows-with-waiting': (about) => {
    if (about.role === 'refresh-counter') return 0.9;
    if (about.role === 'strobe-driver' || about.role === 'supply') return 0.2;
    if (about.part.id === 'unlisted:all') return 0.3;
    return ofChip(about) ? 0.08 : 0.01;
  },
  'grows-with-warmth': (about) => {
    if (about.kind.intermittent) return ofPosition(about) || ofChip(about) ? 0.6 : 0.4;
    return ofChip(about) ? 0.15 : 0.05;
  },
  touch: (about) => {
    const contact = ofPosition(about) || about.role === 'connector';
    const base = contact ? 0.8 : ofChip(about) ? 0.15 : 0.1;
    const place = about.here === null ? 1 : about.here ? 1 : 0.25;
    return base * place * (about.kind.intermittent ? 1 : 0.4);
  },
  hot: (about) => {
    // One chip in seven that is bad runs hot, one good chip in a hundred does (estimates of the same table).
    if (about.here === null) return ofChip(about) ? 0.15 : 0.02;
    return about.here && ofChip(about) ? (about.cause.mode === 'wrong-part' ? 0.6 : 0.15) : 0.01;
  },
  'writes-do-not-stick': (about) => {
    if (about.role === 'write-driver') return 0.9;
    // Drivers of strobes often drive the write line as well.
    if (about.role === 'strobe-driver') return 0.4;
    if (ofPosition(about)) return 0.1;
    return about.part.id === 'unlisted:all' ? 0.2 : 0.04;
  },
  dead: () => 1,
};

/** The weight of a sign for a cause: ratios between causes are likelihood ratios. */
export function signWeight(sign: SignKind, about: About): number {
  return weights[sign](about);
}

/** The same for a failure that nothing in the model explains. */
export const unknownWeights: Record<SignKind, number> = {
  'changes-each-pass': 0.3,
  'grows-with-waiting': 0.05,
  'grows-with-warmth': 0.2,
  touch: 0.15,
  hot: 0.01,
  'writes-do-not-stick': 0.05,
  dead: 1,
};
