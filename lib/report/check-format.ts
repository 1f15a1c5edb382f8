import { highestSyndrome, validateCode } from '../ecc/code';
import { listWords, sentenceCase } from '../layout/words';
import { type FieldPart, type FormatContext, bitsOfField } from './format-context';
import { nounOfField } from './reasons';
import { entryNamesLane } from './values';

/** Why a format cannot be used for a layout. */
export interface FormatReason {
  /** JSON pointer inside the format. */
  readonly pointer: string;
  readonly code: string;
  readonly message: string;
}

type FieldName = FieldPart['field']['field'];

const naming: ReadonlySet<FieldName> = new Set(['bank', 'bit', 'mask', 'address', 'read', 'lane', 'socket'] as const);
const several: ReadonlySet<FieldName> = new Set(['ignored', 'count', 'mask', 'written', 'read'] as const);
const countable: ReadonlySet<FieldName> = new Set(['bank', 'bit', 'lane'] as const);
const namedThings: ReadonlySet<FieldName> = new Set(['bank', 'bit', 'socket', 'ignored'] as const);

const pointerTo = (part: FieldPart) => `/parts/${part.at}`;

function notationReasons(part: FieldPart): FormatReason[] {
  const { field, notation } = part.field;
  const pointer = `${pointerTo(part)}/notation`;
  const wrong = (message: string): FormatReason[] => [{ pointer, code: 'format-notation', message }];
  if (notation === 'words' && part.field.table.length === 0)
    return wrong(`A field in words needs a table of the words that the machine shows.`);
  if (notation === 'letter' && !countable.has(field))
    return wrong(
      `Letters count banks, bits or lanes. Write the ${nounOfField(part)} in digits or as a table of words.`,
    );
  if (notation === 'names' && !namedThings.has(field))
    return wrong(
      `Only a bank, a bit or a socket has a name. Write the ${nounOfField(part)} in digits or as a table of words.`,
    );
  if (notation === 'one-hot' && !countable.has(field) && field !== 'mask')
    return wrong(`One-hot digits show a bank, a bit, a lane or a mask, not a ${nounOfField(part)}.`);
  if (notation === 'flashes' && !countable.has(field) && field !== 'count')
    return wrong(`A person counts flashes for a bank, a bit or a lane, not for a ${nounOfField(part)}.`);
  if (field === 'socket' && notation !== 'names' && notation !== 'words')
    return wrong('A socket is written by its name. Choose the notation "names".');
  return [];
}

function tableReasons(part: FieldPart, { index }: FormatContext): FormatReason[] {
  const seen = new Map<string, number>();
  return part.field.table.flatMap((entry, at) => {
    const pointer = `${pointerTo(part)}/table/${at}`;
    const reasons: FormatReason[] = [];
    const earlier = seen.get(entry.text);
    if (earlier !== undefined) {
      reasons.push({
        pointer: `${pointer}/text`,
        code: 'format-table-twice',
        message: `"${entry.text}" already stands in line ${earlier + 1} of this table. A text can mean one thing only.`,
      });
    } else seen.set(entry.text, at);
    if (entry.bank !== undefined && !index.bankByName.has(entry.bank)) {
      reasons.push({ pointer: `${pointer}/bank`, code: 'unknown-bank', message: `There is no bank "${entry.bank}".` });
    }
    for (const [n, bit] of (entry.bits ?? []).entries()) {
      if (bit >= index.bitCount)
        reasons.push({
          pointer: `${pointer}/bits/${n}`,
          code: 'bit-out-of-range',
          message: `There is no bit ${bit}: the word has bits 0 to ${index.bitCount - 1}.`,
        });
    }
    if (!entryNamesLane(entry) && entry.means === undefined && naming.has(part.field.field)) {
      reasons.push({
        pointer,
        code: 'format-table-empty',
        message: `Say what "${entry.text}" stands for: a value, a bank, bits, or words.`,
      });
    }
    return reasons;
  });
}

function bitReasons(part: FieldPart, { index }: FormatContext): FormatReason[] {
  const seen = new Set<number>();
  return (part.field.bits ?? []).flatMap((bit, at) => {
    const pointer = `${pointerTo(part)}/bits/${at}`;
    if (bit >= index.bitCount)
      return [
        {
          pointer,
          code: 'bit-out-of-range',
          message: `There is no bit ${bit}: the word has bits 0 to ${index.bitCount - 1}.`,
        },
      ];
    if (seen.has(bit)) return [{ pointer, code: 'format-bit-twice', message: `Bit ${bit} is listed twice.` }];
    seen.add(bit);
    return [];
  });
}

