import type { Run } from '@/shared';
import type { SocketIndex } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import type { Verdict, Weighed } from '../verdict';
import type { Rerun } from './rerun';
import { solderedFactor } from './costs';

/** Everything that the checks are proposed from. */
export interface Desk extends Rerun {
  readonly index: LayoutIndex;
  readonly weighed: Weighed;
  readonly verdict: Verdict;
  readonly runs: readonly Run[];
}

/** How many times longer it takes to move the chip of a socket. */
export function effort(index: LayoutIndex, sockets: readonly SocketIndex[]): number {
  return sockets.some((socket) => index.document.sockets[socket]?.soldered) ? solderedFactor : 1;
}
