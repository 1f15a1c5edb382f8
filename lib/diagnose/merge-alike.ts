import type { HiddenState, HiddenVariable, NoisyOrModel } from './noisy-or';

/**
 * Variables that touch the same positives with the same chances to miss become one, whose states are counts:
 * sixty-four chips that could each hold the same strobe, the decoder and the supply then cost as much as one.
 */
export interface MergedModel {
  readonly model: NoisyOrModel;
  /** Posteriors of the merged variables back to those of the single ones. */
  readonly unmerge: (marginals: readonly Float64Array[]) => Float64Array[];
}

/** How many members of a set are in the first state and in the second: weights by [first][second]. */
type Counts = number[][];

/** Members that have the same weights too, so that they share what their kind gets. */
interface Kind {
  readonly members: number[];
  readonly single: HiddenVariable;
  counts: Counts;
}

/** Counts whose weight is below this share of the whole are left out: less than a double can tell. */
const negligible = 1e-17;
/** No more than this many members at once are counted. */
const most = 12;

/** Takes variables together that the positives cannot tell apart. Exact up to the last digits of a double. */
export function mergeAlike(model: NoisyOrModel): MergedModel {
  const groups = new Map<string, number[]>();
  // Causes of one kind mostly share one list of positives, so the key of a list is worked out once.
  const keys = new Map<readonly number[], string>();
  const keyOf = (touches: readonly number[]) => {
    const before = keys.get(touches);
    if (before !== undefined) return before;
    const key = touches.join(' ');
    keys.set(touches, key);
    return key;
  };
  model.variables.forEach((variable, v) => {
    const key = alikeKey(variable, keyOf) ?? `only ${v}`;
    const group = groups.get(key);
    if (group) group.push(v);
    else groups.set(key, [v]);
  });
  const variables: HiddenVariable[] = [];
  const back: ((own: Float64Array, single: Float64Array[]) => void)[] = [];
  for (const members of groups.values()) {
    if (members.length === 1) {
      const v = members[0] as number;
      variables.push(model.variables[v] as HiddenVariable);
      back.push((own, single) => void (single[v] = own));
    } else {
      const merged = takeTogether(model, members);
      variables.push(merged.variable);
      back.push(merged.back);
    }
  }
  return {
    model: { ...model, variables },
    unmerge: (marginals) => {
      const single: Float64Array[] = model.variables.map((variable) => new Float64Array(variable.states.length));
      back.forEach((each, m) => each(marginals[m] as Float64Array, single));
      return single;
    },
  };
}

function alikeKey(variable: HiddenVariable, keyOf: (touches: readonly number[]) => string): string | null {
  const [first, second] = variable.states;
  if (!first || first.touches.length === 0 || variable.states.length > 2) return null;
  const touches = keyOf(first.touches);
  if (second && keyOf(second.touches) !== touches) return null;
  return `${touches}|${first.miss}|${second?.miss ?? ''}`;
}

function takeTogether(model: NoisyOrModel, members: readonly number[]) {
  const kinds = new Map<string, Kind>();
  for (const v of members) {
    const single = model.variables[v] as HiddenVariable;
    const key = `${single.absent} ${single.states.map((state) => state.weight).join(' ')}`;
    const kind = kinds.get(key);
    if (kind) kind.members.push(v);
    else kinds.set(key, { members: [v], single, counts: [] });
  }
  const list = [...kinds.values()];
  for (const kind of list) kind.counts = countsOf(kind.single, kind.members.length);
  const all = list.reduce<Counts>((sum, kind) => convolve(sum, kind.counts), [[1]]);

  const [first, second] = (model.variables[members[0] as number] as HiddenVariable).states as [
    HiddenState,
    HiddenState?,
  ];
  const states: HiddenState[] = [];
  const at: [number, number][] = [];
  let total = 0;
  for (const row of all) for (const weight of row) total += weight;
  all.forEach((row, a) =>
    row.forEach((weight, b) => {
      if (a + b === 0 || !(weight > total * negligible)) return;
      states.push({ weight, touches: first.touches, miss: first.miss ** a * (second?.miss ?? 1) ** b });
      at.push([a, b]);
    }),
  );
  const expected = list.map((kind) => expectedCounts(kind, list, all));
  const back = (own: Float64Array, single: Float64Array[]): void => {
    list.forEach((kind, k) => {
      let inFirst = 0;
      let inSecond = 0;
      at.forEach(([a, b], s) => {
        const [ea, eb] = expected[k]?.(a, b) ?? [0, 0];
        inFirst += (own[s] as number) * ea;
        inSecond += (own[s] as number) * eb;
      });
      for (const v of kind.members) {
        single[v] = Float64Array.from(
          second || kind.single.states.length > 1 ? [inFirst, inSecond] : [inFirst],
          (p) => p / kind.members.length,
        );
      }
    });
  };
  return { variable: { absent: (all[0] as number[])[0] as number, states }, back };
}

/** Weights of every count of members of one kind in the two states. */
function countsOf(single: HiddenVariable, members: number): Counts {
  const first = single.states[0]?.weight ?? 0;
  const second = single.states[1]?.weight ?? 0;
  const counts: Counts = [];
  let cap = 1;
  // The chance of more than `cap` members at once falls fast for rare causes.
  for (let tail = members * (first + second); cap < Math.min(members, most) && tail > negligible; cap++) {
    tail *= ((members - cap) * (first + second)) / (cap + 1);
  }
  for (let a = 0; a <= cap; a++) {
    const row: number[] = [];
    for (let b = 0; a + b <= cap; b++) {
      row.push(
        choose(members, a + b) * choose(a + b, b) * first ** a * second ** b * single.absent ** (members - a - b),
      );
    }
    counts.push(row);
  }
  return counts;
}

function choose(n: number, k: number): number {
  let product = 1;
  for (let i = 1; i <= k; i++) product = (product * (n - k + i)) / i;
  return product;
}

function convolve(x: Counts, y: Counts): Counts {
  const cap = Math.min(most, x.length + y.length - 2);
  const sum: Counts = Array.from({ length: cap + 1 }, (_, a) => new Array<number>(cap + 1 - a).fill(0));
  x.forEach((xr, a) =>
    xr.forEach((xv, b) => {
      if (xv === 0) return;
      y.forEach((yr, c) => {
        const row = sum[a + c];
        if (row) yr.forEach((yv, d) => void (b + d < row.length && (row[b + d] = (row[b + d] as number) + xv * yv)));
      });
    }),
  );
  return sum;
}

/** How many members of a kind are in each state, on average, where so many of all kinds together are. */
function expectedCounts(kind: Kind, list: readonly Kind[], all: Counts): (a: number, b: number) => [number, number] {
  const others = list.reduce<Counts>((sum, each) => (each === kind ? sum : convolve(sum, each.counts)), [[1]]);
  return (a, b) => {
    let inFirst = 0;
    let inSecond = 0;
    kind.counts.forEach((row, c) =>
      row.forEach((weight, d) => {
        const rest = others[a - c]?.[b - d];
        if (rest === undefined) return;
        inFirst += weight * rest * c;
        inSecond += weight * rest * d;
      }),
    );
    const total = all[a]?.[b] ?? 0;
    return total > 0 ? [inFirst / total, inSecond / total] : [0, 0];
  };
}
