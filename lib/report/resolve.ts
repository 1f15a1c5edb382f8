import { type BankIndex, type Lane, bankIndex, lane } from '../brand';
import { type SpanPlace, decodeSpan } from '../place/address';
import type { Convention } from './conventions';
import type { FieldPart, FormatContext } from './format-context';
import type { FieldMatch, Match } from './match-types';
import type { FailingLane } from './meaning';
import { numberOf } from './numerals';
import {
  addressReason,
  bankReason,
  laneReason,
  missingBitReason,
  noSuchBankHere,
  numberReason,
  sentence,
} from './reasons';
import { countOf, entryNamesLane, placedBank } from './values';
import { failingBits } from './failing-bits';
import type { FailingBits, RawReading, Refusal, Resolved } from './outcome';

/** A bank that the code can mean, with what the address tells beside it. */
interface Site {
  readonly bank: BankIndex;
  readonly place: SpanPlace | null;
  readonly address: number | null;
  readonly take: string | null;
}

function refuse(reason: string, at: number): Resolved {
  return { readings: [], refusal: { reason, at } };
}

const fieldNamed = (match: Match, name: FieldPart['field']['field']) =>
  match.fields.find(({ part }) => part.field.field === name);

/** Words of a table that name no lane, such as memory on an expansion card. */
function wordsOnly(match: Match): Refusal | null {
  for (const { entry, part, start, text } of match.fields) {
    if (entry?.means === undefined || entryNamesLane(entry)) continue;
    if (part.field.field === 'ignored' || part.field.field === 'count') continue;
    return { reason: sentence(`${text}: ${entry.means}`), at: start, known: true };
  }
  return null;
}

/** The bank that the code names by itself; undefined where it names none. */
function namedBank(context: FormatContext, match: Match, convention: Convention): BankIndex | Refusal | undefined {
  const { index, format } = context;
  let named: BankIndex | undefined;
  for (const field of match.fields) {
    const bank = placedBank(context, field, convention);
    if (bank === undefined) continue;
    if (bank === null) {
      const count = field.entry === null ? countOf(field, convention) : 0;
      return { reason: typeof count === 'string' ? count : bankReason(context, field), at: field.start };
    }
    if (named !== undefined && named !== bank)
      return { reason: noSuchBankHere(context, bank, field.text), at: field.start };
    named = bank;
  }
  return named ?? (format.bank === undefined ? undefined : index.bankByName.get(format.bank));
}

function addressSites(context: FormatContext, field: FieldMatch, named: BankIndex | undefined): Site[] | Refusal {
  const size = 2 ** field.part.field.shift;
  const value = field.entry?.value ?? numberOf(field.text, field.part.radix ?? 10);
  const from = value * size;
  const places = decodeSpan(context.map, from, from + size - 1);
  if (places.length === 0) return { ...addressReason(context, field, from), at: field.start };
  const fitting = named === undefined ? places : places.filter((place) => place.bank === named);
  if (fitting.length === 0) return { reason: noSuchBankHere(context, named!, field.text), at: field.start };
  const banks = new Set(fitting.map((place) => place.bank));
  return fitting.map((place) => ({
    bank: place.bank,
    place,
    address: place.word === null ? null : from,
    take:
      fitting.length === 1
        ? null
        : place.register !== null
          ? `${place.register.name} = ${place.register.value}`
          : banks.size > 1
            ? bankTake(context, place.bank)
            : null,
  }));
}

function bankTake({ index }: FormatContext, bank: BankIndex): string {
  return `bank ${index.document.memory.banks[bank]!.id}`;
}

function sitesOf(context: FormatContext, match: Match, convention: Convention): Site[] | Refusal {
  const named = namedBank(context, match, convention);
  if (typeof named === 'object') return named;
  const address = fieldNamed(match, 'address');
  const tells = context.map.windows.length > 0;
  if (address !== undefined && tells && (address.entry === null || address.entry.value !== undefined)) {
    return addressSites(context, address, named);
  }
  const one = named ?? (context.index.bankCount === 1 ? bankIndex(0) : undefined);
  if (one !== undefined) return [{ bank: one, place: null, address: null, take: null }];
  return Array.from({ length: context.index.bankCount }, (_, n) => {
    const bank = bankIndex(n);
    return { bank, place: null, address: null, take: bankTake(context, bank) };
  });
}

interface Placing {
  readonly site: Site;
  readonly convention: Convention;
}

