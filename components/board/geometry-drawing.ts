import { sketchScale } from '@/components/theme/sketch-scale';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import type { Box, Point } from './geometry';
import type { Fit } from './geometry-fit';
import { heldShort, type Axes } from './geometry-grid';
import { commonLabelSize, fitLabel, fitWords, letterWidth, wrapWords, type FittedText } from './geometry-label';
import { shares } from './geometry-marks';
import type { Scene, ScenePart, SceneSocket, TargetKey } from './geometry-scene';
import { partWordings } from './words';

/** A socket ready to be drawn, in px; what lies inside it counts from its centre. */
export interface SocketDrawing {
  readonly key: TargetKey;
  /** Its label as the board prints it. */
  readonly name: string;
  /** Place in the document's list. */
  readonly at: number;
  readonly box: Box;
  readonly pin1: Point;
  readonly notch: Point;
  /** Where letters may stand, clear of notch, dot and sides. */
  readonly area: Box;
  /** Null where the socket is too small for letters. */
  readonly label: FittedText | null;
  /** What neither side of the sketch tells: "C 5". */
  readonly caption: FittedText | null;
}

/** A shared part ready to be drawn, in px. */
export interface PartDrawing {
  readonly key: TargetKey;
  /** Its label as the board prints it. */
  readonly name: string;
  /** Place in the document's list. */
  readonly at: number;
  readonly box: Box;
  /** Read from below, because it is narrow. */
  readonly turned: boolean;
  readonly label: FittedText | null;
  /** What it is, beside the label where there is no room under it. */
  readonly beside: FittedText | null;
  /** What it is, in lines under the label. */
  readonly lines: readonly string[];
}

const { leastLabel, greatestLabel, leastWords, words, gap } = sketchScale;

/** Share of a socket's width that letters take at most; on a small one they need it nearly all. */
const widest = { usual: 0.8, small: 0.93, smallSide: 28 };
/** Greatest size of a label as a share of the height of its socket, alone and over a caption. */
const tallest = { alone: 0.34, overCaption: 0.27 };
/** Height of a line of label or caption as a share of its letters. */
const lineHeight = 1.2;
/** Room between the dashes of a shared part and its letters, px. */
export const partPad = gap.small + gap.hair;
/** Least size of a part's label that is read at ease. */
const easyLabel = 10;

/** Where letters may stand on a socket, from its centre. */
function textArea({ width, height }: Box, notch: Point): Box {
  const side = Math.min(width, height);
  const cut = notch.x === 0 ? 0 : shares.notch * side;
  return {
    x: (-notch.x * cut) / 2,
    y: 0,
    width: width * (side < widest.smallSide ? widest.small : widest.usual) - cut,
    height: height - 2 * (shares.pin1 + 0.04) * side,
  };
}

/** Words that fit under the label of a socket; null where there is no room. */
export function fitCaption(
  wordings: readonly string[],
  { area, most = words }: { area: Box; most?: number },
): FittedText | null {
  if (wordings.length === 0 || area.height < lineHeight * (leastLabel + leastWords)) return null;
  return fitWords(wordings, {
    width: area.width,
    least: leastWords,
    most: Math.min(most, words, area.height * 0.36),
  });
}

/** Ways to say what the sides do not tell, the longest first, each shorter one in the same place of the list. */
function captionWordings(index: LayoutIndex, at: number, untold: { bank: boolean; bit: boolean }): readonly string[] {
  const { banks, bits } = heldShort(index, at);
  const bit = bits === null || !untold.bit ? '' : `${/[– ]/.test(bits) ? 'bits' : 'bit'} ${bits}`;
  if (!untold.bank) return bit === '' ? [] : [bit, bits ?? ''];
  return bit === '' ? [`bank ${banks}`, banks] : [`${banks} ${bit}`, `${banks} ${bits}`, banks];
}

/** Captions of all sockets, worded alike: the longest wording that fits nearly all of them. */
function captionsOf(wordings: readonly (readonly string[])[], areas: readonly Box[]): readonly (FittedText | null)[] {
  const levels = Math.max(0, ...wordings.map(({ length }) => length));
  const speaking = wordings.filter(({ length }) => length > 0).length;
  for (let level = 0; level < levels; level++) {
    const fitted = wordings.map((list, at) => fitCaption(list.slice(level), { area: areas[at] as Box }));
    const asWorded = fitted.filter((caption, at) => caption?.text === wordings[at]?.[level]).length;
    if (asWorded < 0.9 * speaking && level < levels - 1) continue;
    const most = commonLabelSize(
      fitted.flatMap((caption) => (caption ? [caption.size] : [])),
      { least: leastWords, most: words },
    );
    return fitted.map((caption) => caption && { ...caption, size: Math.min(caption.size, most) });
  }
  return wordings.map(() => null);
}

