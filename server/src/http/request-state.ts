import type { Request } from 'express';

import type { VisitorContext } from './request-context.js';

const contexts = new WeakMap<Request, VisitorContext>();

/** Keeps the context that the access guard has made for this request. */
export function setContext(request: Request, context: VisitorContext): void {
  contexts.set(request, context);
}

/** The context of a request that has passed the access guard. */
export function contextOf(request: Request): VisitorContext {
  const context = contexts.get(request);
  if (context === undefined) {
    throw new Error('This request has not passed the access guard.');
  }
  return context;
}

/** The request's id, as `x-request-id` sends it. */
export function requestIdOf(request: Request): string {
  const { id } = request as Request & { id?: unknown };
  return typeof id === 'string' ? id : '';
}
