import { allLanes, diagnose, faultKinds, type FaultKind, type PossibleFault } from '@/lib';
import { demoProofBoards, generatedProofBoards, type ProofBoard } from './boards';
import { drawShown } from './draw';
import { seededRandom } from './random';
import { naiveScore, scoreAnswer } from './score';
import { hand, optionsFrom, type ProofOptions } from './table';
import { calibrationError, figure, mean, percent, Tally } from './tally';

/** Faults that are proved together: a kind, and with shared parts whether there is more than one chip behind them. */
interface Wanted {
  readonly name: string;
  readonly fits: (board: ProofBoard, fault: PossibleFault) => boolean;
}

/** A shared part behind which there is one chip alone cannot be told from that chip by what fails. */
const oneChip = ({ wiring }: ProofBoard, { part, lanes }: PossibleFault): boolean =>
  part !== 'chip' &&
  part !== 'position' &&
  new Set(lanes.flatMap((lane) => (wiring.portsOfLane.get(lane) ?? []).map((at) => wiring.ports[at]?.position))).size <
    2;

/** Faults of one sort on all boards in turn, evidence that lists every lane. */
function prove(boards: readonly ProofBoard[], { fits }: Wanted, { cases, seed }: ProofOptions): Tally {
  const tally = new Tally();
  const random = seededRandom(seed);
  const able = boards
    .map((board) => ({ board, possible: board.possible.filter((each) => fits(board, each)) }))
    .filter(({ possible }) => possible.length > 0);
  for (let n = 0; n < cases && able.length > 0; n++) {
    const { board, possible } = able[n % able.length]!;
    const drawn = drawShown(board, possible, random);
    if (drawn === null) continue;
    const said = allLanes(board.wiring, drawn.result);
    const answer = diagnose(board.index, [{ changes: [], ...said }]);
    tally.add(scoreAnswer(board.wiring, answer, drawn.from), naiveScore(board.wiring, drawn.result.lanes, drawn.from));
  }
  return tally;
}

const row = (name: string, tally: Tally): string[] => [
  name,
  String(tally.cases),
  percent(tally.first, tally.cases),
  percent(tally.inThree, tally.cases),
  percent(tally.chipFirst, tally.cases),
  mean(tally.pulled, tally.cases),
  percent(tally.naiveFirst, tally.cases),
  mean(tally.naivePulled, tally.cases),
  figure(calibrationError(tally.stated)),
  mean(tally.setSize, tally.cases),
  percent(tally.setHolds, tally.cases),
];

const own: readonly FaultKind[] = faultKinds.slice(0, faultKinds.indexOf('channel of a buffer'));

/** The faults of one part of the proof: those of chips and positions, or those of what they share. */
function wantedIn(half: string | undefined): Wanted[] {
  if (half !== 'own' && half !== 'shared') throw new RangeError('Say own or shared.');
  const kinds = faultKinds.filter((kind) => own.includes(kind) === (half === 'own'));
  const each = kinds.map((kind): Wanted => ({
    name: kind,
    fits: (board, fault) => fault.kind === kind && (kind === 'wiring of one lane' || !oneChip(board, fault)),
  }));
  if (half === 'own') return each;
  return [
    ...each,
    {
      name: 'shared part with one chip behind it',
      fits: (board, fault) => fault.kind !== 'wiring of one lane' && oneChip(board, fault),
    },
    { name: 'any, drawn by the priors', fits: () => true },
  ];
}

const options = optionsFrom(process.env);
const boards = [...demoProofBoards(), ...generatedProofBoards()];
const half = process.argv[2];
const rows = wantedIn(half)
  .filter(({ name }) => options.only === null || name === options.only)
  .map((wanted, at) =>
    row(wanted.name, prove(boards, wanted, { ...options, seed: options.seed * 1000 + at + (half === 'own' ? 0 : 50) })),
  );
hand([
  {
    title: 'One fault, evidence that lists every lane',
    columns: [
      'fault',
      'cases',
      'place or group first',
      'in first three',
      'a chip first',
      'chips pulled before',
      'naive rule first',
      'naive chips pulled',
      'calibration error',
      '95 % set',
      'set holds it',
    ],
    rows,
    notes: [`On ${boards.length} boards in turn: the demo boards and generated ones of 8 to 256 sockets.`],
  },
]);
