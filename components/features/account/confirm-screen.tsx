import { useMutation } from '@tanstack/react-query';
import { confirmAddress, resendConfirmation } from '@/components/api/account';
import { ApiProblem } from '@/components/api/problem';
import { Button, ButtonLink } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { Rule } from '@/components/ui/rule';
import { Text } from '@/components/ui/text';
import { AddressForm } from './address-form';
import { FormFailure } from './form-failure';
import { useLinkToken } from './use-link-token';

/**
 * Confirms an address by the link from the mail.
 * A button, not the mere visit, confirms: mail filters open links before their reader does.
 */
export function ConfirmScreen() {
  const token = useLinkToken();
  const confirm = useMutation({ mutationFn: confirmAddress });
  const badLink =
    token === null ||
    (confirm.error instanceof ApiProblem && ['link-invalid', 'invalid-request'].includes(confirm.error.code));
  return (
    <Page title="Confirm your e-mail address" width="form">
      <Rule weight="heavy" />
      {confirm.isSuccess ? (
        <Notice
          kind="good"
          live
          title="Your address is confirmed."
          action={<ButtonLink href="/sign-in" kind="primary" label="Sign in" />}
        >
          The account is ready.
        </Notice>
      ) : badLink ? (
        <>
          <Notice kind="problem" live title="This link does not work.">
            It was used already, has expired, or is not complete. If you confirmed before, just sign in; else ask for a
            new link here.
          </Notice>
          <AddressForm
            label="New link"
            button="Send a new link"
            linkDoes="confirms the address"
            send={resendConfirmation}
          />
          <ButtonLink href="/sign-in" kind="quiet" label="Sign in" />
        </>
      ) : (
        <>
          <Text>One press, and the account is ready.</Text>
          <FormFailure failure={confirm.error} />
          <Button
            kind="primary"
            label="Confirm the address"
            busy={confirm.isPending}
            busyLabel="Confirming…"
            onPress={() => confirm.mutate({ token })}
            wide
          />
        </>
      )}
    </Page>
  );
}
