import {
  buildLayoutIndex,
  possibleFaults,
  priors,
  wiringOf,
  type LayoutIndex,
  type PossibleFault,
  type Wiring,
} from '@/lib';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument, type LayoutDocument } from '@/shared';
import { generateBoard, generatedSizes, nameOf, smallSizes } from './generated';

/** A board made ready for many faults. */
export interface ProofBoard {
  readonly name: string;
  readonly index: LayoutIndex;
  readonly wiring: Wiring;
  readonly possible: readonly PossibleFault[];
}

const ready = (name: string, document: LayoutDocument): ProofBoard => {
  const wiring = wiringOf(document);
  return { name, index: buildLayoutIndex(document), wiring, possible: possibleFaults(wiring, priors) };
};

/** The demo boards. */
export const demoProofBoards = (): ProofBoard[] =>
  demoBoards.map(({ slug, document }) => ready(slug, layoutDocument.parse(document)));

/** Generated boards of 8 to 256 sockets. */
export const generatedProofBoards = (): ProofBoard[] =>
  generatedSizes.map((size) => ready(nameOf(size), generateBoard(size)));

/** Boards small enough to be summed over whole. */
export const smallProofBoards = (): ProofBoard[] => smallSizes.map((size) => ready(nameOf(size), generateBoard(size)));
