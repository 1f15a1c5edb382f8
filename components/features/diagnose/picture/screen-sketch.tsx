import { useId, useState } from 'react';
import { View, type GestureResponderEvent, type ViewStyle } from 'react-native';
import Svg, { Circle, Defs, G, Path, Pattern, Rect, Text as SvgText } from 'react-native-svg';
import { hatchPath } from '@/components/board/geometry-marks';
import { makeStyles, useTheme } from '@/components/theme';
import { sketchScale } from '@/components/theme/sketch-scale';
import { Text } from '@/components/ui/text';
import { glassSize } from '@/lib';
import type { PictureMark, ScreenMap } from '@/shared';
import { drawMark } from './mark-drawing';
import type { GlassPoint } from './picture-draft';

type ScreenSketchProps = {
  map: ScreenMap;
  /** On the glass. */
  marks: readonly PictureMark[];
  /** The mark in hand, drawn in front. Left out: the marks are only looked at, and are all drawn alike without a number. */
  at?: number;
  /** What is drawn, in words. */
  label: string;
  /** A finger or a pointer goes from one place to another. Left out: the sketch is only looked at. */
  onDraw?: (from: GlassPoint, to: GlassPoint) => void;
  /** px. */
  greatestHeight: number;
};

/** Height of the glass of a usual tube for its width; a tube on its side the other way round. */
const tubeShare = 3 / 4;

/** The screen of a board with what is wrong on it hatched and numbered. Places can be set by touch. */
export function ScreenSketch({ map, marks, at, label, onDraw, greatestHeight }: ScreenSketchProps) {
  const styles = useStyles();
  const [room, setRoom] = useState<number>(sketchScale.firstWidth);
  const share = map.turn % 2 === 1 ? 1 / tubeShare : tubeShare;
  const width = Math.max(1, Math.min(room, greatestHeight / share));
  const px = { width, height: width * share };
  const touch = useTouch({ map, px, onDraw });
  // The mark in hand last, so that it lies in front.
  const inOrder = [...marks.keys()].sort((a, b) => Number(a === at) - Number(b === at));
  const drawings = marks.map((mark) => drawMark(mark, glassSize(map), px));
  return (
    <View onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout.width)}>
      <View role="img" aria-label={label} style={[styles.glass, onDraw && styles.drawn, px]} {...touch}>
        <View pointerEvents="none">
          <Svg width={px.width} height={px.height}>
            {inOrder.map((n) => (
              <Mark
                key={n}
                drawing={drawings[n]!}
                px={px}
                number={at === undefined || marks.length === 1 ? null : n + 1}
                strong={at === undefined || n === at}
              />
            ))}
          </Svg>
        </View>
      </View>
      {drawings.some(({ wider }) => wider) ? (
        <Text variant="fine" tone="soft">
          Drawn wider apart than it is.
        </Text>
      ) : null}
    </View>
  );
}

type Px = { width: number; height: number };

function useTouch({ map, px, onDraw }: { map: ScreenMap; px: Px; onDraw: ScreenSketchProps['onDraw'] }) {
  const [begun, setBegun] = useState<GlassPoint | null>(null);
  if (onDraw === undefined) return {};
  const glass = glassSize(map);
  const pointAt = ({ nativeEvent: { locationX, locationY } }: GestureResponderEvent): GlassPoint => {
    const into = (share: number, size: number) => Math.max(0, Math.min(size - 1, Math.floor(share * size)));
    return { x: into(locationX / px.width, glass.width), y: into(locationY / px.height, glass.height) };
  };
  return {
    onStartShouldSetResponder: () => true,
    onMoveShouldSetResponder: () => true,
    onResponderTerminationRequest: () => false,
    onResponderGrant: (event: GestureResponderEvent) => {
      const point = pointAt(event);
      setBegun(point);
      onDraw(point, point);
    },
    onResponderMove: (event: GestureResponderEvent) => {
      const point = pointAt(event);
      onDraw(begun ?? point, point);
    },
    onResponderRelease: () => setBegun(null),
  };
}

type MarkProps = {
  /** Null where it needs none. */
  number: number | null;
  drawing: ReturnType<typeof drawMark>;
  px: Px;
  strong: boolean;
};

function Mark({ number, drawing: { box, tile, cell }, px, strong }: MarkProps) {
  const { colours } = useTheme();
  // A colon, which React puts in, ends the name in url(#...).
  const id = `mark${useId().replaceAll(':', '')}`;
  const ink = strong ? colours.pencil : colours.soft;
  const roomy = cell.width >= sketchScale.hatch && cell.height >= sketchScale.hatch;
  const badge = {
    x: Math.min(px.width - badgeRadius, Math.max(badgeRadius, box.x + box.width / 2)),
    y: Math.min(px.height - badgeRadius, Math.max(badgeRadius, box.y + box.height / 2)),
  };
  return (
    <G>
      <Defs>
        <Pattern id={id} patternUnits="userSpaceOnUse" {...box} {...tile}>
          <Rect width={cell.width} height={cell.height} fill={roomy ? colours.pencilWash : ink} />
          {roomy ? (
            <G transform={`translate(${cell.width / 2} ${cell.height / 2})`}>
              <Path d={hatchPath(cell, sketchScale.hatch)} stroke={ink} strokeWidth={sketchScale.line.body} />
            </G>
          ) : null}
        </Pattern>
      </Defs>
      <Rect {...box} fill={`url(#${id})`} />
      <Rect
        {...box}
        fill="none"
        stroke={ink}
        strokeWidth={strong ? sketchScale.line.mark : sketchScale.line.hair}
        strokeDasharray={strong ? undefined : [sketchScale.gap.small, sketchScale.gap.hair]}
      />
      {number === null ? null : (
        <>
          <Circle cx={badge.x} cy={badge.y} r={badgeRadius} fill={ink} stroke={colours.sheet} />
          <SvgText
            x={badge.x}
            y={badge.y + sketchScale.words * 0.36}
            fontSize={sketchScale.words}
            fontFamily={sketchScale.font.monoBold}
            fill={colours.onPencil}
            textAnchor="middle"
          >
            {number}
          </SvgText>
        </>
      )}
    </G>
  );
}

const badgeRadius = sketchScale.badges[0];

const useStyles = makeStyles((t) => ({
  glass: {
    alignSelf: 'center',
    overflow: 'hidden',
    backgroundColor: t.colours.chip,
    borderRadius: t.radius.md,
    outlineWidth: t.line.ink,
    outlineStyle: 'solid',
    outlineColor: t.colours.ink,
  } as ViewStyle,
  // A finger that marks must not scroll the page.
  drawn: { touchAction: 'none', cursor: 'crosshair', userSelect: 'none' } as unknown as ViewStyle,
}));
