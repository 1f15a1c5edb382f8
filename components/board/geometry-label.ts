/** The two faces of the sketch: mono for labels, text for words. */
export type Face = 'mono' | 'text';

/** Letters that were made to fit. */
export interface FittedText {
  readonly text: string;
  /** Size of the letters, px. */
  readonly size: number;
}

/** How letters may be made to fit: width and sizes in px. */
interface Fitting {
  readonly width: number;
  readonly least: number;
  readonly most: number;
}

/** Width of every letter of the mono face as a share of its size, from the font's own table. */
const mono = 0.632;

/** The same for the text face, in four groups, each at the widest of its letters. */
function textLetter(letter: string): number {
  if (/[fijlrtI1 .,:;'|!()/-]/.test(letter)) return 0.38;
  if (/[mwMW@%]/.test(letter)) return 0.86;
  return /[A-Z0-9+&]/.test(letter) ? 0.68 : 0.56;
}

/** Width of letters of size 1; of other sizes it grows alike. */
export function letterWidth(text: string, face: Face): number {
  const letters = [...text];
  if (face === 'mono') return letters.length * mono;
  return letters.reduce((sum, letter) => sum + textLetter(letter), 0);
}

/**
 * A label as large as fits; where even the least size is too wide, its end behind an ellipsis,
 * because labels of one board begin alike. Null where not two letters and the ellipsis fit.
 */
export function fitLabel(label: string, { width, least, most }: Fitting): FittedText | null {
  const letters = [...label];
  const size = Math.min(most, width / letterWidth(label, 'mono'));
  if (size >= least) return { text: label, size };
  const room = Math.floor(width / (least * mono) + 1e-9);
  if (room < Math.min(3, letters.length)) return null;
  return { text: `…${letters.slice(letters.length - (room - 1)).join('')}`, size: least };
}

/** The first of some wordings that fits in one line, null where none does. */
export function fitWords(wordings: readonly string[], { width, least, most }: Fitting): FittedText | null {
  for (const text of wordings) {
    const size = Math.min(most, width / letterWidth(text, 'text'));
    if (size >= least) return { text, size };
  }
  return null;
}

/** Words in lines no wider than `width`, null where they need more lines or a word is too wide. */
export function wrapWords(
  text: string,
  { width, size, lines }: { width: number; size: number; lines: number },
): readonly string[] | null {
  const fits = (words: string) => letterWidth(words, 'text') * size <= width;
  const out: string[] = [];
  for (const word of text.split(/\s+/).filter(Boolean)) {
    if (!fits(word)) return null;
    const last = out[out.length - 1];
    if (last !== undefined && fits(`${last} ${word}`)) out[out.length - 1] = `${last} ${word}`;
    else out.push(word);
  }
  return out.length <= lines ? out : null;
}

/** The common size of the letters of many labels: all but the tightest tenth fit, and none is larger than `most`. */
export function commonLabelSize(fits: readonly number[], { least, most }: { least: number; most: number }): number {
  const sorted = [...fits].sort((a, b) => a - b);
  const size = sorted[Math.floor(sorted.length / 10)] ?? most;
  return Math.max(least, Math.min(most, size));
}
