import type { Database } from '@/server/models';

/** Mail that waits in the outbox for an address, the newest first. */
export const waitingMail = async (db: Database, recipient: string) =>
  db.OutboxMail.findAll({ where: { recipient }, order: [['createdAt', 'DESC']] });

/** The token of the link in the newest mail to an address. */
export const linkToken = async (db: Database, recipient: string): Promise<string> => {
  const [mail] = await waitingMail(db, recipient);
  const token = /[?&]token=([\w-]+)/.exec(mail?.body ?? '')?.[1];
  if (token === undefined) throw new Error(`no link was sent to ${recipient}`);
  return token;
};
