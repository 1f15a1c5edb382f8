import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { Router } from 'express';
import { z } from 'zod';

const caught = z.object({
  id: z.string(),
  at: z.string(),
  to: z.array(z.string()),
  from: z.string(),
  subject: z.string(),
  text: z.string(),
});

type Caught = z.output<typeof caught>;

/** Most mails on the page. */
const shown = 200;

/**
 * Development only: the mail that the local catcher took, as a page (/dev/mail) and as JSON
 * (/dev/mail.json?to=address), the newest first.
 */
export const caughtMail = (folder: string): Router => {
  const router = Router();
  router.get('/dev/mail.json', async (req, res) => {
    const { to } = req.query;
    const mails = await readCaught(folder);
    res.set('Cache-Control', 'no-store').json({
      items: typeof to === 'string' ? mails.filter((mail) => mail.to.includes(to.toLowerCase())) : mails,
    });
  });
  router.get('/dev/mail', async (_req, res) => {
    res
      .set('Cache-Control', 'no-store')
      .type('html')
      .send(pageOf(await readCaught(folder)));
  });
  return router;
};

const readCaught = async (folder: string): Promise<Caught[]> => {
  const names = (await readdir(folder).catch(() => [])).filter((name) => name.endsWith('.json'));
  const newest = names.sort().reverse().slice(0, shown);
  const read = await Promise.all(newest.map(async (name) => asMail(await readFile(join(folder, name), 'utf8'))));
  return read.filter((mail) => mail !== undefined);
};

/** A file that is just being written does not parse yet. */
const asMail = (text: string): Caught | undefined => {
  try {
    return caught.parse(JSON.parse(text));
  } catch {
    return undefined;
  }
};

const escape = (text: string): string => text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);

const withLinks = (text: string): string =>
  escape(text).replace(/https?:\/\/[^\s<]+/g, (url) => `<a href="${url}">${url}</a>`);

const pageOf = (mails: readonly Caught[]): string => `<!doctype html>
<html lang="en"><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>Caught mail</title>
<style>body{font:1rem/1.5 sans-serif;max-width:50rem;margin:2rem auto;padding:0 1rem}
article{border-top:1px solid;padding:1rem 0}pre{white-space:pre-wrap;font:inherit;overflow-wrap:anywhere}</style>
<h1>Caught mail</h1>
<p>This page exists in development only. Nothing here has left the machine.</p>
${mails.length ? mails.map(articleOf).join('\n') : '<p>No mail yet.</p>'}`;

const articleOf = (mail: Caught): string => `<article>
<h2>${escape(mail.subject)}</h2>
<p>To ${escape(mail.to.join(', '))}, <time>${escape(mail.at)}</time></p>
<pre>${withLinks(mail.text)}</pre>
</article>`;
