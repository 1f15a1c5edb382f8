import { memo } from 'react';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import type { PartDrawing, SocketDrawing } from './geometry-drawing';
import type { TargetKey } from './geometry-scene';
import { PartGlyph } from './part-glyph';
import type { Inks } from './sketch-inks';
import type { SketchMarks } from './sketch-types';
import { SocketGlyph } from './socket-glyph';

type SketchGlyphsProps = {
  index: LayoutIndex;
  marks: SketchMarks;
  sockets: readonly SocketDrawing[];
  parts: readonly PartDrawing[];
  chosen: TargetKey | null;
  idOf: (drawing: SocketDrawing | PartDrawing) => string;
  inks: Inks;
};

/** All sockets and shared parts. Left alone while only the keyboard moves. */
export const SketchGlyphs = memo(function SketchGlyphs(props: SketchGlyphsProps) {
  const { index, marks, sockets, parts, chosen, idOf, inks } = props;
  return (
    <>
      {parts.map((drawing) => (
        <PartGlyph
          key={drawing.key}
          index={index}
          drawing={drawing}
          mark={marks.sharedParts.get(drawing.name)}
          id={idOf(drawing)}
          chosen={chosen === drawing.key}
          inks={inks}
        />
      ))}
      {sockets.map((drawing) => (
        <SocketGlyph
          key={drawing.key}
          index={index}
          drawing={drawing}
          mark={marks.sockets.get(drawing.name)}
          id={idOf(drawing)}
          chosen={chosen === drawing.key}
          inks={inks}
        />
      ))}
    </>
  );
});
