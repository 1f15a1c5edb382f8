import { useQueryClient } from '@tanstack/react-query';
import { useLocalSearchParams, useRouter } from 'expo-router';
import { View } from 'react-native';
import { acceptSession, signIn } from '@/components/api/account';
import { ApiProblem } from '@/components/api/problem';
import { useSession } from '@/components/api/session';
import { makeStyles } from '@/components/theme';
import { useAnnouncer } from '@/components/ui/announcer';
import { Button, ButtonLink } from '@/components/ui/button';
import { Form } from '@/components/ui/form';
import { FormField } from '@/components/ui/form-field';
import { Link } from '@/components/ui/link';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { Rule } from '@/components/ui/rule';
import { Text } from '@/components/ui/text';
import { signInRequest } from '@/shared/api/account';
import { FormFailure } from './form-failure';
import { nextPage } from './next-page';
import { PasswordField } from './password-field';
import { ResendConfirmation } from './resend-confirmation';
import { useApiForm } from './use-api-form';

/** Signs a person in. The look-up needs none of it, and says so. */
export function SignInScreen() {
  const styles = useStyles();
  const session = useSession();
  const { next } = useLocalSearchParams();
  if (session.person) {
    return (
      <Page title="Sign in" width="form">
        <Notice kind="good" title={`You are signed in as ${session.person.name}.`}>
          <View style={styles.links}>
            <ButtonLink href={nextPage(next)} kind="primary" label="Go on" />
            <ButtonLink href="/account" label="Account" />
          </View>
        </Notice>
      </Page>
    );
  }
  return (
    <Page title="Sign in" lead="The look-up works without an account." width="form">
      <Rule weight="heavy" />
      <SignInForm />
      <Rule />
      <View style={styles.links}>
        <Text variant="small">No account yet?</Text>
        <Link href="/sign-up" standalone variant="smallStrong">
          Make an account
        </Link>
      </View>
    </Page>
  );
}

function SignInForm() {
  const styles = useStyles();
  const router = useRouter();
  const queryClient = useQueryClient();
  const { announce } = useAnnouncer();
  const { next } = useLocalSearchParams();
  const { form, submit, busy, failure } = useApiForm({
    schema: signInRequest,
    empty: { email: '', password: '' },
    send: signIn,
    onDone: (answer) => {
      acceptSession(queryClient, answer);
      announce(`Signed in as ${answer.person.name}.`);
      router.replace(nextPage(next));
    },
  });
  const unconfirmed = failure instanceof ApiProblem && failure.code === 'email-not-confirmed';
  return (
    <Form label="Sign in" onSubmit={submit}>
      <FormField
        control={form.control}
        name="email"
        label="E-mail address"
        inputMode="email"
        autoComplete="username"
        autoCapitalize="none"
        autoCorrect={false}
        spellCheck={false}
      />
      <PasswordField control={form.control} name="password" label="Password" kind="current" />
      {unconfirmed ? <ResendConfirmation email={form.getValues('email')} /> : <FormFailure failure={failure} />}
      <Button kind="primary" label="Sign in" busy={busy} busyLabel="Signing in…" onPress={submit} wide />
      <View style={styles.links}>
        <Link href="/reset" standalone variant="smallStrong">
          Forgotten password
        </Link>
      </View>
    </Form>
  );
}

const useStyles = makeStyles((t) => ({
  links: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: t.space.md, rowGap: t.space.sm },
}));
