import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Form } from '@/components/ui/form';
import { FormField } from '@/components/ui/form-field';
import { addressRequest, type AddressRequest } from '@/shared/api/account';
import { CheckMail } from './check-mail';
import { FormFailure } from './form-failure';
import { useApiForm } from './use-api-form';

type AddressFormProps = {
  label: string;
  button: string;
  linkDoes: string;
  send: (request: AddressRequest) => Promise<unknown>;
};

/** Asks for an address and sends a link to it. */
export function AddressForm({ label, button, linkDoes, send }: AddressFormProps) {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { form, submit, busy, failure } = useApiForm({
    schema: addressRequest,
    empty: { email: '' },
    send,
    onDone: (_answer, { email }) => setSentTo(email),
  });
  if (sentTo !== null) {
    return (
      <CheckMail
        email={sentTo}
        linkDoes={linkDoes}
        again={() => send({ email: sentTo })}
        onChangeAddress={() => setSentTo(null)}
      />
    );
  }
  return (
    <Form label={label} onSubmit={submit}>
      <FormField
        control={form.control}
        name="email"
        label="E-mail address"
        inputMode="email"
        autoComplete="email"
        autoCapitalize="none"
        autoCorrect={false}
        spellCheck={false}
      />
      <FormFailure failure={failure} />
      <Button kind="primary" label={button} busy={busy} busyLabel="Sending…" onPress={submit} wide />
    </Form>
  );
}
