import type { Picture, PictureMark, ScreenMap } from '@/shared';
import { listWords } from '../layout/words';
import { colourFault } from './colours';
import { placesOf, type Extent } from './extent';
import { columnsOf, glassSize, linesOf, markOnGlass } from './turn';

const ordinals = [
  'second',
  'third',
  'fourth',
  'fifth',
  'sixth',
  'seventh',
  'eighth',
  'ninth',
  'tenth',
  'eleventh',
  'twelfth',
  'thirteenth',
  'fourteenth',
  'fifteenth',
  'sixteenth',
];

function ordinal(n: number): string {
  const word = ordinals[n - 2];
  if (word !== undefined) return word;
  const teen = n % 100 >= 11 && n % 100 <= 13;
  return `${n}${teen ? 'th' : (['th', 'st', 'nd', 'rd'][n % 10] ?? 'th')}`;
}

/**
 * Columns or lines in words: "every eighth column from column 2", "lines 96 to 191"; null where it is all of them.
 * Columns and lines are counted from 0.
 */
export function extentWords(name: 'column' | 'line', extent: Extent, size: number): string | null {
  const places = placesOf(extent, size);
  if (places.length === size) return null;
  const { from, every, until } = extent;
  const to = Math.min(extent.to, size - 1);
  const span = from === to ? `${name} ${from}` : `${name}s ${from} to ${to}`;
  if (every === undefined || from + every >= Math.min(size, (until ?? size) + 1)) return span;
  const end = until === undefined || until >= size - 1 ? '' : `, as far as ${name} ${until}`;
  if (every <= to - from + 1) return `${name}s ${from} to ${Math.min(until ?? size - 1, size - 1)}`;
  if (from === to) return `every ${ordinal(every)} ${name} from ${name} ${from}${end}`;
  return `${to - from + 1} ${name}s of every ${every} from ${name} ${from}${end}`;
}

/** The planes that a mark names, by number; all where it names none. */
export function planesOfMark(map: ScreenMap, { planes }: Pick<PictureMark, 'planes'>): number[] {
  const named = planes?.map((name) => name.trim().toLowerCase());
  return map.planes.flatMap(({ name }, at) => ((named?.includes(name.trim().toLowerCase()) ?? true) ? [at] : []));
}

/** What is wrong at a mark: "magenta in place of white", "dots of the plane type wrong". */
function looksWords(map: ScreenMap, mark: Pick<PictureMark, 'looks' | 'planes'>): string {
  const planes = planesOfMark(map, mark);
  if (planes.length === 0) return 'wrong';
  const { missing, lit } = colourFault(map, planes);
  if (mark.looks === 'missing') return missing;
  if (mark.looks === 'lit') return lit;
  if (map.planes.length === 1) return 'wrong';
  if (planes.length === map.planes.length) return 'wrong in every plane';
  return `wrong in ${listWords(planes.map((at) => map.planes[at]!.name))}`;
}

/** Where on the glass a mark lies: "every eighth column from column 2, lines 96 to 191"; "the whole picture" for all. */
export function placeOfMarkWords(map: ScreenMap, onGlass: PictureMark): string {
  const { width, height } = glassSize(map);
  const where = [extentWords('column', columnsOf(onGlass), width), extentWords('line', linesOf(onGlass), height)];
  const told = where.filter((words) => words !== null);
  return told.length === 0 ? 'the whole picture' : told.join(', ');
}

/** A mark of the memory in the words of the glass: one text for each piece that it is seen as. */
export function markWords(map: ScreenMap, mark: PictureMark): string[] {
  return markOnGlass(map, mark).map((seen) => `${placeOfMarkWords(map, seen)}, ${looksWords(map, mark)}`);
}

/** A picture as evidence in words: its marks, and what of the rest. */
export function pictureWords(map: ScreenMap, { marks, rest }: Picture): { text: string; note: string } {
  const text = listOfMarks(marks.flatMap((mark) => markWords(map, mark)));
  return { text, note: rest === 'right' ? 'the rest of the picture is right' : 'the rest of it was not looked at' };
}

function listOfMarks(words: readonly string[], most = 3): string {
  const shown = words.slice(0, most).join('; ');
  return words.length > most ? `${shown}; and ${words.length - most} more` : shown;
}

/** What a fault of these planes looks like, whichever way their bits read. */
export function faultWords(map: ScreenMap, planes: readonly number[]): string {
  const { missing, lit } = colourFault(map, planes);
  return `${missing} where they read 0, ${lit} where they read 1`;
}
