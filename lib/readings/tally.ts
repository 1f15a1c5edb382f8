import type { LogEvidence, ReadEvidence, Reading, Readings } from '@/shared';
import type { BankIndex, Lane } from '../brand';
import { segmentsOf } from '../layout/segments';
import { bankWords } from '../layout/words';
import type { AddressMap } from '../place/address';
import { bitOf, commonOnes } from '../place/address-bits';
import { nearestWords } from '../place/nearest-window';
import { placeValue, type ValuePlace } from '../place/place-value';
import { rowAndColumn } from './chip-word';
import { emptySeen, type LaneSeen } from './lane-seen';

/** A value that was written to a bank and what came back, as whole words. */
export interface ValueSeen {
  readonly bank: BankIndex;
  readonly written: number;
  readonly read: number;
  readonly count: number;
}

/** Readings drawn together. */
export interface Tally {
  readonly lanes: ReadonlyMap<Lane, LaneSeen>;
  readonly values: readonly ValueSeen[];
  /** The whole memory was tested, so what did not fail passed. */
  readonly whole: boolean;
  readonly readings: number;
}

/** One way to place the readings: several where a page or bank register decides and is not known. */
export interface TallyWay {
  readonly tally: Tally;
  readonly takes: readonly string[];
}

export interface TalliedReadings {
  readonly ways: readonly TallyWay[];
  readonly words: ReadEvidence['words'];
  /** Lines that lead nowhere, in words. */
  readonly problems: readonly string[];
}

/**
 * Of runs of addresses no more than this many are looked at in all, spread over them, the ends among them; but a few of
 * each run.
 */
const mostOfRuns = 4096;
const mostOfRun = 2048;
const leastOfRun = 4;
const mostWords = 64;
const mostWays = 8;

/** The golden ratio spreads samples evenly without a stride, which would look like an address bit that never changes. */
const golden = 0.618_033_988_749_894_9;

function nthOfRun(i: number, looked: number, count: number): number {
  return i === looked - 1 ? count - 1 : Math.floor(((i * golden) % 1) * count);
}

/** Draws the readings together. Never throws; a line that leads nowhere is told in `problems` and left out. */
export function tallyReadings(map: AddressMap, evidence: Readings): TalliedReadings {
  const problems: string[] = [];
  const registers = new Map<string, NonNullable<ValuePlace['register']>>();
  for (const line of evidence.lines) {
    if (line.register) continue;
    const places = placeValue(map, line.address, evidence);
    if (places.length < 2) continue;
    for (const { register } of places) if (register) registers.set(`${register.name}=${register.value}`, register);
  }
  const choices = registers.size === 0 ? [null] : [...registers.values()].slice(0, mostWays);
  const words: ReadEvidence['words'] = [];
  const ways = choices.map((register, w): TallyWay => {
    const builder = new TallyBuilder(map, evidence, register);
    for (const line of evidence.lines) builder.add(line);
    if (w === 0) {
      problems.push(...builder.problems);
      words.push(...builder.words);
    }
    return {
      tally: builder.finish(evidence.rest === 'passed'),
      takes: register ? [`${register.name} = ${register.value}`] : [],
    };
  });
  return { ways, words, problems };
}

class TallyBuilder {
  readonly problems: string[] = [];
  readonly words: ReadEvidence['words'] = [];
  private readonly lanes = new Map<
    Lane,
    LaneSeen & { rowSet: Set<number>; columnSet: Set<number>; seen: Set<number> }
  >();
  private readonly values = new Map<string, { bank: BankIndex; written: number; read: number; count: number }>();
  private readings = 0;
  private readonly perRun: number;

  constructor(
    private readonly map: AddressMap,
    private readonly form: Readings,
    private readonly register: ValuePlace['register'],
  ) {
    const runs = form.lines.filter((line) => line.to !== undefined).length;
    this.perRun = Math.max(leastOfRun, Math.min(mostOfRun, Math.floor(mostOfRuns / Math.max(1, runs))));
  }

