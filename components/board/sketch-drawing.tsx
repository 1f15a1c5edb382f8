import { memo, useId, useMemo, useRef, useState } from 'react';
import { View } from 'react-native';
import Svg from 'react-native-svg';
import { makeStyles } from '@/components/theme';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { drawParts, drawSockets, type PartDrawing, type SocketDrawing } from './geometry-drawing';
import { fitScene, wholeScale, type FitInput } from './geometry-fit';
import { directions, nearestTo, neighbourOf, readingOrder } from './geometry-nearest';
import { keyOf, type ScenePart, type SceneSocket, type TargetKey } from './geometry-scene';
import { PartGlyph } from './part-glyph';
import { SketchAxes, SketchEdge } from './sketch-axes';
import type { Inks } from './sketch-inks';
import { SketchOverlay } from './sketch-overlay';
import type { PickTarget, SketchMarks, SketchView } from './sketch-types';
import { SocketGlyph } from './socket-glyph';
import { useOpening } from './use-opening';

type SketchDrawingProps = {
  index: LayoutIndex;
  marks: SketchMarks;
  view: SketchView;
  input: FitInput;
  factor: number;
  suspect: SceneSocket | ScenePart | null;
  picked: PickTarget | null;
  label: string;
  inks: Inks;
  print: boolean;
  onPick?: (target: PickTarget) => void;
  onFactor: (factor: number) => void;
  /** Keys of the view's actions; true where one was meant. */
  onActionKey: (key: string) => boolean;
};

type Target = SceneSocket | ScenePart;

const kindOf = (key: TargetKey): PickTarget['kind'] => (key.startsWith('socket:') ? 'socket' : 'shared-part');

