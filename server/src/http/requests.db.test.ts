import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { problemBody } from '#common/errors/problem';
import { signIn, startTestApp, type TestApp } from '#tests/helpers/app';

let test: TestApp;
beforeAll(async () => {
  test = await startTestApp({ env: { HOLDFAST_PUBLIC_ORIGINS: 'https://holdfast.example' } });
});
afterAll(async () => {
  await test.close();
  delete process.env['HOLDFAST_PUBLIC_ORIGINS'];
});

const credentials = { email: 'nobody@kiln.example', password: 'something' };

interface Answer {
  status: number;
  body: unknown;
  headers: Record<string, string>;
}

/** The failure of an answer, which must have the one shape. */
const failure = (response: Answer) => problemBody.parse(response.body).error;

describe('a request that changes something', () => {
  it.each(['https://evil.example', 'null', 'http://127.0.0.1:1'])(
    'is refused from %s, signed in or not, and changes nothing',
    async (origin) => {
      const { agent, workspace } = await signIn(test, 'owner');
      const path = `/api/workspaces/${workspace.slug}`;
      const response = await agent.patch(path).set('origin', origin).send({ name: 'Taken' });
      expect([response.status, failure(response).code]).toEqual([403, 'request.origin']);
      expect((await agent.get(path)).body.name).toBe(workspace.name);
    },
  );

  it('is taken from a page of the product itself', async () => {
    const { agent, workspace } = await signIn(test, 'owner');
    for (const origin of ['https://holdfast.example', 'http://lab.example:8080']) {
      await agent
        .patch(`/api/workspaces/${workspace.slug}`)
        .set('host', 'lab.example:8080')
        .set('origin', origin)
        .send({ name: 'Ours' })
        .expect(200);
    }
  });

  it('is not taken as a form, which any site may send', async () => {
    const response = await test.browser().post('/api/session').type('form').send(credentials);
    expect([response.status, failure(response).code]).toEqual([400, 'request.invalid']);
  });
});

describe('a request that can’t be understood', () => {
  it('names every field at fault', async () => {
    const response = await test.browser().post('/api/session').send({ email: 'x' });
    const { code, details } = failure(response);
    expect([response.status, code]).toEqual([400, 'request.invalid']);
    expect(details?.fields?.map(({ field }) => field)).toEqual(['email', 'password']);
  });

  it.each(['{', '[1,', 'null', '"text"', '[]', '7'])('is 400 with body %s', async (body) => {
    const response = await test
      .browser()
      .post('/api/session')
      .set('content-type', 'application/json')
      .send(body);
    expect([response.status, failure(response).code]).toEqual([400, 'request.invalid']);
  });

  it('is 413 when it is larger than the server takes', async () => {
    const response = await test
      .browser()
      .post('/api/session')
      .send({ ...credentials, password: 'x'.repeat(5_000_000) });
    expect([response.status, failure(response).code]).toEqual([413, 'request.too_large']);
  });

  it('is 404 at an address that does not exist, and 400 at a broken one', async () => {
    for (const path of ['/api/nothing', '/api', '/api/session/more']) {
      const response = await test.browser().get(path);
      expect([path, response.status, failure(response).code]).toEqual([
        path,
        404,
        'route.not_found',
      ]);
    }
    const broken = await test.browser().get('/api/invitations/%E0%A4%A');
    expect([broken.status, failure(broken).code]).toEqual([400, 'request.invalid']);
  });

  it('can’t reach the prototype of an object', async () => {
    const response = await test
      .browser()
      .post('/api/session')
      .set('content-type', 'application/json')
      .send('{"__proto__":{"email":"a@b.example","password":"x"}}');
    expect(response.status).toBe(400);
  });

  it('leaves the server answering', async () => {
    await test.browser().get('/api/session').expect(200);
  });
});

describe('every answer', () => {
  it('carries a request id, the same as in the failure’s body', async () => {
    const response = await test.browser().get('/api/nothing');
    expect(response.headers['x-request-id']).toMatch(/^[\w-]{8,64}$/);
    expect(failure(response).requestId).toBe(response.headers['x-request-id']);
  });

  it('keeps a request id that was sent, unless it is no id', async () => {
    const kept = await test.browser().get('/api/session').set('x-request-id', 'script-run-0007');
    expect(kept.headers['x-request-id']).toBe('script-run-0007');
    const other = await test
      .browser()
      .get('/api/session')
      .set('x-request-id', '<b>' + 'x'.repeat(90));
    expect(other.headers['x-request-id']).toMatch(/^[\w-]{36}$/);
  });

  it('keeps pages and data to themselves (ASVS 3.4)', async () => {
    const { headers } = await test.browser().get('/api/session');
    expect(headers['content-security-policy']).toContain("default-src 'self'");
    expect(headers['content-security-policy']).toContain("frame-ancestors 'none'");
    expect(headers['content-security-policy']).toContain("object-src 'none'");
    expect(headers['content-security-policy']).not.toContain('unsafe');
    expect(headers['strict-transport-security']).toContain('max-age=');
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['referrer-policy']).toBe('no-referrer');
    expect(headers['cache-control']).toBe('no-store');
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['access-control-allow-origin']).toBeUndefined();
  });
});

describe('the reference of the API', () => {
  it('describes every route with the contracts of bodies, answers and failures', async () => {
    const { body } = await test.browser().get('/api/docs-json').expect(200);
    expect(Object.keys(body.paths).length).toBeGreaterThan(15);
    const signInRoute = body.paths['/api/session'].post;
    const sent = signInRoute.requestBody.content['application/json'].schema;
    expect(sent.properties).toHaveProperty('password');
    const answered = signInRoute.responses['200'].content['application/json'].schema;
    expect(answered.properties).toHaveProperty('needsSetup');
    expect(signInRoute.responses).toHaveProperty('default');
  });

  it('is a page that loads only from this server', async () => {
    const { text, headers } = await test.browser().get('/api/docs').expect(200);
    expect(text).not.toMatch(/(src|href)="(https?:)?\/\//);
    expect(text).not.toMatch(/<script(?![^>]*\bsrc=)[^>]*>\s*\S/);
    expect(headers['content-security-policy']).toContain("script-src 'self';");
  });
});

// Last in the file: it uses up this address's share of the minute.
describe('a flood of requests from one address', () => {
  it('is refused for a while, and says for how long; other routes go on', async () => {
    const statuses = new Set<number>();
    let refused = await test.browser().post('/api/setup').send({});
    for (let index = 0; index < 130 && refused.status !== 429; index += 1) {
      statuses.add(refused.status);
      refused = await test.browser().post('/api/setup').send({});
    }
    expect([...statuses]).toEqual([400]);
    expect([refused.status, failure(refused).code]).toEqual([429, 'request.too_many']);
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
    await test.browser().get('/api/session').expect(200);
  });
});
