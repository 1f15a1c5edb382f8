import { existsSync } from 'node:fs';
import { join, resolve } from 'node:path';
import compression from 'compression';
import express, { Router, type Request, type RequestHandler, type Response } from 'express';

/** Folders of the export whose files carry the hash of their content in their name. */
const hashed = /^\/(_expo\/static|assets)\//;

const year = 31_536_000;

/**
 * The web export: files as they are, Brotli where a `.br` lies beside them, and index.html for every other path,
 * because the application routes by itself. Hashed files are kept for good; all others are asked for anew.
 */
export const webExport = (folder: string): Router => {
  const root = resolve(folder);
  const router = Router();
  router.use(compression(), brotli(root));
  router.use(express.static(root, { index: false, redirect: false, cacheControl: false, setHeaders: setCache }));
  router.get('/{*path}', pageOf(root));
  return router;
};

const cacheFor = (path: string): string => (hashed.test(path) ? `public, max-age=${year}, immutable` : 'no-cache');

const setCache = (res: Response): void => {
  res.setHeader('Cache-Control', cacheFor(res.req.originalUrl));
  // A service worker is to rule the whole site, wherever its file lies.
  if (/\/(sw|service-worker)\.js/.test(res.req.originalUrl)) res.setHeader('Service-Worker-Allowed', '/');
};

/** Answers with the file's Brotli twin, made when the export was built, if the browser takes it. */
const brotli =
  (root: string): RequestHandler =>
  (req, res, next) => {
    const path = plainPath(req);
    if (path === undefined || !takesBrotli(req) || !existsSync(join(root, `${path}.br`))) return next();
    sendBrotli(res, { root, path });
  };

const sendBrotli = (res: Response, { root, path }: { root: string; path: string }): void => {
  setCache(res);
  res
    .set('Content-Encoding', 'br')
    .vary('Accept-Encoding')
    .type(path.slice(path.lastIndexOf('/') + 1));
  res.sendFile(`${path}.br`, { root, cacheControl: false });
};

const takesBrotli = (req: Request): boolean =>
  (req.method === 'GET' || req.method === 'HEAD') && req.acceptsEncodings('br') === 'br' && !req.headers.range;

/** The path of a request, if it may name a file of the export. */
const plainPath = (req: Request): string | undefined =>
  /^(\/[\w@().\-~[\]+]+)+$/.test(req.path) && !req.path.includes('/.') ? req.path : undefined;

/** index.html for a path of the application; a missing hashed file is missing, not a page. */
const pageOf =
  (root: string): RequestHandler =>
  (req, res, next) => {
    if (hashed.test(req.path)) return next();
    res.set('Cache-Control', 'no-cache').vary('Accept-Encoding');
    if (takesBrotli(req) && existsSync(join(root, 'index.html.br')))
      return sendBrotli(res, { root, path: '/index.html' });
    res.sendFile('index.html', { root, cacheControl: false }, (error) => {
      if (error) next(res.headersSent ? error : undefined);
    });
  };
