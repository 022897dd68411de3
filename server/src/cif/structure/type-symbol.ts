import { findElement } from '#common/chemistry/elements';

/** What a type symbol or a label says about an ion. */
export interface ReadIon {
  readonly element: string;
  /** In elementary charges; null when not said. */
  readonly chargeE: number | null;
  /** The isotope that was named instead of its element: `D`. */
  readonly isotope: string | null;
}

/**
 * Reads an atom type: `Ti4+`, `Sr+2`, `TI4+`, `O2-`, `Na1+`, `Cl-`, `Fe`, `D`.
 * @returns null when it begins with no element
 */
export function readTypeSymbol(text: string): ReadIon | null {
  const match = /^([A-Za-z]{1,2})(?:(\d?)([+-])|([+-])(\d))?$/.exec(text.trim());
  const symbol = match ? canonical(match[1]!) : null;
  if (!match || !symbol) {
    return null;
  }
  const sign = match[3] ?? match[4];
  const size = match[2] || match[5] || '1';
  const chargeE = sign === undefined ? null : Number(size) * (sign === '-' ? -1 : 1);
  return { ...symbol, chargeE };
}

/**
 * Reads the element a site label begins with: `Mg1`, `CL2`, `O1A`.
 * @returns null when it begins with no element
 */
export function readLabelElement(label: string): ReadIon | null {
  const letters = /^[A-Za-z]{1,2}/.exec(label)?.[0] ?? '';
  const symbol = canonical(letters) ?? canonical(letters.slice(0, 1));
  return symbol ? { ...symbol, chargeE: null } : null;
}

function canonical(letters: string): { element: string; isotope: string | null } | null {
  const symbol = letters.charAt(0).toUpperCase() + letters.slice(1).toLowerCase();
  if (symbol === 'D' || symbol === 'T') {
    return { element: 'H', isotope: symbol };
  }
  return findElement(symbol) ? { element: symbol, isotope: null } : null;
}
