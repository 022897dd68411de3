import { composition } from '#common/physics/composition';
import { chargeSumE, shortestContacts } from '#common/physics/cell-summary';
import {
  buildPairLedger,
  shortestUnlike,
  speciesOfCell,
  type SpeciesOfCell,
} from '#common/physics/pair-ledger';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationMethod } from '#common/schemas/cell';
import type { EvaluationResult, Species } from '#common/schemas/evaluation';
import { GRAM_PER_MOL_CUBIC_ANGSTROM_IN_GRAM_PER_CM3 } from '#common/units/constants';

import { engineVersion, evaluateElectrostatics } from './engine/index.js';
import { madelungConstants } from './results/madelung.js';
import { refuseCoincident, refuseUnfit } from './results/refusals.js';
import { rowsWithShells, siteTable } from './results/site-table.js';
import { warningsFor } from './results/warnings.js';

/** The space group a result names; null where the cell gives bare operations. */
export interface SpaceGroupName {
  readonly spaceGroupNumber: number | null;
  readonly spaceGroupSymbol: string | null;
}

function listSpecies(cell: ResolvedCell, species: SpeciesOfCell, units: number): Species[] {
  return species.keys.map((key, k) => {
    const sites = cell.sites.filter((site) => site.speciesKey === key);
    return {
      key,
      element: sites[0]!.element,
      charge: species.chargesE[k]!,
      perFormulaUnit: sites.length / units,
      isMixed: sites[0]!.components.length > 1 || sites[0]!.components[0]!.occupancy < 1,
    };
  });
}

function sumCell(cell: ResolvedCell, species: SpeciesOfCell, method: EvaluationMethod) {
  return evaluateElectrostatics({
    vectorsA: cell.vectorsA,
    fractional: Float64Array.from(cell.sites.flatMap(({ fractional }) => [...fractional])),
    chargesE: Float64Array.from(cell.sites, ({ chargeE }) => chargeE),
    speciesIndex: species.indexOfSite,
    speciesCount: species.keys.length,
    toleranceRelative: method.toleranceRelative,
    uniformBackground: method.uniformBackground,
  });
}

/**
 * Everything electrostatic about one cell: energy with bound, Madelung constants, site table, pair
 * ledger, sublattice matrix, stress and the certificate. Energies per formula unit unless the name
 * says otherwise. A pure function of its arguments.
 *
 * @throws Problem `cell.no_sites`, `cell.no_charges`, `cell.not_neutral`, `cell.too_many_sites`,
 *   `cell.coincident_sites`, with field paths relative to the cell
 */
export function evaluateCell(
  cell: ResolvedCell,
  method: EvaluationMethod,
  spaceGroup: SpaceGroupName,
): EvaluationResult {
  refuseUnfit(cell, method);
  refuseCoincident(cell, shortestContacts(cell, 1)[0]);
  const { formula, formulaUnitsPerCell: units, massGPerMol } = composition(cell);
  const species = speciesOfCell(cell);
  const sums = sumCell(cell, species, method);
  const energyEv = sums.energyEv / units;
  const energyBoundEv = sums.energyBoundEv / units;
  const speciesList = listSpecies(cell, species, units);
  const unlike = shortestUnlike(cell);
  const ledger = buildPairLedger(cell, energyEv, units);
  const sites = siteTable(cell, sums, ledger.reachA);
  const density =
    ((massGPerMol * units) / cell.volumeA3) * GRAM_PER_MOL_CUBIC_ANGSTROM_IN_GRAM_PER_CM3;
  return {
    engine: engineVersion,
    method,
    formula,
    formulaUnitsPerCell: units,
    sitesPerCell: cell.sites.length,
    volumeA3: cell.volumeA3,
    densityGPerCm3: Number.isFinite(density) ? density : null,
    ...spaceGroup,
    shortestDistanceA: sums.shortestDistanceA,
    shortestUnlikeDistanceA: unlike?.distanceA ?? null,
    shortestUnlikePair: unlike && [
      cell.sites[unlike.siteA]!.label,
      cell.sites[unlike.siteB]!.label,
    ],
    energyEvPerCell: { value: sums.energyEv, bound: sums.energyBoundEv },
    energyEvPerFormulaUnit: { value: energyEv, bound: energyBoundEv },
    relativeErrorBound: sums.energyBoundEv / Math.abs(sums.energyEv),
    madelung: madelungConstants({
      energyEv,
      energyBoundEv,
      shortestUnlikeA: unlike?.distanceA ?? null,
      firstEdgeA: cell.lattice.aA,
      ions: speciesList
        .filter(({ charge }) => charge !== 0)
        .map(({ charge, perFormulaUnit }) => ({ chargeE: charge, perFormulaUnit })),
    }),
    potentialBoundV: sums.potentialBoundV,
    species: speciesList,
    sites,
    stressEvPerA3: [...sums.stressEvPerA3],
    stressBoundEvPerA3: sums.stressBoundEvPerA3,
    pairLedger: ledger,
    sublatticeMatrix: {
      speciesKeys: [...species.keys],
      energiesEv: sums.speciesMatrixEv.map((row) => row.map((value) => value / units)),
      boundEv: sums.speciesMatrixBoundEv / units,
    },
    certificate: { ...sums.certificate, splittingPerA: [...sums.certificate.splittingPerA] },
    hasPolarAxis: cell.hasPolarAxis,
    warnings: warningsFor(cell, method, {
      shortestDistanceA: sums.shortestDistanceA,
      chargeSumE: chargeSumE(cell),
      agrees: sums.certificate.agrees,
      shellsLeftOut: Math.max(0, sites.length - rowsWithShells),
    }),
  };
}
