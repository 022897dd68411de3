import { Problem, type FieldProblem } from '#common/errors/problem';
import { chargeSumE } from '#common/physics/cell-summary';
import { buildNeighbourGrid, forEachNeighbour } from '#common/physics/neighbours';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import { cellLimits, type EvaluationMethod } from '#common/schemas/cell';

/** Rows of the site table named as ways to balance a charged cell. */
const rowsNamed = 6;

/** Charges a row may have. */
const largestChargeE = 9;

/** Closer than this, two sites are one place. */
const closestAllowedA = 1e-3;

/** A charge as read: +2, −0.5. */
function signed(value: number): string {
  const size = String(Number(Math.abs(value).toFixed(6)));
  return value < 0 ? `−${size}` : `+${size}`;
}

/** For each row of the site table, the charge that alone would make the cell neutral. */
function neutralisingRows(cell: ResolvedCell, excess: number): FieldProblem[] {
  const rows = new Map<number, { label: string; charge: number; weight: number; parts: number }>();
  for (const { definitionIndex, label, components } of cell.sites) {
    const [first] = components;
    const known = rows.get(definitionIndex);
    if (known === undefined) {
      rows.set(definitionIndex, {
        label,
        charge: first!.chargeE,
        weight: first!.occupancy,
        parts: 1,
      });
    } else {
      known.weight += first!.occupancy;
      known.parts += 1;
    }
  }
  const options = [...rows].map(([index, row]) => ({
    index,
    ...row,
    balanced: row.charge - excess / row.weight,
  }));
  const possible = options.filter(({ balanced }) => Math.abs(balanced) <= largestChargeE);
  return (possible.length > 0 ? possible : options)
    .slice(0, rowsNamed)
    .map(({ index, label, charge, parts, balanced }) => ({
      code: 'cell.not_neutral',
      field: `sites.${index}.charge`,
      message:
        `The cell has an excess of ${signed(excess)}. ${label} (${parts} in the cell) at ` +
        `${signed(balanced)} instead of ${signed(charge)} would balance it.`,
    }));
}

function refuse(code: 'cell.no_sites' | 'cell.no_charges' | 'cell.too_many_sites', text: string) {
  return new Problem(code, text, { fields: [{ code, field: 'sites', message: text }] });
}

/**
 * Refuses cells that have no Madelung energy or that are too large.
 * @throws Problem `cell.no_sites`, `cell.too_many_sites`, `cell.no_charges`, `cell.not_neutral`
 */
export function refuseUnfit(cell: ResolvedCell, method: EvaluationMethod): void {
  if (cell.sites.length === 0) {
    throw refuse('cell.no_sites', 'Add at least one site: an element, its charge and where it is.');
  }
  if (cell.sites.length > cellLimits.expandedSites) {
    throw refuse(
      'cell.too_many_sites',
      `The cell has ${cell.sites.length} sites; at most ${cellLimits.expandedSites} are taken.`,
    );
  }
  if (cell.sites.every(({ chargeE }) => chargeE === 0)) {
    throw refuse('cell.no_charges', 'Every charge is zero: give the ions their charges.');
  }
  const excess = chargeSumE(cell);
  if (excess !== 0 && !method.uniformBackground) {
    throw new Problem(
      'cell.not_neutral',
      `The charges add up to ${signed(excess)}, so the cell has no Madelung energy. Change a ` +
        'charge, or switch on the uniform background for charged-defect work.',
      { fields: neutralisingRows(cell, excess) },
    );
  }
}

/** The two sites that lie closest together, if closer than a limit. */
function closestWithin(
  cell: ResolvedCell,
  limitA: number,
): { siteA: number; siteB: number; distanceA: number } | null {
  const fractional = Float64Array.from(cell.sites.flatMap((site) => [...site.fractional]));
  const grid = buildNeighbourGrid(cell.vectorsA, fractional, limitA);
  let closest: { siteA: number; siteB: number; distanceA: number } | null = null;
  for (let siteA = 0; siteA < cell.sites.length; siteA += 1) {
    forEachNeighbour(grid, siteA, limitA, (siteB, distanceA) => {
      if (siteA <= siteB && (closest === null || distanceA < closest.distanceA)) {
        closest = { siteA, siteB, distanceA };
      }
    });
  }
  return closest;
}

/**
 * Refuses a cell in which two sites all but coincide.
 * @throws Problem `cell.coincident_sites`, the field being the later row of the two
 */
export function refuseCoincident(cell: ResolvedCell): void {
  const closest = closestWithin(cell, closestAllowedA);
  if (closest === null) {
    return;
  }
  const [first, second] = [cell.sites[closest.siteA]!, cell.sites[closest.siteB]!];
  const later = first.definitionIndex > second.definitionIndex ? first : second;
  const other = later === first ? second : first;
  const message =
    later.definitionIndex === other.definitionIndex
      ? `Two copies of ${later.label} lie on one place: put it exactly on the symmetry element, or off it.`
      : `${later.label} lies on ${other.label} (${closest.distanceA.toExponential(1)} Å apart): move or remove one.`;
  const field = `sites.${later.definitionIndex}.x`;
  throw new Problem('cell.coincident_sites', message, {
    fields: [{ code: 'cell.coincident_sites', field, message }],
  });
}
