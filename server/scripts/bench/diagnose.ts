import { buildLayoutIndex, compiledFormats, diagnose, type Lane, type LayoutIndex } from '@/lib';
import { runs as runsSchema, type RunInput, type Run } from '@/shared';
import { benchBoard } from './board';
import { quantile, report, seeded, timed, type Row } from './measure';

const looks = 100;
const pieces = 10;

/** Ms on this machine for a phone that is slowed four times to stay below one frame of 16 ms. */
const frame = 4;

type Random = (below: number) => number;

/** Lanes that ten lines of a list name, by what is broken: a chip, two chips, a data line, a bank, or a chip that was moved. */
const usual = (index: LayoutIndex, at: number, random: Random): number[] => {
  const { bankCount, bitCount, laneCount } = index;
  const many = (lane: () => number) => Array.from({ length: pieces }, lane);
  const [first, second] = [random(laneCount), random(laneCount)];
  if (at % 5 === 1) return many(() => (random(2) === 0 ? first : second));
  if (at % 5 === 2) return many(() => random(bankCount) * bitCount + (at % bitCount));
  if (at % 5 === 3) return many(() => (at % bankCount) * bitCount + random(bitCount));
  return many(() => first);
};

/** Ten lanes that have nothing in common: no single fault explains them, and nearly every combination has to be weighed. */
const scattered = (index: LayoutIndex, _: number, random: Random): number[] =>
  Array.from({ length: pieces }, () => random(index.laneCount));

const evidenceOf = (index: LayoutIndex, lanes: readonly number[]) =>
  lanes.map((lane) => {
    const written = compiledFormats(index)
      .get('list')
      ?.write([lane as Lane]);
    if (!written?.ok) throw new RangeError('A lane has no code.');
    return { kind: 'code' as const, format: 'list', text: written.text };
  });

/** Every fifth look-up has a swap in it: half of the evidence is from before, half from after. */
const runsFor = (index: LayoutIndex, at: number, lanes: readonly number[]): Run[] => {
  const evidence = evidenceOf(index, lanes);
  const swap = { kind: 'swap' as const, sockets: ['U1', `U${2 + (at % (index.laneCount - 1))}`] as [string, string] };
  const input: RunInput[] =
    at % 5 === 4
      ? [{ evidence: evidence.slice(0, pieces / 2) }, { changes: [swap], evidence: evidence.slice(pieces / 2) }]
      : [{ evidence }];
  return runsSchema.parse(input);
};

const measure = (sockets: number, kind: 'usual' | 'scattered'): Row[] => {
  const index = buildLayoutIndex(benchBoard(sockets));
  const random = seeded(sockets);
  const lanesOf = kind === 'usual' ? usual : scattered;
  const all = Array.from({ length: looks }, (_, at) => runsFor(index, at, lanesOf(index, at, random)));
  for (let round = 0; round < 2; round++) for (const runs of all) diagnose(index, runs);
  const times = all.map((runs) => timed(() => diagnose(index, runs)));
  const what = `diagnose, ${sockets} sockets, ${pieces} ${kind === 'usual' ? 'pieces' : 'scattered lanes'}`;
  const target = sockets === 64 && kind === 'usual' ? { target: { atMost: frame } } : {};
  return [
    { what: `${what}, median`, value: quantile(times, 0.5), unit: 'ms' },
    { what: `${what}, p95`, value: quantile(times, 0.95), unit: 'ms', ...target },
  ];
};

const sizes = [8, 64, 256, 1024];
const rows = sizes.flatMap((sockets) => [...measure(sockets, 'usual'), ...measure(sockets, 'scattered')]);

/** How many times longer the middle answer takes on a board than on the smallest one. */
const growth = (sockets: number): Row => {
  const middle = (of: number) => rows.find(({ what }) => what === `diagnose, ${of} sockets, ${pieces} pieces, median`);
  const [small, large] = [middle(sizes[0] ?? 0), middle(sockets)];
  if (!small || !large) throw new RangeError('A size was not measured.');
  return {
    what: `diagnose, ${sockets} sockets beside ${sizes[0]}, median`,
    value: large.value / small.value,
    unit: 'times',
  };
};

report([...rows, ...sizes.slice(1).map(growth)]);
