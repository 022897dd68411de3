import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationMethod } from '#common/schemas/cell';
import type { Warning } from '#common/schemas/evaluation';

const closeContactA = 0.8;

/** What a reader of the numbers must know. */
export function warningsFor(
  cell: ResolvedCell,
  method: EvaluationMethod,
  facts: { shortestDistanceA: number; chargeSumE: number; agrees: boolean; shellsLeftOut: number },
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
  return warnings;
}
