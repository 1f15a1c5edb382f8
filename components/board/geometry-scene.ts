import type { LayoutIndex } from '@/lib/layout/layout-index';
import type { SharedPart, Socket } from '@/shared';
import {
  boundsOf,
  compose,
  medianOf,
  orient,
  orientBox,
  orientEdge,
  type Box,
  type Edge,
  type Orientation,
  type Point,
} from './geometry';
import type { PickTarget, SketchView } from './sketch-types';

/** Name of a target among all of a sketch; sockets and shared parts may carry the same label. */
export type TargetKey = `socket:${string}` | `shared-part:${string}`;

/** A socket as it lies in the view, in sketch units. */
export interface SceneSocket {
  readonly key: TargetKey;
  readonly label: string;
  /** Place in the document's list. */
  readonly at: number;
  readonly box: Box;
  /** Corner of pin 1: each sign -1 or 1. */
  readonly pin1: Point;
  /** Side of the notch: a unit vector. */
  readonly notch: Point;
}

/** A shared part as it lies in the view, in sketch units. */
export interface ScenePart {
  readonly key: TargetKey;
  readonly label: string;
  readonly at: number;
  readonly box: Box;
}

/** The board as it lies in a view, in sketch units. */
export interface Scene {
  readonly sockets: readonly SceneSocket[];
  readonly parts: readonly ScenePart[];
  readonly bounds: Box;
  /** Usual short side of a socket. */
  readonly side: number;
  readonly edge: Edge;
}

/** The name of what was picked. */
export function keyOf({ kind, label }: PickTarget): TargetKey {
  return `${kind}:${label}`;
}

/** How the document's drawing is laid down in a view: mirrored when looked at from its other side. */
export function orientationOf(index: LayoutIndex, view: Pick<SketchView, 'turn' | 'solderSide'>): Orientation {
  const drawnFromSolderSide = index.document.board.view.side === 'solder';
  return { turn: view.turn, mirrored: view.solderSide !== drawnFromSolderSide };
}

const corners: Record<Socket['pin1'], Point> = {
  'top-left': { x: -1, y: -1 },
  'top-right': { x: 1, y: -1 },
  'bottom-left': { x: -1, y: 1 },
  'bottom-right': { x: 1, y: 1 },
};

/** Corner of pin 1 and side of the notch of a socket in a view. The notch is at the end of the long axis where pin 1 is. */
export function pin1Of(socket: Pick<Socket, 'pin1' | 'turn' | 'width' | 'height'>, view: Orientation) {
  const whole = compose({ turn: socket.turn, mirrored: false }, view);
  const corner = corners[socket.pin1];
  const notch = socket.height >= socket.width ? { x: 0, y: corner.y } : { x: corner.x, y: 0 };
  return { pin1: orient(whole, corner), notch: orient(whole, notch) };
}

function ownBox(item: Point & Pick<Socket, 'turn' | 'width' | 'height'>): Box {
  const { width, height } = orientBox({ turn: item.turn, mirrored: false }, { ...item, x: 0, y: 0 });
  return { x: item.x, y: item.y, width, height };
}

const partGap = 4;

/** Boxes of the shared parts on the document's drawing; those without a place stand in rows under everything else. */
export function placeParts(parts: readonly SharedPart[], sockets: readonly Box[]): readonly Box[] {
  const placed = parts.map((part) =>
    part.x === undefined || part.y === undefined ? null : ownBox({ ...part, x: part.x, y: part.y }),
  );
  const above = boundsOf([...sockets, ...placed.filter((box) => box !== null)]);
  const left = above.x - above.width / 2;
  let [x, y, rowHeight] = [left, above.y + above.height / 2 + partGap, 0];
  return parts.map((part, at) => {
    const known = placed[at];
    if (known) return known;
    const { width, height } = ownBox({ ...part, x: 0, y: 0 });
    if (x > left && x + width > left + above.width) [x, y, rowHeight] = [left, y + rowHeight + partGap, 0];
    const box = { x: x + width / 2, y: y + height / 2, width, height };
    x += width + partGap;
    rowHeight = Math.max(rowHeight, height);
    return box;
  });
}

/** Lays the board down in a view. */
export function buildScene(index: LayoutIndex, view: Pick<SketchView, 'turn' | 'solderSide'>): Scene {
  const { document } = index;
  const by = orientationOf(index, view);
  const drawn = document.sockets.map(ownBox);
  const sockets = document.sockets.map((socket, at): SceneSocket => ({
    key: keyOf({ kind: 'socket', label: socket.label }),
    label: socket.label,
    at,
    box: orientBox(by, drawn[at] as Box),
    ...pin1Of(socket, by),
  }));
  const parts = placeParts(document.sharedParts, drawn).map((box, at): ScenePart => {
    const { label } = document.sharedParts[at] as SharedPart;
    return { key: keyOf({ kind: 'shared-part', label }), label, at, box: orientBox(by, box) };
  });
  return {
    sockets,
    parts,
    bounds: boundsOf([...sockets, ...parts].map(({ box }) => box)),
    side: medianOf(sockets.map(({ box }) => Math.min(box.width, box.height))),
    edge: orientEdge(by, document.board.view.edge),
  };
}
