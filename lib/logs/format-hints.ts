import type { FormatField, ReportFormat } from '@/shared';
import { compiledFormats } from '../diagnose/compiled-formats';
import type { LayoutIndex } from '../layout/layout-index';
import type { CompiledFormat } from '../report/meaning';
import type { ColumnPattern, LogNotation } from './line-pattern';

/** What a report format of the layout says of the numbers of a log whose lines it reads. */
export interface FormatHint {
  readonly format: string;
  readonly name: string;
  /** Share of the lines that are worded as the format. */
  readonly share: number;
  /** What the numbers are; null where columns cannot say it: bits in another order, or a table of words. */
  readonly numbers: Pick<ColumnPattern, 'notation' | 'values' | 'unit' | 'shows'> | null;
}

/** Fewer lines than this share are chance. */
const leastShare = 0.3;

const bitsPerDigit = { hexadecimal: 4, octal: 3, decimal: Math.log2(10), binary: 1 } as const;

function isPlainNotation(notation: string): notation is LogNotation | 'binary' {
  return notation in bitsPerDigit;
}

function fieldsOf(format: ReportFormat): FormatField[] {
  return format.parts.filter((part): part is FormatField => 'field' in part);
}

function isPlain(index: LayoutIndex, field: FormatField): boolean {
  const dataBits = Array.from({ length: index.bitCount }, (_, bit) => bit).filter((bit) => index.isCheckBit[bit] === 0);
  const usual = field.bits === undefined || field.bits.join() === dataBits.join();
  return usual && field.bitOrder === 'low-first' && field.table.length === 0 && isPlainNotation(field.notation);
}

function numbersOf(index: LayoutIndex, fields: readonly FormatField[]): FormatHint['numbers'] {
  const address = fields.find(({ field }) => field === 'address')!;
  const values = fields.filter(({ field }) => field === 'written' || field === 'read' || field === 'mask');
  const [value] = values;
  const told = values.length === 2 ? values[0]!.field !== values[1]!.field : value?.field === 'mask';
  const spoken = address.notation;
  if (value === undefined || !told || !isPlainNotation(spoken) || spoken === 'binary' || address.table.length > 0)
    return null;
  if (!values.every((each) => isPlain(index, each) && each.notation === value.notation)) return null;
  if (!isPlainNotation(value.notation)) return null;
  const steps = Math.max(1, ...index.document.addressMap.windows.map(({ lanes }) => lanes?.length ?? 1));
  const unit = address.shift === 0 ? 'address' : 2 ** address.shift === steps ? 'word' : null;
  if (unit === null) return null;
  const dataBits = index.bitCount - index.isCheckBit.reduce((sum, check) => sum + check, 0);
  const shown = (value.digits?.max ?? 0) * bitsPerDigit[value.notation];
  const whole = steps > 1 && (unit === 'word' || shown >= dataBits);
  return {
    notation: spoken,
    ...(value.notation === spoken ? {} : { values: value.notation }),
    unit,
    shows: whole ? 'word' : 'address',
  };
}

const plainText = (text: string) => text.trim().replace(/\s+/g, ' ').toUpperCase();

/** Whether a machine wrote the line so. What a tired hand leaves out is read as well, and says nothing of a log. */
function isWordedAs(reader: CompiledFormat, text: string): boolean {
  const result = reader.read(text.trim());
  return result.ok && plainText(result.text) === plainText(text);
}

/** The report formats with an address that word a good part of the lines, with what they say of the numbers. */
export function formatHints(index: LayoutIndex, texts: readonly string[]): FormatHint[] {
  const compiled = compiledFormats(index);
  return index.document.reportFormats.flatMap((format): FormatHint[] => {
    const fields = fieldsOf(format);
    const reader = compiled.get(format.id);
    if (reader === undefined || texts.length === 0 || !fields.some(({ field }) => field === 'address')) return [];
    const share = texts.filter((text) => isWordedAs(reader, text)).length / texts.length;
    if (share < leastShare) return [];
    return [{ format: format.id, name: format.name, share, numbers: numbersOf(index, fields) }];
  });
}
