import type { Picture, PictureMark } from '@/shared';
import { lane, type Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { listWords } from '../layout/words';
import { chipEnds, chipsOfLine, piecesOf, segmentAt } from './chips-of-line';
import { covers, placesOf } from './extent';
import { lineOf, screenOf, type LinePattern, type Screen } from './screen';
import { columnsOf, linesOf } from './turn';

/** A lane that the marks of a picture show as failing. */
export interface MarkedLane {
  readonly lane: Lane;
  /** What its bits read as: dots that are missing read 0, dots that should be dark read 1. */
  readonly reads: 'zero' | 'one' | 'unknown';
  /** Words of the lane that a mark covers. */
  readonly words: number;
  /** Words of the lane that the screen shows; the mark covers words / shown of them. */
  readonly shown: number;
  /**
   * Chips behind the lane that hold a marked word, and chips of which words were seen to be right and none is marked:
   * masks over `segmentsOf`. Both 0 where one chip holds the whole lane.
   */
  readonly failingSegments: number;
  readonly rightSegments: number;
}

/** What the marks of a picture say of the lanes. */
export interface LanesOfMarks {
  /** Ascending by lane. */
  readonly failing: readonly MarkedLane[];
  /** Lanes that were seen to be right, ascending. Lanes that the screen does not show are in neither list. */
  readonly passed: readonly Lane[];
  /** What could not be read, in words. Nothing is taken to have passed where there is one. */
  readonly problems: readonly string[];
}

interface ReadMark {
  readonly mark: PictureMark;
  readonly planes: ReadonlySet<number>;
}

/** The bits in which a mark is noted for a pixel, so that several marks on one pixel keep what each says. */
const noted = { missing: 1, lit: 2, wrong: 4 } as const;

/**
 * The lanes that the marks of a picture show as failing, and those that it shows to be right. A lit dot is taken to
 * be a 1. A word counts once however often the screen repeats its line, and fails where one of its pixels is marked.
 * Takes time in proportion to the pixels of lines that differ, not to all pixels. The same picture is read once: it
 * must not be changed afterwards.
 */
export function lanesOfMarks(index: LayoutIndex, picture: Picture): LanesOfMarks {
  const before = read.get(picture);
  if (before?.index === index) return before.lanes;
  const lanes = readMarks(index, picture);
  read.set(picture, { index, lanes });
  return lanes;
}

/** A diagnosis is made anew at each thing that is added, the pictures before it stay the same. */
const read = new WeakMap<Picture, { readonly index: LayoutIndex; readonly lanes: LanesOfMarks }>();

function readMarks(index: LayoutIndex, picture: Picture): LanesOfMarks {
  const screen = screenOf(index);
  if (screen === null)
    return { failing: [], passed: [], problems: ['This board has no screen map to read a picture with.'] };
  const problems: string[] = [];
  const marks = picture.marks.flatMap((mark, at) => readMark(screen, { mark, at, problems }));
  const shown = new Float64Array(index.laneCount);
  const words = new Float64Array(index.laneCount);
  const looks = new Uint8Array(index.laneCount);
  const shownSegments = new Uint32Array(index.laneCount);
  const markedSegments = new Uint32Array(index.laneCount);
  screen.planes.forEach((_, plane) => {
    const here = marks.filter(({ planes }) => planes.has(plane)).map(({ mark }) => mark);
    for (const { pattern, pixels, lines, word } of alikeLines({ screen, plane, marks: here, problems })) {
      const segment = segmentAt(index, word);
      forEachPixel(screen, pattern, (of, x) => {
        shown[of]! += lines;
        shownSegments[of]! |= segment(of);
        if (pixels === null || pixels[x] === 0) return;
        words[of]! += lines;
        looks[of]! |= pixels[x]!;
        markedSegments[of]! |= segment(of);
      });
    }
  });
  const failing = [...index.lanes].flatMap((n) =>
    words[n]! > 0
      ? [
          {
            lane: lane(n),
            reads: readsOf(looks[n]!),
            words: words[n]!,
            shown: shown[n]!,
            failingSegments: markedSegments[n]!,
            rightSegments: picture.rest === 'right' ? shownSegments[n]! & ~markedSegments[n]! : 0,
          },
        ]
      : [],
  );
  if (failing.length === 0 && problems.length === 0)
    problems.push('What is marked of the picture shows no memory of this board.');
  const right = picture.rest === 'right' && problems.length === 0;
  const passed = right ? [...index.lanes].filter((n) => shown[n]! > 0 && words[n] === 0).map(lane) : [];
  return { failing, passed, problems };
}

function readsOf(looks: number): MarkedLane['reads'] {
  if (looks === noted.missing) return 'zero';
  return looks === noted.lit ? 'one' : 'unknown';
}

const sameName = (a: string, b: string) => a.trim().toLowerCase() === b.trim().toLowerCase();

/** The planes that a mark names, by number; with a problem in words where a name is not one of the screen. */
function readMark(
  { map }: Screen,
  { mark, at, problems }: { mark: PictureMark; at: number; problems: string[] },
): ReadMark[] {
  const which = `Mark ${at + 1}`;
  const names = map.planes.map(({ name }) => name);
  const unknown = (mark.planes ?? []).filter((name) => !names.some((known) => sameName(known, name)));
  if (unknown.length > 0) {
    const quoted = listWords(unknown.map((name) => `"${name}"`));
    problems.push(
      `${which} names ${quoted}; the picture of this board has the plane${names.length === 1 ? '' : 's'} ${listWords(names)}.`,
    );
  }
  if (mark.x[0] >= map.width || mark.y[0] >= map.height) {
    problems.push(`${which} lies outside the picture, which has ${map.width} columns and ${map.height} lines.`);
    return [];
  }
  const planes = names.flatMap((name, plane) =>
    mark.planes === undefined || mark.planes.some((wanted) => sameName(wanted, name)) ? [plane] : [],
  );
  return [{ mark, planes: new Set(planes) }];
}

/** Lines that show the same lanes and carry the same marks. */
interface AlikeLines {
  readonly pattern: LinePattern;
  /** What is noted for each column; null where nothing is. */
  readonly pixels: Uint8Array | null;
  /** How many lines of different words there are. */
  readonly lines: number;
  /** A word of theirs; all of them are behind the same chips. */
  readonly word: number;
}

interface Asked {
  readonly screen: Screen;
  readonly plane: number;
  readonly marks: readonly PictureMark[];
  readonly problems: string[];
}

/** Units of lines that resemble no other which are followed one by one; a layout without mistakes needs a few. */
const mostSingleUnits = 500_000;

function* alikeLines({ screen, plane, marks, problems }: Asked): Generator<AlikeLines> {
  let single = 0;
  const ends = chipEnds(screen.index);
  const groups = new Map<LinePattern, Map<string, { lines: number; word: number; marked: string }>>();
  const pixelsOf = new Map<string, Uint8Array | null>();
  const pixels = (marked: string) => {
    if (!pixelsOf.has(marked)) pixelsOf.set(marked, markedPixels(screen, marks, marked));
    return pixelsOf.get(marked) ?? null;
  };
  for (const [line, marked] of markedLines(screen, marks)) {
    const here = lineOf(screen, screen.planes[plane]!, line);
    const chips = chipsOfLine(ends, here);
    if (!here.shared || chips === null) {
      single += screen.shownUnits;
      if (single > mostSingleUnits) {
        const name = screen.map.planes[plane]!.name;
        problems.push(
          `The lines of the plane ${name} lie too irregularly in memory; they are read down to line ${line}.`,
        );
        break;
      }
      for (const piece of piecesOf(ends, here)) yield { ...piece, pixels: pixels(marked), lines: 1 };
      continue;
    }
    let ofPattern = groups.get(here.pattern);
    if (ofPattern === undefined) groups.set(here.pattern, (ofPattern = new Map()));
    const key = `${marked}/${chips}`;
    const before = ofPattern.get(key);
    if (before === undefined) ofPattern.set(key, { lines: 1, word: here.firstWord + here.pattern.least, marked });
    else before.lines++;
  }
  for (const [pattern, ofPattern] of groups) {
    for (const { lines, word, marked } of ofPattern.values()) yield { pattern, pixels: pixels(marked), lines, word };
  }
}

/** Each line of different words with the marks that it carries, a 1 for each; lines that repeat another are joined to it. */
function markedLines({ map, lineOffsets }: Screen, marks: readonly PictureMark[]): Iterable<[number, string]> {
  const extents = marks.map(linesOf);
  const firstAt = new Map<number, number>();
  const carried = new Map<number, string>();
  for (let line = 0; line < map.height; line++) {
    const here = extents.map((extent) => (covers(extent, line) ? '1' : '0')).join('');
    const first = firstAt.get(lineOffsets[line]!);
    if (first === undefined) {
      firstAt.set(lineOffsets[line]!, line);
      carried.set(line, here);
    } else {
      const before = carried.get(first)!;
      carried.set(first, [...here].map((one, at) => (one === '1' ? '1' : before[at])).join(''));
    }
  }
  return carried;
}

function markedPixels({ map }: Screen, marks: readonly PictureMark[], marked: string): Uint8Array | null {
  if (!marked.includes('1')) return null;
  const pixels = new Uint8Array(map.width);
  marks.forEach((mark, at) => {
    if (marked[at] !== '1') return;
    for (const column of placesOf(columnsOf(mark), map.width)) pixels[column]! |= noted[mark.looks];
  });
  return pixels;
}

function forEachPixel({ map }: Screen, { cells }: LinePattern, visit: (lane: number, x: number) => void): void {
  cells.forEach((cell, unit) => {
    if (cell === null) return;
    const left = unit * map.pixelsPerUnit;
    const seen = Math.min(map.pixelsPerUnit, map.width - left);
    for (let pixel = 0; pixel < seen; pixel++) if (cell.lanes[pixel]! >= 0) visit(cell.lanes[pixel]!, left + pixel);
  });
}
