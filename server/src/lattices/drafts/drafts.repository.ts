import { Inject, Injectable } from '@nestjs/common';
import { and, eq, isNull } from 'drizzle-orm';

import {
  DATABASE,
  type Database,
  type Executor,
  type Transaction,
} from '#server/database/database';
import { users } from '#server/users/user.table';

import { lattices } from '../lattice.table.js';
import { revisions } from '../revisions/revision.table.js';
import { drafts, type DraftRow } from './draft.table.js';

/** The draft of a lattice as it is, beside the newest revision; at least one of them is there. */
export interface DraftState {
  readonly latticeId: string;
  readonly latticeName: string;
  readonly prototype: string | null;
  readonly headRevision: number;
  readonly draft: DraftRow | null;
  readonly head: Pick<typeof revisions.$inferSelect, 'cell' | 'method' | 'model'> | null;
  readonly updatedBy: { readonly id: string; readonly name: string } | null;
}

@Injectable()
export class DraftsRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** All of it in one statement, so that the parts belong together. */
  async state(
    workspaceId: string,
    latticeId: string,
    executor: Executor = this.db,
  ): Promise<DraftState | null> {
    const [row] = await executor
      .select({
        latticeId: lattices.id,
        latticeName: lattices.name,
        prototype: lattices.prototype,
        headRevision: lattices.headRevision,
        draft: drafts,
        head: { cell: revisions.cell, method: revisions.method, model: revisions.model },
        updatedBy: { id: users.id, name: users.name },
      })
      .from(lattices)
      .leftJoin(drafts, eq(drafts.latticeId, lattices.id))
      .leftJoin(users, eq(users.id, drafts.updatedById))
      .leftJoin(
        revisions,
        and(eq(revisions.latticeId, lattices.id), eq(revisions.number, lattices.headRevision)),
      )
      .where(
        and(
          eq(lattices.workspaceId, workspaceId),
          eq(lattices.id, latticeId),
          isNull(lattices.deletedAt),
        ),
      );
    return row ?? null;
  }

  /** Keeps a draft in place of the one before; the caller holds the lattice's lock. */
  async put(draft: DraftRow, tx: Transaction): Promise<void> {
    const { latticeId: _latticeId, workspaceId: _workspaceId, ...change } = draft;
    await tx
      .insert(drafts)
      .values(draft)
      .onConflictDoUpdate({ target: drafts.latticeId, set: change });
  }

  async remove(workspaceId: string, latticeId: string, tx: Transaction): Promise<void> {
    await tx
      .delete(drafts)
      .where(and(eq(drafts.workspaceId, workspaceId), eq(drafts.latticeId, latticeId)));
  }
}
