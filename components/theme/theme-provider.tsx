import { createContext, useCallback, useContext, useLayoutEffect, useMemo, useState, type ReactNode } from 'react';
import { applyDocumentStyle } from './document-style';
import { themes, type Theme } from './theme';
import { readThemeChoice, writeThemeChoice, type ThemeChoice } from './theme-choice';
import { useMediaQuery } from './use-media-query';

type ThemeState = { theme: Theme; choice: ThemeChoice; choose: (choice: ThemeChoice) => void };

const ThemeContext = createContext<ThemeState>({ theme: themes.day, choice: 'system', choose: () => undefined });

/** Gives the theme to everything below: the person's choice, else what the system asks for. */
export function ThemeProvider({ children }: { children: ReactNode }) {
  const [choice, setChoice] = useState<ThemeChoice>(readThemeChoice);
  const systemIsDark = useMediaQuery('(prefers-color-scheme: dark)');
  const printing = useMediaQuery('print');
  const onScreen = choice === 'system' ? (systemIsDark ? 'night' : 'day') : choice;
  // Paper is white: light ink on it could not be read.
  const theme = themes[printing ? 'day' : onScreen];

  const choose = useCallback((next: ThemeChoice) => {
    writeThemeChoice(next);
    setChoice(next);
  }, []);
  useLayoutEffect(() => applyDocumentStyle(theme), [theme]);

  const state = useMemo(() => ({ theme, choice, choose }), [theme, choice, choose]);
  return <ThemeContext.Provider value={state}>{children}</ThemeContext.Provider>;
}

/** Shows what is below it in a given theme, whatever the person chose; for showing both side by side. */
export function FixedTheme({ name, children }: { name: Theme['name']; children: ReactNode }) {
  const { choice, choose } = useContext(ThemeContext);
  const state = useMemo(() => ({ theme: themes[name], choice, choose }), [name, choice, choose]);
  return <ThemeContext.Provider value={state}>{children}</ThemeContext.Provider>;
}

/** The theme in force: colours, distances, lines, radii and styles of words. */
export function useTheme(): Theme {
  return useContext(ThemeContext).theme;
}

/** The person's choice of theme, and how to change it. */
export function useThemeChoice(): Omit<ThemeState, 'theme'> {
  const { choice, choose } = useContext(ThemeContext);
  return { choice, choose };
}
