import { useState } from 'react';
import { View } from 'react-native';
import { resendConfirmation, signUp } from '@/components/api/account';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Form } from '@/components/ui/form';
import { FormField } from '@/components/ui/form-field';
import { Link } from '@/components/ui/link';
import { Page } from '@/components/ui/page';
import { Rule } from '@/components/ui/rule';
import { Text } from '@/components/ui/text';
import { signUpRequest } from '@/shared/api/account';
import { CheckMail } from './check-mail';
import { FormFailure } from './form-failure';
import { PasswordField } from './password-field';
import { useApiForm } from './use-api-form';

/** Makes an account: a form, then "check your mail". */
export function SignUpScreen() {
  const styles = useStyles();
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { form, submit, busy, failure } = useApiForm({
    schema: signUpRequest,
    empty: { name: '', email: '', password: '' },
    send: signUp,
    onDone: (_answer, { email }) => setSentTo(email),
  });
  if (sentTo !== null) {
    return (
      <Page title="Make an account" width="form">
        <CheckMail
          email={sentTo}
          linkDoes="confirms the address, and the account is ready"
          again={() => resendConfirmation({ email: sentTo })}
          onChangeAddress={() => setSentTo(null)}
        />
      </Page>
    );
  }
  return (
    <Page
      title="Make an account"
      lead="To document boards for others, and to keep your own. Looking a failure up needs none."
      width="form"
    >
      <Rule weight="heavy" />
      <Form label="Make an account" onSubmit={submit}>
        <FormField
          control={form.control}
          name="name"
          label="Name"
          hint="Others see it beside what you contribute."
          autoComplete="name"
        />
        <FormField
          control={form.control}
          name="email"
          label="E-mail address"
          hint="Only you and the moderators see it."
          inputMode="email"
          autoComplete="email"
          autoCapitalize="none"
          autoCorrect={false}
          spellCheck={false}
        />
        <PasswordField
          control={form.control}
          name="password"
          label="Password"
          kind="new"
          hint="At least 10 characters. Any sentence will do."
        />
        <FormFailure failure={failure} />
        <Button kind="primary" label="Make the account" busy={busy} busyLabel="Sending…" onPress={submit} wide />
      </Form>
      <Rule />
      <View style={styles.links}>
        <Text variant="small">You have one already?</Text>
        <Link href="/sign-in" standalone variant="smallStrong">
          Sign in
        </Link>
      </View>
    </Page>
  );
}

const useStyles = makeStyles((t) => ({
  links: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: t.space.md },
}));
