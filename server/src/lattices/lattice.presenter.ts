import type { Bounded } from '#common/schemas/evaluation';
import type { LatticeSummary } from '#common/schemas/lattice';
import { presentPerson } from '#server/users/person.presenter';

import type { ShelfRow } from './lattices.repository.js';

/** A number with its bound, if there is one. */
export const presentBounded = (value: number | null, bound: number | null): Bounded | null =>
  value === null || bound === null ? null : { value, bound };

export const presentLattice = (row: ShelfRow): LatticeSummary => ({
  id: row.id,
  name: row.name,
  tags: row.tags,
  formula: row.formula,
  prototype: row.prototype,
  spaceGroupSymbol: row.spaceGroupSymbol,
  spaceGroupNumber: row.spaceGroupNumber,
  madelungReduced: presentBounded(row.madelungReduced, row.madelungReducedBound),
  energyEvPerFormulaUnit: presentBounded(
    row.energyEvPerFormulaUnit,
    row.energyBoundEvPerFormulaUnit,
  ),
  problemCode: row.problemCode,
  state: row.state,
  headRevision: row.headRevision,
  hasDraft: row.hasDraft,
  openRemarks: row.openRemarks,
  author: presentPerson(row.author),
  createdAt: row.createdAt.toISOString(),
  updatedAt: row.updatedAt.toISOString(),
  deletedAt: row.deletedAt?.toISOString() ?? null,
});
