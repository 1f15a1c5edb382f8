import { useInfiniteQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { peopleQueryOptions, type PeopleFilters } from '@/components/api/people';
import { problemWords } from '@/components/api/problem';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';
import { Table, type Column } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import { useDebounced } from '@/components/ui/use-debounced';
import type { OwnPerson } from '@/shared/api/account';
import type { PersonRow } from '@/shared/api/people';
import { roles, rolesInPowerOf, type Role } from '@/shared/standing';
import { RoleDialog } from './role-dialog';

type RoleFilter = Role | 'all';

const filters: readonly { value: RoleFilter; label: string }[] = [
  { value: 'all', label: 'Everybody' },
  ...roles.map((role) => ({ value: role, label: `${role[0]?.toUpperCase()}${role.slice(1)}s` })),
];

/** Everybody with an account, searched and narrowed, with the way to change a role. */
export function PeopleList({ me }: { me: OwnPerson }) {
  const styles = useStyles();
  const [search, setSearch] = useState('');
  const [role, setRole] = useState<RoleFilter>('all');
  const [changing, setChanging] = useState<PersonRow | null>(null);
  const settled = useDebounced(search.trim(), 250);
  return (
    <Panel title="Everybody with an account">
      <View style={styles.filters}>
        <View style={styles.search}>
          <Field label="Name or address" value={search} onChangeText={setSearch} inputMode="search" maxLength={80} />
        </View>
        <SegmentedControl label="Role" options={filters} value={role} onChange={setRole} />
      </View>
      <Results filters={{ search: settled, role: role === 'all' ? undefined : role }} me={me} onChange={setChanging} />
      {changing === null ? null : <RoleDialog person={changing} by={me.role} onClose={() => setChanging(null)} />}
    </Panel>
  );
}

type ResultsProps = { filters: PeopleFilters; me: OwnPerson; onChange: (person: PersonRow) => void };

function Results({ filters: asked, me, onChange }: ResultsProps) {
  const styles = useStyles();
  const { data, error, isPending, hasNextPage, isFetchingNextPage, fetchNextPage, refetch } = useInfiniteQuery(
    peopleQueryOptions(asked),
  );
  const columns = usePeopleColumns(me, onChange);
  if (isPending) return <Loading label="Loading people" />;
  if (error) {
    return (
      <ErrorState title="The list could not be loaded." onRetry={() => void refetch()}>
        {problemWords(error)}
      </ErrorState>
    );
  }
  return (
    <View style={styles.results}>
      <Table
        caption="People"
        hideCaption
        columns={columns}
        rows={data.pages.flatMap((page) => page.items)}
        rowKey={(person) => person.id}
        empty={<EmptyState title="Nobody answers to that.">Try a part of the name, or another role.</EmptyState>}
      />
      {hasNextPage ? (
        <Button
          label="Show more"
          busy={isFetchingNextPage}
          busyLabel="Loading…"
          onPress={() => void fetchNextPage()}
          style={styles.more}
        />
      ) : null}
    </View>
  );
}

function usePeopleColumns(me: OwnPerson, onChange: (person: PersonRow) => void): Column<PersonRow>[] {
  const styles = useStyles();
  const mayChange = (person: PersonRow) => person.id !== me.id && rolesInPowerOf[me.role].includes(person.role);
  return [
    { key: 'name', header: 'Name', cell: (person) => person.name, share: 3 },
    { key: 'email', header: 'E-mail address', cell: (person) => person.email, share: 4 },
    {
      key: 'confirmed',
      header: 'Confirmed',
      cell: (person) => (person.confirmed ? 'yes' : 'not yet'),
      share: 2,
    },
    {
      key: 'since',
      header: 'Since',
      cell: (person) => new Date(person.createdAt).toLocaleDateString(undefined, { dateStyle: 'medium' }),
      share: 2,
    },
    {
      key: 'role',
      header: 'Role',
      share: 3,
      cell: (person) =>
        mayChange(person) ? (
          <View style={styles.role}>
            <Text>{person.role}</Text>
            <Button
              kind="quiet"
              label="Change"
              aria-label={`Change the role of ${person.name}`}
              onPress={() => onChange(person)}
            />
          </View>
        ) : (
          <Text>{person.id === me.id ? `${person.role} (you)` : person.role}</Text>
        ),
    },
  ];
}

const useStyles = makeStyles((t) => ({
  filters: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'flex-end',
    gap: t.space.lg,
    paddingVertical: t.space.sm,
  },
  search: { flexGrow: 1, flexBasis: t.measure.form / 2, maxWidth: t.measure.form },
  results: { gap: t.space.lg },
  more: { alignSelf: 'flex-start' },
  role: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: t.space.sm },
}));
