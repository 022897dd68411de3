import { findElement } from '#common/chemistry/elements';
import type { FieldProblem } from '#common/errors/problem';
import {
  evaluateExpression,
  evaluateParameters,
  type ParameterValues,
} from '#common/expressions/evaluate-expression';
import { findMetricFault, groupFault } from '#common/physics/operation-checks';
import { resolveLattice } from '#common/physics/resolve-lattice';
import { resolveSites, type SiteNumbers } from '#common/physics/resolve-sites';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { CellDefinition, CellSite } from '#common/schemas/cell';
import type { SpaceGroupSetting, SymmetryOperation } from '#common/schemas/symmetry';

/** The operations to apply, and the tabulated setting they belong to, if any. */
export interface CellSymmetryData {
  readonly operations: readonly SymmetryOperation[];
  readonly setting: SpaceGroupSetting | null;
}

const largestChargeE = 9;

/** Reads one number of a site row; null and a problem where it can't be read or is out of range. */
function readNumber(
  text: string,
  field: string,
  parameters: ParameterValues,
  problems: FieldProblem[],
  check: (value: number) => { code: string; message: string } | null,
): number | null {
  const result = evaluateExpression(text, parameters.values, parameters.broken);
  if (!result.ok) {
    problems.push({ code: 'cell.expression', field, message: result.message });
    return null;
  }
  const fault = check(result.value);
  if (fault !== null) {
    problems.push({ field, ...fault });
    return null;
  }
  return result.value;
}

const checkCharge = (value: number) =>
  Math.abs(value) <= largestChargeE
    ? null
    : {
        code: 'cell.charge',
        message: `Write a charge between −${largestChargeE} and ${largestChargeE}.`,
      };
const checkCoordinate = (value: number) =>
  Math.abs(value) <= 1000
    ? null
    : {
        code: 'cell.coordinate',
        message: 'Write a fractional coordinate, usually between 0 and 1.',
      };
const checkOccupancy = (value: number) =>
  value > 0 && value <= 1
    ? null
    : { code: 'cell.occupancy', message: 'Write an occupancy above 0 and at most 1.' };

/** What is wrong with a label; remembers it as taken. */
function labelProblem(label: string, taken: Set<string>): string | null {
  if (label === '') {
    return 'Give the site a label, such as Mg1.';
  }
  if (taken.has(label)) {
    return `There are two sites called ${label}: rename one.`;
  }
  taken.add(label);
  return null;
}

function readSite(
  site: CellSite,
  index: number,
  takenLabels: Set<string>,
  parameters: ParameterValues,
  problems: FieldProblem[],
): SiteNumbers | null {
  const at = (name: keyof CellSite) => `sites.${index}.${name}`;
  const label = labelProblem(site.label.trim(), takenLabels);
  if (label !== null) {
    problems.push({ code: 'cell.label', field: at('label'), message: label });
  }
  const element = findElement(site.element);
  if (element === null) {
    const message = `“${site.element}” is not an element: write a symbol such as Mg.`;
    problems.push({ code: 'cell.element', field: at('element'), message });
  }
  const read = (name: 'x' | 'y' | 'z') =>
    readNumber(site[name], at(name), parameters, problems, checkCoordinate);
  const chargeE = readNumber(site.charge, at('charge'), parameters, problems, checkCharge);
  const [x, y, z] = [read('x'), read('y'), read('z')];
  const occupancy = readNumber(
    site.occupancy,
    at('occupancy'),
    parameters,
    problems,
    checkOccupancy,
  );
  const numbers = [chargeE, x, y, z, occupancy];
  if (label !== null || element === null || numbers.some((number) => number === null)) {
    return null;
  }
  return {
    definitionIndex: index,
    label: site.label.trim(),
    component: { element: element.symbol, chargeE: chargeE!, occupancy: occupancy! },
    fractional: [x!, y!, z!],
  };
}

/**
 * Whether symmetry leaves a direction unchanged: ΣW, the projector on what every operation keeps,
 * is then not zero.
 */
function leavesPolarAxis(operations: readonly SymmetryOperation[]): boolean {
  const sum = new Array<number>(9).fill(0);
  for (const { rotation } of operations) {
    rotation.forEach((entry, k) => {
      sum[k]! += entry;
    });
  }
  return sum.some((entry) => entry !== 0);
}

/** Faults of operations that are no tabulated setting, which the tables vouch for. */
function symmetryProblems(
  { operations, setting }: CellSymmetryData,
  vectorsA: readonly number[] | null,
): FieldProblem[] {
  if (setting !== null) {
    return [];
  }
  const fault = groupFault(operations);
  if (fault !== null) {
    return [{ code: 'cell.operation', field: 'symmetry', message: fault }];
  }
  const misfit = vectorsA === null ? null : findMetricFault(operations, vectorsA);
  return misfit === null
    ? []
    : [{ code: 'cell.system_constraint', field: 'symmetry', message: misfit }];
}

/**
 * Turns a cell as typed into numbers: parameters and expressions evaluated, lattice checked,
 * symmetry applied, shared places merged.
 *
 * @param definition the cell as a person defined it
 * @param symmetry operations of its space group (the identity among them)
 * @returns the cell, or null with a problem per field at fault; field paths are relative to the
 *   cell: `sites.0.x`, `lattice.a`, `parameters.1.expression`
 */
export function resolveCell(
  definition: CellDefinition,
  symmetry: CellSymmetryData,
): { cell: ResolvedCell | null; problems: FieldProblem[] } {
  const parameters = evaluateParameters(definition.parameters);
  const problems = [...parameters.problems];
  // Operations typed by hand bind the cell to 1e-3, even where they happen to be a tabulated setting:
  // the form, which doesn't look them up, and the server must say the same.
  const setting = definition.symmetry.kind === 'setting' ? symmetry.setting : null;
  const lattice = resolveLattice(definition.lattice, parameters, setting);
  if (Array.isArray(lattice)) {
    problems.push(...lattice);
  }
  if (definition.sites.length === 0) {
    const message = 'Add at least one site: an element, its charge and where it is.';
    problems.push({ code: 'cell.no_sites', field: 'sites', message });
  }
  problems.push(
    ...symmetryProblems({ ...symmetry, setting }, Array.isArray(lattice) ? null : lattice.vectorsA),
  );
  const takenLabels = new Set<string>();
  const rows = definition.sites
    .map((site, index) => readSite(site, index, takenLabels, parameters, problems))
    .filter((row) => row !== null);
  if (Array.isArray(lattice) || problems.length > 0) {
    return { cell: null, problems };
  }
  const resolved = resolveSites(rows, symmetry.operations, lattice.vectorsA);
  if (resolved.problems.length > 0) {
    return { cell: null, problems: resolved.problems };
  }
  const cell: ResolvedCell = {
    ...lattice,
    sites: resolved.sites,
    operationCount: symmetry.operations.length,
    hasPolarAxis: leavesPolarAxis(symmetry.operations),
    parameters: parameters.values,
  };
  return { cell, problems: [] };
}
