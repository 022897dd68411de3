import { commonOxidationStates } from '#common/chemistry/oxidation-states';

/** Charges that make a composition neutral, and whether they are the only choice. */
export interface SuggestedCharges {
  readonly charges: Readonly<Record<string, number>>;
  readonly isUnique: boolean;
  /** Number of neutral choices. */
  readonly alternatives: number;
}

type Part = { readonly element: string; readonly count: number };

const combinationLimit = 20_000;

/** All ways to give each element one of its usual oxidation states. */
function* combinations(parts: readonly Part[]): Generator<number[]> {
  const options = parts.map(({ element }) => commonOxidationStates(element));
  const total = options.reduce((product, list) => product * list.length, 1);
  for (let k = 0; k < Math.min(total, combinationLimit); k += 1) {
    let rest = k;
    yield options.map((list) => {
      const value = list[rest % list.length]!;
      rest = Math.floor(rest / list.length);
      return value;
    });
  }
}

/**
 * Neutral charges of a composition from the usual oxidation states, one per element.
 *
 * @param parts elements with their counts (per cell or per formula unit)
 * @returns the choice whose states are most usual, and whether it is the only neutral one;
 *   null if there is none. A choice needs both signs: all zero is none.
 */
export function suggestCharges(parts: readonly Part[]): SuggestedCharges | null {
  const neutral = [...combinations(parts)].filter((charges) => {
    const sum = charges.reduce((total, charge, k) => total + charge * parts[k]!.count, 0);
    return Math.abs(sum) < 1e-6 && charges.some((charge) => charge > 0);
  });
  if (neutral.length === 0) {
    return null;
  }
  const rarity = (charges: readonly number[]) =>
    charges.reduce(
      (sum, charge, k) => sum + commonOxidationStates(parts[k]!.element).indexOf(charge),
      0,
    );
  const [best] = [...neutral].sort((a, b) => rarity(a) - rarity(b));
  return {
    charges: Object.fromEntries(parts.map(({ element }, k) => [element, best![k]!])),
    isUnique: neutral.length === 1,
    alternatives: neutral.length,
  };
}
