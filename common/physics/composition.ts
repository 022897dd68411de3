import { findElement } from '#common/chemistry/elements';
import type { ResolvedCell } from '#common/physics/resolved-cell';

/** What the cell is made of, per formula unit. */
export interface Composition {
  /** Cations first, then anions, each in order of first appearance: `MgAl2O4`. */
  readonly formula: string;
  /** Z, the number of formula units in the cell. */
  readonly formulaUnitsPerCell: number;
  readonly massGPerMol: number;
  readonly parts: readonly { readonly element: string; readonly count: number }[];
}

const isWhole = (value: number) => Math.abs(value - Math.round(value)) < 1e-6;

function greatestCommonDivisor(values: readonly number[]): number {
  return values.reduce((a, b) => {
    let [x, y] = [a, b];
    while (y > 0) {
      [x, y] = [y, x % y];
    }
    return x;
  }, 0);
}

function countBy<T>(items: readonly T[], key: (item: T) => string, weight: (item: T) => number) {
  const counts = new Map<string, number>();
  for (const item of items) {
    counts.set(key(item), (counts.get(key(item)) ?? 0) + weight(item));
  }
  return counts;
}

/** A count as formulas write it: nothing for one, at most four decimals. */
function formatCount(count: number): string {
  const rounded = Number(count.toFixed(4));
  return rounded === 1 ? '' : String(rounded);
}

/**
 * Z: the greatest common divisor of the numbers of atoms; where sites are shared or partly empty,
 * that of the numbers of places of each kind, so that mixed crystals read Mg0.75Fe0.25O.
 */
function formulaUnits(cell: ResolvedCell, elementCounts: ReadonlyMap<string, number>): number {
  const counts = [...elementCounts.values()];
  const isOrdered = cell.sites.every(
    ({ components }) => components.length === 1 && components[0]!.occupancy === 1,
  );
  if (isOrdered && counts.every(isWhole)) {
    return Math.max(1, greatestCommonDivisor(counts.map(Math.round)));
  }
  const places = countBy(
    cell.sites,
    ({ speciesKey }) => speciesKey,
    () => 1,
  );
  return Math.max(1, greatestCommonDivisor([...places.values()]));
}

/**
 * Formula, formula units and molar mass of a cell.
 *
 * @param cell at least one site
 */
export function composition(cell: ResolvedCell): Composition {
  const components = cell.sites.flatMap((site) => site.components);
  const counts = countBy(
    components,
    ({ element }) => element,
    ({ occupancy }) => occupancy,
  );
  const charges = countBy(
    components,
    ({ element }) => element,
    ({ chargeE, occupancy }) => chargeE * occupancy,
  );
  const formulaUnitsPerCell = formulaUnits(cell, counts);
  const rank = (element: string) => {
    const charge = charges.get(element)!;
    return charge > 0 ? 0 : charge === 0 ? 1 : 2;
  };
  const parts = [...counts]
    .map(([element, count]) => ({ element, count: count / formulaUnitsPerCell }))
    .sort((a, b) => rank(a.element) - rank(b.element));
  return {
    formula: parts.map(({ element, count }) => `${element}${formatCount(count)}`).join(''),
    formulaUnitsPerCell,
    massGPerMol: parts.reduce(
      (mass, { element, count }) => mass + count * (findElement(element)?.massGPerMol ?? NaN),
      0,
    ),
    parts,
  };
}
