import { Problem } from '#common/errors/problem';
import { chargeSumE } from '#common/physics/cell-summary';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import { dynamicsLimits } from '#common/schemas/dynamics';
import type { PairPotential } from '#common/schemas/energetics';

import { refuseCoincident } from '#server/electrostatics/results/refusals';

function refuse(
  code: 'cell.no_sites' | 'cell.too_many_sites' | 'cell.not_neutral',
  field: string,
  message: string,
): Problem {
  return new Problem(code, message, { fields: [{ code, field, message }] });
}

/** Two rows for one pair of species contradict each other. */
function refuseTwiceGiven(pairs: readonly PairPotential[]): void {
  const seen = new Set<string>();
  pairs.forEach(({ speciesA, speciesB }, row) => {
    const key = [speciesA, speciesB].sort().join(' ');
    if (seen.has(key)) {
      const message = `${speciesA} and ${speciesB} have two rows: keep one.`;
      const field = `model.repulsion.pairs.${row}.speciesB`;
      throw new Problem('request.invalid', message, {
        fields: [{ code: 'request.invalid', field, message }],
      });
    }
    seen.add(key);
  });
}

/**
 * Refuses what a pair model can't be applied to, before any sum is taken.
 * @throws Problem `cell.no_sites`, `cell.too_many_sites`, `cell.not_neutral`,
 *   `cell.coincident_sites`, `request.invalid` for a pair of species given twice
 */
export function refuseUnfitForDynamics(cell: ResolvedCell, pairs: readonly PairPotential[]): void {
  const { sites } = cell;
  if (sites.length === 0) {
    throw refuse('cell.no_sites', 'sites', 'Add at least one site: an element and its charge.');
  }
  if (sites.length > dynamicsLimits.sites) {
    throw refuse(
      'cell.too_many_sites',
      'sites',
      `The cell has ${sites.length} sites; relaxation, elastic constants and vibrations take at ` +
        `most ${dynamicsLimits.sites}.`,
    );
  }
  const excess = chargeSumE(cell);
  if (excess !== 0) {
    throw refuse(
      'cell.not_neutral',
      'sites',
      `The charges add up to ${Number(excess.toFixed(6))}: ions can’t move in a charged cell. ` +
        'Change a charge.',
    );
  }
  refuseCoincident(cell);
  refuseTwiceGiven(pairs);
}
