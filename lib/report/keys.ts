import type { TypedField } from './field-lanes';
import type { FormatContext } from './format-context';
import type { ReportKey } from './meaning';

/** More words than this are typed letter by letter. */
const mostWordKeys = 16;

type Key = Pick<ReportKey, 'text' | 'label'>;

function charactersOf({ part, texts, width }: TypedField): string[] {
  const counts = texts.filter((entry) => entry.padded);
  const written = counts.flatMap(({ text }) => [...(text.length < width.max ? `0${text}` : text)]);
  const digits = part.digits !== null && counts.length === 0 ? [...part.digits.alphabet] : [];
  return [...new Set([...written, ...digits])];
}

function wordsOf(field: TypedField): { words: string[]; characters: string[] } {
  const digits = new Set(charactersOf(field));
  const words = field.texts
    .filter(({ text, padded }) => !padded && ![...text].every((character) => digits.has(character)))
    .map(({ text }) => text);
  const long = words.filter((text) => text.length > 1);
  if (long.length <= mostWordKeys) return { words: long, characters: words.filter((text) => text.length === 1) };
  return { words: [], characters: words.flatMap((text) => [...text]) };
}

/** True where the words of a field have a key each. */
export function hasWordKeys(field: TypedField): boolean {
  return wordsOf(field).words.length > 0;
}

const isDigit = (character: string) => character >= '0' && character <= '9';

/** Letters before digits as the code has them, but 0 to F in one row where digits go beyond 9. */
function sorted(characters: readonly string[], first: 'digits' | 'letters'): string[] {
  const unique = [...new Set(characters)].sort();
  const digits = unique.filter(isDigit);
  const others = unique.filter((character) => !isDigit(character));
  return first === 'digits' ? [...digits, ...others] : [...others, ...digits];
}

/** Fixed text after a field whose end only the next character shows: it needs a key of its own. */
function fixedKeys(context: FormatContext, fields: ReadonlyMap<number, TypedField>): Key[] {
  return context.parts.flatMap((part, at) => {
    const before = fields.get(at - 1);
    if (part.kind !== 'text' || before === undefined) return [];
    const lengths = new Set(before.texts.map(({ text }) => text.length));
    const open =
      before.part.free || (before.part.digits !== null && before.width.min !== before.width.max) || lengths.size > 1;
    return open ? [{ text: part.text, label: part.text.trim() === '' ? 'space' : part.text.trim() }] : [];
  });
}

/** The keys of a format, always the same ones in the same order: words, letters, digits, and signs between fields. */
export function keysOf(context: FormatContext, fields: ReadonlyMap<number, TypedField>): Key[] {
  const all = [...fields.values()];
  const words = new Set(all.flatMap((field) => wordsOf(field).words));
  const free = all.some(({ part }) => part.free) ? [...'ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789'] : [];
  const characters = [...all.flatMap((field) => [...wordsOf(field).characters, ...charactersOf(field)]), ...free];
  const hexadecimal = all.some(({ part }) => part.radix === 16 && charactersOf(fields.get(part.at)!).length > 10);
  const [first] = characters;
  const plain = sorted(characters, hexadecimal || first === undefined || isDigit(first) ? 'digits' : 'letters');
  const keys = [...words, ...plain].map((text): Key => ({ text, label: text }));
  const known = new Set(keys.map(({ text }) => text));
  const fixed = new Map(fixedKeys(context, fields).map((key) => [key.text, key] as const));
  return [...keys, ...[...fixed.values()].filter(({ text }) => !known.has(text))];
}
