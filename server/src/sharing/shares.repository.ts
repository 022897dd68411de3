import { Inject, Injectable } from '@nestjs/common';
import { and, desc, eq, getTableColumns, gt, isNull, or, sql } from 'drizzle-orm';

import {
  DATABASE,
  type Database,
  type Executor,
  type Transaction,
} from '#server/database/database';
import { revisions } from '#server/lattices/revisions/revision.table';
import { users } from '#server/users/user.table';
import { workspaces } from '#server/workspaces/workspace.table';

import { shares, type ShareRow } from './share.table.js';

/** A link as its workspace sees it. */
export type ShareFullRow = Omit<ShareRow, 'tokenHash'> & {
  readonly revisionNumber: number;
  readonly createdBy: { readonly id: string; readonly name: string };
};

/** What a link opens. */
export interface OpenShare {
  readonly id: string;
  readonly workspaceId: string;
  readonly revisionId: string;
  readonly workspaceName: string;
  readonly expiresAt: Date | null;
}

const { tokenHash: _tokenHash, ...shown } = getTableColumns(shares);

@Injectable()
export class SharesRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  async insert(share: typeof shares.$inferInsert, tx: Transaction): Promise<string> {
    const [row] = await tx.insert(shares).values(share).returning({ id: shares.id });
    return row!.id;
  }

  /** Every link to revisions of the lattice, the newest first. */
  async list(workspaceId: string, latticeId: string): Promise<ShareFullRow[]> {
    return this.select(this.db)
      .where(and(eq(shares.workspaceId, workspaceId), eq(revisions.latticeId, latticeId)))
      .orderBy(desc(shares.createdAt), desc(shares.id));
  }

  async find(
    workspaceId: string,
    latticeId: string,
    id: string,
    executor: Executor = this.db,
  ): Promise<ShareFullRow | null> {
    const [row] = await this.select(executor).where(
      and(
        eq(shares.workspaceId, workspaceId),
        eq(revisions.latticeId, latticeId),
        eq(shares.id, id),
      ),
    );
    return row ?? null;
  }

  async revoke(workspaceId: string, id: string, at: Date, tx: Transaction): Promise<void> {
    await tx
      .update(shares)
      .set({ revokedAt: at })
      .where(and(eq(shares.workspaceId, workspaceId), eq(shares.id, id)));
  }

  /** The link of a token, if it opens anything now. */
  async findOpen(tokenHash: string, now: Date): Promise<OpenShare | null> {
    const [row] = await this.db
      .select({
        id: shares.id,
        workspaceId: shares.workspaceId,
        revisionId: shares.revisionId,
        workspaceName: workspaces.name,
        expiresAt: shares.expiresAt,
      })
      .from(shares)
      .innerJoin(workspaces, eq(workspaces.id, shares.workspaceId))
      .where(
        and(
          eq(shares.tokenHash, tokenHash),
          isNull(shares.revokedAt),
          or(isNull(shares.expiresAt), gt(shares.expiresAt, now)),
        ),
      );
    return row ?? null;
  }

  async countOpening({ workspaceId, id }: OpenShare, at: Date): Promise<void> {
    await this.db
      .update(shares)
      .set({ openedCount: sql`${shares.openedCount} + 1`, lastOpenedAt: at })
      .where(and(eq(shares.workspaceId, workspaceId), eq(shares.id, id)));
  }

  private select(executor: Executor) {
    return executor
      .select({
        ...shown,
        revisionNumber: revisions.number,
        createdBy: { id: users.id, name: users.name },
      })
      .from(shares)
      .innerJoin(revisions, eq(revisions.id, shares.revisionId))
      .innerJoin(users, eq(users.id, shares.createdById))
      .$dynamic();
  }
}
