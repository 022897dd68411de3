import { sql } from 'drizzle-orm';
import { boolean, check, jsonb, pgTable } from 'drizzle-orm/pg-core';

import type { SessionState } from '#common/schemas/auth';
import { createdAt } from '#server/database/columns';

export type DemoNotice = NonNullable<SessionState['demo']>;

/** The one row about this server as a whole. */
export const installation = pgTable(
  'installation',
  {
    isOnlyRow: boolean('is_only_row').primaryKey().default(true),
    /** The demo's people and password, shown on the sign-in page; null without the demo. */
    demoNotice: jsonb('demo_notice').$type<DemoNotice>(),
    createdAt: createdAt(),
  },
  (table) => [check('installation_one_row', sql`${table.isOnlyRow}`)],
);
