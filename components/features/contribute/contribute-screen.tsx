import { View } from 'react-native';
import { useSession } from '@/components/api/session';
import { RolePanel } from '@/components/features/account/role-panel';
import { SignedInOnly } from '@/components/features/account/signed-in-only';
import { makeStyles } from '@/components/theme';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { Loading } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import { Documents } from './documents';
import { ImportPage } from './import-page';

const path = '/contribute';

/** The way to a board that nobody has described yet: a layout document, checked here and sent to the moderators. */
export function ContributeScreen() {
  const { state, person, mayContribute } = useSession();
  if (person !== null && mayContribute) return <ImportPage key={person.id} personId={person.id} />;
  if (state === 'unknown') {
    return (
      <Page title="Add a board" hideTitle>
        <Loading label="Asking who you are" />
      </Page>
    );
  }
  return <Introduction />;
}

/** For whoever may not send layouts yet: what it is for, how it goes, and the way to it. */
function Introduction() {
  const styles = useStyles();
  return (
    <Page
      title="Add a board"
      lead="A layout tells which socket a code means. Whoever has found that out spares the next one the search."
      width="prose"
    >
      <View role="list" aria-label="How it goes" style={styles.steps}>
        {steps.map((step, at) => (
          <View key={step} role="listitem" style={styles.step}>
            <Text variant="code" aria-hidden>
              {at + 1}
            </Text>
            <Text style={styles.words}>{step}</Text>
          </View>
        ))}
      </View>
      <Text>Layouts are sent by contributors. A moderator gives that role to whoever asks for it.</Text>
      <SignedInOnly page={path}>{({ role }) => <RolePanel role={role} />}</SignedInOnly>
      <Panel title="The document">
        <Documents />
      </Panel>
    </Page>
  );
}

const steps = [
  'A contributor describes the board in a layout document: banks, sockets, shared parts, report formats, sources.',
  'Every problem is told while it is written, and a code can be tried on the sketch at once.',
  'A moderator compares it with its sources, and publishes it or returns it with words.',
];

const useStyles = makeStyles((t) => ({
  steps: { gap: t.space.sm },
  step: { flexDirection: 'row', gap: t.space.md },
  words: { flexShrink: 1 },
}));
