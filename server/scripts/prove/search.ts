import { faultKinds, type FaultKind } from '@/lib';
import { Session } from './bench-session';
import { smallProofBoards } from './boards';
import { drawShown, type DrawnCase } from './draw';
import { seededRandom } from './random';
import { hand, optionsFrom } from './table';
import { mean, percent } from './tally';
import { TwoStepSearch } from './two-step-search';

const found = 0.95;
const mostChecks = 6;

/** How often the part was found after so many checks, and at what cost. */
class Course {
  cases = 0;
  minutes = 0;
  readonly after = [0, 0, 0];
  foundAtLast = 0;

  add({ checks, minutes, isFound }: { checks: number; minutes: number; isFound: boolean }): void {
    this.cases++;
    this.minutes += minutes;
    if (!isFound) return;
    this.foundAtLast++;
    this.after.forEach((_, at) => {
      if (checks <= at + 1) this.after[at]!++;
    });
  }

  cells(): string[] {
    const { cases, after } = this;
    return [
      ...after.map((count) => percent(count, cases)),
      percent(this.foundAtLast, cases),
      mean(this.minutes, cases),
    ];
  }
}

interface Stepping {
  readonly share: number;
  readonly minutes: number;
  step: () => unknown;
}

function run(stepping: Stepping, course: Course): void {
  let checks = 0;
  while (stepping.share < found && checks < mostChecks) {
    if (stepping.step() === false) break;
    checks++;
  }
  course.add({ checks, minutes: stepping.minutes, isFound: stepping.share >= found });
}

const options = optionsFrom(process.env);
const cases = Math.max(1, Math.floor(options.cases / 10));
const boards = smallProofBoards();

function rowOf(kind: FaultKind): string[] | null {
  const [own, searched] = [new Course(), new Course()];
  const able = boards
    .map((board) => ({ board, possible: board.possible.filter((each) => each.kind === kind) }))
    .filter(({ possible }) => possible.length > 0);
  if (able.length === 0) return null;
  for (let n = 0; n < cases; n++) {
    const { board, possible } = able[n % able.length]!;
    // The same fault and the same first pass for both; what follows is drawn by each for itself.
    const seed = options.seed * 100_000 + faultKinds.indexOf(kind) * 1000 + n;
    const draw = (): { drawn: DrawnCase | null; random: ReturnType<typeof seededRandom> } => {
      const random = seededRandom(seed);
      return { drawn: drawShown(board, possible, random), random };
    };
    const [one, other] = [draw(), draw()];
    if (one.drawn === null || other.drawn === null) continue;
    run(new Session(one.drawn, one.random), own);
    run(new TwoStepSearch(other.drawn, other.random), searched);
  }
  return [kind, String(own.cases), ...own.cells(), ...searched.cells()];
}

const kinds = faultKinds.filter((kind) => kind !== 'wiring of one lane' && (options.only ?? kind) === kind);
const course = ['after 1', 'after 2', 'after 3', `within ${mostChecks}`, 'minutes'];
hand([
  {
    title: 'Next checks beside an exhaustive search over two steps, on small boards',
    columns: [
      'fault',
      'cases',
      ...course.map((each) => `Rowcall: ${each}`),
      ...course.map((each) => `search: ${each}`),
    ],
    rows: kinds.flatMap((kind) => {
      const row = rowOf(kind);
      return row === null ? [] : [row];
    }),
    notes: [
      'The search knows that there is one fault. It tries swaps, spares, reseating, measuring, pulling in turn and probing.',
    ],
  },
]);
