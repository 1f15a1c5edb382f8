import { useMutation } from '@tanstack/react-query';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Sheet } from '@/components/ui/sheet';
import { Text } from '@/components/ui/text';
import { FormFailure } from './form-failure';

type CheckMailProps = {
  email: string;
  /** What the link in the mail does: "confirms your address". */
  linkDoes: string;
  /** Sends the mail again. */
  again: () => Promise<unknown>;
  /** Back to the form, with everything still in it. */
  onChangeAddress: () => void;
};

/** A mail may be on its way. The words are the same for every address, so that nobody can find out who has an account. */
export function CheckMail({ email, linkDoes, again, onChangeAddress }: CheckMailProps) {
  const styles = useStyles();
  const resend = useMutation({ mutationFn: again });
  return (
    <Sheet bar="tick">
      <View role="status" style={styles.words}>
        <Text variant="heading">Check your mail</Text>
        <Text>
          If <Text variant="strong">{email}</Text> can be used, a mail is on its way to it. The link in it {linkDoes}.
        </Text>
        <Text variant="small" tone="soft">
          Nothing after a few minutes? Look among the unwanted mail, and check the address above.
        </Text>
      </View>
      {resend.isSuccess ? <Notice kind="good" live title="Sent again." /> : <FormFailure failure={resend.error} />}
      <View style={styles.actions}>
        <Button label="Send again" busy={resend.isPending} busyLabel="Sending…" onPress={() => resend.mutate()} />
        <Button kind="quiet" label="Change the address" onPress={onChangeAddress} />
      </View>
    </Sheet>
  );
}

const useStyles = makeStyles((t) => ({
  words: { gap: t.space.sm },
  actions: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
