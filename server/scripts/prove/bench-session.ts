import { allLanes, diagnose, simulatedReadings, type Random, type TestResult } from '@/lib';
import type { Change, Diagnosis, NextCheck, Run } from '@/shared';
import type { DrawnCase } from './draw';

/** A repair that follows what it is told, run by run. */
export class Session {
  readonly runs: Run[] = [];
  minutes = 0;
  answer: Diagnosis;
  /** A measurement showed the part itself. */
  private shown = false;
  private readonly done = new Set<string>();

  constructor(
    private readonly drawn: DrawnCase,
    private readonly random: Random,
  ) {
    this.runs.push({ changes: [], ...allLanes(drawn.board.wiring, drawn.result) });
    this.answer = this.diagnose();
  }

  /** How sure the answer is of the part that has the fault: 1 once a measurement has shown it. */
  get share(): number {
    if (this.shown) return 1;
    return suspectShare(this.answer, this.drawn);
  }

  /** Does the best check that was not done yet. False where there is none. */
  step(): boolean {
    const check = this.answer.nextChecks.find(({ label }) => !this.done.has(label));
    if (!check) return false;
    this.minutes += check.minutes;
    this.follow(check);
    return true;
  }

  private diagnose(): Diagnosis {
    return diagnose(this.drawn.board.index, this.runs);
  }

  private follow(check: NextCheck): void {
    const { bench } = this.drawn;
    switch (check.action) {
      case 'swap': {
        const [one, other] = check.sockets;
        if (one === undefined || other === undefined) return this.nothingTold(check);
        bench.swap(one, other);
        return this.rerun([{ kind: 'swap', sockets: [one, other] }]);
      }
      case 'replace':
      case 'stack': {
        const [socket] = check.sockets;
        if (socket === undefined) return this.nothingTold(check);
        return this.replace(socket);
      }
      case 'reseat':
        for (const socket of check.sockets) bench.reseat(socket);
        return this.rerun(check.sockets.map((socket) => ({ kind: 'reseat', socket })));
      case 'pull-in-turn':
        // Each chip is taken out in its turn and a good one is fitted, until the failure changes.
        for (const socket of check.sockets) {
          const before = this.lastFailing();
          this.replace(socket);
          if (this.lastFailing() !== before) return;
        }
        return;
      case 'soak':
        return this.soak();
      case 'pattern':
        return this.pattern();
      case 'read-again':
      case 'test-whole':
        return this.rerun([]);
      case 'measure':
      case 'probe':
      case 'rails':
        return this.measure(check);
      case 'ask':
      case 'feel':
        return this.nothingTold(check);
    }
  }

  /** Many passes: each is a run, and the first failure ends it. */
  private soak(): void {
    for (let pass = 0; pass < soakPasses; pass++) {
      const result = this.run([]);
      if (result.lanes.length > 0) break;
    }
    this.ask();
  }

  /** Values are written and read back by hand: what was written and read is told, word by word. */
  private pattern(): void {
    const { bench, board } = this.drawn;
    const said = simulatedReadings(board.wiring, bench.run(), { most: patternLines });
    this.runs.push({ changes: [], evidence: said.evidence, complete: said.complete });
    this.ask();
  }

  /** A meter or a scope shows the part itself where it is looked at; a sound part is only left out from now on. */
  private measure(check: NextCheck): void {
    const { from } = this.drawn;
    const looked =
      from.part === 'position'
        ? check.sockets.includes(from.socket ?? '')
        : from.part !== 'chip' && check.action !== 'rails' && check.sockets.length !== 1;
    if (looked && this.random() < meterShows) this.shown = true;
    this.nothingTold(check);
  }

  private replace(socket: string): void {
    this.drawn.bench.replace(socket);
    this.rerun([{ kind: 'replace', socket, with: 'known-good' }]);
  }

  private rerun(changes: Change[]): void {
    this.run(changes);
    this.ask();
  }

  private run(changes: Change[]): TestResult {
    const { bench, board } = this.drawn;
    const result = bench.run();
    this.runs.push({ changes, ...allLanes(board.wiring, result) });
    return result;
  }

  private ask(): void {
    this.answer = this.diagnose();
    this.done.clear();
  }

  private nothingTold({ label }: NextCheck): void {
    this.done.add(label);
  }

  private lastFailing(): string {
    return JSON.stringify(this.runs[this.runs.length - 1]?.evidence ?? []);
  }
}

/** Passes of a soak that are told one by one. */
const soakPasses = 8;
/** Lines that are written and read back by hand. */
const patternLines = 16;
/** A meter or scope shows a fault where it is (common practice, no source). */
const meterShows = 0.95;

/** The probability that an answer gives to the part that has the fault. */
export function suspectShare(answer: Diagnosis, { from, board }: Pick<DrawnCase, 'from' | 'board'>): number {
  const own = from.lanes.join(' ');
  const { wiring } = board;
  return answer.suspects
    .filter((suspect) => {
      if (from.part === 'chip') return suspect.id === `chip:${from.socket}`;
      if (from.part === 'position') return suspect.kind === 'position' && suspect.socket === from.socket;
      if (suspect.kind !== from.part) return false;
      if (from.sharedPart !== null) return suspect.sharedPart === from.sharedPart;
      const lanes = suspect.lanes.map(({ bank, bit }) => wiring.banks.indexOf(bank) * wiring.bits + bit);
      return suspect.sharedPart === null && lanes.sort((a, b) => a - b).join(' ') === own;
    })
    .reduce((sum, { probability }) => sum + probability, 0);
}
