import type { z } from 'zod';

import { problemBody } from '#common/errors/problem';
import { ApiError } from '#client/lib/api-error.ts';

type QueryValue = string | number | boolean | null | undefined;

export interface RequestOptions<S extends z.ZodType> {
  /** The contract of the answer; what does not fit it is an error, not data. */
  schema: S;
  query?: Record<string, QueryValue>;
  /** Sent as JSON. */
  body?: unknown;
  /** ETag of the version that was edited. */
  ifMatch?: string;
  signal?: AbortSignal;
}

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

const unreachable = 'The server can’t be reached. Check the connection and try again.';
const unexpected = 'The server’s answer was not as expected. Load the page again.';

/** Address below /api with its query; empty and missing values are left out. */
export function apiAddress(path: string, query: Record<string, QueryValue> = {}): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value !== undefined && value !== null && value !== '') {
      search.set(name, String(value));
    }
  }
  const tail = search.toString();
  return `/api${path}${tail === '' ? '' : `?${tail}`}`;
}

function requestInit(method: Method, options: RequestOptions<z.ZodType>): RequestInit {
  const headers = new Headers({ accept: 'application/json' });
  if (options.body !== undefined) {
    headers.set('content-type', 'application/json');
  }
  if (options.ifMatch !== undefined) {
    headers.set('if-match', options.ifMatch);
  }
  return {
    method,
    headers,
    credentials: 'same-origin',
    ...(options.body === undefined ? {} : { body: JSON.stringify(options.body) }),
    ...(options.signal === undefined ? {} : { signal: options.signal }),
  };
}

async function readJson(response: Response): Promise<unknown> {
  const text = await response.text();
  if (text === '') {
    return undefined;
  }
  try {
    return JSON.parse(text) as unknown;
  } catch {
    // A proxy's HTML page, say: the caller turns undefined into a plain failure.
    return undefined;
  }
}

function failure(response: Response, body: unknown): ApiError {
  const requestId = response.headers.get('x-request-id');
  const parsed = problemBody.safeParse(body);
  if (!parsed.success) {
    const message = response.status >= 500 ? unreachable : unexpected;
    return new ApiError(response.status, 'answer.unexpected', message, {}, requestId);
  }
  const { code, message, details } = parsed.data.error;
  return new ApiError(
    response.status,
    code,
    message,
    details,
    parsed.data.error.requestId ?? requestId,
  );
}

async function send<S extends z.ZodType>(
  method: Method,
  path: string,
  options: RequestOptions<S>,
): Promise<z.output<S>> {
  let response: Response;
  try {
    response = await fetch(apiAddress(path, options.query), requestInit(method, options));
  } catch (error) {
    if (options.signal?.aborted === true) {
      throw error;
    }
    throw new ApiError(0, 'network.unreachable', unreachable);
  }
  const body = await readJson(response);
  if (!response.ok) {
    throw failure(response, body);
  }
  const parsed = options.schema.safeParse(body);
  if (!parsed.success) {
    throw new ApiError(
      response.status,
      'answer.unexpected',
      unexpected,
      {},
      response.headers.get('x-request-id'),
    );
  }
  return parsed.data;
}

const sender =
  (method: Method) =>
  <S extends z.ZodType>(path: string, options: RequestOptions<S>): Promise<z.output<S>> =>
    send(method, path, options);

/** Requests to the API. Paths are below /api; answers are parsed; failures are {@link ApiError}. */
export const api = {
  get: sender('GET'),
  post: sender('POST'),
  put: sender('PUT'),
  patch: sender('PATCH'),
  delete: sender('DELETE'),
} as const;
