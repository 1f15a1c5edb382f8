import type { Place } from '@/shared';
import type { Findings } from './suspects';
import { labelOf } from './timeline';

/** One of several explanations that are told as a group. */
export interface Member {
  readonly id: string;
  readonly label: string;
  readonly share: number;
}

/** Of two likely places this share is held by both at once, so that they are one explanation and no two. */
const onlyTogether = 0.6;

/** Two places that explain the evidence only when both have failed. */
export function needEachOther(
  places: readonly Place[],
  findings: Findings,
): { member: Member; sockets: string[] } | null {
  const [one, other] = places;
  if (!one || !other || other.probability < 0.1) return null;
  const partsOf = (socket: string) =>
    findings.parts.flatMap((part, p) =>
      part.socket !== null && labelOf(findings.index, part.socket) === socket ? [p] : [],
    );
  const either = findings.posterior.anyOf(new Set([...partsOf(one.socket), ...partsOf(other.socket)]));
  const share = one.probability + other.probability - either;
  if (share < onlyTogether * other.probability) return null;
  const sockets = [one.socket, other.socket].sort();
  return {
    member: { id: `together:${sockets.join('+')}`, label: `${sockets.join(' and ')} together`, share },
    sockets,
  };
}
