import { elementData } from '#common/chemistry/element-data';

/** A chemical element. */
export interface Element {
  readonly atomicNumber: number;
  readonly symbol: string;
  readonly name: string;
  /** Standard atomic mass; for elements without one the mass number of a long-lived isotope. */
  readonly massGPerMol: number;
  /** True where `massGPerMol` is only a mass number. */
  readonly hasOnlyMassNumber: boolean;
}

function readElement(text: string): Element {
  const [atomicNumber, symbol, name, mass] = text.trim().split(' ') as [
    string,
    string,
    string,
    string,
  ];
  return {
    atomicNumber: Number(atomicNumber),
    symbol,
    name,
    massGPerMol: Number(mass.replace('*', '')),
    hasOnlyMassNumber: mass.endsWith('*'),
  };
}

/** Elements 1 to 118, in order. */
export const elements: readonly Element[] = elementData.split(';').map(readElement);

/**
 * Hydrogen's isotopes that crystallographers write as elements.
 * Masses: AME2020 atomic masses of ²H and ³H (from memory, 6 digits).
 */
const isotopes: readonly Element[] = [
  {
    atomicNumber: 1,
    symbol: 'D',
    name: 'Deuterium',
    massGPerMol: 2.014102,
    hasOnlyMassNumber: false,
  },
  {
    atomicNumber: 1,
    symbol: 'T',
    name: 'Tritium',
    massGPerMol: 3.016049,
    hasOnlyMassNumber: false,
  },
];

const bySymbol = new Map([...elements, ...isotopes].map((element) => [element.symbol, element]));

/** The element of a symbol in any case (`Mg`, `MG`, `mg`; also D and T), or null. */
export function findElement(symbol: string): Element | null {
  const trimmed = symbol.trim();
  const written = trimmed.charAt(0).toUpperCase() + trimmed.slice(1).toLowerCase();
  return bySymbol.get(written) ?? null;
}
