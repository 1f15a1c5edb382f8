import type { Evidence, ReportFormat } from '@/shared';
import type { Lane } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { chipWordOf } from '../../layout/segments';
import { listWords } from '../../layout/words';
import { decodeAddress } from '../../place/address';
import { rowAndColumn } from '../../readings/chip-word';
import { emptySeen, type LaneSeen } from '../../readings/lane-seen';
import type { Tally } from '../../readings/tally';
import { compileFormat } from '../../report/compile-format';
import type { CompiledFormat, ReportReading } from '../../report/meaning';
import { openConventions, type Doubt } from '../../report/open-conventions';
import { emptyPiece, laneName, noChoice, refuse, shownOf, type Choice, type Read, type Where } from './piece';

type Code = Extract<Evidence, { kind: 'code' }>;

/** A code in one of the report formats of the layout. */
export function readCode(where: Where, evidence: Code): Read {
  const { index, formats } = where;
  const definition = index.document.reportFormats.find((each) => each.id === evidence.format);
  const format = evidence.doubts?.length
    ? doubted(index, definition, evidence.doubts)
    : (formats.get(evidence.format) ?? null);
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
    piece: {
      ...emptyPiece(where),
      question: evidence.format,
      after: definition.after,
      unordered: definition.after === 'stops' && definition.testOrder === undefined,
      choices: result.readings.map((reading) => choiceOf(where, reading, definition)),
    },
    shown: {
      ...shownOf(where, evidence.text),
      readAs: result.text === evidence.text.trim() ? null : result.text,
      notes: [...result.notes],
      failing: failing.map((lane) => laneName(index, lane)),
      words: first ? wordsOf(where, first) : [],
      passed: first?.passed.length ?? 0,
      alternatives: result.readings.length,
    },
  };
}

const doubtedFormats = new WeakMap<ReportFormat, Map<string, CompiledFormat | null>>();

/** The format with the doubted conventions left open. */
function doubted(
  index: LayoutIndex,
  definition: ReportFormat | undefined,
  doubts: readonly Doubt[],
): CompiledFormat | null {
  if (!definition) return null;
  let variants = doubtedFormats.get(definition);
  if (!variants) doubtedFormats.set(definition, (variants = new Map()));
  const key = [...new Set(doubts)].sort().join(' ');
  const before = variants.get(key);
  if (before !== undefined) return before;
  const result = compileFormat(openConventions(definition, doubts), index);
  const compiled = result.ok ? result.format : null;
  variants.set(key, compiled);
  return compiled;
}

function choiceOf(where: Where, reading: ReportReading, { after, testOrder }: ReportFormat): Choice {
  // Without an order of the test, right bits of one word are all that is known of their lanes.
  const oneWordOnly = after === 'stops' && testOrder === undefined;
  return {
    ...noChoice,
    failing: reading.failing.map((f) => f.lane),
    passed: reading.passed,
    tally: reading.address === null ? null : oneWord(where, reading, { address: reading.address, oneWordOnly }),
    takes: reading.takes,
  };
}

/** The word inside its chip for each lane that a reading with an address names. */
function chipWords({ index, map }: Where, lanes: readonly Lane[], address: number) {
  const places = decodeAddress(map, address);
  return lanes.flatMap((lane) => {
    const place = places.find(({ bank }) => bank === index.bankOf(lane));
    if (!place) return [];
    const at = chipWordOf(index, lane, place.word);
    return at ? [{ lane, word: place.word as number, inChip: at.inChip, mask: 1 << at.segment }] : [];
  });
}

/** A code that names one word, as a tally of that one reading. */
function oneWord(
  where: Where,
  reading: ReportReading,
  { address, oneWordOnly }: { address: number; oneWordOnly: boolean },
): Tally {
  const { index } = where;
  const lanes = new Map<Lane, LaneSeen>();
  const reads = new Map(reading.failing.map((f) => [f.lane, f.reads]));
  for (const { lane, inChip, mask } of chipWords(where, [...reads.keys()], address)) {
    const place = rowAndColumn(index, inChip);
    lanes.set(lane, {
      ...emptySeen(),
      readsOne: reads.get(lane) === 'one' ? 1 : 0,
      readsZero: reads.get(lane) === 'zero' ? 1 : 0,
      alone: reads.size === 1 ? 1 : 0,
      words: 1,
      rows: place ? 1 : 0,
      columns: place ? 1 : 0,
      row: place?.row ?? null,
      column: place?.column ?? null,
      ones: inChip,
      zeros: 2 ** 40 - 1 - inChip,
      failingSegments: mask,
    });
  }
  for (const { lane, mask } of oneWordOnly ? chipWords(where, reading.passed, address) : []) {
    if (lanes.has(lane)) continue;
    // Where the values are not shown, one of the two was tried.
    const one = reading.values ? Math.floor(reading.values.written / 2 ** (index.bitOf(lane) as number)) % 2 : 0;
    lanes.set(lane, { ...emptySeen(), rightOnes: one, rightZeros: 1 - one, rightSegments: mask });
  }
  const bank = index.bankOf((reading.failing[0]?.lane ?? reading.passed[0]) as Lane);
  const values = reading.values ? [{ bank, ...reading.values, count: 1 }] : [];
  return { lanes, values, whole: false, readings: 1 };
}

function wordsOf(where: Where, reading: ReportReading) {
  if (reading.address === null) return [];
  const { index } = where;
  const failing = reading.failing.map((f) => f.lane);
  const [first] = chipWords(where, failing, reading.address);
  if (!first) return [];
  const place = rowAndColumn(index, first.inChip);
  const mask = failing.reduce((sum, lane) => {
    const bit = index.bitOf(lane) as number;
    return index.bankOf(lane) === index.bankOf(first.lane) && bit < 40 ? sum + 2 ** bit : sum;
  }, 0);
  const { bank } = laneName(index, first.lane);
  return [
    { address: reading.address, bank, word: first.word, row: place?.row ?? null, column: place?.column ?? null, mask },
  ];
}
