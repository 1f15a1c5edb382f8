import type { ScreenMap } from '@/shared';
import type { BankIndex } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { laneAt } from '../layout/served-lanes';
import { addressMapOf, decodeAddress, type AddressMap, type WordPlace } from '../place/address';

type Plane = ScreenMap['planes'][number];

/** What one address shows in one plane. */
export interface ScreenCell {
  readonly bank: BankIndex;
  /** The lane of each pixel of the unit, leftmost first; -1 where the pixel shows no lane of the board. */
  readonly lanes: Int32Array;
}

/** What a line shows, unit by unit from the left; lines that differ in nothing but where their words begin share one. */
export interface LinePattern {
  /** Null where the address leads to no word. */
  readonly cells: readonly (ScreenCell | null)[];
  /** The word of each unit, counted from `firstWord` of the line. */
  readonly words: Float64Array;
  /** The lowest and the highest of `words` that a unit shows; both 0 where none shows any. */
  readonly least: number;
  readonly most: number;
}

export interface PlaneLine {
  readonly pattern: LinePattern;
  readonly firstWord: number;
  /** True where other lines share the pattern object. */
  readonly shared: boolean;
}

/** One plane of a prepared screen. */
export interface ScreenPlane {
  readonly plane: Plane;
  readonly base: number;
  readonly cellOf: (place: WordPlace) => ScreenCell;
  readonly patterns: Map<string, LinePattern>;
  /** Lines that were followed before and share their pattern, by number. */
  readonly lines: (PlaneLine | undefined)[];
}

/** The screen of a layout made ready for look-up. Pixels are those of the memory, before the picture is turned. */
export interface Screen {
  readonly index: LayoutIndex;
  readonly map: ScreenMap;
  readonly addressMap: AddressMap;
  /** How far each line begins from the base, by line number. */
  readonly lineOffsets: Float64Array;
  /** Units of a line that the width leaves to be seen. */
  readonly shownUnits: number;
  readonly planes: readonly ScreenPlane[];
}

const prepared = new WeakMap<LayoutIndex, Screen | null>();

/** The screen of a layout, null where it has none. Made once for a layout. */
export function screenOf(index: LayoutIndex): Screen | null {
  let screen = prepared.get(index);
  if (screen === undefined) {
    screen = index.document.screenMap === undefined ? null : prepare(index, index.document.screenMap);
    prepared.set(index, screen);
  }
  return screen;
}

function prepare(index: LayoutIndex, map: ScreenMap): Screen {
  const addressMap = addressMapOf(index);
  const carried = declaredBits(addressMap);
  return {
    index,
    map,
    addressMap,
    lineOffsets: Float64Array.from({ length: map.height }, (_, line) =>
      map.lineWeights.reduce((sum, weight, bit) => sum + (Math.floor(line / 2 ** bit) % 2) * weight, 0),
    ),
    shownUnits: Math.min(map.unitsPerLine, Math.ceil(map.width / map.pixelsPerUnit)),
    planes: map.planes.map((plane) => ({
      plane,
      base: plane.base ?? map.base,
      cellOf: cellMaker({ index, map, plane, carried }),
      patterns: new Map(),
      lines: [],
    })),
  };
}

type Carried = ReadonlyMap<WordPlace['bits'], readonly number[]>;

/** The bits that each address step carries as the window lists them, also those that a bank does not have. */
function declaredBits({ index, windows }: AddressMap): Carried {
  const all = Array.from({ length: index.bitCount }, (_, bit) => bit);
  return new Map(
    windows.flatMap(({ window, carried }) =>
      carried.flatMap((steps) => steps.map((bits, step) => [bits, window.lanes?.[step] ?? all] as const)),
    ),
  );
}

/**
 * Bits of a plane are bits of the word. Where an address carries only a part of the word, such as one byte of two,
 * and not those very bits, they are counted within what the address carries.
 */
function bitsShown(plane: Plane, declared: readonly number[]): (number | undefined)[] {
  if (plane.bits.every((bit) => declared.includes(bit))) return plane.bits;
  if (plane.bits.every((bit) => bit < declared.length)) return plane.bits.map((bit) => declared[bit]);
  return plane.bits.map((bit) => (declared.includes(bit) ? bit : undefined));
}

function cellMaker(of: { index: LayoutIndex; map: ScreenMap; plane: Plane; carried: Carried }) {
  const { index, map, plane, carried } = of;
  const made = new Map<WordPlace['bits'], Map<BankIndex, ScreenCell>>();
  return ({ bank, bits }: WordPlace): ScreenCell => {
    let byBank = made.get(bits);
    if (byBank === undefined) made.set(bits, (byBank = new Map()));
    let cell = byBank.get(bank);
    if (cell === undefined) {
      const shown = bitsShown(plane, carried.get(bits) ?? bits);
      const lanes = Int32Array.from({ length: map.pixelsPerUnit }, (_, pixel) => {
        const bit = shown[pixel];
        return bit === undefined ? -1 : (laneAt(index, bank, bit) ?? -1);
      });
      byBank.set(bank, (cell = { bank, lanes }));
    }
    return cell;
  };
}

