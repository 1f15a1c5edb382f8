import type { AddressWindow, LayoutProblem, ScreenMap } from '@/shared';
import { addressWords } from '../words';
import { type Checked, bitOutOfRange, error, warning } from './problem';

type Span = readonly [from: number, to: number];

/** The addresses of windows that a plane can see, drawn together. */
function visible(windows: readonly AddressWindow[], register: { name: string; value: number } | undefined): Span[] {
  const spans = windows
    .filter(
      (window) =>
        window.register === undefined ||
        (window.register.name === register?.name && window.register.value === register.value),
    )
    .map(({ range }): [number, number] => [range.from, range.to])
    .sort((a, b) => a[0] - b[0]);
  const merged: [number, number][] = [];
  for (const [from, to] of spans) {
    const last = merged[merged.length - 1];
    if (last !== undefined && from <= last[1] + 1) last[1] = Math.max(last[1], to);
    else merged.push([from, to]);
  }
  return merged;
}

function lineStart({ lineWeights }: ScreenMap, base: number, line: number): number {
  return lineWeights.reduce((sum, weight, bit) => sum + (Math.floor(line / 2 ** bit) % 2) * weight, base);
}

function planeProblems({ document, index }: Checked, screen: ScreenMap, at: number): LayoutProblem[] {
  const plane = screen.planes[at]!;
  const pointer = `/screenMap/planes/${at}`;
  const problems = plane.bits.flatMap((bit, n) =>
    bit >= index.bitCount ? [bitOutOfRange(`${pointer}/bits/${n}`, bit, index.bitCount)] : [],
  );
  if (plane.bits.length !== screen.pixelsPerUnit) {
    const message = `The plane ${plane.name} lists ${plane.bits.length} bits for ${screen.pixelsPerUnit} pixels. List one bit a pixel, the leftmost first.`;
    problems.push(error({ pointer: `${pointer}/bits`, code: 'screen-bits', message }));
  }
  const { windows } = document.addressMap;
  if (windows.length === 0) return problems;
  const spans = visible(windows, plane.register);
  const inside = (from: number, to: number) => spans.some((span) => from >= span[0] && to <= span[1]);
  let outside = 0;
  let first: Span | null = null;
  for (let line = 0; line < screen.height; line++) {
    const from = lineStart(screen, plane.base ?? screen.base, line);
    const to = from + screen.unitsPerLine - 1;
    if (inside(from, to)) continue;
    outside++;
    first ??= [from, to];
  }
  if (first === null) return problems;
  const [from, to] = first.map((end) => addressWords(document.addressMap, end));
  const message = `${outside} of ${screen.height} lines of the plane ${plane.name} reach outside every address window, the first at ${from} to ${to}. Check the base, the units of a line and the line weights.`;
  return [...problems, error({ pointer, code: 'screen-outside', message })];
}

/** A screen map whose picture does not lie in the memory of the board, or does not add up. */
export function checkScreen(checked: Checked): LayoutProblem[] {
  const { screenMap: screen, addressMap } = checked.document;
  if (screen === undefined) return [];
  const problems = screen.planes.flatMap((_, at) => planeProblems(checked, screen, at));
  const pixels = screen.unitsPerLine * screen.pixelsPerUnit;
  if (screen.width > pixels) {
    problems.push(
      error({
        pointer: '/screenMap/width',
        code: 'screen-width',
        message: `A line of ${screen.unitsPerLine} units has ${pixels} pixels, not ${screen.width}.`,
      }),
    );
  }
  if (2 ** screen.lineWeights.length < screen.height) {
    const message = `${screen.lineWeights.length} line weights number ${2 ** screen.lineWeights.length} lines, and the picture has ${screen.height}. Add a weight for each bit of the line number.`;
    problems.push(error({ pointer: '/screenMap/lineWeights', code: 'screen-lines', message }));
  }
  if (addressMap.windows.length === 0) {
    problems.push(
      warning({
        pointer: '/screenMap',
        code: 'screen-no-windows',
        message: 'The screen map needs address windows to find the bank of a pixel.',
      }),
    );
  }
  return problems;
}
