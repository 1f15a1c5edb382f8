import { faultKinds, type FaultKind } from '@/lib';
import { Session } from './bench-session';
import { demoProofBoards, generatedProofBoards, type ProofBoard } from './boards';
import { drawShown } from './draw';
import { seededRandom } from './random';
import { hand, optionsFrom } from './table';
import { mean, percent } from './tally';

/** From here on a cause counts as found. */
const found = 0.95;
const mostChecks = 6;
/** Larger boards tell nothing new of the checks and take long. */
const mostSockets = 72;

interface Followed {
  cases: number;
  /** Found after so many checks. */
  readonly after: [number, number, number, number];
  minutes: number;
  foundAtLast: number;
  checks: number;
}

function followKind(boards: readonly ProofBoard[], kind: FaultKind, { cases, seed }: { cases: number; seed: number }) {
  const random = seededRandom(seed * 1000 + 701 + faultKinds.indexOf(kind));
  const followed: Followed = { cases: 0, after: [0, 0, 0, 0], minutes: 0, foundAtLast: 0, checks: 0 };
  const able = boards
    .map((board) => ({ board, possible: board.possible.filter((each) => each.kind === kind) }))
    .filter(({ possible }) => possible.length > 0);
  for (let n = 0; n < cases && able.length > 0; n++) {
    const { board, possible } = able[n % able.length]!;
    const drawn = drawShown(board, possible, random);
    if (drawn === null) continue;
    followed.cases++;
    const session = new Session(drawn, random);
    let checks = 0;
    while (session.share < found && checks < mostChecks && session.step()) checks++;
    const isFound = session.share >= found;
    followed.after.forEach((_, most) => {
      if (isFound && checks <= most) followed.after[most]!++;
    });
    followed.minutes += session.minutes;
    followed.checks += checks;
    if (isFound) followed.foundAtLast++;
  }
  return followed;
}

const options = optionsFrom(process.env);
const boards = [...demoProofBoards(), ...generatedProofBoards()].filter(
  ({ wiring }) => wiring.labels.length <= mostSockets,
);
const kinds = faultKinds.filter((kind) => kind !== 'wiring of one lane' && (options.only ?? kind) === kind);
const cases = Math.max(1, Math.floor(options.cases / 6));
hand([
  {
    title: 'Following the next checks, one fault, evidence that lists every lane',
    columns: [
      'fault',
      'cases',
      'above 95 % at once',
      'after 1 check',
      'after 2',
      'after 3',
      `within ${mostChecks}`,
      'mean checks',
      'mean minutes',
    ],
    rows: kinds.map((kind) => {
      const { cases: of, after, foundAtLast, minutes, checks } = followKind(boards, kind, { ...options, cases });
      return [
        kind,
        String(of),
        ...after.map((count) => percent(count, of)),
        percent(foundAtLast, of),
        mean(checks, of),
        mean(minutes, of),
      ];
    }),
    notes: [
      'The part itself counts, not its place alone: chip or contact. A meter or scope shows a fault where it is looked for in 95 % of cases.',
    ],
  },
]);
