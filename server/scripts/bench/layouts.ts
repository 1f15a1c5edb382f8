import { fork, type ChildProcess } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import autocannon from 'autocannon';
import type { Served } from './layouts-serve';
import { startMariadb } from '../setup/mariadb.mjs';
import { freePort } from '../setup/ports.mjs';

const connections = 32;
/** Rounds of each route, in turn, so that what else the machine does falls on both. */
const rounds = 5;
const seconds = 4;
/** The rate of GET /layouts/:slug must be at least this share of the bare route's. */
const wanted = 0.7;

const startServer = async (databaseUrl: string): Promise<{ child: ChildProcess; served: Served }> => {
  const child = fork(join(__dirname, 'layouts-serve.ts'), [], {
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      PUBLIC_URL: 'http://127.0.0.1',
      DATABASE_URL: databaseUrl,
      TOKEN_SECRET: randomBytes(24).toString('hex'),
      SMTP_URL: 'smtp://127.0.0.1:1',
      MAIL_FROM: 'Rowcall <post@rowcall.example>',
      S3_ENDPOINT: 'http://127.0.0.1:1',
      S3_BUCKET: 'bench',
      S3_ACCESS_KEY: 'bench',
      S3_SECRET_KEY: 'bench',
      RATE_LIMIT_PER_MINUTE: '100000000',
    },
  });
  const [served] = (await once(child, 'message')) as [Served];
  return { child, served };
};

/** Requests a second that were answered with 200; throws if any was not. */
const rate = async (url: string, duration: number): Promise<number> => {
  const result = await autocannon({ url, connections, duration });
  if (result.non2xx || result.errors) throw new Error(`${url}: ${result.non2xx + result.errors} answers were not 200`);
  return result.requests.average;
};

const middle = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[values.length >> 1] ?? NaN;

const measure = async ({ layout, bare }: Served): Promise<boolean> => {
  for (const url of [layout, bare]) await rate(url, 2);
  const rates = { layout: [] as number[], bare: [] as number[] };
  for (let round = 0; round < rounds; round++) {
    rates.bare.push(await rate(bare, seconds));
    rates.layout.push(await rate(layout, seconds));
  }
  const ratio = middle(rates.layout.map((value, round) => value / (rates.bare[round] ?? NaN)));
  const figures = (values: readonly number[]) => values.map((value) => value.toFixed(0)).join(', ');
  process.stdout.write(
    [
      `GET /api/v1/layouts/:slug, ${connections} connections, ${rounds} rounds of ${seconds} s in turn`,
      `  bare Express, one SELECT by primary key: ${middle(rates.bare).toFixed(0)} a second (${figures(rates.bare)})`,
      `  the route:                               ${middle(rates.layout).toFixed(0)} a second (${figures(rates.layout)})`,
      `  ratio: ${ratio.toFixed(2)}, wanted at least ${wanted}: ${ratio >= wanted ? 'met' : 'MISSED'}`,
      '',
    ].join('\n'),
  );
  return ratio >= wanted;
};

/** Measures on a private database and leaves nothing behind; the exit code tells whether the figure is met. */
const bench = async (): Promise<void> => {
  const folder = mkdtempSync(join(tmpdir(), 'rowcall-bench-'));
  const password = randomBytes(12).toString('hex');
  const database = await startMariadb({ folder, port: await freePort(), password, databases: 'rowcall' });
  let child: ChildProcess | undefined;
  try {
    const started = await startServer(`${database.url}/rowcall`);
    child = started.child;
    if (!(await measure(started.served))) process.exitCode = 1;
  } finally {
    child?.kill();
    await database.stop();
    rmSync(folder, { recursive: true, force: true });
  }
};

void bench();
