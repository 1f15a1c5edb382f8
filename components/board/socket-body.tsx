import { Circle, Path } from 'react-native-svg';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { Point } from './geometry';
import { bodyPath, hatchPath, notchPath, pin1Place, ringPath, shares, tickPath, tickPlace } from './geometry-marks';
import type { Inks } from './sketch-inks';
import type { SocketState } from './sketch-types';

type Size = { width: number; height: number };

type SocketBodyProps = {
  size: Size;
  pin1: Point;
  notch: Point;
  state: SocketState;
  /** Words stand under the label, so the tick goes above. */
  captioned?: boolean;
  inks: Inks;
};

const dashes: Partial<Record<SocketState, string>> = { untested: '4 3', 'ruled-out': '1.5 3.5' };

function outline(state: SocketState, inks: Inks) {
  const { line } = sketchScale;
  if (state === 'failed' || state === 'mixed') return { stroke: inks.pencil, width: line.body };
  if (state === 'untested') return { stroke: inks.soft, width: line.hair };
  if (state === 'ruled-out') return { stroke: inks.soft, width: line.hair };
  return { stroke: inks.ink, width: state === 'possible' ? line.heavy : line.body };
}

/** A chip around the origin in one of its states, without letters and without the ring. */
export function SocketBody({ size, pin1, notch, state, captioned = false, inks }: SocketBodyProps) {
  const { stroke, width } = outline(state, inks);
  const hollow = state === 'untested' || state === 'ruled-out';
  const hatched = state === 'failed' || state === 'mixed';
  const side = Math.min(size.width, size.height);
  const dot = pin1Place(size, pin1);
  const tick = tickPlace(size, { pin1, overCaption: captioned });
  // Dashes would swallow the small notch, and a heavy line would fill it.
  const notchApart = hollow || state === 'possible';
  const fill = hollow ? 'transparent' : hatched ? inks.pencilWash : inks.chip;
  return (
    <>
      <Path
        d={notchApart ? bodyPath(size) : bodyPath(size) + notchPath(size, notch)}
        fill={fill}
        stroke={stroke}
        strokeWidth={width}
        strokeDasharray={dashes[state]}
      />
      {notchApart ? (
        <Path
          d={notchPath(size, notch)}
          fill="none"
          stroke={stroke}
          strokeWidth={Math.min(width, sketchScale.line.body)}
        />
      ) : null}
      {hatched ? (
        <Path
          d={hatchPath(size, Math.max(sketchScale.hatch, side * 0.13))}
          stroke={inks.pencil}
          strokeWidth={sketchScale.line.hair}
          strokeOpacity={0.55}
        />
      ) : null}
      <Circle
        cx={dot.x}
        cy={dot.y}
        r={Math.max(1, Math.min(sketchScale.pin1, side * 0.05))}
        fill={hollow ? inks.soft : inks.ink}
      />
      {state === 'passed' || state === 'mixed' ? (
        <Path
          d={tickPath(Math.min(side * (captioned ? shares.smallTick : shares.tick), sketchScale.greatestLabel), tick)}
          fill="none"
          stroke={inks.tick}
          strokeWidth={Math.min(sketchScale.line.mark, side * 0.08)}
        />
      ) : null}
    </>
  );
}

/** The red pencil ring around a chip at the origin: whole, or the left half only where it both failed and answered. */
export function PencilRing({ size, half, inks }: { size: Size; half: boolean; inks: Inks }) {
  return (
    <Path
      d={ringPath(size, half ? { from: 80, to: 280 } : { from: -115, to: 270 })}
      fill="none"
      stroke={inks.pencil}
      strokeWidth={sketchScale.line.mark + (Math.min(size.width, size.height) > 40 ? 0.5 : 0)}
      strokeLinecap="round"
    />
  );
}
