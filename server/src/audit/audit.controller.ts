import { Controller, Get, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import { pageQuery, type PageQuery } from '#common/schemas/shared';
import { auditPage } from '#common/schemas/workspace';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentAuditEvent } from './audit.presenter.js';
import { AuditService } from './audit.service.js';

@ApiTags('workspaces')
@Controller('workspaces/:workspace/audit')
export class AuditController {
  constructor(private readonly audit: AuditService) {}

  @Get()
  @Allow('audit.read')
  @Answers(auditPage)
  async list(
    @Context() context: RequestContext,
    @Query({ schema: pageQuery }) query: PageQuery,
  ): Promise<z.infer<typeof auditPage>> {
    const { rows, total } = await this.audit.list(context, query);
    return { items: rows.map(presentAuditEvent), ...query, total };
  }
}
