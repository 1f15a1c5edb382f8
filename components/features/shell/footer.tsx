import { View } from 'react-native';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Link } from '@/components/ui/link';
import { Text } from '@/components/ui/text';
import { ThemeSwitch } from './theme-switch';

/** The foot of every page: the cautions in one line, the way to the chips, and the theme. */
export function Footer() {
  const styles = useStyles();
  const phone = useBreakpoint() === 'phone';
  return (
    <View role="contentinfo" dataSet={{ print: 'hide' }} style={[styles.footer, phone && styles.footerPhone]}>
      <View style={styles.words}>
        <Text variant="fine" tone="soft">
          Power off and wait before you move a chip. The equipment’s service manual and local rules come first.
        </Text>
        <Link href="/learn/cautions" variant="smallStrong" standalone>
          All cautions
        </Link>
        <Link href="/parts" variant="smallStrong" standalone>
          RAM chips
        </Link>
      </View>
      <ThemeSwitch />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  footer: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: t.space.md,
    paddingHorizontal: t.space.xl,
    paddingVertical: t.space.md,
    borderTopWidth: t.line.thin,
    borderTopColor: t.colours.ruleStrong,
  },
  footerPhone: { paddingHorizontal: t.space.lg },
  words: { flexShrink: 1, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: t.space.lg },
}));
