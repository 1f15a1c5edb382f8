import { Router, type RequestHandler } from 'express';
import { readJson } from './body';
import { parse, type Parsed } from './parse';
import { handled, type Route } from './route';
import { contextOf } from './who';
import type { Platform } from '@/server/context';
import { AppError } from '@/server/errors';
import { requireStanding } from '@/server/policies/standing';
import { limits } from '@/shared/limits';

/**
 * Puts declared routes on a router: who may, then the body, then the schemas, then the handler.
 * A known path with another method is answered 405 with what it takes.
 */
export const mountRoutes = (platform: Platform, routes: readonly Route[]): Router => {
  const router = Router({ strict: true });
  for (const route of routes) {
    router[route.method](
      route.path,
      allow(platform, route),
      ...(route.body ? readJson(route.bodyBytes ?? limits.bodyBytes) : []),
      check(route),
      answer(platform, route),
    );
  }
  for (const [path, methods] of methodsByPath(routes)) {
    router.all(path, () => {
      throw new AppError('method-not-allowed', { headers: { Allow: methods.join(', ') } });
    });
  }
  return router;
};

const allow =
  (platform: Platform, route: Route): RequestHandler =>
  async (req, res, next) => {
    res.locals.who = await requireStanding(contextOf(platform, req, res), route.may);
    next();
  };

const check =
  (route: Route): RequestHandler =>
  (req, res, next) => {
    res.locals.parsed = parse(req, route);
    next();
  };

const answer =
  (platform: Platform, route: Route): RequestHandler =>
  async (req, res) => {
    const parsed = res.locals.parsed as Parsed;
    const reply = await route.handler({
      context: contextOf(platform, req, res),
      ...parsed,
      request: req,
      response: res,
    });
    if (reply === handled) return;
    if (platform.config.mode === 'test') route.answer.schema?.parse(reply.body);
    if (reply.headers) res.set(reply.headers);
    if (!res.get('Cache-Control'))
      res.set('Cache-Control', route.may === 'guest' && route.method === 'get' ? 'no-cache' : 'no-store');
    res.status(reply.status);
    if (reply.body === undefined) res.end();
    else res.json(reply.body);
  };

const methodsByPath = (routes: readonly Route[]): Map<string, string[]> => {
  const map = new Map<string, string[]>();
  for (const { path, method } of routes) {
    const methods = map.get(path) ?? [];
    methods.push(method.toUpperCase(), ...(method === 'get' ? ['HEAD'] : []));
    map.set(path, methods);
  }
  return map;
};
