import type { SharedPartMark, SketchMarks, SocketMark, SocketState } from '@/components/board/sketch-types';
import { leadingSuspects } from './answer/suspect-words';
import type { Lane, LayoutIndex } from '@/lib';
import type { Diagnosis, LaneName, LaneState } from '@/shared';

/** Suspects whose number stands on the sketch; more would hide the board. */
const mostRanks = 5;
/** Suspects below this probability are told in the list only. */
const leastRanked = 0.03;

/** The sketch of an answer: what each socket did in the last run, and the first suspects by number. */
export function answerMarks(index: LayoutIndex, diagnosis: Diagnosis): SketchMarks {
  const stateOf = new Map(diagnosis.lanes.map((lane) => [nameOf(lane), lane.state]));
  const sockets = new Map<string, SocketMark>();
  const sharedParts = new Map<string, SharedPartMark>();
  const ranks = new Map<string, number>();
  // What explains nothing is merely not cleared; its number would draw the eye for no reason.
  for (const { rank, socket, sharedPart, probability } of leadingSuspects(diagnosis)) {
    if (rank > mostRanks || probability < leastRanked) continue;
    if (sharedPart !== null && !sharedParts.has(sharedPart)) sharedParts.set(sharedPart, { rank, state: 'suspect' });
    else if (socket !== null && !ranks.has(socket)) ranks.set(socket, rank);
  }
  index.document.sockets.forEach(({ label }, at) => {
    const states = lanesOf(index, at).map((lane) => stateOf.get(nameOf(laneName(index, lane))) ?? 'untested');
    const state = diagnosis.outcome === 'no-evidence' ? 'plain' : socketState(states);
    sockets.set(label, { state, rank: ranks.get(label) });
  });
  return { sockets, sharedParts };
}

/** The sketch while a code is typed: the sockets that it can still mean. Null lanes: all are open, nothing is said. */
export function possibleMarks(index: LayoutIndex, possible: readonly Lane[] | null): SketchMarks {
  const open = new Set(possible);
  const sockets = new Map(
    index.document.sockets.map(({ label }, at): [string, SocketMark] => {
      const held = lanesOf(index, at).some((lane) => open.has(lane));
      return [label, { state: possible === null ? 'plain' : held ? 'possible' : 'ruled-out' }];
    }),
  );
  return { sockets, sharedParts: new Map() };
}

/** The sketch while chips are chosen that were moved. */
export function chosenMarks(index: LayoutIndex, chosen: readonly string[]): SketchMarks {
  const sockets = new Map(
    index.document.sockets.map(({ label }): [string, SocketMark] => {
      const at = chosen.indexOf(label);
      return [label, at < 0 ? { state: 'plain' } : { state: 'possible', note: 'chosen' }];
    }),
  );
  return { sockets, sharedParts: new Map() };
}

/** Of a chip with several lanes the worst counts: what did not answer is what the technician looks for. */
function socketState(states: readonly LaneState['state'][]): SocketState {
  if (states.includes('failed')) return 'failed';
  if (states.includes('mixed')) return 'mixed';
  return states.includes('untested') ? 'untested' : 'passed';
}

/** The lanes that a socket holds. */
export function lanesOf(index: LayoutIndex, socket: number): Lane[] {
  return Array.from(
    index.socketLanes.subarray(index.socketLaneStart[socket], index.socketLaneStart[socket + 1]),
  ) as Lane[];
}

/** A lane as evidence and answers name it. */
export function laneName(index: LayoutIndex, lane: Lane): LaneName {
  return { bank: index.document.memory.banks[index.bankOf(lane)]?.id ?? '', bit: index.bitOf(lane) };
}

const nameOf = ({ bank, bit }: LaneName) => `${bank}/${bit}`;
