import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import { pino, type DestinationStream, type Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import type { Config } from '@/server/config';

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

/** Gives each request an id (kept from a proxy's X-Request-Id when it is a sane one) and logs its end. */
export const requestLog = (logger: Logger): RequestHandler =>
  pinoHttp({
    logger,
    genReqId: (req, res) => {
      const given = req.headers['x-request-id'];
      const id = typeof given === 'string' && requestIdPattern.test(given) ? given : randomUUID();
      res.setHeader('X-Request-Id', id);
      return id;
    },
    serializers: {
      req: (req: { id: string; method: string; url: string }) => ({
        id: req.id,
        method: req.method,
        url: loggableUrl(req.url),
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
    },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? 'error' : 'info'),
    // The error handler has logged the cause; here only the outcome is noted.
    customErrorObject: (_req, _res, _error, value: object) => ({ ...value, err: undefined }),
  });
