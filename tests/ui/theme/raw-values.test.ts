import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

const files = ['components', 'app'].flatMap((folder) =>
  (readdirSync(folder, { recursive: true }) as string[])
    .map((file) => join(folder, file))
    .filter((file) => /\.tsx?$/.test(file) && !file.startsWith(join('components', 'theme'))),
);

const withoutComments = (source: string) => source.replace(/\/\*[\s\S]*?\*\//g, '').replace(/^\s*\/\/.*$/gm, '');

const places = (pattern: RegExp) =>
  files.flatMap((file) =>
    (withoutComments(readFileSync(file, 'utf8')).match(pattern) ?? []).map((found) => `${file}: ${found}`),
  );

test('no colour is written outside the theme', () => {
  expect(places(/['"`]#[0-9a-f]{3,8}['"`]|\b(?:rgb|hsl)a?\(/gi)).toEqual([]);
});

test('no pixel size is written outside the theme', () => {
  const sizes =
    /\b(?:(?:min|max)?(?:width|height)|(?:padding|margin|border)\w*|gap|fontSize|lineHeight|flexBasis): -?[1-9]\d*\b(?![%'])/gi;
  expect(places(sizes)).toEqual([]);
});
