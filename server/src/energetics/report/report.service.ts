import { Inject, Injectable } from '@nestjs/common';

import type { LatticeReport } from '#common/schemas/report';
import { noOverrides } from '#common/chemistry/sourced';
import { Clock } from '#server/config/clock';
import { APP_CONFIG, type AppConfig } from '#server/config/environment';
import { assertCan, type RequestContext } from '#server/http/request-context';
import { presentRevisionDetail } from '#server/lattices/revisions/revision.presenter';
import { RevisionsService } from '#server/lattices/revisions/revisions.service';
import { AnnotationsService } from '#server/review/annotations/annotations.service';
import { presentSharedRevision } from '#server/sharing/share.presenter';
import { SharesService } from '#server/sharing/shares.service';
import { DataValuesService } from '#server/workspaces/data-values/data-values.service';

import { composeReport } from './compose-report.js';

@Injectable()
export class ReportService {
  constructor(
    private readonly revisions: RevisionsService,
    private readonly annotations: AnnotationsService,
    private readonly shares: SharesService,
    private readonly dataValues: DataValuesService,
    private readonly clock: Clock,
    @Inject(APP_CONFIG) private readonly config: AppConfig,
  ) {}

  /**
   * The report of a revision.
   * @throws {Problem} `revision.not_found`
   */
  async read(context: RequestContext, latticeId: string, number: string): Promise<LatticeReport> {
    assertCan(context, 'lattice.read');
    const evaluated = await this.revisions.read(context, latticeId, number);
    const [remarks, overrides] = await Promise.all([
      this.annotations.list(context, latticeId, number),
      this.dataValues.overridesOf(context.workspace.id),
    ]);
    const resolved = remarks.filter(({ resolvedAt }) => resolvedAt !== null).length;
    const page = `/w/${context.workspace.slug}/lattices/${latticeId}?rev=${number}`;
    return composeReport({
      revision: presentRevisionDetail(evaluated),
      workspaceName: context.workspace.name,
      overrides,
      remarks: { open: remarks.length - resolved, resolved },
      address: `${this.config.publicOrigins[0] ?? ''}${page}`,
      madeAt: this.clock.now(),
    });
  }

  /**
   * The report that the holder of a link gets: what the link shows, with shipped values only.
   * @throws {Problem} `share.not_found`
   */
  async readShared(token: string): Promise<LatticeReport> {
    const shared = presentSharedRevision(await this.shares.open(token));
    return composeReport({
      revision: shared.revision,
      workspaceName: shared.workspaceName,
      overrides: noOverrides,
      remarks: null,
      address: null,
      madeAt: this.clock.now(),
    });
  }
}
