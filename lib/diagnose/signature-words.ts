import type { Shape, Signature } from '@/shared';
import type { Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { listWords, sentenceCase } from '../layout/words';
import { lanesWords } from './lane-words';
import { looksJoined } from './line-pairs';
import { laneName } from './observe/piece';
import type { RunObservation } from './observe/observations';
import type { LaneShape, Signals } from './signals';

interface Group {
  readonly own: LaneShape;
  readonly run: number;
  readonly lanes: Lane[];
}

/** The patterns that are sure enough to be told, the ones of the last run first. */
export function listSignatures(index: LayoutIndex, signals: Signals, runs: readonly RunObservation[]): Signature[] {
  const groups = new Map<string, Group>();
  signals.lanes.forEach((lanes, run) => {
    for (const [lane, own] of lanes) {
      if (own.shapes.length !== 1 || own.shapes[0] === 'follows-neighbour') continue;
      const seen = runs[run]?.seen.get(lane);
      const key = `${run} ${own.key} ${seen?.row ?? ''} ${seen?.column ?? ''}`;
      const group = groups.get(key);
      if (group) group.lanes.push(lane);
      else groups.set(key, { own, run, lanes: [lane] });
    }
  });
  const shown = [...groups.values()].reverse().map((group) => describe(index, group, runs));
  return [...joinedLines(index, signals), ...shown].slice(0, 12);
}

function joinedLines(index: LayoutIndex, signals: Signals): Signature[] {
  return signals.pairs.filter(looksJoined).map((pair): Signature => {
    const names = pair.lines.map((line) => index.lineName(line));
    const lanes = ([...index.lanes] as Lane[]).filter((lane) => pair.lines.includes(index.lineOfLane[lane] as number));
    const wins = pair.wins === null ? '' : `, ${pair.wins} wins`;
    return {
      shape: 'follows-neighbour',
      words: `${listWords(names)} read alike whenever they were written differently${wins}, and are right when they were written alike.`,
      lanes: lanes.map((lane) => laneName(index, lane)),
      row: null,
      column: null,
      count: pair.joined,
    };
  });
}

function describe(index: LayoutIndex, { own, run, lanes }: Group, runs: readonly RunObservation[]): Signature {
  const seen = runs[run]?.seen.get(lanes[0] as Lane);
  const shape = own.shapes[0] as Shape;
  const count = seen ? Math.round(seen.words) : null;
  const subject = `${sentenceCase(lanesWords(index, lanes))}: `;
  return {
    shape,
    words: subject + wordsFor(shape, { own, count, row: seen?.row ?? null, column: seen?.column ?? null }),
    lanes: lanes.map((lane) => laneName(index, lane)),
    row: seen?.row ?? null,
    column: seen?.column ?? null,
    count,
  };
}

const hex = (n: number) => (n < 10 ? `${n}` : `${n} (${n.toString(16).toUpperCase()} hex)`);

function wordsFor(
  shape: Shape,
  { own, count, row, column }: { own: LaneShape; count: number | null; row: number | null; column: number | null },
): string {
  const failing =
    count === null ? 'the failing words' : count === 1 ? 'the failing word' : `all ${count} failing words`;
  switch (shape) {
    case 'cell':
      return count === 1
        ? 'one word fails, all others are right. A single cell.'
        : `${count ?? 'a few'} words fail, all others are right. Single cells.`;
    case 'row':
      return `${failing} lie in row ${row === null ? '?' : hex(row)} of the chip.`;
    case 'column':
      return `${failing} lie in column ${column === null ? '?' : hex(column)} of the chip.`;
    case 'block':
      return own.addressBits.length > 0
        ? `the failures follow ${own.addressBits.length === 1 ? 'bit' : 'bits'} ${listWords(own.addressBits.map(String))} of the word number inside the chip: an address bit is lost or stuck.`
        : 'a part of the chip fails that an address input cuts off.';
    case 'scattered':
      return `${failing} lie scattered over the chip.`;
    case 'whole':
      return 'words all over the chip fail.';
    case 'follows-neighbour':
      return 'it follows its neighbour.';
  }
}
