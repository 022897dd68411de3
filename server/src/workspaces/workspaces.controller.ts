import { Body, Controller, Get, Patch } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import {
  updateWorkspaceRequest,
  workspaceDetail,
  workspaceList,
  type WorkspaceDetail,
} from '#common/schemas/workspace';
import { Allow, Context, SignedIn } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext, UserContext } from '#server/http/request-context';

import { presentWorkspace } from './workspace.presenter.js';
import { WorkspacesService } from './workspaces.service.js';

@ApiTags('workspaces')
@Controller('workspaces')
export class WorkspacesController {
  constructor(private readonly service: WorkspacesService) {}

  @Get()
  @SignedIn()
  @Answers(workspaceList)
  async list(@Context() context: UserContext): Promise<z.infer<typeof workspaceList>> {
    const rows = await this.service.listOwn(context);
    return { items: rows.map((row) => presentWorkspace(row, row.role)) };
  }

  @Get(':workspace')
  @Allow('workspace.read')
  @Answers(workspaceDetail)
  async read(@Context() context: RequestContext): Promise<WorkspaceDetail> {
    return presentWorkspace(await this.service.read(context), context.actor.role);
  }

  @Patch(':workspace')
  @Allow('workspace.update')
  @Answers(workspaceDetail)
  async update(
    @Context() context: RequestContext,
    @Body({ schema: updateWorkspaceRequest }) body: z.infer<typeof updateWorkspaceRequest>,
  ): Promise<WorkspaceDetail> {
    return presentWorkspace(await this.service.update(context, body), context.actor.role);
  }
}
