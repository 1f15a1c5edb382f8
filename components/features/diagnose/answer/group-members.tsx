import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import type { SuspectGroup } from '@/shared';
import { ShareBar } from './share-bar';

/** Parts that the evidence cannot tell apart, with their shares, why, and what would tell them apart where the next check does not say it anyway. */
export function GroupMembers({ group, nextCheck }: { group: SuspectGroup; nextCheck: string | null }) {
  const styles = useStyles();
  return (
    <View style={styles.group}>
      <View role="list" aria-label="Members of the group" style={styles.list}>
        {group.members.map(({ id, label, share }) => (
          <View key={id} role="listitem">
            <ShareBar label={label} share={share} mono={label.length <= 8} />
          </View>
        ))}
      </View>
      <Text variant="small">{group.why}</Text>
      {group.check === null || group.check === nextCheck ? null : (
        <Text variant="small">
          <Text variant="smallStrong">To tell them apart: </Text>
          {group.check}
        </Text>
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({ group: { gap: t.space.sm }, list: { gap: t.space.xs } }));
