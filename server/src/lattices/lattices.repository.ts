import { Inject, Injectable } from '@nestjs/common';
import { and, eq, getTableColumns, isNotNull, isNull, lt, sql } from 'drizzle-orm';

import {
  DATABASE,
  type Database,
  type Executor,
  type Transaction,
} from '#server/database/database';
import { annotations } from '#server/review/annotations/annotation.table';
import { users } from '#server/users/user.table';

import { drafts } from './drafts/draft.table.js';
import type { DraftRef, Headline } from './headline.js';
import { lattices, type LatticeRow } from './lattice.table.js';
import { revisions } from './revisions/revision.table.js';

/** A lattice as the shelf shows it. */
export interface ShelfRow extends LatticeRow {
  readonly author: { readonly id: string; readonly name: string };
  readonly hasDraft: boolean;
  /** Remarks on any of its revisions that nobody has resolved. */
  readonly openRemarks: number;
}

export type LatticeChange = Partial<Omit<LatticeRow, 'id' | 'workspaceId'>>;

const openRemarks = sql<number>`(
  select count(*)::int from ${annotations}
  join ${revisions} on ${revisions.id} = ${annotations.revisionId}
  where ${revisions.latticeId} = ${lattices.id} and ${annotations.resolvedAt} is null
)`;

const hasDraft = sql<boolean>`exists (
  select 1 from ${drafts} where ${drafts.latticeId} = ${lattices.id}
)`;

/** The columns of a {@link ShelfRow}; `users` joined as the author. */
export const shelfColumns = {
  ...getTableColumns(lattices),
  author: { id: users.id, name: users.name },
  hasDraft,
  openRemarks,
};

const place = (workspaceId: string, id: string) =>
  and(eq(lattices.workspaceId, workspaceId), eq(lattices.id, id));

@Injectable()
export class LatticesRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  async insert(lattice: typeof lattices.$inferInsert, tx: Transaction): Promise<LatticeRow> {
    const [row] = await tx.insert(lattices).values(lattice).returning();
    return row!;
  }

  /** A lattice of the workspace, deleted or not. */
  async find(workspaceId: string, id: string): Promise<ShelfRow | null> {
    const [row] = await this.db
      .select(shelfColumns)
      .from(lattices)
      .innerJoin(users, eq(users.id, lattices.authorId))
      .where(place(workspaceId, id));
    return row ?? null;
  }

  /** A lattice that is not deleted; whoever else wants to change it waits for the transaction. */
  async lock(workspaceId: string, id: string, tx: Transaction): Promise<LatticeRow | null> {
    const [row] = await tx
      .select()
      .from(lattices)
      .where(and(place(workspaceId, id), isNull(lattices.deletedAt)))
      .for('no key update');
    return row ?? null;
  }

  async update(
    workspaceId: string,
    id: string,
    change: LatticeChange,
    executor: Executor,
  ): Promise<void> {
    await executor.update(lattices).set(change).where(place(workspaceId, id));
  }

  /** Only while the draft it is about is the newest and nothing is saved. */
  async setDraftHeadline(
    { workspaceId, latticeId, version }: DraftRef,
    headline: Headline,
  ): Promise<void> {
    await this.db
      .update(lattices)
      .set(headline)
      .where(
        and(
          place(workspaceId, latticeId),
          eq(lattices.headRevision, 0),
          eq(lattices.draftVersion, version),
        ),
      );
  }

  /** Takes a deleted lattice back; null when it is not there or was deleted too long ago. */
  async restore(
    workspaceId: string,
    id: string,
    deletedAfter: Date,
    tx: Transaction,
  ): Promise<LatticeRow | null> {
    const [row] = await tx
      .update(lattices)
      .set({ deletedAt: null })
      .where(
        and(
          place(workspaceId, id),
          isNotNull(lattices.deletedAt),
          sql`${lattices.deletedAt} >= ${deletedAfter.toISOString()}`,
        ),
      )
      .returning();
    return row ?? null;
  }

  /** Removes for good what was deleted before a moment; returns how many lattices that were. */
  async purge(deletedBefore: Date): Promise<number> {
    const rows = await this.db
      .delete(lattices)
      .where(lt(lattices.deletedAt, deletedBefore))
      .returning({ id: lattices.id });
    return rows.length;
  }
}
