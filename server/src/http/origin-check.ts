import type { NextFunction, Request, Response } from 'express';

import { Problem } from '#common/errors/problem';

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS']);

export interface RequestOrigin {
  readonly method: string;
  /** `Origin`, sent by browsers with every request that changes something. */
  readonly origin: string | undefined;
  /** `Sec-Fetch-Site`, which no page can set. */
  readonly fetchSite: string | undefined;
  readonly host: string | undefined;
}

/**
 * Whether a request may change something, judged by where it comes from: a page of this server
 * (its own host or a public origin), or no page at all (a script, which carries no cookie of a
 * visitor).
 */
export function isTrustedOrigin(request: RequestOrigin, publicOrigins: readonly string[]): boolean {
  const { method, origin, fetchSite, host } = request;
  if (safeMethods.has(method)) {
    return true;
  }
  if (origin !== undefined) {
    const isOwnHost =
      URL.canParse(origin) && host !== undefined && new URL(origin).host === host.toLowerCase();
    return isOwnHost || publicOrigins.includes(origin);
  }
  return fetchSite === undefined || fetchSite === 'same-origin' || fetchSite === 'none';
}

/** Refuses state-changing requests that another site has made a browser send. */
export function originCheck(publicOrigins: readonly string[]) {
  return (request: Request, _response: Response, next: NextFunction): void => {
    const from: RequestOrigin = {
      method: request.method,
      origin: request.get('origin'),
      fetchSite: request.get('sec-fetch-site'),
      host: request.get('host'),
    };
    next(isTrustedOrigin(from, publicOrigins) ? undefined : new Problem('request.origin'));
  };
}
