import { existsSync } from 'node:fs';
import { join, resolve } from 'node:path';
import compression from 'compression';
import express, { Router, type Request, type RequestHandler, type Response } from 'express';

/** Folders of the export whose files carry the hash of their content in their name. */
const hashed = /^\/(_expo\/static|assets)\//;

const year = 31_536_000;

/** Endings of the compressed twins that lie beside a file of the export, the smallest first. */
const twins = { br: '.br', gzip: '.gz' } as const;

/**
 * The web export: files as they are, or the compressed twin beside them, and index.html for every other path,
 * because the application routes by itself. Hashed files are kept for good; all others are asked for anew.
 */
export const webExport = (folder: string): Router => {
  const root = resolve(folder);
  const router = Router();
  router.use(compression(), compressed(root));
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

/** Answers with a compressed twin of the file, made when the export was built, if the browser takes it. */
const compressed =
  (root: string): RequestHandler =>
  (req, res, next) => {
    const path = plainPath(req);
    if (path === undefined || !sendTwin(req, res, { root, path })) next();
  };

/** Sends the twin that the browser likes best; false where there is none. */
const sendTwin = (req: Request, res: Response, { root, path }: { root: string; path: string }): boolean => {
  const encoding = encodingFor(req);
  if (encoding === undefined || !existsSync(join(root, `${path}${twins[encoding]}`))) return false;
  setCache(res);
  res
    .set('Content-Encoding', encoding)
    .vary('Accept-Encoding')
    .type(path.slice(path.lastIndexOf('/') + 1));
  res.sendFile(`${path}${twins[encoding]}`, { root, cacheControl: false });
  return true;
};

const encodingFor = (req: Request): keyof typeof twins | undefined => {
  if ((req.method !== 'GET' && req.method !== 'HEAD') || req.headers.range) return undefined;
  // Without the header anything may be sent; a script that says nothing wants the file as it is.
  if (!req.headers['accept-encoding']) return undefined;
  // One by one: asked for both, Express would take the one that the browser happens to name first.
  return (['br', 'gzip'] as const).find((encoding) => req.acceptsEncodings(encoding) === encoding);
};

/** The path of a request, if it may name a file of the export. */
const plainPath = (req: Request): string | undefined =>
  /^(\/[\w@().\-~[\]+]+)+$/.test(req.path) && !req.path.includes('/.') ? req.path : undefined;

/** index.html for a path of the application; a missing hashed file is missing, not a page. */
const pageOf =
  (root: string): RequestHandler =>
  (req, res, next) => {
    if (hashed.test(req.path)) return next();
    if (sendTwin(req, res, { root, path: '/index.html' })) return;
    res.set('Cache-Control', 'no-cache').vary('Accept-Encoding');
    res.sendFile('index.html', { root, cacheControl: false }, (error) => {
      if (error) next(res.headersSent ? error : undefined);
    });
  };
