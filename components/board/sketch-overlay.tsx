import { useMemo } from 'react';
import { G, Path, Rect, Text as SvgText } from 'react-native-svg';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { Box } from './geometry';
import { lettersOf, type PartDrawing, type SocketDrawing } from './geometry-drawing';
import { letterWidth } from './geometry-label';
import { badgePlace, bodyPath, type BadgePlace } from './geometry-marks';
import type { TargetKey } from './geometry-scene';
import type { Inks } from './sketch-inks';
import type { SketchMarks, SocketMark } from './sketch-types';
import { PencilRing } from './socket-body';

const { badges, font, line, gap } = sketchScale;

type SketchOverlayProps = {
  sockets: readonly SocketDrawing[];
  parts: readonly PartDrawing[];
  marks: SketchMarks;
  chosen: TargetKey | null;
  focused: TargetKey | null;
  inks: Inks;
};

/** Whether a socket gets the pencil ring: it did not answer, or it is the first to pull. */
function isRinged(mark: SocketMark): boolean {
  return mark.state === 'failed' || mark.state === 'mixed' || mark.rank === 1;
}

/** What lies above all sockets: rings, ranks, what is chosen, where the keyboard is. For the eye only. */
export function SketchOverlay({ sockets, parts, marks, chosen, focused, inks }: SketchOverlayProps) {
  const letters = useMemo(() => lettersOf(sockets, parts), [sockets, parts]);
  const marked = sockets.flatMap((drawing) => {
    const mark = marks.sockets.get(drawing.name);
    return mark ? [{ drawing, mark }] : [];
  });
  const find = (key: TargetKey | null) => [...sockets, ...parts].find((drawing) => drawing.key === key);
  const chosenOne = find(chosen);
  const focusedOne = find(focused);
  const hidden: object = { 'aria-hidden': true, pointerEvents: 'none' };
  return (
    <G {...hidden}>
      {marked.map(({ drawing, mark }) =>
        mark.outlined && drawing !== chosenOne ? <DoubleLine key={drawing.key} box={drawing.box} inks={inks} /> : null,
      )}
      {chosenOne ? <DoubleLine box={chosenOne.box} inks={inks} /> : null}
      {marked.map(({ drawing, mark }) =>
        isRinged(mark) ? (
          <G key={drawing.key} transform={`translate(${drawing.box.x} ${drawing.box.y})`}>
            <PencilRing size={drawing.box} half={mark.state === 'mixed'} inks={inks} />
          </G>
        ) : null,
      )}
      {marked.map(({ drawing, mark }) =>
        mark.rank === undefined ? null : (
          <Badge
            key={drawing.key}
            box={drawing.box}
            rank={mark.rank}
            label={drawing.label ? null : drawing.name}
            tone={mark.rank === 1 ? inks.pencil : inks.mark}
            keepClear={letters}
            inks={inks}
          />
        ),
      )}
      {parts.map((drawing) => {
        const rank = marks.sharedParts.get(drawing.name)?.rank;
        if (rank === undefined) return null;
        const tone = rank === 1 ? inks.pencil : inks.mark;
        return (
          <Badge
            key={drawing.key}
            box={drawing.box}
            rank={rank}
            label={null}
            tone={tone}
            keepClear={letters}
            inks={inks}
          />
        );
      })}
      {focusedOne ? <FocusLine box={focusedOne.box} inks={inks} /> : null}
      {[...new Set([chosenOne, focusedOne])].map((drawing) =>
        drawing && !drawing.label && marks.sockets.get(drawing.name)?.rank === undefined ? (
          <Tag key={drawing.key} place={tagPlace(drawing.box)} text={drawing.name} tone={inks.pen} inks={inks} />
        ) : null,
      )}
    </G>
  );
}

type BadgeProps = {
  box: Box;
  rank: number;
  /** The socket's label, where the socket itself is too small for it. */
  label: string | null;
  tone: string;
  keepClear: readonly Box[];
  inks: Inks;
};

/** Above the middle of what it names. */
const tagPlace = ({ x, y, height }: Box) => ({ x, y: y - height / 2 - badges[0] - gap.small, radius: badges[0] });

function Badge({ box, rank, label, tone, keepClear, inks }: BadgeProps) {
  const place = badgePlace(box, badges, keepClear);
  const text = label === null ? String(rank) : `${rank} ${label}`;
  return <Tag place={place} text={text} tone={tone} solid={rank === 1} hangs={label !== null} inks={inks} />;
}

type TagProps = { place: BadgePlace; text: string; tone: string; solid?: boolean; hangs?: boolean; inks: Inks };

/** A few letters in a round frame: around `place`, or to the right of it where it hangs on a socket. */
function Tag({ place, text, tone, solid = false, hangs = false, inks }: TagProps) {
  const { x, y, radius } = place;
  const letters = radius * 1.4;
  const width = Math.max(2 * radius, (letterWidth(text, 'mono') + 0.5) * letters);
  const left = hangs ? -radius : -width / 2;
  return (
    <G transform={`translate(${x} ${y})`}>
      <Rect
        x={left}
        y={-radius}
        rx={radius}
        width={width}
        height={2 * radius}
        fill={solid ? tone : inks.sheet}
        stroke={tone}
        strokeWidth={line.mark}
      />
      <SvgText
        x={left + width / 2}
        y={letters * 0.34}
        textAnchor="middle"
        fontFamily={font.monoBold}
        fontSize={letters}
        fill={solid ? inks.onPencil : tone}
      >
        {text}
      </SvgText>
    </G>
  );
}

function DoubleLine({ box, inks }: { box: Box; inks: Inks }) {
  const grown = (by: number) => bodyPath({ width: box.width + by, height: box.height + by });
  return (
    <G transform={`translate(${box.x} ${box.y})`}>
      <Path d={grown(0)} fill="none" stroke={inks.pen} strokeWidth={line.body} />
      <Path d={grown(2 * gap.small)} fill="none" stroke={inks.pen} strokeWidth={line.mark} />
    </G>
  );
}

function FocusLine({ box, inks }: { box: Box; inks: Inks }) {
  const grow = 2 * (gap.small + gap.hair);
  return (
    <G transform={`translate(${box.x} ${box.y})`}>
      <Path
        d={bodyPath({ width: box.width + grow, height: box.height + grow })}
        fill="none"
        stroke={inks.pen}
        strokeWidth={line.heavy}
      />
    </G>
  );
}
