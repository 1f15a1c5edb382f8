import { useMemo } from 'react';
import { useTheme, type Colours } from '@/components/theme';
import { sketchScale } from '@/components/theme/sketch-scale';

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
    const { ink, soft, rule } = colours;
    return {
      ink,
      soft,
      rule,
      ruleStrong: soft,
      sheet: sketchScale.printGround,
      chip: sketchScale.printGround,
      pencil: ink,
      pencilWash: sketchScale.printGround,
      onPencil: sketchScale.printGround,
      tick: ink,
      pen: ink,
      mark: ink,
    };
  }, [colours, print]);
}
