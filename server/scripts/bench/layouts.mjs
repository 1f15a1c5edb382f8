import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import autocannon from 'autocannon';
import { startNode, whenReady } from '../setup/children.mjs';
import { startLocalServices } from '../setup/local-services.mjs';
import { freePort } from '../setup/ports.mjs';

const slug = 'tarnvall-t-64-rev-b';
const connections = 32;
const rounds = 7;
const seconds = 3;

/** Requests a second that are answered with 200; throws if one is answered otherwise. */
const rateOf = async (url) => {
  // What a browser takes.
  const headers = { 'accept-encoding': 'gzip, deflate, br' };
  const result = await autocannon({ url, connections, duration: seconds, headers });
  if (result.non2xx + result.errors > 0) {
    throw new Error(`${url}: ${result.non2xx} answers are not 2xx, ${result.errors} requests got none.`);
  }
  return result.requests.total / result.duration;
};

const start = async (args, env) => {
  const server = startNode(['--import', 'tsx', ...args], { env });
  let id;
  server.child.on('message', (message) => {
    id = message.id;
  });
  if (!(await whenReady(server))) throw new Error(`${args} did not start: ${server.complaint()}`);
  return { stop: server.stop, id };
};

const median = (values) => values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)];

const measure = async (stops) => {
  const folder = mkdtempSync(join(tmpdir(), 'rowcall-bench-'));
  stops.push(() => rmSync(folder, { recursive: true, force: true }));
  const { PATH, HOME } = process.env;
  const port = await freePort();
  const { env } = await startLocalServices({
    folder,
    port,
    stops: { add: (stop) => stops.push(stop) },
    set: { PATH, HOME, RATE_LIMIT_PER_MINUTE: '100000000' },
  });
  const product = await start(['server/index.ts'], env);
  stops.push(product.stop);
  const barePort = await freePort();
  const bare = await start(['server/scripts/bench/bare-server.ts'], {
    ...env,
    PORT: String(barePort),
    BENCH_SLUG: slug,
  });
  stops.push(bare.stop);
  const ours = `http://127.0.0.1:${port}/api/v1/layouts/${slug}`;
  const theirs = `http://127.0.0.1:${barePort}/rows/${bare.id}`;
  const pairs = [];
  for (let round = 0; round <= rounds; round++) {
    const pair = { bare: await rateOf(theirs), layout: await rateOf(ours) };
    // The first one warms both up.
    if (round > 0) pairs.push(pair);
  }
  return [
    {
      what: `bare Express route with one SELECT, ${connections} connections`,
      value: median(pairs.map((p) => p.bare)),
      unit: '/s',
    },
    {
      what: `GET /api/v1/layouts/:slug, ${connections} connections`,
      value: median(pairs.map((p) => p.layout)),
      unit: '/s',
    },
    {
      what: 'layout route against bare route',
      value: median(pairs.map((p) => p.layout / p.bare)),
      unit: 'x',
      target: { atLeast: 0.7 },
    },
  ];
};

const stops = [];
try {
  process.send?.({ rows: await measure(stops) });
} finally {
  for (const stop of stops.reverse()) await stop();
}
process.disconnect?.();
