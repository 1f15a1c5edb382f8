import { priors, type Lane } from '@/lib';
import { candidates, deskFor, ranked } from '@/lib/diagnose/check/candidates';
import type { Candidate } from '@/lib/diagnose/check/candidate';
import { smallBench, weighedOf } from './small-bench';

/**
 * The order of the checks against an exhaustive search over every pair of checks, on boards of two to eight chips.
 * Both follow the same tables of what a check shows; the arithmetic below is written a second time.
 */
const enough = 0.95;
/** Minutes that a bit still costs when the listed checks are used up. */
const minutesPerBit = 20;
const worthMaking = 0.005;

interface Check {
  readonly name: string;
  readonly minutes: number;
  readonly rows: readonly (readonly number[])[];
}

const sumOf = (list: readonly number[]) => list.reduce((a, b) => a + b, 0);
const isSettled = (belief: readonly number[]) => Math.max(...belief) >= enough;
const entropy = (belief: readonly number[]) => -sumOf(belief.map((p) => (p > 0 ? p * Math.log2(p) : 0)));
const left = (belief: readonly number[]) => (isSettled(belief) ? 0 : minutesPerBit * entropy(belief));

/** Every outcome with its probability and what is believed after it. */
function outcomesOf(belief: readonly number[], { rows }: Check): { probability: number; after: number[] }[] {
  return rows.flatMap((row) => {
    const joint = belief.map((p, n) => p * (row[n] as number));
    const probability = sumOf(joint);
    return probability > 1e-3 ? [{ probability, after: joint.map((p) => p / probability) }] : [];
  });
}

function gain(belief: readonly number[], check: Check): number {
  return entropy(belief) - sumOf(outcomesOf(belief, check).map((each) => each.probability * entropy(each.after)));
}

const worth = (belief: readonly number[], checks: readonly Check[]) =>
  checks.filter((check) => gain(belief, check) > worthMaking);

type Policy = (belief: readonly number[], checks: readonly Check[]) => Check | undefined;

const greedy: Policy = (belief, checks) =>
  worth(belief, checks).sort((a, b) => gain(belief, b) / b.minutes - gain(belief, a) / a.minutes)[0];

/** Expected minutes of a check and of the best that follows it, `depth` checks in all. */
function expected(belief: readonly number[], checks: readonly Check[], of: { check: Check; depth: number }): number {
  const others = checks.filter((check) => check !== of.check);
  const after = outcomesOf(belief, of.check).map((each) => {
    if (isSettled(each.after)) return 0;
    const next = of.depth > 1 ? worth(each.after, others) : [];
    if (next.length === 0) return each.probability * left(each.after);
    const best = next.map((check) => expected(each.after, others, { check, depth: of.depth - 1 }));
    return each.probability * Math.min(...best);
  });
  return of.check.minutes + sumOf(after);
}

const twoSteps: Policy = (belief, checks) => {
  const scored = worth(belief, checks).map((check) => ({ check, cost: expected(belief, checks, { check, depth: 2 }) }));
  return scored.sort((a, b) => a.cost - b.cost)[0]?.check;
};

/** Ways of things to go that are rarer than this are not followed further. */
const worthFollowing = 0.004;

/** Mean minutes until one cause is above 95 %, over everything that the checks can show. */
function follow(belief: readonly number[], checks: readonly Check[], how: { policy: Policy; reach?: number }): number {
  if (isSettled(belief)) return 0;
  const { policy, reach = 1 } = how;
  const check = reach < worthFollowing ? undefined : policy(belief, checks);
  if (!check) return left(belief);
  const others = checks.filter((each) => each !== check);
  const after = outcomesOf(belief, check).map(
    (each) => each.probability * follow(each.after, others, { policy, reach: reach * each.probability }),
  );
  return check.minutes + sumOf(after);
}

const checkOf = ({ action, sockets, minutes, outcomes }: Candidate): Check => ({
  name: `${action} ${sockets.join(' ')}`,
  minutes,
  rows: outcomes.map(({ likelihood }) => likelihood),
});

function tablesOf(bench: ReturnType<typeof smallBench>, failing: readonly Lane[], passed: readonly Lane[]) {
  const desk = deskFor({ ...weighedOf(bench, failing, passed), runs: [], priors });
  if (!desk) throw new Error('nothing explains what failed');
  return { belief: desk.beliefs.answers.map(({ share }) => share), order: ranked(desk, candidates(desk)) };
}

const boards: [number, number][] = [
  [1, 2],
  [2, 2],
  [2, 4],
  [4, 2],
];

function evidenceOf({ index, lanes }: ReturnType<typeof smallBench>): [string, Lane[], Lane[]][] {
  const first = lanes[0] as Lane;
  const line = lanes.filter((lane) => index.bitOf(lane) === 0);
  const rest = (failing: Lane[]) => lanes.filter((lane) => !failing.includes(lane));
  const two = lanes.slice(0, 2);
  return [
    ['one lane, the others passed', [first], rest([first])],
    ['one lane, nothing else tested', [first], []],
    ['one bit in every bank', line, rest(line)],
    ['two lanes', two, rest(two)],
  ];
}

describe('the order of the next checks', () => {
  it('costs at most a tenth more minutes than an exhaustive search over two steps', () => {
    const ratios: { name: string; greedy: number; search: number }[] = [];
    for (const [banks, bits] of boards) {
      const bench = smallBench(banks, bits);
      for (const [name, failing, passed] of evidenceOf(bench)) {
        const { belief, order } = tablesOf(bench, failing, passed);
        const checks = order.map(checkOf);
        const search = follow(belief, checks, { policy: twoSteps });
        if (search > 0)
          ratios.push({
            name: `${banks} x ${bits}, ${name}`,
            greedy: follow(belief, checks, { policy: greedy }),
            search,
          });
      }
    }
    expect(ratios.length).toBeGreaterThan(10);
    const mean = (pick: (each: (typeof ratios)[number]) => number) => sumOf(ratios.map(pick)) / ratios.length;
    expect(mean((each) => each.greedy) / mean((each) => each.search)).toBeLessThanOrEqual(1.1);
    // No single kind of evidence hides a bad order behind the others.
    expect(ratios.filter((each) => each.greedy > 1.15 * each.search)).toEqual([]);
  });

  it('is that of information per minute, worked out a second time', () => {
    const bench = smallBench(2, 4);
    const lanes = bench.lanes;
    const { belief, order } = tablesOf(bench, [lanes[0] as Lane], lanes.slice(1));
    const perMinute = order.map((each) => gain(belief, checkOf(each)) / each.minutes);
    expect(perMinute).toEqual([...perMinute].sort((a, b) => b - a));
    expect(order[0]?.action).toBe('swap');
  });

  it('every column of every table adds up to 1', () => {
    for (const [banks, bits] of boards) {
      const bench = smallBench(banks, bits);
      for (const [, failing, passed] of evidenceOf(bench)) {
        for (const { outcomes } of tablesOf(bench, failing, passed).order) {
          const answers = outcomes[0]?.likelihood.length ?? 0;
          for (let n = 0; n < answers; n++)
            expect(sumOf(outcomes.map(({ likelihood }) => likelihood[n] as number))).toBeCloseTo(1, 9);
        }
      }
    }
  });
});
