import { Inject, Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import { secretToken } from '#common/schemas/shared';
import { AuditService } from '#server/audit/audit.service';
import { Clock } from '#server/config/clock';
import { DATABASE, withTransaction, type Database } from '#server/database/database';
import { isId } from '#server/http/is-id';
import { assertCan, type RequestContext } from '#server/http/request-context';
import { newSecretToken, secretTokenHash } from '#server/http/secret-token';
import { LatticesService } from '#server/lattices/lattices.service';
import {
  RevisionsService,
  type EvaluatedRevision,
} from '#server/lattices/revisions/revisions.service';

import { SharesRepository, type OpenShare, type ShareFullRow } from './shares.repository.js';

const dayMs = 24 * 3_600_000;

/** What a link holder gets to see. */
export interface OpenedShare extends EvaluatedRevision {
  readonly share: OpenShare;
}

@Injectable()
export class SharesService {
  constructor(
    private readonly shares: SharesRepository,
    private readonly lattices: LatticesService,
    private readonly revisions: RevisionsService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  /**
   * Makes a link to one revision.
   * @returns the link and its token, which is kept nowhere
   * @throws {Problem} `lattice.not_found`, `revision.not_found`
   */
  async create(
    context: RequestContext,
    latticeId: string,
    number: string,
    expiresInDays: number | null,
  ): Promise<{ share: ShareFullRow; token: string }> {
    assertCan(context, 'share.create');
    const token = newSecretToken();
    const now = this.clock.now();
    const share = await withTransaction(this.db, async (tx) => {
      const lattice = await this.lattices.lock(context, latticeId, tx);
      const revision = await this.revisions.find(context, latticeId, number, tx);
      const id = await this.shares.insert(
        {
          workspaceId: context.workspace.id,
          revisionId: revision.id,
          tokenHash: secretTokenHash(token),
          createdById: context.user.id,
          createdAt: now,
          expiresAt:
            expiresInDays === null ? null : new Date(now.getTime() + expiresInDays * dayMs),
        },
        tx,
      );
      const days = expiresInDays === null ? 'until withdrawn' : `for ${expiresInDays} days`;
      const detail = `revision ${revision.number}, ${days}`;
      await this.audit.record(context, 'share.create', lattice.name, detail, tx);
      return (await this.shares.find(context.workspace.id, latticeId, id, tx))!;
    });
    return { share, token };
  }

  /** @throws {Problem} `lattice.not_found` */
  async list(context: RequestContext, latticeId: string): Promise<ShareFullRow[]> {
    assertCan(context, 'share.list');
    const lattice = await this.lattices.read(context, latticeId);
    if (lattice.deletedAt !== null) {
      throw new Problem('lattice.not_found');
    }
    return this.shares.list(context.workspace.id, latticeId);
  }

  /**
   * Withdraws a link; one that is withdrawn already stays so.
   * @throws {Problem} `lattice.not_found`, `share.not_found`
   */
  async revoke(context: RequestContext, latticeId: string, id: string): Promise<void> {
    assertCan(context, 'share.revoke');
    await withTransaction(this.db, async (tx) => {
      const lattice = await this.lattices.lock(context, latticeId, tx);
      const share = isId(id)
        ? await this.shares.find(context.workspace.id, latticeId, id, tx)
        : null;
      if (share === null) {
        throw new Problem('share.not_found');
      }
      if (share.revokedAt === null) {
        await this.shares.revoke(context.workspace.id, id, this.clock.now(), tx);
        const detail = `revision ${share.revisionNumber}`;
        await this.audit.record(context, 'share.revoke', lattice.name, detail, tx);
      }
    });
  }

  /**
   * What the holder of a link sees; counts the opening.
   * @throws {Problem} `share.not_found`, whatever the reason
   */
  async open(token: string): Promise<OpenedShare> {
    const now = this.clock.now();
    const share = secretToken.safeParse(token).success
      ? await this.shares.findOpen(secretTokenHash(token), now)
      : null;
    const opened = share && (await this.revisions.findById(share.workspaceId, share.revisionId));
    if (share === null || opened === null) {
      throw new Problem('share.not_found');
    }
    await this.shares.countOpening(share, now);
    return { share, ...opened };
  }
}
