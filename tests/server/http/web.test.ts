import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliCompressSync, gzipSync } from 'node:zlib';
import express from 'express';
import request from 'supertest';
import { buildConfig } from '../support/config';
import { securityHeaders } from '@/server/http/security';
import { webExport } from '@/server/http/web';

const folder = mkdtempSync(join(tmpdir(), 'rowcall-web-'));
const script = '/_expo/static/js/web/entry-0123456789abcdef.js';
const code = 'console.log("roll call")';

const put = (path: string, content: string | Buffer) => {
  mkdirSync(join(folder, path, '..'), { recursive: true });
  writeFileSync(join(folder, path), content);
};

put('index.html', '<!doctype html><title>Rowcall</title>');
put(script, code);
put(`${script}.br`, brotliCompressSync(code));
put(`${script}.gz`, gzipSync(code));
put('sw.js', 'self.skipWaiting()');
put('.sources', 'hidden');
put('boards/[slug].html', 'x');

const app = express().use(securityHeaders(buildConfig()), webExport(folder));

afterAll(() => rmSync(folder, { recursive: true }));

describe('the web export', () => {
  it.each(['/', '/boards', '/boards/a.board-1/diagnose', '/reset?token=abc'])(
    'answers %s with the application',
    async (path) => {
      const answer = await request(app).get(path).expect(200);
      expect(answer.text).toContain('<title>Rowcall</title>');
      expect(answer.headers['cache-control']).toBe('no-cache');
    },
  );

  it('lets hashed files be kept for good', async () => {
    const answer = await request(app).get(script).set('Accept-Encoding', 'identity').expect(200);
    expect(answer.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    expect(answer.text).toBe(code);
  });

  it('sends the Brotli twin to a browser that takes it', async () => {
    const answer = await request(app).get(script).set('Accept-Encoding', 'gzip, br').expect(200);
    expect(answer.headers['content-encoding']).toBe('br');
    expect(answer.headers['content-type']).toMatch('javascript');
    expect(answer.headers['cache-control']).toMatch('immutable');
    expect(answer.headers.vary).toMatch('Accept-Encoding');
  });

  it('sends the gzip twin where the browser takes no Brotli, as on plain HTTP', async () => {
    const answer = await request(app).get(script).set('Accept-Encoding', 'gzip, deflate').expect(200);
    expect(answer.headers['content-encoding']).toBe('gzip');
    expect(answer.headers['content-length']).toBe(String(gzipSync(code).length));
  });

  it('lets the service worker be asked for anew, for the whole site', async () => {
    const answer = await request(app).get('/sw.js').expect(200);
    expect(answer.headers['cache-control']).toBe('no-cache');
    expect(answer.headers['service-worker-allowed']).toBe('/');
  });

  it('says that a hashed file of an older version is missing, instead of sending a page for it', async () => {
    await request(app).get('/_expo/static/js/web/entry-gone.js').expect(404);
  });

  it.each(['/.sources', '/%2e%2e/%2e%2e/etc/passwd', '/..%2f..%2fetc/passwd'])('does not let %s out', async (path) => {
    const answer = await request(app).get(path);
    expect(answer.text).not.toMatch(/hidden|root:/);
  });

  it('runs no script but its own', async () => {
    const answer = await request(app).get('/');
    expect(answer.headers['content-security-policy']).toMatch(/script-src 'self';/);
    expect(answer.headers['x-content-type-options']).toBe('nosniff');
  });
});
