import { describe, expect, it, vi } from 'vitest';
import { z } from 'zod';

import { api, apiAddress } from '#client/lib/api-client.ts';
import { ApiError, hasCode, messageOf } from '#client/lib/api-error.ts';
import { answer, fakeApi, refuse } from '#client/testing/fake-api.ts';

const schema = z.object({ name: z.string() });

async function failureOf(promise: Promise<unknown>): Promise<ApiError> {
  const error: unknown = await promise.then(
    () => null,
    (reason: unknown) => reason,
  );
  expect(error).toBeInstanceOf(ApiError);
  return error as ApiError;
}

describe('api', () => {
  it('parses the answer and sends body, If-Match and query', async () => {
    const fake = fakeApi({ 'PUT /drafts/1': answer(schema, { name: 'MgO' }) });
    const data = await api.put('/drafts/1', {
      schema,
      body: { cell: 1 },
      ifMatch: '"r1-v2"',
      query: { view: 'bare', empty: '', missing: undefined },
    });
    expect(data).toEqual({ name: 'MgO' });
    const sent = fake.last('PUT /drafts/1');
    expect(sent?.body).toEqual({ cell: 1 });
    expect(sent?.headers.get('if-match')).toBe('"r1-v2"');
    expect(sent?.headers.get('content-type')).toBe('application/json');
    expect(sent?.query).toEqual({ view: 'bare' });
  });

  it('throws the code, message, fields and request id of a failure', async () => {
    const fields = [{ code: 'cell.element', field: 'cell.sites.0.element', message: 'No Xq.' }];
    fakeApi({ 'POST /lattices': refuse('request.invalid', { fields }) });
    const error = await failureOf(api.post('/lattices', { schema, body: {} }));
    expect(error).toMatchObject({ status: 400, code: 'request.invalid', requestId: 'req-1' });
    expect(error.fields).toEqual(fields);
    expect(hasCode(error, 'request.invalid')).toBe(true);
    expect(error.isTransient).toBe(false);
  });

  it('does not pass off an answer that breaks the contract as data', async () => {
    fakeApi({ 'GET /x': () => Response.json({ name: 7 }) });
    const error = await failureOf(api.get('/x', { schema }));
    expect(error.code).toBe('answer.unexpected');
  });

  it('copes with an answer that is no JSON at all, such as a proxy’s page', async () => {
    fakeApi({ 'GET /x': () => new Response('<h1>Bad gateway</h1>', { status: 502 }) });
    const error = await failureOf(api.get('/x', { schema }));
    expect(error).toMatchObject({ status: 502, code: 'answer.unexpected' });
    expect(error.isTransient).toBe(true);
  });

  it('says that the server can’t be reached', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
    const error = await failureOf(api.get('/x', { schema }));
    expect(error).toMatchObject({ status: 0, code: 'network.unreachable' });
  });

  it('passes an abort on as it is', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new DOMException('gone', 'AbortError')));
    const signal = AbortSignal.abort();
    await expect(api.get('/x', { schema, signal })).rejects.toThrow('gone');
  });
});

describe('apiAddress', () => {
  it('leaves out what is empty and escapes what is not', () => {
    expect(apiAddress('/lattices', { search: 'a&b', page: 2, state: null, deleted: false })).toBe(
      '/api/lattices?search=a%26b&page=2&deleted=false',
    );
  });
});

describe('messageOf', () => {
  it('shows the API’s words, and never those of a bug', () => {
    expect(messageOf(new ApiError(409, 'member.already', 'A member already.'))).toBe(
      'A member already.',
    );
    expect(messageOf(new TypeError('x is undefined'))).not.toContain('undefined');
  });
});