/** The sockets of a scene as they are drawn in a fit. `tellAll`: the names at the sides may be out of sight. */
export function drawSockets(
  index: LayoutIndex,
  { scene, axes, fit, tellAll }: { scene: Scene; axes: Axes; fit: Fit; tellAll: boolean },
): readonly SocketDrawing[] {
  const { sockets } = scene;
  const boxes = sockets.map(({ box }) => fit.toPx(box));
  const areas = boxes.map((box, n) => textArea(box, (sockets[n] as SceneSocket).notch));
  const all = { bank: true, bit: true };
  const captions = captionsOf(
    sockets.map(({ at }) => captionWordings(index, at, tellAll ? all : (axes.untold[at] ?? all))),
    areas,
  );
  const most = greatestLabel * Math.max(1, fit.scale / 10);
  const common = commonLabelSize(
    sockets.map(({ label }, n) =>
      Math.min(
        (boxes[n] as Box).height * (captions[n] ? tallest.overCaption : tallest.alone),
        (areas[n] as Box).width / letterWidth(label, 'mono'),
      ),
    ),
    { least: leastLabel, most },
  );
  return sockets.map(({ key, at, label, pin1, notch }, n) => {
    const area = areas[n] as Box;
    const box = boxes[n] as Box;
    const fitted =
      box.height < leastLabel * 1.4 ? null : fitLabel(label, { width: area.width, least: leastLabel, most: common });
    return { key, name: label, at, box, pin1, notch, area, label: fitted, caption: fitted && (captions[n] ?? null) };
  });
}

/** Middles of a label and of a caption under it, down from the middle of the socket. */
export function textLines(label: FittedText, caption: FittedText | null): { label: number; caption: number } {
  if (!caption) return { label: 0, caption: 0 };
  const whole = lineHeight * (label.size + caption.size);
  return {
    label: -whole / 2 + (lineHeight * label.size) / 2,
    caption: whole / 2 - (lineHeight * caption.size) / 2,
  };
}

type PartText = Pick<PartDrawing, 'label' | 'beside' | 'lines'>;

function partText(label: string, wordings: readonly string[], size: { width: number; height: number }): PartText {
  const width = size.width - 2 * partPad;
  const most = Math.min(words + 2, size.height * 0.6);
  const fitted = most < leastLabel ? null : fitLabel(label, { width, least: leastLabel, most });
  if (!fitted) return { label: null, beside: null, lines: [] };
  const letters = words - 2;
  const room = Math.floor((size.height - fitted.size * lineHeight - gap.small) / (letters * lineHeight));
  for (const text of wordings) {
    const lines = wrapWords(text, { width, size: letters, lines: room });
    if (lines) return { label: fitted, beside: null, lines };
  }
  const left = width - letterWidth(fitted.text, 'mono') * fitted.size - gap.middle;
  const beside = fitWords(wordings, { width: left, least: leastWords, most: letters });
  return { label: fitted, beside, lines: [] };
}

const worth = ({ label, beside, lines }: PartText) =>
  (label && label.size >= easyLabel ? 2 : label ? 1 : 0) + (beside || lines.length > 0 ? 1 : 0);

/** The shared parts of a scene as they are drawn in a fit. */
export function drawParts(index: LayoutIndex, scene: Scene, fit: Fit): readonly PartDrawing[] {
  return scene.parts.map(({ key, at, label, box: lies }: ScenePart) => {
    const box = fit.toPx(lies);
    const part = index.document.sharedParts[at];
    const wordings = part ? partWordings(part) : [];
    const upright = partText(label, wordings, box);
    const along = partText(label, wordings, { width: box.height, height: box.width });
    const turned = box.height > box.width && worth(along) > worth(upright);
    return { key, name: label, at, box, turned, ...(turned ? along : upright) };
  });
}

/** Where the labels of sockets and shared parts stand on the drawing, px; nothing may lie on them. */
export function lettersOf(sockets: readonly SocketDrawing[], parts: readonly PartDrawing[]): readonly Box[] {
  const widthOf = (label: FittedText) => letterWidth(label.text, 'mono') * label.size;
  const onSockets = sockets.flatMap(({ box, area, label, caption }) =>
    label
      ? [{ x: box.x + area.x, y: box.y + textLines(label, caption).label, width: widthOf(label), height: label.size }]
      : [],
  );
  const onParts = parts.flatMap(({ box, label, lines, turned }) => {
    if (!label) return [];
    const length = turned ? box.height : box.width;
    const along = box.height > box.width && !turned ? 0 : -length / 2 + partPad + widthOf(label) / 2;
    const down = lines.length === 0 ? 0 : (-lines.length * (words - 2) * lineHeight) / 2;
    return turned
      ? [{ x: box.x + down, y: box.y - along, width: label.size, height: widthOf(label) }]
      : [{ x: box.x + along, y: box.y + down, width: widthOf(label), height: label.size }];
  });
  return [...onSockets, ...onParts];
}
