import fc from 'fast-check';
import { buildLayoutIndex, diagnose, priors, type LayoutIndex } from '@/lib';
import type { Diagnosis, Run } from '@/shared';
import { buildLayout } from '../../factories/layout';

/**
 * The posterior worked out a second time with nothing of the engine's inference: every cause of the written
 * model, every combination of their kinds, one after the other. Boards are small so that it ends: the first
 * two banks of two bits, one chip a lane, one set of data lines, no shared part listed.
 */
const bits = 2;
const banks = 2;
const lanesOf = (wanted: (bank: number, bit: number) => boolean) =>
  [0, 1, 2, 3].filter((lane) => wanted(Math.floor(lane / bits), lane % bits));

interface Kind {
  prior: number;
  miss: number;
  spoils: number[][];
}
interface Cause {
  part: string;
  kinds: Kind[];
}

/** Hard and coming-and-going kinds with the lanes spoiled in each run. */
const two = (prior: number, spoils: number[][]): Kind[] => [
  { prior: prior * 0.8, miss: 0.02, spoils },
  { prior: prior * 0.2, miss: 0.5, spoils },
];

/** `swaps[r]`: the sockets (numbered as their lanes) that change chips before run r. */
function causesOf(swaps: (readonly [number, number] | null)[], failed: ReadonlySet<number>): Cause[] {
  const at = swaps.reduce<number[][]>((runs, swap) => {
    const now = [...(runs.at(-1) ?? [0, 1, 2, 3])];
    if (swap) {
      const [a, b] = swap;
      const kept = now[a] as number;
      now[a] = now[b] as number;
      now[b] = kept;
    }
    return [...runs, now];
  }, []);
  const everyRun = (lanes: number[]) => swaps.map(() => lanes);
  const causes: Cause[] = [];
  for (let chip = 0; chip < 4; chip++) {
    const places = at.map((now) => now.indexOf(chip));
    const part = `chip ${chip}`;
    causes.push({
      part,
      kinds: two(
        0.018,
        places.map((p) => [p]),
      ),
    });
    causes.push({
      part,
      kinds: two(
        0.002,
        places.map((p) => lanesOf((_, bit) => bit === p % bits)),
      ),
    });
    causes.push({
      part,
      kinds: two(
        0.00005,
        places.map((p) => lanesOf((bank) => bank === Math.floor(p / bits))),
      ),
    });
    causes.push({
      part,
      kinds: two(
        0.00005,
        places.map(() => [0, 1, 2, 3]),
      ),
    });
  }
  for (let socket = 0; socket < 4; socket++) {
    const handled = swaps.flatMap((swap, r) => (swap?.includes(socket) ? [r] : []));
    const kinds: Kind[] = [];
    let lasting = 1;
    for (const run of handled) {
      kinds.push(
        ...two(
          0.004 * lasting * 0.4,
          swaps.map((_, r) => (r < run ? [socket] : [])),
        ),
      );
      lasting *= 0.6;
    }
    causes.push({ part: `position ${socket}`, kinds: [...two(0.004 * lasting, everyRun([socket])), ...kinds] });
    if (handled.length > 0) {
      const fitted = handled.flatMap((run, i) =>
        two(
          0.01,
          swaps.map((_, r) => (r >= run && r < (handled[i + 1] ?? Infinity) ? [socket] : [])),
        ),
      );
      causes.push({ part: `position ${socket}`, kinds: fitted });
    }
  }
  causes.push({ part: 'all', kinds: two(0.002, everyRun([0, 1, 2, 3])) });
  for (let bank = 0; bank < banks; bank++) {
    causes.push({ part: `bank ${bank}`, kinds: two(0.002, everyRun(lanesOf((b) => b === bank))) });
  }
  for (let bit = 0; bit < bits; bit++) {
    causes.push({ part: `line ${bit}`, kinds: two(0.0015, everyRun(lanesOf((_, b) => b === bit))) });
  }
  // Something outside the listed parts that spoils just one lane, in every run.
  for (const lane of failed) causes.push({ part: `elsewhere ${lane}`, kinds: two(0.0008, everyRun([lane])) });
  causes.push({ part: 'short', kinds: two(0.0005, everyRun([0, 1, 2, 3])) });
  return causes;
}

type Seen = ('failed' | 'passed' | 'untested')[];

/** Fixed point with 80 decimals, so that the alternating sum below loses nothing that a double could show. */
const one = 10n ** 80n;
const fixed = (x: number) => BigInt(Math.round(x * 1e12)) * 10n ** 68n;
const times = (a: bigint, b: bigint) => (a * b) / one;
const ratio = (a: bigint, b: bigint) => Number((a * 10n ** 20n) / b) / 1e20;

/**
 * Every combination of causes, summed by the inclusion and exclusion of the failing lanes: the probability
 * that a given set of lanes reads well is a plain product over the causes.
 */
