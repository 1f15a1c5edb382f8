import { isNumber, labelledField, wordsOfLine } from './line-words';

const mostUsual = 48;
const mostOthers = 16;
const mostWordsOfShape = 24;

/** What a line looks like: its words, with N for each number. */
function shapeOf(line: string): string {
  const words = wordsOfLine(line).slice(0, mostWordsOfShape);
  return words.map(({ text }) => (isNumber(text, 'hexadecimal') ? 'N' : text.toUpperCase())).join(' ');
}

/** Whether a line without numbers may name the columns under it. */
function isHeading(line: string): boolean {
  const words = wordsOfLine(line);
  return words.some(({ text }) => labelledField(text) === 'address') && !words.some(({ text }) => /[0-9]/.test(text));
}

/** Some of a list, evenly spread, in its order. */
function spread<T>(list: readonly T[], most: number): T[] {
  if (list.length <= most) return [...list];
  return Array.from({ length: most }, (_, n) => list[Math.floor((n * list.length) / most)]!);
}

/**
 * Lines of the beginning of a log that show how its readings are written: of the lines that look alike the most
 * numerous with at least two numbers, a heading before them, and a few of the others. A memory test often greets
 * first and reports later.
 */
export function sampleOfLog(text: string): string[] {
  const lines = text.split(/\r\n|\n|\r/).filter((line) => /[0-9A-Za-z]/.test(line));
  const byShape = new Map<string, string[]>();
  for (const line of lines) {
    const shape = shapeOf(line);
    const alike = byShape.get(shape);
    if (alike === undefined) byShape.set(shape, [line]);
    else alike.push(line);
  }
  const numbers = (shape: string) => shape.split(' ').filter((word) => word === 'N').length;
  const groups = [...byShape]
    .filter(([shape]) => numbers(shape) > 1)
    .sort(([, a], [, b]) => b.length - a.length)
    .map(([, alike]) => alike);
  const [usual, ...others] = groups;
  if (usual === undefined) return lines.slice(0, mostOthers);
  return [
    ...lines.filter(isHeading).slice(0, 1),
    ...spread(usual, mostUsual),
    ...others.slice(0, mostOthers - 1).flatMap((alike) => alike.slice(0, 1)),
  ];
}
