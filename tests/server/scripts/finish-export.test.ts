import { execFileSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { brotliDecompressSync, gunzipSync } from 'node:zlib';

const root = mkdtempSync(join(tmpdir(), 'rowcall-export-'));
const hash = (at: number) => String(at).repeat(32);
const font = `assets/node_modules/fonts/Hyper_400.${hash(7)}.ttf`;
const entry = (at: number) => `_expo/static/js/web/entry-${hash(at)}.js`;
const code = 'export const roll = "call";'.repeat(200);

/** Builds an export whose code has a hash of its own, and finishes it as the build after `before`. */
const build = (at: number, before?: string): string => {
  const folder = mkdtempSync(join(root, 'build-'));
  const put = (file: string, content: string) => {
    mkdirSync(dirname(join(folder, file)), { recursive: true });
    writeFileSync(join(folder, file), content);
  };
  put('index.html', `<html><head></head><body><script src="/${entry(at)}" defer></script></body></html>`);
  put('manifest.webmanifest', '{}');
  put('icons/icon.svg', '<svg/>');
  put(entry(at), `${code}//${at}`);
  put(`_expo/static/js/web/_layout-${hash(8)}.js`, code);
  put(font, 'font '.repeat(100));
  execFileSync(process.execPath, ['server/scripts/finish-export.mjs', folder, ...(before ? [before] : [])]);
  return folder;
};

const text = (folder: string, file: string) => readFileSync(join(folder, file), 'utf8');

afterAll(() => rmSync(root, { recursive: true }));

describe('a finished export', () => {
  const folder = build(1);

  it('has a Brotli and a gzip twin of its code that say the same', () => {
    expect(brotliDecompressSync(readFileSync(join(folder, `${entry(1)}.br`))).toString()).toBe(`${code}//1`);
    expect(gunzipSync(readFileSync(join(folder, `${entry(1)}.gz`))).toString()).toBe(`${code}//1`);
    expect(brotliDecompressSync(readFileSync(join(folder, 'index.html.br'))).toString()).toBe(
      text(folder, 'index.html'),
    );
  });

  it('asks for the fonts and the code around every page at once', () => {
    const page = text(folder, 'index.html');
    expect(page).toContain(`<link rel="preload" href="/${font}" as="font" crossorigin />`);
    expect(page).toMatch(/<link rel="preload" href="\/_expo\/static\/js\/web\/_layout-8+\.js" as="script" \/>/);
  });

  it('has a service worker that keeps each of its files, and leaves the API and the development pages alone', () => {
    const worker = text(folder, 'sw.js');
    for (const file of [entry(1), font, 'index.html', 'manifest.webmanifest', 'icons/icon.svg']) {
      expect(worker).toContain(`url:"${file}"`);
    }
    expect(worker).toContain(`{url:"${entry(1)}",revision:null}`);
    expect(worker).toContain(String.raw`denylist:[/^\/(api|dev)(\/|$)/]`);
    expect(worker).not.toMatch(/importScripts|https?:\/\/(?!localhost)[\w.]*(google|cdn)/);
  });
});

describe('an export that replaces another', () => {
  it('still has the code that pages opened before ask for, does not keep it on devices, and lets it go after some builds', () => {
    const builds = [build(2)];
    for (const at of [3, 4, 5]) builds.push(build(at, builds.at(-1)));
    const last = builds.at(-1) ?? '';
    expect(text(last, entry(2))).toBe(`${code}//2`);
    expect(existsSync(join(last, `${entry(2)}.br`))).toBe(true);
    expect(text(last, 'sw.js')).not.toContain(entry(2));
    const after = build(6, last);
    expect(existsSync(join(after, entry(2)))).toBe(false);
    expect(text(after, entry(3))).toBe(`${code}//3`);
  });

  it('counts the same files built again as one build', () => {
    const again = build(9, build(9));
    expect(JSON.parse(text(again, '.builds.json'))).toHaveLength(1);
  });
});
