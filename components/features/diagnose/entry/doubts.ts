import { compileFormat, openConventions, type CompiledFormat, type Doubt, type LayoutIndex } from '@/lib';
import type { ReportFormat } from '@/shared';

export type { Doubt };

/** Doubts in the words of the question. */
export const doubtWords: Record<Doubt, string> = {
  first: 'Does it count from 0 or from 1?',
  order: 'Which end is bit 0?',
};

const both: readonly Doubt[] = ['first', 'order'];

/** What may be doubted of a format: only what it takes for granted. */
export function doubtsOf(definition: ReportFormat, index: LayoutIndex): Doubt[] {
  const own = compileFormat(definition, index);
  const open = compileFormat(openConventions(definition, both), index);
  if (!own.ok || !open.ok) return [];
  const known = new Set(own.questions.map(({ kind }) => kind));
  return both.filter((doubt) => !known.has(doubt) && open.questions.some(({ kind }) => kind === doubt));
}

/** The format as it is read while something is doubted; null where it then cannot be read. */
export function doubtedFormat(
  definition: ReportFormat,
  index: LayoutIndex,
  doubts: readonly Doubt[],
): CompiledFormat | null {
  const result = compileFormat(openConventions(definition, doubts), index);
  return result.ok ? result.format : null;
}

/** The tab of a link with the doubts behind it: `lamp~first-order`. */
export const writeTab = (tab: string, doubts: readonly Doubt[]): string =>
  doubts.length === 0 ? tab : `${tab}~${doubts.join('-')}`;

/** The tab and the doubts of such a text. */
export function readTab(text: string): { tab: string; doubts: Doubt[] } {
  const at = text.indexOf('~', 1);
  if (at < 0) return { tab: text, doubts: [] };
  const said = text.slice(at + 1).split('-');
  return { tab: text.slice(0, at), doubts: both.filter((doubt) => said.includes(doubt)) };
}
