/** A place that the navigation names. */
export type Place = { href: '/' | '/boards' | '/contribute' | '/review' | '/account' | '/sign-in'; label: string };

const lookUp: Place = { href: '/', label: 'Look up' };
const boards: Place = { href: '/boards', label: 'Boards' };
const contribute: Place = { href: '/contribute', label: 'Contribute' };
const review: Place = { href: '/review', label: 'Review' };

/** The places for a person, in order; the account stands apart at the end. */
export function placesFor({
  mayContribute,
  mayReview,
}: {
  mayContribute: boolean;
  mayReview: boolean;
}): readonly Place[] {
  return [lookUp, boards, ...(mayContribute ? [contribute] : []), ...(mayReview ? [review] : [])];
}

/** Where a person's own things are: the account, or the way to one. */
export function accountPlace({ signedIn }: { signedIn: boolean }): Place {
  return signedIn ? { href: '/account', label: 'Account' } : { href: '/sign-in', label: 'Sign in' };
}

/** Whether a path lies at or under a place. The workspace of a board is part of the look-up. */
export function isCurrent(place: Place, pathname: string): boolean {
  const lookingUp = pathname === '/' || /^\/boards\/[^/]+\/diagnose$/.test(pathname);
  if (place.href === '/' || lookingUp) return place.href === '/' && lookingUp;
  return pathname === place.href || pathname.startsWith(`${place.href}/`);
}
