import { View } from 'react-native';
import { problemWords } from '@/components/api/problem';
import { useOnline } from '@/components/api/use-online';
import { makeStyles } from '@/components/theme';
import { Button, ButtonLink } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import { searchWords, type LibraryLink } from './library-link';
import { LibraryTable } from './library-table';
import { useLibrary, type Library } from './use-library';

type LibraryListProps = { link: LibraryLink; onClear: () => void };

/** The boards that fit the link; on their way, missing, or only those of this device. */
export function LibraryList({ link, onClear }: LibraryListProps) {
  const styles = useStyles();
  const library = useLibrary(link);
  const { rows, kept, state, deviceOnly, settling } = library;
  if (state === 'loading') return <Loading label="Fetching the boards" lines={8} />;
  if (state === 'failed') {
    return (
      <ErrorState title={problemWords(library.error)} onRetry={library.retry}>
        The list did not come. What you searched stands in the address.
      </ErrorState>
    );
  }
  return (
    <View style={[styles.all, settling && styles.settling]} aria-busy={settling}>
      {deviceOnly ? <DeviceOnly retry={library.retry} /> : null}
      <Text variant="small" tone="soft" role="status">
        {countWords(library)}
      </Text>
      {rows.length === 0 ? (
        <NoBoard link={link} deviceOnly={deviceOnly} onClear={onClear} />
      ) : (
        <LibraryTable rows={rows} kept={kept} />
      )}
      <More library={library} />
    </View>
  );
}

function countWords({ rows, kept, more, deviceOnly }: Library): string {
  if (rows.length === 0) return '';
  const boards = `${rows.length} ${rows.length === 1 ? 'board' : 'boards'}`;
  if (deviceOnly) return `${boards} on this device.`;
  const here = rows.filter(({ slug }) => kept.has(slug)).length;
  const onDevice = here === 0 ? '' : ` ${here} of them kept on this device.`;
  return more === null ? `${boards}.${onDevice}` : `The first ${boards}; there are more.${onDevice}`;
}

function DeviceOnly({ retry }: { retry: () => void }) {
  const online = useOnline();
  return (
    <Notice
      kind="warning"
      title={online ? 'The server cannot be reached.' : 'No network.'}
      action={<Button label="Try again" onPress={retry} />}
    >
      Listed are the boards that are kept on this device. They work as they are.
    </Notice>
  );
}

function NoBoard({ link, deviceOnly, onClear }: LibraryListProps & { deviceOnly: boolean }) {
  const searched = searchWords(link);
  if (searched === '') {
    return (
      <EmptyState title={deviceOnly ? 'No board is kept on this device.' : 'No board is published yet.'}>
        {deviceOnly
          ? 'Open a board once with a network, and it works without one from then on.'
          : 'Boards are added by the people who repair them.'}
      </EmptyState>
    );
  }
  return (
    <EmptyState
      title={`No board ${deviceOnly ? 'on this device ' : ''}fits.`}
      action={
        <>
          <Button kind="primary" label="Clear search and filters" onPress={onClear} />
          {deviceOnly ? null : <ButtonLink href="/contribute" label="Document a board" />}
        </>
      }
    >
      {`Searched: ${searched}. Try the maker alone, or fewer filters.`}
    </EmptyState>
  );
}

function More({ library: { more, fetchingMore, moreFailed, error } }: { library: Library }) {
  const styles = useStyles();
  if (more === null) return null;
  return (
    <View style={styles.more}>
      {moreFailed ? (
        <Text role="alert" variant="smallStrong" tone="pencil">
          {problemWords(error)}
        </Text>
      ) : null}
      <Button label="More boards" busy={fetchingMore} busyLabel="Fetching…" onPress={more} />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  settling: { opacity: 0.6 },
  more: { alignItems: 'flex-start', gap: t.space.sm },
}));
