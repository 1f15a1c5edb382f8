import { line, space } from './scale';
import { family } from './type';

/** Sizes on the board sketch, px. Everything on it that follows the board's own size is a share of a socket instead. */
export const sketchScale = {
  /** Width that is drawn for until the container has said its own. */
  firstWidth: 358,
  /** Greatest height of the sketch before it is scaled down or scrolled. */
  greatestHeight: 640,
  /** Least height of the opening through which an enlarged sketch is seen. */
  leastOpening: 300,
  /** Short side of a usual socket: beyond this a small board is not blown up. */
  greatestSocket: 76,
  /** Short side of a usual socket when the sketch goes to the suspect, and at the greatest zoom. */
  readableSocket: 60,
  closestSocket: 132,
  /** Sockets smaller than this are enlarged by a tap before they can be told apart. */
  tappableSocket: 22,
  /** How far beside a socket a finger may land and still mean it. */
  reach: 24,
  /** Room around the drawing for rings, badges and focus. */
  margin: 14,
  /** Letters: least that is still read, least and greatest of a socket's label, notes and names. */
  leastLabel: 7.5,
  greatestLabel: 18,
  leastWords: 9,
  words: 13,
  axis: 14,
  axisStrong: 16,
  /** Ground of chips and letters on paper. */
  printGround: '#FFFFFF',
  /** Between the names at the left and the array; a ring fits in. */
  namesGap: space.md,
  /** Widest that the names at the left may be. */
  greatestNames: 76,
  /** Radius of a rank badge, and where chips lie close. */
  badges: [10, 8],
  pin1: 2,
  hatch: 6,
  edge: 26,
  swatch: { width: 30, height: 24 },
  line: { hair: line.thin, body: line.thin * 1.5, mark: line.ink, heavy: line.heavy },
  gap: { hair: space.hair, small: space.xs, middle: space.sm },
  font: family,
} as const;
