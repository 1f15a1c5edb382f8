import { Op } from 'sequelize';
import type { Platform } from '@/server/context';

const day = 86_400_000;

/** Days that an account waits for its confirmation, and that sent mail is remembered. */
const kept = 7;

/** Removes what has had its time: ended sessions, used tokens, counted attempts, sent mail, accounts never confirmed. */
export const sweep = async ({ db, now }: Platform): Promise<void> => {
  const present = now();
  const before = new Date(present.getTime() - kept * day);
  await db.RefreshToken.destroy({ where: { usedAt: { [Op.lt]: before } } });
  await db.Session.destroy({
    where: { [Op.or]: [{ expiresAt: { [Op.lt]: present } }, { endedAt: { [Op.lt]: before } }] },
  });
  await db.EmailToken.destroy({ where: { expiresAt: { [Op.lt]: before } } });
  await db.OutboxMail.destroy({ where: { state: ['sent', 'failed'], createdAt: { [Op.lt]: before } } });
  await db.User.destroy({ where: { emailConfirmedAt: null, createdAt: { [Op.lt]: before } } });
  await db.sequelize.query('DELETE FROM attempts WHERE ends_at < :present', { replacements: { present } });
};
