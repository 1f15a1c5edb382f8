import cookieParser from 'cookie-parser';
import express, { type Express } from 'express';
import type { Platform } from './context';
import { caughtMail } from './http/caught-mail';
import { errorHandler, notFound } from './http/error-handler';
import { requestLog } from './http/log';
import { mountRoutes } from './http/mount';
import { openapiPage } from './http/openapi-page';
import { checkOrigin, generalLimit, securityHeaders } from './http/security';
import { webExport } from './http/web';
import { findWho } from './http/who';
import { routes } from './routes';

/** Builds the application on a platform: the API, the web export, and the caught mail in development. It does not listen. */
export const buildApp = (platform: Platform): Express => {
  const { config, logger } = platform;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.set('query parser', 'simple');
  app.use(requestLog(logger), securityHeaders(config));
  app.use('/api', generalLimit(config), checkOrigin(config), cookieParser(), findWho(platform));
  app.use('/api/v1', mountRoutes(platform, routes));
  app.use('/api/v1/docs', openapiPage());
  app.use('/api', notFound);
  if (config.mail.caughtFolder !== undefined) app.use(caughtMail(config.mail.caughtFolder));
  app.use(webExport(config.webFolder), notFound);
  app.use(errorHandler(logger));
  return app;
};
