import { UniqueConstraintError } from 'sequelize';
import { issueLink, redeemLink } from './account-links';
import { spendAttempts } from './attempts';
import { takeAtLeast } from './constant-time';
import { queueMail } from './outbox';
import { hashPassword } from './passwords';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';
import { alreadyKnownMail, confirmationMail } from '@/server/mail/messages';
import { inTransaction } from '@/server/models/transaction';
import type { AddressRequest, ConfirmRequest, SignUpRequest } from '@/shared/api/account';

/** Milliseconds that the work after the password takes at least, whether or not the address is known. */
const shortWork = 100;

/** The address as it is compared: one account an address, whatever its case. */
export const emailKeyOf = (email: string): string => email.toLowerCase();

/**
 * Makes an account that waits for its confirmation, and sends the link. For an address that has an account the
 * answer is the same and its owner gets a mail. An account that was never confirmed is made anew: the last
 * sign-up counts, and only its link is good.
 */
export const signUp = async (context: Context, input: SignUpRequest): Promise<void> => {
  await spendAttempts(context, [
    { kind: 'sign-up-caller', subject: context.ip },
    { kind: 'mail-address', subject: input.email },
  ]);
  const passwordHash = await hashPassword(context.config, input.password);
  await takeAtLeast(shortWork, async () => {
    const candidate = { name: input.name, email: input.email, passwordHash };
    try {
      await enrol(context, candidate);
    } catch (error) {
      // Two sign-ups with one address at the same moment: the second one finds the first.
      if (!(error instanceof UniqueConstraintError)) throw error;
      await enrol(context, candidate);
    }
  });
};

const enrol = (context: Context, candidate: { name: string; email: string; passwordHash: string }): Promise<void> =>
  inTransaction(context.db, async (transaction) => {
    const { db, config } = context;
    const emailKey = emailKeyOf(candidate.email);
    const known = await db.User.findOne({ where: { emailKey }, lock: true, transaction });
    if (known?.emailConfirmedAt) return queueMail(context, alreadyKnownMail(config, known), transaction);
    const user = known
      ? await known.update(candidate, { transaction })
      : await db.User.create({ ...candidate, emailKey, emailConfirmedAt: null }, { transaction });
    const token = await issueLink(context, { userId: user.id, purpose: 'confirm' }, transaction);
    return queueMail(context, confirmationMail(config, user, token), transaction);
  });

/** Confirms the address that the link was sent to; throws `link-invalid`. */
export const confirmAddress = (context: Context, { token }: ConfirmRequest): Promise<void> =>
  inTransaction(context.db, async (transaction) => {
    const userId = await redeemLink(context, { token, purpose: 'confirm' }, transaction);
    const user = await context.db.User.findByPk(userId, { transaction });
    if (!user) throw new AppError('link-invalid');
    await user.update({ emailConfirmedAt: user.emailConfirmedAt ?? context.now() }, { transaction });
  });

/** Sends the confirmation again, if an account waits for it; the answer is the same for every address. */
export const resendConfirmation = async (context: Context, { email }: AddressRequest): Promise<void> => {
  await spendAttempts(context, [
    { kind: 'mail-caller', subject: context.ip },
    { kind: 'mail-address', subject: email },
  ]);
  await takeAtLeast(shortWork, () =>
    inTransaction(context.db, async (transaction) => {
      const user = await context.db.User.findOne({ where: { emailKey: emailKeyOf(email) }, transaction });
      if (!user || user.emailConfirmedAt) return;
      const token = await issueLink(context, { userId: user.id, purpose: 'confirm' }, transaction);
      await queueMail(context, confirmationMail(context.config, user, token), transaction);
    }),
  );
};
