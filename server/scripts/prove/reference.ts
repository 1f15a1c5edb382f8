import { allLanes, diagnose, drawEach, priors, SimulatedBench, type PossibleFault, type Random } from '@/lib';
import { demoProofBoards, generatedProofBoards, smallProofBoards, type ProofBoard } from './boards';
import { drawShown, figures } from './draw';
import { entityOf, referencePosterior } from './posterior-reference';
import { seededRandom } from './random';
import { entitiesOf, keysOf, smallestSet, type Entity } from './score';
import { hand, optionsFrom, type ProofOptions } from './table';
import { calibrationError, figure, mean, percent, type Stated } from './tally';

/** Entities that stand within this of the first count as first with it: nothing tells them apart. */
const tie = 1e-6;
const mostFailing = 12;
/** Boards that are ranked without the sum. */
const mostSockets = 72;

/** One way to rank, over many cases. */
class Ranking {
  cases = 0;
  first = 0;
  inThree = 0;
  setHolds = 0;
  setSize = 0;
  setShare = 0;
  readonly stated: Stated[] = [];

  add(ranked: readonly Entity[], truth: ReadonlySet<string>): void {
    this.cases++;
    const best = ranked[0]?.probability ?? 0;
    const tied = ranked.filter(({ probability }) => probability > best - tie);
    // Among equals each is as likely to be looked at first.
    this.first += tied.filter(({ key }) => truth.has(key)).length / Math.max(1, tied.length);
    if (ranked.slice(0, 3).some(({ key }) => truth.has(key))) this.inThree++;
    const set = smallestSet(ranked);
    const total = ranked.reduce((sum, { probability }) => sum + probability, 0);
    this.setSize += set.length;
    this.setShare += ranked.slice(0, set.length).reduce((sum, { probability }) => sum + probability, 0) / total;
    if (set.some((key) => truth.has(key))) this.setHolds++;
    for (const { key, probability } of ranked)
      if (probability >= 0.01) this.stated.push({ probability, right: truth.has(key) });
  }

  row(name: string): string[] {
    const { cases } = this;
    return [
      name,
      String(cases),
      percent(this.first, cases),
      percent(this.inThree, cases),
      figure(calibrationError(this.stated)),
      mean(this.setSize, cases),
      percent(this.setShare, cases),
      percent(this.setHolds, cases),
    ];
  }
}

interface Shown {
  readonly board: ProofBoard;
  readonly there: readonly PossibleFault[];
  readonly result: ReturnType<SimulatedBench['run']>;
}

function single(board: ProofBoard, random: Random): Shown | null {
  const drawn = drawShown(board, board.possible, random);
  return drawn && { board, there: [drawn.from], result: drawn.result };
}

/** Every cause drawn by itself, and lanes that read bad for none, as the model has it. */
function fromModel(board: ProofBoard, random: Random): Shown | null {
  for (let tried = 0; tried < 1000; tried++) {
    const drawn = drawEach(board.possible, priors, random);
    const faults = drawn.map(({ fault }) => fault);
    const result = new SimulatedBench(board.wiring, {
      faults,
      random,
      figures: { ...figures, leak: priors.leak },
    }).run();
    if (result.lanes.length > 0) return { board, there: drawn.map(({ from }) => from), result };
  }
  return null;
}

interface Compared {
  readonly engine: Ranking;
  readonly reference: Ranking;
  /** The greatest distance between two probabilities of one entity. */
  apart: number;
}

/** The engine alone, on boards that are too large to be summed over whole. */
function onLarger({ cases, seed }: ProofOptions): Ranking {
  const boards = [...demoProofBoards(), ...generatedProofBoards()].filter(
    ({ wiring }) => wiring.labels.length <= mostSockets,
  );
  const random = seededRandom(seed * 1000 + 601);
  const ranking = new Ranking();
  for (let n = 0; n < cases; n++) {
    const shown = fromModel(boards[n % boards.length]!, random);
    if (shown === null) continue;
    const { board, there, result } = shown;
    const answer = diagnose(board.index, [{ changes: [], ...allLanes(board.wiring, result) }]);
    ranking.add(entitiesOf(answer), new Set(there.flatMap((fault) => keysOf(board.wiring, answer, fault))));
  }
  return ranking;
}

function compare(draw: typeof single, { cases, seed }: ProofOptions): Compared {
  const boards = smallProofBoards();
  const random = seededRandom(seed * 1000 + 501);
  const compared: Compared = { engine: new Ranking(), reference: new Ranking(), apart: 0 };
  for (let n = 0; n < cases; n++) {
    const shown = draw(boards[n % boards.length]!, random);
    if (shown === null || shown.result.lanes.length > mostFailing) continue;
    const { board, there, result } = shown;
    // The wiring of a lane is no part that an answer could name.
    const expected = referencePosterior(board.possible, priors, {
      lanes: board.wiring.lanes,
      failing: result.lanes,
    }).filter(({ key }) => !key.startsWith('wiring:'));
    compared.reference.add(expected, new Set(there.map(entityOf)));
    const said = allLanes(board.wiring, result);
    const answer = diagnose(board.index, [{ changes: [], ...said }]);
    const ranked = entitiesOf(answer);
    compared.engine.add(ranked, new Set(there.flatMap((fault) => keysOf(board.wiring, answer, fault))));
    const own = new Map(ranked.map(({ key, probability }) => [key, probability]));
    for (const { key, probability } of expected) {
      if (key.startsWith('place:') && own.has(key))
        compared.apart = Math.max(compared.apart, Math.abs(probability - (own.get(key) as number)));
    }
  }
  return compared;
}

const options = optionsFrom(process.env);
const rows = (
  [
    ['one fault drawn by the priors', single],
    ['any number of faults, each drawn by its prior', fromModel],
  ] as const
).map(([name, draw]) => ({ name, ...compare(draw, { ...options, cases: options.cases * 2 }) }));
hand([
  {
    title: 'Beside brute-force Bayes under the same model',
    columns: [
      'who, on what',
      'cases',
      'place first',
      'in first three',
      'calibration error, all places and parts',
      '95 % set',
      'probability in the set',
      'set holds it',
    ],
    rows: [
      ...rows.flatMap(({ name, engine, reference }) => [
        engine.row(`Rowcall, ${name}`),
        reference.row(`sum over every combination, ${name}`),
      ]),
      onLarger(options).row('Rowcall, any number of faults, on the other boards of up to 72 sockets'),
    ],
    notes: [
      `Greatest distance between a probability of a place and that of the sum: ${rows.map(({ apart }) => apart.toExponential(1)).join(' and ')}. The sum is over small boards, of 2 to 12 sockets. Where several are equally likely, one of them is looked at first by chance.`,
    ],
  },
]);
