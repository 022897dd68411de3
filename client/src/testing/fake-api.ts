import { vi } from 'vitest';
import type { z } from 'zod';

import { problemBody, type ProblemDetails } from '#common/errors/problem';
import { errorCodes, type ErrorCode } from '#common/errors/error-codes';

interface FakeRequest {
  method: string;
  path: string;
  query: Record<string, string>;
  body: unknown;
  headers: Headers;
}

type Answer = (request: FakeRequest) => Response | Promise<Response>;

/** An answer that keeps the contract: data that does not fit the schema fails the test. */
export function answer<S extends z.ZodType>(schema: S, data: z.input<S>, status = 200): Answer {
  return () => Response.json(schema.parse(data), { status });
}

/** A failure as the server words it, with the status that belongs to the code. */
export function refuse(code: ErrorCode, details?: ProblemDetails): Answer {
  const [status, message] = errorCodes[code];
  const body = problemBody.parse({ error: { code, message, requestId: 'req-1', details } });
  return () => Response.json(body, { status });
}

export interface FakeApi {
  /** Everything that was asked, oldest first. */
  requests: FakeRequest[];
  /** Adds or replaces answers: `GET /session`. */
  on: (answers: Record<string, Answer>) => void;
  /** The last request of this kind. */
  last: (route: string) => FakeRequest | undefined;
}

function readRequest(input: RequestInfo | URL, init: RequestInit = {}): FakeRequest {
  const address = new URL(input instanceof Request ? input.url : input, 'http://holdfast.example');
  return {
    method: init.method ?? 'GET',
    path: address.pathname.replace(/^\/api/, ''),
    query: Object.fromEntries(address.searchParams),
    body: typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : undefined,
    headers: new Headers(init.headers),
  };
}

/** Puts a small API in the place of fetch until the test ends. */
export function fakeApi(answers: Record<string, Answer> = {}): FakeApi {
  const known = new Map(Object.entries(answers));
  const requests: FakeRequest[] = [];
  vi.stubGlobal('fetch', async (input: RequestInfo | URL, init?: RequestInit) => {
    const request = readRequest(input, init);
    requests.push(request);
    const reply = known.get(`${request.method} ${request.path}`) ?? refuse('route.not_found');
    return reply(request);
  });
  return {
    requests,
    on: (more) => Object.entries(more).forEach(([route, reply]) => known.set(route, reply)),
    last: (route) => requests.findLast((request) => `${request.method} ${request.path}` === route),
  };
}
