import type { ColumnPattern } from './line-pattern';
import { type LabelledField, type LineWord, isNumber, joinsRun, labelledField, wordsOfLine } from './line-words';

/** The columns of a pattern without what the numbers mean, and how much the lines themselves say for it. */
export interface LineShape {
  readonly columns: Pick<ColumnPattern, 'address' | 'written' | 'read' | 'mask' | 'register'>;
  /** Told by words of the log, by a heading over the columns, or by nothing but the usual order. */
  readonly told: 'words' | 'heading' | 'order' | 'other order';
  /** Where only the address has no word before it: how many numbers before it could be the address as well. */
  readonly passedOver: number;
}

type Fields = Partial<Record<LabelledField, string>>;

const anyNotation = (word: string) => isNumber(word, 'hexadecimal');

/** A number at the end of a label: W00, R01. Words of letters only, such as READ, are none. */
function gluedLabel(word: string): { readonly label: string; readonly field: LabelledField } | null {
  const parts = /^([a-z]+?)([0-9a-f]*[0-9][0-9a-f]*|f{2,})$/i.exec(word);
  const field = parts === null ? null : labelledField(parts[1]!);
  return field === null || parts === null ? null : { label: parts[1]!, field };
}

/** Labels that a number follows, at most two other words between, in the order of the line. */
function labelsOf(
  words: readonly LineWord[],
  registers: ReadonlySet<string>,
): { field: LabelledField; label: string }[] {
  const found: { field: LabelledField; label: string }[] = [];
  let pending: { field: LabelledField; label: string; age: number } | null = null;
  words.forEach(({ text, before }, at) => {
    const upper = text.toUpperCase();
    if (pending !== null && anyNotation(text) && !(upper === 'BE' && pending.label === 'SHOULD')) {
      found.push({ field: pending.field, label: pending.label });
      pending = null;
      return;
    }
    const register = registers.has(upper);
    const slashed = upper === 'B' && before === '/' && words[at - 1]?.text.toUpperCase() === 'S';
    const field = register ? 'register' : slashed ? 'written' : labelledField(text);
    if (field !== null) {
      pending = { field, label: upper, age: 0 };
      return;
    }
    const glued = anyNotation(text) ? null : gluedLabel(text);
    if (glued !== null) {
      found.push({ field: glued.field, label: glued.label.toUpperCase() });
      pending = null;
    } else if (pending !== null && ++pending.age > 2) pending = null;
  });
  return found;
}

/** The label that most lines use for each field. */
function commonLabels(lines: readonly (readonly LineWord[])[], registers: ReadonlySet<string>): Fields {
  const counts = new Map<string, { field: LabelledField; label: string; count: number }>();
  for (const words of lines) {
    const seen = new Set<string>();
    for (const { field, label } of labelsOf(words, registers)) {
      const key = `${field} ${label}`;
      if (seen.has(key)) continue;
      seen.add(key);
      const entry = counts.get(key) ?? { field, label, count: 0 };
      entry.count++;
      counts.set(key, entry);
    }
  }
  const fields: Fields = {};
  for (const { field, label } of [...counts.values()].sort((a, b) => b.count - a.count)) fields[field] ??= label;
  return fields;
}

/** Words of a line as columns, the far end of the first run of addresses, and the word before it, left out. */
function columnsWithoutRun(words: readonly LineWord[]): string[] {
  for (let at = 1; at < words.length; at++) {
    const [first, word] = [words[at - 1]!, words[at]!];
    if (!anyNotation(first.text)) continue;
    if (joinsRun(word) && anyNotation(words[at + 1]?.text ?? '')) return textsOf(words.toSpliced(at, 2));
    const dashed = /^\s*(-|~|\.\.|[\u2010-\u2015])\s*$/.test(word.before);
    if (dashed && anyNotation(word.text) && word.text.length === first.text.length)
      return textsOf(words.toSpliced(at, 1));
  }
  return textsOf(words);
}

function textsOf(words: readonly LineWord[]): string[] {
  return words.map(({ text }) => text);
}

/** Columns, counted from 1, that hold a number in most of the lines. */
function numberColumns(lines: readonly (readonly string[])[]): number[] {
  const counts = new Map<number, number>();
  for (const columns of lines) {
    columns.forEach((text, at) => {
      if (anyNotation(text)) counts.set(at + 1, (counts.get(at + 1) ?? 0) + 1);
    });
  }
  return [...counts]
    .filter(([, count]) => count * 2 > lines.length)
    .map(([column]) => column)
    .sort((a, b) => a - b);
}

