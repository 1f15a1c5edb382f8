import { presentOwnPerson } from './person';
import type { OpenSession } from '@/server/services/sessions';
import type { SessionAnswer } from '@/shared/api/account';

/** A session as its person sees it; the access token only for a script. */
export const presentSession = ({ user, access }: OpenSession, { bearer }: { bearer: boolean }): SessionAnswer => ({
  person: presentOwnPerson(user),
  accessExpiresAt: access.expiresAt.toISOString(),
  ...(bearer ? { accessToken: access.token } : {}),
});
