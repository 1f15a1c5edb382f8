import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { percentWords } from '@/components/ui/percent';
import { Text } from '@/components/ui/text';
import { stated } from '../stated';

/** A share (0 to 1) as a line of ink beside its words. The words alone say all of it. */
export function ShareBar({ label, share, mono = false }: { label: string; share: number; mono?: boolean }) {
  const styles = useStyles();
  return (
    <View style={styles.row}>
      <View style={styles.label}>
        <Text variant={mono ? 'codeSmall' : 'small'}>{label}</Text>
      </View>
      <View aria-hidden style={styles.track}>
        <View style={[styles.bar, { width: `${Math.max(1, Math.round(share * 100))}%` }]} />
      </View>
      <View style={styles.number}>
        <Text variant="smallStrong" align="right">
          {percentWords(stated(share))}
        </Text>
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  row: { flexDirection: 'row', alignItems: 'center', gap: t.space.sm },
  label: { flexBasis: 0, flexGrow: 5, minWidth: 0 },
  track: {
    flexBasis: 0,
    flexGrow: 4,
    height: t.space.sm,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.ruleStrong,
  },
  bar: { height: t.space.xs, marginTop: t.space.hair, backgroundColor: t.colours.ink },
  number: { minWidth: t.target + t.space.xl },
}));
