import { Op, type Transaction } from 'sequelize';
import type { Platform } from '@/server/context';

export interface Mail {
  readonly recipient: string;
  readonly subject: string;
  readonly body: string;
}

/** Puts a mail into the outbox, in the transaction of what it tells about; the worker sends it. */
export const queueMail = async ({ db, now }: Platform, mail: Mail, transaction: Transaction): Promise<void> => {
  await db.OutboxMail.create({ ...mail, dueAt: now(), lastError: null, sentAt: null }, { transaction });
};

/** Seconds for which a worker that took a mail has it for itself. */
const lease = 120;

/** Seconds until the next attempt after so many failed ones: 10 s, 30 s, 90 s and so on up to an hour. */
const backOff = (attempts: number): number => Math.min(3600, 10 * 3 ** (attempts - 1));

/** After so many attempts (about a day) a mail has failed. */
const mostAttempts = 30;

export interface TakenMail extends Mail {
  readonly id: string;
}

/** Takes the next due mail for `lease` seconds; several workers never take the same one. */
export const takeDueMail = async ({ db, now }: Platform): Promise<TakenMail | undefined> =>
  db.sequelize.transaction(async (transaction) => {
    const mail = await db.OutboxMail.findOne({
      where: { state: 'waiting', dueAt: { [Op.lte]: now() } },
      order: [['dueAt', 'ASC']],
      lock: true,
      skipLocked: true,
      transaction,
    });
    if (!mail) return undefined;
    await mail.update(
      { attempts: mail.attempts + 1, dueAt: new Date(now().getTime() + lease * 1000) },
      { transaction },
    );
    return { id: mail.id, recipient: mail.recipient, subject: mail.subject, body: mail.body ?? '' };
  });

/** Notes that a mail was sent, and forgets its body: the link in it is a secret. */
export const markSent = async ({ db, now }: Platform, id: string): Promise<void> => {
  await db.OutboxMail.update({ state: 'sent', sentAt: now(), body: null, lastError: null }, { where: { id } });
};

/** Notes why a mail was not sent and when it is tried again. */
export const markFailed = async ({ db, now }: Platform, id: string, reason: string): Promise<void> => {
  const mail = await db.OutboxMail.findByPk(id);
  if (!mail) return;
  const given = mail.attempts >= mostAttempts;
  await mail.update({
    state: given ? 'failed' : 'waiting',
    dueAt: new Date(now().getTime() + backOff(mail.attempts) * 1000),
    lastError: reason.slice(0, 300),
    ...(given ? { body: null } : {}),
  });
};
