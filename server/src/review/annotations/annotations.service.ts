import { Inject, Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import type { AnnotationAnchor, CreateAnnotationRequest } from '#common/schemas/review';
import { AuditService } from '#server/audit/audit.service';
import { Clock } from '#server/config/clock';
import {
  DATABASE,
  withTransaction,
  type Database,
  type Transaction,
} from '#server/database/database';
import { EvaluationsService } from '#server/electrostatics/evaluations.service';
import { isId } from '#server/http/is-id';
import { assertCan, type RequestContext } from '#server/http/request-context';
import type { LatticeRow } from '#server/lattices/lattice.table';
import { LatticesService } from '#server/lattices/lattices.service';
import {
  RevisionsService,
  type EvaluatedRevision,
} from '#server/lattices/revisions/revisions.service';

import { AnnotationsRepository, type AnnotationFullRow } from './annotations.repository.js';

@Injectable()
export class AnnotationsService {
  constructor(
    private readonly annotations: AnnotationsRepository,
    private readonly lattices: LatticesService,
    private readonly revisions: RevisionsService,
    private readonly evaluations: EvaluationsService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  /** @throws {Problem} `revision.not_found` */
  async list(
    context: RequestContext,
    latticeId: string,
    number: string,
  ): Promise<AnnotationFullRow[]> {
    assertCan(context, 'lattice.read');
    const revision = await this.revisions.find(context, latticeId, number);
    return this.annotations.list(context.workspace.id, revision.id);
  }

  /**
   * Pins a remark to a revision, one of its sites or one of its ion pairs.
   * @throws {Problem} `revision.not_found`, `annotation.bad_anchor`
   */
  async create(
    context: RequestContext,
    latticeId: string,
    number: string,
    { anchor, text }: CreateAnnotationRequest,
  ): Promise<AnnotationFullRow> {
    assertCan(context, 'annotation.create');
    const target = await this.revisions.read(context, latticeId, number);
    await this.assertAnchor(anchor, target);
    const workspaceId = context.workspace.id;
    const revisionId = target.revision.id;
    return withTransaction(this.db, async (tx) => {
      // Remarks made at the same moment take their numbers one after the other.
      const lattice = await this.lattices.lock(context, latticeId, tx);
      const id = await this.annotations.insert(
        {
          workspaceId,
          revisionId,
          number: await this.annotations.nextNumber(workspaceId, revisionId, tx),
          ...anchorColumns(anchor),
          text,
          authorId: context.user.id,
          createdAt: this.clock.now(),
        },
        tx,
      );
      return this.recorded(context, 'annotation.create', lattice, id, tx);
    });
  }

  /** @throws {Problem} `annotation.not_found` */
  async reply(
    context: RequestContext,
    latticeId: string,
    id: string,
    text: string,
  ): Promise<AnnotationFullRow> {
    assertCan(context, 'annotation.reply');
    return withTransaction(this.db, async (tx) => {
      const { lattice, annotation } = await this.lock(context, latticeId, id, tx);
      const by = { authorId: context.user.id, createdAt: this.clock.now() };
      const place = { workspaceId: context.workspace.id, annotationId: annotation.id };
      await this.annotations.insertReply({ ...place, ...by, text }, tx);
      return this.recorded(context, 'annotation.reply', lattice, id, tx);
    });
  }

  /**
   * Marks a remark as settled, or opens it again; one that is so already stays as it is.
   * @throws {Problem} `annotation.not_found`, `auth.forbidden`
   */
  async settle(
    context: RequestContext,
    latticeId: string,
    id: string,
    verb: 'resolve' | 'reopen',
  ): Promise<AnnotationFullRow> {
    assertCan(context, 'annotation.resolve');
    return withTransaction(this.db, async (tx) => {
      const { lattice, annotation } = await this.lock(context, latticeId, id, tx);
      assertCan(context, 'annotation.resolve', { authorId: annotation.authorId });
      const isResolved = annotation.resolvedAt !== null;
      if (isResolved === (verb === 'resolve')) {
        return annotation;
      }
      const resolution =
        verb === 'resolve'
          ? { resolvedAt: this.clock.now(), resolvedById: context.user.id }
          : { resolvedAt: null, resolvedById: null };
      await this.annotations.setResolution(context.workspace.id, id, resolution, tx);
      return this.recorded(context, `annotation.${verb}`, lattice, id, tx);
    });
  }

  private async lock(
    context: RequestContext,
    latticeId: string,
    id: string,
    tx: Transaction,
  ): Promise<{ lattice: LatticeRow; annotation: AnnotationFullRow }> {
    const lattice = await this.lattices.lock(context, latticeId, tx);
    const annotation = await this.find(context, latticeId, id, tx);
    return { lattice, annotation };
  }

  private async find(
    context: RequestContext,
    latticeId: string,
    id: string,
    tx: Transaction,
  ): Promise<AnnotationFullRow> {
    const row = isId(id)
      ? await this.annotations.find(context.workspace.id, latticeId, id, tx)
      : null;
    if (row === null) {
      throw new Problem('annotation.not_found');
    }
    return row;
  }

  private async recorded(
    context: RequestContext,
    action: string,
    lattice: LatticeRow,
    id: string,
    tx: Transaction,
  ): Promise<AnnotationFullRow> {
    const annotation = await this.find(context, lattice.id, id, tx);
    const detail = `revision ${annotation.revisionNumber}, remark ${annotation.number}`;
    await this.audit.record(context, action, lattice.name, detail, tx);
    return annotation;
  }

  private async assertAnchor(anchor: AnnotationAnchor, target: EvaluatedRevision): Promise<void> {
    if (!(await this.isThere(anchor, target))) {
      throw new Problem('annotation.bad_anchor', undefined, {
        fields: [
          {
            code: 'annotation.bad_anchor',
            field: anchor.kind === 'site' ? 'anchor.label' : 'anchor.key',
            message:
              anchor.kind === 'site'
                ? 'The revision has no site of this label.'
                : 'The revision’s pair ledger has no such row.',
          },
        ],
      });
    }
  }

  private async isThere(
    anchor: AnnotationAnchor,
    { revision, evaluation }: EvaluatedRevision,
  ): Promise<boolean> {
    switch (anchor.kind) {
      case 'revision':
        return true;
      case 'site':
        return revision.cell.sites.some(({ label }) => label.trim() === anchor.label);
      case 'pair':
        return (
          evaluation !== null &&
          (evaluation.result.pairLedger.rows.some(({ key }) => key === anchor.key) ||
            // The ledger can be drawn up to a longer reach than the one that is kept.
            (await this.evaluations.hasPair(revision.cell, revision.method, anchor.key)))
        );
    }
  }
}

function anchorColumns(anchor: AnnotationAnchor) {
  switch (anchor.kind) {
    case 'revision':
      return { anchorKind: anchor.kind, anchorTarget: null };
    case 'site':
      return { anchorKind: anchor.kind, anchorTarget: anchor.label };
    case 'pair':
      return { anchorKind: anchor.kind, anchorTarget: anchor.key };
  }
}
