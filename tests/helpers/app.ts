import 'reflect-metadata';

import type { NestExpressApplication } from '@nestjs/platform-express';
import { Test } from '@nestjs/testing';
import supertest from 'supertest';

import type { Role } from '#common/schemas/auth';
import { AppModule } from '#server/app.module';
import { Clock } from '#server/config/clock';
import type { Database } from '#server/database/database';
import { configureApp } from '#server/http/configure-app';
import { createLogger, PinoLoggerService } from '#server/http/logging';
import type { UserRow } from '#server/users/user.table';
import type { WorkspaceRow } from '#server/workspaces/workspace.table';

import { TestClock } from './clock.js';
import { createEmptyDatabase } from './database.js';
import { makeMember, makeWorkspace, testPassword } from './factories.js';

/** A client that keeps cookies, like a browser. */
export type Agent = ReturnType<typeof supertest.agent>;

/** The whole product on a database of its own, listening on a free port. */
export interface TestApp {
  readonly app: NestExpressApplication;
  readonly db: Database;
  readonly clock: TestClock;
  /** A browser nobody is signed in with. */
  browser(): Agent;
  close(): Promise<void>;
}

export interface TestAppOptions {
  /** Whether the demo workspace is made; not unless asked. */
  demo?: boolean;
  env?: Record<string, string>;
}

/** Starts the product as main.ts does. */
export async function startTestApp(options: TestAppOptions = {}): Promise<TestApp> {
  const database = await createEmptyDatabase();
  Object.assign(process.env, {
    HOLDFAST_DATABASE_URL: database.url,
    HOLDFAST_SESSION_SECRET: 'only-for-tests-0123456789abcdef0123456789abcdef',
    HOLDFAST_DEMO: options.demo === true ? 'on' : 'off',
    HOLDFAST_LOG_LEVEL: 'fatal',
    HOLDFAST_WORKER_THREADS: '1',
    ...options.env,
  });
  const clock = new TestClock();
  const logger = createLogger({ logLevel: 'fatal' });
  const testing = await Test.createTestingModule({ imports: [AppModule] })
    .overrideProvider(Clock)
    .useValue(clock)
    .setLogger(new PinoLoggerService(logger))
    .compile();
  const app = testing.createNestApplication<NestExpressApplication>({
    bodyParser: false,
    forceCloseConnections: true,
  });
  configureApp(app, logger);
  await app.listen(0, '127.0.0.1');
  return {
    app,
    db: database.db,
    clock,
    browser: () => supertest.agent(app.getHttpServer()),
    close: async () => {
      await app.close();
      await database.drop();
    },
  };
}

/** Signs a person in; fails loudly when the server does not. */
export async function signInAs(
  test: TestApp,
  email: string,
  password = testPassword,
): Promise<Agent> {
  const agent = test.browser();
  await agent.post('/api/session').send({ email, password }).expect(200);
  return agent;
}

export interface SignedIn {
  readonly agent: Agent;
  readonly user: UserRow;
  readonly workspace: WorkspaceRow;
}

/** A new person with this role, signed in; in a new workspace unless one is given. */
export async function signIn(
  test: TestApp,
  role: Role,
  workspace?: WorkspaceRow,
): Promise<SignedIn> {
  const room = workspace ?? (await makeWorkspace(test.db));
  const user = await makeMember(test.db, room, role);
  return { agent: await signInAs(test, user.email), user, workspace: room };
}
