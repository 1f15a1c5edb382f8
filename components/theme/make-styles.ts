import { StyleSheet, type ViewStyle } from 'react-native';
import type { Theme } from './theme';
import { useTheme } from './theme-provider';

/**
 * Makes a hook that gives a component its styles in the theme in force.
 * Styles are built once a theme, not once a component: `const useStyles = makeStyles((t) => ({ box: { padding: t.space.lg } }))`.
 */
export function makeStyles<Styles extends StyleSheet.NamedStyles<Styles>>(
  build: (theme: Theme) => Styles & StyleSheet.NamedStyles<Styles>,
): () => Styles {
  const built = new Map<Theme, Styles>();
  return function useStyles() {
    const theme = useTheme();
    let styles = built.get(theme);
    if (styles === undefined) {
      styles = StyleSheet.create(build(theme));
      built.set(theme, styles);
    }
    return styles;
  };
}

/** `position: sticky`, which the web has and React Native's types do not name. */
export const sticky = 'sticky' as 'relative';

/** `position: fixed`, which the web has and React Native's types do not name. */
export const fixed = 'fixed' as 'absolute';

/** Thin rules across, as on writing paper; for empty ground that should still look like a sheet. */
export function ruledPaper({ colours, space, line }: Theme): ViewStyle {
  const pitch = space.xxl;
  return {
    backgroundImage: `repeating-linear-gradient(to bottom, transparent 0, transparent ${pitch - line.thin}px, ${colours.rule} ${pitch - line.thin}px, ${colours.rule} ${pitch}px)`,
  } as ViewStyle;
}
