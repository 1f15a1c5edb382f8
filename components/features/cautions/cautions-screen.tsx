import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Link } from '@/components/ui/link';
import { Page } from '@/components/ui/page';
import { Rule } from '@/components/ui/rule';
import { Text } from '@/components/ui/text';
import { cautions, cautionsDefer } from './cautions';

/** Every caution that the product owes, in one place. */
export function CautionsScreen() {
  const styles = useStyles();
  return (
    <Page title="Cautions" lead={cautionsDefer} width="prose">
      <Rule weight="heavy" />
      <View role="list" style={styles.list}>
        {cautions.map(({ id, title, body }, at) => (
          <View key={id} id={id} role="listitem" style={styles.entry}>
            <View aria-hidden style={styles.number}>
              <Text variant="code" tone="pencil">
                {at + 1}
              </Text>
            </View>
            <View style={styles.words}>
              <Text variant="heading">{title}</Text>
              <Text>{body}</Text>
              {id === 'wrong-rail' || id === 'negative-rail' ? (
                <Link href="/parts" variant="smallStrong" standalone aria-label={`RAM chips: will it fit? (${title})`}>
                  RAM chips: will it fit?
                </Link>
              ) : null}
            </View>
          </View>
        ))}
      </View>
    </Page>
  );
}

const useStyles = makeStyles((t) => ({
  list: { margin: t.space.none, padding: t.space.none },
  entry: {
    flexDirection: 'row',
    gap: t.space.lg,
    paddingVertical: t.space.lg,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  number: { width: t.space.xl },
  words: { flex: 1, gap: t.space.xs },
}));
