import { Body, Controller, Delete, Get, Param, Patch } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import { done } from '#common/schemas/shared';
import { changeRoleRequest, member, memberList, type Member } from '#common/schemas/workspace';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentMember } from './member.presenter.js';
import { MembersService } from './members.service.js';

@ApiTags('members')
@Controller('workspaces/:workspace/members')
export class MembersController {
  constructor(private readonly service: MembersService) {}

  @Get()
  @Allow('member.list')
  @Answers(memberList)
  async list(@Context() context: RequestContext): Promise<z.infer<typeof memberList>> {
    return { items: (await this.service.list(context)).map(presentMember) };
  }

  @Patch(':userId')
  @Allow('member.change_role')
  @Answers(member)
  async changeRole(
    @Context() context: RequestContext,
    @Param('userId') userId: string,
    @Body({ schema: changeRoleRequest }) body: z.infer<typeof changeRoleRequest>,
  ): Promise<Member> {
    return presentMember(await this.service.changeRole(context, userId, body.role));
  }

  /** Everyone may leave; the service asks for more when it is someone else who goes. */
  @Delete(':userId')
  @Allow('workspace.leave')
  @Answers(done)
  async remove(
    @Context() context: RequestContext,
    @Param('userId') userId: string,
  ): Promise<z.infer<typeof done>> {
    await this.service.remove(context, userId);
    return { ok: true };
  }
}
