import type { Context, Who } from '@/server/context';
import { AppError } from '@/server/errors';
import { loadStanding } from '@/server/services/sessions';
import { includesRole, type Standing } from '@/shared/roles';

/**
 * Throws unless whoever asks has at least the standing `needs`. For anything beyond a guest's the database is
 * asked, so that a session that was ended and a role that was taken away count at once. Returns who asks, with
 * the standing of this moment.
 */
export const requireStanding = async (context: Context, needs: Standing): Promise<Who> => {
  const { who } = context;
  if (needs === 'guest') return who;
  if (who.standing === 'guest') throw new AppError('sign-in-required', { headers: { 'WWW-Authenticate': 'Bearer' } });
  const standing = await loadStanding(context, who);
  if (standing === undefined) throw new AppError('session-ended');
  if (!includesRole(standing, needs)) throw new AppError('role-required', { message: `This needs the role ${needs}.` });
  return { ...who, standing };
};

/** Whoever asks, as a person with an account; throws `sign-in-required` for a guest. */
export const requirePerson = ({ who }: Context): Exclude<Who, { standing: 'guest' }> => {
  if (who.standing === 'guest') throw new AppError('sign-in-required');
  return who;
};
