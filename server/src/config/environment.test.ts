import { describe, expect, it } from 'vitest';

import { ConfigurationError, readConfig } from './environment.js';

const needed = {
  HOLDFAST_DATABASE_URL: 'postgres://holdfast@127.0.0.1/holdfast',
  HOLDFAST_SESSION_SECRET: 'x'.repeat(32),
};

describe('readConfig', () => {
  it('fills in what a local start needs', () => {
    const config = readConfig(needed);
    expect(config).toMatchObject({
      host: '127.0.0.1',
      port: 4310,
      isDemo: true,
      trustedProxies: 0,
      publicOrigins: ['http://127.0.0.1:4310', 'http://localhost:4310'],
    });
    expect(config.workerThreads).toBeGreaterThanOrEqual(1);
  });

  it('takes what is given', () => {
    const config = readConfig({
      ...needed,
      PORT: '8080',
      HOLDFAST_DEMO: 'off',
      HOLDFAST_PUBLIC_ORIGINS: 'https://holdfast.example/, https://lab.example:8443',
      HOLDFAST_WORKER_THREADS: '3',
    });
    expect(config).toMatchObject({
      port: 8080,
      isDemo: false,
      workerThreads: 3,
      publicOrigins: ['https://holdfast.example', 'https://lab.example:8443'],
    });
  });

  it.each([
    ['PORT', 'eighty'],
    ['HOLDFAST_DEMO', 'yes'],
    ['HOLDFAST_DATABASE_URL', 'mysql://x'],
    ['HOLDFAST_SESSION_SECRET', 'short'],
    ['HOLDFAST_PUBLIC_ORIGINS', 'holdfast.example'],
    ['HOLDFAST_LOG_LEVEL', 'loud'],
  ])('names %s when it can’t be read', (name, value) => {
    const read = () => readConfig({ ...needed, [name]: value });
    expect(read).toThrow(ConfigurationError);
    expect(read).toThrow(name);
  });

  it('names everything that is missing at once', () => {
    expect(() => readConfig({})).toThrow(/HOLDFAST_DATABASE_URL[^]*HOLDFAST_SESSION_SECRET/);
  });
});