/** Lines of the commonest number of columns: the others are headings and remarks. */
function usualLines(lines: readonly (readonly string[])[]): (readonly string[])[] {
  const bySize = new Map<number, (readonly string[])[]>();
  for (const columns of lines) {
    if (columns.some(anyNotation)) bySize.set(columns.length, [...(bySize.get(columns.length) ?? []), columns]);
  }
  return [...bySize.values()].sort((a, b) => b.length - a.length)[0] ?? [];
}

/** Fields in the order in which a heading without numbers names them. */
function headingFields(lines: readonly (readonly LineWord[])[]): LabelledField[] | null {
  for (const words of lines) {
    if (words.some(({ text }) => /[0-9]/.test(text))) continue;
    const fields = words.flatMap(({ text }) => labelledField(text) ?? []);
    const distinct = [...new Set(fields)];
    if (distinct.includes('address') && distinct.length > 1) return distinct;
  }
  return null;
}

function headedShapes(columns: readonly number[], heading: readonly LabelledField[]): LineShape[] {
  if (columns.length < heading.length) return [];
  const shape: Partial<Record<LabelledField, number>> = {};
  heading.forEach((field, at) => (shape[field] = columns[at]!));
  const { address, written, read, mask } = shape;
  if (address === undefined || ((written === undefined || read === undefined) && mask === undefined)) return [];
  return [{ columns: dropUndefined({ address, written, read, mask }), told: 'heading', passedOver: 0 }];
}

function dropUndefined(columns: { [Name in keyof LineShape['columns']]?: LineShape['columns'][Name] | undefined }) {
  return Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined)) as LineShape['columns'];
}

const mostBareColumns = 12;

/** Bare columns: any of them the address, two neighbours of the rest written and read. */
function bareShapes(columns: readonly number[]): LineShape[] {
  const considered = columns.slice(0, mostBareColumns);
  if (considered.length === 2)
    return [{ columns: { address: considered[0]!, mask: considered[1]! }, told: 'order', passedOver: 0 }];
  return considered.flatMap((address) => {
    const rest = considered.filter((column) => column !== address);
    return rest.slice(1).flatMap((second, at): LineShape[] => {
      const first = rest[at]!;
      const told = address < first ? 'order' : 'other order';
      const mask = rest[at + 2];
      const pair: LineShape[] = [
        { columns: { address, written: first, read: second }, told, passedOver: 0 },
        { columns: { address, written: second, read: first }, told: 'other order', passedOver: 0 },
      ];
      if (mask === undefined) return pair;
      return [...pair, ...pair.map((shape) => ({ ...shape, columns: { ...shape.columns, mask } }))];
    });
  });
}

/** Labelled values; the address labelled too, or any number that no label stands before. */
function labelledShapes(fields: Fields, columns: readonly number[]): LineShape[] {
  const { written, read, mask } = fields;
  const pair = written !== undefined && read !== undefined;
  if (!pair && mask === undefined) return [];
  const values = pair ? { written, read } : { mask: mask! };
  const registerLabel = fields.register;
  const register = registerLabel === undefined ? {} : { register: { name: registerLabel, column: registerLabel } };
  const labelled: LineShape[] =
    fields.address === undefined
      ? []
      : [{ columns: { address: fields.address, ...values, ...register }, told: 'words', passedOver: 0 }];
  const placed = columns.slice(0, mostBareColumns).map((address, at): LineShape => ({
    columns: { address, ...values, ...register },
    told: 'words',
    passedOver: at + 3 * labelled.length,
  }));
  return [...labelled, ...placed];
}

/** Every arrangement of columns that the lines suggest, without what their numbers mean. */
export function shapesOf(lines: readonly string[], registers: readonly string[]): LineShape[] {
  const words = lines.map(wordsOfLine).filter((line) => line.length > 0);
  const names = new Map(registers.map((name) => [name.toUpperCase(), name]));
  const plain = words.map(textsOf);
  const withNumbers = plain.filter((line) => line.some(anyNotation));
  const fields = commonLabels(words, new Set(names.keys()));
  const labelled = labelledShapes(fields, numberColumns(withNumbers)).map((shape): LineShape => {
    const { register } = shape.columns;
    if (register === undefined) return shape;
    return {
      ...shape,
      columns: { ...shape.columns, register: { ...register, name: names.get(register.name) ?? register.name } },
    };
  });
  if (labelled.length > 0) return labelled;
  const heading = headingFields(words);
  const bare = new Map<string, LineShape>();
  for (const counted of [plain, words.map(columnsWithoutRun)]) {
    const columns = numberColumns(usualLines(counted));
    const headed = heading === null ? [] : headedShapes(columns, heading);
    for (const shape of headed.length > 0 ? headed : bareShapes(columns))
      bare.set(JSON.stringify(shape.columns), shape);
  }
  return [...bare.values()];
}
