import { createHash } from 'node:crypto';

import { Inject, Injectable } from '@nestjs/common';
import { asc, eq, inArray, lt, sql } from 'drizzle-orm';

import { Clock } from '#server/config/clock';
import {
  DATABASE,
  withTransaction,
  type Database,
  type Transaction,
} from '#server/database/database';

import { delayAfterMs, forgetAfterMs, type AttemptKind } from './sign-in-delay.js';
import { signInAttempts } from './sign-in-attempt.table.js';

export interface AttemptKey {
  readonly kind: AttemptKind;
  readonly value: string;
}

const keyText = ({ kind, value }: AttemptKey): string =>
  `${kind}:${createHash('sha256').update(value).digest('hex')}`;

const sortedKeys = (keys: readonly AttemptKey[]) =>
  keys
    .map((key) => ({ kind: key.kind, key: keyText(key) }))
    .sort((a, b) => (a.key < b.key ? -1 : 1));

@Injectable()
export class SignInAttemptRepository {
  constructor(
    @Inject(DATABASE) private readonly db: Database,
    private readonly clock: Clock,
  ) {}

  /**
   * Counts a try as failed before it is judged, so that many at once gain nothing.
   * @returns milliseconds still to wait (then nothing was counted), 0 when the try may go on
   */
  async begin(keys: readonly AttemptKey[]): Promise<number> {
    const wanted = sortedKeys(keys);
    const names = wanted.map(({ key }) => key);
    const start = this.clock.now();
    return withTransaction(this.db, async (tx) => {
      await tx
        .insert(signInAttempts)
        .values(names.map((key) => ({ key, failures: 0, lastAt: start, blockedUntil: start })))
        .onConflictDoNothing();
      const rows = await this.hold(names, tx);
      // Read once the rows are held: a try that came first may have waited less.
      const now = this.clock.now();
      const waitMs = Math.max(...rows.map((row) => row.blockedUntil.getTime() - now.getTime()));
      if (waitMs > 0) {
        return waitMs;
      }
      for (const row of rows) {
        const isOld = now.getTime() - row.lastAt.getTime() > forgetAfterMs;
        const failures = (isOld ? 0 : row.failures) + 1;
        const { kind } = wanted.find(({ key }) => key === row.key)!;
        const blockedUntil = new Date(now.getTime() + delayAfterMs(kind, failures));
        await tx
          .update(signInAttempts)
          .set({ failures, lastAt: now, blockedUntil })
          .where(eq(signInAttempts.key, row.key));
      }
      return 0;
    });
  }

  /**
   * Takes back the count of a try that was right. Accounts and browsers start anew; an address
   * only loses this one, or an attacker's own account would wash it clean.
   */
  async succeed(keys: readonly AttemptKey[]): Promise<void> {
    const names = sortedKeys(keys).map(({ key }) => key);
    await withTransaction(this.db, async (tx) => {
      await this.hold(names, tx);
      await tx
        .update(signInAttempts)
        .set({
          failures: sql`case when ${signInAttempts.key} like 'address:%'
            then greatest(${signInAttempts.failures} - 1, 0) else 0 end`,
          blockedUntil: this.clock.now(),
        })
        .where(inArray(signInAttempts.key, names));
    });
  }

  /** Locks the counters until the transaction ends; in one order, so that no two wait in a ring. */
  private hold(names: readonly string[], tx: Transaction) {
    return tx
      .select()
      .from(signInAttempts)
      .where(inArray(signInAttempts.key, names))
      .orderBy(asc(signInAttempts.key))
      .for('update');
  }

  /** Forgets what is too old to count. */
  async forgetOld(): Promise<void> {
    await this.db
      .delete(signInAttempts)
      .where(lt(signInAttempts.lastAt, new Date(this.clock.now().getTime() - forgetAfterMs)));
  }
}
