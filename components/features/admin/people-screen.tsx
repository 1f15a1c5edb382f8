import { View } from 'react-native';
import { SignedInOnly } from '@/components/features/account/signed-in-only';
import { makeStyles } from '@/components/theme';
import { Page } from '@/components/ui/page';
import { PeopleList } from './people-list';
import { RoleRequests } from './role-requests';

/** People and their roles, for moderators and the owner. */
export function PeopleScreen() {
  const styles = useStyles();
  return (
    <Page title="People and roles" lead="Moderators give and take the role of contributor; the owner moderator too.">
      <SignedInOnly page="/admin/people" needs="moderator">
        {(person) => (
          <View style={styles.parts}>
            <RoleRequests />
            <PeopleList me={person} />
          </View>
        )}
      </SignedInOnly>
    </Page>
  );
}

const useStyles = makeStyles((t) => ({ parts: { gap: t.space.xxl } }));
