import { isDeepStrictEqual } from 'node:util';

import { Inject, Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import { AuditService } from '#server/audit/audit.service';
import { Clock } from '#server/config/clock';
import {
  DATABASE,
  withTransaction,
  type Database,
  type Transaction,
} from '#server/database/database';
import { EvaluationsService, type CellOutcome } from '#server/electrostatics/evaluations.service';
import { assertCan, type RequestContext } from '#server/http/request-context';

import { draftConflict, matchesEtag, requireIfMatch } from '../drafts/draft-etag.js';
import type { DraftRow } from '../drafts/draft.table.js';
import { DraftsRepository, type DraftState } from '../drafts/drafts.repository.js';
import { DraftsService, etagOf } from '../drafts/drafts.service.js';
import { headlineOf } from '../headline.js';
import { LatticesRepository } from '../lattices.repository.js';
import { LatticesService } from '../lattices.service.js';
import { RevisionsRepository } from './revisions.repository.js';
import { RevisionsService, type EvaluatedRevision } from './revisions.service.js';

@Injectable()
export class SaveRevisionService {
  constructor(
    private readonly drafts: DraftsService,
    private readonly draftRows: DraftsRepository,
    private readonly revisions: RevisionsService,
    private readonly revisionRows: RevisionsRepository,
    private readonly lattices: LatticesService,
    private readonly latticeRows: LatticesRepository,
    private readonly evaluations: EvaluationsService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  /**
   * Makes the draft an immutable revision. A cell that can be read but not evaluated (its charges
   * don't balance, say) is kept with the reason.
   * @throws {Problem} `lattice.not_found`, `request.if_match_missing`, `draft.conflict`,
   *   `revision.unchanged`; what is wrong with a cell that can't be read, field by field
   */
  async save(
    context: RequestContext,
    latticeId: string,
    ifMatch: string | undefined,
    note: string,
  ): Promise<EvaluatedRevision> {
    assertCan(context, 'revision.save');
    const wanted = requireIfMatch(ifMatch);
    const draft = changedDraft(await this.drafts.read(context, latticeId), wanted);
    // Outside the transaction, since it may take a while; the draft's version is checked again.
    const outcome = await this.evaluations.outcomeOf(
      context.workspace.id,
      draft.cell,
      draft.method,
    );
    const number = await withTransaction(this.db, async (tx) => {
      const lattice = await this.lattices.lock(context, latticeId, tx);
      const state = await this.draftRows.state(context.workspace.id, latticeId, tx);
      const fresh = changedDraft(state!, wanted);
      const next = lattice.headRevision + 1;
      await this.insert(context, fresh, next, note, outcome, tx);
      await this.audit.record(context, 'revision.save', lattice.name, `revision ${next}`, tx);
      return next;
    });
    return this.revisions.read(context, latticeId, String(number));
  }

  private async insert(
    context: RequestContext,
    { latticeId, cell, method, model }: DraftRow,
    number: number,
    note: string,
    outcome: CellOutcome,
    tx: Transaction,
  ): Promise<void> {
    const workspaceId = context.workspace.id;
    const now = this.clock.now();
    const headline = headlineOf(outcome);
    await this.revisionRows.insert(
      {
        workspaceId,
        latticeId,
        number,
        note,
        authorId: context.user.id,
        createdAt: now,
        cell,
        method,
        model,
        formula: outcome.identity.formula,
        evaluationHash: outcome.evaluation?.hash ?? null,
        evaluationProblem: outcome.problem,
        energyEvPerFormulaUnit: headline.energyEvPerFormulaUnit,
        energyBoundEvPerFormulaUnit: headline.energyBoundEvPerFormulaUnit,
      },
      tx,
    );
    await this.draftRows.remove(workspaceId, latticeId, tx);
    await this.latticeRows.update(
      workspaceId,
      latticeId,
      { ...headline, headRevision: number, state: 'draft', updatedAt: now },
      tx,
    );
  }
}

/** The draft at the wanted version, if it says something else than the newest revision. */
function changedDraft(state: DraftState, wanted: string): DraftRow {
  const { draft, head } = state;
  if (!matchesEtag(wanted, etagOf(state))) {
    throw draftConflict(etagOf(state));
  }
  const isSame =
    draft === null ||
    (head !== null &&
      isDeepStrictEqual(draft.cell, head.cell) &&
      isDeepStrictEqual(draft.method, head.method) &&
      isDeepStrictEqual(draft.model, head.model));
  if (isSame) {
    throw new Problem('revision.unchanged');
  }
  return draft;
}
