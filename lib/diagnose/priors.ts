/**
 * How often things fail before anything is known, and how surely a fault shows. All are estimates of the
 * trade (common practice, no source) until the product's own history replaces them. Probabilities are for
 * one board with a fault that a memory test reports, measured supply good.
 *
 * The model: every cause below is there or not, each on its own. A cause has one or more kinds that
 * exclude each other (hard or coming and going; cured by handling or not). A lane that a test looks at
 * reads bad with probability 1 - (1 - leak) * product over the causes there of (1 - detection) (noisy-OR).
 */
export const priors = {
  /** A chip that is bad for its own lanes. */
  chipDead: 0.018,
  /** A chip that never lets go of its data line, so the bit fails in every bank on the same lines. Shared among its data pins. */
  chipHoldsLine: 0.002,
  /** A chip that holds the strobe of its bank. */
  chipHoldsStrobe: 0.00005,
  /** A chip that holds an address line, so every lane of the array suffers. */
  chipHoldsAddress: 0.00005,
  /** What a chip fitted as known good keeps of the chip priors above. */
  knownGoodShare: 0.1,
  /** A position without contact: socket, solder, trace. */
  positionOpen: 0.004,
  /** Of a chip or position with several data pins: the share of faults that spoil just one of the pins. */
  oneDataPinShare: 0.5,
  /** One channel of a shared part. */
  sharedChannel: 0.0015,
  /** A whole shared part. */
  sharedWhole: 0.002,
  /** Two neighbouring data lines joined. */
  lineShort: 0.0005,
  /** Two data lines joined that are not neighbours by number; weighed only where readings show them to follow each other. */
  farShort: 0.0001,
  /** Two channels joined inside a buffer; weighed only where readings show the lines to follow each other. */
  shortInside: 0.00003,
  /** A data line shorted to a supply, beside the driver that the layout lists. */
  lineItself: 0.0003,
  /** One address line of the array; weighed beside the listed parts only where readings show an address bit to be lost. */
  addressLine: 0.0008,
  /** A lane that reads bad though no cause of the model is there. */
  leak: 0.001,
  /** Something else that spoils just one lane, in every run: wiring, gating, a trace beyond the position. Divided among the data pins of the chip. */
  elsewhere: 0.0008,
  /** A chip whose socket feeds its pins wrongly is taken for destroyed. */
  wrongPart: 0.95,
  /** One fault in five comes and goes. */
  intermittentShare: 0.2,
  /** A hard fault shows on a lane in this share of tests. */
  detectionHard: 0.98,
  /** A fault that comes and goes shows on a lane in this share of tests. */
  detectionIntermittent: 0.5,
  /** Handling a position (swap, reseat, replacement) cures an open contact in this share of cases. */
  handlingCures: 0.4,
  /** Handling a position leaves a bent leg or a chip turned round in this share of cases. */
  handlingHarms: 0.01,
} as const;

export type Priors = { readonly [K in keyof typeof priors]: number } & {
  /**
   * How much likelier than the mean the chip first found in each socket is to be bad, by the board's failure history
   * (`priorsFor`); 1 where nothing is known.
   */
  readonly chipFactor?: readonly number[];
};
