import session from 'express-session';

import type { AppConfig } from '#server/config/environment';
import type { SessionMiddleware } from '#server/http/session-middleware';

import { sessionCookieName, sessionIdleMs } from './session-limits.js';
import type { HashedSessionStore } from './session-store.js';

/**
 * Reads the session cookie of each request. A session is made by signing in only; each request
 * pushes its idle end on. The cookie is `Secure` whenever the request came over https.
 */
export const createSessionMiddleware = (
  config: AppConfig,
  store: HashedSessionStore,
): SessionMiddleware =>
  session({
    name: sessionCookieName,
    secret: config.sessionSecret,
    store,
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', path: '/', maxAge: sessionIdleMs },
  });
