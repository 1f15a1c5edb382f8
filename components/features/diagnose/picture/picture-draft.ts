import { glassSize, markInMemory, markOnGlass } from '@/lib';
import type { Picture, PictureMark, ScreenMap } from '@/shared';

/** What a mark is drawn as: it decides what a finger on the screen sets, and which figures are asked for. */
export type FaultShape = 'columns' | 'lines' | 'dots' | 'whole';

export const faultShapes = [
  { value: 'columns', label: 'Columns' },
  { value: 'lines', label: 'A band of lines' },
  { value: 'dots', label: 'Dots' },
  { value: 'whole', label: 'Everywhere' },
] as const satisfies readonly { value: FaultShape; label: string }[];

/** One mark as it is being made, in columns and lines of the glass. */
export interface MarkDraft {
  readonly shape: FaultShape;
  readonly mark: PictureMark;
}

/** The marks of a picture as they are being made. */
export interface PictureDraft {
  /** At least one. */
  readonly marks: readonly MarkDraft[];
  /** The mark in hand. */
  readonly at: number;
  readonly rest: Picture['rest'];
}

/** A place on the glass, in columns and lines. */
export interface GlassPoint {
  readonly x: number;
  readonly y: number;
}

/** How often a bit of a word comes again along a line, and which way its lines lie on the glass. */
function repeatOf(map: ScreenMap): { x?: number; y?: number } {
  const size = map.turn % 2 === 1 ? map.height : map.width;
  if (map.pixelsPerUnit < 2 || map.pixelsPerUnit >= size) return {};
  return map.turn % 2 === 1 ? { y: map.pixelsPerUnit } : { x: map.pixelsPerUnit };
}

/** A mark before anything of it is said. On a screen of several planes it names none yet, so that one must be chosen. */
export function newMark(map: ScreenMap, shape: FaultShape): MarkDraft {
  return shaped(map, shape, { looks: 'wrong', ...(map.planes.length > 1 ? { planes: [] } : {}) });
}

function shaped(map: ScreenMap, shape: FaultShape, like: Pick<PictureMark, 'looks' | 'planes'>): MarkDraft {
  const said = { looks: like.looks, ...(like.planes === undefined ? {} : { planes: like.planes }) };
  const { width, height } = glassSize(map);
  const repeat = repeatOf(map);
  const all = { x: [0, width - 1] as [number, number], y: [0, height - 1] as [number, number] };
  switch (shape) {
    case 'columns':
      return { shape, mark: { ...said, ...all, x: [0, 0], ...(repeat.x === undefined ? {} : { everyX: repeat.x }) } };
    case 'lines':
      return {
        shape,
        mark: {
          ...said,
          ...all,
          y: repeat.y === undefined ? [0, Math.max(0, Math.ceil(height / 4) - 1)] : [0, 0],
          ...(repeat.y === undefined ? {} : { everyY: repeat.y }),
        },
      };
    case 'dots':
      return { shape, mark: { ...said, x: [width >> 1, width >> 1], y: [height >> 1, height >> 1] } };
    case 'whole':
      return { shape, mark: { ...said, ...all } };
  }
}

/** A draft to begin with: one mark of columns, or the marks of a picture that is being changed. */
export function newDraft(map: ScreenMap, before?: Picture): PictureDraft {
  if (before === undefined) return { marks: [newMark(map, 'columns')], at: 0, rest: 'right' };
  const marks = before.marks.flatMap((mark) => markOnGlass(map, mark));
  return { marks: marks.map((mark) => ({ shape: shapeOf(map, mark), mark })), at: 0, rest: before.rest };
}

function shapeOf(map: ScreenMap, mark: PictureMark): FaultShape {
  const { width, height } = glassSize(map);
  const wide = mark.x[0] === 0 && mark.x[1] >= width - 1;
  const high = mark.y[0] === 0 && mark.y[1] >= height - 1;
  if (wide) return high ? 'whole' : 'lines';
  return high || mark.everyX !== undefined ? 'columns' : 'dots';
}

/** The mark in hand. */
export const inHand = ({ marks, at }: PictureDraft): MarkDraft => marks[at] as MarkDraft;

/** The draft with another mark in the place of the one in hand. */
export function withMark(draft: PictureDraft, mark: MarkDraft): PictureDraft {
  return { ...draft, marks: draft.marks.map((each, at) => (at === draft.at ? mark : each)) };
}

/** The mark in hand in another shape; how it looks and its planes stay. */
export function withShape(map: ScreenMap, draft: PictureDraft, shape: FaultShape): PictureDraft {
  return withMark(draft, shaped(map, shape, inHand(draft).mark));
}

/** One more mark, which is then in hand; it looks like the one before. */
export function withNewMark(map: ScreenMap, draft: PictureDraft): PictureDraft {
  const { shape, mark } = inHand(draft);
  return { ...draft, marks: [...draft.marks, shaped(map, shape, mark)], at: draft.marks.length };
}

/** Without the mark in hand; the last one is never taken out. */
export function withoutMark(draft: PictureDraft): PictureDraft {
  if (draft.marks.length === 1) return draft;
  return { ...draft, marks: draft.marks.filter((_, at) => at !== draft.at), at: Math.max(0, draft.at - 1) };
}

const ordered = (a: number, b: number): [number, number] => (a <= b ? [a, b] : [b, a]);

/**
 * The mark after a finger has gone from one place of the glass to another. Columns: the first place picks the column,
 * a long way down also the lines. Lines: the band between both. Dots: the box between both.
 */
export function drawn(
  map: ScreenMap,
  { shape, mark }: MarkDraft,
  [from, to]: readonly [GlassPoint, GlassPoint],
): MarkDraft {
  const { height } = glassSize(map);
  switch (shape) {
    case 'whole':
      return { shape, mark };
    case 'dots':
      return { shape, mark: { ...mark, x: ordered(from.x, to.x), y: ordered(from.y, to.y) } };
    case 'lines': {
      const first = mark.everyY === undefined ? from.y : from.y % mark.everyY;
      return { shape, mark: { ...mark, y: mark.everyY === undefined ? ordered(from.y, to.y) : [first, first] } };
    }
    case 'columns': {
      const first = mark.everyX === undefined ? from.x : from.x % mark.everyX;
      const last = mark.everyX === undefined ? to.x : first;
      const far = Math.abs(to.y - from.y) * 10 >= height;
      return { shape, mark: { ...mark, x: ordered(first, last), ...(far ? { y: ordered(from.y, to.y) } : {}) } };
    }
  }
}

/** What is still missing of a draft, in words; null where it can be used. */
export function draftProblem({ marks }: PictureDraft): string | null {
  const without = marks.findIndex(({ mark }) => mark.planes?.length === 0);
  if (without < 0) return null;
  return `${marks.length === 1 ? '' : `Mark ${without + 1}: `}say which colour is wrong there.`;
}

/** More marks than this cannot be sent. */
export const mostMarks = 64;

/** The draft as evidence: its marks in pixels of the memory. */
export function pictureOf(map: ScreenMap, { marks, rest }: PictureDraft): Picture {
  return { kind: 'picture', marks: marks.flatMap(({ mark }) => markInMemory(map, mark)), rest };
}
