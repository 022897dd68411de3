import type { ResolvedCell } from '#common/physics/resolved-cell';
import { buildShellTable } from '#common/physics/shell-table';
import type { SiteResult } from '#common/schemas/evaluation';

/** Rows of the site table that carry their shells; the rest are drawn up on demand. */
export const rowsWithShells = 60;

/** The sums at the sites, in the order of `cell.sites`. */
export interface SiteSums {
  readonly potentialsV: Float64Array;
  readonly fieldsVPerA: Float64Array;
  readonly forcesEvPerA: Float64Array;
}

/**
 * The largest difference between the potentials of two copies of one row, V. Copies made by a space
 * group see the same surroundings; those of operations that are no group need not.
 */
export function copySpreadV(cell: ResolvedCell, potentialsV: Float64Array): number {
  const range = new Map<number, { least: number; most: number }>();
  cell.sites.forEach(({ definitionIndex }, index) => {
    const value = potentialsV[index]!;
    const known = range.get(definitionIndex);
    if (known === undefined) {
      range.set(definitionIndex, { least: value, most: value });
    } else {
      known.least = Math.min(known.least, value);
      known.most = Math.max(known.most, value);
    }
  });
  return [...range.values()].reduce((most, row) => Math.max(most, row.most - row.least), 0);
}

/** One row per place of the definition: its first copy, and how many copies there are. */
export function siteTable(cell: ResolvedCell, sums: SiteSums, reachA: number): SiteResult[] {
  const copies = new Map<number, { index: number; multiplicity: number }>();
  cell.sites.forEach(({ definitionIndex }, index) => {
    const known = copies.get(definitionIndex);
    if (known === undefined) {
      copies.set(definitionIndex, { index, multiplicity: 1 });
    } else {
      known.multiplicity += 1;
    }
  });
  return [...copies.values()].map(({ index, multiplicity }, row) => {
    const site = cell.sites[index]!;
    const potentialV = sums.potentialsV[index]!;
    return {
      definitionIndex: site.definitionIndex,
      label: site.label,
      speciesKey: site.speciesKey,
      element: site.element,
      charge: site.chargeE,
      multiplicity,
      fractional: [...site.fractional],
      potentialV,
      fieldVPerA: [...sums.fieldsVPerA.subarray(3 * index, 3 * index + 3)],
      forceEvPerA: [...sums.forcesEvPerA.subarray(3 * index, 3 * index + 3)],
      energyShareEv: 0.5 * site.chargeE * potentialV,
      shells: row < rowsWithShells ? buildShellTable(cell, index, reachA) : [],
    };
  });
}
