/** A span of columns or of lines, both ends included, that can come again at a fixed distance. */
export interface Extent {
  readonly from: number;
  readonly to: number;
  /** From one start of the span to the next. Left out: the span is there once. */
  readonly every?: number | undefined;
  /** The last place that a repeat reaches. Left out: up to the edge. */
  readonly until?: number | undefined;
}

/** True where an extent covers a place. */
export function covers({ from, to, every, until }: Extent, at: number): boolean {
  if (at < from) return false;
  if (every === undefined) return at <= to;
  return (until === undefined || at <= until) && (at - from) % every <= to - from;
}

/** The places below `size` that an extent covers, ascending. */
export function placesOf(extent: Extent, size: number): number[] {
  const { from, to, every, until = size - 1 } = extent;
  const last = Math.min(every === undefined ? to : until, size - 1);
  const found: number[] = [];
  for (let at = from; at <= last; at++) if (covers(extent, at)) found.push(at);
  return found;
}

/** The fewest extents, taken from the start, that cover these places and no other. `places` ascending, each once. */
export function extentsOf(places: readonly number[], size: number): Extent[] {
  const runs = runsOf(places);
  const found: Extent[] = [];
  for (let at = 0; at < runs.length;) {
    const [from, to] = runs[at]!;
    const next = runs[at + 1];
    const every = next === undefined ? 0 : next[0] - from;
    let end = at + 1;
    while (end < runs.length && follows(runs, { at, end, every, size })) end++;
    if (end - at < 3) {
      found.push({ from, to });
      at++;
      continue;
    }
    const until = runs[end - 1]![1];
    const goesOn = runs[end - 1]![0] + every < size;
    found.push({ from, to, every, ...(goesOn ? { until } : {}) });
    at = end;
  }
  return found;
}

type Run = readonly [from: number, to: number];

function runsOf(places: readonly number[]): Run[] {
  const runs: [number, number][] = [];
  for (const place of places) {
    const last = runs[runs.length - 1];
    if (last !== undefined && last[1] === place - 1) last[1] = place;
    else runs.push([place, place]);
  }
  return runs;
}

/** True where a run is the next repeat of the first one; the edge may cut it short. */
function follows(runs: readonly Run[], of: { at: number; end: number; every: number; size: number }): boolean {
  const [from, to] = runs[of.end]!;
  const first = runs[of.at]!;
  if (from !== first[0] + of.every * (of.end - of.at)) return false;
  return to - from === first[1] - first[0] || (to === of.size - 1 && to - from < first[1] - first[0]);
}
