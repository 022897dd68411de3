import { composition } from '#common/physics/composition';
import { buildNeighbourGrid, forEachNeighbour } from '#common/physics/neighbours';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import { GRAM_PER_MOL_CUBIC_ANGSTROM_IN_GRAM_PER_CM3 } from '#common/units/constants';

/** A short distance between two rows of the site table. */
export interface Contact {
  readonly labelA: string;
  readonly labelB: string;
  readonly distanceA: number;
}

/** What is shown of a cell while it is being typed. */
export interface CellSummary {
  readonly formula: string;
  readonly formulaUnitsPerCell: number;
  readonly volumeA3: number;
  readonly densityGPerCm3: number;
  /** Sum of the charges over the cell; zero for a neutral one. */
  readonly chargeSumE: number;
  readonly contacts: readonly Contact[];
}

const contactsShown = 4;
const sitesLookedAt = 200;

/** Radius in Å that surely reaches a neighbour, from the room each site has. */
function searchRadiusA(cell: ResolvedCell): number {
  return Math.max(1.5, 1.6 * Math.cbrt(cell.volumeA3 / cell.sites.length));
}

/**
 * The shortest distances between different pairs of site-table rows, shortest first.
 * Looks at one copy of each row (at most 200 rows).
 */
export function shortestContacts(cell: ResolvedCell, shown = contactsShown): Contact[] {
  const radiusA = searchRadiusA(cell);
  const flat = cell.sites.flatMap((site) => [...site.fractional]);
  const grid = buildNeighbourGrid(cell.vectorsA, flat, radiusA);
  const best = new Map<string, Contact>();
  const firsts = cell.sites.map((_, index) => index).filter((i) => cell.sites[i]!.copy === 0);
  for (const i of firsts.slice(0, sitesLookedAt)) {
    const { label: labelA, definitionIndex } = cell.sites[i]!;
    forEachNeighbour(grid, i, radiusA, (j, distanceA) => {
      const other = cell.sites[j]!;
      const isFirst = definitionIndex <= other.definitionIndex;
      const [a, b] = isFirst ? [labelA, other.label] : [other.label, labelA];
      const key = `${a}|${b}`;
      const known = best.get(key);
      if (known === undefined || distanceA < known.distanceA) {
        best.set(key, { labelA: a, labelB: b, distanceA });
      }
    });
  }
  return [...best.values()].sort((a, b) => a.distanceA - b.distanceA).slice(0, shown);
}

/** Sum of the site charges with the rounding of thirds and the like taken out. */
export function chargeSumE(cell: ResolvedCell): number {
  const sum = cell.sites.reduce((total, site) => total + site.chargeE, 0);
  const size = cell.sites.reduce((total, site) => total + Math.abs(site.chargeE), 0);
  return Math.abs(sum) <= 1e-12 * size ? 0 : sum;
}

/** Formula, Z, volume, density, charge sum and shortest contacts of a cell with at least one site. */
export function summariseCell(cell: ResolvedCell): CellSummary {
  const { formula, formulaUnitsPerCell, massGPerMol } = composition(cell);
  const densityGPerCm3 =
    ((massGPerMol * formulaUnitsPerCell) / cell.volumeA3) *
    GRAM_PER_MOL_CUBIC_ANGSTROM_IN_GRAM_PER_CM3;
  return {
    formula,
    formulaUnitsPerCell,
    volumeA3: cell.volumeA3,
    densityGPerCm3,
    chargeSumE: chargeSumE(cell),
    contacts: shortestContacts(cell),
  };
}
