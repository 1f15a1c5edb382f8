import * as fc from 'fast-check';
import { fitScene, greatestZoom, zoomFactor, type FitInput } from '@/components/board/geometry-fit';
import { findAxes } from '@/components/board/geometry-grid';
import { buildScene } from '@/components/board/geometry-scene';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { board, boardOf, boards, lies } from './boards';

const inputOf = (index: LayoutIndex, width: number, lie = lies[0]!): FitInput => {
  const scene = buildScene(index, lie);
  return { scene, axes: findAxes(index, scene.sockets), width, greatestHeight: Math.max(640, width), edge: true };
};

describe('laying a board into its container', () => {
  test.each([...boards])('%s fits whole into a phone and into a wide page, in every lie', (_, index) => {
    for (const lie of lies)
      for (const width of [320, 358, 720, 1200]) {
        const input = inputOf(index, width, lie);
        const fit = fitScene(input, 1);
        expect(fit.width).toBeLessThanOrEqual(width + 1e-6);
        expect(fit.height).toBeLessThanOrEqual(Math.max(640, width) + 1e-6);
        const outside = [...input.scene.sockets, ...input.scene.parts].filter(({ box }) => {
          const { x, y, width: across, height: down } = fit.toPx(box);
          return x < across / 2 || y < down / 2 || x + across / 2 > fit.width || y + down / 2 > fit.height;
        });
        expect(outside).toEqual([]);
      }
  });

  test('what is under a finger is what was drawn there', () => {
    const fit = fitScene(inputOf(board('tarnvall-t-64-rev-b'), 358), 2.3);
    fc.assert(
      fc.property(fc.integer({ min: -100, max: 100 }), fc.integer({ min: -100, max: 100 }), (x, y) => {
        const back = fit.toUnits(fit.toPx({ x, y, width: 0, height: 0 }));
        expect(back.x).toBeCloseTo(x);
        expect(back.y).toBeCloseTo(y);
      }),
    );
  });

  test('a board of four sockets is not blown up to fill a wide page', () => {
    const input = inputOf(board('corvane-six-a1'), 1400);
    expect(input.scene.side * fitScene(input, 1).scale).toBeLessThanOrEqual(76);
  });
});

describe('zoom', () => {
  const large = inputOf(boardOf({ banks: 16, bits: 16 }), 358);

  test('to the suspect makes a label readable on a phone, on a board of 256 sockets', () => {
    expect(large.scene.side * fitScene(large, 1).scale).toBeLessThan(20);
    expect(large.scene.side * fitScene(large, zoomFactor('suspect', large)).scale).toBeCloseTo(60);
  });

  test('stays between whole and close, whatever a link asks for', () => {
    fc.assert(
      fc.property(fc.double(), (asked) => {
        const factor = zoomFactor(asked, large);
        expect(factor).toBeGreaterThanOrEqual(1);
        expect(factor).toBeLessThanOrEqual(greatestZoom(large));
      }),
    );
  });

  test('to the suspect comes closer even where the board was large already', () => {
    expect(zoomFactor('suspect', inputOf(board('tarnvall-t-64-rev-b'), 720))).toBeGreaterThan(1);
  });
});
