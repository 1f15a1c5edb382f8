import type { ReactNode } from 'react';
import { Text, type TextProps, type ViewStyle } from 'react-native';
import { makeStyles } from '@/components/theme';

const useStyles = makeStyles((t) => ({
  hidden: {
    position: 'absolute',
    width: t.line.thin,
    height: t.line.thin,
    margin: -t.line.thin,
    overflow: 'hidden',
    clipPath: 'inset(50%)',
  } as ViewStyle,
}));

/** Words for a screen reader only. */
export function VisuallyHidden({
  children,
  ...rest
}: { children: ReactNode } & Pick<TextProps, 'id' | 'role' | 'aria-live' | 'aria-level'>) {
  const styles = useStyles();
  return (
    <Text {...rest} style={styles.hidden}>
      {children}
    </Text>
  );
}
