import path from 'node:path';

import type { NestExpressApplication } from '@nestjs/platform-express';
import type { Logger } from 'pino';

import { APP_CONFIG, type AppConfig } from '#server/config/environment';
import { productVersion } from '#server/config/product-version';
import { projectRoot } from '#server/config/project-root';

import { requestLogging } from './logging.js';
import { serveApiReference } from './open-api.js';
import { originCheck } from './origin-check.js';
import { securityHeaders } from './security-headers.js';
import { SESSION_MIDDLEWARE, type SessionMiddleware } from './session-middleware.js';
import { serveClient } from './static-client.js';

/** Largest body taken; the largest structure file with room to spare. */
const bodyLimit = '4mb';

/** Answers of the API belong to who asked and are not kept, unless a route says otherwise. */
const keepPrivate: SessionMiddleware = (_request, response, next) => {
  response.setHeader('cache-control', 'no-store');
  next();
};

/** Sets up what stands before the routes; the order is that of a request's way in. */
export function configureApp(app: NestExpressApplication, logger: Logger): void {
  const config = app.get<AppConfig>(APP_CONFIG);
  const isHttps = config.publicOrigins.every((origin) => origin.startsWith('https:'));
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustedProxies);
  // Only what has a version of its own carries an ETag.
  app.set('etag', false);
  app.set('query parser', 'simple');
  app.setGlobalPrefix('api');
  app.use(requestLogging(logger));
  app.use(securityHeaders(isHttps));
  serveClient(app, path.join(projectRoot(), 'dist', 'client'));
  app.use('/api', keepPrivate);
  app.use('/api', originCheck(config.publicOrigins));
  app.useBodyParser('json', { limit: bodyLimit });
  app.use('/api', app.get<SessionMiddleware>(SESSION_MIDDLEWARE));
  serveApiReference(app, productVersion());
  app.enableShutdownHooks();
}
