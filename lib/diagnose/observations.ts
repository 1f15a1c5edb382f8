import type { Evidence, ReadEvidence, Run } from '@/shared';
import type { Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { laneAt } from '../layout/served-lanes';
import { bankWords, listWords } from '../layout/words';
import type { CompiledFormat, ReportReading } from '../report/meaning';

/** What one run showed of each lane that was tested in it. */
export interface RunObservation {
  readonly failing: ReadonlySet<Lane>;
  readonly passed: ReadonlySet<Lane>;
}

/** One way to understand all the evidence together; several remain where a convention is unknown. */
export interface Interpretation {
  readonly runs: readonly RunObservation[];
  /** Which conventions it takes, in words. */
  readonly takes: readonly string[];
}

export interface Observations {
  readonly interpretations: readonly Interpretation[];
  readonly evidence: readonly ReadEvidence[];
  /** Lanes that each piece of evidence says failed, in the order of `evidence`. */
  readonly failingOf: readonly (readonly Lane[])[];
  /** For each run, why silence may not be taken for a pass, in words; null where nothing was left untested. */
  readonly silence: readonly (string | null)[];
  readonly notes: readonly string[];
}

/** A piece of evidence with its readings. */
interface Piece {
  readonly run: number;
  readonly format: CompiledFormat | null;
  readonly after: 'stops' | 'lists-lanes' | 'lists-banks' | null;
  readonly readings: readonly ReportReading[];
  readonly passesOutright: boolean;
}

type Read = { piece: Piece; shown: ReadEvidence } | { piece: null; shown: ReadEvidence };

/** More ways to understand all the evidence together than this are not followed. */
const mostInterpretations = 96;

/**
 * Reads every piece of evidence of every run, and says for each lane whether it failed, passed or was not
 * tested. What cannot be read is told with its reason and left out.
 */
export function observe(
  index: LayoutIndex,
  runs: readonly Run[],
  formats: ReadonlyMap<string, CompiledFormat>,
): Observations {
  const read = runs.flatMap((run, r) =>
    run.evidence.map((each, i) => readPiece({ index, formats, run: r, at: i }, each)),
  );
  const pieces = read.flatMap(({ piece }) => (piece ? [piece] : []));
  const notes: string[] = [];
  const choices = consistentChoices(pieces);
  if (choices.length > mostInterpretations) {
    notes.push(
      `The evidence can be understood in ${choices.length} ways; the first ${mostInterpretations} are weighed.`,
    );
  }
  const interpretations = choices.slice(0, mostInterpretations).map((choice) => ({
    runs: runs.map((run, r) =>
      observeRun(
        index,
        run,
        pieces.flatMap((piece, p) => (piece.run === r ? [{ piece, reading: choice[p] as ReportReading }] : [])),
      ),
    ),
    takes: [...new Set(choice.flatMap((reading) => reading.takes))],
  }));
  return {
    interpretations,
    evidence: read.map(({ shown }) => shown),
    failingOf: read.map(({ piece }) => [
      ...new Set((piece?.readings ?? []).flatMap((reading) => reading.failing.map((f) => f.lane))),
    ]),
    silence: runs.map((run, r) =>
      silenceWords(
        index,
        run,
        pieces.filter((piece) => piece.run === r),
      ),
    ),
    notes: [
      ...notes,
      ...runs.flatMap((_, r) =>
        twoStops(
          pieces.filter((piece) => piece.run === r),
          r,
        ),
      ),
    ],
  };
}

interface Where {
  readonly index: LayoutIndex;
  readonly formats: ReadonlyMap<string, CompiledFormat>;
  readonly run: number;
  readonly at: number;
}

function readPiece(where: Where, evidence: Evidence): Read {
  switch (evidence.kind) {
    case 'code':
      return readCode(where, evidence);
    case 'mask':
      return readMask(where, evidence);
    case 'lanes':
      return readLanes(where, evidence);
    case 'pass':
      return readPass(where, evidence);
  }
}

function shownOf(where: Where, text: string): ReadEvidence {
  return {
    run: where.run,
    index: where.at,
    text,
    ok: true,
    readAs: null,
    notes: [],
    reason: null,
    failing: [],
    passed: 0,
    alternatives: 1,
  };
}

function refuse(where: Where, text: string, reason: string): Read {
  return { piece: null, shown: { ...shownOf(where, text), ok: false, reason } };
}

const name = (index: LayoutIndex, lane: Lane) => ({
  bank: index.document.memory.banks[index.bankOf(lane)]?.id ?? '',
  bit: index.bitOf(lane) as number,
});

function readCode(where: Where, evidence: Extract<Evidence, { kind: 'code' }>): Read {
  const { index, formats } = where;
  const format = formats.get(evidence.format);
  const definition = index.document.reportFormats.find((each) => each.id === evidence.format);
  if (!format || !definition) {
    const known = [...formats.keys()];
    const reason = definition
      ? `The report format ${evidence.format} of this layout does not work, so nothing can be read with it.`
      : `This board has no report format "${evidence.format}". It has ${known.length > 0 ? listWords(known) : 'none'}.`;
    return refuse(where, evidence.text, reason);
  }
  const result = format.read(evidence.text);
  if (!result.ok) return refuse(where, evidence.text, result.reason);
  const failing = [...new Set(result.readings.flatMap((reading) => reading.failing.map((f) => f.lane)))];
  const [first] = result.readings;
  return {
    piece: { run: where.run, format, after: definition.after, readings: result.readings, passesOutright: false },
    shown: {
      ...shownOf(where, evidence.text),
      readAs: result.text === evidence.text.trim() ? null : result.text,
      notes: [...result.notes],
      failing: failing.map((lane) => name(index, lane)),
      passed: first?.passed.length ?? 0,
      alternatives: result.readings.length,
    },
  };
}

function direct(where: Where, text: string, said: { failing: readonly Lane[]; passed: readonly Lane[] }): Read {
  const reading: ReportReading = {
    failing: said.failing.map((lane) => ({ lane, reads: 'unknown' })),
    passed: said.passed,
    address: null,
    takes: [],
  };
  return {
    piece: {
      run: where.run,
      format: null,
      after: null,
      readings: [reading],
      passesOutright: said.failing.length === 0,
    },
    shown: {
      ...shownOf(where, text),
      failing: said.failing.map((lane) => name(where.index, lane)),
      passed: said.passed.length,
    },
  };
}

function bankReason(index: LayoutIndex, bank: string): string {
  return `This board has no bank ${bank}. It has ${listWords(index.document.memory.banks.map((each) => bankWords(each.id)))}.`;
}

function readMask(where: Where, evidence: Extract<Evidence, { kind: 'mask' }>): Read {
  const { index } = where;
  const text = `${bankWords(evidence.bank)}, mask ${evidence.mask.toString(16).toUpperCase()}`;
  const bank = index.bankByName.get(evidence.bank);
  if (bank === undefined) return refuse(where, text, bankReason(index, evidence.bank));
  const failing: Lane[] = [];
  const passed: Lane[] = [];
  for (let bit = 0, rest = evidence.mask; bit < Math.max(index.bitCount, 40); bit++, rest = Math.floor(rest / 2)) {
    const set = rest % 2 === 1;
    const lane = laneAt(index, bank, bit);
    if (lane !== null) (set ? failing : passed).push(lane);
    else if (set)
      return refuse(
        where,
        text,
        `Bit ${bit}: ${bankWords(evidence.bank)} has no such bit; this board has bits 0 to ${index.bitCount - 1}.`,
      );
  }
  return direct(where, text, { failing, passed });
}

function readLanes(where: Where, evidence: Extract<Evidence, { kind: 'lanes' }>): Read {
  const { index } = where;
  const find = (lanes: readonly { bank: string; bit: number }[]): Lane[] | string => {
    const found: Lane[] = [];
    for (const each of lanes) {
      const bank = index.bankByName.get(each.bank);
      if (bank === undefined) return bankReason(index, each.bank);
      const lane = laneAt(index, bank, each.bit);
      if (lane === null)
        return `Bit ${each.bit}: ${bankWords(each.bank)} has no such bit; this board has bits 0 to ${index.bitCount - 1}.`;
      found.push(lane);
    }
    return found;
  };
  const words = evidence.failing.map((each) => `bit ${each.bit} of ${bankWords(each.bank)}`);
  const text = words.length > 0 ? listWords(words) : 'passed';
  const failing = find(evidence.failing);
  if (typeof failing === 'string') return refuse(where, text, failing);
  const failed = new Set(failing);
  const rest = () => ([...index.lanes] as Lane[]).filter((lane) => !failed.has(lane));
  const passed = evidence.passed === 'rest' ? rest() : evidence.passed === 'none' ? [] : find(evidence.passed);
  if (typeof passed === 'string') return refuse(where, text, passed);
  return direct(where, text, { failing, passed });
}

function readPass(where: Where, evidence: Extract<Evidence, { kind: 'pass' }>): Read {
  const { index } = where;
  const banks = evidence.banks ?? index.document.memory.banks.map((bank) => bank.id);
  const text = evidence.banks ? `${listWords(banks.map(bankWords))} passed` : 'all passed';
  const passed: Lane[] = [];
  for (const id of banks) {
    const bank = index.bankByName.get(id);
    if (bank === undefined) return refuse(where, text, bankReason(index, id));
    for (let bit = 0; bit < index.bitCount; bit++) {
      const lane = laneAt(index, bank, bit);
      if (lane !== null) passed.push(lane);
    }
  }
  return direct(where, text, { failing: [], passed });
}

/** One reading for each piece, such that pieces of one format take the same convention. */
function consistentChoices(pieces: readonly Piece[]): ReportReading[][] {
  const conventionOf = (piece: Piece, reading: ReportReading) => `${piece.format?.id ?? ''}|${reading.takes.join('|')}`;
  let choices: { readings: ReportReading[]; taken: Map<string, string> }[] = [{ readings: [], taken: new Map() }];
  for (const piece of pieces) {
    choices = choices.flatMap((choice) =>
      piece.readings.flatMap((reading) => {
        const format = piece.format?.id;
        const convention = conventionOf(piece, reading);
        const before = format === undefined ? undefined : choice.taken.get(format);
        // A code that reads the same under every convention takes none, and binds none.
        if (before !== undefined && piece.readings.length > 1 && before !== convention) return [];
        const taken = new Map(choice.taken);
        if (format !== undefined && piece.readings.length > 1) taken.set(format, convention);
        return [{ readings: [...choice.readings, reading], taken }];
      }),
    );
    // No common convention: each code is then taken by itself, by its first reading.
    if (choices.length === 0) return [pieces.map((each) => each.readings[0] as ReportReading)];
    if (choices.length > 256) choices = choices.slice(0, 256);
  }
  return choices.map((choice) => choice.readings);
}

function observeRun(
  index: LayoutIndex,
  run: Run,
  chosen: readonly { piece: Piece; reading: ReportReading }[],
): RunObservation {
  const failing = new Set<Lane>();
  const passed = new Set<Lane>();
  const outright = new Set<Lane>();
  let listed = false;
  for (const { piece, reading } of chosen) {
    for (const each of reading.failing) failing.add(each.lane);
    for (const lane of reading.passed) (piece.passesOutright ? outright : passed).add(lane);
    if (run.complete && (piece.after === 'lists-lanes' || piece.after === 'lists-banks')) listed = true;
  }
  if (listed) for (const lane of index.lanes) passed.add(lane as Lane);
  // Failing in one code and passed by the silence of another is a failure; only an outright pass speaks against it.
  for (const lane of failing) passed.delete(lane);
  for (const lane of outright) passed.add(lane);
  return { failing, passed };
}

function silenceWords(index: LayoutIndex, run: Run, pieces: readonly Piece[]): string | null {
  if (pieces.some((piece) => piece.after === 'stops')) return 'this self-test stops at the first failure';
  if (pieces.some((piece) => piece.after !== null) && !run.complete) return 'the list of failures was not complete';
  return pieces.length > 0 ? 'nothing was said of it' : null;
}

function twoStops(pieces: readonly Piece[], run: number): string[] {
  const stops = pieces.filter((piece) => piece.after === 'stops');
  const different = new Set(stops.map((piece) => (piece.readings[0]?.failing ?? []).map((f) => f.lane).join(' ')));
  if (different.size < 2) return [];
  return [
    `Run ${run + 1} holds ${different.size} different codes of a test that stops at the first failure: the fault changes from pass to pass, or they belong into separate runs.`,
  ];
}
