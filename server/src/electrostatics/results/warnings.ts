import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationMethod } from '#common/schemas/cell';
import type { Warning } from '#common/schemas/evaluation';

/** No two ions come closer; O–H, the shortest bond in crystals of this kind, is 0.96 Å. */
const closeContactA = 0.8;

/** Rounded cell parameters let copies differ in the fourth digit; more than this is no rounding. */
const noticeableSpreadV = 0.05;

/** What the warnings follow from, beside the cell and the method. */
interface ResultFacts {
  readonly shortestDistanceA: number;
  readonly chargeSumE: number;
  readonly agrees: boolean;
  readonly shellsLeftOut: number;
  /** Width of the ledger's distance groups where it is not the usual one, else null. */
  readonly widerGroupingA: number | null;
  readonly areSublatticesMerged: boolean;
  /** Largest difference between the potentials of two copies of one row. */
  readonly copySpreadV: number;
}

/** What a reader of the numbers must know. */
export function warningsFor(
  cell: ResolvedCell,
  method: EvaluationMethod,
  facts: ResultFacts,
): Warning[] {
  return [...warningsOfCell(cell, method, facts), ...warningsOfResult(facts)];
}

function warningsOfCell(
  cell: ResolvedCell,
  method: EvaluationMethod,
  facts: ResultFacts,
): Warning[] {
  const warnings: Warning[] = [];
  const isMixed = cell.sites.some(
    ({ components }) => components.length > 1 || components[0]!.occupancy < 1,
  );
  if (facts.chargeSumE !== 0 && method.uniformBackground) {
    warnings.push({
      code: 'evaluation.uniform_background',
      message:
        'The cell is charged: every number includes a uniform background of the opposite charge.',
    });
  }
  if (isMixed) {
    warnings.push({
      code: 'evaluation.mean_field',
      message: 'Shared or partly filled sites count with their mean charge (mean field).',
    });
  }
  if (cell.hasPolarAxis) {
    warnings.push({
      code: 'evaluation.polar_axis',
      message:
        'The symmetry leaves a polar axis. The energy is for conducting surroundings; a crystal summed in spheres differs by a surface term.',
    });
  }
  if (facts.shortestDistanceA < closeContactA) {
    warnings.push({
      code: 'evaluation.close_contact',
      message: `Two sites are only ${facts.shortestDistanceA.toFixed(3)} Å apart: no two ions come this close.`,
    });
  }
  if (facts.copySpreadV > noticeableSpreadV) {
    warnings.push({
      code: 'evaluation.copies_differ',
      message:
        'Copies of one site see different surroundings: the operations do not map this cell onto itself. A row of the site table shows its first copy.',
    });
  }
  return warnings;
}

function warningsOfResult(facts: ResultFacts): Warning[] {
  const warnings: Warning[] = [];
  if (!facts.agrees) {
    warnings.push({
      code: 'evaluation.certificate',
      message: 'The checks of this result do not agree within the tolerance: trust fewer digits.',
    });
  }
  if (facts.shellsLeftOut > 0) {
    warnings.push({
      code: 'evaluation.shells_left_out',
      message: `Shell tables of ${facts.shellsLeftOut} sites are left out of this result; they are drawn up when a site is picked.`,
    });
  }
  if (facts.widerGroupingA !== null) {
    warnings.push({
      code: 'evaluation.ledger_grouped',
      message: `The pair ledger has very many distances: those within ${facts.widerGroupingA} Å are one row here.`,
    });
  }
  if (facts.areSublatticesMerged) {
    warnings.push({
      code: 'evaluation.sublattices_merged',
      message: 'There are very many ion kinds: the sublattice matrix takes them by sign of charge.',
    });
  }
  return warnings;
}