function posteriorOf(causes: Cause[], runs: Seen[]): Map<string, number> {
  const seen = runs.flatMap((run, r) => run.map((state, lane) => ({ r, lane, state })));
  const passed = seen.filter(({ state }) => state === 'passed');
  const failed = seen.filter(({ state }) => state === 'failed');
  let evidence = 0n;
  const part = new Map<string, bigint>();
  for (let subset = 0; subset < 2 ** failed.length; subset++) {
    const well = [...passed, ...failed.filter((_, i) => subset & (1 << i))];
    const sign = failed.filter((_, i) => subset & (1 << i)).length % 2 === 0 ? 1n : -1n;
    const terms = causes.map((cause) => {
      const kinds = cause.kinds.map((kind) =>
        well.reduce(
          (weight, { r, lane }) => (kind.spoils[r]?.includes(lane) ? times(weight, fixed(kind.miss)) : weight),
          fixed(kind.prior),
        ),
      );
      const absent = cause.kinds.reduce((left, kind) => left - fixed(kind.prior), one);
      return { kinds, sum: kinds.reduce((a, b) => a + b, absent) };
    });
    const leak = well.reduce((product) => times(product, fixed(1 - priors.leak)), one);
    const all = terms.reduce((product, { sum }) => times(product, sum), leak);
    evidence += sign * all;
    terms.forEach(({ kinds, sum }, c) => {
      const others = (all * one) / sum;
      const name = (causes[c] as Cause).part;
      for (const kind of kinds) part.set(name, (part.get(name) ?? 0n) + sign * times(others, kind));
    });
  }
  return new Map([...part].map(([name, mass]) => [name, ratio(mass, evidence)]));
}

const document = buildLayout({ banks, bits, sharedParts: false, formats: ['code'] });
const index: LayoutIndex = buildLayoutIndex(document);
const label = (lane: number) =>
  index.document.sockets[index.laneSockets[index.laneSocketStart[lane] as number] as number]?.label as string;
const bankId = (lane: number) => document.memory.banks[Math.floor(lane / bits)]?.id as string;

function runsOf(swaps: (readonly [number, number] | null)[], seen: Seen[]): Run[] {
  return seen.map((states, r): Run => {
    const named = (wanted: string) =>
      states.flatMap((state, lane) => (state === wanted ? [{ bank: bankId(lane), bit: lane % bits }] : []));
    const swap = swaps[r];
    return {
      changes: swap ? [{ kind: 'swap', sockets: [label(swap[0]), label(swap[1])] }] : [],
      evidence: [{ kind: 'lanes', failing: named('failed'), passed: named('passed') }],
      complete: true,
    };
  });
}

function expectSame(answer: Diagnosis, expected: Map<string, number>) {
  const nameOf = (suspect: Diagnosis['suspects'][number]): string => {
    if (suspect.kind === 'short') return 'short';
    if (suspect.id === 'unlisted:all') return 'all';
    const unlisted = /^unlisted:(bank|line):(.*)$/.exec(suspect.id);
    if (unlisted) {
      const which =
        unlisted[1] === 'bank'
          ? document.memory.banks.findIndex((bank) => bank.id === unlisted[2])
          : Number(unlisted[2]);
      return `${unlisted[1]} ${which}`;
    }
    const home = suspect.kind === 'chip' ? suspect.id.slice('chip:'.length) : (suspect.socket as string);
    const lane = [0, 1, 2, 3].find((each) => label(each) === home);
    return `${suspect.kind} ${lane}`;
  };
  expect(answer.suspects.length).toBeGreaterThan(0);
  for (const suspect of answer.suspects) {
    const truth = Math.min(1, expected.get(nameOf(suspect)) ?? NaN);
    expect(Math.abs(suspect.probability - truth)).toBeLessThan(1e-9);
  }
}

const failedIn = (runs: Seen[]) =>
  new Set(runs.flatMap((run) => run.flatMap((each, lane) => (each === 'failed' ? [lane] : []))));

const state = fc.constantFrom('failed' as const, 'passed' as const, 'untested' as const);
const seenRun = fc.tuple(state, state, state, state).map((states): Seen => [...states]);
const swap = fc.oneof(fc.constant(null), fc.constantFrom<readonly [number, number]>([0, 1], [0, 2], [1, 3], [2, 3]));

describe('the probabilities of an answer', () => {
  it('equal those of the written model summed over every combination of causes, for one run', () => {
    fc.assert(
      fc.property(
        seenRun.filter((run) => run.includes('failed')),
        (run) => {
          expectSame(diagnose(index, runsOf([null], [run])), posteriorOf(causesOf([null], failedIn([run])), [run]));
        },
      ),
      { seed: 11, numRuns: 300 },
    );
  });

  it('equal them after a swap, when a chip takes its guilt along and its place keeps its own', () => {
    fc.assert(
      fc.property(
        seenRun.filter((run) => run.includes('failed')),
        seenRun,
        swap,
        (first, second, changed) => {
          const swaps = [null, changed];
          const seen = [first, second];
          expectSame(diagnose(index, runsOf(swaps, seen)), posteriorOf(causesOf(swaps, failedIn(seen)), seen));
        },
      ),
      { seed: 12, numRuns: 100 },
    );
  }, 120_000);
});
