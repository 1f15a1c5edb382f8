import { buildLayoutIndex, diagnose } from '@/lib';
import { run, type Change, type Diagnosis, type NextCheck, type RunInput } from '@/shared';
import { buildLayout } from '../../../factories/layout';

/**
 * A bench of its own: one fault drawn with how it shows, chips that are moved by hand, reports of what fails. The
 * first check of the answer is made each time, and its report goes back to the engine.
 */
const document = buildLayout({ banks: 4, bits: 8, sharedParts: true, formats: [] });
const index = buildLayoutIndex(document);
const sockets = document.sockets.map(({ label, holds }) => ({
  label,
  bank: holds[0]?.bank ?? '',
  bit: holds[0]?.bit ?? 0,
}));

function mulberry(seed: number) {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
}

type Fault = { kind: 'chip' | 'position' | 'channel'; at: number; comesAndGoes: boolean };

class Board {
  /** Number of the chip in each socket, by where it was at first; -1 for a good one from the drawer. */
  private chips = sockets.map((_, s) => s);
  /** The handling put an open contact right: nothing is left to find but that it went away. */
  cured = false;

  constructor(
    readonly fault: Fault,
    private readonly chance: () => number,
  ) {}

  private spoiled(): number[] {
    const { kind, at } = this.fault;
    if (kind === 'channel') return sockets.flatMap((socket, s) => (socket.bit === sockets[at]?.bit ? [s] : []));
    if (kind === 'position') return this.cured ? [] : [at];
    const where = this.chips.indexOf(at);
    return where < 0 ? [] : [where];
  }

  test(changes: Change[]): RunInput {
    const failing = this.spoiled().filter(() => this.chance() < (this.fault.comesAndGoes ? 0.5 : 0.98));
    const lanes = failing.map((s) => ({ bank: sockets[s]?.bank ?? '', bit: sockets[s]?.bit ?? 0 }));
    return { changes, evidence: [{ kind: 'lanes', failing: lanes, passed: 'rest' }] };
  }

  handle({ action, sockets: labels }: NextCheck): Change[] {
    const [a, b] = labels.map((label) => sockets.findIndex((socket) => socket.label === label));
    const { kind, at } = this.fault;
    if (kind === 'position' && [a, b].includes(at) && this.chance() < 0.4) this.cured = true;
    if (action === 'swap' && a !== undefined && b !== undefined) {
      [this.chips[a], this.chips[b]] = [this.chips[b] as number, this.chips[a] as number];
      return [{ kind: 'swap', sockets: [labels[0] as string, labels[1] as string] }];
    }
    if (a !== undefined && action === 'replace') {
      this.chips[a] = -1;
      return [{ kind: 'replace', socket: labels[0] as string, with: 'known-good' }];
    }
    return a === undefined ? [] : [{ kind: 'reseat', socket: labels[0] as string }];
  }
}

/** Whether an outcome seen at the bench, other than by a run, names the fault. */
function seenAtBench(check: NextCheck, fault: Fault, chance: () => number): boolean {
  const label = sockets[fault.at]?.label ?? '';
  if (check.action === 'measure') return fault.kind === 'position' && check.sockets[0] === label && chance() < 0.55;
  if (check.action === 'pull-in-turn') return fault.kind === 'channel' && chance() < 0.95;
  return check.action === 'probe' && fault.kind === 'channel' && chance() < 0.85;
}

/** That the true part is above 95 %, by the engine alone. */
function isProven({ suspects }: Diagnosis, { kind, at }: Fault): boolean {
  const label = sockets[at]?.label ?? '';
  const wanted = kind === 'chip' ? `chip:${label}` : `position:${label}`;
  return suspects.some(({ id, probability }) => id === wanted && probability >= 0.95);
}

/** After how many checks the fault is above 95 %; Infinity where not within three; null where nothing is left to find. */
function checksNeeded(fault: Fault, seed: number): number | null {
  const chance = mulberry(seed);
  const board = new Board(fault, chance);
  const first = board.test([]);
  if (first.evidence?.every((each) => each.kind === 'lanes' && each.failing.length === 0)) return null;
  const runs: RunInput[] = [first];
  const made: string[] = [];
  for (let n = 0; n <= 3; n++) {
    const answer = diagnose(
      index,
      runs.map((each) => run.parse(each)),
    );
    if (isProven(answer, fault)) return n;
    // What was measured and looked right is not measured again.
    const check = answer.nextChecks.find(({ label }) => !made.includes(label));
    if (!check || n === 3) break;
    made.push(check.label);
    if (['swap', 'replace', 'reseat', 'soak'].includes(check.action)) runs.push(board.test(board.handle(check)));
    else if (seenAtBench(check, fault, chance)) return n + 1;
  }
  return board.cured ? null : Infinity;
}

const cases = 60;

function shareWithin(kind: Fault['kind'], most: number): number {
  const chance = mulberry(20_260_101);
  const needed: number[] = [];
  for (let seed = 1; needed.length < cases; seed++) {
    const fault = { kind, at: Math.floor(chance() * sockets.length), comesAndGoes: chance() < 0.2 };
    const checks = checksNeeded(fault, seed);
    if (checks !== null) needed.push(checks);
  }
  return needed.filter((checks) => checks <= most).length / needed.length;
}

describe('following the first check each time', () => {
  it('a dead chip is above 95 % within two checks in nine of ten cases', () => {
    expect(shareWithin('chip', 2)).toBeGreaterThanOrEqual(0.9);
  });

  it('an open position that handling does not cure is told within three checks in seven of ten cases', () => {
    expect(shareWithin('position', 3)).toBeGreaterThanOrEqual(0.7);
  });

  it('a channel is told within three checks', () => {
    expect(shareWithin('channel', 3)).toBeGreaterThanOrEqual(0.9);
  });
});
