import { setTimeout as delay } from 'node:timers/promises';

import { Injectable, Logger } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import type { CellDefinition, EvaluationMethod } from '#common/schemas/cell';
import { EvaluationsService } from '#server/electrostatics/evaluations.service';

import { headlineOf, headlineOfUnreadable, type DraftRef, type Headline } from './headline.js';
import { LatticesRepository } from './lattices.repository.js';

/** How long an answer about a draft waits for its headline; a longer computation goes on behind. */
const patienceMs = 2_000;

/** Keeps the shelf up to date about lattices that have only a draft. */
@Injectable()
export class DraftHeadlineService {
  private readonly logger = new Logger('Shelf');

  constructor(
    private readonly evaluations: EvaluationsService,
    private readonly lattices: LatticesRepository,
  ) {}

  /** Brings the headline up to date, unless a newer draft or a revision has come meanwhile. */
  async refresh(draft: DraftRef, cell: CellDefinition, method: EvaluationMethod): Promise<void> {
    const patience = new AbortController();
    const work = this.write(draft, cell, method)
      .catch((error: unknown) => this.logger.error({ error, latticeId: draft.latticeId }))
      .finally(() => patience.abort());
    const waited = delay(patienceMs, undefined, { signal: patience.signal }).catch(() => undefined);
    await Promise.race([work, waited]);
  }

  private async write(
    draft: DraftRef,
    cell: CellDefinition,
    method: EvaluationMethod,
  ): Promise<void> {
    const headline = await this.headline(draft.workspaceId, cell, method);
    await this.lattices.setDraftHeadline(draft, headline);
  }

  private async headline(
    workspaceId: string,
    cell: CellDefinition,
    method: EvaluationMethod,
  ): Promise<Headline> {
    try {
      return headlineOf(await this.evaluations.outcomeOf(workspaceId, cell, method));
    } catch (error) {
      if (error instanceof Problem) {
        return headlineOfUnreadable(error.code);
      }
      throw error;
    }
  }
}
