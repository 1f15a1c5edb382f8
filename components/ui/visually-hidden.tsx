import type { ReactNode } from 'react';
import { StyleSheet, Text, type TextProps, type ViewStyle } from 'react-native';

const styles = StyleSheet.create({
  hidden: {
    position: 'absolute',
    width: 1,
    height: 1,
    margin: -1,
    overflow: 'hidden',
    clipPath: 'inset(50%)',
  } as ViewStyle,
});

/** Words for a screen reader only. */
export function VisuallyHidden({
  children,
  ...rest
}: { children: ReactNode } & Pick<TextProps, 'id' | 'role' | 'aria-live' | 'aria-level'>) {
  return (
    <Text {...rest} style={styles.hidden}>
      {children}
    </Text>
  );
}
