import { useMutation } from '@tanstack/react-query';
import { resendConfirmation } from '@/components/api/account';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { FormFailure } from './form-failure';

/** The address is not confirmed yet; offers another link. */
export function ResendConfirmation({ email }: { email: string }) {
  const resend = useMutation({ mutationFn: () => resendConfirmation({ email }) });
  if (resend.isSuccess) return <Notice kind="good" live title="A new link is on its way. Look in your mail." />;
  return (
    <Notice
      kind="warning"
      live
      title="Confirm your e-mail address first."
      action={
        <Button
          label="Send the link again"
          busy={resend.isPending}
          busyLabel="Sending…"
          onPress={() => resend.mutate()}
        />
      }
    >
      <Text variant="small">The link is in the mail that came when you made the account.</Text>
      <FormFailure failure={resend.error} />
    </Notice>
  );
}
