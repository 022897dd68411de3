import { existsSync } from 'node:fs';
import path from 'node:path';

import { Logger, Module } from '@nestjs/common';
import { ServeStaticModule, type ServeStaticModuleOptions } from '@nestjs/serve-static';
import type { Response } from 'express';

import { projectRoot } from '../config/project-root.js';

const hashedAssets = `${path.sep}assets${path.sep}`;

/** Names in assets/ change with their content; everything else must be asked for again. */
function setCaching(response: Response, file: string): void {
  response.setHeader(
    'cache-control',
    file.includes(hashedAssets) ? 'public, max-age=31536000, immutable' : 'no-cache',
  );
}

/** The built client, its index page at every address that is neither a file nor the API's. */
function clientOptions(): ServeStaticModuleOptions[] {
  const rootPath = path.join(projectRoot(), 'dist', 'client');
  if (!existsSync(path.join(rootPath, 'index.html'))) {
    new Logger('Client').warn('The client is not built; only the API is served.');
    return [];
  }
  return [
    {
      rootPath,
      exclude: ['/api', '/api/{*rest}', '/assets/{*rest}'],
      serveStaticOptions: { setHeaders: setCaching, fallthrough: true },
    },
  ];
}

@Module({ imports: [ServeStaticModule.forRootAsync({ useFactory: clientOptions })] })
export class StaticClientModule {}
