import { View } from 'react-native';
import Svg, { G, Rect } from 'react-native-svg';
import { makeStyles } from '@/components/theme';
import { sketchScale } from '@/components/theme/sketch-scale';
import { Text } from '@/components/ui/text';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { isSuspect } from './part-glyph';
import type { Inks } from './sketch-inks';
import type { SketchMarks, SocketState } from './sketch-types';
import { PencilRing, SocketBody } from './socket-body';

const order: readonly SocketState[] = ['failed', 'mixed', 'passed', 'untested', 'possible', 'ruled-out'];

const words: Record<SocketState, string> = {
  failed: 'ring and hatching: did not answer',
  mixed: 'half ring: failed and answered',
  passed: 'tick: answered',
  untested: 'dashed: not tested',
  possible: 'heavy line: still possible',
  'ruled-out': 'dots: ruled out',
  plain: '',
};

const { swatch, line, gap } = sketchScale;
const size = { width: swatch.height * 0.58, height: swatch.height * 0.72 };

type SketchLegendProps = { index: LayoutIndex; marks: SketchMarks; chosen: boolean; inks: Inks };

/** What the marks on the sketch mean; only those that are on it. */
export function SketchLegend({ index, marks, chosen, inks }: SketchLegendProps) {
  const styles = useStyles();
  const present = new Set<SocketState>();
  for (const { label } of index.document.sockets) present.add(marks.sockets.get(label)?.state ?? 'plain');
  const parts = index.document.sharedParts;
  const suspected = parts.some(({ label }) => isSuspect(marks.sharedParts.get(label)));
  return (
    <View role="list" aria-label="What the marks mean" style={styles.legend}>
      {order
        .filter((state) => present.has(state))
        .map((state) => (
          <Entry key={state} text={words[state]}>
            <SocketBody size={size} pin1={{ x: -1, y: -1 }} notch={{ x: 0, y: -1 }} state={state} inks={inks} />
            {state === 'failed' || state === 'mixed' ? (
              <PencilRing size={size} half={state === 'mixed'} inks={inks} />
            ) : null}
          </Entry>
        ))}
      {parts.length > 0 ? (
        <Entry text="long dashes: shared part">
          <Rect
            x={-swatch.width / 2 + gap.hair}
            y={-swatch.height / 4}
            width={swatch.width - 2 * gap.hair}
            height={swatch.height / 2}
            fill="none"
            stroke={suspected ? inks.mark : inks.soft}
            strokeWidth={suspected ? line.mark : line.hair}
            strokeDasharray="9 5"
          />
        </Entry>
      ) : null}
      {chosen || marks.outlinedMeans ? (
        <Entry text={`double line: ${[chosen && 'chosen', marks.outlinedMeans].filter(Boolean).join(', ')}`}>
          <Rect x={-7} y={-8} width={14} height={16} fill="none" stroke={inks.pen} strokeWidth={line.body} />
          <Rect x={-10} y={-11} width={20} height={22} fill="none" stroke={inks.pen} strokeWidth={line.mark} />
        </Entry>
      ) : null}
    </View>
  );
}

function Entry({ text, children }: { text: string; children: React.ReactNode }) {
  const styles = useStyles();
  return (
    <View role="listitem" style={styles.entry}>
      <View aria-hidden>
        <Svg width={swatch.width} height={swatch.height}>
          <G transform={`translate(${swatch.width / 2} ${swatch.height / 2})`}>{children}</G>
        </Svg>
      </View>
      <Text variant="fine" tone="soft">
        {text}
      </Text>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  legend: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    columnGap: t.space.lg,
    rowGap: t.space.xs,
    margin: t.space.none,
    padding: t.space.none,
  },
  entry: { flexDirection: 'row', alignItems: 'center', gap: t.space.xs },
}));
