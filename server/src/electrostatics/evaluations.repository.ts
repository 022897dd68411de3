import { Inject, Injectable } from '@nestjs/common';
import { and, eq, lt, notExists } from 'drizzle-orm';

import { DATABASE, type Database } from '#server/database/database';
import { revisions } from '#server/lattices/revisions/revision.table';

import { evaluations, evaluationUses, type EvaluationRow } from './evaluation.table.js';

@Injectable()
export class EvaluationsRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** A result by its hash, whoever asked for it first. */
  async find(hash: string): Promise<EvaluationRow | null> {
    const [row] = await this.db.select().from(evaluations).where(eq(evaluations.hash, hash));
    return row ?? null;
  }

  /** A result that this workspace has asked for. */
  async findUsed(workspaceId: string, hash: string): Promise<EvaluationRow | null> {
    const [row] = await this.db
      .select({ evaluation: evaluations })
      .from(evaluationUses)
      .innerJoin(evaluations, eq(evaluations.hash, evaluationUses.hash))
      .where(and(eq(evaluationUses.workspaceId, workspaceId), eq(evaluationUses.hash, hash)));
    return row?.evaluation ?? null;
  }

  /** Keeps a result; the first one kept under a hash stays. */
  async keep(row: typeof evaluations.$inferInsert): Promise<EvaluationRow> {
    await this.db.insert(evaluations).values(row).onConflictDoNothing();
    return (await this.find(row.hash))!;
  }

  /** Notes that a workspace has asked for a result. */
  async noteUse(workspaceId: string, hash: string): Promise<void> {
    await this.db.insert(evaluationUses).values({ workspaceId, hash }).onConflictDoNothing();
  }

  /** Removes results computed before a moment that no revision names; returns how many. */
  async removeUnnamed(computedBefore: Date): Promise<number> {
    const naming = this.db
      .select({ id: revisions.id })
      .from(revisions)
      .where(eq(revisions.evaluationHash, evaluations.hash));
    const rows = await this.db
      .delete(evaluations)
      .where(and(lt(evaluations.computedAt, computedBefore), notExists(naming)))
      .returning({ hash: evaluations.hash });
    return rows.length;
  }
}
