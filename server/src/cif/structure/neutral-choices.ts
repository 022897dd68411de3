import { commonOxidationStates } from '#common/chemistry/oxidation-states';

const tolerance = 1e-4;
/** More elements without a charge than any small structure has; the search stays instant. */
const mostElements = 8;

/**
 * All ways to make a cell neutral with one common oxidation state for each element that lacks a
 * charge, but no more than `most` of them.
 * @param counts how many ions of each such element the cell holds
 * @param knownChargeE what the other ions sum to, in elementary charges
 */
export function neutralChoices(
  counts: ReadonlyMap<string, number>,
  knownChargeE: number,
  most: number,
): readonly ReadonlyMap<string, number>[] {
  const elements = [...counts].map(([element, count]) => ({
    element,
    count,
    states: commonOxidationStates(element),
  }));
  if (elements.length > mostElements || elements.some(({ states }) => states.length === 0)) {
    return [];
  }
  const found: ReadonlyMap<string, number>[] = [];
  const search = (index: number, sum: number, chosen: ReadonlyMap<string, number>): void => {
    const next = elements[index];
    if (!next) {
      if (Math.abs(sum) < tolerance) {
        found.push(chosen);
      }
      return;
    }
    for (const state of next.states) {
      if (found.length < most) {
        search(index + 1, sum + state * next.count, new Map(chosen).set(next.element, state));
      }
    }
  };
  search(0, knownChargeE, new Map());
  return found;
}
