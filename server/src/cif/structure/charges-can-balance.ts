import { commonOxidationStates } from '#common/chemistry/oxidation-states';

const tolerance = 1e-4;

/**
 * Whether the elements of a cell can be neutral: with the charge known for an element, else with any
 * one of its common oxidation states (one state for all ions of an element).
 * @param counts how many of each element the cell holds
 * @param known charges by element, null where the file gives none
 */
export function chargesCanBalance(
  counts: ReadonlyMap<string, number>,
  known: ReadonlyMap<string, number | null>,
): boolean {
  let sums = new Set([0]);
  for (const [element, count] of counts) {
    const given = known.get(element) ?? null;
    const states = given === null ? commonOxidationStates(element) : [given];
    sums = new Set([...sums].flatMap((sum) => states.map((state) => sum + state * count)));
  }
  return [...sums].some((sum) => Math.abs(sum) < tolerance);
}
