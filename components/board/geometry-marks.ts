import { distanceToBox, type Box, type Point } from './geometry';

const at = (n: number) => Number(n.toFixed(2));

/** Outline of a chip of a size in px, its corners rounded, around the origin. */
export function bodyPath({ width, height }: { width: number; height: number }): string {
  const r = Math.min(width, height) * 0.05;
  const [x, y] = [width / 2, height / 2];
  const arc = (dx: number, dy: number) => `a${at(r)} ${at(r)} 0 0 1 ${at(dx)} ${at(dy)}`;
  return (
    `M${at(-x + r)} ${at(-y)}H${at(x - r)}${arc(r, r)}V${at(y - r)}${arc(-r, r)}` +
    `H${at(-x + r)}${arc(-r, -r)}V${at(-y + r)}${arc(r, -r)}Z`
  );
}

/** The notch: a half circle at the middle of the side where pin 1 is. */
export function notchPath({ width, height }: { width: number; height: number }, side: Point): string {
  const r = Math.min(width, height) * 0.13;
  const middle = { x: (side.x * width) / 2, y: (side.y * height) / 2 };
  // Along the side, clockwise, so that the half circle bulges inwards.
  const along = { x: -side.y, y: side.x };
  return `M${at(middle.x - along.x * r)} ${at(middle.y - along.y * r)}A${at(r)} ${at(r)} 0 0 0 ${at(middle.x + along.x * r)} ${at(middle.y + along.y * r)}`;
}

/** Centre of the dot of pin 1, just inside its corner. */
export function pin1Place({ width, height }: { width: number; height: number }, corner: Point): Point {
  const inset = Math.min(width, height) * 0.16;
  return { x: corner.x * (width / 2 - inset), y: corner.y * (height / 2 - inset) };
}

/** Parallel strokes from lower left to upper right over a box around the origin, `step` px apart. */
export function hatchPath({ width, height }: { width: number; height: number }, step: number): string {
  const [x, y] = [width / 2, height / 2];
  let path = '';
  // Every stroke lies on x + y = c.
  for (let c = -x - y + step / 2; c < x + y; c += step) {
    const from = Math.max(-x, c - y);
    const to = Math.min(x, c + y);
    if (to > from) path += `M${at(from)} ${at(c - from)}L${at(to)} ${at(c - to)}`;
  }
  return path;
}

/** A small tick, `size` px wide, its foot at the origin's left. */
export function tickPath(size: number): string {
  return `M${at(-size * 0.5)} ${at(0)}L${at(-size * 0.14)} ${at(size * 0.36)}L${at(size * 0.5)} ${at(-size * 0.4)}`;
}

/** Centre of the tick: the lower right corner, or the lower left where pin 1 or the notch is there. */
export function tickPlace({ width, height }: { width: number; height: number }, corner: Point): Point {
  const inset = Math.min(width, height) * 0.2;
  const side = corner.x === 1 && corner.y === 1 ? -1 : 1;
  return { x: side * (width / 2 - inset), y: height / 2 - inset };
}

/** How a pencil ring is drawn: half axes in px; `from` and `to` in degrees clockwise from the right. */
export interface Ring {
  readonly rx: number;
  readonly ry: number;
  readonly from: number;
  readonly to: number;
}

/** A ring drawn by hand around the origin: its end passes its beginning, and it is not quite round. */
export function ringPath({ rx, ry, from, to }: Ring): string {
  const steps = Math.max(4, Math.ceil((to - from) / 20));
  const point = (n: number): Point => {
    const share = n / steps;
    const angle = ((from + (to - from) * share) * Math.PI) / 180;
    const swing = 1.035 - 0.05 * share + 0.012 * Math.sin(angle * 3 + 0.6);
    return { x: Math.cos(angle) * rx * swing, y: Math.sin(angle) * ry * swing };
  };
  let path = '';
  for (let n = 0; n < steps; n++) {
    const [before, start, end, after] = [point(n - 1), point(n), point(n + 1), point(n + 2)];
    if (n === 0) path += `M${at(start.x)} ${at(start.y)}`;
    // Catmull-Rom through the points, written as cubic Bezier curves.
    path +=
      `C${at(start.x + (end.x - before.x) / 6)} ${at(start.y + (end.y - before.y) / 6)} ` +
      `${at(end.x - (after.x - start.x) / 6)} ${at(end.y - (after.y - start.y) / 6)} ${at(end.x)} ${at(end.y)}`;
  }
  return path;
}

/** Half axes of the ring around a chip: beyond its sides, but not onto the labels of its neighbours. */
export function ringAxes({ width, height }: { width: number; height: number }): { rx: number; ry: number } {
  const over = Math.min(width, height) * 0.17 + 2;
  return { rx: width / 2 + over, ry: height / 2 + over };
}

const badgeCorners: readonly Point[] = [
  { x: 1, y: -1 },
  { x: -1, y: -1 },
  { x: 1, y: 1 },
  { x: -1, y: 1 },
];

/** Centre of the rank badge of a chip: the first corner, from the upper right, where it covers none of `keepClear`. */
export function badgePlace(box: Box, radius: number, keepClear: readonly Box[]): Point {
  const corner = ({ x, y }: Point) => ({ x: box.x + (x * box.width) / 2, y: box.y + (y * box.height) / 2 });
  const places = badgeCorners.map(corner);
  return places.find((place) => keepClear.every((box) => distanceToBox(place, box) >= radius)) ?? (places[0] as Point);
}
