import type { Evidence, NextCheck, Run } from '@/shared';
import type { Bench } from '../bench';

/**
 * What an outcome comes to as evidence: its finding where it has one, else what its text says, which is a pass, or codes of the format that was used last. Empty where it
 * is told in words; the report is then typed.
 */
export function outcomeEvidence(
  { formats }: Bench,
  runs: readonly Run[],
  { sees, finding }: Pick<NextCheck['outcomes'][number], 'sees' | 'finding'>,
): Evidence[] {
  if (finding !== undefined) return [finding];
  if (sees === 'no failure') return [{ kind: 'pass' }];
  const codes = runs.flatMap(({ evidence }) => evidence.flatMap((seen) => (seen.kind === 'code' ? [seen] : [])));
  const last = codes.at(-1);
  const format = formats.find(({ definition }) => definition.id === last?.format);
  if (last === undefined || format === undefined) return [];
  const texts = format.compiled.read(sees).ok ? [sees] : sees.split(', ');
  if (!texts.every((text) => format.compiled.read(text).ok)) return [];
  const { doubts } = last;
  return texts.map((text) => ({
    kind: 'code',
    format: last.format,
    text,
    ...(doubts === undefined ? {} : { doubts }),
  }));
}
