import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { brotliCompressSync, constants } from 'node:zlib';
import express from 'express';
import { chromium } from 'playwright-core';
import { ensureChromium } from '../setup/debian.mjs';
import { run } from '../setup/run.mjs';
import { ensureWebExport, exportSettings } from '../setup/web-export.mjs';

const { expo } = JSON.parse(readFileSync('app.json', 'utf8'));

/** An Expo Router page that shows one line of text, with the packages, the bundler and the router's settings of the product. */
const buildBaseline = async (folder) => {
  const router = expo.plugins.find((plugin) => plugin[0] === 'expo-router');
  const app = { name: 'One line', slug: 'one-line', platforms: ['web'], web: expo.web, plugins: [router] };
  mkdirSync(join(folder, 'app'), { recursive: true });
  symlinkSync(resolve('node_modules'), join(folder, 'node_modules'));
  const put = (file, text) => writeFileSync(join(folder, file), text);
  put('package.json', JSON.stringify({ name: 'one-line', version: '0.0.0', private: true, main: 'expo-router/entry' }));
  put('app.json', JSON.stringify({ expo: app }));
  put('babel.config.js', readFileSync('babel.config.js', 'utf8'));
  put(
    'app/index.js',
    "import { Text } from 'react-native';\nexport default function Page() {\n  return <Text>One line of text.</Text>;\n}\n",
  );
  const cli = resolve('node_modules/expo/bin/cli');
  const { status, output } = await run(process.execPath, [cli, 'export', '-p', 'web', '--output-dir', 'out'], {
    env: exportSettings,
    cwd: folder,
  });
  if (status !== 0) throw new Error(`The page to compare with was not built: ${output.slice(-2000)}`);
  return join(folder, 'out');
};

/** Serves an export on loopback, and an empty library in place of the API, so that the page comes to rest. */
const serve = async (folder) => {
  const app = express();
  app.use('/api', (_, res) => res.json({ items: [], nextCursor: null }));
  app.use(express.static(folder));
  app.get('/{*path}', (_, res) => res.sendFile(join(resolve(folder), 'index.html')));
  return new Promise((done) => {
    const server = app.listen(0, '127.0.0.1', () => done(server));
  });
};

/** Paths of the scripts that a browser asks for when it opens / for the first time. */
const scriptsOf = async (browser, address) => {
  const context = await browser.newContext({ serviceWorkers: 'block' });
  const page = await context.newPage();
  const paths = new Set();
  page.on('request', (request) => {
    if (request.resourceType() === 'script') paths.add(decodeURIComponent(new URL(request.url()).pathname));
  });
  await page.goto(address, { waitUntil: 'networkidle' });
  await page.waitForTimeout(1000);
  if (!(await page.locator('#root').innerText()).trim()) throw new Error(`${address} shows nothing.`);
  await context.close();
  return [...paths];
};

/** Bytes over the wire: Brotli at its best, as the server holds it ready. */
const brotliBytes = (file) =>
  existsSync(`${file}.br`)
    ? readFileSync(`${file}.br`).length
    : brotliCompressSync(readFileSync(file), { params: { [constants.BROTLI_PARAM_QUALITY]: 11 } }).length;

const weigh = async (browser, folder) => {
  const server = await serve(folder);
  try {
    const scripts = await scriptsOf(browser, `http://127.0.0.1:${server.address().port}/`);
    const files = scripts.map((path) => ({ path, bytes: brotliBytes(join(folder, path)) }));
    return { files, bytes: files.reduce((sum, { bytes }) => sum + bytes, 0) };
  } finally {
    server.closeAllConnections();
    server.close();
  }
};

const measure = async (folder) => {
  await ensureChromium();
  await ensureWebExport();
  const baseline = await buildBaseline(folder);
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
      '--no-first-run',
    ],
  });
  try {
    const product = await weigh(browser, 'dist');
    const oneLine = await weigh(browser, baseline);
    return [
      ...product.files.map(({ path, bytes }) => ({ what: `  ${path.split('/').at(-1)}`, value: bytes, unit: 'B' })),
      { what: 'first load of /, JavaScript, Brotli', value: product.bytes, unit: 'B' },
      { what: 'Expo Router page with one line of text', value: oneLine.bytes, unit: 'B' },
      {
        what: 'first load against one line',
        value: product.bytes / oneLine.bytes,
        unit: 'x',
        target: { atMost: 1.35 },
      },
    ];
  } finally {
    await browser.close();
  }
};

const folder = mkdtempSync(join(tmpdir(), 'rowcall-first-load-'));
try {
  process.send?.({ rows: await measure(folder) });
} finally {
  rmSync(folder, { recursive: true, force: true });
}
process.disconnect?.();
