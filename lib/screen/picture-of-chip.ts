import type { PictureMark } from '@/shared';
import type { BankIndex, Lane, SocketIndex } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { extentsOf } from './extent';
import { faultWords, placeOfMarkWords, planesOfMark } from './mark-words';
import { lineOf, screenOf, type PlaneLine, type Screen, type ScreenCell } from './screen';
import { markAt, markOnGlass } from './turn';

/** What fails: all that a chip holds, or one lane with every chip behind it. */
export type Failing = { readonly socket: SocketIndex } | { readonly lane: Lane };

/** How the picture looks when something fails. */
export interface FailingPicture {
  /** What is wrong of the picture, in pixels of the memory, before it is turned. Empty where the screen shows none of it. */
  readonly marks: readonly PictureMark[];
  /** Dots that are wrong, each plane counted on its own. */
  readonly dots: number;
  /** In the words of the glass, a text for each colour and place. */
  readonly words: readonly string[];
}

interface WordSpan {
  readonly from: number;
  readonly to: number;
}

/** The words of each lane that fail. */
type Wanted = ReadonlyMap<number, readonly WordSpan[]>;

/** More places than this are counted, not listed, in words. */
const mostPlaces = 4;

/** How the picture of a layout looks when a chip or a lane fails; null where the layout has no screen map. */
export function pictureOfChip(index: LayoutIndex, failing: Failing): FailingPicture | null {
  const screen = screenOf(index);
  if (screen === null) return null;
  const wanted = 'lane' in failing ? new Map([[failing.lane as number, [everyWord]]]) : heldBy(index, failing.socket);
  const places = new Map<string, Place>();
  let dots = 0;
  screen.planes.forEach((_, plane) => {
    for (const { columns, lines } of linesThatFail(screen, plane, wanted)) {
      dots += columns.length * lines.length;
      const key = `${columns.join()}/${lines.join()}`;
      const before = places.get(key);
      if (before === undefined) places.set(key, { columns, lines, planes: [plane] });
      else before.planes.push(plane);
    }
  });
  const marks = [...places.values()].flatMap((place) => marksOf(screen, place));
  return { marks, dots, words: wordsOf(screen, marks) };
}

const everyWord: WordSpan = { from: 0, to: Infinity };

function heldBy({ document, bankByName, bitCount }: LayoutIndex, socket: SocketIndex): Wanted {
  const wanted = new Map<number, WordSpan[]>();
  for (const { bank, bit, words } of document.sockets[socket]?.holds ?? []) {
    const at = bankByName.get(bank);
    if (at === undefined || bit >= bitCount) continue;
    const lane = at * bitCount + bit;
    wanted.set(lane, [...(wanted.get(lane) ?? []), words ?? everyWord]);
  }
  return wanted;
}

interface Place {
  readonly columns: readonly number[];
  readonly lines: readonly number[];
  readonly planes: number[];
}

/** Lines of one plane in which the same columns fail. */
function linesThatFail(screen: Screen, at: number, wanted: Wanted): { columns: number[]; lines: number[] }[] {
  const { map } = screen;
  const plane = screen.planes[at]!;
  const banks = new Set([...wanted.keys()].map((lane) => Math.floor(lane / screen.index.bitCount) as BankIndex));
  const found = new Map<string, { columns: number[]; lines: number[] }>();
  const wholeOf = new Map<PlaneLine['pattern'], number[]>();
  const keyOf = new Map<readonly number[], string>();
  const whole = [...wanted.values()].every((spans) => spans.includes(everyWord));
  for (let line = 0; line < map.height; line++) {
    const here = lineOf(screen, plane, line);
    let columns = whole ? wholeOf.get(here.pattern) : undefined;
    columns ??= columnsThatFail(screen, here, { wanted, banks });
    if (whole && here.shared) wholeOf.set(here.pattern, columns);
    if (columns.length === 0) continue;
    // The same list again needs no words of its own.
    let key = keyOf.get(columns);
    if (key === undefined) keyOf.set(columns, (key = columns.join()));
    const before = found.get(key);
    if (before === undefined) found.set(key, { columns, lines: [line] });
    else before.lines.push(line);
  }
  return [...found.values()];
}

function columnsThatFail(
  { map }: Screen,
  { pattern, firstWord }: PlaneLine,
  { wanted, banks }: { wanted: Wanted; banks: ReadonlySet<BankIndex> },
): number[] {
  const columns: number[] = [];
  const lanesOf = (cell: ScreenCell, word: number, left: number) =>
    cell.lanes.forEach((lane, pixel) => {
      const fails = wanted.get(lane)?.some(({ from, to }) => word >= from && word <= to) ?? false;
      if (fails && left + pixel < map.width) columns.push(left + pixel);
    });
  pattern.cells.forEach((cell, unit) => {
    if (cell !== null && banks.has(cell.bank))
      lanesOf(cell, firstWord + pattern.words[unit]!, unit * map.pixelsPerUnit);
  });
  return columns;
}

function marksOf({ map }: Screen, { columns, lines, planes }: Place): PictureMark[] {
  const names = planes.map((at) => map.planes[at]!.name);
  const named = planes.length === map.planes.length ? {} : { planes: names };
  return extentsOf(columns, map.width).flatMap((x) =>
    extentsOf(lines, map.height).map((y) => markAt({ looks: 'wrong', ...named }, x, y)),
  );
}

function wordsOf({ map }: Screen, marks: readonly PictureMark[]): string[] {
  const byPlanes = new Map<string, { planes: number[]; places: string[] }>();
  for (const mark of marks) {
    const planes = planesOfMark(map, mark);
    const key = planes.join();
    const places = markOnGlass(map, mark).map((seen) => placeOfMarkWords(map, seen));
    const before = byPlanes.get(key);
    if (before === undefined) byPlanes.set(key, { planes, places });
    else before.places.push(...places);
  }
  return [...byPlanes.values()].map(({ planes, places }) => {
    const more = places.length > mostPlaces ? `; and ${places.length - mostPlaces} more places` : '';
    return `${places.slice(0, mostPlaces).join('; ')}${more}: ${faultWords(map, planes)}`;
  });
}
