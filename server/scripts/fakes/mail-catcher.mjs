import { mkdirSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import PostalMime from 'postal-mime';
import { SMTPServer } from 'smtp-server';

/** Most mails kept. */
const kept = 500;

/**
 * Starts a server on loopback that speaks SMTP and keeps each mail as a JSON file { id, at, to, from, subject, text }
 * in `folder`; the names sort by time. Nothing leaves the machine.
 *
 * @param {{ port: number, folder: string }} options
 * @returns {Promise<{ stop: () => Promise<void> }>}
 */
export const startMailCatcher = async ({ port, folder }) => {
  mkdirSync(folder, { recursive: true });
  let count = 0;

  const keep = async (bytes, envelope) => {
    const mail = await PostalMime.parse(bytes);
    const name = `${String(Date.now()).padStart(15, '0')}-${String(count++).padStart(6, '0')}.json`;
    const record = {
      id: mail.messageId ?? name,
      at: new Date().toISOString(),
      to: envelope.rcptTo.map(({ address }) => address.toLowerCase()),
      from: envelope.mailFrom ? envelope.mailFrom.address : '',
      subject: mail.subject ?? '',
      text: mail.text ?? mail.html ?? '',
    };
    // Renamed when whole, so that a reader never sees half a mail.
    writeFileSync(join(folder, `${name}.part`), JSON.stringify(record));
    renameSync(join(folder, `${name}.part`), join(folder, name));
    const names = readdirSync(folder)
      .filter((entry) => entry.endsWith('.json'))
      .sort();
    for (const old of names.slice(0, -kept)) rmSync(join(folder, old), { force: true });
  };

  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    onData(stream, session, done) {
      const chunks = [];
      stream.on('data', (chunk) => chunks.push(chunk));
      stream.on('end', () => keep(Buffer.concat(chunks), session.envelope).then(() => done(), done));
    },
  });
  server.on('error', () => {});
  await new Promise((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(port, '127.0.0.1', () => resolve(undefined));
  });
  return { stop: () => new Promise((resolve) => server.close(() => resolve())) };
};
