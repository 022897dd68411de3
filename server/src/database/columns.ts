import { timestamp, uuid } from 'drizzle-orm/pg-core';

import { uuidV7 } from './uuid-v7.js';

/** Primary key `id`: a UUIDv7 made by the server. */
export const idColumn = () =>
  uuid('id')
    .primaryKey()
    .$defaultFn(() => uuidV7());

/** A moment with zone, as a `Date`. */
export const moment = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });

/** `created_at`, set by the database. */
export const createdAt = () => moment('created_at').notNull().defaultNow();
