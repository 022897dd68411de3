import { applyLatticeConstraints } from '#common/physics/crystal-system';
import {
  cellLimits,
  type CellDefinition,
  type CellParameter,
  type CellSite,
  type LatticeParameterName,
} from '#common/schemas/cell';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';

/** Sets an edge or angle; what the crystal system ties to it follows. */
export function setLatticeParameter(
  cell: CellDefinition,
  name: LatticeParameterName,
  text: string,
  setting: SpaceGroupSetting | null,
): CellDefinition {
  const lattice = applyLatticeConstraints({ ...cell.lattice, [name]: text }, setting);
  return { ...cell, lattice };
}

/** Takes another space group; edges and angles are brought into its crystal system. */
export function setSpaceGroup(cell: CellDefinition, setting: SpaceGroupSetting): CellDefinition {
  return {
    ...cell,
    symmetry: { kind: 'setting', hallNumber: setting.hallNumber },
    lattice: applyLatticeConstraints(cell.lattice, setting),
  };
}

/** Gives the operations themselves instead of a tabulated group. */
export function setOperations(cell: CellDefinition, operations: string[]): CellDefinition {
  return { ...cell, symmetry: { kind: 'operations', operations } };
}

/** The next free label of an element: `O2` after `O1`. */
function freeLabel(sites: readonly CellSite[], element: string): string {
  const taken = new Set(sites.map((site) => site.label));
  const stem = element === '' ? 'X' : element;
  let number = 1;
  while (taken.has(`${stem}${number}`)) {
    number += 1;
  }
  return `${stem}${number}`.slice(0, cellLimits.labelLength);
}

export function addSite(cell: CellDefinition): CellDefinition {
  const site: CellSite = {
    label: freeLabel(cell.sites, ''),
    element: '',
    charge: '0',
    x: '0',
    y: '0',
    z: '0',
    occupancy: '1',
  };
  return { ...cell, sites: [...cell.sites, site] };
}

/** Copies a row below itself under a free label. */
export function duplicateSite(cell: CellDefinition, index: number): CellDefinition {
  const site = cell.sites[index];
  if (site === undefined) {
    return cell;
  }
  const copy = { ...site, label: freeLabel(cell.sites, site.element) };
  return { ...cell, sites: cell.sites.toSpliced(index + 1, 0, copy) };
}

export function removeSite(cell: CellDefinition, index: number): CellDefinition {
  return { ...cell, sites: cell.sites.toSpliced(index, 1) };
}

/** Moves a row up (−1) or down (+1); at the ends it stays. */
export function moveSite(cell: CellDefinition, index: number, by: -1 | 1): CellDefinition {
  const site = cell.sites[index];
  const target = index + by;
  if (site === undefined || target < 0 || target >= cell.sites.length) {
    return cell;
  }
  return { ...cell, sites: cell.sites.toSpliced(index, 1).toSpliced(target, 0, site) };
}

/** Whether a label was made from the element, not chosen: `Mg1`, `X2`, empty. */
function isMadeLabel({ label, element }: CellSite): boolean {
  const stem = element === '' ? 'X' : element;
  return label === '' || (label.startsWith(stem) && /^\d*$/.test(label.slice(stem.length)));
}

/** Sets one field of a row. A label that was made from the element follows it. */
export function setSite(
  cell: CellDefinition,
  index: number,
  change: Partial<CellSite>,
): CellDefinition {
  const site = cell.sites[index];
  if (site === undefined) {
    return cell;
  }
  const next = { ...site, ...change };
  if (change.element !== undefined && change.element !== site.element && isMadeLabel(site)) {
    next.label = freeLabel(cell.sites.toSpliced(index, 1), change.element);
  }
  return { ...cell, sites: cell.sites.with(index, next) };
}

/** A new named number, `u` first, then `v`, `w`, `p1` …. */
export function addParameter(cell: CellDefinition): CellDefinition {
  const taken = new Set(cell.parameters.map((parameter) => parameter.name));
  const name =
    ['u', 'v', 'w'].find((one) => !taken.has(one)) ??
    `p${Array.from({ length: cellLimits.parameters }, (_, at) => at + 1).find((at) => !taken.has(`p${at}`)) ?? 1}`;
  return { ...cell, parameters: [...cell.parameters, { name, expression: '0.25' }] };
}

export function setParameter(
  cell: CellDefinition,
  index: number,
  change: Partial<CellParameter>,
): CellDefinition {
  const parameter = cell.parameters[index];
  return parameter === undefined
    ? cell
    : { ...cell, parameters: cell.parameters.with(index, { ...parameter, ...change }) };
}

export function removeParameter(cell: CellDefinition, index: number): CellDefinition {
  return { ...cell, parameters: cell.parameters.toSpliced(index, 1) };
}
