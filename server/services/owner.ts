import { UniqueConstraintError } from 'sequelize';
import { issueLink } from './account-links';
import { queueMail } from './outbox';
import { hashPassword } from './passwords';
import { newSecretToken } from './secret-token';
import { emailKeyOf } from './sign-up';
import type { Platform } from '@/server/context';
import { resetMail } from '@/server/mail/messages';
import { inTransaction } from '@/server/models/transaction';

/**
 * Makes the one owner from the configuration, if there is none. Without a password in the configuration the owner
 * gets a mail with the link to choose one. An account that the address has already becomes the owner's.
 */
export const ensureOwner = async (platform: Platform): Promise<void> => {
  const { db, config, logger, now } = platform;
  if (await db.User.findOne({ where: { role: 'owner' } })) return;
  const { owner } = config;
  if (!owner) {
    logger.warn('there is no owner: set OWNER_EMAIL and start again');
    return;
  }
  const passwordHash = await hashPassword(config, owner.password ?? newSecretToken().token);
  const work = inTransaction(db, async (transaction) => {
    const emailKey = emailKeyOf(owner.email);
    const known = await db.User.findOne({ where: { emailKey }, lock: true, transaction });
    // An account that was never confirmed may be anybody's: its password does not count.
    const fresh = { passwordHash, emailConfirmedAt: now() };
    const user = known
      ? await known.update(
          { role: 'owner', version: known.version + 1, ...(known.emailConfirmedAt ? {} : fresh) },
          { transaction },
        )
      : await db.User.create(
          { email: owner.email, emailKey, name: owner.name, role: 'owner', ...fresh },
          { transaction },
        );
    if (owner.password !== undefined || user.passwordHash !== passwordHash) return;
    const token = await issueLink(platform, { userId: user.id, purpose: 'reset' }, transaction);
    await queueMail(platform, resetMail(config, user, token), transaction);
  });
  await work.catch((error: unknown) => {
    // Another process, started at the same moment, has made it.
    if (!(error instanceof UniqueConstraintError)) throw error;
  });
};
