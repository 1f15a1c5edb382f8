import type { RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import helmet from 'helmet';
import type { Config } from '@/server/config';
import { AppError } from '@/server/errors';

/**
 * Security headers. The content policy lets the web export run: its own scripts and workers, and inline
 * styles, which react-native-web writes; nothing from another site.
 */
export const securityHeaders = (config: Config): RequestHandler =>
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'", 'data:'],
        connectSrc: ["'self'"],
        workerSrc: ["'self'", 'blob:'],
        manifestSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(config.secure ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: config.secure ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    // Both need a secure origin; on plain HTTP a browser only warns about them.
    crossOriginOpenerPolicy: config.secure ? { policy: 'same-origin' } : false,
    originAgentCluster: config.secure,
  });

/** The general limit a caller's address, per process: it keeps one caller from starving the others. */
export const generalLimit = (config: Config): RequestHandler =>
  rateLimit({
    windowMs: 60_000,
    limit: config.rateLimitPerMinute,
    keyGenerator: ({ ip }) => callerOf(ip ?? ''),
    standardHeaders: 'draft-7',
    legacyHeaders: false,
    handler: () => {
      throw new AppError('too-many-requests');
    },
  });

/** Who counts as one caller: an IPv4 address, or the network of an IPv6 one. An IPv4 one needs no reading. */
const callerOf = (ip: string): string => {
  if (ip.startsWith('::ffff:')) return ip.slice('::ffff:'.length);
  return ip.includes(':') ? ipKeyGenerator(ip) : ip;
};

const writes = new Set(['POST', 'PUT', 'PATCH', 'DELETE']);

/**
 * Refuses a write that a browser sends from another site. A browser always names the origin of a write;
 * scripts name none, and carry a bearer token instead of cookies.
 */
export const checkOrigin =
  (config: Config): RequestHandler =>
  (req, _res, next) => {
    if (!writes.has(req.method)) return next();
    const { origin } = req.headers;
    const site = req.headers['sec-fetch-site'];
    if (origin === undefined) {
      if (site === undefined || site === 'same-origin' || site === 'none') return next();
      throw new AppError('foreign-origin');
    }
    if (origin === new URL(config.publicUrl).origin || hostOf(origin) === req.host) return next();
    throw new AppError('foreign-origin');
  };

const hostOf = (origin: string): string | undefined => (URL.canParse(origin) ? new URL(origin).host : undefined);
