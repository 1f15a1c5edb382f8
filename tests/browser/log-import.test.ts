import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import AxeBuilder from '@axe-core/playwright';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

const address = process.env.ROWCALL_URL ?? '';
const workspace = '/boards/tarnvall-t-64-rev-b/diagnose';
const lineBytes = 23;
const lines = 2_000_000;

jest.setTimeout(300_000);

let browser: Browser;
let context: BrowserContext;
let page: Page;
let folder: string;
let large: string;
let packed: string;

/** Lines such as "8A2F wrote 55 read 75": in bank C bit 5 fails, everything else is right. */
function monitorLines(count: number): Buffer {
  const bytes = Buffer.alloc(count * lineBytes, '0000 wrote 00 read 00\r\n');
  const hex = Buffer.from('0123456789ABCDEF');
  let state = 1;
  for (let n = 0; n < count; n++) {
    state = (Math.imul(state, 1_103_515_245) + 12_345) >>> 0;
    const place = state >>> 16;
    const value = state & 0x100 ? 0x55 : 0xaa;
    const wrong = place >>> 14 === 2 ? value ^ 0x20 : value;
    const at = n * lineBytes;
    for (let digit = 0; digit < 4; digit++) bytes[at + digit] = hex[(place >> (12 - 4 * digit)) & 15]!;
    [value, wrong].forEach((each, field) => {
      bytes[at + 11 + field * 8] = hex[each >> 4]!;
      bytes[at + 12 + field * 8] = hex[each & 15]!;
    });
  }
  return bytes;
}

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'rowcall-logs-'));
  large = join(folder, 'night.log');
  packed = join(folder, 'evening.log.gz');
  writeFileSync(large, monitorLines(lines));
  writeFileSync(packed, gzipSync(Buffer.concat([monitorLines(5000), Buffer.from('end of test\r\n')])));
  browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-background-networking', '--disable-component-update', '--no-first-run'],
  });
});
afterAll(async () => {
  await browser.close();
  rmSync(folder, { recursive: true, force: true });
});
afterEach(() => context.close());

type View = { width: number; height: number; colorScheme?: 'light' | 'dark'; serviceWorkers?: 'block' };

const open = async ({ width, height, ...view }: View) => {
  context = await browser.newContext({ viewport: { width, height }, ...view });
  context.setDefaultTimeout(60_000);
  page = await context.newPage();
  await page.goto(`${address}${workspace}`);
  await page.getByRole('radio', { name: 'Something else' }).click();
  await page.getByRole('button', { name: /^A log\./ }).click();
};

const press = (name: string) => page.getByRole('button', { name, exact: true }).click();
const choose = (file: string) => page.getByLabel('Log as a file').setInputFiles(file);
const meanings = () => page.getByRole('list', { name: 'What its first lines mean' });
const sideways = () => page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
const barriers = async (): Promise<string[]> => {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .disableRules(['target-size'])
    .analyze();
  return violations.flatMap(({ id, nodes }) => nodes.map(({ target }) => `${id}: ${target.join(' ')}`));
};

it('reads two million lines in a worker while the screen stays alive, and they lead to the chip', async () => {
  await open({ width: 1440, height: 900 });
  const workers: string[] = [];
  page.on('worker', (worker) => workers.push(worker.url()));
  await choose(large);
  await page.getByRole('radio', { name: /^Address word 1, written after WROTE, read after READ; hex/ }).waitFor();
  await meanings().getByText('Bit 5 of bank C').first().waitFor();
  // Every drawing of the screen is counted from here on, with the longest time between two.
  await page.evaluate(() => {
    const seen = { frames: 0, longest: 0, last: performance.now() };
    Object.assign(window, { seen });
    const frame = (now: number) => {
      seen.frames++;
      seen.longest = Math.max(seen.longest, now - seen.last);
      seen.last = now;
      requestAnimationFrame(frame);
    };
    requestAnimationFrame(frame);
  });
  await press('Read the log');
  await page.getByText('One bit failed.').waitFor();
  const seen = await page.evaluate(() => (window as unknown as { seen: { frames: number; longest: number } }).seen);
  expect(workers).toHaveLength(1);
  expect(seen.frames).toBeGreaterThan(5);
  expect(seen.longest).toBeLessThan(1000);
  const main = (await page.locator('main').innerText()).replace(/\s+/g, ' ');
  expect(main).toContain('2 000 000 lines; 2 000 000 readings');
  expect(main).toMatch(/Bit 5 of bank C U31/);
  expect(await barriers()).toEqual([]);
  expect(await sideways()).toBeLessThanOrEqual(0);
  await press('Use this log');
  await page.getByRole('heading', { name: /U31/ }).first().waitFor();
  await page.getByText('night.log').first().waitFor();
});

it.each(['light', 'dark'] as const)(
  'reads a packed log on a phone, without a barrier at any step, %s',
  async (scheme) => {
    await open({ width: 390, height: 844, colorScheme: scheme });
    const step = async () => {
      expect(await barriers()).toEqual([]);
      expect(await sideways()).toBeLessThanOrEqual(0);
    };
    await step();
    await choose(packed);
    await page.getByText('Bit 5 of bank C').first().waitFor();
    await step();
    await page.getByRole('radio', { name: /^I point at the words/ }).click();
    await step();
    await press('Read the log');
    await page.getByText('One bit failed.').waitFor();
    await page.getByText(/^Line 5.001: /).waitFor();
    await step();
    await press('Use this log');
    await page.getByRole('heading', { name: /U31/ }).first().waitFor();
  },
);

it('says that the packing of a file is broken', async () => {
  await open({ width: 390, height: 844 });
  const broken = join(folder, 'broken.gz');
  writeFileSync(broken, gzipSync(monitorLines(100_000)).subarray(0, 60_000));
  await choose(broken);
  await press('Read the log');
  await page.getByText('broken.gz: The file is packed, and its packing is broken.').waitFor();
});

it('stops reading when it is told to', async () => {
  await open({ width: 1440, height: 900, serviceWorkers: 'block' });
  await choose(large);
  // The worker is held up, so that there is something to stop.
  await page.route(/\/log-[0-9a-f]+\.js$/, () => undefined);
  await press('Read the log');
  await page.getByRole('progressbar').waitFor();
  expect(await barriers()).toEqual([]);
  // A window that gets narrow, or a phone that is turned, loses nothing of it.
  await page.setViewportSize({ width: 390, height: 844 });
  await page.getByRole('progressbar').waitFor();
  await press('Stop reading');
  await page.getByRole('button', { name: 'Read the log', exact: true }).waitFor();
});
