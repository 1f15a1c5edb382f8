import type { AddressSpan } from '@/lib';
import { addressWords } from '@/lib/layout/words';
import type { LayoutDocument } from '@/shared';

/** Spans that are told one by one; more are counted. */
const mostSpans = 4;

/**
 * Addresses in words: "4000 to 7FFF", "0000 to 3F80, one in 80", with the register that they need. The step stands in the
 * notation of the machine, as the addresses do. Empty where there are none.
 */
export function spanWords({ addressMap }: Pick<LayoutDocument, 'addressMap'>, spans: readonly AddressSpan[]): string[] {
  const told = spans.slice(0, mostSpans).map(({ first, last, step, count, register }) => {
    const from = addressWords(addressMap, first);
    const reach = count === 1 ? from : `${from} to ${addressWords(addressMap, last)}`;
    const every =
      step > 1 ? `, one in ${addressWords(addressMap, step, 1)}` : step === 0 && count > 1 ? ', some of them' : '';
    return `${reach}${every}${register === null ? '' : `, ${register.name} ${register.value}`}`;
  });
  return spans.length > mostSpans ? [...told, `and ${spans.length - mostSpans} more runs like these`] : told;
}
