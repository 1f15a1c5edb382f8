import type { PictureMark } from '@/shared';

/** A mark as it is drawn: a box, and in it a tile that comes again. All in px of the drawing. */
export interface MarkDrawing {
  readonly box: { readonly x: number; readonly y: number; readonly width: number; readonly height: number };
  readonly tile: { readonly width: number; readonly height: number };
  /** The part of each tile that is wrong. */
  readonly cell: { readonly width: number; readonly height: number };
  /** True where repeats lie too close to be drawn as they are, and are drawn wider apart. */
  readonly wider: boolean;
}

/** Repeats closer than this, px, are drawn wider apart. */
const closest = 7;
/** Least size of what is wrong, px. */
const least = 1.5;

interface Along {
  readonly start: number;
  readonly length: number;
  readonly tile: number;
  readonly cell: number;
  readonly wider: boolean;
}

type Span = {
  readonly span: readonly [number, number];
  readonly every?: number | undefined;
  readonly until?: number | undefined;
};

function along({ span: [from, to], every, until }: Span, of: { size: number; px: number }): Along {
  const scale = of.px / of.size;
  const last = Math.min(every === undefined ? to : (until ?? of.size - 1), of.size - 1);
  const start = from * scale;
  const length = Math.max(least, (last + 1 - from) * scale);
  if (every === undefined) return { start, length, tile: length, cell: length, wider: false };
  const times = Math.max(1, Math.ceil(closest / (every * scale)));
  const cell = Math.max(least, Math.min(to + 1 - from, every) * scale * times);
  return { start, length, tile: every * scale * times, cell, wider: times > 1 };
}

/** How a mark of the glass is drawn on a screen of so many px. */
export function drawMark(
  { x, everyX, untilX, y, everyY, untilY }: PictureMark,
  glass: { width: number; height: number },
  px: { width: number; height: number },
): MarkDrawing {
  const across = along({ span: x, every: everyX, until: untilX }, { size: glass.width, px: px.width });
  const down = along({ span: y, every: everyY, until: untilY }, { size: glass.height, px: px.height });
  return {
    box: { x: across.start, y: down.start, width: across.length, height: down.length },
    tile: { width: across.tile, height: down.tile },
    cell: { width: across.cell, height: down.cell },
    wider: across.wider || down.wider,
  };
}
