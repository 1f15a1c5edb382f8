import type { PictureMark, ScreenMap } from '@/shared';
import { extentsOf, placesOf, type Extent } from './extent';

interface Point {
  readonly x: number;
  readonly y: number;
}

/** Columns and lines of the picture as it stands on the glass, after the turn. */
export function glassSize({ width, height, turn }: ScreenMap): { width: number; height: number } {
  return turn % 2 === 1 ? { width: height, height: width } : { width, height };
}

/** Where a pixel of the memory is seen on the glass. */
export function toGlass({ width, height, turn }: ScreenMap, { x, y }: Point): Point {
  switch (turn) {
    case 0:
      return { x, y };
    case 1:
      return { x: height - 1 - y, y: x };
    case 2:
      return { x: width - 1 - x, y: height - 1 - y };
    case 3:
      return { x: y, y: width - 1 - x };
  }
}

/** The pixel of the memory that is seen at a place of the glass. */
export function fromGlass(map: ScreenMap, at: Point): Point {
  const { width, height } = glassSize(map);
  return toGlass({ ...map, width, height, turn: ((4 - map.turn) % 4) as ScreenMap['turn'] }, at);
}

/** The columns of a mark. */
export const columnsOf = ({ x, everyX, untilX }: PictureMark): Extent => ({
  from: x[0],
  to: x[1],
  every: everyX,
  until: untilX,
});

/** The lines of a mark. */
export const linesOf = ({ y, everyY, untilY }: PictureMark): Extent => ({
  from: y[0],
  to: y[1],
  every: everyY,
  until: untilY,
});

/** A mark with these columns and lines. */
export function markAt(mark: Pick<PictureMark, 'looks' | 'planes'>, columns: Extent, lines: Extent): PictureMark {
  return {
    looks: mark.looks,
    ...(mark.planes === undefined ? {} : { planes: mark.planes }),
    x: [columns.from, columns.to],
    ...(columns.every === undefined ? {} : { everyX: columns.every }),
    ...(columns.until === undefined ? {} : { untilX: columns.until }),
    y: [lines.from, lines.to],
    ...(lines.every === undefined ? {} : { everyY: lines.every }),
    ...(lines.until === undefined ? {} : { untilY: lines.until }),
  };
}

/** A mark as the memory holds it, as it is seen on the glass: one as a rule, more where a repeat is cut at an edge. */
export function markOnGlass(map: ScreenMap, mark: PictureMark): PictureMark[] {
  return turned(mark, { width: map.width, height: map.height, turn: map.turn });
}

/** A mark made on the glass, as the memory holds it. */
export function markInMemory(map: ScreenMap, mark: PictureMark): PictureMark[] {
  return turned(mark, { ...glassSize(map), turn: (4 - map.turn) % 4 });
}

function turned(
  mark: PictureMark,
  { width, height, turn }: { width: number; height: number; turn: number },
): PictureMark[] {
  const along = (extent: Extent, size: number, mirrored: 'mirrored' | 'as it is') => {
    const places = placesOf(extent, size);
    return extentsOf(mirrored === 'mirrored' ? places.map((at) => size - 1 - at).reverse() : places, size);
  };
  // A quarter turn clockwise sends lines to columns from the right, and columns to lines from above.
  const x = along(columnsOf(mark), width, turn === 2 || turn === 3 ? 'mirrored' : 'as it is');
  const y = along(linesOf(mark), height, turn === 1 || turn === 2 ? 'mirrored' : 'as it is');
  const [columns, lines] = turn % 2 === 1 ? [y, x] : [x, y];
  return columns.flatMap((each) => lines.map((line) => markAt(mark, each, line)));
}
