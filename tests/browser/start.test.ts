import { chromium, type Browser } from 'playwright-core';

const address = process.env.ROWCALL_URL ?? '';

let browser: Browser;

beforeAll(async () => {
  browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-background-networking', '--disable-component-update', '--no-first-run'],
  });
}, 60_000);
afterAll(() => browser.close());

it('the application runs under its content policy: no script, style or request of it is refused', async () => {
  const page = await browser.newPage();
  const refused: string[] = [];
  page.on('console', (message) => {
    if (/Content Security Policy|Refused to/i.test(message.text())) refused.push(message.text());
  });
  page.on('pageerror', (error) => refused.push(String(error)));
  await page.goto(address, { waitUntil: 'networkidle' });
  await page.waitForFunction(() => (document.getElementById('root')?.innerText.length ?? 0) > 20);
  expect(refused).toEqual([]);
  await page.close();
}, 120_000);
