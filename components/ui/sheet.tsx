import type { ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import { makeStyles } from '@/components/theme';

/** Props of Sheet. */
export type SheetProps = {
  children: ReactNode;
  /** paper: lies on the page with thin rules above and below. boxed: an ink edge all round. */
  kind?: 'paper' | 'boxed';
  /** The bar at its left edge: pencil for what needs the eye, tick for what is well, mark for a warning, pen for a choice. */
  bar?: 'pencil' | 'tick' | 'mark' | 'pen';
  /** Room inside its edges; none for a sheet that holds a table to its edges. */
  padding?: 'none' | 'md' | 'lg';
  /** Distance between its children. */
  gap?: 'none' | 'sm' | 'md' | 'lg';
  /** Makes it a landmark with this name. */
  label?: string;
  style?: StyleProp<ViewStyle>;
};

/** A sheet of paper that lies on the page. */
export function Sheet({ children, kind = 'paper', bar, padding = 'lg', gap = 'md', label, style }: SheetProps) {
  const styles = useStyles();
  const inside = { none: null, md: styles.paddingMd, lg: styles.paddingLg }[padding];
  const apart = { none: null, sm: styles.gapSm, md: styles.gapMd, lg: styles.gapLg }[gap];
  return (
    <View
      {...(label === undefined ? {} : { role: 'region' as const, 'aria-label': label })}
      style={[styles.sheet, kind === 'boxed' && styles.boxed, inside, apart, bar && [styles.bar, styles[bar]], style]}
    >
      {children}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  sheet: {
    backgroundColor: t.colours.sheet,
    borderColor: t.colours.rule,
    borderTopWidth: t.line.thin,
    borderBottomWidth: t.line.thin,
  },
  boxed: { borderWidth: t.line.ink, borderColor: t.colours.ink, borderRadius: t.radius.md },
  paddingMd: { padding: t.space.md },
  paddingLg: { padding: t.space.lg },
  gapSm: { gap: t.space.sm },
  gapMd: { gap: t.space.md },
  gapLg: { gap: t.space.lg },
  bar: { borderLeftWidth: t.line.bar },
  pencil: { borderLeftColor: t.colours.pencil },
  tick: { borderLeftColor: t.colours.tick },
  mark: { borderLeftColor: t.colours.mark },
  pen: { borderLeftColor: t.colours.pen },
}));
