import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { glassSize } from '@/lib';
import type { PictureMark, ScreenMap } from '@/shared';
import { NumberStepper } from './number-stepper';
import type { MarkDraft } from './picture-draft';

type MarkFieldsProps = { map: ScreenMap; draft: MarkDraft; onChange: (draft: MarkDraft) => void };

/** Where a mark lies, in figures: what a finger sets on the sketch can be set here to the dot. */
export function MarkFields({ map, draft, onChange }: MarkFieldsProps) {
  const styles = useStyles();
  const { shape, mark } = draft;
  if (shape === 'whole') return null;
  const { width, height } = glassSize(map);
  const set = (change: Partial<PictureMark>) => onChange({ shape, mark: { ...mark, ...change } });
  const columns = { name: 'column', size: width, span: mark.x, every: mark.everyX } as const;
  const lines = { name: 'line', size: height, span: mark.y, every: mark.everyY } as const;
  const setX = (x: Span) => set({ x });
  const setY = (y: Span) => set({ y });
  return (
    <View role="group" aria-label="Where it is wrong" style={styles.fields}>
      {shape === 'lines' ? (
        <>
          <Ends {...lines} onChange={setY} />
          <Every {...lines} onChange={(y, everyY) => set({ y, everyY })} />
        </>
      ) : (
        <>
          <Ends {...columns} onChange={setX} />
          {shape === 'columns' ? <Every {...columns} onChange={(x, everyX) => set({ x, everyX })} /> : null}
          <Ends {...lines} onChange={setY} />
        </>
      )}
    </View>
  );
}

type Span = [number, number];
type AxisProps = { name: 'column' | 'line'; size: number; span: Span; every: number | undefined };

/** First and last of a span. What comes again is moved as a whole; otherwise one end pushes the other. */
function Ends({ name, size, span: [from, to], every, onChange }: AxisProps & { onChange: (span: Span) => void }) {
  const wide = every === undefined ? 0 : to - from;
  return (
    <>
      <NumberStepper
        label={`First ${name}`}
        value={from}
        least={0}
        most={size - 1 - wide}
        soon={every === undefined ? [0, to] : undefined}
        onChange={(first) => onChange([first, every === undefined ? Math.max(first, to) : first + wide])}
      />
      <NumberStepper
        label={`Last ${name}`}
        value={to}
        least={every === undefined ? 0 : from}
        most={every === undefined ? size - 1 : Math.min(size - 1, from + every - 1)}
        soon={[from, size - 1]}
        onChange={(last) => onChange([Math.min(from, last), last])}
      />
    </>
  );
}

type EveryProps = AxisProps & { onChange: (span: Span, every: number | undefined) => void };

/** How often a span comes again; 0 where it does not. */
function Every({ size, span: [from, to], every, onChange }: EveryProps) {
  return (
    <NumberStepper
      label="Again every, 0: once"
      value={every ?? 0}
      least={0}
      most={size}
      onChange={(next) =>
        next === 0 ? onChange([from, to], undefined) : onChange([from, Math.min(to, from + next - 1)], next)
      }
    />
  );
}

const useStyles = makeStyles((t) => ({
  fields: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.md },
}));
