import type { Evidence, LaneName, ReportFormat } from '@/shared';
import { addressesOf } from './addresses';
import { reportText, type Saying } from './report-text';
import { patternBit, type FailingWord, type TestResult } from './self-test';
import { grouped, type Wiring } from './wiring';

/** Lines of one report or list of readings that are kept. */
const mostLines = 512;

/** What a pass looks like to the technician: evidence, and whether all of it is there. */
export interface Reported {
  readonly evidence: Evidence[];
  readonly complete: boolean;
}

const nameOf = (wiring: Wiring, lane: number): LaneName => ({
  bank: wiring.banks[Math.floor(lane / wiring.bits)] ?? '',
  bit: lane % wiring.bits,
});

/** Every failing lane; all others passed. */
export function allLanes(wiring: Wiring, { lanes }: TestResult): Reported {
  const failing = lanes.map((lane) => nameOf(wiring, lane));
  return { evidence: [{ kind: 'lanes', failing, passed: 'rest' }], complete: true };
}

/** The first failing lane in the order of the layout, and nothing of the others. */
export function firstLane(wiring: Wiring, { lanes }: TestResult): Reported {
  const [first] = lanes;
  if (first === undefined) return { evidence: [{ kind: 'pass' }], complete: true };
  return { evidence: [{ kind: 'lanes', failing: [nameOf(wiring, first)], passed: 'none' }], complete: true };
}

/**
 * Addresses with what was written and read there, each failing word and pattern once. Where the word is wider than an
 * address carries, a line stands for each address with a failing bit. Lanes that no window shows are left out.
 */
export function readings(wiring: Wiring, { words, waited }: TestResult, { most = mostLines } = {}): Reported {
  const all = words.flatMap((word) => linesOf(wiring, word));
  if (all.length === 0) return { evidence: words.length === 0 ? [{ kind: 'pass' }] : [], complete: true };
  const lines = all.slice(0, most);
  return {
    evidence: [
      {
        kind: 'readings',
        lines: lines.map(({ place, written, bits }) => ({
          address: place.address,
          written: valueOf(place.bits, written),
          read: valueOf(place.bits, (bit) => (written(bit) ^ (bits.includes(bit) ? 1 : 0)) as 0 | 1),
          ...(place.register === null ? {} : { register: place.register }),
        })),
        unit: 'address',
        shows: 'address',
        rest: all.length <= most ? 'passed' : 'unknown',
        ...(waited > 0 ? { waited } : {}),
      },
    ],
    complete: all.length <= most,
  };
}

const valueOf = (bits: readonly number[], of: (bit: number) => 0 | 1): number =>
  bits.reduce((sum, bit, place) => sum + of(bit) * 2 ** place, 0);

interface Line extends Saying {
  readonly place: NonNullable<Saying['place']>;
}

/** What the machine prints of one failing word: a line for each address that carries a failing bit. */
function linesOf(wiring: Wiring, { bank, word, written, bits }: FailingWord): Line[] {
  return addressesOf(wiring, bank, word).flatMap((place) => {
    const own = bits.filter((bit) => place.bits.includes(bit));
    return own.length === 0 ? [] : [{ bank, bits: own, place, written: (bit: number) => patternBit(written, bit) }];
  });
}

/**
 * What the machine reports in one of its formats. A machine that stops says the first failure in the order of its
 * test; one that lists says each lane, bank or failing word. `complete` is false where more than 512 lines came, or
 * where the format could not say some of it. A pass without a failure is told as such.
 */
export function inFormat(wiring: Wiring, format: ReportFormat, result: TestResult): Reported {
  if (result.lanes.length === 0) return { evidence: [{ kind: 'pass' }], complete: true };
  const hasAddress = format.parts.some((part) => 'field' in part && part.field === 'address');
  const listed = hasAddress
    ? result.words.flatMap((word) => linesOf(wiring, word))
    : format.after === 'lists-banks'
      ? byBank(wiring, result)
      : result.lanes.map((lane) => sayingOf(wiring, [lane]));
  const sayings = format.after === 'stops' ? firstOf(wiring, format, result) : listed;
  const said = sayings.map((saying) => inWords(wiring, format, saying));
  const texts = [...new Set(said.flat())];
  const kept = texts.slice(0, mostLines);
  return {
    evidence: kept.map((text) => ({ kind: 'code', format: format.id, text })),
    complete: kept.length === texts.length && said.every((each) => each.length > 0),
  };
}

/** The text for a saying, or one for each of its bits where the format says one bit at a time. */
function inWords(wiring: Wiring, format: ReportFormat, saying: Saying): string[] {
  const whole = reportText(wiring, format, saying);
  if (whole !== null) return [whole];
  return saying.bits.flatMap((bit) => reportText(wiring, format, { ...saying, bits: [bit] }) ?? []);
}

const zero = (): 0 => 0;

function sayingOf(wiring: Wiring, lanes: readonly number[]): Saying {
  const bank = Math.floor((lanes[0] ?? 0) / wiring.bits);
  const bits = lanes.map((lane) => lane % wiring.bits);
  return { bank, bits, place: null, written: zero };
}

function byBank(wiring: Wiring, { lanes }: TestResult): Saying[] {
  return [...grouped(lanes, (lane) => Math.floor(lane / wiring.bits)).values()].map((own) => sayingOf(wiring, own));
}

/** The first failure in the order of the test; without a word on the order, in the order of the layout. */
function firstOf(wiring: Wiring, format: ReportFormat, { lanes, words }: TestResult): Saying[] {
  const { banks: named, bits = 'together', outer = 'bank' } = format.testOrder ?? {};
  const banks = (named ?? wiring.banks).map((name) => wiring.banks.indexOf(name));
  const rank = (lane: number): number => {
    const bank = banks.indexOf(Math.floor(lane / wiring.bits));
    const bit = bits === 'descending' ? wiring.bits - 1 - (lane % wiring.bits) : lane % wiring.bits;
    if (bits === 'together' || outer === 'bank') return bank * wiring.bits + (bits === 'together' ? 0 : bit);
    return bit * wiring.banks.length + bank;
  };
  const tested = lanes.filter((lane) => banks.includes(Math.floor(lane / wiring.bits)));
  const [first] = [...tested].sort((a, b) => rank(a) - rank(b) || a - b);
  if (first === undefined) return [];
  const bank = Math.floor(first / wiring.bits);
  if (bits !== 'together') return [withPlace(wiring, sayingOf(wiring, [first]), words)];
  const word = words.find((each) => each.bank === bank);
  const own = word?.bits.map((bit) => bank * wiring.bits + bit) ?? [first];
  const saying = withPlace(wiring, sayingOf(wiring, own), words);
  // A format that says one bit at a time names the lowest.
  return [reportText(wiring, format, saying) === null ? { ...saying, bits: saying.bits.slice(0, 1) } : saying];
}

function withPlace(wiring: Wiring, saying: Saying, words: readonly FailingWord[]): Saying {
  const word = words.find(({ bank, bits }) => bank === saying.bank && saying.bits.some((bit) => bits.includes(bit)));
  const [line] = word ? linesOf(wiring, word) : [];
  return line ? { ...saying, place: line.place, written: line.written } : saying;
}
