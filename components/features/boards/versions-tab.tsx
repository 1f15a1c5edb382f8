import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { versionsQuery } from '@/components/api/layout-versions';
import { problemWords } from '@/components/api/problem';
import type { Bench } from '@/components/features/diagnose/bench';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button, ButtonLink } from '@/components/ui/button';
import { dateWords } from '@/components/ui/date-words';
import { downloadText } from '@/components/ui/download';
import { Link } from '@/components/ui/link';
import { ErrorState, Loading } from '@/components/ui/states';
import { Table } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import type { VersionRow } from '@/shared/api/layouts';
import { stateWords } from './version-words';

type VersionsTabProps = { bench: Bench; slug: string };

/** The versions of a board's layout, and what can be done with the one that is shown. */
export function VersionsTab({ bench, slug }: VersionsTabProps) {
  const styles = useStyles();
  const phone = useBreakpoint() === 'phone';
  const save = () =>
    downloadText({
      name: `${slug}.json`,
      text: `${JSON.stringify(bench.document, null, 2)}\n`,
      type: 'application/json',
    });
  return (
    <View style={[styles.room, phone && styles.roomPhone]}>
      <View>
        <Text variant="heading">Versions</Text>
        <Text variant="small" tone="soft">
          A published version never changes; a correction is a new one.
        </Text>
      </View>
      <VersionList slug={slug} />
      <View style={styles.actions}>
        <Button label="Save this layout as a file" onPress={save} />
        <ButtonLink
          href={{ pathname: '/contribute', params: { from: slug } }}
          label="Correct it, or start another board"
        />
      </View>
    </View>
  );
}

function VersionList({ slug }: { slug: string }) {
  const { data, error, isPending, refetch } = useQuery(versionsQuery(slug));
  if (isPending) return <Loading label="Fetching the versions" lines={3} />;
  if (error) {
    return (
      <ErrorState title={problemWords(error)} onRetry={() => void refetch()}>
        The list of versions is on the server. The board itself works without it.
      </ErrorState>
    );
  }
  return (
    <Table
      caption="Versions of this layout"
      hideCaption
      columns={[
        { key: 'number', header: 'Version', cell: (row) => <VersionLink row={row} /> },
        { key: 'state', header: 'State', share: 1.4, cell: stateWords },
        { key: 'date', header: 'Since', cell: ({ decidedAt, submittedAt }) => dateWords(decidedAt ?? submittedAt) },
        { key: 'author', header: 'By', share: 1.4, cell: ({ author }) => author?.name ?? 'an account that is gone' },
        {
          key: 'remarks',
          header: 'Remarks',
          share: 3,
          cell: ({ remarks }) => (remarks === null ? '' : <Text variant="small">{remarks}</Text>),
        },
      ]}
      rows={data.items}
      rowKey={({ id }) => id}
    />
  );
}

function VersionLink({ row: { slug, number, current } }: { row: VersionRow }) {
  return (
    <Link
      standalone
      href={{ pathname: '/boards/[slug]', params: current ? { slug } : { slug, version: String(number) } }}
    >
      {`Version ${number}`}
    </Link>
  );
}

const useStyles = makeStyles((t) => ({
  room: { padding: t.space.xl, gap: t.space.lg, maxWidth: t.measure.page },
  roomPhone: { padding: t.space.lg },
  actions: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
