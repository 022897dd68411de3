import { Inject, Injectable } from '@nestjs/common';
import { and, eq } from 'drizzle-orm';

import { DATABASE, type Database, type Executor } from '#server/database/database';

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
  async noteUse(workspaceId: string, hash: string, executor: Executor = this.db): Promise<void> {
    await executor.insert(evaluationUses).values({ workspaceId, hash }).onConflictDoNothing();
  }
}