function codeReasons(part: FieldPart, context: FormatContext): FormatReason[] {
  const { code, field, digits } = part.field;
  if (code === undefined) return [];
  const pointer = `${pointerTo(part)}/code`;
  const wrong = (message: string, at = pointer): FormatReason[] => [{ pointer: at, code: 'format-code', message }];
  if (field !== 'syndrome') return wrong(`Only a syndrome has a code, not a ${nounOfField(part)}.`);
  const { radix } = part;
  if (radix === null) return wrong('A code gives numbers. Choose hexadecimal, decimal, octal or binary digits.');
  const bits = bitsOfField(context, part, null);
  if (code.columns.length !== bits.length)
    return wrong(
      `The code has ${code.columns.length} columns, but the field has ${bits.length} bits. Give one for each.`,
      `${pointer}/columns`,
    );
  const top = highestSyndrome(code).toString(radix).toUpperCase();
  const tooLong =
    digits !== undefined && top.length > digits.max
      ? wrong(
          `Syndromes go up to ${top}, which is more than the ${digits.max} ${digits.max === 1 ? 'digit' : 'digits'} of the field.`,
        )
      : [];
  const bitAt = (column: number) => `bit ${bits[column]}`;
  const problems = validateCode(code).flatMap(({ column, kind, others }) => {
    const at = `${pointer}/columns/${column}`;
    const [one, two] = others.map(bitAt);
    switch (kind) {
      case 'zero':
        return wrong(`A column of 0 says that ${bitAt(column)} is never checked.`, at);
      case 'twice':
        return wrong(
          `${sentenceCase(bitAt(column))} has the same column as ${one}: the code could not tell them apart.`,
          at,
        );
      case 'pair':
        return wrong(
          `${sentenceCase(one!)} and ${two} wrong together would look like ${bitAt(column)} alone, so two errors are not detected.`,
          at,
        );
    }
  });
  return [...tooLong, ...problems];
}

function repeatedReasons(context: FormatContext): FormatReason[] {
  const first = new Map<FieldName, FieldPart[]>();
  return context.fields.flatMap((part): FormatReason[] => {
    const before = first.get(part.field.field) ?? [];
    first.set(part.field.field, [...before, part]);
    if (before.length === 0 || part.field.field === 'ignored' || part.field.field === 'count') return [];
    const noun = nounOfField(part);
    if (!several.has(part.field.field))
      return [
        {
          pointer: pointerTo(part),
          code: 'format-field-twice',
          message: `The code already has a field for the ${noun}.`,
        },
      ];
    const taken = new Set(before.flatMap((other) => bitsOfField(context, other, null)));
    const shared = bitsOfField(context, part, null).filter((bit) => taken.has(bit));
    if (shared.length === 0) return [];
    return [
      {
        pointer: pointerTo(part),
        code: 'format-field-twice',
        message: `Two fields show ${shared.length === 1 ? 'bit' : 'bits'} ${listWords(shared.map(String))}. Say for each ${noun} which bits it shows.`,
      },
    ];
  });
}

function meaningReasons(context: FormatContext): FormatReason[] {
  const { fields, format, index, map } = context;
  const has = (name: FieldName) => fields.some((part) => part.field.field === name);
  const listsBits = fields.some((part) =>
    part.field.table.some((entry) => entry.bits !== undefined || entry.bank !== undefined),
  );
  const tellsBits = listsBits || fields.some((part) => part.field.code !== undefined);
  const reasons: FormatReason[] = [];
  const wrong = (pointer: string, code: string, message: string) => reasons.push({ pointer, code, message });
  if (!fields.some((part) => naming.has(part.field.field)) && !tellsBits) {
    wrong(
      '/parts',
      'format-names-nothing',
      'No part of this code names a bank, a bit, an address or a socket. Add a field that does.',
    );
  }
  if (has('read') && !has('written') && format.written === undefined && !has('mask') && !tellsBits) {
    wrong(
      '/parts',
      'format-written-missing',
      'The code shows what was read but not what was written. Add a field for it, or give the value that the test always writes.',
    );
  }
  if (has('written') && !has('read') && !has('mask') && !tellsBits) {
    wrong('/parts', 'format-read-missing', 'The code shows what was written but neither what was read nor a mask.');
  }
  const namesBank = has('bank') || has('lane') || has('socket') || format.bank !== undefined || listsBits;
  if (has('address') && map.windows.length === 0 && !namesBank && index.bankCount > 1) {
    wrong(
      '/parts',
      'format-no-windows',
      'The code names the bank by an address, but the layout has no address windows. Add them to the address map.',
    );
  }
  if (format.bank !== undefined && !index.bankByName.has(format.bank))
    wrong('/bank', 'unknown-bank', `There is no bank "${format.bank}".`);
  for (const part of fields) {
    if (part.field.field === 'syndrome' && part.field.table.length === 0 && part.field.code === undefined)
      wrong(
        pointerTo(part),
        'format-syndrome',
        'Say in a table which bits each syndrome stands for, or give the code that it comes from.',
      );
  }
  return reasons;
}

/** Every reason why a format cannot be used; empty where it can. */
export function checkFormat(context: FormatContext): FormatReason[] {
  const each = context.fields.flatMap((part) => [
    ...notationReasons(part),
    ...tableReasons(part, context),
    ...bitReasons(part, context),
    ...codeReasons(part, context),
  ]);
  return [...each, ...repeatedReasons(context), ...meaningReasons(context)];
}