/** The code names a bank and no bit: one of its bits, and nothing says which. */
function anyBitOf(context: FormatContext, site: Site, takes: readonly string[]): RawReading[] {
  const { index } = context;
  const lanes = context.allBits
    .map((bit) => lane(site.bank * index.bitCount + bit))
    .filter((at) => index.laneExists[at] === 1);
  return lanes.map((at) => ({
    failing: [{ lane: at, reads: 'unknown' }],
    shown: [],
    showsWord: false,
    address: site.address,
    values: null,
    takes: [...takes, index.laneWords(at)],
  }));
}

function rightOnes({ index }: FormatContext, base: number, { failing, shown }: FailingBits): Lane[] {
  const lanes: Lane[] = [];
  for (const bit of shown ?? []) {
    if (index.laneExists[base + bit] === 1 && !failing?.some((bad) => bad.bit === bit)) lanes.push(lane(base + bit));
  }
  return lanes.sort((a, b) => a - b);
}

function readingsAt(context: FormatContext, { site, convention }: Placing, bits: FailingBits): RawReading[] {
  const base = site.bank * context.index.bitCount;
  const takes = site.take === null ? convention.takes : [...convention.takes, site.take];
  if (bits.failing === null) return anyBitOf(context, site, takes);
  const failing: FailingLane[] = [];
  for (const { bit, reads } of bits.failing) failing.push({ lane: lane(base + bit), reads });
  failing.sort((a, b) => a.lane - b.lane);
  const shown = rightOnes(context, base, bits);
  const values = bits.values ?? null;
  return [{ failing, shown, showsWord: bits.shown !== null, address: site.address, values, takes }];
}

function direct(lanes: readonly Lane[], convention: Convention): Resolved {
  const failing = lanes.map((bad): FailingLane => ({ lane: bad, reads: 'unknown' }));
  return {
    readings: [{ failing, shown: [], showsWord: false, address: null, values: null, takes: convention.takes }],
    refusal: null,
  };
}

function socketLanes({ index }: FormatContext, label: string): Lane[] {
  const socket = index.socketByLabel.get(label);
  if (socket === undefined) return [];
  return Array.from(index.socketLanes.subarray(index.socketLaneStart[socket], index.socketLaneStart[socket + 1]), lane);
}

function resolveSocket(context: FormatContext, field: FieldMatch, convention: Convention): Resolved {
  const lanes = socketLanes(context, field.text);
  if (lanes.length === 0) return refuse(`${field.text} holds no bit of this board's memory.`, field.start);
  return direct(lanes, convention);
}

function resolveLane(context: FormatContext, field: FieldMatch, convention: Convention): Resolved {
  const { index } = context;
  const count = countOf(field, convention);
  if (typeof count === 'string') return refuse(count, field.start);
  const bits = field.part.field.bits ?? context.dataBits;
  const total = bits.length * index.bankCount;
  if (count < 0 || count >= total) return refuse(numberReason(context, field, total), field.start);
  const bankFirst = field.part.field.order === 'bank-first';
  const bank = bankFirst ? Math.floor(count / bits.length) : count % index.bankCount;
  const at = bankFirst ? count % bits.length : Math.floor(count / index.bankCount);
  const bit = bits[convention.highFirst(field.part) ? bits.length - 1 - at : at]!;
  const named = lane(bank * index.bitCount + bit);
  return index.laneExists[named] === 1
    ? direct([named], convention)
    : refuse(laneReason(context, named, field.text), field.start);
}

/** What a matched text says under one convention: readings, or why there is none. */
export function resolve(context: FormatContext, match: Match, convention: Convention): Resolved {
  const words = wordsOnly(match);
  if (words !== null) return { readings: [], refusal: words };
  const socket = fieldNamed(match, 'socket');
  if (socket !== undefined && socket.entry === null) return resolveSocket(context, socket, convention);
  const number = fieldNamed(match, 'lane');
  if (number !== undefined && (number.entry === null || number.entry.value !== undefined))
    return resolveLane(context, number, convention);

  const sites = sitesOf(context, match, convention);
  if (!Array.isArray(sites)) return { readings: [], refusal: sites };
  const readings: RawReading[] = [];
  let refusal: Refusal | null = null;
  for (const site of sites) {
    const bits = failingBits(context, match, { convention, place: site.place });
    if ('reason' in bits) {
      refusal ??= bits;
      continue;
    }
    const absent = bits.failing?.find(
      ({ bit }) => context.index.laneExists[site.bank * context.index.bitCount + bit] !== 1,
    );
    if (absent !== undefined) refusal ??= { reason: missingBitReason(context, site.bank, absent.bit), at: bits.at };
    else readings.push(...readingsAt(context, { site, convention }, bits));
  }
  return { readings, refusal };
}
