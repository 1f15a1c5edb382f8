import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { validateLayout } from '@/lib/layout/validate';
import { pictureOfChip } from '@/lib/screen/picture-of-chip';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';

const board = (slug: string) => layoutDocument.parse(demoBoards.find((each) => each.slug === slug)?.document);
const withScreen = demoBoards
  .map(({ slug, document }) => ({ slug, document: layoutDocument.parse(document) }))
  .filter(({ document }) => document.screenMap !== undefined);
const look = (slug: string, label: string) => {
  const index = buildLayoutIndex(board(slug));
  return pictureOfChip(index, { socket: index.socketByLabel.get(label)! })!;
};

describe.each(withScreen)('the screen of $slug', ({ document }) => {
  it('is without a problem', () => {
    expect(validateLayout(document).filter(({ pointer }) => pointer.startsWith('/screenMap'))).toEqual([]);
  });

  it('shows every dot through one chip', () => {
    const index = buildLayoutIndex(document);
    const { width, height, planes } = document.screenMap!;
    const dots = document.sockets.map((_, at) => pictureOfChip(index, { socket: at as never })!.dots);
    expect(dots.reduce((sum, each) => sum + each, 0)).toBe(width * height * planes.length);
  });
});

describe('a dead chip of the demo boards', () => {
  it('of the page display takes one colour out of every eighth column', () => {
    expect(look('penhallow-formset-2-pd-3', 'N22').words).toEqual([
      'every eighth column from column 2: magenta in place of white where they read 0, green in place of black where they read 1',
    ]);
  });

  it('of the door terminal draws its own part of the upright tube', () => {
    expect(look('rimstad-ct-7-rev-3', 'E29').words).toEqual([
      'columns 192 to 319, every eighth line from line 0: dark in place of lit where they read 0, lit in place of dark where they read 1',
    ]);
    expect(look('rimstad-ct-7-rev-3', 'E30').words[0]).toMatch(/^columns 0 to 191, every eighth line from line 0:/);
    expect(look('rimstad-ct-7-rev-3', 'E31').words).toEqual([]);
  });
});
