import { Inject, Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import type { PolicySubject, WorkspaceAction } from '#common/policies/workspace-policy';
import { AuditService } from '#server/audit/audit.service';
import { Clock } from '#server/config/clock';
import { DATABASE, withTransaction, type Database, type Executor } from '#server/database/database';
import { isUniqueViolation } from '#server/database/database-errors';
import type { EvaluationRow } from '#server/electrostatics/evaluation.table';
import { EvaluationsService } from '#server/electrostatics/evaluations.service';
import { isId } from '#server/http/is-id';
import { assertCan, type RequestContext } from '#server/http/request-context';

import { LatticesRepository } from '../lattices.repository.js';
import { LatticesService } from '../lattices.service.js';
import {
  RevisionsRepository,
  type ReviewChange,
  type RevisionFullRow,
  type RevisionListRow,
} from './revisions.repository.js';

/** A revision as it is read. */
export type RevisionRead = RevisionFullRow;

/** A revision with what was computed from it. */
export interface EvaluatedRevision {
  readonly revision: RevisionFullRow;
  readonly evaluation: EvaluationRow | null;
}

/** A step of review: what is asked, and what it makes of the revision. */
export interface ReviewStep {
  readonly action: WorkspaceAction;
  /** Decides, or throws why not. */
  decide(revision: RevisionFullRow, headRevision: number, now: Date): ReviewChange;
}

/** What the policy must know of a revision. */
export const policySubjectOf = (revision: RevisionFullRow): PolicySubject => ({
  authorId: revision.authorId,
  submittedById: revision.submittedById,
  state: revision.state,
});

/** Numbers of revisions as addresses write them. */
const numberPattern = /^[1-9]\d{0,8}$/;

@Injectable()
export class RevisionsService {
  constructor(
    private readonly revisions: RevisionsRepository,
    private readonly latticeRows: LatticesRepository,
    private readonly lattices: LatticesService,
    private readonly evaluations: EvaluationsService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  /**
   * Every revision of a lattice, the newest first.
   * @throws {Problem} `lattice.not_found`
   */
  async list(context: RequestContext, latticeId: string): Promise<RevisionListRow[]> {
    assertCan(context, 'lattice.read');
    const lattice = await this.lattices.read(context, latticeId);
    if (lattice.deletedAt !== null) {
      throw new Problem('lattice.not_found');
    }
    return this.revisions.list(context.workspace.id, latticeId);
  }

  /** @throws {Problem} `revision.not_found`, for every lattice that the workspace has not */
  async read(
    context: RequestContext,
    latticeId: string,
    number: string,
  ): Promise<EvaluatedRevision> {
    assertCan(context, 'lattice.read');
    return this.evaluated(await this.find(context, latticeId, number));
  }

  /** The row alone, for what belongs to it. */
  async find(
    context: RequestContext,
    latticeId: string,
    number: string,
    executor?: Executor,
  ): Promise<RevisionFullRow> {
    const row =
      isId(latticeId) && numberPattern.test(number)
        ? await this.revisions.find(context.workspace.id, latticeId, Number(number), executor)
        : null;
    if (row === null) {
      throw new Problem('revision.not_found');
    }
    return row;
  }

  /** A revision that something outside its workspace names; null when its lattice is deleted. */
  async findById(workspaceId: string, id: string): Promise<EvaluatedRevision | null> {
    const row = await this.revisions.findById(workspaceId, id);
    return row && this.evaluated(row);
  }

  /**
   * Moves a revision along its way through review; steps of one lattice wait for each other.
   * @throws {Problem} `lattice.not_found`, `revision.not_found`, `auth.forbidden`, and whatever the
   *   step throws; `revision.wrong_state` when another revision is in review
   */
  async review(
    context: RequestContext,
    latticeId: string,
    number: string,
    { action, decide }: ReviewStep,
  ): Promise<RevisionFullRow> {
    assertCan(context, action);
    try {
      return await withTransaction(this.db, async (tx) => {
        const lattice = await this.lattices.lock(context, latticeId, tx);
        const revision = await this.find(context, latticeId, number, tx);
        const now = this.clock.now();
        const change = decide(revision, lattice.headRevision, now);
        await this.revisions.review(context.workspace.id, revision.id, change, tx);
        if (revision.number === lattice.headRevision) {
          const { state } = change;
          const shown = { state, updatedAt: now };
          await this.latticeRows.update(context.workspace.id, latticeId, shown, tx);
        }
        await this.audit.record(context, action, lattice.name, `revision ${revision.number}`, tx);
        return this.find(context, latticeId, number, tx);
      });
    } catch (error) {
      if (isUniqueViolation(error, 'revisions_one_in_review')) {
        throw new Problem(
          'revision.wrong_state',
          'Another revision of this lattice is in review. Withdraw it first.',
        );
      }
      throw error;
    }
  }

  private async evaluated(revision: RevisionFullRow): Promise<EvaluatedRevision> {
    const { evaluationHash } = revision;
    const evaluation = evaluationHash === null ? null : await this.evaluations.find(evaluationHash);
    return { revision, evaluation };
  }
}
