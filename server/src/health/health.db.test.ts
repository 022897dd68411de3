import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { health } from '#common/schemas/health';
import { productVersion } from '#server/config/product-version';
import { DATABASE_POOL, type DatabasePool } from '#server/database/database';
import { startTestApp, type TestApp } from '#tests/helpers/app';

import { WORKER_POOL_STATUS, type WorkerPoolStatus } from './worker-pool-status.js';

let test: TestApp;
beforeAll(async () => {
  test = await startTestApp();
});
afterAll(() => test.close());

describe('the health of the server', () => {
  it('is told to anyone: database, threads, version', async () => {
    const answer = health.parse((await test.browser().get('/api/health').expect(200)).body);
    expect(answer).toMatchObject({
      status: 'ok',
      version: productVersion(),
      database: { ok: true },
      workers: { ok: true, threads: 1 },
    });
    expect(answer.database.latencyMs).toBeGreaterThan(0);
  });

  it('is degraded while the threads are not well, and still 200', async () => {
    const pool = test.app.get<WorkerPoolStatus>(WORKER_POOL_STATUS, { strict: false });
    const status = pool.status.bind(pool);
    pool.status = () => ({ ok: false, threads: 0, queued: 7 });
    try {
      const answer = health.parse((await test.browser().get('/api/health').expect(200)).body);
      expect(answer).toMatchObject({ status: 'degraded', workers: { ok: false, queued: 7 } });
    } finally {
      pool.status = status;
    }
  });

  it('is 503 while the database does not answer, and says nothing about why', async () => {
    const pool = test.app.get<DatabasePool>(DATABASE_POOL, { strict: false });
    const query = pool.query.bind(pool);
    pool.query = () => Promise.reject(new Error('no route to 10.0.0.7'));
    try {
      const response = await test.browser().get('/api/health').expect(503);
      expect(health.parse(response.body)).toMatchObject({
        status: 'degraded',
        database: { ok: false, latencyMs: null },
      });
      expect(JSON.stringify(response.body)).not.toContain('10.0.0.7');
    } finally {
      pool.query = query;
    }
  });
});
