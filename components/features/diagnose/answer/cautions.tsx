import { useSyncExternalStore } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Link } from '@/components/ui/link';
import { Text } from '@/components/ui/text';
import type { Caution } from '@/shared';

// Put away for the session of this page only: the next visit shows them again.
let putAway = false;
const listeners = new Set<() => void>();
const subscribe = (changed: () => void) => {
  listeners.add(changed);
  return () => void listeners.delete(changed);
};
const setPutAway = (next: boolean) => {
  putAway = next;
  for (const changed of listeners) changed();
};

/** The cautions that apply to this answer: short, put away by one press, and always one press away. */
export function Cautions({ cautions }: { cautions: readonly Caution[] }) {
  const styles = useStyles();
  const hidden = useSyncExternalStore(
    subscribe,
    () => putAway,
    () => false,
  );
  if (cautions.length === 0) return null;
  return (
    <View role="region" aria-label="Cautions" style={styles.all}>
      {hidden ? null : (
        <View role="list" style={styles.list}>
          {cautions.map(({ id, text }, at) => (
            <View key={id} role="listitem">
              <Text variant={at === 0 ? 'smallStrong' : 'small'} tone={at === 0 ? 'ink' : 'soft'}>
                {text}
              </Text>
            </View>
          ))}
        </View>
      )}
      <View style={styles.row}>
        <Button
          kind="quiet"
          label={hidden ? `Cautions (${cautions.length})` : 'Put these away'}
          aria-expanded={!hidden}
          onPress={() => setPutAway(!hidden)}
        />
        <Link href="/learn/cautions" variant="smallStrong" standalone>
          All cautions
        </Link>
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: {
    gap: t.space.xs,
    paddingTop: t.space.md,
    borderTopWidth: t.line.thin,
    borderTopColor: t.colours.ruleStrong,
  },
  list: { gap: t.space.xs },
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: t.space.lg, marginLeft: -t.space.sm },
}));