/** The drawing in its opening: one stop of the tab key, arrow keys inside, nearest socket under a finger. */
export function SketchDrawing(props: SketchDrawingProps) {
  const { index, marks, view, input, factor, suspect, picked, label, inks, print, onPick, onFactor, onActionKey } =
    props;
  const styles = useStyles();
  const base = useId();
  const { scene, axes } = input;
  const fit = useMemo(() => fitScene(input, factor), [input, factor]);
  const whole = useMemo(() => fitScene(input, 1), [input]);
  const enlarged = factor > 1;
  const sockets = useMemo(
    () => drawSockets(index, { scene, axes, fit, tellAll: enlarged }),
    [index, scene, axes, fit, enlarged],
  );
  const parts = useMemo(() => drawParts(index, scene, fit), [index, scene, fit]);
  const targets = useMemo(() => readingOrder<Target>([...scene.sockets, ...scene.parts]), [scene]);
  const opening = useOpening({
    fit,
    lie: `${view.turn}${view.solderSide}`,
    aim: view.zoom === 'suspect' ? (suspect?.box ?? null) : null,
    factor,
    onFactor,
  });
  const pointer = useRef(false);
  const [focus, setFocus] = useState<'none' | 'pointer' | 'keyboard'>('none');
  const [wandered, setWandered] = useState<TargetKey | null>(null);

  const chosen = picked ? keyOf(picked) : null;
  const find = (key: TargetKey | null) => targets.find((target) => target.key === key);
  const active = find(wandered) ?? find(chosen) ?? suspect ?? targets[0];
  const idOf = (key: TargetKey) => `${base}${key}`.replace(/\s/g, '_');

  const pick = (target: Target) => {
    setWandered(target.key);
    onPick?.({ kind: kindOf(target.key), label: target.label });
  };
  const tap = (target: Target) => {
    if (scene.side * fit.scale < sketchScale.tappableSocket) {
      opening.lookAtNext(target.box);
      onFactor(sketchScale.readableSocket / (scene.side * wholeScale(input)));
    }
    pick(target);
  };
  const onClick = (event: React.MouseEvent) => {
    const at = opening.toDrawing(event);
    const option = event.target instanceof Element ? event.target.closest('[role="option"]')?.id : undefined;
    const direct = option === undefined ? undefined : targets.find(({ key }) => idOf(key) === option);
    const target = direct ?? nearestTo(targets, fit.toUnits(at), sketchScale.reach / fit.scale);
    if (target) tap(target);
  };
  const moveTo = (target: Target | null | undefined) => {
    if (!target) return;
    setWandered(target.key);
    opening.reveal(target.box);
  };
  const onKeyDown = (event: React.KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey || !active) return;
    setFocus('keyboard');
    const direction = directions[event.key as keyof typeof directions];
    if (direction) moveTo(neighbourOf(targets, active, direction));
    else if (event.key === 'Home') moveTo(targets[0]);
    else if (event.key === 'End') moveTo(targets[targets.length - 1]);
    else if (event.key === 'Enter' || event.key === ' ') pick(active);
    else {
      opening.lookAtNext(active.box);
      if (!onActionKey(event.key)) return;
    }
    event.preventDefault();
  };

  const box: object = {
    role: 'listbox',
    'aria-label': label,
    'aria-activedescendant': active ? idOf(active.key) : undefined,
    tabIndex: 0,
    onClick,
    onKeyDown,
    onMouseDown: () => {
      pointer.current = true;
    },
    onFocus: () => {
      setFocus(pointer.current ? 'pointer' : 'keyboard');
      pointer.current = false;
    },
    onBlur: () => setFocus('none'),
  };
  const height = Math.min(fit.height, Math.max(whole.height, enlarged ? sketchScale.leastOpening : 0));
  const size = print ? { width: '100%', height: undefined } : { width: fit.width, height: fit.height };
  return (
    <View ref={opening.ref} {...box} style={[styles.opening, print ? null : { height }]}>
      <Svg
        {...size}
        viewBox={`0 0 ${fit.width} ${fit.height}`}
        {...presentation}
        style={{ flexShrink: 0, maxWidth: fit.width }}
      >
        <SketchEdge edge={scene.edge} name={index.document.board.view.edgeName} fit={fit} inks={inks} />
        <SketchAxes axes={axes} fit={fit} inks={inks} />
        <Glyphs {...{ index, marks, sockets, parts, chosen, idOf, inks }} />
        <SketchOverlay
          sockets={sockets}
          parts={parts}
          marks={marks}
          labelOf={(drawing) => drawing.key.slice(drawing.key.indexOf(':') + 1)}
          chosen={chosen}
          focused={focus === 'keyboard' && active ? active.key : null}
          inks={inks}
        />
      </Svg>
    </View>
  );
}

const presentation: object = { role: 'presentation' };

type GlyphsProps = {
  index: LayoutIndex;
  marks: SketchMarks;
  sockets: readonly SocketDrawing[];
  parts: readonly PartDrawing[];
  chosen: TargetKey | null;
  idOf: (key: TargetKey) => string;
  inks: Inks;
};

const Glyphs = memo(function Glyphs({ index, marks, sockets, parts, chosen, idOf, inks }: GlyphsProps) {
  const { document } = index;
  return (
    <>
      {parts.map((drawing) => (
        <PartGlyph
          key={drawing.key}
          index={index}
          drawing={drawing}
          mark={marks.sharedParts.get(document.sharedParts[drawing.at]?.label ?? '')}
          id={idOf(drawing.key)}
          chosen={chosen === drawing.key}
          inks={inks}
        />
      ))}
      {sockets.map((drawing) => (
        <SocketGlyph
          key={drawing.key}
          index={index}
          drawing={drawing}
          mark={marks.sockets.get(document.sockets[drawing.at]?.label ?? '')}
          id={idOf(drawing.key)}
          chosen={chosen === drawing.key}
          inks={inks}
        />
      ))}
    </>
  );
});

const useStyles = makeStyles((t) => ({
  opening: {
    overflow: 'scroll',
    maxWidth: '100%',
    alignItems: 'flex-start',
    userSelect: 'none',
    cursor: 'pointer',
    borderRadius: t.radius.sm,
  },
}));
