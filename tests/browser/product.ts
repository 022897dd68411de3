import { spawn, type ChildProcess } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import net from 'node:net';
import { fileURLToPath } from 'node:url';

import { administer, dropDatabase, testServerUrl } from '../helpers/administer.js';

const entry = fileURLToPath(new URL('../../dist/server/src/main.js', import.meta.url));

/** The built product with a database of its own, run as `npm start` runs it. */
export interface Product {
  readonly origin: string;
  /** Ends the server the hard way, as a power cut would. */
  kill(): Promise<void>;
  /** Starts the server again on the same database and address. */
  restart(): Promise<void>;
  /** Ends the server and drops the database. */
  stop(): Promise<void>;
}

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = net.createServer();
    probe.on('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => resolve(typeof address === 'object' && address ? address.port : 0));
    });
  });
}

function launch(
  port: number,
  database: string,
  env: Record<string, string>,
): Promise<ChildProcess> {
  const url = testServerUrl();
  url.pathname = `/${database}`;
  const server = spawn(process.execPath, [entry], {
    env: {
      ...process.env,
      NODE_ENV: 'production',
      HOLDFAST_DATABASE_URL: url.href,
      HOLDFAST_SESSION_SECRET: 'only-for-tests-0123456789abcdef0123456789abcdef',
      HOLDFAST_LOG_LEVEL: 'warn',
      HOLDFAST_DEMO: 'on',
      ...env,
      HOST: '127.0.0.1',
      PORT: String(port),
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  return new Promise((resolve, reject) => {
    let output = '';
    const take = (chunk: Buffer) => {
      output += chunk.toString();
      if (output.includes(`Holdfast is ready at http://127.0.0.1:${port}`)) {
        resolve(server);
      }
    };
    server.stdout?.on('data', take);
    server.stderr?.on('data', take);
    server.on('exit', (code) => reject(new Error(`The server ended with ${code}:\n${output}`)));
  });
}

function ended(server: ChildProcess, signal: NodeJS.Signals): Promise<void> {
  if (server.exitCode !== null || server.signalCode !== null) {
    return Promise.resolve();
  }
  return new Promise((resolve) => {
    server.once('exit', () => resolve());
    server.kill(signal);
  });
}

/** Starts the built product on a free port with an empty database (the demo unless told not). */
export async function startProduct(env: Record<string, string> = {}): Promise<Product> {
  const database = `holdfast_browser_${randomBytes(6).toString('hex')}`;
  await administer(`create database ${database}`);
  const port = await freePort();
  let server = await launch(port, database, env);
  return {
    origin: `http://127.0.0.1:${port}`,
    kill: () => ended(server, 'SIGKILL'),
    restart: async () => {
      server = await launch(port, database, env);
    },
    stop: async () => {
      await ended(server, 'SIGTERM');
      await dropDatabase(database);
    },
  };
}
