/** What a person asked for: one theme, or whatever the system says. */
export type ThemeChoice = 'system' | 'day' | 'night';

const themeChoices: readonly ThemeChoice[] = ['system', 'day', 'night'];

const storageKey = 'rowcall.theme';

/** The remembered choice; 'system' where nothing is remembered or storage is closed. */
export function readThemeChoice(): ThemeChoice {
  try {
    const stored = window.localStorage.getItem(storageKey);
    return themeChoices.find((choice) => choice === stored) ?? 'system';
  } catch {
    return 'system';
  }
}

/** Remembers the choice on this device; where storage is closed it lasts for the visit only. */
export function writeThemeChoice(choice: ThemeChoice): void {
  try {
    window.localStorage.setItem(storageKey, choice);
  } catch {
    // Private windows and full disks: the choice still holds until the page is closed.
  }
}
