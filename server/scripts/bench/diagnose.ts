import { buildLayoutIndex, compiledFormats, diagnose, type Lane, type LayoutIndex } from '@/lib';
import { runs as runsSchema, type RunInput, type Run } from '@/shared';
import { benchBoard } from './board';
import { quantile, report, seeded, timed, type Row } from './measure';

const looks = 120;
const pieces = 10;

/** Ms on this machine for a phone that is slowed four times to stay below one frame of 16 ms. */
const frame = 4;

/** Evidence of ten pieces of the kinds that benches see: any lanes, one bit in many banks, one bank, two runs with a swap. */
const evidenceFor = (index: LayoutIndex, at: number, random: (below: number) => number): Run[] => {
  const format = compiledFormats(index).get('list');
  const lane = (): number => {
    const bit = at % 8;
    const banks = index.bankCount;
    if (at % 4 === 1) return random(banks) * 8 + bit;
    if (at % 4 === 2) return (at % banks) * 8 + random(8);
    return random(index.laneCount);
  };
  const code = () => {
    const written = format?.write([lane() as Lane]);
    if (!written?.ok) throw new RangeError('A lane has no code.');
    return { kind: 'code' as const, format: 'list', text: written.text };
  };
  const many = (count: number) => Array.from({ length: count }, code);
  const swap = { kind: 'swap' as const, sockets: ['U1', `U${2 + random(index.laneCount - 1)}`] as [string, string] };
  const input: RunInput[] =
    at % 4 === 3
      ? [{ evidence: many(pieces / 2) }, { changes: [swap], evidence: many(pieces / 2) }]
      : [{ evidence: many(pieces) }];
  return runsSchema.parse(input);
};

const measure = (sockets: number): Row[] => {
  const index = buildLayoutIndex(benchBoard(sockets));
  const random = seeded(sockets);
  const all = Array.from({ length: looks }, (_, at) => evidenceFor(index, at, random));
  for (const runs of all.slice(0, 20)) diagnose(index, runs);
  const times = all.map((runs) => timed(() => diagnose(index, runs)));
  const target = sockets === 64 ? { target: { atMost: frame } } : {};
  return [
    { what: `diagnose, ${sockets} sockets, ${pieces} pieces, median`, value: quantile(times, 0.5), unit: 'ms' },
    {
      what: `diagnose, ${sockets} sockets, ${pieces} pieces, p95`,
      value: quantile(times, 0.95),
      unit: 'ms',
      ...target,
    },
  ];
};

report([8, 64, 256].flatMap(measure));
