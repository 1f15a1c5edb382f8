import { allLanes, diagnose, drawFault, priors, SimulatedBench, type BenchFigures } from '@/lib';
import type { ProofBoard } from './boards';
import { seededRandom } from './random';
import { entitiesOf } from './score';
import type { ProofTable } from './table';
import { percent } from './tally';

/** Two chips or positions at once, each dead for its own lanes and always there: are both places in the first three? */
export function drawPairs(
  boards: readonly ProofBoard[],
  { cases, seed, figures }: { cases: number; seed: number; figures: BenchFigures },
): ProofTable {
  const random = seededRandom(seed * 1000 + 901);
  let [tried, both, firstTwo, neither] = [0, 0, 0, 0];
  for (let n = 0; n < cases; n++) {
    const board = boards[n % boards.length]!;
    const possible = board.possible.filter(({ kind }) => kind === 'chip dead' || kind === 'position open');
    const [one, other] = [drawFault(possible, priors, random), drawFault(possible, priors, random)];
    if (one === null || other === null || one.from.socket === other.from.socket) continue;
    const faults = [one.fault, other.fault].map((fault) => ({ ...fault, intermittent: false }));
    const bench = new SimulatedBench(board.wiring, { faults, random, figures: { ...figures, detectionHard: 1 } });
    const said = allLanes(board.wiring, bench.run());
    const ranked = entitiesOf(diagnose(board.index, [{ changes: [], ...said }]));
    const ranks = [one, other].map(({ from }) => ranked.findIndex(({ key }) => key === `place:${from.socket}`));
    tried++;
    if (ranks.every((rank) => rank >= 0 && rank < 3)) both++;
    if (ranks.every((rank) => rank >= 0 && rank < 2)) firstTwo++;
    if (ranks.every((rank) => rank < 0 || rank >= 3)) neither++;
  }
  return {
    title: 'Two dead chips or open positions at once, evidence that lists every lane',
    columns: ['cases', 'both in first three', 'both in first two', 'neither in first three'],
    rows: [[String(tried), percent(both, tried), percent(firstTwo, tried), percent(neither, tried)]],
  };
}
