import { buildUser } from '../../factories/build-user';
import type { Platform } from '@/server/context';
import type { User } from '@/server/models/user';
import { signAccessToken } from '@/server/services/access-token';
import type { Standing } from '@/shared/roles';

/** The Authorization header of a new person of a standing with an open session; none for a guest. */
export const authorization = async (platform: Platform, standing: Standing): Promise<Record<string, string>> => {
  if (standing === 'guest') return {};
  return authorizationOf(platform, await buildUser(platform.db, { role: standing }));
};

/** The Authorization header of a person, with a new session. */
export const authorizationOf = async (platform: Platform, user: User): Promise<Record<string, string>> => {
  const { db, config, now } = platform;
  const expiresAt = new Date(now().getTime() + 86_400_000);
  const session = await db.Session.create({ userId: user.id, expiresAt, endedAt: null, endedBy: null });
  const claims = { userId: user.id, sessionId: session.id, standing: user.role };
  return { Authorization: `Bearer ${signAccessToken(config, claims, now()).token}` };
};
