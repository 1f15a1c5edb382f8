import { LRUCache } from 'lru-cache';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';

/** What a piece of work costs at least: a document that was sent has to be read and checked first. */
const costs = { published: 1, document: 5 } as const;

/** The work grows with the board: each so many sockets cost one point more. */
const socketsAPoint = 32;

/** What is computed, and how many sockets the board has. */
interface Work {
  readonly of: keyof typeof costs;
  readonly sockets: number;
}

const points = 3000;
const minute = 60_000;

/** What each caller has spent in the minute that ends at `endsAt` (milliseconds), in this process. */
const spent = new LRUCache<string, { points: number; endsAt: number }>({ max: 20_000 });

/**
 * Counts work that needs the processor but no account, so that one caller cannot keep it from the others; throws
 * `too-many-requests` with Retry-After.
 */
export const spendComputing = ({ ip, now }: Context, work: Work): void => {
  const time = now().getTime();
  let account = spent.get(ip);
  if (!account || account.endsAt <= time) spent.set(ip, (account = { points: 0, endsAt: time + minute }));
  account.points += costs[work.of] + Math.floor(work.sockets / socketsAPoint);
  if (account.points <= points) return;
  const wait = Math.ceil((account.endsAt - time) / 1000);
  throw new AppError('too-many-requests', { headers: { 'Retry-After': String(wait) } });
};
