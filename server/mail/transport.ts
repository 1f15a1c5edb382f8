import { createTransport } from 'nodemailer';
import type { Config } from '@/server/config';
import type { TakenMail } from '@/server/services/outbox';

/** Sends mail; rejects when the other side did not take it. */
export interface MailTransport {
  readonly send: (mail: TakenMail) => Promise<void>;
  readonly close: () => void;
}

/** A transport over SMTP. The message id comes from the outbox, so a mail that comes twice is known as one. */
export const openMailTransport = (config: Config): MailTransport => {
  const smtp = createTransport(config.mail.smtpUrl);
  const domain = new URL(config.publicUrl).hostname;
  return {
    send: async ({ id, recipient, subject, body }) => {
      await smtp.sendMail({
        from: config.mail.from,
        to: recipient,
        subject,
        text: body,
        messageId: `<${id}@${domain}>`,
      });
    },
    close: () => smtp.close(),
  };
};
