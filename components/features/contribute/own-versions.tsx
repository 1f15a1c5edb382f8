import { useInfiniteQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { ownVersionsQuery, versionQuery } from '@/components/api/layout-versions';
import { problemWords } from '@/components/api/problem';
import { stateWords } from '@/components/features/boards/version-words';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { dateWords } from '@/components/ui/date-words';
import { Link } from '@/components/ui/link';
import { Panel } from '@/components/ui/panel';
import { ErrorState, Loading } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import type { VersionRow } from '@/shared/api/layouts';
import type { KeptText } from './kept-text';

type OwnVersionsProps = { onPut: (next: KeptText, what: string) => void };

/** Versions that stand before one asks for more; the last change is the first. */
const firstShown = 5;

/** What the contributor has sent, how far each has come, and what the moderators said. */
export function OwnVersions({ onPut }: OwnVersionsProps) {
  const styles = useStyles();
  const { data, error, isPending, refetch, hasNextPage, fetchNextPage, isFetchingNextPage } =
    useInfiniteQuery(ownVersionsQuery);
  const [all, setAll] = useState(false);
  const rows = data?.pages.flatMap(({ items }) => items) ?? [];
  const shown = all ? rows : rows.slice(0, firstShown);
  return (
    <Panel title="What you have sent">
      {isPending ? <Loading label="Fetching what you have sent" lines={2} /> : null}
      {error !== null && data === undefined ? (
        <ErrorState title={problemWords(error)} onRetry={() => void refetch()} />
      ) : null}
      {data !== undefined && rows.length === 0 ? <Text tone="soft">Nothing yet.</Text> : null}
      <View role="list" aria-label="What you have sent">
        {shown.map((row) => (
          <OwnVersion key={row.id} row={row} onPut={onPut} />
        ))}
      </View>
      {shown.length < rows.length ? (
        <Button kind="quiet" label="Show all of them" onPress={() => setAll(true)} style={styles.more} />
      ) : hasNextPage ? (
        <Button label="Older ones" busy={isFetchingNextPage} onPress={() => void fetchNextPage()} />
      ) : null}
    </Panel>
  );
}

function OwnVersion({ row, onPut }: OwnVersionsProps & { row: VersionRow }) {
  const styles = useStyles();
  const queryClient = useQueryClient();
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const { slug, maker, name, revision, number, state, remarks, moderator } = row;
  const open = state === 'returned' || state === 'submitted';
  const mend = async () => {
    setBusy(true);
    setProblem(null);
    try {
      const { document, change } = await queryClient.fetchQuery({ ...versionQuery(slug, number), staleTime: 0 });
      const text = `${JSON.stringify(document, null, 2)}\n`;
      onPut({ text, instead: { slug, number, change } }, `Version ${number} is in the field, to be put right.`);
    } catch (error) {
      setProblem(problemWords(error));
    } finally {
      setBusy(false);
    }
  };
  return (
    <View role="listitem" style={[styles.version, state === 'returned' && styles.returned]}>
      <Link
        href={{ pathname: '/boards/[slug]', params: row.current ? { slug } : { slug, version: String(number) } }}
        standalone
      >
        {`${maker} ${name}, rev ${revision}`}
      </Link>
      <Text variant="small">
        {`Version ${number}: ${stateWords(row)}, ${dateWords(row.decidedAt ?? row.submittedAt)}`}
      </Text>
      {remarks === null ? null : (
        <Text variant="small">
          <Text variant="smallStrong">{`${moderator?.name ?? 'A moderator'}: `}</Text>
          {remarks}
        </Text>
      )}
      {problem === null ? null : (
        <Text role="alert" variant="smallStrong" tone="pencil">
          {problem}
        </Text>
      )}
      {open ? (
        <Button
          kind={state === 'returned' ? 'secondary' : 'quiet'}
          label={state === 'returned' ? 'Put it right' : 'Change it'}
          aria-label={`${state === 'returned' ? 'Put it right' : 'Change it'}: ${name}, rev ${revision}, version ${number}`}
          busy={busy}
          busyLabel="Fetching…"
          onPress={() => void mend()}
          style={styles.mend}
        />
      ) : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  version: {
    gap: t.space.hair,
    paddingBottom: t.space.sm,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  returned: { paddingLeft: t.space.md, borderLeftWidth: t.line.underline, borderLeftColor: t.colours.mark },
  more: { alignSelf: 'flex-start' },
  mend: { alignSelf: 'flex-start', marginTop: t.space.xs },
}));
