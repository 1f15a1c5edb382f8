import { useState } from 'react';
import { askPasswordReset, resetPassword } from '@/components/api/account';
import { ApiProblem } from '@/components/api/problem';
import { Button, ButtonLink } from '@/components/ui/button';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { Rule } from '@/components/ui/rule';
import { resetRequest } from '@/shared/api/account';
import { AddressForm } from './address-form';
import { FormFailure } from './form-failure';
import { PasswordField } from './password-field';
import { useApiForm } from './use-api-form';
import { useLinkToken } from './use-link-token';

/** Forgotten password: asks for a link, or, by the link, for a new password. */
export function ResetScreen() {
  const token = useLinkToken();
  if (token !== null) return <NewPassword token={token} />;
  return (
    <Page title="Forgotten password" lead="A link to choose a new one comes by mail." width="form">
      <Rule weight="heavy" />
      <AskForLink />
    </Page>
  );
}

function AskForLink() {
  return (
    <>
      <AddressForm
        label="Forgotten password"
        button="Send the link"
        linkDoes="lets you choose a new password"
        send={askPasswordReset}
      />
      <ButtonLink href="/sign-in" kind="quiet" label="Back to sign in" />
    </>
  );
}

function NewPassword({ token }: { token: string }) {
  const [done, setDone] = useState(false);
  const { form, submit, busy, failure } = useApiForm({
    schema: resetRequest,
    empty: { token, password: '' },
    send: resetPassword,
    onDone: () => setDone(true),
  });
  const badLink =
    (failure instanceof ApiProblem && failure.code === 'link-invalid') || form.formState.errors.token !== undefined;
  return (
    <Page title="Choose a new password" width="form">
      <Rule weight="heavy" />
      {done ? (
        <Notice
          kind="good"
          live
          title="The new password holds from now on."
          action={<ButtonLink href="/sign-in" kind="primary" label="Sign in" />}
        >
          Every other session of the account has ended.
        </Notice>
      ) : badLink ? (
        <>
          <Notice kind="problem" live title="This link does not work.">
            It was used already, has expired, or is not complete. Ask for a new one here.
          </Notice>
          <AskForLink />
        </>
      ) : (
        <Form label="New password" onSubmit={submit}>
          <PasswordField
            control={form.control}
            name="password"
            label="New password"
            kind="new"
            hint="At least 10 characters. Any sentence will do."
          />
          <FormFailure failure={failure} />
          <Button kind="primary" label="Set the password" busy={busy} busyLabel="Sending…" onPress={submit} wide />
        </Form>
      )}
    </Page>
  );
}
