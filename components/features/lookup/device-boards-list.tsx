import { useRouter } from 'expo-router';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { ButtonLink } from '@/components/ui/button';
import { Chip } from '@/components/ui/chip';
import { Text } from '@/components/ui/text';
import { useDeviceBoards, type RecentBoard } from './device-boards';

/** Boards that were starred or opened on this device, and the look-up that was left last. */
export function DeviceBoards({ kept }: { kept: ReadonlySet<string> }) {
  const styles = useStyles();
  const { recent, starred, lookups } = useDeviceBoards();
  const [last] = recent;
  const link = last === undefined ? undefined : lookups[last.slug];
  if (recent.length + starred.length === 0) return null;
  return (
    <View style={styles.all}>
      {last !== undefined && link !== undefined ? (
        <ButtonLink
          kind="secondary"
          href={{ pathname: '/boards/[slug]/diagnose', params: { slug: last.slug, r: link } }}
          label={`Take up the last look-up: ${last.name}`}
        />
      ) : null}
      <Row title="Starred" boards={starred} kept={kept} />
      <Row title="Opened here" boards={recent} kept={kept} />
    </View>
  );
}

function Row({ title, boards, kept }: { title: string; boards: readonly RecentBoard[]; kept: ReadonlySet<string> }) {
  const styles = useStyles();
  const router = useRouter();
  if (boards.length === 0) return null;
  return (
    <View role="group" aria-label={title} style={styles.group}>
      <Text variant="small" tone="soft">
        {title}
      </Text>
      <View style={styles.row}>
        {boards.map(({ slug, name }) => (
          <Chip
            key={slug}
            label={name}
            aria-label={`${name}${kept.has(slug) ? ', works without network' : ''}`}
            onPress={() => router.push({ pathname: '/boards/[slug]/diagnose', params: { slug } })}
          />
        ))}
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  group: { gap: t.space.xs },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
