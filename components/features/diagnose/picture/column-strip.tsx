import { Pressable, View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import { useRovingFocus } from '@/components/ui/use-roving-focus';

type ColumnStripProps = {
  name: 'column' | 'line';
  /** Columns between one repeat and the next. */
  every: number;
  span: readonly [number, number];
  onChoose: (first: number) => void;
};

/** The columns of one repeat enlarged, so that a finger can pick the one among its neighbours. */
export function ColumnStrip({ name, every, span, onChoose }: ColumnStripProps) {
  const styles = useStyles();
  const first = span[0] % every;
  const wide = Math.min(every, span[1] - span[0] + 1);
  const isWrong = (at: number) => (at - first + every) % every < wide;
  const roving = useRovingFocus({ count: every, index: first, move: onChoose });
  return (
    <View style={styles.part}>
      <Text variant="label">{`Which of every ${every} ${name}s`}</Text>
      <View
        role="radiogroup"
        aria-label={`Which of every ${every} ${name}s is the first that is wrong`}
        style={styles.strip}
        onKeyDown={roving.onKeyDown}
      >
        {Array.from({ length: every }, (_, at) => (
          <Pressable
            key={at}
            ref={roving.itemRef(at)}
            role="radio"
            aria-checked={at === first}
            aria-label={`${name} ${at}`}
            tabIndex={at === first ? 0 : -1}
            onPress={() => onChoose(at)}
            style={[styles.column, isWrong(at) && styles.wrong]}
          >
            <Text variant="codeSmall" tone={isWrong(at) ? 'onPencil' : 'ink'}>
              {isWrong(at) ? `×${at}` : at}
            </Text>
          </Pressable>
        ))}
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  part: { gap: t.space.xs },
  strip: { flexDirection: 'row', flexWrap: 'wrap' },
  column: {
    flexGrow: 1,
    flexBasis: '12.5%',
    minHeight: t.target,
    alignItems: 'center',
    justifyContent: 'center',
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.thin,
    borderColor: t.colours.ruleStrong,
  },
  wrong: { backgroundColor: t.colours.pencil, borderColor: t.colours.pencil },
}));
