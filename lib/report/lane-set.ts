/** A set of lanes as a byte each; made for unions and intersections over a whole board. */
export interface LaneSet {
  readonly has: Uint8Array;
  /** A code that goes so may also be one that names no lane, such as memory that is not on the board. */
  readonly speaks: boolean;
}

/** Lanes that both name; null names all. */
export function intersection(a: LaneSet | null, b: LaneSet | null): LaneSet | null {
  if (a === null || b === null) return a ?? b;
  const speaks = (a.speaks && isAlive(b)) || (b.speaks && isAlive(a));
  return { has: a.has.map((value, at) => value & b.has[at]!), speaks };
}

/** True where something is left that a code can mean. */
export function isAlive(set: LaneSet): boolean {
  return set.speaks || set.has.includes(1);
}
