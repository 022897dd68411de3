import { neutralCharges } from '#common/chemistry/neutral-charges';
import { applyLatticeConstraints } from '#common/physics/crystal-system';
import { resolveCell } from '#common/physics/resolve-cell';
import type { CellDefinition, CellSite, CellSymmetry } from '#common/schemas/cell';
import type { Warning } from '#common/schemas/evaluation';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';
import { findSetting, symmetryOf } from '#server/symmetry/space-groups';

import { findValue } from './format/block-values.js';
import type { CifBlock } from './format/cif-document.js';
import { readChemicalFormula } from './structure/chemical-formula.js';
import { chooseOrigin } from './structure/choose-origin.js';
import { readLattice, type ReadLattice } from './structure/read-lattice.js';
import { readSites, type ReadSite } from './structure/read-sites.js';
import { readSymmetry } from './structure/read-symmetry.js';
import { structureBlock } from './structure/structure-block.js';
import { suggestName } from './structure/suggest-name.js';

/** What a CIF says about a structure. */
export interface ReadStructure {
  readonly suggestedName: string;
  /** Charges the file does not give stand as `0`; {@link chargesGiven} says which those are. */
  readonly cell: CellDefinition;
  /** By site: whether the file gives its charge. */
  readonly chargesGiven: readonly boolean[];
  /** By site: the line it stands on. */
  readonly siteLines: readonly number[];
  readonly warnings: readonly Warning[];
}

/**
 * Reads the first structure of a CIF.
 * @param text the file as text, any line ends
 * @throws Problem with a `cif.…` code; `details.line` where a line is at fault
 */
export function readStructure(text: string): ReadStructure {
  const warnings: Warning[] = [];
  const block = structureBlock(text, warnings);
  const lattice = readLattice(block, warnings);
  const found = readSymmetry(block, lattice, warnings);
  const sites = readSites(block, lattice, warnings);
  const symmetry: CellSymmetry =
    found.kind === 'settled'
      ? found.symmetry
      : {
          kind: 'setting',
          hallNumber: originOf(found.candidates, block, lattice, sites, warnings).hallNumber,
        };
  const cell = defineCell(lattice, symmetry, sites);
  noteFittedLattice(lattice, cell, warnings);
  return {
    suggestedName: suggestName(block),
    cell,
    chargesGiven: sites.map(({ chargeE }) => chargeE !== null),
    siteLines: sites.map(({ line }) => line),
    warnings,
  };
}

function defineCell(
  lattice: ReadLattice,
  symmetry: CellSymmetry,
  sites: readonly ReadSite[],
): CellDefinition {
  const setting = symmetry.kind === 'setting' ? findSetting(symmetry.hallNumber) : null;
  return {
    lattice: applyLatticeConstraints(lattice.texts, setting),
    symmetry,
    parameters: [],
    sites: sites.map(defineSite),
  };
}

/** Edges that symmetry makes equal but the file gives apart, by rounding or refinement. */
function noteFittedLattice(
  { texts }: ReadLattice,
  { lattice }: CellDefinition,
  warnings: Warning[],
): void {
  const names = ['a', 'b', 'c', 'alpha', 'beta', 'gamma'] as const;
  const changed = names.filter((name) => Number(texts[name]) !== Number(lattice[name]));
  if (changed.length > 0) {
    const parts = changed.map((name) => `${name} = ${texts[name]} became ${lattice[name]}`);
    warnings.push({
      code: 'cif.lattice_fitted',
      message: `To fit the crystal system, ${parts.join(', ')}.`,
    });
  }
}

function defineSite(site: ReadSite): CellSite {
  const [x, y, z] = site.coordinates;
  const charge = String(site.chargeE ?? 0);
  return {
    label: site.label,
    element: site.element,
    charge,
    x,
    y,
    z,
    occupancy: site.occupancy,
  };
}

function originOf(
  candidates: readonly SpaceGroupSetting[],
  block: CifBlock,
  lattice: ReadLattice,
  sites: readonly ReadSite[],
  warnings: Warning[],
): SpaceGroupSetting {
  const formula = findValue(block, '_chemical_formula_sum');
  const given = new Map(sites.map(({ element, chargeE }) => [element, chargeE]));
  const count = (setting: SpaceGroupSetting): ReadonlyMap<string, number> | null => {
    const symmetry: CellSymmetry = { kind: 'setting', hallNumber: setting.hallNumber };
    const { cell } = resolveCell(defineCell(lattice, symmetry, sites), symmetryOf(symmetry));
    return cell && countElements(cell.sites);
  };
  return chooseOrigin(
    candidates,
    {
      count,
      formula: formula ? readChemicalFormula(formula.text) : null,
      canBeNeutral: (counts) => canBeNeutral(counts, given),
    },
    warnings,
  );
}

/** Neutral with the charge given for an element, else with a common one. */
function canBeNeutral(
  counts: ReadonlyMap<string, number>,
  given: ReadonlyMap<string, number | null>,
): boolean {
  const open = new Map<string, number>();
  let known = 0;
  for (const [element, count] of counts) {
    const chargeE = given.get(element) ?? null;
    if (chargeE === null) {
      open.set(element, count);
    } else {
      known += chargeE * count;
    }
  }
  return neutralCharges(open, known, 1).length > 0;
}

function countElements(
  sites: readonly { components: readonly { element: string; occupancy: number }[] }[],
): ReadonlyMap<string, number> {
  const counts = new Map<string, number>();
  for (const { components } of sites) {
    for (const { element, occupancy } of components) {
      counts.set(element, (counts.get(element) ?? 0) + occupancy);
    }
  }
  return counts;
}
