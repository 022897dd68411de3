import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('..', import.meta.url));
const conditions = ['holdfast'];

/** Shared by every ring: resolve `#common/*` and `#server/*` to their TypeScript sources. */
const base = {
  root,
  resolve: { conditions: ['holdfast', 'module', 'browser', 'development|production'] },
  ssr: { resolve: { conditions: [...conditions, 'node', 'module'] } },
};

export default defineConfig({
  root,
  test: {
    projects: [
      {
        ...base,
        test: {
          name: 'unit',
          environment: 'node',
          include: ['{common,server,tests}/**/*.test.ts'],
          exclude: ['**/*.db.test.ts', 'tests/e2e/**', 'tests/browser/**', 'node_modules/**'],
        },
      },
      {
        ...base,
        test: {
          name: 'client',
          environment: 'jsdom',
          include: ['client/**/*.test.{ts,tsx}'],
          setupFiles: ['tests/helpers/client-setup.ts'],
        },
      },
      {
        ...base,
        test: {
          name: 'db',
          environment: 'node',
          include: ['{server,tests}/**/*.db.test.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
          fileParallelism: false,
        },
      },
      {
        ...base,
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.test.ts'],
          testTimeout: 60_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
      {
        ...base,
        test: {
          name: 'browser',
          environment: 'node',
          include: ['tests/browser/**/*.test.ts'],
          testTimeout: 180_000,
          hookTimeout: 180_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
