import { isDeepStrictEqual } from 'node:util';

import { Inject, Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import type { PutDraftRequest } from '#common/schemas/lattice';
import { AuditService } from '#server/audit/audit.service';
import { Clock } from '#server/config/clock';
import { DATABASE, withTransaction, type Database, type Executor } from '#server/database/database';
import { isId } from '#server/http/is-id';
import { assertCan, type RequestContext } from '#server/http/request-context';

import { DraftHeadlineService } from '../draft-headline.service.js';
import { LatticesRepository } from '../lattices.repository.js';
import { LatticesService } from '../lattices.service.js';
import { draftConflict, draftEtag, matchesEtag, requireIfMatch } from './draft-etag.js';
import { DraftsRepository, type DraftState } from './drafts.repository.js';

/** The version of what the draft says now. */
export const etagOf = ({ headRevision, draft }: DraftState): string =>
  draftEtag(draft?.baseRevision ?? headRevision, draft?.version ?? 0);

@Injectable()
export class DraftsService {
  constructor(
    private readonly drafts: DraftsRepository,
    private readonly latticeRows: LatticesRepository,
    private readonly lattices: LatticesService,
    private readonly headlines: DraftHeadlineService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  /** @throws {Problem} `lattice.not_found` */
  async read(context: RequestContext, latticeId: string): Promise<DraftState> {
    assertCan(context, 'lattice.read');
    return this.state(context, latticeId);
  }

  /**
   * Keeps an edit, if nobody else's came between.
   * @throws {Problem} `lattice.not_found`, `request.if_match_missing`, `draft.conflict`
   */
  async put(
    context: RequestContext,
    latticeId: string,
    ifMatch: string | undefined,
    content: PutDraftRequest,
  ): Promise<DraftState> {
    assertCan(context, 'draft.edit');
    const wanted = requireIfMatch(ifMatch);
    const workspaceId = context.workspace.id;
    const { state, isNew } = await withTransaction(this.db, async (tx) => {
      const lattice = await this.lattices.lock(context, latticeId, tx);
      const before = await this.state(context, latticeId, tx);
      if (!matchesEtag(wanted, etagOf(before))) {
        if (isSentAgain(before, context.user.id, content)) {
          return { state: before, isNew: false };
        }
        throw draftConflict(etagOf(before));
      }
      const version = lattice.draftVersion + 1;
      const now = this.clock.now();
      const place = { workspaceId, latticeId, baseRevision: lattice.headRevision, version };
      const by = { updatedAt: now, updatedById: context.user.id };
      await this.drafts.put({ ...place, ...content, ...by }, tx);
      const change = { draftVersion: version, updatedAt: now };
      await this.latticeRows.update(workspaceId, latticeId, change, tx);
      return { state: await this.state(context, latticeId, tx), isNew: true };
    });
    if (isNew && state.headRevision === 0) {
      const { version } = state.draft!;
      const { cell, method } = content;
      await this.headlines.refresh({ workspaceId, latticeId, version }, cell, method);
    }
    return state;
  }

  /**
   * Throws the edit away: what is left is the newest revision.
   * @throws {Problem} `lattice.not_found`, `request.if_match_missing`, `draft.conflict`;
   *   `draft.not_found` when nothing is saved yet, so that nothing would be left
   */
  async discard(
    context: RequestContext,
    latticeId: string,
    ifMatch: string | undefined,
  ): Promise<DraftState> {
    assertCan(context, 'draft.edit');
    const wanted = requireIfMatch(ifMatch);
    return withTransaction(this.db, async (tx) => {
      const lattice = await this.lattices.lock(context, latticeId, tx);
      const before = await this.state(context, latticeId, tx);
      if (!matchesEtag(wanted, etagOf(before))) {
        throw draftConflict(etagOf(before));
      }
      if (before.head === null) {
        throw new Problem(
          'draft.not_found',
          'No revision is saved yet, so there is nothing to go back to. Delete the lattice instead.',
        );
      }
      if (before.draft !== null) {
        await this.drafts.remove(context.workspace.id, latticeId, tx);
        await this.audit.record(context, 'draft.discard', lattice.name, undefined, tx);
      }
      return this.state(context, latticeId, tx);
    });
  }

  private async state(
    context: RequestContext,
    latticeId: string,
    executor?: Executor,
  ): Promise<DraftState> {
    const state = isId(latticeId)
      ? await this.drafts.state(context.workspace.id, latticeId, executor)
      : null;
    if (state === null) {
      throw new Problem('lattice.not_found');
    }
    return state;
  }
}

/** Whether the very edit is kept already: its answer was lost and the editor sends it again. */
function isSentAgain({ draft }: DraftState, userId: string, sent: PutDraftRequest): boolean {
  return (
    draft !== null &&
    draft.updatedById === userId &&
    isDeepStrictEqual({ cell: draft.cell, method: draft.method, model: draft.model }, sent)
  );
}
