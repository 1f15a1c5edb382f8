import { createHash } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';
import type { Database } from '@/server/models';

const minute = 60;
const hour = 60 * minute;

/** How many attempts of a kind one subject has in how many seconds. They count over all processes. */
const allowances = {
  'sign-in-pair': { points: 10, seconds: 15 * minute },
  'sign-in-address': { points: 60, seconds: hour },
  'sign-in-caller': { points: 200, seconds: 15 * minute },
  'sign-up-caller': { points: 60, seconds: hour },
  'mail-address': { points: 5, seconds: hour },
  'mail-caller': { points: 60, seconds: hour },
  'layout-import': { points: 300, seconds: hour },
  'password-change': { points: 10, seconds: 15 * minute },
} as const;

export type AttemptKind = keyof typeof allowances;

export interface Attempt {
  readonly kind: AttemptKind;
  /** Whose attempts are counted: an address, a caller, or both. It is stored hashed. */
  readonly subject: string;
}

const keyOf = ({ kind, subject }: Attempt): string =>
  `${kind}:${createHash('sha256').update(subject.toLowerCase()).digest('base64url')}`;

/**
 * Counts attempts before they are made, so that attempts at the same moment cannot slip through; throws
 * `too-many-attempts` with Retry-After when one of them has none left.
 */
export const spendAttempts = async ({ db, now }: Context, attempts: readonly Attempt[]): Promise<void> => {
  for (const attempt of attempts) {
    const { points, seconds } = allowances[attempt.kind];
    const spent = await spend(db, { key: keyOf(attempt), seconds, now: now() });
    if (spent.points <= points) continue;
    const wait = Math.max(1, Math.ceil((spent.endsAt.getTime() - now().getTime()) / 1000));
    throw new AppError('too-many-attempts', {
      message: `Try again in ${wait < 120 ? `${wait} seconds` : `${Math.ceil(wait / 60)} minutes`}.`,
      headers: { 'Retry-After': String(wait) },
    });
  }
};

const spend = async (
  db: Database,
  { key, seconds, now }: { key: string; seconds: number; now: Date },
): Promise<{ points: number; endsAt: Date }> => {
  const [row] = await db.sequelize.query<{ points: number; endsAt: Date }>(
    `INSERT INTO attempts (id, points, ends_at) VALUES (:key, 1, :end)
     ON DUPLICATE KEY UPDATE points = IF(ends_at <= :now, 1, points + 1), ends_at = IF(ends_at <= :now, VALUES(ends_at), ends_at)
     RETURNING points, ends_at AS endsAt`,
    { type: QueryTypes.SELECT, replacements: { key, now, end: new Date(now.getTime() + seconds * 1000) } },
  );
  if (!row) throw new RangeError('INSERT ... RETURNING gave no row');
  return { points: row.points, endsAt: new Date(row.endsAt) };
};

/** Gives attempts back that turned out right. */
export const forgiveAttempts = async ({ db }: Context, attempts: readonly Attempt[]): Promise<void> => {
  await db.sequelize.query('DELETE FROM attempts WHERE id IN (:keys)', {
    replacements: { keys: attempts.map(keyOf) },
  });
};
