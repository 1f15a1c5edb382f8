import { useRouter } from 'expo-router';
import { Pressable, View } from 'react-native';
import { problemWords } from '@/components/api/problem';
import { useOnline } from '@/components/api/use-online';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { VisuallyHidden } from '@/components/ui/visually-hidden';
import { boardFacts, type BoardFamily } from './find-boards';
import type { BoardSearch } from './use-board-search';

type FoundBoardsProps = {
  search: BoardSearch;
  text: string;
  /** A board of several revisions was chosen. */
  onBoard: (family: BoardFamily) => void;
};

/** The boards that fit, each one press away from its workspace. */
export function FoundBoards({ search, text, onBoard }: FoundBoardsProps) {
  const styles = useStyles();
  const online = useOnline();
  const { families, state, deviceOnly, more } = search;
  const wanted = text.trim();
  if (state === 'loading') return <Loading label="Fetching the boards" lines={6} />;
  if (state === 'failed') {
    return (
      <ErrorState title={problemWords(search.error)} onRetry={search.retry}>
        No board was opened on this device before, so there is nothing to look up without the server.
      </ErrorState>
    );
  }
  if (families.length === 0) {
    return (
      <EmptyState title={wanted === '' ? 'No board is published yet.' : `No board fits “${wanted}”.`}>
        {deviceOnly
          ? 'Only boards that were opened on this device can be searched without the network.'
          : 'Try the maker alone, or the number etched in the copper. Boards are added by the people who repair them.'}
      </EmptyState>
    );
  }
  const count = `${families.length}${more === null ? '' : ' and more'} ${families.length === 1 ? 'board' : 'boards'}`;
  return (
    <View style={styles.all}>
      {deviceOnly ? (
        <Notice kind="warning" title={online ? 'The server cannot be reached.' : 'No network.'}>
          These boards are kept on this device and work as they are.
        </Notice>
      ) : null}
      <VisuallyHidden role="status">{wanted === '' ? '' : count}</VisuallyHidden>
      <View role="list" aria-label="Boards" style={styles.list}>
        {families.map((family) => (
          <BoardRow key={family.key} family={family} kept={search.kept} onBoard={onBoard} />
        ))}
      </View>
      {more === null ? null : <Button label="More boards" onPress={more} />}
    </View>
  );
}

type BoardRowProps = { family: BoardFamily; kept: ReadonlySet<string>; onBoard: (family: BoardFamily) => void };

function BoardRow({ family, kept, onBoard }: BoardRowProps) {
  const styles = useStyles();
  const router = useRouter();
  const { revisions, maker, name } = family;
  const [only] = revisions;
  if (only === undefined) return null;
  const several = revisions.length > 1;
  const onDevice = revisions.filter(({ slug }) => kept.has(slug)).length;
  return (
    <View role="listitem" style={styles.item}>
      <Pressable
        role="link"
        onPress={() =>
          several ? onBoard(family) : router.push({ pathname: '/boards/[slug]/diagnose', params: { slug: only.slug } })
        }
        style={(state) => [styles.row, (state.hovered || state.pressed) && styles.held]}
      >
        <View style={styles.words}>
          <Text variant="subheading" level={null}>
            {name}
          </Text>
          <Text variant="small">
            {several
              ? `${maker}, revisions ${revisions.map(({ revision }) => revision).join(', ')}`
              : `${maker}, revision ${only.revision}`}
          </Text>
          <Text variant="small" tone="soft">
            {boardFacts(only)}
          </Text>
        </View>
        {onDevice === 0 ? null : (
          <Text variant="fine" tone="tick" align="right" style={styles.kept}>
            {onDevice === revisions.length
              ? '✓ works without network'
              : `✓ ${onDevice} of ${revisions.length} without network`}
          </Text>
        )}
      </Pressable>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  list: { borderTopWidth: t.line.thin, borderTopColor: t.colours.ink },
  item: { borderBottomWidth: t.line.thin, borderBottomColor: t.colours.rule },
  row: {
    minHeight: t.target,
    paddingVertical: t.space.md,
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: t.space.md,
  },
  held: { backgroundColor: t.colours.sheet },
  words: { flexShrink: 1, minWidth: 0 },
  kept: { maxWidth: t.measure.beside },
}));
