import type { TextStyle } from 'react-native';

/** Font families as loaded; a weight is a family of its own, so no browser has to fake bold. */
export const family = {
  text: 'Atkinson Next, system-ui, sans-serif',
  textBold: 'Atkinson Next Bold, Atkinson Next, system-ui, sans-serif',
  mono: 'Atkinson Mono, ui-monospace, monospace',
  monoBold: 'Atkinson Mono Bold, Atkinson Mono, ui-monospace, monospace',
} as const;

const variant = (fontFamily: string, fontSize: number, lineHeight: number) =>
  ({ fontFamily, fontSize, lineHeight }) satisfies TextStyle;

/**
 * Named styles of words, sizes in px.
 * `answer` and `code*` are for what is read off a board or a chip: every letter and digit differs.
 */
export const textStyles = {
  answer: variant(family.monoBold, 60, 64),
  codeLarge: variant(family.monoBold, 40, 46),
  codeMedium: variant(family.monoBold, 28, 34),
  code: variant(family.monoBold, 18, 24),
  codeSmall: variant(family.monoBold, 15, 20),
  key: variant(family.textBold, 24, 30),
  mono: variant(family.mono, 16, 24),
  display: variant(family.textBold, 34, 40),
  title: variant(family.textBold, 27, 33),
  heading: variant(family.textBold, 19, 26),
  subheading: variant(family.textBold, 17, 24),
  lead: variant(family.text, 19, 28),
  body: variant(family.text, 17, 25),
  strong: variant(family.textBold, 17, 25),
  label: variant(family.textBold, 16, 22),
  small: variant(family.text, 15, 21),
  smallStrong: variant(family.textBold, 15, 21),
  fine: variant(family.text, 14, 19),
} as const;

/** Name of a style of words. */
export type TextVariant = keyof typeof textStyles;
