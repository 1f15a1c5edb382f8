import type { MailTransport } from './transport';
import type { Platform } from '@/server/context';
import { markFailed, markSent, takeDueMail } from '@/server/services/outbox';

/** Milliseconds between two looks into the outbox. */
const rest = 1000;

/** Sends every mail that is due; returns how many were sent. One that fails waits for its next attempt. */
export const sendDueMail = async (platform: Platform, transport: MailTransport): Promise<number> => {
  for (let sent = 0; ;) {
    const mail = await takeDueMail(platform);
    if (!mail) return sent;
    try {
      await transport.send(mail);
    } catch (error) {
      platform.logger.warn({ mail: mail.id, reason: String(error) }, 'mail was not taken');
      await markFailed(platform, mail.id, String(error));
      continue;
    }
    await markSent(platform, mail.id);
    sent++;
  }
};

/** Looks into the outbox once a second until it is stopped; stopping waits for the mail that is on its way. */
export const startMailWorker = (platform: Platform, transport: MailTransport): { stop: () => Promise<void> } => {
  let stopped = false;
  let wake = () => {};
  const work = async () => {
    while (!stopped) {
      await sendDueMail(platform, transport).catch((error: unknown) => platform.logger.error({ err: error }, 'outbox'));
      await new Promise<void>((resolve) => {
        const timer = setTimeout(resolve, stopped ? 0 : rest);
        wake = () => {
          clearTimeout(timer);
          resolve();
        };
      });
    }
    transport.close();
  };
  const done = work();
  return {
    stop: () => {
      stopped = true;
      wake();
      return done;
    },
  };
};
