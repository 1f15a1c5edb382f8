import { useMemo } from 'react';
import { useTheme, type Colours } from '@/components/theme';

/** The colours that the sketch is drawn in. */
export type Inks = Pick<
  Colours,
  | 'chip'
  | 'ink'
  | 'soft'
  | 'rule'
  | 'ruleStrong'
  | 'pencil'
  | 'pencilWash'
  | 'onPencil'
  | 'tick'
  | 'pen'
  | 'mark'
  | 'sheet'
>;

/** Inks of the theme in force; on paper everything in one ink, since the marks differ in shape already. */
export function useInks(print: boolean): Inks {
  const { colours } = useTheme();
  return useMemo(() => {
    if (!print) return colours;
    const { ink, sheet, soft, rule, ruleStrong } = colours;
    return {
      ink,
      soft,
      rule,
      ruleStrong: soft,
      sheet,
      chip: 'transparent',
      pencil: ink,
      pencilWash: 'transparent',
      onPencil: sheet,
      tick: ink,
      pen: ink,
      mark: ruleStrong && ink,
    };
  }, [colours, print]);
}
