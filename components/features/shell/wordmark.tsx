import { Link } from 'expo-router';
import { Text as NativeText, type TextStyle } from 'react-native';
import { makeStyles } from '@/components/theme';

/** The product's name, which leads home. */
export function Wordmark() {
  const styles = useStyles();
  return (
    <Link href="/" aria-label="Rowcall, look up a failure" style={styles.link}>
      Row<NativeText style={styles.call}>call</NativeText>
    </Link>
  );
}

const useStyles = makeStyles((t) => ({
  link: {
    ...t.text.heading,
    fontSize: t.text.lead.fontSize + t.line.ink,
    lineHeight: t.target,
    color: t.colours.ink,
    paddingHorizontal: t.space.xs,
    textDecorationLine: 'none',
  } as TextStyle,
  call: { color: t.colours.pencil },
}));
