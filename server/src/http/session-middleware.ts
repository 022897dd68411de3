import type { NextFunction, Request, Response } from 'express';

/** Token of what reads the session cookie; the auth module provides it. */
export const SESSION_MIDDLEWARE = Symbol('SESSION_MIDDLEWARE');

export type SessionMiddleware = (request: Request, response: Response, next: NextFunction) => void;
