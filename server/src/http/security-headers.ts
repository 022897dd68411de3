import type { NextFunction, Request, Response } from 'express';
import helmet from 'helmet';

type Handler = (request: Request, response: Response, next: NextFunction) => void;

function headers(style: string[], isHttps: boolean): Handler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: style,
        // Blobs and data: pictures that the stage exports, and the previews of the docs page.
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'", 'blob:'],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(isHttps ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    crossOriginEmbedderPolicy: false,
    strictTransportSecurity: isHttps,
    referrerPolicy: { policy: 'no-referrer' },
    xFrameOptions: { action: 'deny' },
  });
}

/** Where the API's reference page lives. */
export const docsPath = '/api/docs';

/**
 * Headers that keep pages to themselves: everything comes from this server, nothing inline. The
 * API's reference page alone carries an inline style sheet.
 */
export function securityHeaders(isHttps: boolean): Handler {
  const strict = headers(["'self'"], isHttps);
  const docs = headers(["'self'", "'unsafe-inline'"], isHttps);
  return (request, response, next) =>
    (request.path.startsWith(docsPath) ? docs : strict)(request, response, next);
}
