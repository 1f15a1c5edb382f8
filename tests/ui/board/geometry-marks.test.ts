import { distanceToBox, type Box, type Point } from '@/components/board/geometry';
import { drawParts, drawSockets, lettersOf } from '@/components/board/geometry-drawing';
import { fitScene, zoomFactor } from '@/components/board/geometry-fit';
import { findAxes } from '@/components/board/geometry-grid';
import { badgePlace, hatchPath, notchPath, pin1Place, ringPath, tickPlace } from '@/components/board/geometry-marks';
import { buildScene } from '@/components/board/geometry-scene';
import { board, boards, lies } from './boards';

/** Ends of the strokes of a path. */
function pointsOf(path: string): Point[] {
  return path
    .split(/(?=[MCL])/)
    .map((piece) =>
      piece
        .match(/-?\d+(\.\d+)?/g)!
        .map(Number)
        .slice(-2),
    )
    .map(([x, y]) => ({ x: x!, y: y! }));
}

describe('nothing lies on a label', () => {
  const cases = [...boards].flatMap(([slug, index]) =>
    ([358, 720] as const).flatMap((width) =>
      (['whole', 'suspect'] as const).map((zoom) => ({ slug, index, width, zoom })),
    ),
  );

  test.each(cases)('$slug at $width px, $zoom: neither ring nor rank of any socket', ({ index, width, zoom }) => {
    const covered: string[] = [];
    for (const lie of lies) {
      const scene = buildScene(index, lie);
      const axes = findAxes(index, scene.sockets);
      const input = { scene, axes, width, greatestHeight: 640, edge: true };
      const fit = fitScene(input, zoomFactor(zoom, input));
      const sockets = drawSockets(index, { scene, axes, fit, tellAll: zoom === 'suspect' });
      const letters = lettersOf(sockets, drawParts(index, scene, fit));
      const clear = (at: Point, by: number) => letters.every((box) => distanceToBox(at, box) >= by - 1e-6);
      for (const { box, name } of sockets) {
        const badge = badgePlace(box, [10, 8], letters);
        if (!clear(badge, badge.radius)) covered.push(`rank of ${name}, ${lie.turn} ${lie.solderSide}`);
        const ring = pointsOf(ringPath(box, { from: -115, to: 270 }));
        if (!ring.every(({ x, y }) => clear({ x: box.x + x, y: box.y + y }, 0.5)))
          covered.push(`ring of ${name}, ${lie.turn} ${lie.solderSide}`);
      }
    }
    expect(covered).toEqual([]);
  });

  test('a label keeps clear of the notch and of pin 1', () => {
    for (const lie of lies) {
      const index = board('kestrup-lc-2-rev-d');
      const scene = buildScene(index, lie);
      const axes = findAxes(index, scene.sockets);
      const fit = fitScene({ scene, axes, width: 358, greatestHeight: 640, edge: true }, 1);
      for (const { box, notch, pin1, area } of drawSockets(index, { scene, axes, fit, tellAll: true })) {
        const marks: Point[] = [...pointsOf(notchPath(box, notch)), pin1Place(box, pin1)];
        const inner: Box = { ...area, width: area.width - 1, height: area.height - 1 };
        if (notch.x !== 0) for (const mark of marks) expect(distanceToBox(mark, inner)).toBeGreaterThan(0);
      }
    }
  });
});

describe('marks on a chip', () => {
  const chip = { width: 40, height: 50 };

  test('the tick never stands on pin 1', () => {
    for (const x of [-1, 1])
      for (const y of [-1, 1])
        for (const overCaption of [false, true]) {
          const pin1 = { x, y };
          const [dot, tick] = [pin1Place(chip, pin1), tickPlace(chip, { pin1, overCaption })];
          expect(Math.hypot(dot.x - tick.x, dot.y - tick.y)).toBeGreaterThan(12);
        }
  });

  test('hatching stays on its chip', () => {
    const strokes = pointsOf(hatchPath(chip, 6));
    expect(strokes.length).toBeGreaterThan(20);
    for (const { x, y } of strokes) {
      expect(Math.abs(x)).toBeLessThanOrEqual(20);
      expect(Math.abs(y)).toBeLessThanOrEqual(25);
    }
  });

  test('the ring closes around the chip', () => {
    for (const { x, y } of pointsOf(ringPath(chip, { from: -115, to: 270 })))
      expect((x / 20) ** 2 + (y / 25) ** 2).toBeGreaterThan(1);
  });
});
