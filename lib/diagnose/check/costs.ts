/**
 * Minutes that a check takes, with what it risks counted in. Estimates of the trade (common practice, no
 * source) until a workshop's own records replace them.
 */
export const minutes = {
  /** Two chips change places, and the test runs again. */
  swap: 8,
  /** Another chip is fitted, and the test runs again. */
  replace: 8,
  /** Out and in again, contacts cleaned, and the test runs again. */
  reseat: 5,
  /** A good chip on top of the soldered or socketed one, fitted with the power off. */
  stack: 5,
  /** Continuity of every leg of one socket, power off. */
  measure: 6.5,
  /** Two lines against each other, power off. */
  lineToLine: 5,
  /** One signal with a scope, power on: a slip of the probe shorts rails. */
  probe: 10,
  /** The supply pins of one socket. */
  rails: 3,
  /** Finger or thermometer along the chips. */
  feel: 1,
  /** Two values written and read back by hand. */
  pattern: 3,
  /** The test over all of the memory. */
  testWhole: 3,
  /** Off, on, and the report once more. */
  readAgain: 2,
  /** A look into the manual, or one pull test. */
  ask: 5,
  /** Setting out to pull chips in turn, and each chip pulled. */
  pullStart: 2,
  pullEach: 4,
  /** Legs looked at and the chips fitted again, and the test runs again. */
  refit: 8,
  /** A supply put right, without the parts. */
  repairSupply: 30,
  /** Eight hours, cold and warm. */
  soak: 480,
} as const;

/** Moving a soldered chip takes about this many times as long, lifted pads counted in (common practice, no source). */
export const solderedFactor = 10;