/** True where a plane sees a window: the window is always there, or under the register value of the plane. */
export function seesRegister(plane: Plane, register: WordPlace['register'] | undefined): boolean {
  if (register === null || register === undefined) return true;
  return plane.register?.name === register.name && plane.register.value === register.value;
}

/** The word that an address leads to for a plane; null outside every window that the plane sees. */
export function placeInPlane(screen: Screen, { plane }: ScreenPlane, address: number): WordPlace | null {
  const places = decodeAddress(screen.addressMap, address).filter(({ register }) => seesRegister(plane, register));
  return places.find(({ register }) => register !== null) ?? places[0] ?? null;
}

/** Patterns of lines that are kept, in units of all of them together, for one plane. */
const mostKeptUnits = 1_000_000;

/** What a line of a plane shows. Lines from 0 to below the height. */
export function lineOf(screen: Screen, plane: ScreenPlane, line: number): PlaneLine {
  const before = plane.lines[line];
  if (before !== undefined) return before;
  const followed = followLine(screen, plane, line);
  if (followed.shared) plane.lines[line] = followed;
  return followed;
}

function followLine(screen: Screen, plane: ScreenPlane, line: number): PlaneLine {
  const start = plane.base + screen.lineOffsets[line]!;
  const key = patternKey(screen, plane, start);
  if (key === null) return { pattern: patternAt(screen, plane, { start, firstWord: 0 }), firstWord: 0, shared: false };
  const firstWord = placeInPlane(screen, plane, start)?.word ?? 0;
  const known = plane.patterns.get(key);
  if (known !== undefined) return { pattern: known, firstWord, shared: true };
  const pattern = patternAt(screen, plane, { start, firstWord });
  const shared = plane.patterns.size * screen.shownUnits < mostKeptUnits;
  if (shared) plane.patterns.set(key, pattern);
  return { pattern, firstWord, shared };
}

function patternAt(screen: Screen, plane: ScreenPlane, at: { start: number; firstWord: number }): LinePattern {
  const words = new Float64Array(screen.shownUnits);
  let [least, most] = [Infinity, -Infinity];
  const cells = Array.from({ length: screen.shownUnits }, (_, unit) => {
    const place = placeInPlane(screen, plane, at.start + unit);
    if (place === null) return null;
    const word = place.word - at.firstWord;
    words[unit] = word;
    least = Math.min(least, word);
    most = Math.max(most, word);
    return plane.cellOf(place);
  });
  return most < least ? { cells, words, least: 0, most: 0 } : { cells, words, least, most };
}

/**
 * Equal for lines of equal pattern; null where that is not known beforehand. Without interleave only the byte lane at
 * the start counts. With interleave the address bits above a line add the same to every unit, as long as no carry
 * leaves the bits that count inside a line.
 */
function patternKey(screen: Screen, plane: ScreenPlane, start: number): string | null {
  const { index, addressMap, shownUnits } = screen;
  const end = start + shownUnits - 1;
  const touched = addressMap.windows.flatMap((each, at) =>
    each.window.range.from <= end && each.window.range.to >= start && seesRegister(plane.plane, each.window.register)
      ? [{ ...each, at }]
      : [],
  );
  const only = touched[0];
  if (only === undefined || touched.length > 1) return null;
  const { window, steps, removed, at, banks } = only;
  if (window.range.from > start || window.range.to < end) return null;
  const closed = 2 ** (Math.max(-1, ...removed) + 1);
  const units = (window.range.to - window.range.from + 1) / steps;
  const reach = window.firstWord + Math.ceil(units / closed) * (closed / 2 ** removed.length);
  const whole = banks.every((bank) => bank !== undefined && reach <= index.document.memory.banks[bank]!.words);
  if (!whole) return null;
  const offset = start - window.range.from;
  if (window.interleave.length === 0) return `${at}/${offset % steps}`;
  const inside = 2 ** Math.ceil(Math.log2(Math.max(shownUnits, steps)));
  if ((start % inside) + shownUnits <= inside && (offset % inside) + shownUnits <= inside) {
    const bank = placeInPlane(screen, plane, start)?.bank;
    return `${at}/${start % inside}/${offset % inside}/${bank}`;
  }
  const all = 2 ** (Math.max(...window.interleave.flat()) + 1);
  return `${at}/${start % all}/${offset % all}`;
}
