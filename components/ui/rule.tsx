import { View } from 'react-native';
import { makeStyles } from '@/components/theme';

const useStyles = makeStyles((t) => ({
  thin: { height: t.line.thin, backgroundColor: t.colours.rule },
  strong: { height: t.line.thin, backgroundColor: t.colours.ink },
  heavy: { height: t.line.ink, backgroundColor: t.colours.ink },
}));

/** A ruled line across: thin between entries, strong under a table's head, heavy under the head of a page. */
export function Rule({ weight = 'thin' }: { weight?: 'thin' | 'strong' | 'heavy' }) {
  const styles = useStyles();
  return <View aria-hidden style={styles[weight]} />;
}
