import { describe, expect, it } from 'vitest';

import { isTrustedOrigin, type RequestOrigin } from './origin-check.js';

const origins = ['https://holdfast.example'];
const from = (given: Partial<RequestOrigin>): RequestOrigin => ({
  method: 'POST',
  origin: undefined,
  fetchSite: undefined,
  host: '127.0.0.1:4310',
  ...given,
});

describe('isTrustedOrigin', () => {
  it.each<[string, Partial<RequestOrigin>]>([
    ['reading from anywhere', { method: 'GET', origin: 'https://evil.example' }],
    ['a page of the own host', { origin: 'http://127.0.0.1:4310', fetchSite: 'same-origin' }],
    ['a page of a public origin', { origin: 'https://holdfast.example' }],
    ['a script', {}],
    ['an address typed in', { fetchSite: 'none' }],
  ])('lets %s through', (_what, given) => {
    expect(isTrustedOrigin(from(given), origins)).toBe(true);
  });

  it.each<[string, Partial<RequestOrigin>]>([
    ['another site', { origin: 'https://evil.example' }],
    ['another port of the same machine', { origin: 'http://127.0.0.1:9999' }],
    ['a site whose name contains ours', { origin: 'https://holdfast.example.evil.example' }],
    ['our name without encryption', { origin: 'http://holdfast.example' }],
    ['a sandboxed page', { origin: 'null' }],
    ['a page that hides its origin', { fetchSite: 'cross-site' }],
    ['a sibling site that hides its origin', { fetchSite: 'same-site' }],
    ['a request without a host', { origin: 'http://127.0.0.1:4310', host: undefined }],
  ])('refuses %s', (_what, given) => {
    for (const method of ['POST', 'PUT', 'PATCH', 'DELETE']) {
      expect(isTrustedOrigin(from({ ...given, method }), origins)).toBe(false);
    }
  });
});
