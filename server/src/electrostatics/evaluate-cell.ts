import { composition } from '#common/physics/composition';
import { chargeSumE } from '#common/physics/cell-summary';
import {
  defaultGroupingA,
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
import { resultLedger } from './results/result-ledger.js';
import { copySpreadV, rowsWithShells, siteTable } from './results/site-table.js';
import { sublatticesOf, type Sublattices } from './results/sublattices.js';
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

function sumCell(cell: ResolvedCell, sublattices: Sublattices, method: EvaluationMethod) {
  return evaluateElectrostatics({
    vectorsA: cell.vectorsA,
    fractional: Float64Array.from(cell.sites.flatMap(({ fractional }) => [...fractional])),
    chargesE: Float64Array.from(cell.sites, ({ chargeE }) => chargeE),
    speciesIndex: sublattices.indexOfSite,
    speciesCount: sublattices.keys.length,
    toleranceRelative: method.toleranceRelative,
    uniformBackground: method.uniformBackground,
  });
}

type EngineSums = ReturnType<typeof sumCell>;

/** Energies with bounds, and the four Madelung constants that follow from them. */
function energies(
  cell: ResolvedCell,
  sums: EngineSums,
  species: readonly Species[],
  units: number,
): Pick<
  EvaluationResult,
  | 'shortestUnlikeDistanceA'
  | 'shortestUnlikePair'
  | 'energyEvPerCell'
  | 'energyEvPerFormulaUnit'
  | 'relativeErrorBound'
  | 'madelung'
> {
  const unlike = shortestUnlike(cell);
  const { energyEv, energyBoundEv } = sums;
  const perUnit = { value: energyEv / units, bound: energyBoundEv / units };
  return {
    shortestUnlikeDistanceA: unlike?.distanceA ?? null,
    shortestUnlikePair: unlike && [
      cell.sites[unlike.siteA]!.label,
      cell.sites[unlike.siteB]!.label,
    ],
    energyEvPerCell: { value: energyEv, bound: energyBoundEv },
    energyEvPerFormulaUnit: perUnit,
    relativeErrorBound: energyEv === 0 ? 1 : energyBoundEv / Math.abs(energyEv),
    madelung: madelungConstants({
      energyEv: perUnit.value,
      energyBoundEv: perUnit.bound,
      shortestUnlikeA: unlike?.distanceA ?? null,
      firstEdgeA: cell.lattice.aA,
      ions: species
        .filter(({ charge }) => charge !== 0)
        .map(({ charge, perFormulaUnit }) => ({ chargeE: charge, perFormulaUnit })),
    }),
  };
}

function densityGPerCm3(cell: ResolvedCell, massGPerMolPerCell: number): number | null {
  const density =
    (massGPerMolPerCell / cell.volumeA3) * GRAM_PER_MOL_CUBIC_ANGSTROM_IN_GRAM_PER_CM3;
  return Number.isFinite(density) ? density : null;
}

/** Energies of the sublattice matrix per formula unit, and the certificate, as plain data. */
function matrixAndCertificate(sums: EngineSums, sublattices: Sublattices, units: number) {
  return {
    sublatticeMatrix: {
      speciesKeys: [...sublattices.keys],
      energiesEv: sums.speciesMatrixEv.map((row) => row.map((value) => value / units)),
      boundEv: sums.speciesMatrixBoundEv / units,
    },
    certificate: { ...sums.certificate, splittingPerA: [...sums.certificate.splittingPerA] },
  };
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
  refuseCoincident(cell);
  const { formula, formulaUnitsPerCell: units, massGPerMol } = composition(cell);
  const kinds = speciesOfCell(cell);
  const sublattices = sublatticesOf(kinds);
  const sums = sumCell(cell, sublattices, method);
  const species = listSpecies(cell, kinds, units);
  const { ledger, groupingA } = resultLedger(cell, sums.energyEv / units, units);
  const sites = siteTable(cell, sums, ledger.reachA);
  return {
    engine: engineVersion,
    method,
    formula,
    formulaUnitsPerCell: units,
    sitesPerCell: cell.sites.length,
    volumeA3: cell.volumeA3,
    densityGPerCm3: densityGPerCm3(cell, massGPerMol * units),
    spaceGroupNumber: spaceGroup.spaceGroupNumber,
    spaceGroupSymbol: spaceGroup.spaceGroupSymbol,
    shortestDistanceA: sums.shortestDistanceA,
    ...energies(cell, sums, species, units),
    potentialBoundV: sums.potentialBoundV,
    species,
    sites,
    stressEvPerA3: [...sums.stressEvPerA3],
    stressBoundEvPerA3: sums.stressBoundEvPerA3,
    pairLedger: ledger,
    ...matrixAndCertificate(sums, sublattices, units),
    hasPolarAxis: cell.hasPolarAxis,
    warnings: warningsFor(cell, method, {
      shortestDistanceA: sums.shortestDistanceA,
      chargeSumE: chargeSumE(cell),
      agrees: sums.certificate.agrees,
      shellsLeftOut: Math.max(0, sites.length - rowsWithShells),
      widerGroupingA: groupingA > defaultGroupingA ? groupingA : null,
      areSublatticesMerged: sublattices.areMerged,
      copySpreadV: copySpreadV(cell, sums.potentialsV),
    }),
  };
}
