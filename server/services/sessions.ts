import { Op, type Transaction } from 'sequelize';
import { signAccessToken } from './access-token';
import { forgiveAttempts, spendAttempts, type Attempt } from './attempts';
import { passwordMatches } from './passwords';
import { hashSecretToken, newSecretToken } from './secret-token';
import { emailKeyOf } from './sign-up';
import type { Context, Platform, Who } from '@/server/context';
import { AppError } from '@/server/errors';
import { inTransaction } from '@/server/models/transaction';
import type { Session } from '@/server/models/session';
import type { User } from '@/server/models/user';
import type { Role } from '@/shared/roles';

/**
 * Milliseconds in which a used refresh token may come again: two tabs of one browser refresh at the same moment.
 * The second gets an access token and no further refresh token.
 */
const grace = 10_000;

const day = 86_400_000;

/** Tokens of an open session; `refresh` is undefined when the browser has a newer one already. */
export interface OpenSession {
  readonly user: User;
  readonly access: { readonly token: string; readonly expiresAt: Date };
  readonly refresh: string | undefined;
}

/**
 * Signs somebody in. Throws `sign-in-failed` in the same time whether the address is unknown or the password is
 * wrong, `email-not-confirmed` to who has the right password, `too-many-attempts`.
 */
export const signIn = async (context: Context, input: { email: string; password: string }): Promise<OpenSession> => {
  const { db, config, now, ip } = context;
  const attempts: Attempt[] = [
    { kind: 'sign-in-caller', subject: ip },
    { kind: 'sign-in-address', subject: input.email },
    { kind: 'sign-in-pair', subject: `${input.email} ${ip}` },
  ];
  await spendAttempts(context, attempts);
  const user = await db.User.findOne({ where: { emailKey: emailKeyOf(input.email) } });
  const matches = await passwordMatches(config, input.password, user?.passwordHash);
  if (!user || !matches) throw new AppError('sign-in-failed');
  await forgiveAttempts(context, attempts.slice(1));
  if (!user.emailConfirmedAt) throw new AppError('email-not-confirmed');
  return inTransaction(db, async (transaction) => {
    const expiresAt = new Date(now().getTime() + config.tokens.sessionDays * day);
    const session = await db.Session.create(
      { userId: user.id, expiresAt, endedAt: null, endedBy: null },
      { transaction },
    );
    return issue(context, { user, session }, transaction);
  });
};

const issue = async (
  platform: Platform,
  { user, session }: { user: User; session: Session },
  transaction: Transaction,
): Promise<OpenSession> => {
  const { token, hash } = newSecretToken();
  await platform.db.RefreshToken.create({ tokenHash: hash, sessionId: session.id, usedAt: null }, { transaction });
  return { user, access: accessFor(platform, { user, session }), refresh: token };
};

const accessFor = ({ config, now }: Platform, { user, session }: { user: User; session: Session }) =>
  signAccessToken(config, { userId: user.id, sessionId: session.id, standing: user.role }, now());

/**
 * Changes a refresh token for the next one. A token that comes a second time (later than two tabs would) was
 * stolen: the whole session ends. Throws `session-ended`.
 */
export const refreshSession = async (context: Context, token: string): Promise<OpenSession> => {
  const { db, config, now } = context;
  const renewed = await inTransaction(db, async (transaction) => {
    const known = await db.RefreshToken.findByPk(hashSecretToken(token), { lock: true, transaction });
    const session = known && (await db.Session.findByPk(known.sessionId, { lock: true, transaction }));
    if (!session || session.endedAt || session.expiresAt <= now()) return undefined;
    const user = await db.User.findByPk(session.userId, { transaction });
    if (!user) return undefined;
    if (known.usedAt) {
      if (now().getTime() - known.usedAt.getTime() <= grace) {
        return { user, access: accessFor(context, { user, session }), refresh: undefined };
      }
      await session.update({ endedAt: now(), endedBy: 'token-reused' }, { transaction });
      return undefined;
    }
    await known.update({ usedAt: now() }, { transaction });
    await session.update({ expiresAt: new Date(now().getTime() + config.tokens.sessionDays * day) }, { transaction });
    return issue(context, { user, session }, transaction);
  });
  if (!renewed) throw new AppError('session-ended');
  return renewed;
};

/** Ends the session that a refresh token or whoever asks belongs to; nothing happens if it has ended already. */
export const signOut = async (context: Context, token: string | undefined): Promise<void> => {
  const { db, who, now } = context;
  const known = token === undefined ? null : await db.RefreshToken.findByPk(hashSecretToken(token));
  const ids = [known?.sessionId, who.standing === 'guest' ? undefined : who.sessionId].filter((id) => id !== undefined);
  await db.Session.update({ endedAt: now(), endedBy: 'signed-out' }, { where: { id: ids, endedAt: null } });
};

/** Ends all sessions of a person, but for one if `except` names it. */
export const endSessions = async (
  { db, now }: Platform,
  { userId, reason, except }: { userId: string; reason: string; except?: string },
  transaction: Transaction,
): Promise<void> => {
  const where = { userId, endedAt: null, ...(except === undefined ? {} : { id: { [Op.ne]: except } }) };
  await db.Session.update({ endedAt: now(), endedBy: reason }, { where, transaction });
};

/** The person of an open session; undefined if it has ended or expired. */
export const loadPerson = async (
  { db, now }: Platform,
  who: Exclude<Who, { standing: 'guest' }>,
): Promise<User | undefined> => {
  const session = await db.Session.findByPk(who.sessionId);
  if (!session || session.userId !== who.userId || session.endedAt !== null || session.expiresAt <= now())
    return undefined;
  return (await db.User.findByPk(session.userId)) ?? undefined;
};

/** The role that the session's person has now; undefined if the session has ended or expired. */
export const loadStanding = async (
  platform: Platform,
  who: Exclude<Who, { standing: 'guest' }>,
): Promise<Role | undefined> => (await loadPerson(platform, who))?.role;
