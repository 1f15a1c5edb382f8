import { distanceToBox, type Box, type Point } from './geometry';

/** Sizes on a chip as shares of its short side: radius of the notch, inset of the dot of pin 1, inset and size of the tick. */
export const shares = {
  corner: 0.05,
  notch: 0.13,
  pin1: 0.16,
  tickInset: 0.2,
  tick: 0.3,
  smallTickInset: 0.12,
  smallTick: 0.2,
} as const;

const at = (n: number) => Number(n.toFixed(2));

/** Outline of a chip of a size in px, its corners rounded, around the origin. */
export function bodyPath({ width, height }: { width: number; height: number }): string {
  const r = Math.min(width, height) * shares.corner;
  const [x, y] = [width / 2, height / 2];
  const arc = (dx: number, dy: number) => `a${at(r)} ${at(r)} 0 0 1 ${at(dx)} ${at(dy)}`;
  return (
    `M${at(-x + r)} ${at(-y)}H${at(x - r)}${arc(r, r)}V${at(y - r)}${arc(-r, r)}` +
    `H${at(-x + r)}${arc(-r, -r)}V${at(-y + r)}${arc(r, -r)}Z`
  );
}

/** The notch: a half circle at the middle of the side where pin 1 is. */
export function notchPath({ width, height }: { width: number; height: number }, side: Point): string {
  const r = Math.min(width, height) * shares.notch;
  const middle = { x: (side.x * width) / 2, y: (side.y * height) / 2 };
  // Along the side, clockwise, so that the half circle bulges inwards.
  const along = { x: -side.y, y: side.x };
  return `M${at(middle.x - along.x * r)} ${at(middle.y - along.y * r)}A${at(r)} ${at(r)} 0 0 0 ${at(middle.x + along.x * r)} ${at(middle.y + along.y * r)}`;
}

/** Centre of the dot of pin 1, just inside its corner. */
export function pin1Place({ width, height }: { width: number; height: number }, corner: Point): Point {
  const inset = Math.min(width, height) * shares.pin1;
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

/** A small tick, `size` px wide, around its centre. */
export function tickPath(size: number, { x, y }: Point): string {
  return `M${at(x - size * 0.5)} ${at(y)}l${at(size * 0.36)} ${at(size * 0.36)}l${at(size * 0.64)} ${at(-size * 0.76)}`;
}

/**
 * Centre of the tick: the lower right corner, or the lower left where pin 1 is there. Above a caption it moves to the
 * upper corner that pin 1 leaves free.
 */
export function tickPlace(
  { width, height }: { width: number; height: number },
  { pin1, overCaption }: { pin1: Point; overCaption: boolean },
): Point {
  const inset = Math.min(width, height) * (overCaption ? shares.smallTickInset : shares.tickInset);
  const y = overCaption ? -1 : 1;
  const x = pin1.y === y && pin1.x === 1 ? -1 : 1;
  return { x: x * (width / 2 - inset), y: y * (height / 2 - inset) };
}

/** How far a ring passes the sides of its chip, px: a share of the chip, but not onto what lies beside it. */
function ringOverhang({ width, height }: { width: number; height: number }): number {
  return Math.min(10, Math.min(width, height) * 0.13 + 2);
}

/** The part of a ring that is drawn, in degrees clockwise from the right. */
interface Arc {
  readonly from: number;
  readonly to: number;
}

/** A ring drawn by hand around a chip at the origin: its end passes its beginning, and it is not quite round. */
export function ringPath(chip: { width: number; height: number }, { from, to }: Arc): string {
  const steps = Math.max(4, Math.ceil((to - from) / 20));
  const overhang = ringOverhang(chip);
  const point = (n: number): Point => {
    const share = n / steps;
    const angle = ((from + (to - from) * share) * Math.PI) / 180;
    // It starts wide and closes in; the wave is the unsteady hand.
    const over = overhang * (1.2 - 0.55 * share + 0.12 * Math.sin(angle * 3 + 0.6));
    return { x: Math.cos(angle) * (chip.width / 2 + over), y: Math.sin(angle) * (chip.height / 2 + over) };
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

const badgeCorners: readonly Point[] = [
  { x: 1, y: -1 },
  { x: -1, y: -1 },
  { x: 1, y: 1 },
  { x: -1, y: 1 },
];

/** A round badge of a rank. */
export interface BadgePlace extends Point {
  readonly radius: number;
}

/**
 * Where the rank badge of a chip or part goes, px: at the first corner, from the upper right, where it covers none of
 * `keepClear`; where every corner does, a little further out, then smaller. The upper right where nothing helps.
 */
export function badgePlace(box: Box, radii: readonly number[], keepClear: readonly Box[]): BadgePlace {
  const places = radii.flatMap((radius) =>
    [0, 0.2, 0.4].flatMap((out) =>
      badgeCorners.map(({ x, y }) => ({
        x: box.x + x * (box.width / 2 + out * radius),
        y: box.y + y * (box.height / 2 + out * radius),
        radius,
      })),
    ),
  );
  const far = box.width + box.height + 4 * Math.max(...radii);
  const near = keepClear.filter((letters) => distanceToBox(box, letters) <= far);
  const clear = places.find((place) => near.every((letters) => distanceToBox(place, letters) >= place.radius));
  return clear ?? (places[0] as BadgePlace);
}
