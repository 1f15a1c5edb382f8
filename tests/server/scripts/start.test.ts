import { spawn } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

const folder = mkdtempSync(join(tmpdir(), 'rowcall-start-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** Runs the starter to its end, in an environment of its own. */
const start = (env: Record<string, string>): Promise<{ code: number | null; told: string }> =>
  new Promise((resolve) => {
    const child = spawn(process.execPath, ['server/scripts/start.mjs'], {
      env: { PATH: process.env.PATH, HOME: process.env.HOME, ROWCALL_FOLDER: join(folder, 'data'), ...env } as never,
    });
    let told = '';
    child.stdout.on('data', (chunk: Buffer) => (told += chunk.toString()));
    child.stderr.on('data', (chunk: Buffer) => (told += chunk.toString()));
    child.once('close', (code) => resolve({ code, told }));
  });

describe('what stands in the way of a start is one clear line', () => {
  it('a port that is in use', async () => {
    const other = createServer();
    await new Promise<void>((resolve) => other.listen(0, '127.0.0.1', resolve));
    const { port } = other.address() as AddressInfo;
    const { code, told } = await start({ PORT: String(port) });
    await new Promise((resolve) => other.close(resolve));
    expect([code, told]).toEqual([
      1,
      `Rowcall: port ${port} is in use by another program. Take another: PORT=${port + 1} npm start\n`,
    ]);
  });

  it('a port that is none', async () => {
    const { code, told } = await start({ PORT: 'lamp' });
    expect([code, told]).toEqual([1, 'Rowcall: PORT has to be a number from 1 to 65535, not "lamp".\n']);
  });

  it('a folder that cannot be written', async () => {
    const { code, told } = await start({ ROWCALL_FOLDER: '/dev/null/rowcall' });
    expect(code).toBe(1);
    expect(told).toMatch(/^Rowcall: the folder \/dev\/null\/rowcall cannot be written: .*\n$/);
  });

  it('a folder that another run uses', async () => {
    const data = join(folder, 'used');
    mkdirSync(data);
    const other = spawn(process.execPath, ['-e', 'setTimeout(() => {}, 60000)', 'scripts/start.mjs']);
    writeFileSync(join(data, 'running.json'), JSON.stringify({ pid: other.pid, address: 'http://localhost:3000' }));
    const { code, told } = await start({ ROWCALL_FOLDER: data });
    other.kill();
    expect([code, told]).toEqual([
      1,
      `Rowcall: it runs already at http://localhost:3000 (process ${other.pid}). Stop that one first.\n`,
    ]);
  });

  it('production without its configuration, with every variable that is missing', async () => {
    const { code, told } = await start({ NODE_ENV: 'production' });
    expect(code).toBe(1);
    for (const name of ['PUBLIC_URL', 'DATABASE_URL', 'TOKEN_SECRET', 'SMTP_URL', 'MAIL_FROM', 'S3_ENDPOINT']) {
      expect(told).toContain(`  ${name}: `);
    }
    expect(told).toMatch(/\nRowcall: nothing was started\.\n$/);
  });
});
