import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { openRoleRequestsQuery, useDecideRoleRequest } from '@/components/api/people';
import { problemWords } from '@/components/api/problem';
import { FormFailure } from '@/components/features/account/form-failure';
import { makeStyles } from '@/components/theme';
import { useAnnouncer } from '@/components/ui/announcer';
import { Button } from '@/components/ui/button';
import { Panel } from '@/components/ui/panel';
import { ErrorState, Loading } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import type { RoleDecision, RoleRequestRow } from '@/shared/api/people';

/** Requests for the role of contributor, each with its answer. */
export function RoleRequests() {
  const { data, error, isPending, refetch } = useQuery(openRoleRequestsQuery);
  return (
    <Panel title="Waiting to become contributor">
      {isPending ? (
        <Loading label="Loading the requests" lines={1} />
      ) : error ? (
        <ErrorState title="The requests could not be loaded." onRetry={() => void refetch()}>
          {problemWords(error)}
        </ErrorState>
      ) : data.items.length === 0 ? (
        <Text tone="soft">Nobody is waiting.</Text>
      ) : (
        <View role="list">
          {data.items.map((row) => (
            <RequestRow key={row.id} row={row} />
          ))}
        </View>
      )}
    </Panel>
  );
}

function RequestRow({ row }: { row: RoleRequestRow }) {
  const styles = useStyles();
  const decide = useDecideRoleRequest();
  const { toast } = useAnnouncer();
  const answer = (decision: RoleDecision['decision']) =>
    decide.mutate(
      { id: row.id, decision },
      {
        onSuccess: () =>
          toast({
            text:
              decision === 'granted'
                ? `${row.person.name} is a contributor now.`
                : `Declined. ${row.person.name} stays technician.`,
            kind: 'good',
          }),
      },
    );
  return (
    <View role="listitem" style={styles.row}>
      <View style={styles.words}>
        <Text variant="strong">{row.person.name}</Text>
        <Text>{row.reason}</Text>
        <Text variant="fine" tone="soft">
          {`Asked ${new Date(row.createdAt).toLocaleDateString(undefined, { dateStyle: 'medium' })}`}
        </Text>
        <FormFailure failure={decide.error} />
      </View>
      <View style={styles.actions}>
        <Button
          kind="primary"
          label="Grant"
          aria-label={`Grant, ${row.person.name}`}
          busy={decide.isPending}
          onPress={() => answer('granted')}
        />
        <Button
          label="Decline"
          aria-label={`Decline, ${row.person.name}`}
          busy={decide.isPending}
          onPress={() => answer('declined')}
        />
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  row: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    justifyContent: 'space-between',
    gap: t.space.md,
    paddingVertical: t.space.md,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: t.measure.form / 2, gap: t.space.xs },
  actions: { flexDirection: 'row', gap: t.space.sm, alignItems: 'center' },
}));