  add(line: Reading): void {
    const step = line.step ?? 1;
    const count = line.to === undefined ? 1 : Math.floor((line.to - line.address) / Math.max(1, step)) + 1;
    const looked = Math.min(count, this.perRun);
    let missed = 0;
    for (let i = 0; i < looked; i++) {
      const nth = looked === count ? i : nthOfRun(i, looked, count);
      const place = this.placeOf(line, line.address + nth * step);
      if (place) this.addPlaced(line, { place, address: line.address + nth * step, weight: count / looked });
      else missed++;
    }
    if (missed === looked) this.problems.push(nearestWords(this.map, line.address, this.form.unit));
    this.readings += count;
  }

  private placeOf(line: Reading, address: number): ValuePlace | null {
    const places = placeValue(this.map, address, this.form).map((place) => wideEnough(place, line));
    if (places.length < 2) return places[0] ?? null;
    const wanted = line.register ?? this.register;
    return (
      places.find((p) => p.register?.name === wanted?.name && p.register?.value === wanted?.value) ?? places[0] ?? null
    );
  }

  private addPlaced(line: Reading, at: { place: ValuePlace; address: number; weight: number }): void {
    const { index } = this.map;
    const { place, weight } = at;
    const mask = line.mask ?? -1;
    const bad: number[] = [];
    let written = 0;
    let read = 0;
    place.bits.forEach((bit, i) => {
      const wrote = line.written === undefined ? null : bitOf(line.written, i);
      const got = line.read === undefined ? null : bitOf(line.read, i);
      const fails = mask >= 0 ? bitOf(mask, i) === 1 : wrote !== got;
      const lane = index.laneOf(place.bank, bit);
      if (!index.laneExists[lane]) return;
      if (fails) bad.push(i);
      const seen = this.seenOf(lane);
      const value = wrote;
      if (fails) {
        const readsOne = got === 1 || value === 0;
        const readsZero = got === 0 || value === 1;
        if (readsOne) seen.readsOne += weight;
        else if (readsZero) seen.readsZero += weight;
      } else if (value === 1) seen.rightOnes += weight;
      else if (value === 0) seen.rightZeros += weight;
      else {
        // The machine shows failing bits only: what was written is not known.
        seen.rightOnes += weight / 2;
        seen.rightZeros += weight / 2;
      }
      if (bit < 40) {
        if (wrote === 1) written += 2 ** bit;
        if (wrote !== null && (fails ? 1 - wrote : wrote) === 1) read += 2 ** bit;
      }
    });
    const beyond = this.beyond(line, place);
    if (beyond !== null) this.problems.push(beyond);
    this.placeFailing(place, bad, { address: at.address, weight });
    if (line.written !== undefined) {
      const key = `${place.bank} ${written} ${read}`;
      const before = this.values.get(key);
      if (before) before.count += weight;
      else if (this.values.size < 4096) this.values.set(key, { bank: place.bank, written, read, count: weight });
    }
  }

  /** A failing bit that the word does not have, in words. */
  private beyond(line: Reading, place: ValuePlace): string | null {
    const most = Math.max(line.mask ?? 0, line.written ?? 0, line.read ?? 0);
    if (most < 2 ** place.bits.length) return null;
    const bit = Math.floor(Math.log2(most));
    return `Bit ${bit}: ${bankWords(this.map.index.document.memory.banks[place.bank]?.id ?? '')} shows ${place.bits.length} bits at an address.`;
  }

  private placeFailing(place: ValuePlace, bad: readonly number[], at: { address: number; weight: number }): void {
    const { index } = this.map;
    let mask = 0;
    let shown: { row: number; column: number } | null = null;
    place.bits.forEach((bit, i) => {
      const fails = bad.includes(i);
      const lane = index.laneOf(place.bank, bit);
      if (!index.laneExists[lane]) return;
      const seen = this.seenOf(lane);
      const segments = segmentsOf(index, lane);
      segments.forEach((segment, n) => {
        if (place.word < segment.from || place.word > segment.to) return;
        if (!fails) {
          seen.rightSegments |= 1 << n;
          return;
        }
        seen.failingSegments |= 1 << n;
        this.countWord(seen, place.word, place.word - segment.from + segment.at);
        shown ??= rowAndColumn(index, place.word - segment.from + segment.at);
      });
      if (!fails) return;
      if (bit < 40) mask += 2 ** bit;
      if (bad.length === 1) seen.alone += at.weight;
      // A run of many addresses that was looked at in samples counts for all of them.
      if (at.weight > 1) seen.words += at.weight - 1;
    });
    if (this.words.length < mostWords && bad.length > 0) {
      const bank = index.document.memory.banks[place.bank]?.id ?? '';
      const { row = null, column = null } = shown ?? {};
      this.words.push({ address: at.address, bank, word: place.word, row, column, mask });
    }
  }

