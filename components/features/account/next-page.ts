import type { Href } from 'expo-router';

/**
 * Where to go after signing in: the page that was asked for, if it is one of ours, else the look-up.
 * Anything that could lead to another site is left out.
 */
export function nextPage(asked: string | string[] | undefined): Href {
  const path = Array.isArray(asked) ? asked[0] : asked;
  const own = path !== undefined && /^\/(?![/\\])/.test(path) && !path.startsWith('/sign-');
  return (own ? path : '/') as Href;
}
