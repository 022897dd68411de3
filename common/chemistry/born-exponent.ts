import { elements, findElement } from '#common/chemistry/elements';
import { oxidationStates } from '#common/chemistry/oxidation-states';
import {
  ionKey,
  noOverrides,
  ownOr,
  type DataOverrides,
  type Sourced,
} from '#common/chemistry/sourced';

const pauling = 'Pauling’s exponents by closed-shell core, as handbooks list them';

/**
 * Exponents by the number of electrons of the closed shells, as tabulated: He 5, Ne 7, Ar and Cu⁺ 9,
 * Kr and Ag⁺ 10, Xe and Au⁺ 12. No value is tabulated for a core of radon.
 */
const cores = [
  { electrons: 2, name: 'He', exponent: 5 },
  { electrons: 10, name: 'Ne', exponent: 7 },
  { electrons: 18, name: 'Ar', exponent: 9 },
  { electrons: 28, name: 'Cu⁺', exponent: 9 },
  { electrons: 36, name: 'Kr', exponent: 10 },
  { electrons: 46, name: 'Ag⁺', exponent: 10 },
  { electrons: 54, name: 'Xe', exponent: 12 },
  { electrons: 78, name: 'Au⁺', exponent: 12 },
] as const;

/** Electrons of the radon core, from which on nothing is tabulated. */
const radonElectrons = 86;

function shippedExponent(element: string, chargeE: number): Sourced | null {
  const found = findElement(element);
  const electrons = found === null ? NaN : found.atomicNumber - chargeE;
  if (!Number.isInteger(electrons) || electrons >= radonElectrons) {
    return null;
  }
  const core = cores.findLast((one) => one.electrons <= electrons);
  if (core === undefined) {
    return null;
  }
  return core.electrons === electrons
    ? { value: core.exponent, source: `${pauling}: ${core.name} core`, status: 'verified' }
    : {
        value: core.exponent,
        source: `Open shell over the ${core.name} core, whose exponent is taken; common practice, no source`,
        status: 'from-memory',
      };
}

/**
 * Born exponent of an ion, from the closed-shell core its electrons fill or exceed.
 * @returns null for a charge that is no whole number, a bare proton, and ions beyond a radon core
 */
export function bornExponent(
  element: string,
  chargeE: number,
  overrides: DataOverrides = noOverrides,
): Sourced | null {
  const key = `born-exponent:${ionKey(element, chargeE)}`;
  return ownOr(overrides, key, shippedExponent(element, chargeE));
}

function statesOf(symbol: string): number[] {
  const { usual, occasional, rare } = oxidationStates(symbol);
  return [...usual, ...occasional, ...rare];
}

/** Keys of the exponents of the usual ions; the look-up knows many more. */
export const bornExponentKeys: readonly string[] = elements.flatMap(({ symbol }) =>
  statesOf(symbol)
    .filter((chargeE) => shippedExponent(symbol, chargeE) !== null)
    .map((chargeE) => `born-exponent:${ionKey(symbol, chargeE)}`),
);
