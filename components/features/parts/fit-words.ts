import type { NoticeProps } from '@/components/ui/notice';
import type { FitCheck, FitPin, FitVerdict } from '@/lib';

/** The verdict as a sentence of its own. */
export const verdictWords: Record<FitVerdict, string> = {
  fits: 'It fits as it is.',
  'fits-after-changes': 'It fits after changes.',
  destroyed: 'It would be destroyed.',
  'does-not-fit': 'It does not fit.',
};

/** Which slip the verdict is laid on the page with. */
export const verdictKind: Record<FitVerdict, NonNullable<NoticeProps['kind']>> = {
  fits: 'good',
  'fits-after-changes': 'warning',
  destroyed: 'problem',
  'does-not-fit': 'problem',
};

/** How a pin comes out, in words. */
export const pinWords: Record<FitPin['severity'], string> = {
  same: 'same',
  harmless: 'harmless',
  change: 'to change',
  destroys: 'destroys it',
};

/** Over the list of changes; null where there is nothing to change. */
export function changesTitle({ verdict, changes }: FitCheck): string | null {
  if (changes.length === 0) return null;
  return verdict === 'destroyed' ? 'Only after these changes' : 'What to change';
}
