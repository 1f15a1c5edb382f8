import { spawnSync } from 'node:child_process';
import { closeSync, mkdtempSync, openSync, readSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildLayoutIndex, openLogImport } from '@/lib';
import type { LogEvidence } from '@/shared';
import { lineBytes, logBoard, logPattern, logWriter, usualPatterns } from './log-lines';
import { type Row, median, report } from './measure';

const lines = 1_000_000;
const rounds = 5;
const sizes = [10, 100, 1000];
const banks = ['A', 'B'];
/** MB that the greatest memory may grow by, whatever the length of the log. */
const mostGrowth = 48;

const folder = mkdtempSync(join(tmpdir(), 'rowcall-bench-'));
const file = join(folder, 'night.log');

/** Reads the file as the screen does, in pieces of 1 MB, from the disk to the evidence. */
const importFile = (): LogEvidence => {
  const log = openLogImport(buildLayoutIndex(logBoard()), logPattern, { name: 'night.log' });
  const piece = new Uint8Array(1 << 20);
  const open = openSync(file, 'r');
  for (let read = readSync(open, piece); read > 0; read = readSync(open, piece)) log.push(piece.subarray(0, read));
  closeSync(open);
  return log.finish();
};

const timedResult = <T>(work: () => T): { readonly ms: number; readonly result: T } => {
  const start = performance.now();
  const result = work();
  return { ms: performance.now() - start, result };
};

const run = (command: string, args: readonly string[]): string => {
  const { status, stdout, stderr } = spawnSync(command, args, {
    encoding: 'utf8',
    env: { ...process.env, LC_ALL: 'C' },
  });
  if (status !== 0) throw new Error(`${command} failed: ${stderr}`);
  return stdout;
};

/** Both tallies in one form, to see that they are the same. */
const tallyOfImport = ({ lanes, right }: LogEvidence): string[] =>
  lanes.map((lane) => {
    const seen = right.find(({ bank, bit }) => bank === lane.bank && bit === lane.bit);
    const { readsOne, readsZero, alone, words, rows, columns, first, last } = lane;
    const counts = [readsOne, readsZero, alone, words, rows, columns, first, last, seen?.zeros ?? 0, seen?.ones ?? 0];
    return [banks.indexOf(lane.bank), lane.bit, ...counts].join(' ');
  });

const same = (ours: readonly string[], theirs: readonly string[]) =>
  ours.toSorted().join('\n') === theirs.toSorted().join('\n');

/** Milliseconds of the import, of mawk and of wc on the same file, one after the other in each round. */
const compare = (): { ours: number; first: number; mawk: number; wc: number } => {
  const ours: number[] = [];
  const mawk: number[] = [];
  const wc: number[] = [];
  for (let round = 0; round < rounds; round++) {
    const imported = timedResult(importFile);
    const tallied = timedResult(() => run('mawk', ['-f', 'server/scripts/bench/log-tally.awk', file]));
    ours.push(imported.ms);
    mawk.push(tallied.ms);
    wc.push(timedResult(() => run('wc', ['-l', file])).ms);
    if (!same(tallyOfImport(imported.result), tallied.result.trim().split('\n')))
      throw new Error('mawk comes to another tally of the same log.');
  }
  return { ours: median(ours), first: ours[0] ?? NaN, mawk: median(mawk), wc: median(wc) };
};

const growthAt = (megabytes: number): number =>
  Number(run(process.execPath, ['--import', 'tsx', 'server/scripts/bench/log-memory.ts', String(megabytes)]));

const rows = (): Row[] => {
  const bytes = new Uint8Array(lineBytes * lines);
  logWriter(1, usualPatterns)(bytes);
  writeFileSync(file, bytes);
  const { ours, first, mawk, wc } = compare();
  return [
    { what: 'log import, 1,000,000 lines', value: ours, unit: 'ms' },
    { what: 'log import, the first of a process', value: first, unit: 'ms' },
    { what: 'mawk, the same tally of the same file', value: mawk, unit: 'ms' },
    { what: 'wc -l, the same file', value: wc, unit: 'ms' },
    { what: 'log import, times as fast as mawk', value: mawk / ours, unit: 'times', target: { atLeast: 2 } },
    { what: 'log import, times as long as wc -l', value: ours / wc, unit: 'times' },
    ...sizes.map((size): Row => ({
      what: `log import, memory that ${size === 1000 ? '1 GB' : `${size} MB`} of log adds`,
      value: growthAt(size),
      unit: 'MB',
      target: { atMost: mostGrowth },
    })),
  ];
};

try {
  report(rows());
} finally {
  rmSync(folder, { recursive: true, force: true });
}
