import { existsSync } from 'node:fs';
import path from 'node:path';

import { Logger } from '@nestjs/common';
import type { NestExpressApplication } from '@nestjs/platform-express';
import type { NextFunction, Request, Response } from 'express';

const hashedAssets = `${path.sep}assets${path.sep}`;

/** Names in assets/ change with their content; everything else must be asked for again. */
function setCaching(response: Response, file: string): void {
  response.setHeader(
    'cache-control',
    file.includes(hashedAssets) ? 'public, max-age=31536000, immutable' : 'no-cache',
  );
}

const isPage = ({ method, path: address }: Request): boolean =>
  (method === 'GET' || method === 'HEAD') && !/^\/api(\/|$)/.test(address);

/**
 * Serves the built client, its index page at every address that is neither a file nor the API's.
 * Files are named relative to the folder: below a folder whose name starts with a dot, absolute
 * names would be taken for hidden files and refused.
 */
export function serveClient(app: NestExpressApplication, folder: string): void {
  if (!existsSync(path.join(folder, 'index.html'))) {
    new Logger('Client').warn('The client is not built; only the API is served.');
    return;
  }
  app.useStaticAssets(folder, { index: false, redirect: false, setHeaders: setCaching });
  app.use((request: Request, response: Response, next: NextFunction) => {
    if (!isPage(request)) {
      next();
    } else if (request.path.startsWith('/assets/')) {
      // A script of an older build: the index page in its place would only confuse.
      response.status(404).type('text').send('There is nothing at this address.');
    } else {
      response.setHeader('cache-control', 'no-cache');
      response.sendFile('index.html', { root: folder, cacheControl: false }, next);
    }
  });
}
