import { Injectable } from '@nestjs/common';

import type { CellDefinition } from '#common/schemas/cell';
import { defaultEvaluationMethod } from '#common/schemas/cell';
import type { RequestContext } from '#server/http/request-context';
import { DraftsService, etagOf } from '#server/lattices/drafts/drafts.service';
import { LatticesService } from '#server/lattices/lattices.service';
import type { EvaluatedRevision } from '#server/lattices/revisions/revisions.service';
import { SaveRevisionService } from '#server/lattices/revisions/save-revision.service';
import { readPrototypes } from '#server/prototypes/prototypes';
import { AnnotationsService } from '#server/review/annotations/annotations.service';
import { DecisionsService } from '#server/review/decisions/decisions.service';
import { SharesService } from '#server/sharing/shares.service';

import { demoCell, demoLattices, type DemoLattice } from './demo-lattices.js';
import type { DemoPersonKey } from './demo-people.js';

/** Lets each of the demo's people act as if they had sent the request themselves. */
export type DemoCast = Readonly<Record<DemoPersonKey, RequestContext>>;

const first = '1';

/** Plays through what the demo's group has done so far, by the services everyone uses. */
@Injectable()
export class DemoStoryService {
  constructor(
    private readonly lattices: LatticesService,
    private readonly drafts: DraftsService,
    private readonly saving: SaveRevisionService,
    private readonly decisions: DecisionsService,
    private readonly annotations: AnnotationsService,
    private readonly shares: SharesService,
  ) {}

  async play(cast: DemoCast): Promise<void> {
    const prototypes = readPrototypes();
    for (const lattice of demoLattices) {
      await this.bring(cast, lattice, demoCell(lattice, prototypes));
    }
  }

  /** Brings one lattice as far as it has come. */
  private async bring(cast: DemoCast, lattice: DemoLattice, cell: CellDefinition): Promise<void> {
    const author = cast[lattice.author];
    const { name, prototype, tags, note, progress } = lattice;
    const asked = { name, prototype, tags: [...tags], cell, method: defaultEvaluationMethod };
    const { id } = await this.lattices.create(author, asked);
    if (progress === 'draft') {
      return;
    }
    const etag = etagOf(await this.drafts.read(author, id));
    const saved = await this.saving.save(author, id, etag, note);
    if (progress === 'saved') {
      return;
    }
    await this.decisions.submit(author, id, first);
    if (progress === 'in_review') {
      await this.discuss(cast, id, saved);
    } else if (progress === 'returned') {
      await this.sendBack(cast, id);
    } else {
      await this.decisions.accept(cast.sabela, id, first, 'Agrees with the tables.');
      await this.shares.create(author, id, first, null);
    }
  }

  private async discuss(cast: DemoCast, id: string, saved: EvaluatedRevision): Promise<void> {
    const row = saved.evaluation!.result.pairLedger.rows[0]!;
    const remark = await this.annotations.create(cast.sabela, id, first, {
      anchor: { kind: 'pair', key: row.key },
      text: 'Is 2.106 Å from the powder data, or half of a rounded edge?',
    });
    await this.annotations.reply(
      cast.teodor,
      id,
      remark.id,
      'Half of the edge, 4.212 Å, which is the measured one.',
    );
  }

  private async sendBack(cast: DemoCast, id: string): Promise<void> {
    const site = await this.annotations.create(cast.sabela, id, first, {
      anchor: { kind: 'site', label: 'O1' },
      text: 'u decides which of the two Ti–O distances is the shorter one. Name its source.',
    });
    await this.annotations.reply(
      cast.teodor,
      id,
      site.id,
      'From memory so far; I will look it up.',
    );
    const whole = await this.annotations.create(cast.sabela, id, first, {
      anchor: { kind: 'revision' },
      text: 'Say in the note which temperature the edges belong to.',
    });
    await this.annotations.settle(cast.sabela, id, whole.id, 'resolve');
    const reason = 'The energy hangs on u, so it can’t be accepted before u has a source.';
    await this.decisions.return(cast.sabela, id, first, reason);
  }
}
