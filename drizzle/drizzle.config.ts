import { defineConfig } from 'drizzle-kit';

export default defineConfig({
  dialect: 'postgresql',
  schema: './server/src/**/*.table.ts',
  out: './drizzle/migrations',
  strict: true,
});
