import type { LayoutIndex } from '@/lib/layout/layout-index';
import { bitName } from '@/lib/layout/words';
import type { SceneSocket } from './geometry-scene';

/** What the names along a side of the sketch tell. */
type AxisKind = 'bank' | 'bit';

/** Names along one side of the sketch. */
interface Axis {
  readonly kind: AxisKind;
  /** Where each name stands, in sketch units along the axis, ascending. */
  readonly names: readonly { readonly at: number; readonly text: string }[];
}

/** Names down the left and along the top, and what is left to be said on each socket itself. */
export interface Axes {
  readonly rows: Axis | null;
  readonly columns: Axis | null;
  /** By the socket's place in the document: the bank is told by neither side, the bit is told by neither side. */
  readonly untold: readonly { readonly bank: boolean; readonly bit: boolean }[];
}

/** What a socket holds, in short. */
export interface Held {
  readonly banks: string;
  /** Null where it holds every bit of the word. */
  readonly bits: string | null;
}

/** Numbers drawn together where they follow one another: "0–3", "0 2 4". */
function shortNumbers(index: LayoutIndex, bits: readonly number[]): string {
  const { memory } = index.document;
  const names = bits.map((bit) => bitName(memory, bit));
  const first = bits[0];
  const follow = bits.length > 2 && first !== undefined && bits.every((bit, at) => bit === first + at);
  return follow ? `${names[0]}–${names[names.length - 1]}` : names.join(' ');
}

/** The banks and the bits that a socket holds, in short: "C" and "5", "P0" and "0–3". */
export function heldShort(index: LayoutIndex, at: number): Held {
  const banks = new Set<number>();
  const bits = new Set<number>();
  for (let n = index.socketLaneStart[at] ?? 0; n < (index.socketLaneStart[at + 1] ?? 0); n++) {
    const lane = index.socketLanes[n] ?? 0;
    banks.add(Math.floor(lane / index.bitCount));
    bits.add(lane % index.bitCount);
  }
  return {
    banks: [...banks].map((bank) => index.document.memory.banks[bank]?.id ?? '').join(' '),
    bits:
      bits.size === index.bitCount && bits.size > 1
        ? null
        : shortNumbers(
            index,
            [...bits].sort((a, b) => a - b),
          ),
  };
}

interface Line {
  /** Its middle and its ends across the line. */
  readonly at: number;
  readonly from: number;
  readonly to: number;
  readonly members: readonly SceneSocket[];
}

/** Sockets in lines: those whose centres differ by less than half a socket lie in one. */
function linesOf(sockets: readonly SceneSocket[], axis: 'x' | 'y'): readonly Line[] {
  const side = axis === 'x' ? 'width' : 'height';
  const sorted = [...sockets].sort((a, b) => a.box[axis] - b.box[axis]);
  const lines: SceneSocket[][] = [];
  for (const socket of sorted) {
    const head = lines[lines.length - 1]?.[0];
    if (head && socket.box[axis] - head.box[axis] < Math.min(head.box[side], socket.box[side]) / 2)
      lines[lines.length - 1]!.push(socket);
    else lines.push([socket]);
  }
  return lines.map((members) => ({
    at: members.reduce((sum, { box }) => sum + box[axis], 0) / members.length,
    from: Math.min(...members.map(({ box }) => box[axis] - box[side] / 2)),
    to: Math.max(...members.map(({ box }) => box[axis] + box[side] / 2)),
    members,
  }));
}

interface Candidate {
  readonly axis: Axis;
  readonly told: ReadonlySet<number>;
}

/** The names that hold for whole lines. */
function candidate(lines: readonly Line[], kind: AxisKind, held: readonly Held[]): Candidate {
  const names: { at: number; text: string }[] = [];
  const told = new Set<number>();
  for (const { at, members } of lines) {
    const of = (socket: SceneSocket) => held[socket.at]?.[kind === 'bank' ? 'banks' : 'bits'] ?? '';
    const first = members[0] ? of(members[0]) : '';
    if (first === '' || members.some((socket) => of(socket) !== first)) continue;
    names.push({ at, text: first });
    for (const socket of members) told.add(socket.at);
  }
  // Blocks that lie between one another have no lines of their own for a name to stand at.
  const apart = lines.every((line, n) => n === 0 || line.from >= (lines[n - 1] as Line).to - 1e-9);
  return { axis: { kind, names }, told: apart ? told : new Set() };
}

/** Share of the sockets that a side must name to be worth its place. */
const worthwhile = 0.6;

/** Finds out what can be told along the sides of the sketch, from where the sockets lie. */
export function findAxes(index: LayoutIndex, sockets: readonly SceneSocket[]): Axes {
  const held = index.document.sockets.map((_, at) => heldShort(index, at));
  const rows = linesOf(sockets, 'y');
  const columns = linesOf(sockets, 'x');
  const name = (lines: readonly Line[], kind: AxisKind) => candidate(lines, kind, held);
  const usual = [name(rows, 'bank'), name(columns, 'bit')] as const;
  const turned = [name(rows, 'bit'), name(columns, 'bank')] as const;
  const score = (pair: readonly Candidate[]) => pair.reduce((sum, { told }) => sum + told.size, 0);
  const [down, across] = (score(turned) > score(usual) ? turned : usual).map((side) =>
    side.told.size >= worthwhile * sockets.length ? side : null,
  );
  const tells = (kind: AxisKind, at: number) =>
    [down, across].some((side) => side?.axis.kind === kind && side.told.has(at));
  return {
    rows: down?.axis ?? null,
    columns: across?.axis ?? null,
    untold: held.map(({ bits }, at) => ({ bank: !tells('bank', at), bit: bits !== null && !tells('bit', at) })),
  };
}
