import type { Scene, ScenePart, SceneSocket } from './geometry-scene';
import { readingOrder } from './geometry-nearest';
import type { SketchMarks } from './sketch-types';

/** What the sketch goes to: the best rank of all; without ranks the first socket that did not answer; else nothing. */
export function firstSuspect(scene: Scene, marks: SketchMarks): SceneSocket | ScenePart | null {
  let best: SceneSocket | ScenePart | null = null;
  let least = Infinity;
  const consider = (item: SceneSocket | ScenePart, rank: number | undefined) => {
    if (rank !== undefined && rank < least) [best, least] = [item, rank];
  };
  for (const socket of scene.sockets) consider(socket, marks.sockets.get(socket.label)?.rank);
  for (const part of scene.parts) consider(part, marks.sharedParts.get(part.label)?.rank);
  if (best !== null) return best;
  const failed = scene.sockets.filter(({ label }) => marks.sockets.get(label)?.state === 'failed');
  return readingOrder(failed)[0] ?? null;
}
