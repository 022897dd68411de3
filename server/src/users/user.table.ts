import { sql } from 'drizzle-orm';
import { check, pgTable, text, uniqueIndex } from 'drizzle-orm/pg-core';

import { createdAt, idColumn, moment } from '#server/database/columns';

export const users = pgTable(
  'users',
  {
    id: idColumn(),
    name: text('name').notNull(),
    email: text('email').notNull(),
    /** argon2id, in the PHC string format. */
    passwordHash: text('password_hash').notNull(),
    passwordChangedAt: moment('password_changed_at').notNull().defaultNow(),
    createdAt: createdAt(),
  },
  (table) => [
    uniqueIndex('users_email').on(sql`lower(${table.email})`),
    check('users_name_length', sql`char_length(btrim(${table.name})) between 1 and 80`),
    check(
      'users_email_form',
      sql`char_length(${table.email}) between 3 and 254 and ${table.email} like '%_@_%'`,
    ),
    check('users_password_hash_form', sql`${table.passwordHash} like '$argon2id$%'`),
  ],
);
export type UserRow = typeof users.$inferSelect;