  /** `bankWord` tells words of several chips behind a lane apart; `word` is that inside the chip. */
  private countWord(
    seen: LaneSeen & { rowSet: Set<number>; columnSet: Set<number>; seen: Set<number> },
    bankWord: number,
    word: number,
  ) {
    if (seen.seen.has(bankWord)) return;
    seen.seen.add(bankWord);
    seen.words++;
    seen.ones = seen.seen.size === 1 ? word : commonOnes(seen.ones, word);
    const not = 2 ** 40 - 1 - word;
    seen.zeros = seen.seen.size === 1 ? not : commonOnes(seen.zeros, not);
    const place = rowAndColumn(this.map.index, word);
    if (!place) return;
    seen.rowSet.add(place.row);
    seen.columnSet.add(place.column);
  }

  private seenOf(lane: Lane) {
    let seen = this.lanes.get(lane);
    if (!seen) {
      seen = { ...emptySeen(), rowSet: new Set(), columnSet: new Set(), seen: new Set() };
      this.lanes.set(lane, seen);
    }
    return seen;
  }

  finish(whole: boolean): Tally {
    const lanes = new Map<Lane, LaneSeen>();
    for (const [lane, { rowSet, columnSet, seen: _, ...seen }] of this.lanes) {
      lanes.set(lane, {
        ...seen,
        rows: rowSet.size,
        columns: columnSet.size,
        row: rowSet.size === 1 ? ([...rowSet][0] as number) : null,
        column: columnSet.size === 1 ? ([...columnSet][0] as number) : null,
      });
    }
    return { lanes, values: [...this.values.values()], whole, readings: this.readings };
  }
}

/** A value that is too wide for the data bits shows the check bits as well. */
function wideEnough(place: ValuePlace, { written = 0, read = 0, mask = 0 }: Reading): ValuePlace {
  return Math.max(written, read, mask) < 2 ** place.bits.length ? place : { ...place, bits: place.withChecks };
}

/** A log that was drawn together before, as a tally of this layout. Lanes that the board does not have are left out. */
export function tallyOfLog({ index }: Pick<AddressMap, 'index'>, log: LogEvidence): Tally {
  const lanes = new Map<Lane, LaneSeen>();
  const laneNamed = (name: { bank: string; bit: number }): Lane | null => {
    const bank = index.bankByName.get(name.bank);
    if (bank === undefined || name.bit >= index.bitCount) return null;
    const lane = index.laneOf(bank, name.bit as never);
    return index.laneExists[lane] ? lane : null;
  };
  for (const each of log.lanes) {
    const lane = laneNamed(each);
    if (lane === null) continue;
    lanes.set(lane, {
      ...emptySeen(),
      readsOne: each.readsOne,
      readsZero: each.readsZero,
      alone: each.alone,
      words: each.words,
      rows: each.rows,
      columns: each.columns,
      row: each.row ?? null,
      column: each.column ?? null,
      ones: each.ones,
      zeros: each.zeros,
    });
  }
  for (const each of log.right) {
    const lane = laneNamed(each);
    if (lane === null) continue;
    const seen = lanes.get(lane) ?? emptySeen();
    lanes.set(lane, { ...seen, rightZeros: each.zeros, rightOnes: each.ones });
  }
  const values = log.values.flatMap(({ bank, written, read, count }) => {
    const at = index.bankByName.get(bank);
    return at === undefined ? [] : [{ bank: at, written, read, count }];
  });
  return { lanes, values, whole: log.rest === 'passed', readings: log.readings };
}
