import type { Request, RequestHandler, Response } from 'express';
import { accessCookie, clearAccessCookie } from './cookies';
import type { Context, Platform, Who } from '@/server/context';
import { AppError } from '@/server/errors';
import { readAccessToken } from '@/server/services/access-token';

/**
 * Finds out who asks, from a bearer token or the access cookie, without the database.
 * A token that was tampered with is refused on every route. A cookie that has expired makes a guest, so that
 * the look-up goes on; a script whose bearer token has expired is told so.
 */
export const findWho =
  ({ config }: Platform): RequestHandler =>
  (req, res, next) => {
    res.locals.who = read(req, res, config);
    next();
  };

const read = (req: Request, res: Response, config: Platform['config']): Who => {
  const header = req.headers.authorization;
  const bearer = header === undefined ? undefined : (/^Bearer ([\w.~+/-]+=*)$/i.exec(header)?.[1] ?? '');
  const token = bearer ?? (req.cookies as Record<string, unknown>)[accessCookie];
  if (token === undefined) return { standing: 'guest' };
  const result = readAccessToken(config, typeof token === 'string' ? token : '');
  if (result.ok) return { ...result.claims, by: bearer === undefined ? 'cookie' : 'bearer' };
  if (bearer === undefined) {
    clearAccessCookie(res, config);
    // Signing in or out and refreshing mend a bad cookie, so they must not be stopped by it.
    if (result.reason === 'expired' || req.path.startsWith('/v1/sessions')) return { standing: 'guest' };
  }
  throw new AppError(result.reason === 'expired' ? 'token-expired' : 'token-invalid', {
    headers: { 'WWW-Authenticate': 'Bearer' },
  });
};

/** The context of a request, for its services. */
export const contextOf = (platform: Platform, req: Request, res: Response): Context => ({
  ...platform,
  who: (res.locals.who as Who | undefined) ?? { standing: 'guest' },
  requestId: req.id,
  ip: req.ip ?? '',
});
