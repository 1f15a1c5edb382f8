/**
 * The engine's one public door. Everything here is pure: no I/O, no clock, no randomness that is not passed
 * in. The same code answers in the browser with no network and on the server.
 */
export { buildLayoutIndex } from './layout/build-layout-index';
export type { LayoutIndex } from './layout/layout-index';
export { channelsOf, servedLanes, type Channel } from './layout/served-lanes';
export { compileFormat, type CompileResult } from './report/compile-format';
export { openConventions, type Doubt } from './report/open-conventions';
export type {
  CompiledFormat,
  FailingLane,
  Prefix,
  ReadReport,
  ReadResult,
  ReportKey,
  ReportReading,
} from './report/meaning';
export { compiledFormats } from './diagnose/compiled-formats';
export { diagnose } from './diagnose/diagnose';
export { supplyPins, withinLimits, type SupplyPin } from './diagnose/rails';
export { lanesWords } from './diagnose/lane-words';
export { priors, type Priors } from './diagnose/priors';
export {
  inferNoisyOr,
  type HiddenState,
  type HiddenVariable,
  type NoisyOrAnswer,
  type NoisyOrModel,
} from './diagnose/noisy-or';
export type { BankIndex, BitIndex, Lane, SocketIndex } from './brand';
export { validateLayout } from './layout/validate';
export { testSequence } from './report/silence';
export { blamedSockets } from './report/blamed-sockets';
export { builtInFamilies, findFamily } from './chips/families';
export { fitCheck, railsAtSocket } from './chips/fit';
export type { FitCheck, FitPin, FitReason, FitSeverity, FitVerdict, RailAtPins } from './chips/fit-types';
export {
  addressMapOf,
  decodeAddress,
  encodeAddress,
  type AddressMap,
  type AddressOf,
  type WordPlace,
} from './place/address';
export { tallyReadings } from './readings/tally';
export { eitherReadings, parseReadings, type ParsedReadings, type UnreadLine } from './logs/parse-readings';
export { findLinePatterns } from './logs/find-pattern';
export { isFormatPattern, patternWords, type Column, type ColumnPattern, type LinePattern } from './logs/line-pattern';
export {
  brierScore,
  expectedCalibrationError,
  reliabilityCurve,
  type Prediction,
  type ReliabilityBin,
} from './statistics/calibration';
export { wilsonInterval, type Interval } from './statistics/interval';
export { soakBound, type SoakBound } from './statistics/soak';
export {
  priorsFor,
  socketRates,
  type BoardRates,
  type HistoryPriors,
  type SocketCount,
  type SocketRate,
} from './statistics/socket-rates';
export { leastGroup, showGroups, type NamedGroup, type ShownGroups } from './statistics/small-groups';
export { lanesOfMarks } from './screen/lanes-of-marks';
export {
  classifySyndrome,
  highestSyndrome,
  syndromeOf,
  validateCode,
  type CodeProblem,
  type ErrorCode,
  type SyndromeMeaning,
} from './ecc/code';
export { pictureOfChip, type FailingPicture } from './screen/picture-of-chip';
export { markWords, pictureWords } from './screen/mark-words';
export { colourChoices, colourName, fullColour } from './screen/colours';
export { glassSize, markInMemory, markOnGlass } from './screen/turn';
export { effectOf, type AddressSpan, type ShapeEffect } from './simulate/effect';
export { SimulatedBench, type BenchFigures } from './simulate/bench';
export { allLanes, firstLane, inFormat, readings as simulatedReadings } from './simulate/emit';
export { faultKinds, type FaultKind, type PossibleFault } from './simulate/fault-kinds';
export type { BoardFault } from './simulate/faults';
export { chipFaults, drawEach, drawFault, possibleFaults } from './simulate/possible-faults';
export type { Random, TestResult } from './simulate/self-test';
export { wiringOf, type Wiring } from './simulate/wiring';
export { openLogImport, type LogImport } from './logs/log-import';
export type { LogCounts } from './logs/log-book';
export type { LaneSummary, LogSummary } from './logs/log-evidence';
export { sampleOfLog } from './logs/log-sample';
export { wordsOfLine } from './logs/line-words';
