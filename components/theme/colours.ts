/** The two sheets a person can work on: warm paper, or ink-dark for a dim bench. */
export type ThemeName = 'day' | 'night';

const day = {
  /** Ground of the page. */
  paper: '#F7F2E6',
  /** Ground of a sheet that lies on the page. */
  sheet: '#FFFCF4',
  /** Thin ruled line; decoration only. */
  rule: '#DCD2BD',
  /** Ruled line that separates areas; edge of a quiet control. */
  ruleStrong: '#B9AC8F',
  /** Words, heavy rules, edges of controls. */
  ink: '#14212C',
  /** Words that stand back. */
  soft: '#51606B',
  /** Red pencil: the chip that did not answer, problems, the current place. */
  pencil: '#B3261E',
  /** Red pencil laid on flat, under words. */
  pencilWash: '#F8E1DA',
  /** Pen: links, what is chosen or changed, focus. */
  pen: '#1B4B7A',
  /** Those that answered. */
  tick: '#2E6A4B',
  /** Body of a chip on the sketch. */
  chip: '#FFFDF7',
  /** Warnings, lesser suspects, shared parts. */
  mark: '#7A5200',
  /** The answer: pencil pressed harder, at least 7:1 on paper and sheet. */
  answer: '#A01C15',
  /** Words and marks on a ground of ink. */
  onInk: '#FFFCF4',
  /** Words on a ground of pencil. */
  onPencil: '#FFFCF4',
  /** Ground of a control that cannot be used now. */
  faded: '#E9E2D1',
  /** Veil behind a dialog. */
  veil: 'rgba(20, 33, 44, 0.55)',
};

/** What each colour is for; both themes have the same names. */
export type Colours = typeof day;

const night: Colours = {
  paper: '#0E1419',
  sheet: '#151D24',
  rule: '#2A363F',
  ruleStrong: '#44545F',
  ink: '#F2EADA',
  soft: '#A9B6BF',
  pencil: '#FF8A78',
  pencilWash: '#3A1C18',
  pen: '#8FC1F2',
  tick: '#7CCB9F',
  chip: '#1B252D',
  mark: '#E5B45B',
  answer: '#FF8A78',
  onInk: '#14212C',
  onPencil: '#14212C',
  faded: '#202A32',
  veil: 'rgba(0, 0, 0, 0.65)',
};

/** The colours of both themes. */
export const palettes: Record<ThemeName, Colours> = { day, night };
