import cookieParser from 'cookie-parser';
import express, { type Express } from 'express';
import type { Platform } from './context';
import { errorHandler, notFound } from './http/error-handler';
import { requestLog } from './http/log';
import { mountRoutes } from './http/mount';
import { checkOrigin, generalLimit, securityHeaders } from './http/security';
import { findWho } from './http/who';
import { routes } from './routes';

/** Builds the application on a platform; it does not listen. */
export const buildApp = (platform: Platform): Express => {
  const { config, logger } = platform;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.set('query parser', 'simple');
  app.use(requestLog(logger), securityHeaders(config));
  app.use('/api', generalLimit(config), checkOrigin(config), cookieParser(), findWho(platform));
  app.use('/api/v1', mountRoutes(platform, routes));
  app.use('/api', notFound);
  app.use(errorHandler(logger));
  return app;
};
