import type { CookieOptions, Response } from 'express';
import type { Config } from '@/server/config';

export const accessCookie = 'rowcall_access';
export const refreshCookie = 'rowcall_refresh';

const refreshPath = '/api/v1/sessions';

const options = (config: Config, path: string): CookieOptions => ({
  httpOnly: true,
  sameSite: 'strict',
  secure: config.secure,
  path,
});

/** Sets both cookies of a session; neither can be read by a script of the page. */
export const setSessionCookies = (
  res: Response,
  config: Config,
  tokens: { access: string; refresh: string | undefined },
): void => {
  res.cookie(accessCookie, tokens.access, { ...options(config, '/api'), maxAge: config.tokens.accessMinutes * 60_000 });
  if (tokens.refresh === undefined) return;
  res.cookie(refreshCookie, tokens.refresh, {
    ...options(config, refreshPath),
    maxAge: config.tokens.sessionDays * 86_400_000,
  });
};

/** Takes both cookies away. */
export const clearSessionCookies = (res: Response, config: Config): void => {
  clearAccessCookie(res, config);
  res.clearCookie(refreshCookie, options(config, refreshPath));
};

/** Takes the access cookie away, for one that is no longer any good. */
export const clearAccessCookie = (res: Response, config: Config): void => {
  res.clearCookie(accessCookie, options(config, '/api'));
};
