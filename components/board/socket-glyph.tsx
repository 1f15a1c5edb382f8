import { memo } from 'react';
import { G, Rect, Text as SvgText } from 'react-native-svg';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import type { Point } from './geometry';
import { fitCaption, textLines, type SocketDrawing } from './geometry-drawing';
import { letterWidth, type Face, type FittedText } from './geometry-label';
import type { Inks } from './sketch-inks';
import type { SocketMark } from './sketch-types';
import { SocketBody } from './socket-body';
import { svgTitle } from './svg-title';
import { socketWords } from './words';

type SocketGlyphProps = {
  index: LayoutIndex;
  drawing: SocketDrawing;
  mark: SocketMark | undefined;
  id: string;
  chosen: boolean;
  inks: Inks;
};

const { font } = sketchScale;

function labelTone(mark: SocketMark | undefined, inks: Inks): string {
  if (mark?.state === 'failed' || mark?.state === 'mixed') return inks.pencil;
  return mark?.state === 'untested' || mark?.state === 'ruled-out' ? inks.soft : inks.ink;
}

/** One socket: body, state, pin 1 and label. Its ring, rank and choice lie on a layer above all sockets. */
function Glyph({ index, drawing, mark, id, chosen, inks }: SocketGlyphProps) {
  const { box, label, pin1, notch, area } = drawing;
  const state = mark?.state ?? 'plain';
  const words = socketWords(index, drawing.at, mark);
  const note = mark?.note === undefined ? null : fitCaption([mark.note], { area });
  const caption = label && (note ?? drawing.caption);
  const hatched = state === 'failed' || state === 'mixed';
  const tone = labelTone(mark, inks);
  const lines = label ? textLines(label, caption) : null;
  // What must be heard of it; the drawing's own types know no names for these.
  const aria: object = { id, role: 'option', 'aria-label': words, 'aria-selected': chosen };
  return (
    <G {...aria} transform={`translate(${box.x} ${box.y})`}>
      {svgTitle(words)}
      <SocketBody size={box} pin1={pin1} notch={notch} state={state} captioned={caption !== null} inks={inks} />
      {label && lines && hatched ? (
        <Plate text={label} at={{ x: area.x, y: lines.label }} face="mono" fill={inks.pencilWash} />
      ) : null}
      {label && lines ? (
        <SvgText
          x={area.x}
          y={lines.label + label.size * 0.34}
          textAnchor="middle"
          fontFamily={font.monoBold}
          fontSize={label.size}
          fill={tone}
        >
          {label.text}
        </SvgText>
      ) : null}
      {caption && lines && hatched ? (
        <Plate text={caption} at={{ x: area.x, y: lines.caption }} face="text" fill={inks.pencilWash} />
      ) : null}
      {caption && lines ? (
        <SvgText
          x={area.x}
          y={lines.caption + caption.size * 0.34}
          textAnchor="middle"
          fontFamily={font.text}
          fontSize={caption.size}
          fill={inks.soft}
        >
          {caption.text}
        </SvgText>
      ) : null}
    </G>
  );
}

type PlateProps = { text: FittedText; at: Point; face: Face; fill: string };

/** Bare paper under the letters, so that no hatching runs through them. */
function Plate({ text, at, face, fill }: PlateProps) {
  const width = (letterWidth(text.text, face) + 0.3) * text.size;
  const height = text.size * 1.15;
  return <Rect x={at.x - width / 2} y={at.y - height / 2} width={width} height={height} fill={fill} />;
}

/** Drawn again only when what is said about this socket has changed, since marks come as new maps each time. */
export const SocketGlyph = memo(
  Glyph,
  (a, b) =>
    a.index === b.index &&
    a.drawing === b.drawing &&
    a.id === b.id &&
    a.chosen === b.chosen &&
    a.inks === b.inks &&
    a.mark?.state === b.mark?.state &&
    a.mark?.rank === b.mark?.rank &&
    a.mark?.note === b.mark?.note,
);
