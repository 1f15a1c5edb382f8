import type { LayoutIndex } from '@/lib/layout/layout-index';
import { bankWords, bitName, bitWords, listWords, numbersWords, sentenceCase } from '@/lib/layout/words';
import type { SharedPart } from '@/shared';
import { orientEdge, type Edge } from './geometry';
import { orientationOf } from './geometry-scene';
import type { SharedPartMark, SketchView, SocketMark, SocketState } from './sketch-types';

const edgeWords: Record<Edge, string> = {
  top: 'at the top',
  right: 'at the right',
  bottom: 'at the bottom',
  left: 'at the left',
};

/** Which side is in sight and how the board lies: "Component side, connector at the bottom". */
export function sideWords(index: LayoutIndex, view: Pick<SketchView, 'turn' | 'solderSide'>): string {
  const { edge, edgeName } = index.document.board.view;
  const at = edgeWords[orientEdge(orientationOf(index, view), edge)];
  return `${view.solderSide ? 'Solder side' : 'Component side'}, ${edgeName} ${at}`;
}

/** What a state says about a socket; empty where it says nothing. */
export const stateWords: Record<SocketState, string> = {
  failed: 'did not answer',
  passed: 'answered',
  mixed: 'failed and answered',
  untested: 'not tested',
  possible: 'still possible',
  'ruled-out': 'ruled out',
  plain: '',
};

const roleWords: Record<SharedPart['role'], string> = {
  'data-buffer': 'data buffer',
  multiplexer: 'multiplexer',
  'strobe-driver': 'strobe driver',
  'write-driver': 'write driver',
  decoder: 'decoder',
  'refresh-counter': 'refresh counter',
  parity: 'parity',
  'shift-register': 'shift register',
  supply: 'supply',
  connector: 'connector',
  other: 'shared part',
};

/** What a shared part is, longest wording first: its own name, its role. */
export function partWordings({ name, role }: SharedPart): readonly string[] {
  const short = roleWords[role];
  return name === undefined || name === short ? [short] : [name, short];
}

function bitsWords(index: LayoutIndex, bits: readonly number[]): string {
  const { memory } = index.document;
  if (bits.length === 1) return bitWords(memory, bits[0] as number);
  const numbered = bits.every((bit) => bitName(memory, bit) === String(bit));
  return `bits ${
    numbered
      ? numbersWords(bits)
      : listWords(
          bits.map((bit) => bitName(memory, bit)),
          8,
        )
  }`;
}

/** What a socket holds: "bit 5 of bank C", "bits 0 to 3 of bank P0", with the words where it has a part of them only. */
export function heldWords(index: LayoutIndex, at: number): string {
  const bitsOf = new Map<number, number[]>();
  for (let n = index.socketLaneStart[at] ?? 0; n < (index.socketLaneStart[at + 1] ?? 0); n++) {
    const lane = index.socketLanes[n] ?? 0;
    const bank = Math.floor(lane / index.bitCount);
    bitsOf.set(bank, [...(bitsOf.get(bank) ?? []), lane % index.bitCount]);
  }
  const lanes = listWords(
    [...bitsOf].map(
      ([bank, bits]) => `${bitsWords(index, bits)} of ${bankWords(index.document.memory.banks[bank]?.id ?? '')}`,
    ),
  );
  const words = index.document.sockets[at]?.holds.find((held) => held.words)?.words;
  return words === undefined ? lanes : `${lanes}, words ${words.from} to ${words.to}`;
}

const sentence = (parts: readonly (string | undefined | false)[]) => parts.filter(Boolean).join(', ');

const rankWords = (rank: number | undefined) => rank !== undefined && `suspect ${rank}`;

/** A socket in one line: "U31, bit 5 of bank C, did not answer, suspect 1". */
export function socketWords(index: LayoutIndex, at: number, mark?: SocketMark): string {
  const socket = index.document.sockets[at];
  return sentence([
    socket?.label,
    heldWords(index, at),
    mark && stateWords[mark.state],
    rankWords(mark?.rank),
    mark?.note,
    socket?.soldered && 'soldered in',
  ]);
}

/** A shared part in one line: "U52, data buffer, bits 4 to 7, shared part, suspect 3". */
export function partWords(part: SharedPart, mark?: SharedPartMark): string {
  return sentence([
    part.label,
    partWordings(part)[0],
    part.role !== 'other' && 'shared part',
    rankWords(mark?.rank) || (mark?.state === 'suspect' && 'suspect'),
  ]);
}

/** The state column of the table: "did not answer", "answered, was bit 3". */
export function markWords(mark?: SocketMark): string {
  return sentenceCase(sentence([mark && stateWords[mark.state], mark?.note]));
}
