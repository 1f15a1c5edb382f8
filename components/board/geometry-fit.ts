import { scaleLinear } from 'd3-scale';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { Box, Point } from './geometry';
import type { Axes } from './geometry-grid';
import { letterWidth } from './geometry-label';
import type { Scene } from './geometry-scene';
import type { SketchView } from './sketch-types';

/** The board laid into a container: everything in px. */
export interface Fit {
  /** Px a sketch unit. */
  readonly scale: number;
  /** Size of the whole drawing; larger than the container when zoomed. */
  readonly width: number;
  readonly height: number;
  readonly toPx: (box: Box) => Box;
  readonly toUnits: (point: Point) => Point;
  /** Where the array itself lies in the drawing. */
  readonly array: Box;
  /** Where the names at the left begin, and how wide they may be. */
  readonly namesAt: number;
  readonly namesWidth: number;
  /** From the array to the line of the connector. */
  readonly edgeAway: number;
}

/** What a fit depends on. */
export interface FitInput {
  readonly scene: Scene;
  readonly axes: Axes;
  /** Width of the container, px. */
  readonly width: number;
  readonly greatestHeight: number;
  /** The connector is drawn. */
  readonly edge: boolean;
}

interface Margins {
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
  readonly left: number;
  readonly namesAt: number;
  readonly namesWidth: number;
  readonly edgeAway: number;
}

/** Room for names, connector and rings around the array, px. */
function marginsOf({ scene, axes, edge }: FitInput): Margins {
  const { margin, axis, axisStrong, gap, words, greatestNames, namesGap } = sketchScale;
  const strong = (axes.rows?.names ?? []).map(({ text }) => letterWidth(text, 'mono') * axisStrong);
  const kinds = [axes.rows, axes.columns].map((side) => (side ? letterWidth(side.kind, 'text') * words : 0));
  const namesWidth = Math.min(greatestNames, Math.max(...strong, ...kinds));
  const beside = edge && scene.edge === 'left' ? gap.small : 0;
  const gutter = namesWidth > 0 ? namesWidth + gap.small + beside : 0;
  const header = axes.columns ? axis : 0;
  const strip = (side: Scene['edge']) => (edge && scene.edge === side ? sketchScale.edge : 0);
  return {
    top: margin + header + strip('top'),
    right: margin + strip('right'),
    bottom: margin + strip('bottom'),
    left: (gutter > 0 ? gutter + namesGap : margin) + strip('left'),
    namesAt: strip('left') + beside,
    namesWidth,
    edgeAway:
      margin + { top: header, left: gutter > 0 ? gutter + namesGap - margin : 0, right: 0, bottom: 0 }[scene.edge],
  };
}

/** Px a sketch unit at which the whole board is in sight. Never larger than what suits a usual socket. */
export function wholeScale(input: FitInput): number {
  const { scene, width, greatestHeight } = input;
  const margins = marginsOf(input);
  const across = Math.max(1, width - margins.left - margins.right) / Math.max(scene.bounds.width, 1e-6);
  const down = Math.max(1, greatestHeight - margins.top - margins.bottom) / Math.max(scene.bounds.height, 1e-6);
  return Math.min(across, down, sketchScale.greatestSocket / Math.max(scene.side, 1e-6));
}

/** How many times larger than whole the sketch can be made; 1 where the board is large in sight already. */
export function greatestZoom(input: FitInput): number {
  return Math.max(1, sketchScale.closestSocket / (input.scene.side * wholeScale(input)));
}

/** Going to the suspect is seen to do something, even where it was large enough before. */
const closer = 1.4;

/** How many times larger than whole a view is. */
export function zoomFactor(zoom: SketchView['zoom'], input: FitInput): number {
  if (zoom === 'whole') return 1;
  const readable = sketchScale.readableSocket / (input.scene.side * wholeScale(input));
  const wanted = zoom === 'suspect' ? Math.max(closer, readable) : zoom;
  return Math.min(greatestZoom(input), Math.max(1, Number.isFinite(wanted) ? wanted : 1));
}

/** Lays a scene into a container at a zoom. */
export function fitScene(input: FitInput, factor: number): Fit {
  const { bounds } = input.scene;
  const margins = marginsOf(input);
  const scale = wholeScale(input) * factor;
  const array = {
    x: margins.left + (bounds.width * scale) / 2,
    y: margins.top + (bounds.height * scale) / 2,
    width: bounds.width * scale,
    height: bounds.height * scale,
  };
  // A domain that starts and ends at one point would map everything to its middle.
  const x = scaleLinear([bounds.x, bounds.x + 1], [array.x, array.x + scale]);
  const y = scaleLinear([bounds.y, bounds.y + 1], [array.y, array.y + scale]);
  return {
    scale,
    width: margins.left + array.width + margins.right,
    height: margins.top + array.height + margins.bottom,
    toPx: (box) => ({ x: x(box.x), y: y(box.y), width: box.width * scale, height: box.height * scale }),
    toUnits: (point) => ({ x: x.invert(point.x), y: y.invert(point.y) }),
    array,
    namesAt: margins.namesAt,
    namesWidth: margins.namesWidth,
    edgeAway: margins.edgeAway,
  };
}
