import { allLanes, diagnose, firstLane, inFormat, simulatedReadings, type TestResult } from '@/lib';
import type { Run } from '@/shared';
import { demoProofBoards, generatedProofBoards, type ProofBoard } from './boards';
import { drawShown, figures } from './draw';
import { seededRandom } from './random';
import { naiveScore, scoreAnswer } from './score';
import { hand, optionsFrom } from './table';
import { calibrationError, figure, mean, percent, Tally } from './tally';
import { drawPairs } from './pairs';

/** How a pass becomes evidence; null where the board has no such report. */
type Report = (board: ProofBoard, result: TestResult) => Omit<Run, 'changes'> | null;

const wordsUpTo = 4096;

const byFormat =
  (wanted: 'stops' | 'lists-lanes' | 'lists-banks', withAddress: boolean | null): Report =>
  ({ wiring, index }, result) => {
    const format = index.document.reportFormats.find(
      ({ after, parts }) =>
        after === wanted &&
        (withAddress === null || parts.some((part) => 'field' in part && part.field === 'address') === withAddress),
    );
    return format ? inFormat(wiring, format, result) : null;
  };

/** Readings tell how many words of a chip fail: only boards whose chips are simulated whole give them. */
const asReadings: Report = ({ wiring }, result) =>
  Math.max(...wiring.addressBits) <= 8 && result.words.length <= wordsUpTo ? simulatedReadings(wiring, result) : null;

const reports: readonly (readonly [string, Report])[] = [
  ['every lane', ({ wiring }, result) => allLanes(wiring, result)],
  ['first lane only', ({ wiring }, result) => firstLane(wiring, result)],
  ['text, stops at the first', byFormat('stops', null)],
  ['text, each lane', byFormat('lists-lanes', false)],
  ['text, each bank with a mask', byFormat('lists-banks', null)],
  ['text, each word with its address', byFormat('lists-lanes', true)],
  ['readings of every failing word', asReadings],
];

const options = optionsFrom(process.env);
const boards = [...demoProofBoards(), ...generatedProofBoards()];
const cases = Math.max(1, Math.floor(options.cases / 2));
const rows = reports.map(([name, report], at) => {
  const random = seededRandom(options.seed * 1000 + 801 + at);
  const tally = new Tally();
  for (let n = 0, tried = 0; n < cases && tried < cases * 20; tried++) {
    const board = boards[tried % boards.length]!;
    const drawn = drawShown(board, board.possible, random);
    const said = drawn && report(board, drawn.result);
    if (!drawn || !said || said.evidence.length === 0) continue;
    n++;
    const answer = diagnose(board.index, [{ changes: [], ...said }]);
    tally.add(scoreAnswer(board.wiring, answer, drawn.from), naiveScore(board.wiring, drawn.result.lanes, drawn.from));
  }
  return [
    name,
    String(tally.cases),
    percent(tally.first, tally.cases),
    percent(tally.inThree, tally.cases),
    mean(tally.pulled, tally.cases),
    percent(tally.naiveFirst, tally.cases),
    figure(calibrationError(tally.stated)),
    mean(tally.setSize, tally.cases),
    percent(tally.setHolds, tally.cases),
  ];
});
const pairs = drawPairs(boards, { cases, seed: options.seed, figures });
hand([
  {
    title: 'One fault drawn by the priors, by what the machine reports',
    columns: [
      'evidence',
      'cases',
      'place or group first',
      'in first three',
      'chips pulled before',
      'naive rule first',
      'calibration error',
      '95 % set',
      'set holds it',
    ],
    rows,
  },
  pairs,
]);
