import { oxidationStates } from '#common/chemistry/oxidation-states';

const chargeTolerance = 1e-4;

/** More elements than any small structure has; the search stays instant. */
const mostElements = 8;

/**
 * Elements that form anions, most electronegative first (order of Pauling's scale, hydrogen moved
 * behind arsenic; from memory). An element is negative only if all before it are.
 */
const anionOrder = 'F O Cl N Br I S Se Te C P As H D T B Sb Ge Si Sn'.split(' ');

function keepsAnionOrder(charges: ReadonlyMap<string, number>): boolean {
  const inOrder = anionOrder.map((element) => charges.get(element) ?? 0);
  const firstCation = inOrder.findIndex((charge) => charge > 0);
  return firstCation < 0 || inOrder.slice(firstCation).every((charge) => charge >= 0);
}

/** Which lists of states a search looks into, from the usual only to all. */
const tiers = [['usual'], ['usual', 'occasional'], ['usual', 'occasional', 'rare']] as const;

/**
 * States of an element that a search may use. States above the usual ones need oxygen or fluorine
 * as a partner: MnS₂ holds S₂²⁻, not Mn⁴⁺.
 */
function statesOf(element: string, tier: (typeof tiers)[number], hasStrongOxidiser: boolean) {
  const all = oxidationStates(element);
  const highest = Math.max(...all.usual);
  return tier.flatMap((list) => all[list]).filter((state) => hasStrongOxidiser || state <= highest);
}

/**
 * All ways to make ions neutral with one oxidation state per element, but no more than `most`.
 * Looks among usual states first; among less usual ones only where those give nothing.
 *
 * @param counts how many ions of each element there are
 * @param knownChargeE what other ions, whose charges are known, sum to, in elementary charges
 * @returns none if an element has no states in the table
 */
export function neutralCharges(
  counts: ReadonlyMap<string, number>,
  knownChargeE: number,
  most: number,
): readonly ReadonlyMap<string, number>[] {
  const elements = [...counts];
  // Known ions may be the oxide or fluoride ions.
  const hasStrongOxidiser = counts.has('O') || counts.has('F') || knownChargeE !== 0;
  if (elements.length > mostElements) {
    return [];
  }
  for (const tier of tiers) {
    const options = elements.map(([element]) => statesOf(element, tier, hasStrongOxidiser));
    const found: ReadonlyMap<string, number>[] = [];
    const search = (index: number, sum: number, chosen: ReadonlyMap<string, number>): void => {
      if (index === elements.length) {
        if (Math.abs(sum) < chargeTolerance && keepsAnionOrder(chosen)) {
          found.push(chosen);
        }
        return;
      }
      const [element, count] = elements[index]!;
      for (const state of options[index]!) {
        if (found.length < most) {
          search(index + 1, sum + state * count, new Map(chosen).set(element, state));
        }
      }
    };
    search(0, knownChargeE, new Map());
    if (found.length > 0) {
      return found;
    }
  }
  return [];
}
