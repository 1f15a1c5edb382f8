import { lane } from '../brand';
import { type TypedField, buildTypedField } from './field-lanes';
import { hasWordKeys, keysOf } from './keys';
import { type LaneSet, intersection, isAlive } from './lane-set';
import type { Prefix, ReadResult, ReportKey } from './meaning';
import { type PrefixState, prefixStates } from './prefix-states';
import { type Reader, isKnownElsewhere, mostCharacters, readText } from './read';
import {
  addressReason,
  bankReason,
  maskReason,
  nounOfField,
  numberReason,
  rangeOfField,
  syndromeReason,
} from './reasons';
import { numberOf } from './numerals';
import { bitsOfField } from './format-context';

/** What the keypad of one format needs. */
export interface Keypad {
  readonly reader: Reader;
  readonly fields: ReadonlyMap<number, TypedField>;
  readonly keys: readonly Pick<ReportKey, 'text' | 'label'>[];
  readonly expects: string;
}

/** Prepares the keypad of a format. */
export function buildKeypad(reader: Reader): Keypad {
  const { context, conventions } = reader;
  const fields = new Map(context.fields.map((part) => [part.at, buildTypedField({ context, conventions, part })]));
  const waits = context.fields.map((part) => `${nounOfField(part)} ${rangeOfField(context, part)}`.trim());
  return { reader, fields, keys: keysOf(context, fields), expects: waits.join(', then ') };
}

function lanesOfReading({ reader }: Keypad, result: ReadResult): LaneSet {
  const has = new Uint8Array(reader.context.index.laneCount);
  if (result.ok) for (const reading of result.readings) for (const { lane: bad } of reading.failing) has[bad] = 1;
  return { has, speaks: false };
}

function lanesOfState(keypad: Keypad, state: PrefixState, text: string): LaneSet {
  if (state.done) {
    const set = lanesOfReading(keypad, readText(keypad.reader, text));
    return { ...set, speaks: isKnownElsewhere(keypad.reader, text) };
  }
  let set: LaneSet | null = null;
  for (const { field, text: typed } of state.filled) set = intersection(set, field.lanes(typed, 'whole'));
  if (state.open !== null) set = intersection(set, moreOf(state));
  return set ?? { has: keypad.reader.context.index.laneExists, speaks: false };
}

function moreOf({ open }: PrefixState): LaneSet | null {
  if (open === null) return null;
  const { field, text } = open;
  const room =
    field.part.free || text.length < Math.max(field.width.max, ...field.texts.map((entry) => entry.text.length));
  return room ? field.lanes(text, 'more') : { has: new Uint8Array(0), speaks: false };
}

interface LiveState {
  readonly state: PrefixState;
  readonly lanes: LaneSet;
}

function liveStates(keypad: Keypad, text: string): LiveState[] {
  return prefixStates(keypad.reader.context, keypad.fields, text)
    .map((state) => ({ state, lanes: lanesOfState(keypad, state, text) }))
    .filter(({ lanes }) => isAlive(lanes));
}

function commonStart(texts: readonly string[]): string {
  const [first = ''] = texts;
  let length = first.length;
  for (const text of texts) while (!text.startsWith(first.slice(0, length))) length--;
  return first.slice(0, length);
}

/** What can only follow: fixed text, or the letters that all names left have in common. */
function continuation({ state, lanes }: LiveState): string {
  if (state.open === null) return state.fixed;
  const { field, text } = state.open;
  if (field.part.free || field.part.digits !== null) return '';
  const left = field.texts.filter(
    (entry) =>
      entry.text.length > text.length &&
      entry.text.startsWith(text) &&
      (entry.speaks || entry.lanes.some((at) => lanes.has[at] === 1)),
  );
  // Words that have a key each are put in whole, so nothing of them may stand there already.
  if (text === '' && hasWordKeys(field)) return '';
  return commonStart(left.map((entry) => entry.text.slice(text.length)));
}

function fillsOf(live: readonly LiveState[]): string {
  if (live.some(({ state }) => state.done)) return '';
  return commonStart(live.map(continuation));
}

/** Why a text is not the beginning of a code, in the words of the field that cannot be so. */
function deadReason({ reader }: Keypad, states: readonly PrefixState[]): string | null {
  const { context } = reader;
  for (const { filled, open } of states) {
    const typed = open === null || open.text === '' ? filled : [...filled, open];
    for (const [at, { field, text }] of typed.entries()) {
      const last = open !== null && at === typed.length - 1 && open.text !== '';
      const set = field.lanes(text, last ? 'more' : 'whole');
      if (set === null || isAlive(set)) continue;
      const match = { part: field.part, text };
      const bits = bitsOfField(context, field.part, null).length;
      switch (field.part.field.field) {
        case 'bank':
          return bankReason(context, match);
        case 'bit':
          return numberReason(context, match, bits);
        case 'lane':
          return numberReason(context, match, bits * context.index.bankCount);
        case 'mask':
          return maskReason(match, bits);
        case 'syndrome':
          return field.part.field.code === undefined ? null : syndromeReason(match, 'out-of-range');
        case 'address':
          return addressReason(context, match, numberOf(text, field.part.radix ?? 16) * 2 ** field.part.field.shift)
            .reason;
        default:
          return null;
      }
    }
  }
  return null;
}

function possibleOf(keypad: Keypad, live: readonly LiveState[], result: ReadResult): Prefix['possible'] {
  const { index } = keypad.reader.context;
  const sets = live.length > 0 ? live.map(({ lanes }) => lanes) : [lanesOfReading(keypad, result)];
  return Array.from(index.lanes)
    .filter((at) => sets.some(({ has }) => has[at] === 1))
    .map(lane);
}

/** What can follow a text that is being typed. */
export function nextKeys(keypad: Keypad, text: string): Prefix {
  if (text.length > mostCharacters) {
    const keys = keypad.keys.map((key) => ({ ...key, enabled: false }));
    const result = readText(keypad.reader, text);
    return {
      keys,
      complete: false,
      reason: result.ok ? null : result.reason,
      possible: [],
      expects: keypad.expects,
      fills: '',
    };
  }
  const live = liveStates(keypad, text);
  const result = readText(keypad.reader, text);
  const keys = keypad.keys.map((key) => ({ ...key, enabled: liveStates(keypad, text + key.text).length > 0 }));
  // A whole code that names something beyond the board is no dead end, but it has its words all the same.
  const dead = live.every(({ state }) => state.done) && !result.ok && text !== '';
  const states = dead ? prefixStates(keypad.reader.context, keypad.fields, text) : [];
  return {
    keys,
    complete: result.ok,
    reason: dead ? ((live.length === 0 ? deadReason(keypad, states) : null) ?? result.reason) : null,
    possible: possibleOf(keypad, live, result),
    expects: keypad.expects,
    fills: fillsOf(live),
  };
}
