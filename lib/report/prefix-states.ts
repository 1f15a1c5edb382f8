import type { TypedField } from './field-lanes';
import type { FormatContext } from './format-context';
import { fold, isSpace } from './typed-text';

/** A field with the text that was typed into it. */
export interface FilledField {
  readonly field: TypedField;
  readonly text: string;
}

/** One way to understand a text as the beginning of a code. */
export interface PrefixState {
  readonly filled: readonly FilledField[];
  /** The field that takes more; null where fixed text or the end comes next. */
  readonly open: FilledField | null;
  /** Fixed text that comes next; empty where none does. */
  readonly fixed: string;
  readonly done: boolean;
}

/** A text has more beginnings than this only in a format that cannot be read back anyway. */
const mostStates = 64;

interface Walk {
  readonly context: FormatContext;
  readonly fields: ReadonlyMap<number, TypedField>;
  readonly text: string;
  readonly states: PrefixState[];
  /** Places that lead nowhere for a part, so that each is tried once. */
  readonly dead: Set<number>;
}

function wordsFrom({ text }: Walk, field: TypedField, at: number): number[] {
  const rest = text.slice(at);
  return field.texts
    .filter((entry) => !entry.padded && entry.text !== '' && rest.startsWith(fold(entry.text)))
    .map((entry) => at + entry.text.length);
}

function alphabetOf({ digits, letters }: TypedField['part']): string {
  return digits?.alphabet ?? (letters > 0 ? 'ABCDEFGHIJKLMNOPQRSTUVWXYZ' : '');
}

function digitsFrom({ text }: Walk, { part, width }: TypedField, at: number): number[] {
  const alphabet = alphabetOf(part);
  const ends: number[] = [];
  for (let to = at; to < text.length && to - at < width.max && alphabet.includes(text[to]!); to++) {
    if (to + 1 - at >= width.min) ends.push(to + 1);
  }
  return ends;
}

function freeFrom({ text }: Walk, { part }: TypedField, at: number): number[] {
  if (!part.free) return [];
  let to = at;
  while (to < text.length && !isSpace(text[to]!)) to++;
  return to === at ? [] : [to];
}

/** The text of a field in the machine's own form, where capitals and small letters differ in its words. */
function ownForm(field: TypedField, text: string): string {
  return field.texts.find((entry) => !entry.padded && fold(entry.text) === text)?.text ?? text;
}

interface Step {
  readonly part: number;
  readonly at: number;
  readonly filled: readonly FilledField[];
}

function follow(walk: Walk, { part, at, filled }: Step): void {
  const { context, fields, text, states, dead } = walk;
  const place = part * (text.length + 1) + at;
  if (states.length >= mostStates || dead.has(place)) return;
  const before = states.length;
  const current = context.parts[part];
  if (current === undefined) {
    if (at === text.length) states.push({ filled, open: null, fixed: '', done: true });
    return;
  }
  if (current.kind === 'text') {
    const fixed = fold(current.text);
    const rest = text.slice(at, at + fixed.length);
    if (rest === fixed) follow(walk, { part: part + 1, at: at + fixed.length, filled });
    else if (fixed.startsWith(rest) && at + rest.length === text.length)
      states.push({ filled, open: null, fixed: current.text.slice(rest.length), done: false });
    return;
  }
  const field = fields.get(part)!;
  states.push(...opened(walk, field, { part, at, filled }));
  for (const end of new Set([
    ...wordsFrom(walk, field, at),
    ...digitsFrom(walk, field, at),
    ...freeFrom(walk, field, at),
  ])) {
    follow(walk, {
      part: part + 1,
      at: end,
      filled: [...filled, { field, text: ownForm(field, text.slice(at, end)) }],
    });
  }
  if (states.length === before) dead.add(place);
}

/** The state in which the rest of the text is the beginning of a field. */
function opened({ text }: Walk, field: TypedField, { at, filled }: Step): PrefixState[] {
  const rest = text.slice(at);
  const alphabet = alphabetOf(field.part);
  const word = field.texts.find(
    (entry) => !entry.padded && entry.text.length > rest.length && fold(entry.text).startsWith(rest),
  );
  const digits =
    (alphabet !== '' || rest === '') &&
    rest.length <= field.width.max &&
    [...rest].every((digit) => alphabet.includes(digit));
  if (word === undefined && !digits && !field.part.free) return [];
  const typed = word === undefined ? rest : word.text.slice(0, rest.length);
  return [{ filled, open: { field, text: typed }, fixed: '', done: false }];
}

/** Every way to understand a text as the beginning of a code. */
export function prefixStates(
  context: FormatContext,
  fields: ReadonlyMap<number, TypedField>,
  text: string,
): PrefixState[] {
  const walk: Walk = { context, fields, text: fold(text), states: [], dead: new Set() };
  follow(walk, { part: 0, at: 0, filled: [] });
  return walk.states;
}
