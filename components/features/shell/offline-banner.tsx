import { View } from 'react-native';
import { useOnline } from '@/components/api/use-online';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';

/** Says that there is no network, and what still works. The place is always there, so that it is read out when it fills. */
export function OfflineBanner() {
  const styles = useStyles();
  const online = useOnline();
  return (
    <View role="status" dataSet={{ print: 'hide' }}>
      {online ? null : (
        <View style={styles.banner}>
          <Text variant="smallStrong" tone="mark">
            Offline
          </Text>
          <Text variant="small">Boards opened before still work. Nothing you type is lost.</Text>
        </View>
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  banner: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    columnGap: t.space.md,
    paddingHorizontal: t.space.lg,
    paddingVertical: t.space.sm,
    backgroundColor: t.colours.sheet,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.ruleStrong,
    borderLeftWidth: t.line.bar,
    borderLeftColor: t.colours.mark,
  },
}));
