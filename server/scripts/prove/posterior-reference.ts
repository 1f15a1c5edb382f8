import type { PossibleFault } from '@/lib';
import type { Entity } from './score';

/** How often a fault shows on a lane of its own, how often it comes and goes, how often a lane reads bad for no cause. */
export interface ReferenceFigures {
  readonly intermittentShare: number;
  readonly detectionHard: number;
  readonly detectionIntermittent: number;
  readonly leak: number;
}

type Weights = Float64Array<ArrayBuffer>;

/** What one pass showed: every lane of the board failed or passed. */
interface Seen {
  readonly lanes: readonly number[];
  readonly failing: readonly number[];
}

/** The place or part that a possible fault belongs to, whatever the mode. */
export const entityOf = ({ socket, sharedPart, part, lanes }: PossibleFault): string =>
  socket !== null ? `place:${socket}` : sharedPart !== null ? `shared:${sharedPart}` : `${part}:${lanes.join(' ')}`;

/**
 * The probability that each place or part has failed, summed over every combination of faults: the noisy-OR model of the
 * documented priors worked out a second time. Weights run over the sets of failing lanes that are explained so far, from
 * the front and from the back of the list of causes; an entity is left out by joining the two halves around it. Its cost
 * grows with 2 to the power of the failing lanes: a RangeError from 15 of them on.
 */
export function referencePosterior(
  possible: readonly PossibleFault[],
  figures: ReferenceFigures,
  { lanes, failing }: Seen,
): Entity[] {
  if (failing.length > 14) throw new RangeError('Too many failing lanes to sum over.');
  const place = new Map(failing.map((lane, at) => [lane, at]));
  const all = 2 ** failing.length - 1;
  const names = [...new Set(possible.map(entityOf))];
  const groups = names.map((name) => possible.filter((each) => entityOf(each) === name));
  const step = (weights: Weights, group: readonly PossibleFault[]): Weights =>
    group.reduce<Weights>((before, fault) => withFault(before, fault, { figures, place }), weights);
  const start: Weights = new Float64Array(all + 1);
  start[0] = lanes.reduce((product, lane) => (place.has(lane) ? product : product * (1 - figures.leak)), 1);
  const leaks = failing.reduce<Weights>((before, _, at) => hit(before, at, figures.leak), start);
  const fronts: Weights[] = [leaks];
  for (const group of groups) fronts.push(step(fronts[fronts.length - 1]!, group));
  const none: Weights = new Float64Array(all + 1);
  none[0] = 1;
  let back: Weights = none;
  const total = fronts[groups.length]![all]!;
  const found: Entity[] = [];
  for (let g = groups.length - 1; g >= 0; g--) {
    const absent = groups[g]!.reduce((product, { prior }) => product * (1 - prior), 1);
    const without = absent * joined(fronts[g]!, back, all);
    found.push({ key: names[g]!, probability: Math.max(0, 1 - without / total) });
    back = step(back, groups[g]!);
  }
  return found.sort((a, b) => b.probability - a.probability);
}

interface Given {
  readonly figures: ReferenceFigures;
  readonly place: ReadonlyMap<number, number>;
}

/** The weights after a possible fault: it is absent, always there, or coming and going. */
function withFault(before: Weights, { prior, lanes }: PossibleFault, { figures, place }: Given): Weights {
  const after = before.map((weight) => weight * (1 - prior));
  const kinds = [
    { share: 1 - figures.intermittentShare, shows: figures.detectionHard },
    { share: figures.intermittentShare, shows: figures.detectionIntermittent },
  ];
  for (const { share, shows } of kinds) {
    let weights: Weights = before.map((weight) => weight * prior * share);
    for (const lane of lanes) {
      const at = place.get(lane);
      if (at === undefined) weights = weights.map((weight) => weight * (1 - shows));
      else weights = hit(weights, at, shows);
    }
    weights.forEach((weight, set) => {
      after[set]! += weight;
    });
  }
  return after;
}

/** A failing lane is explained with a chance, where it was not before. */
function hit(weights: Weights, at: number, chance: number): Weights {
  const after = new Float64Array(weights.length);
  weights.forEach((weight, set) => {
    if (set & (1 << at)) after[set]! += weight;
    else {
      after[set]! += weight * (1 - chance);
      after[set | (1 << at)]! += weight * chance;
    }
  });
  return after;
}

/** The weight of explaining all failing lanes between two halves of the list. */
function joined(front: Weights, back: Weights, all: number): number {
  const over = back.slice();
  for (let bit = 1; bit <= all; bit <<= 1) {
    for (let set = 0; set <= all; set++) if (!(set & bit)) over[set]! += over[set | bit]!;
  }
  return front.reduce((sum, weight, set) => sum + weight * over[all ^ set]!, 0);
}
