import type { Held, LayoutProblem } from '@/shared';
import { bankWords, bitWords, listWords, numbersWords, sentenceCase } from '../words';
import { type Checked, bitOutOfRange, error } from './problem';

/** A range of words of one lane, and who holds it. */
interface Piece {
  readonly from: number;
  readonly to: number;
  readonly socket: number;
  readonly pointer: string;
}

interface Holding {
  readonly problems: LayoutProblem[];
  /** By lane. */
  readonly pieces: ReadonlyMap<number, Piece[]>;
}

function heldProblem({ document, index }: Checked, held: Held, pointer: string): LayoutProblem | null {
  const { memory } = document;
  const at = index.bankByName.get(held.bank);
  if (at === undefined) {
    const ids = memory.banks.map(({ id }) => id);
    return error({
      pointer: `${pointer}/bank`,
      code: 'unknown-bank',
      message: `There is no bank "${held.bank}". The banks are ${listWords(ids)}.`,
    });
  }
  if (held.bit >= memory.dataBits) return bitOutOfRange(`${pointer}/bit`, held.bit, memory.dataBits);
  const bank = memory.banks[at]!;
  if (index.laneExists[at * memory.dataBits + held.bit] !== 1) {
    const message = `${sentenceCase(bankWords(bank.id))} has no bit ${held.bit}. Add it to the bits of the bank, or take it out of this socket.`;
    return error({ pointer: `${pointer}/bit`, code: 'bit-not-in-bank', message });
  }
  if (held.words !== undefined && held.words.to >= bank.words) {
    const message = `${sentenceCase(bankWords(bank.id))} has the words 0 to ${bank.words - 1}, but this chip is to hold words up to ${held.words.to}.`;
    return error({ pointer: `${pointer}/words`, code: 'words-out-of-range', message });
  }
  return null;
}

function holding(checked: Checked): Holding {
  const { document, index } = checked;
  const problems: LayoutProblem[] = [];
  const pieces = new Map<number, Piece[]>();
  document.sockets.forEach((socket, at) =>
    socket.holds.forEach((held, n) => {
      const pointer = `/sockets/${at}/holds/${n}`;
      const problem = heldProblem(checked, held, pointer);
      if (problem !== null) problems.push(problem);
      const bank = index.bankByName.get(held.bank);
      if (bank === undefined || held.bit >= index.bitCount || index.laneExists[bank * index.bitCount + held.bit] !== 1)
        return;
      const lane = bank * index.bitCount + held.bit;
      const last = document.memory.banks[bank]!.words - 1;
      const piece = { from: held.words?.from ?? 0, to: Math.min(last, held.words?.to ?? last), socket: at, pointer };
      const list = pieces.get(lane);
      if (list === undefined) pieces.set(lane, [piece]);
      else list.push(piece);
    }),
  );
  return { problems, pieces };
}

function laneWords({ document, index }: Checked, lane: number): string {
  const { memory } = document;
  return `${bitWords(memory, lane % index.bitCount)} of ${bankWords(memory.banks[Math.floor(lane / index.bitCount)]!.id)}`;
}

/** Gaps and overlaps of one lane, by going through its pieces in order of their first word. */
function tiling(checked: Checked, lane: number, pieces: readonly Piece[]): LayoutProblem[] {
  const { document, index } = checked;
  const bank = Math.floor(lane / index.bitCount);
  const { words } = document.memory.banks[bank]!;
  const problems: LayoutProblem[] = [];
  const gap = (from: number, to: number) =>
    problems.push(
      error({
        pointer: `/memory/banks/${bank}`,
        code: 'words-gap',
        message: `No chip holds words ${from} to ${to} of ${laneWords(checked, lane)}. Widen the range of a chip that holds the rest, or add a socket.`,
      }),
    );
  let reached = -1;
  let holder: Piece | null = null;
  for (const piece of [...pieces].sort((a, b) => a.from - b.from || a.socket - b.socket)) {
    if (piece.from > reached + 1) gap(reached + 1, piece.from - 1);
    if (holder !== null && piece.from <= reached) problems.push(overlap(checked, lane, { holder, piece, reached }));
    if (piece.to > reached) {
      reached = piece.to;
      holder = piece;
    }
  }
  if (reached < words - 1) gap(reached + 1, words - 1);
  return problems;
}

function overlap(
  checked: Checked,
  lane: number,
  { holder, piece, reached }: { holder: Piece; piece: Piece; reached: number },
): LayoutProblem {
  const { sockets, memory } = checked.document;
  const [one, two] = [sockets[holder.socket]!.label, sockets[piece.socket]!.label];
  const what = laneWords(checked, lane);
  const { words } = memory.banks[Math.floor(lane / checked.index.bitCount)]!;
  const whole = piece.from === 0 && Math.min(reached, piece.to) === words - 1;
  const who = one === two ? `${one} twice` : `two chips, ${one} and ${two}`;
  const message = whole
    ? `${sentenceCase(what)} is held by ${who}. Take it out of one, or give each its own range of words.`
    : `Words ${piece.from} to ${Math.min(reached, piece.to)} of ${what} are held by ${who}.`;
  return error({ pointer: piece.pointer, code: whole ? 'lane-twice' : 'words-overlap', message });
}

function unheld({ document, index }: Checked, pieces: Holding['pieces']): LayoutProblem[] {
  return document.memory.banks.flatMap((bank, at) => {
    const missing = Array.from({ length: index.bitCount }, (_, bit) => bit).filter((bit) => {
      const lane = at * index.bitCount + bit;
      return index.laneExists[lane] === 1 && !pieces.has(lane);
    });
    if (missing.length === 0) return [];
    const bits = missing.length === 1 ? `bit ${missing[0]}` : `bits ${numbersWords(missing)}`;
    const message = `No socket holds ${bits} of ${bankWords(bank.id)}. Say in "holds" of a socket that it does, or list the bits that the bank has.`;
    return [error({ pointer: `/memory/banks/${at}`, code: 'lane-unheld', message })];
  });
}

/** Lanes held by no chip or by two, and ranges of words that leave a gap or overlap. */
export function checkCoverage(checked: Checked): LayoutProblem[] {
  const { problems, pieces } = holding(checked);
  const tiled = [...pieces].sort(([a], [b]) => a - b).flatMap(([lane, list]) => tiling(checked, lane, list));
  return [...problems, ...unheld(checked, pieces), ...tiled];
}
