import type { CompiledFormat, Prefix } from '@/lib';

/** Longest text that is looked at while it is typed; the same figure as the limit of a code. */
const longest = 512;

/** A text with everything after it that can only follow. */
export function withFills(format: CompiledFormat, text: string): string {
  let filled = text;
  // Each round adds fixed text; a format has far fewer parts than this.
  for (let round = 0; round < 40 && filled.length < longest; round++) {
    const { fills } = format.next(filled);
    if (fills === '') break;
    filled += fills;
  }
  return filled;
}

/** The text after a key of the keypad. Fixed text before the key comes by itself. */
export function press(format: CompiledFormat, text: string, key: string): string {
  return withFills(format, text) + key;
}

/** The text after a sign of a real keyboard: whoever types the fixed text too, as the machine shows it, types it once. */
export function typeSign(format: CompiledFormat, text: string, sign: string): string {
  const fixed = withFills(format, text).charAt(text.length);
  return fixed !== '' && fixed.toUpperCase() === sign.toUpperCase() ? text + fixed : press(format, text, sign);
}

/** The text with the last thing that was typed taken away; fixed text that came by itself goes with it. */
export function erase(format: CompiledFormat, text: string): string {
  const whole = withFills(format, text);
  let rest = text;
  do {
    rest = Array.from(rest).slice(0, -1).join('');
  } while (rest !== '' && withFills(format, rest) === whole);
  return withFills(format, rest) === withFills(format, '') ? '' : rest;
}

/** What the screen shows of a code that is being typed. */
export interface TypedCode {
  /** What was typed, with the fixed text that came by itself. */
  readonly text: string;
  /** Fixed text that comes next, shown faintly. */
  readonly ghost: string;
  readonly prefix: Prefix;
}

/** Looks at a text that is being typed. */
export function lookAt(format: CompiledFormat, text: string): TypedCode {
  const own = format.next(text);
  const filled = own.fills === '' ? text : withFills(format, text);
  return { text, ghost: filled.slice(text.length), prefix: filled === text ? own : format.next(filled) };
}
