import { sql } from 'drizzle-orm';
import { check, index, integer, pgTable, text } from 'drizzle-orm/pg-core';

import { moment } from '#server/database/columns';

/** Failed sign-ins in a row, by account, address and known browser. */
export const signInAttempts = pgTable(
  'sign_in_attempts',
  {
    /** Kind and SHA-256 of what is counted: `account:…`, `address:…`, `browser:…`. */
    key: text('key').primaryKey(),
    failures: integer('failures').notNull(),
    lastAt: moment('last_at').notNull(),
    blockedUntil: moment('blocked_until').notNull(),
  },
  (table) => [
    index('sign_in_attempts_last_at').on(table.lastAt),
    check('sign_in_attempts_failures_count', sql`${table.failures} >= 0`),
    check(
      'sign_in_attempts_key_form',
      sql`${table.key} ~ '^(account|address|browser):[0-9a-f]{64}$'`,
    ),
  ],
);
