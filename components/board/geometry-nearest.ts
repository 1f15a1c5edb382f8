import { distanceToBox, type Box, type Point } from './geometry';

/** Something with a place that can be picked or moved to. */
interface Placed {
  readonly box: Box;
}

/** The item nearest to a point, null where none lies within reach. A point inside several picks the one whose centre is nearest. */
export function nearestTo<Item extends Placed>(items: readonly Item[], point: Point, reach: number): Item | null {
  let best: Item | null = null;
  let least = [Infinity, Infinity] as const;
  for (const item of items) {
    const toBox = distanceToBox(point, item.box);
    if (toBox > reach) continue;
    const toCentre = Math.hypot(point.x - item.box.x, point.y - item.box.y);
    if (toBox < least[0] || (toBox === least[0] && toCentre < least[1])) {
      best = item;
      least = [toBox, toCentre];
    }
  }
  return best;
}

/** Unit vectors of the arrow keys. */
export const directions = {
  ArrowUp: { x: 0, y: -1 },
  ArrowRight: { x: 1, y: 0 },
  ArrowDown: { x: 0, y: 1 },
  ArrowLeft: { x: -1, y: 0 },
} as const satisfies Record<string, Point>;

/**
 * The nearest item in a direction, null at the rim. What lies within 45 degrees of the direction goes first;
 * among the rest a step aside counts twice, so that nothing is out of reach.
 */
export function neighbourOf<Item extends Placed>(items: readonly Item[], from: Item, direction: Point): Item | null {
  let best: Item | null = null;
  let least = Infinity;
  for (const item of items) {
    const dx = item.box.x - from.box.x;
    const dy = item.box.y - from.box.y;
    const along = dx * direction.x + dy * direction.y;
    const aside = Math.abs(dx * direction.y) + Math.abs(dy * direction.x);
    if (item === from || along <= 1e-9) continue;
    const cost = aside <= along + 1e-9 ? Math.hypot(along, aside) : 1e6 + along + 2 * aside;
    if (cost < least) {
      least = cost;
      best = item;
    }
  }
  return best;
}

/** Items in reading order: rows from the top, each from the left. Items that overlap by half their height share a row. */
export function readingOrder<Item extends Placed>(items: readonly Item[]): readonly Item[] {
  const byHeight = [...items].sort((a, b) => a.box.y - b.box.y);
  const rows: Item[][] = [];
  for (const item of byHeight) {
    const head = rows[rows.length - 1]?.[0];
    if (head && item.box.y - head.box.y < Math.min(head.box.height, item.box.height) / 2)
      rows[rows.length - 1]!.push(item);
    else rows.push([item]);
  }
  return rows.flatMap((row) => row.sort((a, b) => a.box.x - b.box.x));
}
