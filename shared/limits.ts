/** Sizes that both sides hold to. A request beyond one is answered with the figure, never cut off. */
export const limits = {
  /** Data bits of a word, parity and check bits included. */
  dataBits: 72,
  banks: 256,
  sockets: 2048,
  sharedParts: 512,
  reportFormats: 32,
  formatParts: 32,
  tableEntries: 1024,
  windows: 256,
  sources: 64,
  examples: 64,
  /** Characters of a report as typed or pasted into the code field. */
  reportText: 512,
  /** Runs of one diagnosis, and pieces of evidence in one run. */
  runs: 64,
  evidencePerRun: 512,
  changesPerRun: 64,
  /** Readings in one piece of evidence; more of them are a log. */
  readings: 1024,
  /** Lanes and pairs of written and read that a log is drawn together into. */
  tallyLanes: 1024,
  tallyValues: 256,
  /** Characters of the address of a board. */
  slug: 100,
  /** Bytes of a layout document sent to the server. */
  layoutBytes: 2_000_000,
  /** Bytes of any other JSON body. */
  bodyBytes: 200_000,
  /** Rows of one page of a list. */
  pageSize: 100,
} as const;
