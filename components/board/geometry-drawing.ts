import { sketchScale } from '@/components/theme/sketch-scale';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import type { Box, Point } from './geometry';
import type { Fit } from './geometry-fit';
import { heldShort, type Axes } from './geometry-grid';
import { commonLabelSize, fitLabel, fitWords, wrapWords, type FittedText } from './geometry-label';
import type { Scene, ScenePart, SceneSocket, TargetKey } from './geometry-scene';
import { partWordings } from './words';

/** A socket ready to be drawn, in px; what lies inside it counts from its centre. */
export interface SocketDrawing {
  readonly key: TargetKey;
  readonly at: number;
  readonly box: Box;
  readonly pin1: Point;
  readonly notch: Point;
  /** Null where the socket is too small for letters. */
  readonly label: FittedText | null;
  /** What neither side of the sketch tells: "C 5". */
  readonly caption: FittedText | null;
}

/** A shared part ready to be drawn, in px. */
export interface PartDrawing {
  readonly key: TargetKey;
  readonly at: number;
  readonly box: Box;
  readonly label: FittedText | null;
  /** What it is, in lines under the label. */
  readonly lines: readonly string[];
}

const { leastLabel, greatestLabel, leastWords, words, advance } = sketchScale;
/** Shares of a socket's size: the widest label, its greatest height without and with words under it. */
const share = { width: 0.9, height: 0.36, heightWithCaption: 0.27 };

/** Words that fit under the label of a socket; null where there is no room. */
export function fitCaption(wordings: readonly string[], box: Box): FittedText | null {
  if (box.height < 3 * leastWords) return null;
  return fitWords(wordings, {
    width: box.width * share.width,
    least: leastWords,
    most: Math.min(words, box.height * 0.2),
    advance: advance.text,
  });
}

function captionWordings(index: LayoutIndex, at: number, untold: { bank: boolean; bit: boolean }): readonly string[] {
  const { banks, bits } = heldShort(index, at);
  if (!untold.bank && !untold.bit) return [];
  if (!untold.bit) return [`bank ${banks}`, banks];
  const bit = /[– ]/.test(bits) ? `bits ${bits}` : `bit ${bits}`;
  return untold.bank ? [`${banks} ${bit}`, `${banks} ${bits}`, `${banks}`] : [bit, bits];
}

/** The sockets of a scene as they are drawn in a fit. `tellAll`: the names at the sides may be out of sight. */
export function drawSockets(
  index: LayoutIndex,
  { scene, axes, fit, tellAll }: { scene: Scene; axes: Axes; fit: Fit; tellAll: boolean },
): readonly SocketDrawing[] {
  const room = (box: Box, hasCaption: boolean) =>
    Math.min(
      greatestLabel * Math.max(1, fit.scale / 10),
      box.height * (hasCaption ? share.heightWithCaption : share.height),
    );
  const drawings = scene.sockets.map((socket: SceneSocket) => {
    const box = fit.toPx(socket.box);
    const untold = tellAll ? { bank: true, bit: true } : (axes.untold[socket.at] ?? { bank: true, bit: true });
    return { socket, box, caption: fitCaption(captionWordings(index, socket.at, untold), box) };
  });
  const common = commonLabelSize(
    drawings.map(({ socket, box, caption }) =>
      Math.min(room(box, caption !== null), (box.width * share.width) / ([...socket.label].length * advance.mono)),
    ),
    { least: leastLabel, most: greatestLabel * 2 },
  );
  return drawings.map(({ socket, box, caption }) => {
    const fitting = { width: box.width * share.width, least: leastLabel, most: common, advance: advance.mono };
    const label = box.height < leastLabel * 1.4 ? null : fitLabel(socket.label, fitting);
    const { key, at, pin1, notch } = socket;
    return { key, at, box, pin1, notch, label, caption: label && caption };
  });
}

/** The shared parts of a scene as they are drawn in a fit. */
export function drawParts(index: LayoutIndex, scene: Scene, fit: Fit): readonly PartDrawing[] {
  return scene.parts.map((part: ScenePart) => {
    const box = fit.toPx(part.box);
    const width = box.width - 2 * sketchScale.gap.small;
    const most = Math.min(words + 2, box.height * 0.6);
    const label =
      most < leastLabel ? null : fitLabel(part.label, { width, least: leastLabel, most, advance: advance.mono });
    const document = index.document.sharedParts[part.at];
    const size = sketchScale.words - 2;
    const lines = Math.floor((box.height - (label?.size ?? 0) * 1.3 - sketchScale.gap.small) / (size * 1.2));
    const wrapped = (document ? partWordings(document) : [])
      .map((text) => wrapWords(text, { width, size, advance: advance.text, lines }))
      .find((found) => found !== null);
    return { key: part.key, at: part.at, box, label, lines: label ? (wrapped ?? []) : [] };
  });
}
