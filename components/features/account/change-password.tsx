import { changePassword } from '@/components/api/account';
import { useAnnouncer } from '@/components/ui/announcer';
import { Button } from '@/components/ui/button';
import { Form } from '@/components/ui/form';
import { passwordChange } from '@/shared/api/account';
import { FormFailure } from './form-failure';
import { PasswordField } from './password-field';
import { useApiForm } from './use-api-form';

/** Changes the password of the person who is signed in. */
export function ChangePassword() {
  const { toast } = useAnnouncer();
  const { form, submit, busy, failure } = useApiForm({
    schema: passwordChange,
    empty: { currentPassword: '', newPassword: '' },
    send: changePassword,
    fieldOf: { 'password-wrong': 'currentPassword' },
    onDone: () => {
      form.reset();
      toast({ text: 'The new password holds from now on. Other sessions have ended.', kind: 'good' });
    },
  });
  return (
    <Form label="Change the password" onSubmit={submit}>
      <PasswordField control={form.control} name="currentPassword" label="Present password" kind="current" />
      <PasswordField
        control={form.control}
        name="newPassword"
        label="New password"
        kind="new"
        hint="At least 10 characters. Any sentence will do."
      />
      <FormFailure failure={failure} />
      <Button label="Change the password" busy={busy} busyLabel="Sending…" onPress={submit} />
    </Form>
  );
}
