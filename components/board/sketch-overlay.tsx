import { Circle, G, Path, Rect, Text as SvgText } from 'react-native-svg';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { Box } from './geometry';
import type { PartDrawing, SocketDrawing } from './geometry-drawing';
import { badgePlace, bodyPath } from './geometry-marks';
import type { TargetKey } from './geometry-scene';
import type { Inks } from './sketch-inks';
import type { SketchMarks, SocketMark } from './sketch-types';
import { PencilRing } from './socket-body';

const { badge, badgeLetters, font, line, advance, gap } = sketchScale;

type SketchOverlayProps = {
  sockets: readonly SocketDrawing[];
  parts: readonly PartDrawing[];
  marks: SketchMarks;
  labelOf: (drawing: SocketDrawing | PartDrawing) => string;
  chosen: TargetKey | null;
  focused: TargetKey | null;
  inks: Inks;
};

/** Where the letters of a socket stand, px. */
export function labelBox({ box, label }: SocketDrawing): Box | null {
  if (!label) return null;
  return { x: box.x, y: box.y, width: [...label.text].length * label.size * advance.mono, height: label.size };
}

/** Whether a socket gets the pencil ring: it did not answer, or it is the first to pull. */
export function isRinged(mark: SocketMark): boolean {
  return mark.state === 'failed' || mark.state === 'mixed' || mark.rank === 1;
}

/** What lies above all sockets: rings, ranks, what is chosen, where the keyboard is. For the eye only. */
export function SketchOverlay({ sockets, parts, marks, labelOf, chosen, focused, inks }: SketchOverlayProps) {
  const labels = sockets.map(labelBox).filter((box) => box !== null);
  const marked = sockets.flatMap((drawing) => {
    const mark = marks.sockets.get(labelOf(drawing));
    return mark ? [{ drawing, mark }] : [];
  });
  const all = [...sockets, ...parts];
  const chosenBox = all.find(({ key }) => key === chosen)?.box;
  const focusedBox = all.find(({ key }) => key === focused)?.box;
  const hidden: object = { 'aria-hidden': true, pointerEvents: 'none' };
  return (
    <G {...hidden}>
      {chosenBox ? <DoubleLine box={chosenBox} inks={inks} /> : null}
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
            label={drawing.label ? null : labelOf(drawing)}
            tone={mark.rank === 1 ? inks.pencil : inks.mark}
            keepClear={labels}
            inks={inks}
          />
        ),
      )}
      {parts.map((drawing) => {
        const rank = marks.sharedParts.get(labelOf(drawing))?.rank;
        if (rank === undefined) return null;
        const tone = rank === 1 ? inks.pencil : inks.mark;
        return (
          <Badge key={drawing.key} box={drawing.box} rank={rank} label={null} tone={tone} keepClear={[]} inks={inks} />
        );
      })}
      {focusedBox ? <FocusLine box={focusedBox} inks={inks} /> : null}
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

function Badge({ box, rank, label, tone, keepClear, inks }: BadgeProps) {
  const place = badgePlace(box, badge, keepClear);
  const first = rank === 1;
  const text = label === null ? String(rank) : `${rank} ${label}`;
  const width = Math.max(2 * badge, ([...text].length + 0.8) * badgeLetters * advance.mono);
  const radius = badge;
  return (
    <G transform={`translate(${place.x} ${place.y})`}>
      {label === null && text.length < 2 ? (
        <Circle r={radius} fill={first ? tone : inks.sheet} stroke={tone} strokeWidth={line.mark} />
      ) : (
        <Rect
          x={label === null ? -width / 2 : -radius}
          y={-radius}
          rx={radius}
          width={width}
          height={2 * radius}
          fill={first ? tone : inks.sheet}
          stroke={tone}
          strokeWidth={line.mark}
        />
      )}
      <SvgText
        x={label === null ? 0 : width / 2 - radius}
        y={badgeLetters * 0.34}
        textAnchor="middle"
        fontFamily={font.monoBold}
        fontSize={badgeLetters}
        fill={first ? inks.onPencil : tone}
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
