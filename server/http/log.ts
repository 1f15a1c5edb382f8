import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import { pino, type DestinationStream, type Logger } from 'pino';
import type { Config } from '@/server/config';

declare module 'express-serve-static-core' {
  interface Request {
    /** Named in the log, in problem documents and in X-Request-Id. */
    id: string;
  }
}

const secretKeys = ['password', 'currentPassword', 'newPassword', 'token', 'accessToken', 'refreshToken', 'secret'];

const redact = {
  paths: [
    'req.headers.cookie',
    'req.headers.authorization',
    'res.headers["set-cookie"]',
    ...secretKeys.flatMap((key) => [key, `*.${key}`, `*.*.${key}`]),
  ],
  censor: '[redacted]',
};

/** The log of the process: one JSON line an event, never with a password, a cookie or a token. */
export const createLogger = (config: Pick<Config, 'logLevel'>, stream?: DestinationStream): Logger =>
  pino({ level: config.logLevel, redact, base: undefined }, stream ?? pino.destination({ dest: 1, sync: false }));

/** An address as it may be logged: links from mail carry their token in the query. */
export const loggableUrl = (url: string): string => url.replace(/((?:^|[?&;])token=)[^&;#]*/gi, '$1[redacted]');

const requestIdPattern = /^[A-Za-z0-9._-]{8,64}$/;

/** Gives each request an id (kept from a proxy's X-Request-Id when it is a sane one) and logs its end in one line. */
export const requestLog =
  (logger: Logger): RequestHandler =>
  (req, res, next) => {
    const id = requestIdOf(req.headers['x-request-id']);
    const began = performance.now();
    req.id = id;
    res.setHeader('X-Request-Id', id);
    res.once('close', () => {
      const status = res.statusCode;
      const entry = {
        req: { id, method: req.method, url: loggableUrl(req.originalUrl) },
        res: { status },
        responseTime: Math.round(performance.now() - began),
      };
      // The error handler has logged the cause; here only the outcome is noted.
      const words = res.writableFinished ? 'request completed' : 'request aborted';
      if (status >= 500) logger.error(entry, words);
      else logger.info(entry, words);
    });
    next();
  };

const requestIdOf = (given: unknown): string =>
  typeof given === 'string' && requestIdPattern.test(given) ? given : randomUUID();
