import type { HiddenVariable, NoisyOrModel } from './noisy-or';

/** Several variables that cannot be told apart, taken together: a state of the whole is a count of each state. */
interface Merged {
  readonly members: readonly number[];
  /** For each state of the merged variable, how many members are in each state of a single one. */
  readonly counts: readonly (readonly number[])[];
}

export interface MergedModel {
  readonly model: NoisyOrModel;
  /** Posteriors of the merged variables back to those of the single ones. */
  readonly unmerge: (marginals: readonly Float64Array[]) => Float64Array[];
}

/** Counts of which all together are less likely than this are left out. */
const negligible = 1e-16;

/**
 * Variables that touch the same positives in all their states, with equal weights, become one variable.
 * Sixty-four chips that could each hold the same strobe then cost as much as one.
 */
export function mergeAlike(model: NoisyOrModel): MergedModel {
  const groups = new Map<string, number[]>();
  model.variables.forEach((variable, v) => {
    const key = alikeKey(variable) ?? `only ${v}`;
    const group = groups.get(key);
    if (group) group.push(v);
    else groups.set(key, [v]);
  });
  const variables: HiddenVariable[] = [];
  const merged: Merged[] = [];
  for (const members of groups.values()) {
    const single = model.variables[members[0] as number] as HiddenVariable;
    if (members.length === 1) {
      variables.push(single);
      merged.push({ members, counts: single.states.map((_, s) => single.states.map((__, t) => (s === t ? 1 : 0))) });
      continue;
    }
    const together = takeTogether(single, members.length);
    variables.push(together.variable);
    merged.push({ members, counts: together.counts });
  }
  const unmerge = (marginals: readonly Float64Array[]) => {
    const single: Float64Array[] = model.variables.map((variable) => new Float64Array(variable.states.length));
    merged.forEach(({ members, counts }, m) => {
      const own = marginals[m] as Float64Array;
      for (const member of members) {
        const into = single[member] as Float64Array;
        counts.forEach((count, s) =>
          count.forEach((n, t) => {
            into[t] = (into[t] as number) + ((own[s] as number) * n) / members.length;
          }),
        );
      }
    });
    return single;
  };
  return { model: { ...model, variables }, unmerge };
}

function alikeKey(variable: HiddenVariable): string | null {
  const [first] = variable.states;
  if (!first || first.touches.length === 0 || variable.states.length > 2) return null;
  const touches = first.touches.join(' ');
  if (variable.states.some((state) => state.touches.join(' ') !== touches)) return null;
  return `${touches}|${variable.absent}|${variable.states.map((state) => `${state.weight}*${state.miss}`).join('|')}`;
}

function takeTogether(single: HiddenVariable, members: number): { variable: HiddenVariable; counts: number[][] } {
  const weights = single.states.map((state) => state.weight);
  const sum = weights.reduce((a, b) => a + b, 0);
  const counts: number[][] = [];
  const states: HiddenVariable['states'][number][] = [];
  const absent = single.absent ** members;
  let choose = 1;
  for (let n = 1; n <= members; n++) {
    choose = (choose * (members - n + 1)) / n;
    const ofSize = choose * sum ** n * single.absent ** (members - n);
    if (n > 1 && ofSize < negligible * (absent + ofSize)) break;
    // How n members in some state divide between the first state and the second.
    let divide = 1;
    for (let b = 0; b <= (weights.length > 1 ? n : 0); b++) {
      if (b > 0) divide = (divide * (n - b + 1)) / b;
      const a = n - b;
      const weight =
        choose * divide * (weights[0] as number) ** a * (weights[1] ?? 0) ** b * single.absent ** (members - n);
      if (!(weight > 0)) continue;
      states.push({
        weight,
        touches: (single.states[0] as HiddenVariable['states'][number]).touches,
        miss: (single.states[0]?.miss ?? 1) ** a * (single.states[1]?.miss ?? 1) ** b,
      });
      counts.push(weights.length > 1 ? [a, b] : [a]);
    }
  }
  return { variable: { absent, states }, counts };
}
