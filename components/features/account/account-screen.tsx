import { View } from 'react-native';
import { useSignOut } from '@/components/api/account';
import { useSession } from '@/components/api/session';
import { makeStyles } from '@/components/theme';
import { useAnnouncer } from '@/components/ui/announcer';
import { Button, ButtonLink } from '@/components/ui/button';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { Text } from '@/components/ui/text';
import type { OwnPerson } from '@/shared/api/account';
import { ChangePassword } from './change-password';
import { FormFailure } from './form-failure';
import { RolePanel } from './role-panel';
import { SignedInOnly } from './signed-in-only';

/** A person's own account: who, password, role, sign out. */
export function AccountScreen() {
  return (
    <Page title="Account" width="prose">
      <SignedInOnly page="/account">{(person) => <Account person={person} />}</SignedInOnly>
    </Page>
  );
}

function Account({ person }: { person: OwnPerson }) {
  const styles = useStyles();
  const { mayReview } = useSession();
  const { announce } = useAnnouncer();
  const signOut = useSignOut();
  return (
    <View style={styles.parts}>
      <Panel title="You">
        <View style={styles.person}>
          <View style={styles.words}>
            <Text variant="strong">{person.name}</Text>
            <Text tone="soft">{person.email}</Text>
            <Text variant="small" tone="soft">
              {`Since ${new Date(person.createdAt).toLocaleDateString(undefined, { dateStyle: 'long' })}`}
            </Text>
          </View>
          <Button
            label="Sign out"
            busy={signOut.isPending}
            busyLabel="Signing out…"
            onPress={() => signOut.mutate(undefined, { onSuccess: () => announce('Signed out.') })}
          />
        </View>
        <FormFailure failure={signOut.error} />
      </Panel>
      <RolePanel role={person.role} />
      {mayReview ? (
        <Panel title="For moderators">
          <View style={styles.links}>
            <ButtonLink href="/review" label="Layouts to review" />
            <ButtonLink href="/admin/people" label="People and roles" />
          </View>
        </Panel>
      ) : null}
      <Panel title="Change the password">
        <ChangePassword />
      </Panel>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  parts: { gap: t.space.xxl },
  person: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    justifyContent: 'space-between',
    gap: t.space.md,
    alignItems: 'center',
  },
  words: { flexShrink: 1, gap: t.space.hair },
  links: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm, paddingTop: t.space.xs },
}));
