import { readFileSync } from 'node:fs';
import { palettes, type Colours } from '@/components/theme/colours';
import { contrast } from '@/tests/ui/support/contrast';

const grounds = ['paper', 'sheet'] as const;
const words = ['ink', 'soft', 'pencil', 'pen', 'tick', 'mark', 'answer'] as const;

const pairs = (list: readonly (keyof Colours)[], on: readonly (keyof Colours)[]) =>
  list.flatMap((word) => on.map((ground) => [word, ground] as const));

test('the measure agrees with the extremes that WCAG gives', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
  expect(contrast('#777777', '#ffffff')).toBeCloseTo(4.48, 2);
});

describe.each(['day', 'night'] as const)('the %s theme', (name) => {
  const colours = palettes[name];

  test.each(pairs(words, grounds))('words in %s on %s can be read: at least 4.5', (word, ground) => {
    expect(contrast(colours[word], colours[ground])).toBeGreaterThanOrEqual(4.5);
  });

  test.each(pairs(['ink', 'answer'], grounds))('the answer in %s on %s: at least 7', (word, ground) => {
    expect(contrast(colours[word], colours[ground])).toBeGreaterThanOrEqual(7);
  });

  test.each([
    ['onInk', 'ink', 7],
    ['onPencil', 'pencil', 4.5],
    ['ink', 'pencilWash', 7],
    ['pencil', 'pencilWash', 4.5],
    ['ink', 'chip', 7],
    ['ink', 'faded', 4.5],
    ['soft', 'faded', 4.5],
  ] as const)('%s on %s: at least %s', (word, ground, least) => {
    expect(contrast(colours[word], colours[ground])).toBeGreaterThanOrEqual(least);
  });

  test.each(pairs(['ink', 'pen', 'pencil'], grounds))(
    'lines that mean something, %s on %s: at least 3',
    (mark, ground) => {
      expect(contrast(colours[mark], colours[ground])).toBeGreaterThanOrEqual(3);
    },
  );
});

test('the page template and the manifest begin in the colours of the themes', () => {
  const template = readFileSync('public/index.html', 'utf8');
  expect(template).toContain(`content="${palettes.day.paper}" media="(prefers-color-scheme: light)"`);
  expect(template).toContain(`content="${palettes.night.paper}" media="(prefers-color-scheme: dark)"`);
  const manifest = JSON.parse(readFileSync('public/manifest.webmanifest', 'utf8')) as Record<string, string>;
  expect([manifest.background_color, manifest.theme_color]).toEqual([palettes.day.paper, palettes.day.paper]);
});
