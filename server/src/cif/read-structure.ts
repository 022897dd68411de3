import { resolveCell } from '#common/physics/resolve-cell';
import type { CellDefinition, CellSite, CellSymmetry } from '#common/schemas/cell';
import type { Warning } from '#common/schemas/evaluation';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';
import { symmetryOf } from '#server/symmetry/space-groups';

import { findValue } from './format/block-values.js';
import type { CifBlock } from './format/cif-document.js';
import { chargesCanBalance } from './structure/charges-can-balance.js';
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
  return {
    suggestedName: suggestName(block),
    cell: defineCell(lattice, symmetry, sites),
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
  return { lattice: lattice.texts, symmetry, parameters: [], sites: sites.map(defineSite) };
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
  const chargeOf = new Map(sites.map(({ element, chargeE }) => [element, chargeE]));
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
      canBeNeutral: (counts) => chargesCanBalance(counts, chargeOf),
    },
    warnings,
  );
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
