import { allLanes, diagnose, faultKinds, type FaultKind } from '@/lib';
import { demoProofBoards, generatedProofBoards, type ProofBoard } from './boards';
import { drawShown } from './draw';
import { seededRandom } from './random';
import { naiveScore, scoreAnswer } from './score';
import { hand, optionsFrom, type ProofOptions } from './table';
import { calibrationError, figure, mean, percent, Tally } from './tally';

/** One kind of single fault on all boards in turn, evidence that lists every lane. */
function proveKind(boards: readonly ProofBoard[], kind: FaultKind | null, { cases, seed }: ProofOptions): Tally {
  const tally = new Tally();
  const random = seededRandom(seed * 1000 + faultKinds.indexOf(kind as FaultKind) + 2);
  const able = boards
    .map((board) => ({ board, possible: board.possible.filter((each) => kind === null || each.kind === kind) }))
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

const options = optionsFrom(process.env);
const boards = [...demoProofBoards(), ...generatedProofBoards()];
const kinds = faultKinds.filter((kind) => options.only === null || kind === options.only);
const rows = kinds.map((kind) => row(kind, proveKind(boards, kind, options)));
const drawn =
  options.only === null
    ? [row('any, drawn by the priors', proveKind(boards, null, { ...options, cases: options.cases * 2 }))]
    : [];
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
    rows: [...rows, ...drawn],
    notes: [`On ${boards.length} boards in turn: the demo boards and generated ones of 8 to 256 sockets.`],
  },
]);
