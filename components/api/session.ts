import { queryOptions, useQuery } from '@tanstack/react-query';
import { includesRole, type Standing } from '@/shared/standing';
import { renewSession, request } from './client';
import type { MeAnswer, OwnPerson } from '@/shared/api/account';

const hintKey = 'rowcall.signed-in';

/**
 * Whether somebody signed in on this device. The cookies of a session cannot be read by the page;
 * without this a guest's every visit would ask the server who they are.
 */
function mayBeSignedIn(): boolean {
  try {
    return window.localStorage.getItem(hintKey) === 'yes';
  } catch {
    return true;
  }
}

/** Remembers on this device that there is, or is no longer, a session. */
export function rememberSignedIn(signedIn: boolean): void {
  try {
    if (signedIn) window.localStorage.setItem(hintKey, 'yes');
    else window.localStorage.removeItem(hintKey);
  } catch {
    // Closed storage: the server is asked at every visit.
  }
}

async function loadPerson(signal: AbortSignal): Promise<OwnPerson | null> {
  if (!mayBeSignedIn()) return null;
  const { person } = await request<MeAnswer>('/me', { signal });
  if (person) return person;
  // An access token that has run out makes a guest; the session behind it may still be good.
  const renewed = await renewSession();
  if (!renewed) rememberSignedIn(false);
  return renewed;
}

/** Query of the person who is signed in; null for a guest. */
export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: ({ signal }) => loadPerson(signal),
  staleTime: 5 * 60_000,
});

/** Who is at work. */
export type Session = {
  /** unknown: the first answer is on its way. unreachable: it did not come; treated as a guest until it does. */
  state: 'unknown' | 'guest' | 'signed-in' | 'unreachable';
  person: OwnPerson | null;
  standing: Standing;
  signedIn: boolean;
  mayContribute: boolean;
  mayReview: boolean;
};

/** Who is at work: a guest until the server says otherwise, and where it cannot be reached. */
export function useSession(): Session {
  const { data, isPending, isError } = useQuery(sessionQuery);
  const person = data ?? null;
  const standing = person?.role ?? 'guest';
  return {
    state: person ? 'signed-in' : isPending ? 'unknown' : isError ? 'unreachable' : 'guest',
    person,
    standing,
    signedIn: person !== null,
    mayContribute: includesRole(standing, 'contributor'),
    mayReview: includesRole(standing, 'moderator'),
  };
}
