/** Letters that were made to fit. */
export interface FittedText {
  readonly text: string;
  /** Size of the letters, px. */
  readonly size: number;
}

/** How letters may be made to fit: widths and sizes in px, `advance` the width of a letter as a share of its size. */
export interface Fitting {
  readonly width: number;
  readonly least: number;
  readonly most: number;
  readonly advance: number;
}

const widthOf = (text: string, size: number, advance: number) => [...text].length * size * advance;

/**
 * A label as large as fits; where even the least size is too wide, its end behind an ellipsis,
 * because labels of one board begin alike. Null where not two letters fit.
 */
export function fitLabel(label: string, { width, least, most, advance }: Fitting): FittedText | null {
  const letters = [...label];
  const size = Math.min(most, width / (letters.length * advance));
  if (size >= least) return { text: label, size };
  const room = Math.floor(width / (least * advance) + 1e-9);
  if (room < Math.min(3, letters.length)) return null;
  return { text: `…${letters.slice(letters.length - (room - 1)).join('')}`, size: least };
}

/** The first of some wordings that fits in one line, null where none does. */
export function fitWords(wordings: readonly string[], fitting: Fitting): FittedText | null {
  for (const text of wordings) {
    const size = Math.min(fitting.most, fitting.width / ([...text].length * fitting.advance));
    if (size >= fitting.least) return { text, size };
  }
  return null;
}

/** Words in lines no wider than `width`, null where they need more lines or a word is too wide. */
export function wrapWords(
  text: string,
  { width, size, advance, lines }: { width: number; size: number; advance: number; lines: number },
): readonly string[] | null {
  const out: string[] = [];
  for (const word of text.split(/\s+/).filter(Boolean)) {
    if (widthOf(word, size, advance) > width) return null;
    const last = out[out.length - 1];
    const longer = last === undefined ? word : `${last} ${word}`;
    if (last !== undefined && widthOf(longer, size, advance) <= width) out[out.length - 1] = longer;
    else out.push(word);
  }
  return out.length <= lines ? out : null;
}

/** The common size of the letters of many labels: all but the longest tenth fit, and none is larger than `most`. */
export function commonLabelSize(fits: readonly number[], { least, most }: { least: number; most: number }): number {
  const sorted = [...fits].sort((a, b) => a - b);
  const size = sorted[Math.floor(sorted.length / 10)] ?? most;
  return Math.max(least, Math.min(most, size));
}
