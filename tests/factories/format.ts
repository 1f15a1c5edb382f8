import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { compileFormat } from '@/lib/report/compile-format';
import type { CompiledFormat, ReadResult, ReportReading } from '@/lib/report/meaning';
import { type LayoutDocumentInput, layoutDocument } from '@/shared';
import { type LayoutOptions, buildLayoutInput } from './layout';

type FormatInput = NonNullable<LayoutDocumentInput['reportFormats']>[number];

export interface ReadyFormat {
  readonly index: LayoutIndex;
  readonly format: CompiledFormat;
}

/** A format compiled for a test layout. Throws where it does not compile. */
export function buildFormat(
  format: Partial<FormatInput> & Pick<FormatInput, 'parts'>,
  board: LayoutOptions & { change?: (input: LayoutDocumentInput) => LayoutDocumentInput } = {},
): ReadyFormat {
  const { change = (input) => input, ...options } = board;
  const whole: FormatInput = { id: 'code', name: 'Code', after: 'stops', ...format };
  const index = buildLayoutIndex(
    layoutDocument.parse(change({ ...buildLayoutInput(options), reportFormats: [whole] })),
  );
  const compiled = compileFormat(index.document.reportFormats[0]!, index);
  if (!compiled.ok) throw new Error(compiled.reasons.map(({ message }) => message).join(' '));
  return { index, format: compiled.format };
}

/** Lanes as "B3", the bank and the bit. */
export function laneNames(index: LayoutIndex, lanes: readonly number[]): string[] {
  const { banks, dataBits } = index.document.memory;
  return lanes.map((lane) => `${banks[Math.floor(lane / dataBits)]!.id}${lane % dataBits}`);
}

/** The failing lanes of each reading as "B3", or the reason why there is none. */
export function meaning({ index, format }: ReadyFormat, text: string): string[] | string {
  const result: ReadResult = format.read(text);
  if (!result.ok) return result.reason;
  const names = ({ failing }: ReportReading) =>
    laneNames(
      index,
      failing.map(({ lane }) => lane),
    ).join(' ');
  return result.readings.map(names);
}
