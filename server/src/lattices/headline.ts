import type { CellOutcome } from '#server/electrostatics/evaluations.service';

import type { LatticeRow } from './lattice.table.js';

/** The draft a headline is about. */
export interface DraftRef {
  readonly workspaceId: string;
  readonly latticeId: string;
  readonly version: number;
}

/** What the shelf says of a cell. */
export type Headline = Pick<
  LatticeRow,
  | 'formula'
  | 'spaceGroupNumber'
  | 'spaceGroupSymbol'
  | 'madelungReduced'
  | 'madelungReducedBound'
  | 'energyEvPerFormulaUnit'
  | 'energyBoundEvPerFormulaUnit'
  | 'problemCode'
>;

/** The headline of a cell that can't be read at all. */
export const headlineOfUnreadable = (problemCode: string): Headline => ({
  formula: null,
  spaceGroupNumber: null,
  spaceGroupSymbol: null,
  madelungReduced: null,
  madelungReducedBound: null,
  energyEvPerFormulaUnit: null,
  energyBoundEvPerFormulaUnit: null,
  problemCode,
});

/** The headline of a cell that can be read, evaluated or not. */
export function headlineOf({ identity, evaluation, problem }: CellOutcome): Headline {
  const { formula, spaceGroupNumber, spaceGroupSymbol } = identity;
  const result = evaluation?.result;
  const { value = null, bound = null } = result?.madelung.reduced ?? {};
  return {
    formula,
    spaceGroupNumber,
    spaceGroupSymbol,
    madelungReduced: bound === null ? null : value,
    madelungReducedBound: value === null ? null : bound,
    energyEvPerFormulaUnit: result?.energyEvPerFormulaUnit.value ?? null,
    energyBoundEvPerFormulaUnit: result?.energyEvPerFormulaUnit.bound ?? null,
    problemCode: problem?.code ?? null,
  };
}
