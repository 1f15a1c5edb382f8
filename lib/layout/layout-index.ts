import type { ChipFamily, LayoutDocument } from '@/shared';
import type { BankIndex, BitIndex, Lane, SocketIndex } from '../brand';

/**
 * Everything about a layout that is looked up, laid out so that each look-up takes constant time.
 * It is built once a layout by `buildLayoutIndex` and never changed.
 */
export interface LayoutIndex {
  readonly document: LayoutDocument;
  readonly bankCount: number;
  /** Data bits of a word, check bits included. */
  readonly bitCount: number;
  /** bankCount * bitCount. Lanes that a bank does not have are among them; see laneExists. */
  readonly laneCount: number;
  /** 1 where the bank has the bit. */
  readonly laneExists: Uint8Array;
  readonly isCheckBit: Uint8Array;
  readonly bankByName: ReadonlyMap<string, BankIndex>;
  readonly socketByLabel: ReadonlyMap<string, SocketIndex>;
  /** The family of each socket's chip, null where the document names one that nobody knows. */
  readonly familyOfSocket: readonly (ChipFamily | null)[];
  /** Sockets that hold a lane: laneSockets[laneSocketStart[lane] .. laneSocketStart[lane + 1]). */
  readonly laneSocketStart: Uint32Array;
  readonly laneSockets: Uint16Array;
  /** Lanes that a socket holds, each once, ascending: same form. */
  readonly socketLaneStart: Uint32Array;
  readonly socketLanes: Uint32Array;
  /** The data line that carries a lane: equal for the same bit of banks that share their lines. */
  readonly lineOfLane: Uint32Array;
  readonly lineCount: number;
  /** Words for a line, such as "D3" or "green D3". */
  readonly lineName: (line: number) => string;
  readonly laneOf: (bank: BankIndex, bit: BitIndex) => Lane;
  readonly bankOf: (lane: Lane) => BankIndex;
  readonly bitOf: (lane: Lane) => BitIndex;
  /** "bit 3 of bank B", or "the parity bit of bank B" for a check bit that has no other name. */
  readonly laneWords: (lane: Lane) => string;
  /** Every lane that exists, ascending. */
  readonly lanes: Uint32Array;
}
