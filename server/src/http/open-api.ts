import type { INestApplication } from '@nestjs/common';
import { DocumentBuilder, SwaggerModule } from '@nestjs/swagger';

import { docsPath } from './security-headers.js';

/** Serves the API's reference at /api/docs and its description at /api/docs-json. */
export function serveApiReference(app: INestApplication, version: string): void {
  const description = new DocumentBuilder()
    .setTitle('Holdfast')
    .setDescription(
      'Sign in with POST /api/session; the cookie it sets opens the rest. Failures have one shape: ' +
        '{ error: { code, message, requestId, details? } }.',
    )
    .setVersion(version)
    .addCookieAuth('holdfast.session')
    .build();
  SwaggerModule.setup(docsPath, app, () => SwaggerModule.createDocument(app, description), {
    jsonDocumentUrl: `${docsPath}-json`,
    customSiteTitle: 'Holdfast API',
    swaggerOptions: { supportedSubmitMethods: ['get'] },
  });
}
