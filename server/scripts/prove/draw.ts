import {
  chipFaults,
  drawFault,
  priors,
  SimulatedBench,
  type BenchFigures,
  type BoardFault,
  type PossibleFault,
  type Random,
  type TestResult,
} from '@/lib';
import type { ProofBoard } from './boards';

/** A fault that the test of the board shows. */
export interface DrawnCase {
  readonly board: ProofBoard;
  readonly from: PossibleFault;
  readonly fault: BoardFault;
  readonly bench: SimulatedBench;
  readonly result: TestResult;
}

/** What shows and what handling does, as the priors say, with no lane that reads bad for no cause. */
export const figures: BenchFigures = { ...priors, leak: 0 };

/** A fault on a board that the first pass shows; null where none was found in a hundred tries. */
export function drawShown(board: ProofBoard, possible: readonly PossibleFault[], random: Random): DrawnCase | null {
  for (let tried = 0; tried < 100; tried++) {
    const drawn = drawFault(possible, priors, random);
    if (drawn === null) return null;
    const spare = (chip: string, socket: string) => faultsOfSpare(board, { chip, socket }, random);
    const bench = new SimulatedBench(board.wiring, { faults: [drawn.fault], random, figures, spare });
    const result = bench.run();
    if (result.lanes.length > 0) return { board, ...drawn, bench, result };
  }
  return null;
}

/** A spare that is thought to be good keeps a share of the priors of a chip. */
const faultsOfSpare = ({ wiring }: ProofBoard, at: { chip: string; socket: string }, random: Random): BoardFault[] =>
  chipFaults(wiring, priors, at).flatMap((fault) =>
    random() < fault.prior * priors.knownGoodShare ? [fault.draw(random, random() < priors.intermittentShare)] : [],
  );
