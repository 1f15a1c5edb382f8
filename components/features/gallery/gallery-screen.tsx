import { View } from 'react-native';
import { FixedTheme, makeStyles, useBreakpoint, type ThemeName } from '@/components/theme';
import { Page } from '@/components/ui/page';
import { Text } from '@/components/ui/text';
import { ControlSamples } from './control-samples';
import { PaperSamples } from './paper-samples';
import { StateSamples } from './state-samples';

/** The primitives in every state, in both themes; for developers. */
export function GalleryScreen() {
  const styles = useStyles();
  const wide = useBreakpoint() === 'wide';
  return (
    <Page title="Gallery" width="full" hideTitle>
      <View style={[styles.themes, !wide && styles.stacked]}>
        {(['day', 'night'] as const).map((name) => (
          <FixedTheme key={name} name={name}>
            <Samples name={name} />
          </FixedTheme>
        ))}
      </View>
    </Page>
  );
}

function Samples({ name }: { name: ThemeName }) {
  const styles = useStyles();
  return (
    <View style={styles.samples}>
      <Text variant="title" level={name === 'day' ? 1 : 2}>
        {name === 'day' ? 'Gallery, day' : 'Gallery, night'}
      </Text>
      <PaperSamples />
      <ControlSamples />
      <StateSamples />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  themes: { flexDirection: 'row' },
  stacked: { flexDirection: 'column' },
  samples: { flex: 1, minWidth: 0, gap: t.space.xxl, padding: t.space.lg, backgroundColor: t.colours.paper },
}));
