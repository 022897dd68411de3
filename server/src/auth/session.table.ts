import { sql, type SQL } from 'drizzle-orm';
import { check, index, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';

import { moment } from '#server/database/columns';
import { users } from '#server/users/user.table';

import type { StoredSession } from './session-data.js';

/**
 * Sessions in the form connect-pg-simple reads and writes (`sid`, `sess`, `expire`). The columns
 * it does not know are derived from `sess`, so that sessions can be listed by person and end with
 * the account.
 */
export const sessions = pgTable(
  'sessions',
  {
    /** SHA-256 of the id in the cookie, so that a leaked table opens no session. */
    sid: text('sid').primaryKey(),
    sess: jsonb('sess').$type<StoredSession>().notNull(),
    expire: moment('expire').notNull(),
    id: uuid('id')
      .notNull()
      .generatedAlwaysAs((): SQL => sql`(sess ->> 'publicId')::uuid`),
    userId: uuid('user_id')
      .notNull()
      .generatedAlwaysAs((): SQL => sql`(sess ->> 'userId')::uuid`)
      .references(() => users.id, { onDelete: 'cascade' }),
  },
  (table) => [
    unique('sessions_id').on(table.id),
    index('sessions_user').on(table.userId),
    index('sessions_expire').on(table.expire),
    check('sessions_sid_form', sql`${table.sid} ~ '^[0-9a-f]{64}$'`),
  ],
);
