import { elements, findElement } from '#common/chemistry/elements';
import { noOverrides, ownOr, type DataOverrides, type Sourced } from '#common/chemistry/sourced';

const repository = 'Blue Obelisk Data Repository (Debian package bodr)';

function shippedMass(symbol: string): Sourced | null {
  const element = findElement(symbol);
  if (element === null) {
    return null;
  }
  const value = element.massGPerMol;
  if (symbol === 'D' || symbol === 'T') {
    return { value, source: 'AME2020, from memory', status: 'from-memory' };
  }
  return element.hasOnlyMassNumber
    ? {
        value,
        source: 'Mass number of a long-lived isotope: the element has no standard mass',
        status: 'single-source',
      }
    : { value, source: repository, status: 'verified' };
}

/** Standard atomic mass, g mol⁻¹ (unified mass units per atom); also of D and T. */
export function atomicMass(
  element: string,
  overrides: DataOverrides = noOverrides,
): Sourced | null {
  return ownOr(overrides, `mass:${element}`, shippedMass(element));
}

/** Keys of every shipped mass. */
export const massKeys: readonly string[] = [
  ...elements.map(({ symbol }) => `mass:${symbol}`),
  'mass:D',
  'mass:T',
];
