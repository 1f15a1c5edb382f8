import { execFileSync } from 'node:child_process';
import { buildLayoutIndex, compiledFormats, type CompiledFormat, type Lane, type LayoutIndex } from '@/lib';
import { benchBoard } from './board';
import { median, report, seeded, timed } from './measure';

const sockets = 256;
const rounds = 61;
const coldProcesses = 7;
const codesInRound = 20_000;

/** The socket that a code names, by the way that the workspace takes: read the text, then ask the index. */
const socketOf = (index: LayoutIndex, format: CompiledFormat, code: string): number => {
  const read = format.read(code);
  const lane = read.ok ? read.readings[0]?.failing[0]?.lane : undefined;
  if (lane === undefined) throw new RangeError(`${code} was not read`);
  const at = index.laneSocketStart[lane] ?? 0;
  return index.laneSockets[at] ?? -1;
};

const codesOf = (index: LayoutIndex, format: CompiledFormat): string[] => {
  const random = seeded(1);
  return Array.from({ length: codesInRound }, () => {
    const written = format.write([index.lanes[random(index.lanes.length)] as Lane]);
    if (!written.ok) throw new RangeError(written.reason);
    return written.text;
  });
};

const document = benchBoard(sockets);
const coldBuilds = Array.from({ length: coldProcesses }, () =>
  Number(execFileSync(process.execPath, ['--import', 'tsx', 'server/scripts/bench/cold-index.ts', String(sockets)])),
);
const builds = Array.from({ length: 50 }, () => timed(() => buildLayoutIndex(document)));
const index = buildLayoutIndex(document);
const format = compiledFormats(index).get('first');
if (format === undefined) throw new RangeError('The format does not compile.');
const codes = codesOf(index, format);

let sum = 0;
const rates = Array.from({ length: rounds }, () => {
  const ms = timed(() => {
    for (const code of codes) sum += socketOf(index, format, code);
  });
  return (codes.length / ms) * 1000;
});
const expected = codes.reduce((total, code) => total + Number.parseInt(code, 16) * 8 + Number(code.at(-1)), 0);
if (sum !== expected * rounds) throw new RangeError('A code led to another socket than it names.');

report([
  { what: `look-up of one code, ${sockets} sockets`, value: median(rates), unit: '/s', target: { atLeast: 200_000 } },
  {
    what: `index of ${sockets} sockets, first build of a process`,
    value: median(coldBuilds),
    unit: 'ms',
    target: { atMost: 10 },
  },
  { what: `index of ${sockets} sockets, median build`, value: median(builds), unit: 'ms', target: { atMost: 10 } },
]);
