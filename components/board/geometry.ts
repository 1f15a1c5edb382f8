/** Quarter turns clockwise. */
export type Turn = 0 | 1 | 2 | 3;

/** A place, or a direction, on the sketch: x to the right, y downwards. */
export interface Point {
  readonly x: number;
  readonly y: number;
}

/** An upright rectangle by its centre. */
export interface Box extends Point {
  readonly width: number;
  readonly height: number;
}

/** How something is laid down: first mirrored left to right, or not, then turned clockwise. */
export interface Orientation {
  readonly turn: Turn;
  readonly mirrored: boolean;
}

/** An edge of the board. */
export type Edge = 'top' | 'right' | 'bottom' | 'left';

/** The edges in clockwise order. */
export const edges: readonly Edge[] = ['top', 'right', 'bottom', 'left'];

/** A number of quarter turns, of either sign, as 0 to 3. */
export function asTurn(quarters: number): Turn {
  return (((quarters % 4) + 4) % 4) as Turn;
}

/** Where a point goes when the plane is mirrored and turned about the origin. */
export function orient({ turn, mirrored }: Orientation, { x, y }: Point): Point {
  const sx = mirrored ? -x : x;
  // Adding 0 makes a negative zero an ordinary one.
  if (turn === 0) return { x: sx + 0, y: y + 0 };
  if (turn === 1) return { x: -y + 0, y: sx + 0 };
  if (turn === 2) return { x: -sx + 0, y: -y + 0 };
  return { x: y + 0, y: -sx + 0 };
}

/** A box after the plane is mirrored and turned: it stays upright, its sides may change places. */
export function orientBox(by: Orientation, box: Box): Box {
  const upright = by.turn % 2 === 0;
  return {
    ...orient(by, box),
    width: upright ? box.width : box.height,
    height: upright ? box.height : box.width,
  };
}

/** The one orientation that does what two do after each other. */
export function compose(first: Orientation, second: Orientation): Orientation {
  // A mirror behind a turn makes it run the other way.
  const quarters = second.turn + (second.mirrored ? -first.turn : first.turn);
  return { turn: asTurn(quarters), mirrored: first.mirrored !== second.mirrored };
}

/** Which edge of the view an edge of the board lies at. */
export function orientEdge({ turn, mirrored }: Orientation, edge: Edge): Edge {
  const at = edges.indexOf(edge);
  const flipped = mirrored && at % 2 === 1 ? (at + 2) % 4 : at;
  return edges[(flipped + turn) % 4] as Edge;
}

/** The smallest box around boxes; an empty one at the origin where there are none. */
export function boundsOf(boxes: readonly Box[]): Box {
  if (boxes.length === 0) return { x: 0, y: 0, width: 0, height: 0 };
  let [left, top, right, bottom] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { x, y, width, height } of boxes) {
    left = Math.min(left, x - width / 2);
    right = Math.max(right, x + width / 2);
    top = Math.min(top, y - height / 2);
    bottom = Math.max(bottom, y + height / 2);
  }
  return { x: (left + right) / 2, y: (top + bottom) / 2, width: right - left, height: bottom - top };
}

/** Distance from a point to the nearest point of a box; 0 inside it. */
export function distanceToBox(point: Point, box: Box): number {
  const dx = Math.max(0, Math.abs(point.x - box.x) - box.width / 2);
  const dy = Math.max(0, Math.abs(point.y - box.y) - box.height / 2);
  return Math.hypot(dx, dy);
}

/** The middle value; 0 of nothing. */
export function medianOf(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? 0;
}
