export type { Colours, ThemeName } from './colours';
export { loadFonts } from './fonts';
export { fixed, makeStyles, ruledPaper, sticky } from './make-styles';
export type { ThemeChoice } from './theme-choice';
export { FixedTheme, ThemeProvider, useTheme, useThemeChoice } from './theme-provider';
export type { TextVariant } from './type';
export { useBreakpoint } from './use-breakpoint';
