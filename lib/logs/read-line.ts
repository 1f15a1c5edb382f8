import type { Reading } from '@/shared';
import { addressWords, bankWords } from '../layout/words';
import type { AddressMap } from '../place/address';
import { nearestWords } from '../place/nearest-window';
import { type ValuePlace, placeValue } from '../place/place-value';
import type { ColumnPattern } from './line-pattern';
import { type LineReader, marks, outcomes, slots } from './line-reader';
import { bytesOfText, numberOfLimbs } from './numbers';

interface Using {
  readonly map: AddressMap;
  readonly pattern: ColumnPattern;
  readonly reader: LineReader;
}

type ReadLine = { readonly ok: true; readonly reading: Reading } | { readonly ok: false; readonly reason: string };

/** Values of typed readings are held in numbers of 40 bits; a log is read from its bytes and has no such bound. */
const widest = 2 ** 40;

const refuse = (reason: string): ReadLine => ({ ok: false, reason });

function registerOf({ pattern, reader }: Using): Pick<Reading, 'register'> {
  if (pattern.register === undefined || (reader.has & marks.register) === 0) return {};
  return { register: { name: pattern.register.name, value: reader.register } };
}

/** Why a value cannot be what this address shows; null where it can. */
export function widthReason({ map, reader }: Omit<Using, 'pattern'>, place: ValuePlace): string | null {
  const values = [slots.written, slots.read, slots.mask].map((slot, at) =>
    (reader.has & [marks.written, marks.read, marks.mask][at]!) === 0 ? 0 : numberOfLimbs(reader.values, slot),
  );
  const most = Math.max(...values);
  if (most < 2 ** place.bits.length) return null;
  const { memory, addressMap } = map.index.document;
  const bank = bankWords(memory.banks[place.bank]!.id);
  const shown = Number.isFinite(most) ? addressWords({ ...addressMap, digits: 1 }, most) : 'One value';
  return `${shown} does not fit: ${bank} shows ${place.bits.length} bits at an address.`;
}

/** The places of a line's address, narrowed to its register where the line has one. */
function placesOf({ map, pattern, reader }: Using, register: Reading['register']): ValuePlace[] {
  const places = placeValue(map, reader.address, pattern);
  if (register === undefined) return places;
  const fitting = places.filter(
    (place) =>
      place.register === null || (place.register.name === register.name && place.register.value === register.value),
  );
  return fitting;
}

/** One line as a reading, or why it is none; null for a line of nothing but separators. */
export function readLine(using: Using, text: string): ReadLine | null {
  const { map, pattern, reader } = using;
  const outcome = reader.line(bytesOfText(`${text.replaceAll('\n', ' ')}\n`), 0);
  if (outcome === outcomes.blank) return null;
  if (outcome === outcomes.unread) return refuse(reader.reason());
  const { address, to, step, has, values } = reader;
  const register = registerOf(using);
  const places = placesOf(using, register.register);
  const [place] = places;
  if (place === undefined) return refuse(nearestWords(map, address, pattern.unit));
  const wide = widthReason(using, place);
  if (wide !== null) return refuse(wide);
  const pair = (has & marks.written) !== 0 && (has & marks.read) !== 0;
  const [written, read, mask] = [slots.written, slots.read, slots.mask].map((slot) => numberOfLimbs(values, slot)) as [
    number,
    number,
    number,
  ];
  if (Math.max(pair ? written : 0, pair ? read : 0, pair ? 0 : mask) >= widest)
    return refuse('A word of more than 40 bits is read from a log only; open the text as a log.');
  return {
    ok: true,
    reading: {
      address,
      ...(to < 0 ? {} : { to }),
      ...(to < 0 || step === 1 ? {} : { step }),
      ...(pair ? { written, read } : (has & marks.written) !== 0 ? { written, mask } : { mask }),
      ...register,
    },
  };
}
