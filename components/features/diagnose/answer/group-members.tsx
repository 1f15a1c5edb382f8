import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import type { SuspectGroup } from '@/shared';
import { ShareBar } from './share-bar';

type GroupMembersProps = Pick<SuspectGroup, 'members' | 'check'> & {
  /** Null where it is said already. */
  why: string | null;
};

/** Parts that the evidence cannot tell apart, with their shares, why, and what would tell them apart. */
export function GroupMembers({ members, why, check }: GroupMembersProps) {
  const styles = useStyles();
  return (
    <View style={styles.group}>
      <View role="list" aria-label="Members of the group" style={styles.list}>
        {members.map(({ id, label, share }) => (
          <View key={id} role="listitem">
            <ShareBar label={label} share={share} mono={label.length <= 8} />
          </View>
        ))}
      </View>
      {why === null ? null : <Text variant="small">{why}</Text>}
      {check === null ? null : (
        <Text variant="small">
          <Text variant="smallStrong">To tell them apart: </Text>
          {check}
        </Text>
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({ group: { gap: t.space.sm }, list: { gap: t.space.xs } }));
