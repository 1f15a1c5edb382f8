/** A text as typed, beside what its characters may stand for. All of the same length. */
export interface TypedText {
  readonly raw: string;
  /** Full-width forms made plain, capital letters. */
  readonly folded: string;
  /** Characters that are mistaken for one another made the same. */
  readonly alike: string;
}

const lookAlikes: Record<string, string> = {
  O: '0',
  Q: '0',
  I: '1',
  L: '1',
  '|': '1',
  '!': '1',
  Z: '2',
  S: '5',
  $: '5',
  G: '6',
  B: '8',
};

/** One character of the text made plain: full-width forms to ordinary ones, small letters to capitals. */
export function foldCharacter(character: string): string {
  const folded = character.normalize('NFKC').toUpperCase();
  return folded.length === 1 ? folded : character;
}

/** The character that stands for all those that look like this one. */
export function alikeCharacter(character: string): string {
  return lookAlikes[character] ?? character;
}

/** A text with each character made plain. Keeps the length. */
export function fold(text: string): string {
  // Most codes are plain already, and the look-up is to be fast.
  if (/^[0-9A-Z -]*$/.test(text)) return text;
  let folded = '';
  for (let at = 0; at < text.length; at++) folded += foldCharacter(text[at]!);
  return folded;
}

/** A text with each character made plain and look-alikes made the same. Keeps the length. */
export function alike(text: string): string {
  let result = '';
  for (const character of fold(text).split('')) result += alikeCharacter(character);
  return result;
}

/** A text as typed; its other forms are worked out when they are asked for, as most codes are plain. */
class Typed implements TypedText {
  private foldedText: string | null = null;
  private alikeText: string | null = null;

  constructor(readonly raw: string) {}

  get folded(): string {
    return (this.foldedText ??= fold(this.raw));
  }

  get alike(): string {
    return (this.alikeText ??= alike(this.raw));
  }
}

/** Prepares a text for tolerant matching. */
export function typedText(raw: string): TypedText {
  return new Typed(raw);
}

/** A space or a sign that only separates. */
export function isSeparator(character: string): boolean {
  return /[^\p{L}\p{N}]/u.test(character);
}

/** A space of any kind. */
export function isSpace(character: string): boolean {
  return /\s/.test(character);
}
