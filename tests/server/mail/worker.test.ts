import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import express from 'express';
import request from 'supertest';
import { testServer } from '../support/platform';
import { caughtMail } from '@/server/http/caught-mail';
import { openMailTransport } from '@/server/mail/transport';
import { sendDueMail } from '@/server/mail/worker';
import { inTransaction } from '@/server/models/transaction';
import { startMailCatcher } from '@/server/scripts/fakes/mail-catcher.mjs';
import { freePort } from '@/server/scripts/setup/ports.mjs';
import { queueMail } from '@/server/services/outbox';

const folder = mkdtempSync(join(tmpdir(), 'rowcall-mail-'));
let server: Awaited<ReturnType<typeof testServer>>;
let port: number;

beforeAll(async () => {
  port = await freePort();
  server = await testServer({ SMTP_URL: `smtp://127.0.0.1:${port}` });
});
afterAll(async () => {
  await server.close();
  rmSync(folder, { recursive: true });
});

const queue = (recipient: string, body = 'Grüße\nhttp://rowcall.test/confirm?token=abc\n') =>
  inTransaction(server.platform.db, (transaction) =>
    queueMail(server.platform, { recipient, subject: 'Größe <b>', body }, transaction),
  );

const caught = async (to: string) => {
  const app = express().use(caughtMail(folder));
  const answer = await request(app).get('/dev/mail.json').query({ to }).expect(200);
  return answer.body.items as { subject: string; text: string; to: string[] }[];
};

const send = async () => {
  const transport = openMailTransport(server.platform.config);
  const sent = await sendDueMail(server.platform, transport);
  transport.close();
  return sent;
};

it('mail waits while nobody takes it, and is sent once when somebody does', async () => {
  await queue('wait@rowcall.test');
  expect(await send()).toBe(0);
  const [waiting] = await server.platform.db.OutboxMail.findAll();
  expect(waiting).toMatchObject({ state: 'waiting', attempts: 1 });
  expect(waiting?.lastError).toMatch('ECONNREFUSED');

  const catcher = await startMailCatcher({ port, folder });
  expect(await send()).toBe(0);
  server.wait(15_000);
  expect(await send()).toBe(1);
  expect(await send()).toBe(0);
  await catcher.stop();
  const [mail, ...more] = await caught('wait@rowcall.test');
  expect(more).toEqual([]);
  expect(mail).toMatchObject({ subject: 'Größe <b>' });
  expect(mail?.text).toContain('Grüße\nhttp://rowcall.test/confirm?token=abc');
});

it('mail that was sent is no longer in the database: its link is a secret', async () => {
  const kept = await server.platform.db.OutboxMail.findAll({ raw: true });
  expect(kept).toEqual([expect.objectContaining({ state: 'sent', body: null })]);
});

it('two workers send each mail once', async () => {
  const catcher = await startMailCatcher({ port, folder });
  for (let count = 0; count < 6; count++) await queue('both@rowcall.test');
  const sent = await Promise.all([send(), send()]);
  expect(sent[0] + sent[1]).toBe(6);
  expect(await caught('both@rowcall.test')).toHaveLength(6);
  await catcher.stop();
});

it('a mail whose work was rolled back is never sent', async () => {
  const broken = inTransaction(server.platform.db, async (transaction) => {
    await queueMail(server.platform, { recipient: 'never@rowcall.test', subject: 's', body: 'b' }, transaction);
    throw new Error('rolled back');
  });
  await expect(broken).rejects.toThrow('rolled back');
  expect(await server.platform.db.OutboxMail.count({ where: { recipient: 'never@rowcall.test' } })).toBe(0);
});

it('the page of caught mail shows it as text, with its links', async () => {
  const app = express().use(caughtMail(folder));
  const { text } = await request(app).get('/dev/mail').expect(200);
  expect(text).toContain('Größe &#60;b&#62;');
  expect(text).toContain('<a href="http://rowcall.test/confirm?token=abc">');
});

it('the page of caught mail does not exist unless a folder is configured', async () => {
  const answer = await request(server.app).get('/dev/mail.json');
  expect(answer.headers['content-type']).not.toMatch('application/json;');
});
