import { neutralCharges } from '#common/chemistry/neutral-charges';
import { resolveCell } from '#common/physics/resolve-cell';
import type { CellDefinition, CellSite } from '#common/schemas/cell';
import type { Warning } from '#common/schemas/evaluation';
import { symmetryOf } from '#server/symmetry/space-groups';

import type { ReadStructure } from './read-structure.js';

/** A cell with as many charges as could be found. */
export interface CompletedCharges {
  readonly cell: CellDefinition;
  readonly warnings: readonly Warning[];
  /** Elements whose charge is still unknown; their sites carry 0. */
  readonly missing: readonly string[];
  /** Neutral choices for those elements when there are several, as `Fe=2,O=-2`. */
  readonly choices: readonly string[];
}

const mostChoices = 4;

/**
 * Settles the charges of a structure: those given from outside, else the file's, else common
 * oxidation states when exactly one neutral choice of them exists.
 * @param charges by site label or element, in elementary charges; a label wins
 */
export function completeCharges(
  structure: ReadStructure,
  charges: ReadonlyMap<string, number>,
): CompletedCharges {
  const isKnown: boolean[] = [];
  const sites = structure.cell.sites.map((site, index): CellSite => {
    const asked = charges.get(site.label) ?? charges.get(site.element);
    isKnown.push(asked !== undefined || structure.chargesGiven[index] === true);
    return asked === undefined ? site : { ...site, charge: String(asked) };
  });
  const cell = { ...structure.cell, sites };
  const warnings = unusedCharges(sites, charges);
  const missing = [...new Set(sites.flatMap(({ element }, i) => (isKnown[i] ? [] : [element])))];
  if (missing.length === 0) {
    return { cell, warnings, missing, choices: [] };
  }
  const choices = choicesFor(cell, isKnown);
  const only = choices[0];
  if (choices.length !== 1 || !only) {
    return { cell, warnings, missing, choices: choices.map(choiceText) };
  }
  const completed = sites.map((site, index) =>
    isKnown[index] ? site : { ...site, charge: String(only.get(site.element)) },
  );
  warnings.push({
    code: 'cif.charges_suggested',
    message: `The file gives no oxidation numbers for ${missing.join(', ')}; the only neutral choice of common ones was taken: ${choiceText(only)}.`,
  });
  return { cell: { ...cell, sites: completed }, warnings, missing: [], choices: [] };
}

function choicesFor(
  cell: CellDefinition,
  isKnown: readonly boolean[],
): readonly ReadonlyMap<string, number>[] {
  const { cell: resolved } = resolveCell(cell, symmetryOf(cell.symmetry));
  if (!resolved) {
    return [];
  }
  const unknown = new Set(cell.sites.flatMap((site, i) => (isKnown[i] ? [] : [site.element])));
  const counts = new Map<string, number>();
  // Sites without a charge carry 0, so this sums the known ones only.
  const known = resolved.sites.reduce((sum, { chargeE }) => sum + chargeE, 0);
  for (const { components } of resolved.sites) {
    for (const { element, chargeE, occupancy } of components) {
      if (unknown.has(element) && chargeE === 0) {
        counts.set(element, (counts.get(element) ?? 0) + occupancy);
      }
    }
  }
  return neutralCharges(counts, known, mostChoices);
}

function choiceText(choice: ReadonlyMap<string, number>): string {
  return [...choice].map(([element, charge]) => `${element}=${charge}`).join(',');
}

function unusedCharges(
  sites: readonly CellSite[],
  charges: ReadonlyMap<string, number>,
): Warning[] {
  const names = new Set(sites.flatMap(({ label, element }) => [label, element]));
  const unused = [...charges.keys()].filter((name) => !names.has(name));
  return unused.length === 0
    ? []
    : [
        {
          code: 'charges.unused',
          message: `Charges were given for ${unused.join(', ')}, but the structure has no such element or label.`,
        },
      ];
}
