import { issueLink, redeemLink } from './account-links';
import { forgiveAttempts, spendAttempts, type Attempt } from './attempts';
import { takeAtLeast } from './constant-time';
import { queueMail } from './outbox';
import { hashPassword, passwordMatches } from './passwords';
import { endSessions } from './sessions';
import { emailKeyOf } from './sign-up';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';
import { passwordChangedMail, resetMail } from '@/server/mail/messages';
import { inTransaction } from '@/server/models/transaction';
import { requirePerson } from '@/server/policies/standing';
import type { AddressRequest, PasswordChange, ResetRequest } from '@/shared/api/account';

/** Milliseconds that a request takes at least, whether or not the address is known. */
const shortWork = 100;

/** Sends the link to a new password, if the address has an account; the answer is the same for every address. */
export const requestReset = async (context: Context, { email }: AddressRequest): Promise<void> => {
  await spendAttempts(context, [
    { kind: 'mail-caller', subject: context.ip },
    { kind: 'mail-address', subject: email },
  ]);
  await takeAtLeast(shortWork, () =>
    inTransaction(context.db, async (transaction) => {
      const user = await context.db.User.findOne({ where: { emailKey: emailKeyOf(email) }, transaction });
      if (!user) return;
      const token = await issueLink(context, { userId: user.id, purpose: 'reset' }, transaction);
      await queueMail(context, resetMail(context.config, user, token), transaction);
    }),
  );
};

/**
 * Sets the new password, ends every session, and confirms the address, which the link has proved; throws
 * `link-invalid`.
 */
export const completeReset = async (context: Context, { token, password }: ResetRequest): Promise<void> => {
  const passwordHash = await hashPassword(context.config, password);
  await inTransaction(context.db, async (transaction) => {
    const userId = await redeemLink(context, { token, purpose: 'reset' }, transaction);
    const user = await context.db.User.findByPk(userId, { transaction });
    if (!user) throw new AppError('link-invalid');
    const emailConfirmedAt = user.emailConfirmedAt ?? context.now();
    await user.update({ passwordHash, emailConfirmedAt }, { transaction });
    await endSessions(context, { userId, reason: 'password-changed' }, transaction);
    await queueMail(context, passwordChangedMail(context.config, user), transaction);
  });
};

/** Changes the password of whoever asks and ends all other sessions; throws `password-wrong`. */
export const changePassword = async (context: Context, input: PasswordChange): Promise<void> => {
  const { userId, sessionId } = requirePerson(context);
  const attempts: Attempt[] = [{ kind: 'password-change', subject: userId }];
  await spendAttempts(context, attempts);
  const user = await context.db.User.findByPk(userId);
  if (!user || !(await passwordMatches(context.config, input.currentPassword, user.passwordHash))) {
    throw new AppError('password-wrong', {
      fields: [
        { in: 'body', pointer: '/currentPassword', code: 'password-wrong', message: 'This is not your password.' },
      ],
    });
  }
  const passwordHash = await hashPassword(context.config, input.newPassword);
  await inTransaction(context.db, async (transaction) => {
    await user.update({ passwordHash }, { transaction });
    await endSessions(context, { userId, reason: 'password-changed', except: sessionId }, transaction);
    await queueMail(context, passwordChangedMail(context.config, user), transaction);
  });
  await forgiveAttempts(context, attempts);
};
