import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import type { LogProgress } from './log-task';
import { byteWords, counted, countedOf, speedWords } from './log-words';

type LogProgressProps = {
  name: string;
  progress: LogProgress | null;
  /** It is read where the screen is drawn. */
  foreground: boolean;
  onCancel: () => void;
};

/** How far the reading of a log is, and the way to stop it. */
export function LogProgressPanel({ name, progress, foreground, onCancel }: LogProgressProps) {
  const styles = useStyles();
  const share = progress === null || progress.total === 0 ? 0 : progress.read / progress.total;
  const percent = Math.floor(100 * share);
  return (
    <View style={styles.all}>
      <Text role="status" variant="strong">{`Reading ${name}`}</Text>
      <View
        role="progressbar"
        aria-label={`Reading ${name}`}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent}
        aria-valuetext={`${percent} %`}
        style={styles.track}
      >
        <View style={[styles.bar, { width: `${percent}%` }]} />
      </View>
      <Text variant="small" tone="soft">
        {progress === null ? 'Beginning…' : words(progress)}
      </Text>
      {foreground ? (
        <Text variant="small" tone="mark">
          This browser cannot read it in the background, so the screen may answer slowly meanwhile.
        </Text>
      ) : null}
      <View style={styles.row}>
        <Button label="Stop reading" onPress={onCancel} />
      </View>
    </View>
  );
}

function words({ read, total, counts, seconds }: LogProgress): string {
  const unread = counts.unread === 0 ? '' : `, ${counted(counts.unread)} not read`;
  return [
    `${byteWords(read)} of ${byteWords(total)}`,
    `${countedOf(counts.lines, 'line')}${unread}`,
    speedWords(counts.lines, seconds),
  ].join('; ');
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  track: {
    height: t.space.lg,
    borderWidth: t.line.thin,
    borderColor: t.colours.ink,
    backgroundColor: t.colours.sheet,
    borderRadius: t.radius.sm,
    overflow: 'hidden',
  },
  bar: { height: '100%', backgroundColor: t.colours.pen },
  row: { flexDirection: 'row', gap: t.space.sm },
}));
