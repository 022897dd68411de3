import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

import { Module } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { serveClient } from './static-client.js';

@Module({})
class EmptyModule {}

let folder: string;
let app: NestExpressApplication;

beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), '.holdfast-client-'));
  mkdirSync(path.join(folder, 'assets'));
  writeFileSync(path.join(folder, 'index.html'), '<title>Holdfast</title>');
  writeFileSync(path.join(folder, 'theme.js'), 'theme');
  writeFileSync(path.join(folder, 'assets', 'index-abc.js'), 'script');
  app = await NestFactory.create<NestExpressApplication>(EmptyModule, { logger: false });
  app.setGlobalPrefix('api');
  serveClient(app, folder);
  await app.init();
});
afterAll(async () => {
  await app.close();
  rmSync(folder, { recursive: true });
});

const get = (address: string) => supertest(app.getHttpServer()).get(address);

// The folder's own name starts with a dot, as a checkout's parent may.
describe('the served client', () => {
  it.each(['/', '/w/kiln-lane/lattices/7?tab=cell', '/s/some-token', '/apiary'])(
    'answers %s with the page, asked for anew each time',
    async (address) => {
      const response = await get(address).expect(200);
      expect(response.text).toContain('Holdfast');
      expect(response.headers['content-type']).toContain('text/html');
      expect(response.headers['cache-control']).toBe('no-cache');
    },
  );

  it('keeps files whose names change with their content', async () => {
    const response = await get('/assets/index-abc.js').expect(200);
    expect(response.headers['cache-control']).toContain('immutable');
    expect((await get('/theme.js').expect(200)).headers['cache-control']).toBe('no-cache');
  });

  it('has no page in place of a script that is gone', async () => {
    await get('/assets/index-old.js').expect(404, 'There is nothing at this address.');
  });

  it('leaves the API’s addresses to the API', async () => {
    for (const address of ['/api', '/api/nothing']) {
      const response = await get(address).expect(404);
      expect(response.headers['content-type']).toContain('application/json');
    }
  });

  it('gives nothing from outside its folder', async () => {
    for (const address of ['/..%2f..%2fetc%2fpasswd', '/%2e%2e/%2e%2e/etc/passwd']) {
      expect((await get(address)).text).not.toContain('root:');
    }
  });
});
