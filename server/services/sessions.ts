import type { Context, Who } from '@/server/context';
import type { Role } from '@/shared/roles';

/** The role that the session's person has now; undefined if the session has ended or expired. */
export const loadStanding = async (
  { db, now }: Context,
  who: Exclude<Who, { standing: 'guest' }>,
): Promise<Role | undefined> => {
  const session = await db.Session.findByPk(who.sessionId);
  if (!session || session.userId !== who.userId || session.endedAt !== null || session.expiresAt <= now())
    return undefined;
  const user = await db.User.findByPk(session.userId, { attributes: ['role'] });
  return user?.role;
};
