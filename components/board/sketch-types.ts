import type { Turn } from './geometry';

/**
 * What is known of a socket.
 * failed: it did not answer. passed: it answered. mixed: both. untested: the test did not reach it.
 * possible, ruled-out: while a code is typed. plain: nothing is said.
 */
export type SocketState = 'failed' | 'passed' | 'untested' | 'mixed' | 'possible' | 'ruled-out' | 'plain';

/** What the sketch says about one socket; `rank` counts suspects from 1, `note` is a few words under the label. */
export interface SocketMark {
  readonly state: SocketState;
  readonly rank?: number;
  readonly note?: string;
  /** Gets the double line of what is chosen or changed. */
  readonly outlined?: boolean;
}

/** What the sketch says about one shared part. */
export interface SharedPartMark {
  readonly rank?: number;
  readonly state?: 'suspect' | 'plain';
}

/** What the sketch says, by the label of the socket or the shared part. What is not in it is plain. */
export interface SketchMarks {
  readonly sockets: ReadonlyMap<string, SocketMark>;
  readonly sharedParts: ReadonlyMap<string, SharedPartMark>;
  /** What the double line around outlined sockets means, in a few words. */
  readonly outlinedMeans?: string;
}

/** What a person chose on the sketch or in its table. */
export interface PickTarget {
  readonly kind: 'socket' | 'shared-part';
  readonly label: string;
}

/** How the board is looked at. Small and serialisable, so that it can be part of a link. */
export interface SketchView {
  readonly turn: Turn;
  /** Seen from the solder side, so mirrored against the component side. */
  readonly solderSide: boolean;
  /** The whole board, close to the first suspect, or so many times larger than whole. */
  readonly zoom: 'whole' | 'suspect' | number;
  /** The table in place of the drawing. */
  readonly table: boolean;
}

/** Marks of a board of which nothing is known. */
export const noMarks: SketchMarks = { sockets: new Map(), sharedParts: new Map() };
