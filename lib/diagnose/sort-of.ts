import type { Cause, Part } from './cause-types';
import type { Sort } from './check/likelihoods';

/** What a cause is to the checks at the bench. */
export function sortOf(part: Part, cause: Cause): Sort {
  switch (cause.mode) {
    case 'holds-line':
    case 'holds-strobe':
    case 'holds-address':
      return 'holder';
    case 'channel':
      return 'line';
    case 'whole':
      return 'shared';
    case 'short':
      return 'short';
    case 'supply':
      return 'supply';
    case 'open':
    case 'open-bit':
    case 'fitting':
      return 'contact';
    default:
      return part.kind === 'chip' ? 'chip' : 'other';
  }
}
