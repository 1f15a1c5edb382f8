import type { Transaction } from 'sequelize';
import { newSecretToken, hashSecretToken } from './secret-token';
import type { Platform } from '@/server/context';
import { AppError } from '@/server/errors';
import type { EmailToken } from '@/server/models/email-token';

type Purpose = EmailToken['purpose'];

const hour = 3_600_000;

/** How long a link is good, in milliseconds. */
const lifetimes: Record<Purpose, number> = { confirm: 48 * hour, reset: hour };

/** Makes the token of a new link; the earlier links of the same purpose end. */
export const issueLink = async (
  { db, now }: Platform,
  { userId, purpose }: { userId: string; purpose: Purpose },
  transaction: Transaction,
): Promise<string> => {
  await voidLinks({ db, now }, { userId, purpose }, transaction);
  const { token, hash } = newSecretToken();
  const expiresAt = new Date(now().getTime() + lifetimes[purpose]);
  await db.EmailToken.create({ tokenHash: hash, userId, purpose, expiresAt, usedAt: null }, { transaction });
  return token;
};

/** Uses a link up and returns whose it is; throws `link-invalid` if it is unknown, used or expired. */
export const redeemLink = async (
  { db, now }: Platform,
  { token, purpose }: { token: string; purpose: Purpose },
  transaction: Transaction,
): Promise<string> => {
  const link = await db.EmailToken.findByPk(hashSecretToken(token), { lock: true, transaction });
  if (!link || link.purpose !== purpose || link.usedAt !== null || link.expiresAt <= now()) {
    throw new AppError('link-invalid');
  }
  await link.update({ usedAt: now() }, { transaction });
  return link.userId;
};

/** Ends all open links of a purpose. */
const voidLinks = async (
  { db, now }: Pick<Platform, 'db' | 'now'>,
  { userId, purpose }: { userId: string; purpose: Purpose },
  transaction: Transaction,
): Promise<void> => {
  await db.EmailToken.update({ usedAt: now() }, { where: { userId, purpose, usedAt: null }, transaction });
};
