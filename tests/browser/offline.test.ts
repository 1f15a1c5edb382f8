import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { Network } from './support/network';

const opened = '/boards/tarnvall-t-64-rev-b/diagnose';
const neverOpened = '/boards/kestrup-lc-2-rev-d/diagnose';
const patience = 30_000;

jest.setTimeout(180_000);

let browser: Browser;
let network: Network;
let address: string;
let context: BrowserContext;

beforeAll(async () => {
  browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-background-networking', '--disable-component-update', '--no-first-run'],
  });
});
afterAll(() => browser.close());

beforeEach(async () => {
  network = new Network(process.env.ROWCALL_URL ?? '');
  address = await network.open();
  context = await browser.newContext();
  context.setDefaultTimeout(patience);
});
afterEach(async () => {
  await context.close();
  await network.close();
});

/** Opens a page and waits until the whole application is kept on the device. */
const visit = async (path: string): Promise<Page> => {
  const page = await context.newPage();
  await page.goto(address + path);
  await page.evaluate(() => navigator.serviceWorker.ready);
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
  return page;
};

const goOffline = async () => {
  network.cut();
  await context.setOffline(true);
};

const comeBack = async () => {
  network.mend();
  await context.setOffline(false);
};

const typeCode = async (page: Page, keys: string[]) => {
  for (const key of keys) await page.getByRole('button', { name: key, exact: true }).click();
  await page.getByRole('button', { name: 'Find the chip' }).click();
};

const answer = (page: Page) => page.getByText(/^Pull \w+/).first();

const releaseOf = (page: Page) =>
  page.evaluate(() => document.querySelector('meta[name="release"]')?.getAttribute('content') ?? 'first');

const bringRelease = async (page: Page) => {
  network.release();
  // No async function: what Babel makes of it needs a helper that the page does not have.
  await page.evaluate(() => navigator.serviceWorker.ready.then((worker) => worker.update()).then(() => undefined));
};

const newVersion = (page: Page) => page.getByText('A new version is ready.');

describe('without a network', () => {
  it('a board that was opened before is loaded again, takes a code and gives the answer', async () => {
    const page = await visit(opened);
    await page.getByRole('button', { name: 'Find the chip' }).waitFor();
    await goOffline();
    await page.reload();
    await page.getByText('Boards opened before still work.').waitFor();
    await typeCode(page, ['B', '3']);
    await answer(page).waitFor();
  });

  it('the look-up lists the boards of this device', async () => {
    const page = await visit(opened);
    await page.getByRole('button', { name: 'Find the chip' }).waitFor();
    await goOffline();
    await page.goto(`${address}/`);
    await page.getByRole('link', { name: /T-64 loom/ }).waitFor();
    await page.getByText('These boards are kept on this device').waitFor();
  });

  it('the page of a board that was opened before is there', async () => {
    const page = await visit(opened);
    await page.getByRole('button', { name: 'Find the chip' }).waitFor();
    await goOffline();
    await page.goto(address + opened.replace('/diagnose', ''));
    await page.getByRole('heading', { name: /T-64/ }).first().waitFor();
  });

  it('a board that was never opened says so, and comes when the network is back', async () => {
    const page = await visit('/');
    await goOffline();
    await page.goto(address + neverOpened);
    await page.getByText('Boards that were opened on this device before work without the network.').waitFor();
    await comeBack();
    await page.getByRole('button', { name: /again/i }).click();
    await page.getByRole('button', { name: 'Find the chip' }).waitFor();
    expect(await page.getByText('Boards opened before still work.').count()).toBe(0);
  });

  it('a form says that the server cannot be reached, and keeps what was typed', async () => {
    const page = await visit('/sign-in');
    await page.getByLabel('E-mail').waitFor();
    await goOffline();
    await page.getByLabel('E-mail').fill('somebody@rowcall.example');
    await page.getByLabel('Password', { exact: true }).fill('a password that is long');
    await page.getByRole('main').getByRole('button', { name: 'Sign in' }).click();
    await page.getByText('The server cannot be reached.').first().waitFor();
    expect(await page.getByLabel('E-mail').inputValue()).toBe('somebody@rowcall.example');
  });
});

it('the device keeps every file of the application, and nothing of the API', async () => {
  const page = await visit(opened);
  await page.getByRole('button', { name: 'Find the chip' }).waitFor();
  const paths = await page.evaluate(() =>
    window.caches
      .keys()
      .then((names) => Promise.all(names.map((name) => window.caches.open(name).then((cache) => cache.keys()))))
      .then((requests) => requests.flat().map(({ url }) => new URL(url).pathname)),
  );
  expect(paths.filter((path) => path.startsWith('/api'))).toEqual([]);
  expect(paths).toContain('/index.html');
  expect(paths.filter((path) => path.endsWith('.ttf'))).toHaveLength(4);
  expect(paths.filter((path) => path.includes('later-screens'))).toHaveLength(1);
});

describe('a new version', () => {
  it('waits while a look-up is open, lets it run on, and keeps it when it is taken over', async () => {
    const page = await visit(opened);
    await typeCode(page, ['B', '3']);
    await answer(page).waitFor();
    const words = await answer(page).innerText();
    await bringRelease(page);
    await newVersion(page).waitFor();
    expect(await releaseOf(page)).toBe('first');
    // Code that this page has not needed yet: the server no longer has it.
    await page.getByRole('link', { name: 'All cautions' }).last().click();
    await page.getByRole('heading', { level: 1, name: /caution/i }).waitFor();
    await page.goBack();
    await answer(page).waitFor();
    const link = page.url();
    await page.getByRole('button', { name: 'Take it over' }).click();
    await page.waitForFunction(() => document.querySelector('meta[name="release"]') !== null);
    await answer(page).waitFor();
    expect(page.url()).toBe(link);
    expect(await answer(page).innerText()).toBe(words);
  });

  it('is taken over by itself at the next start, but not while a look-up is open in another tab', async () => {
    const workspace = await visit(opened);
    await workspace.getByRole('button', { name: 'Find the chip' }).waitFor();
    await bringRelease(workspace);
    await newVersion(workspace).waitFor();
    const second = await visit('/');
    await newVersion(second).waitFor();
    expect(await releaseOf(second)).toBe('first');
    await second.close();
    await workspace.close();
    const third = await context.newPage();
    await third.goto(`${address}/boards`);
    await third.waitForFunction(() => document.querySelector('meta[name="release"]') !== null);
  });

  it('that one tab takes over leaves the others as they are, and says so there', async () => {
    const workspace = await visit(opened);
    await typeCode(workspace, ['B', '3']);
    await answer(workspace).waitFor();
    await bringRelease(workspace);
    const other = await visit('/boards');
    await other.getByRole('button', { name: 'Take it over' }).click();
    await other.waitForFunction(() => document.querySelector('meta[name="release"]') !== null);
    await newVersion(workspace).waitFor();
    expect(await releaseOf(workspace)).toBe('first');
    await answer(workspace).waitFor();
  });
});
