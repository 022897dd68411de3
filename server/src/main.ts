import 'reflect-metadata';

import { Logger } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';

import { AppModule } from './app.module.js';
import { ConfigurationError, readConfig } from './config/environment.js';
import { configureApp } from './http/configure-app.js';
import { createLogger, PinoLoggerService } from './http/logging.js';

async function serve(): Promise<void> {
  const config = readConfig(process.env);
  const logger = createLogger(config);
  for (const event of ['unhandledRejection', 'uncaughtException'] as const) {
    // The state after either is unknown: say what happened and let the next start be clean.
    process.on(event, (error: unknown) => {
      logger.fatal({ err: error, event });
      logger.flush();
      process.exit(1);
    });
  }
  Logger.overrideLogger(new PinoLoggerService(logger));
  const app = await NestFactory.create<NestExpressApplication>(AppModule, {
    logger: new PinoLoggerService(logger),
    bodyParser: false,
    abortOnError: false,
    forceCloseConnections: true,
  });
  configureApp(app, logger);
  await app.listen(config.port, config.host);
  console.log(`Holdfast is ready at http://${config.host}:${config.port}`);
}

/** Why the server could not start, in words its keeper can act on. */
function describeFailure(error: unknown): unknown {
  if (error instanceof ConfigurationError) {
    return error.message;
  }
  const { code, address, port } = (error ?? {}) as NodeJS.ErrnoException & {
    address?: string;
    port?: number;
  };
  switch (code) {
    case 'EADDRINUSE':
      return `Port ${port} of ${address} is taken. Set PORT to another one.`;
    case 'EACCES':
      return `Port ${port} may not be opened by this user. Set PORT to one above 1024.`;
    case 'ECONNREFUSED':
      return `The database does not answer at ${address}:${port}. See HOLDFAST_DATABASE_URL.`;
    default:
      return error;
  }
}

serve().catch((error: unknown) => {
  console.error(describeFailure(error));
  process.exit(1);
});
