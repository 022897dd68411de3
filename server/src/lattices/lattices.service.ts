import { Inject, Injectable } from '@nestjs/common';
import type { z } from 'zod';

import { Problem } from '#common/errors/problem';
import { defaultEvaluationMethod } from '#common/schemas/cell';
import { defaultEnergeticModel } from '#common/schemas/energetics';
import type {
  CreateLatticeRequest,
  ShelfQuery,
  updateLatticeRequest,
} from '#common/schemas/lattice';
import { AuditService } from '#server/audit/audit.service';
import { Clock } from '#server/config/clock';
import {
  DATABASE,
  withTransaction,
  type Database,
  type Transaction,
} from '#server/database/database';
import { isId } from '#server/http/is-id';
import { assertCan, type RequestContext } from '#server/http/request-context';

import { DraftHeadlineService } from './draft-headline.service.js';
import { DraftsRepository } from './drafts/drafts.repository.js';
import type { LatticeRow } from './lattice.table.js';
import { LatticesRepository, type ShelfRow } from './lattices.repository.js';
import { ShelfRepository } from './shelf.repository.js';

/** How long a deleted lattice can be taken back, in milliseconds. */
export const wayBackMs = 30 * 24 * 3_600_000;

@Injectable()
export class LatticesService {
  constructor(
    private readonly lattices: LatticesRepository,
    private readonly shelf: ShelfRepository,
    private readonly drafts: DraftsRepository,
    private readonly headlines: DraftHeadlineService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  async list(
    context: RequestContext,
    query: ShelfQuery,
  ): Promise<{ rows: ShelfRow[]; total: number }> {
    assertCan(context, 'lattice.read');
    return this.shelf.page(context.workspace.id, query);
  }

  /** Makes a lattice with its first draft; the cell need not be complete yet. */
  async create(context: RequestContext, asked: CreateLatticeRequest): Promise<ShelfRow> {
    assertCan(context, 'lattice.create');
    const { name, tags, prototype, cell, method = defaultEvaluationMethod } = asked;
    const { model = defaultEnergeticModel } = asked;
    const workspaceId = context.workspace.id;
    const now = this.clock.now();
    const version = 1;
    const lattice = {
      ...{ workspaceId, name, prototype, tags: unique(tags), authorId: context.user.id },
      ...{ draftVersion: version, createdAt: now, updatedAt: now },
    };
    const { id } = await withTransaction(this.db, async (tx) => {
      const row = await this.lattices.insert(lattice, tx);
      const content = { cell, method, model };
      const draft = { workspaceId, latticeId: row.id, baseRevision: 0, version, ...content };
      await this.drafts.put({ ...draft, updatedAt: now, updatedById: context.user.id }, tx);
      await this.audit.record(context, 'lattice.create', name, undefined, tx);
      return row;
    });
    await this.headlines.refresh({ workspaceId, latticeId: id, version }, cell, method);
    return this.find(context, id);
  }

  /**
   * A lattice; one that was deleted too, so that its page can offer the way back.
   * @throws {Problem} `lattice.not_found`
   */
  async read(context: RequestContext, id: string): Promise<ShelfRow> {
    assertCan(context, 'lattice.read');
    return this.find(context, id);
  }

  /** @throws {Problem} `lattice.not_found` */
  async update(
    context: RequestContext,
    id: string,
    { name, tags }: z.infer<typeof updateLatticeRequest>,
  ): Promise<ShelfRow> {
    assertCan(context, 'lattice.update');
    await withTransaction(this.db, async (tx) => {
      const before = await this.lock(context, id, tx);
      const change = {
        ...(name === undefined ? {} : { name }),
        ...(tags === undefined ? {} : { tags: unique(tags) }),
      };
      if (Object.keys(change).length === 0) {
        return;
      }
      const updatedAt = this.clock.now();
      await this.lattices.update(context.workspace.id, id, { ...change, updatedAt }, tx);
      const said = [
        ...(name === undefined || name === before.name ? [] : [`name: ${name}`]),
        ...(change.tags === undefined ? [] : [`tags: ${change.tags.join(', ') || 'none'}`]),
      ];
      await this.audit.record(context, 'lattice.update', before.name, said.join('; '), tx);
    });
    return this.find(context, id);
  }

  /**
   * Takes a lattice off the shelf; it can be taken back for 30 days.
   * @throws {Problem} `lattice.not_found`
   */
  async remove(context: RequestContext, id: string): Promise<void> {
    assertCan(context, 'lattice.delete');
    await withTransaction(this.db, async (tx) => {
      const { name } = await this.lock(context, id, tx);
      const deletedAt = this.clock.now();
      await this.lattices.update(context.workspace.id, id, { deletedAt }, tx);
      await this.audit.record(context, 'lattice.delete', name, undefined, tx);
    });
  }

  /**
   * Puts a deleted lattice back; one that is not deleted stays as it is.
   * @throws {Problem} `lattice.not_found`
   */
  async restore(context: RequestContext, id: string): Promise<ShelfRow> {
    assertCan(context, 'lattice.restore');
    const before = await this.find(context, id);
    if (before.deletedAt !== null) {
      const since = new Date(this.clock.now().getTime() - wayBackMs);
      await withTransaction(this.db, async (tx) => {
        const row = await this.lattices.restore(context.workspace.id, id, since, tx);
        if (row === null) {
          throw new Problem('lattice.not_found');
        }
        await this.audit.record(context, 'lattice.restore', row.name, undefined, tx);
      });
    }
    return this.find(context, id);
  }

  /**
   * For whoever is about to change something of a lattice: others wait until the transaction ends.
   * @throws {Problem} `lattice.not_found`
   */
  async lock(context: RequestContext, id: string, tx: Transaction): Promise<LatticeRow> {
    const row = isId(id) ? await this.lattices.lock(context.workspace.id, id, tx) : null;
    if (row === null) {
      throw new Problem('lattice.not_found');
    }
    return row;
  }

  private async find(context: RequestContext, id: string): Promise<ShelfRow> {
    const row = isId(id) ? await this.lattices.find(context.workspace.id, id) : null;
    if (row === null) {
      throw new Problem('lattice.not_found');
    }
    return row;
  }
}

/** Each tag once, whatever its capitals. */
function unique(tags: readonly string[]): string[] {
  const seen = new Map(tags.map((tag) => [tag.toLowerCase(), tag]));
  return [...seen.values()];
}
