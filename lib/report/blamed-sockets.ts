import type { SocketIndex } from '../brand';
import { socketIndex } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { type AddressMap, decodeAddress } from '../place/address';
import type { ReportReading } from './meaning';

/** The word of a lane's bank that a reading speaks of; null where it names no address, or one that leads elsewhere. */
function wordOf(map: AddressMap, reading: ReportReading, bank: number): number | null {
  if (reading.address === null) return null;
  return decodeAddress(map, reading.address).find((place) => place.bank === bank)?.word ?? null;
}

/**
 * The sockets that a reading blames, ascending: those that hold its failing lanes, and where banks are several chips
 * deep and the code has an address, only those that hold the word.
 */
export function blamedSockets(index: LayoutIndex, map: AddressMap, reading: ReportReading): SocketIndex[] {
  const { sockets, memory } = index.document;
  const blamed = new Set<number>();
  for (const { lane } of reading.failing) {
    const bank = index.bankOf(lane);
    const word = wordOf(map, reading, bank);
    for (let at = index.laneSocketStart[lane]!; at < index.laneSocketStart[lane + 1]!; at++) {
      const socket = index.laneSockets[at]!;
      const holdsWord = sockets[socket]!.holds.some(
        (held) =>
          held.bank === memory.banks[bank]!.id &&
          held.bit === index.bitOf(lane) &&
          (word === null || held.words === undefined || (word >= held.words.from && word <= held.words.to)),
      );
      if (holdsWord) blamed.add(socket);
    }
  }
  return [...blamed].sort((a, b) => a - b).map(socketIndex);
}
