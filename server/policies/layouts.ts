import { requirePerson } from './standing';
import type { Context, Who } from '@/server/context';
import { AppError } from '@/server/errors';
import type { LayoutVersion } from '@/server/models/layout-version';
import { loadStanding } from '@/server/services/sessions';
import { includesRole } from '@/shared/roles';

type Person = Exclude<Who, { standing: 'guest' }>;

/**
 * Whoever asks, with the role of this moment: on a route for guests the token's role may be out of date. Somebody
 * whose session has ended is a guest there.
 */
export const presentWho = async (context: Context): Promise<Who> => {
  const { who } = context;
  if (who.standing === 'guest') return who;
  const standing = await loadStanding(context, who);
  return standing === undefined ? { standing: 'guest' } : { ...who, standing };
};

/** Throws unless whoever asks may send layouts. */
export const maySendLayouts = (context: Context): Person => {
  const person = requirePerson(context);
  if (!includesRole(person.standing, 'contributor')) throw new AppError('role-required');
  return person;
};

/** Everybody sees what was published; the author his own versions, a moderator all. */
export const seesVersion = (who: Who, { state, authorId }: Pick<LayoutVersion, 'state' | 'authorId'>): boolean =>
  state === 'published' ||
  state === 'retired' ||
  includesRole(who.standing, 'moderator') ||
  (who.standing !== 'guest' && authorId === who.userId);

/** Throws unless whoever asks wrote the version and nobody has decided on it for good. */
export const mayChangeVersion = (context: Context, { authorId, state }: LayoutVersion): void => {
  const person = maySendLayouts(context);
  if (authorId !== person.userId)
    throw new AppError('role-required', { message: 'Only its author changes a version.' });
  if (state !== 'returned' && state !== 'submitted') {
    throw new AppError('conflict', { message: `A ${state} version is not changed; send a new one.` });
  }
};

/** Throws unless whoever asks is a moderator. */
export const mayReview = (context: Context): Person => {
  const person = requirePerson(context);
  if (!includesRole(person.standing, 'moderator')) throw new AppError('role-required');
  return person;
};

/** Throws unless whoever asks may decide on this version: a moderator, and never its author, whatever his role. */
export const mayDecide = (context: Context, { authorId }: LayoutVersion): Person => {
  const person = mayReview(context);
  if (authorId === person.userId) throw new AppError('own-version');
  return person;
};
