import type { SketchView } from '@/components/board/sketch-types';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { buildLayout, type LayoutOptions } from '../../factories/layout';

/** Every demo board, indexed, by its slug. */
export const boards: ReadonlyMap<string, LayoutIndex> = new Map(
  demoBoards.map(({ slug, document }) => [slug, buildLayoutIndex(layoutDocument.parse(document))]),
);

/** One demo board; a RangeError where there is none of that name. */
export function board(slug: string): LayoutIndex {
  const index = boards.get(slug);
  if (!index) throw new RangeError(`There is no demo board ${slug}.`);
  return index;
}

/** An invented board of any size, indexed. */
export const boardOf = (options: LayoutOptions) => buildLayoutIndex(buildLayout(options));

/** The eight ways in which a board can lie. */
export const lies: readonly Pick<SketchView, 'turn' | 'solderSide'>[] = [false, true].flatMap((solderSide) =>
  ([0, 1, 2, 3] as const).map((turn) => ({ turn, solderSide })),
);
