import { Problem, type FieldProblem } from '#common/errors/problem';
import { chargeSumE } from '#common/physics/cell-summary';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import { cellLimits, type EvaluationMethod } from '#common/schemas/cell';

const rowsNamed = 6;
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
  return [...rows].slice(0, rowsNamed).map(([index, { label, charge, weight, parts }]) => ({
    code: 'cell.not_neutral',
    field: `sites.${index}.charge`,
    message:
      `The cell has an excess of ${signed(excess)}. ${label} (${parts} in the cell) at ` +
      `${signed(charge - excess / weight)} instead of ${signed(charge)} would balance it.`,
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

/**
 * Refuses a cell in which two sites all but coincide.
 * @throws Problem `cell.coincident_sites`
 */
export function refuseCoincident(
  cell: ResolvedCell,
  contact: { labelA: string; labelB: string; distanceA: number } | undefined,
): void {
  if (contact === undefined || contact.distanceA > closestAllowedA) {
    return;
  }
  const { labelA, labelB, distanceA } = contact;
  const index = cell.sites.find(({ label }) => label === labelB)?.definitionIndex ?? 0;
  const message = `${labelB} lies on ${labelA} (${distanceA.toExponential(1)} Å apart): move or remove one.`;
  throw new Problem('cell.coincident_sites', message, {
    fields: [{ code: 'cell.coincident_sites', field: `sites.${index}.x`, message }],
  });
}
