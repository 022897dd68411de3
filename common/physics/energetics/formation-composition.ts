import { composition } from '#common/physics/composition';
import type { ResolvedCell, SiteComponent } from '#common/physics/resolved-cell';

/** Ions of one element and one charge. */
export interface FormationIon {
  readonly element: string;
  /** Whole number of elementary charges; 0 for an atom that stays neutral. */
  readonly chargeE: number;
  /** How many per formula unit; a fraction where sites are shared or partly empty. */
  readonly count: number;
}

/** What one formula unit is put together from. */
export interface FormationComposition {
  readonly formula: string;
  /** Cations first, each in order of first appearance. */
  readonly ions: readonly FormationIon[];
  /** True where sites are shared or partly empty: the account is then that of the mean composition. */
  readonly isMixed: boolean;
}

/** Why no account can be drawn up. */
export interface FormationRefusal {
  readonly reason: string;
}

/** Charges that differ from a whole number by less than this are meant as whole. */
const chargeToleranceE = 1e-6;
/** Steps are named with one digit. */
const mostCharges = 9;

const rank = (chargeE: number) => (chargeE > 0 ? 0 : chargeE === 0 ? 1 : 2);

function refusalOf({ element, chargeE }: SiteComponent, label: string): string | null {
  if (Math.abs(chargeE - Math.round(chargeE)) > chargeToleranceE) {
    return `${label}: ${element} carries a charge of ${Number(chargeE.toFixed(4))}. Electrons leave and join atoms as wholes, so the account needs whole charges; share the site between ions of different charge instead.`;
  }
  if (Math.abs(chargeE) > mostCharges) {
    return `${label}: ${element} carries a charge of ${Math.round(chargeE)}; the account goes to ${mostCharges} steps.`;
  }
  return null;
}

function collectIons(cell: ResolvedCell, formulaUnits: number): FormationIon[] {
  const ions = new Map<string, FormationIon>();
  for (const { components } of cell.sites) {
    for (const { element, chargeE, occupancy } of components) {
      const whole = Math.round(chargeE);
      const key = `${element}${whole}`;
      const count = (ions.get(key)?.count ?? 0) + occupancy / formulaUnits;
      ions.set(key, { element, chargeE: whole, count });
    }
  }
  return [...ions.values()]
    .map((ion) => ({ ...ion, count: Number(ion.count.toFixed(9)) }))
    .sort((a, b) => rank(a.chargeE) - rank(b.chargeE));
}

/**
 * The ions of one formula unit, or the reason why there is no Born–Haber account: charges that are
 * no whole numbers, a cell that is not neutral, a cell without ions.
 *
 * Shared and partly empty sites count with their occupancies.
 *
 * @param cell at least one site
 */
export function formationComposition(cell: ResolvedCell): FormationComposition | FormationRefusal {
  for (const site of cell.sites) {
    for (const component of site.components) {
      const reason = refusalOf(component, site.label);
      if (reason !== null) {
        return { reason };
      }
    }
  }
  const { formula, formulaUnitsPerCell } = composition(cell);
  const ions = collectIons(cell, formulaUnitsPerCell);
  const chargeE = ions.reduce((sum, ion) => sum + ion.chargeE * ion.count, 0);
  if (Math.abs(chargeE) > chargeToleranceE) {
    return {
      reason: `The formula unit carries a net charge of ${Number(chargeE.toFixed(4))}: a formation enthalpy belongs to a neutral compound.`,
    };
  }
  if (ions.every((ion) => ion.chargeE === 0)) {
    return { reason: 'The cell has no ions: give its sites their charges first.' };
  }
  const isMixed = cell.sites.some(
    ({ components }) => components.length > 1 || components[0]!.occupancy < 1,
  );
  return { formula, ions, isMixed };
}
