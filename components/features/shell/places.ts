/** A place that the navigation names. */
export type Place = { href: '/' | '/boards' | '/review' | '/account' | '/sign-in'; label: string };

const lookUp: Place = { href: '/', label: 'Look up' };
const boards: Place = { href: '/boards', label: 'Boards' };
const review: Place = { href: '/review', label: 'Review' };

/** The places for a person, in order; the account stands apart at the end. */
export function placesFor({ mayReview }: { mayReview: boolean }): readonly Place[] {
  return mayReview ? [lookUp, boards, review] : [lookUp, boards];
}

/** Where a person's own things are: the account, or the way to one. */
export function accountPlace({ signedIn }: { signedIn: boolean }): Place {
  return signedIn ? { href: '/account', label: 'Account' } : { href: '/sign-in', label: 'Sign in' };
}

/** Whether a path lies at or under a place. */
export function isCurrent(place: Place, pathname: string): boolean {
  if (place.href === '/') return pathname === '/';
  return pathname === place.href || pathname.startsWith(`${place.href}/`);
}
