import type { LayoutProblem, WorkedExample } from '@/shared';
import { addressMapOf } from '../../place/address';
import { blamedSockets } from '../../report/blamed-sockets';
import type { CompileResult } from '../../report/compile-format';
import type { ReadReport } from '../../report/meaning';
import { listWords } from '../words';
import { type Checked, error } from './problem';

function blames(checked: Checked, read: ReadReport): string[][] {
  const { index } = checked;
  const map = addressMapOf(index);
  return read.readings.map((reading) =>
    blamedSockets(index, map, reading).map((at) => index.document.sockets[at]!.label),
  );
}

function same(a: readonly string[], b: readonly string[]): boolean {
  return a.length === b.length && a.every((label) => b.includes(label));
}

function outcome(
  checked: Checked,
  example: WorkedExample,
  { result, pointer }: { result: CompileResult; pointer: string },
): LayoutProblem[] {
  if (!result.ok) return [];
  const read = result.format.read(example.text);
  if (!read.ok)
    return [
      error({
        pointer: `${pointer}/text`,
        code: 'example-unread',
        message: `"${example.text}" is no code of this format. ${read.reason}`,
      }),
    ];
  const found = blames(checked, read);
  const wanted = [...new Set(example.sockets)];
  if (found.some((labels) => same(labels, wanted))) return [];
  const shown = found
    .slice(0, 3)
    .map((labels) => listWords(labels, 8))
    .join(', or ');
  const message = `"${example.text}" leads to ${shown}, not to ${listWords(wanted, 8)}. Either the example or the layout is wrong.`;
  return [error({ pointer: `${pointer}/sockets`, code: 'example-differs', message })];
}

/** Worked examples that do not come out as their source says. */
export function checkExamples(checked: Checked, compiled: readonly CompileResult[]): LayoutProblem[] {
  const { document, index } = checked;
  const formatAt = new Map(document.reportFormats.map((format, at) => [format.id, at]));
  return document.examples.flatMap((example, n) => {
    const pointer = `/examples/${n}`;
    const unknown = example.sockets.flatMap((label, at) =>
      index.socketByLabel.has(label)
        ? []
        : [
            error({
              pointer: `${pointer}/sockets/${at}`,
              code: 'unknown-socket',
              message: `There is no socket ${label}.`,
            }),
          ],
    );
    const at = formatAt.get(example.format);
    if (at === undefined) {
      const message = `There is no report format "${example.format}".`;
      return [...unknown, error({ pointer: `${pointer}/format`, code: 'unknown-format', message })];
    }
    return unknown.length > 0 ? unknown : outcome(checked, example, { result: compiled[at]!, pointer });
  });
}
