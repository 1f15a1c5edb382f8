import { memo } from 'react';
import { G, Rect, Text as SvgText } from 'react-native-svg';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import type { SharedPart } from '@/shared';
import { partPad, type PartDrawing } from './geometry-drawing';
import { letterWidth } from './geometry-label';
import type { Inks } from './sketch-inks';
import type { SharedPartMark } from './sketch-types';
import { svgTitle } from './svg-title';
import { partWords } from './words';

type PartGlyphProps = {
  index: LayoutIndex;
  drawing: PartDrawing;
  mark: SharedPartMark | undefined;
  id: string;
  chosen: boolean;
  inks: Inks;
};

const { font, gap, line, words } = sketchScale;

/** Whether a shared part is under suspicion. */
export function isSuspect(mark: SharedPartMark | undefined): boolean {
  return mark?.state === 'suspect' || mark?.rank !== undefined;
}

/** One shared part: long dashes, its label and what it is. */
function Glyph({ index, drawing, mark, id, chosen, inks }: PartGlyphProps) {
  const { box, label, lines, beside, turned } = drawing;
  const suspect = isSuspect(mark);
  const said = partWords(index.document.sharedParts[drawing.at] as SharedPart, mark);
  const lineHeight = (words - 2) * 1.2;
  const height = (label?.size ?? 0) + lines.length * lineHeight;
  const top = -height / 2;
  const aria: object = { id, role: 'option', 'aria-label': said, 'aria-selected': chosen };
  // An upright narrow part is read down its middle, any other from its left.
  const middle = box.height > box.width && !turned;
  const x = middle ? 0 : -(turned ? box.height : box.width) / 2 + partPad;
  const anchor = middle ? 'middle' : 'start';
  return (
    <G {...aria} transform={`translate(${box.x} ${box.y})`}>
      {svgTitle(said)}
      <Rect
        x={-box.width / 2}
        y={-box.height / 2}
        width={box.width}
        height={box.height}
        fill={inks.chip}
        stroke={suspect ? inks.mark : inks.soft}
        strokeWidth={suspect ? line.mark : line.hair}
        strokeDasharray="9 5"
      />
      <G transform={turned ? 'rotate(-90)' : 'rotate(0)'}>
        {label ? (
          <SvgText
            x={x}
            y={top + label.size * 0.85}
            textAnchor={anchor}
            fontFamily={font.monoBold}
            fontSize={label.size}
            fill={suspect ? inks.mark : inks.ink}
          >
            {label.text}
          </SvgText>
        ) : null}
        {label && beside ? (
          <SvgText
            x={x + letterWidth(label.text, 'mono') * label.size + gap.small}
            y={top + label.size * 0.85}
            fontFamily={font.text}
            fontSize={beside.size}
            fill={inks.soft}
          >
            {beside.text}
          </SvgText>
        ) : null}
        {lines.map((text, at) => (
          <SvgText
            key={text}
            x={x}
            y={top + (label?.size ?? 0) + lineHeight * (at + 0.85)}
            textAnchor={anchor}
            fontFamily={font.text}
            fontSize={words - 2}
            fill={inks.soft}
          >
            {text}
          </SvgText>
        ))}
      </G>
    </G>
  );
}

/** Drawn again only when what is said about this part has changed. */
export const PartGlyph = memo(
  Glyph,
  (a, b) =>
    a.index === b.index &&
    a.drawing === b.drawing &&
    a.id === b.id &&
    a.chosen === b.chosen &&
    a.inks === b.inks &&
    a.mark?.state === b.mark?.state &&
    a.mark?.rank === b.mark?.rank,
);
