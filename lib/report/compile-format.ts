import type { ReportFormat } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import { type FormatReason, checkFormat } from './check-format';
import { type Question, conventionsOf } from './conventions';
import { buildFormatContext } from './format-context';
import { buildKeypad, nextKeys } from './keypad';
import type { CompiledFormat } from './meaning';
import { readEither } from './read-either';
import { buildSilence } from './silence';
import { writeText } from './write';

export type CompileResult =
  | { readonly ok: true; readonly format: CompiledFormat; readonly questions: readonly Question[] }
  | { readonly ok: false; readonly reasons: readonly FormatReason[] };

/**
 * Makes a report format ready for one layout, or gives every reason why it cannot be. Also tells the conventions
 * that the format leaves open: readings whose `takes` hold different answers to one of these questions cannot both
 * be true of one machine.
 */
export function compileFormat(format: ReportFormat, index: LayoutIndex): CompileResult {
  const context = buildFormatContext(format, index);
  const reasons = checkFormat(context);
  if (reasons.length > 0) return { ok: false, reasons };

  const conventions = conventionsOf(context.questions);
  const reader = { context, conventions, silence: buildSilence(format, index) };
  const writer = { context, convention: conventions[0]! };
  const keypad = buildKeypad(reader);
  return {
    ok: true,
    questions: context.questions,
    format: {
      id: format.id,
      name: format.name,
      read: (text) => readEither(reader, text),
      write: (lanes) => writeText(writer, lanes),
      next: (text) => nextKeys(keypad, text),
    },
  };
}
