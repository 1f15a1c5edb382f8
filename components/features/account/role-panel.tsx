import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { askToContribute } from '@/components/api/account';
import { ownRoleRequestQuery } from '@/components/api/people';
import { problemWords } from '@/components/api/problem';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Form } from '@/components/ui/form';
import { FormField } from '@/components/ui/form-field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { ErrorState, Loading } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import { roleRequestInput, type RoleRequestRow } from '@/shared/api/people';
import type { Role } from '@/shared/standing';
import { FormFailure } from './form-failure';
import { roleWords } from './role-words';
import { useApiForm } from './use-api-form';

/** The person's role, and for a technician the way to become contributor. */
export function RolePanel({ role }: { role: Role }) {
  const styles = useStyles();
  return (
    <Panel title="Role">
      <View style={styles.role}>
        <Text variant="strong">{role}</Text>
        <Text tone="soft">{roleWords[role]}</Text>
      </View>
      {role === 'technician' ? <AskToContribute /> : null}
    </Panel>
  );
}

/** Where the person's request stands; the form where there is none that waits. */
function AskToContribute() {
  const queryClient = useQueryClient();
  const { data, error, isPending, refetch } = useQuery(ownRoleRequestQuery);
  if (isPending) return <Loading label="Loading your request" lines={1} />;
  if (error) {
    return (
      <ErrorState title="Whether you asked before could not be loaded." onRetry={() => void refetch()}>
        {problemWords(error)}
      </ErrorState>
    );
  }
  if (data.request?.state === 'open') {
    return (
      <Notice kind="good" live title="Your request is with the moderators.">
        Your role changes here as soon as one of them has answered.
      </Notice>
    );
  }
  return (
    <>
      {data.request?.state === 'declined' ? (
        <Notice kind="info" title="Your last request was declined.">
          You can ask again; say what has changed.
        </Notice>
      ) : null}
      <RequestForm onSent={(request) => queryClient.setQueryData(ownRoleRequestQuery.queryKey, { request })} />
    </>
  );
}

function RequestForm({ onSent }: { onSent: (request: RoleRequestRow) => void }) {
  const [open, setOpen] = useState(false);
  const { form, submit, busy, failure } = useApiForm({
    schema: roleRequestInput,
    empty: { reason: '' },
    send: askToContribute,
    onDone: onSent,
  });
  if (!open) {
    return <Button label="Ask to become contributor" aria-expanded={false} onPress={() => setOpen(true)} />;
  }
  return (
    <Form label="Ask to become contributor" onSubmit={submit}>
      <FormField
        control={form.control}
        name="reason"
        label="Which boards do you know?"
        hint="A sentence or two for the moderators: the machines, and what you would document from."
        multiline
        autoFocus
      />
      <FormFailure failure={failure} />
      <Button kind="primary" label="Send the request" busy={busy} busyLabel="Sending…" onPress={submit} />
    </Form>
  );
}

const useStyles = makeStyles((t) => ({ role: { gap: t.space.hair, paddingBottom: t.space.sm } }));
