import { useCallback, useId, useMemo } from 'react';
import { View } from 'react-native';
import Svg from 'react-native-svg';
import { makeStyles } from '@/components/theme';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { drawParts, drawSockets } from './geometry-drawing';
import { fitScene, wholeScale, type FitInput } from './geometry-fit';
import { readingOrder } from './geometry-nearest';
import { keyOf } from './geometry-scene';
import { SketchAxes, SketchEdge } from './sketch-axes';
import { SketchGlyphs } from './sketch-glyphs';
import type { Inks } from './sketch-inks';
import { SketchOverlay } from './sketch-overlay';
import type { PickTarget, SketchMarks, SketchView } from './sketch-types';
import { useOpening } from './use-opening';
import { useTargets, type Target } from './use-targets';

type SketchDrawingProps = {
  index: LayoutIndex;
  marks: SketchMarks;
  view: SketchView;
  input: FitInput;
  factor: number;
  suspect: Target | null;
  /** Counts how often one asked to be taken to the suspect. */
  aims: number;
  picked: PickTarget | null;
  label: string;
  inks: Inks;
  print: boolean;
  onPick?: (target: PickTarget) => void;
  onFactor: (factor: number) => void;
  /** A key of the view's actions; true where one was meant. */
  onActionKey: (key: string) => boolean;
};

const kindOf = ({ key }: Target): PickTarget['kind'] => (key.startsWith('socket:') ? 'socket' : 'shared-part');

/** The scene in px, and its targets in reading order. Kept from one drawing to the next while nothing moves. */
function useLaidOut({ index, input, factor }: Pick<SketchDrawingProps, 'index' | 'input' | 'factor'>) {
  const { scene, axes } = input;
  const fit = useMemo(() => fitScene(input, factor), [input, factor]);
  const whole = useMemo(() => fitScene(input, 1), [input]);
  const tellAll = factor > 1;
  const sockets = useMemo(() => drawSockets(index, { scene, axes, fit, tellAll }), [index, scene, axes, fit, tellAll]);
  const parts = useMemo(() => drawParts(index, scene, fit), [index, scene, fit]);
  const targets = useMemo(() => readingOrder<Target>([...scene.sockets, ...scene.parts]), [scene]);
  return { fit, whole, sockets, parts, targets };
}

/** The drawing in its opening. */
export function SketchDrawing(props: SketchDrawingProps) {
  const { index, marks, view, input, factor, suspect, aims, picked, inks, print, onPick, onFactor } = props;
  const styles = useStyles();
  const base = useId();
  const { scene, axes } = input;
  const { fit, whole, sockets, parts, targets } = useLaidOut(props);
  const enlarged = factor > 1;
  const chosen = picked ? keyOf(picked) : null;
  const aim = view.zoom === 'suspect' ? (suspect?.box ?? null) : null;
  const { ref, lookAtNext, reveal, toDrawing } = useOpening({
    fit,
    lie: `${view.turn}${view.solderSide}`,
    aim,
    aims,
    factor,
    onFactor,
  });

  const idOf = useCallback(
    (target: Pick<Target, 'key' | 'at'>) => `${base}${target.key.startsWith('socket:') ? 's' : 'p'}${target.at}`,
    [base],
  );
  const pick = (target: Target) => onPick?.({ kind: kindOf(target), label: target.label });
  const { active, focused, handlers } = useTargets({
    targets,
    chosen,
    first: suspect,
    reach: sketchScale.reach / fit.scale,
    idOf,
    placeOf: (event) => fit.toUnits(toDrawing(event)),
    onTap: (target) => {
      pick(target);
      // Too small to tell one socket from the next: come closer at the same time.
      if (scene.side * fit.scale >= sketchScale.tappableSocket) return;
      lookAtNext(target.box);
      onFactor(sketchScale.readableSocket / (scene.side * wholeScale(input)));
    },
    onPick: pick,
    onReach: (target) => reveal(target.box),
    onKey: (key, at) => {
      if (!props.onActionKey(key)) return false;
      lookAtNext(at.box);
      return true;
    },
  });

  const height = Math.min(fit.height, Math.max(whole.height, enlarged ? sketchScale.leastOpening : 0));
  const listbox: object = {
    role: 'listbox',
    'aria-label': props.label,
    'aria-activedescendant': active ? idOf(active) : undefined,
    tabIndex: 0,
    ...handlers,
  };
  const svg: object = {
    role: 'presentation',
    width: print ? '100%' : fit.width,
    height: print ? undefined : fit.height,
    style: [styles.drawing, { maxWidth: fit.width }],
  };
  return (
    <View ref={ref} {...listbox} style={[styles.opening, enlarged && styles.enlarged, print ? null : { height }]}>
      <Svg {...svg} viewBox={`0 0 ${fit.width} ${fit.height}`}>
        {input.edge ? (
          <SketchEdge edge={scene.edge} name={index.document.board.view.edgeName} fit={fit} inks={inks} />
        ) : null}
        <SketchAxes axes={axes} fit={fit} inks={inks} />
        <SketchGlyphs {...{ index, marks, sockets, parts, chosen, idOf, inks }} />
        <SketchOverlay {...{ sockets, parts, marks, chosen, focused, inks }} />
      </Svg>
    </View>
  );
}

/** Scroll bars only where there is something to scroll to; React Native's types do not name it. */
const auto = 'auto' as 'scroll';

const useStyles = makeStyles((t) => ({
  opening: {
    overflow: auto,
    maxWidth: '100%',
    alignItems: 'flex-start',
    userSelect: 'none',
    cursor: 'pointer',
    borderRadius: t.radius.sm,
  },
  enlarged: { borderWidth: t.line.thin, borderColor: t.colours.ruleStrong },
  drawing: { flexShrink: 0 },
}));
