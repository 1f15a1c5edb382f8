import { useCallback, useMemo, useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { sketchScale } from '@/components/theme/sketch-scale';
import { useMediaQuery } from '@/components/theme/use-media-query';
import { Text } from '@/components/ui/text';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { greatestZoom, zoomFactor, type FitInput } from './geometry-fit';
import { findAxes } from './geometry-grid';
import { buildScene } from './geometry-scene';
import { sideActions, zoomActions, type SketchAction } from './sketch-actions';
import { SketchControls } from './sketch-controls';
import { SketchDrawing } from './sketch-drawing';
import { useInks } from './sketch-inks';
import { SketchLegend } from './sketch-legend';
import { SketchTable } from './sketch-table';
import type { PickTarget, SketchMarks, SketchView } from './sketch-types';
import { firstSuspect } from './suspect';
import { initialSketchView } from './use-sketch-view';
import { sideWords } from './words';

/** Props of BoardSketch. */
export type BoardSketchProps = {
  index: LayoutIndex;
  marks: SketchMarks;
  view: SketchView;
  onView: (view: SketchView) => void;
  /** What was tapped, or chosen by key or in the table. Left out: nothing can be chosen. */
  onPick?: (target: PickTarget) => void;
  picked?: PickTarget | null;
  /** The buttons for turn, side, table and zoom; shown where nothing is said. */
  showControls?: boolean;
  /** The drawing alone: no words about the side while the board lies as drawn, no legend. */
  compact?: boolean;
  /** Name of the sketch; the board's name and which side is up where nothing is said. */
  label?: string;
  /** For paper: whole, in one ink, without buttons. The sketch turns to it by itself when the page is printed. */
  print?: boolean;
  /** Greatest height of the drawing, px; a container's width, or a phone's worth, where nothing is said. */
  greatestHeight?: number;
};

/** The board from above or below: every socket with what is known of it, and a table that says the same. */
export function BoardSketch(props: BoardSketchProps) {
  const { index, marks, view, onView, onPick, picked = null, showControls = true, compact = false } = props;
  const styles = useStyles();
  const printing = useMediaQuery('print');
  const print = props.print === true || printing;
  const inks = useInks(print);
  const [aims, setAims] = useState(0);
  const [width, setWidth] = useState<number>(sketchScale.firstWidth);
  const greatestHeight = props.greatestHeight ?? Math.max(sketchScale.greatestHeight, width);
  const { turn, solderSide } = view;
  const scene = useMemo(() => buildScene(index, { turn, solderSide }), [index, turn, solderSide]);
  const axes = useMemo(() => findAxes(index, scene.sockets), [index, scene]);
  const input = useMemo(
    (): FitInput => ({ scene, axes, width, greatestHeight, edge: !compact }),
    [scene, axes, width, greatestHeight, compact],
  );
  const factor = print ? 1 : zoomFactor(view.zoom, input);
  const suspect = useMemo(() => firstSuspect(scene, marks), [scene, marks]);
  const context = { view, factor, greatest: greatestZoom(input), hasSuspect: suspect !== null };
  const side = sideWords(index, view);
  const controls = showControls && !print;
  const table = view.table && !print;
  const drawn = initialSketchView(index);
  const asDrawn = turn === drawn.turn && solderSide === drawn.solderSide;

  const onFactor = useCallback(
    (wanted: number) => {
      const next = zoomFactor(wanted, input);
      onView({ ...view, zoom: next <= 1.02 ? 'whole' : next });
    },
    [view, onView, input],
  );
  const act = (action: SketchAction) => {
    if (action.id === 'suspect') setAims(aims + 1);
    onView(action.run(context));
  };
  const onActionKey = (key: string) => {
    const action = [...sideActions, ...zoomActions].find(({ keys }) => keys.includes(key));
    if (!controls || !action?.allowed(context)) return false;
    act(action);
    return true;
  };

  return (
    <View
      style={styles.sketch}
      onLayout={({ nativeEvent }) => setWidth(Math.max(1, Math.floor(nativeEvent.layout.width)))}
    >
      {controls || !compact || !asDrawn ? (
        <View style={styles.head}>
          <View style={styles.side}>
            {table ? null : (
              <Text variant="strong" aria-live="polite">
                {side}
              </Text>
            )}
          </View>
          {controls ? (
            <SketchControls label="View of the board" actions={sideActions} context={context} onAction={act} />
          ) : null}
        </View>
      ) : null}
      {table ? (
        <SketchTable index={index} marks={marks} picked={picked} onPick={onPick} />
      ) : (
        <SketchDrawing
          {...{ index, marks, view, input, factor, suspect, aims, picked, inks, print, onPick, onFactor, onActionKey }}
          label={props.label ?? `${index.document.board.name}. ${side}`}
        />
      )}
      {controls && !table && context.greatest > 1.25 ? (
        <SketchControls label="Zoom" actions={zoomActions} context={context} onAction={act} />
      ) : null}
      {compact || table ? null : <SketchLegend index={index} marks={marks} chosen={picked !== null} inks={inks} />}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  sketch: { gap: t.space.sm, alignItems: 'stretch', minWidth: 0 },
  head: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: t.space.sm,
  },
  side: { flexGrow: 1, flexShrink: 1 },
}));
