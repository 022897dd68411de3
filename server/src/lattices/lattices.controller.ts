import { Body, Controller, Delete, Get, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import {
  createLatticeRequest,
  latticeSummary,
  shelfPage,
  shelfQuery,
  updateLatticeRequest,
  type CreateLatticeRequest,
  type LatticeSummary,
  type ShelfPage,
  type ShelfQuery,
} from '#common/schemas/lattice';
import { done } from '#common/schemas/shared';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentLattice } from './lattice.presenter.js';
import { LatticesService } from './lattices.service.js';

@ApiTags('lattices')
@Controller('workspaces/:workspace/lattices')
export class LatticesController {
  constructor(private readonly service: LatticesService) {}

  @Get()
  @Allow('lattice.read')
  @Answers(shelfPage)
  async list(
    @Context() context: RequestContext,
    @Query({ schema: shelfQuery }) query: ShelfQuery,
  ): Promise<ShelfPage> {
    const { rows, total } = await this.service.list(context, query);
    const { page, pageSize } = query;
    return { items: rows.map(presentLattice), page, pageSize, total };
  }

  @Post()
  @Allow('lattice.create')
  @Answers(latticeSummary, 201)
  async create(
    @Context() context: RequestContext,
    @Body({ schema: createLatticeRequest }) body: CreateLatticeRequest,
  ): Promise<LatticeSummary> {
    return presentLattice(await this.service.create(context, body));
  }

  @Get(':lattice')
  @Allow('lattice.read')
  @Answers(latticeSummary)
  async read(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
  ): Promise<LatticeSummary> {
    return presentLattice(await this.service.read(context, lattice));
  }

  @Patch(':lattice')
  @Allow('lattice.update')
  @Answers(latticeSummary)
  async update(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Body({ schema: updateLatticeRequest }) body: z.infer<typeof updateLatticeRequest>,
  ): Promise<LatticeSummary> {
    return presentLattice(await this.service.update(context, lattice, body));
  }

  @Delete(':lattice')
  @Allow('lattice.delete')
  @Answers(done)
  async remove(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
  ): Promise<z.infer<typeof done>> {
    await this.service.remove(context, lattice);
    return { ok: true };
  }

  @Post(':lattice/restore')
  @Allow('lattice.restore')
  @Answers(latticeSummary)
  async restore(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
  ): Promise<LatticeSummary> {
    return presentLattice(await this.service.restore(context, lattice));
  }
}
