/**
 * Standard states of the elements at 298.15 K and 1 bar: what an account of formation starts from.
 * Common practice, no source: the states that thermodynamic tables count as zero.
 */
export interface StandardState {
  /** One molecule or atom of it: `Cl2`, `Na`. */
  readonly formula: string;
  readonly phase: 's' | 'l' | 'g';
  /** Atoms in `formula`. */
  readonly atoms: 1 | 2;
  /** In words: `chlorine gas`, `solid sodium`, `graphite`. */
  readonly name: string;
}

const diatomicGases = new Set(['H', 'D', 'T', 'N', 'O', 'F', 'Cl']);
const nobleGases = new Set(['He', 'Ne', 'Ar', 'Kr', 'Xe', 'Rn']);
/** Counted per molecule of two atoms, though liquid or solid. */
const condensedMolecules: Readonly<Record<string, 's' | 'l'>> = { Br: 'l', I: 's' };
const namedForms: Readonly<Record<string, string>> = {
  C: 'graphite',
  P: 'white phosphorus',
  S: 'rhombic sulfur',
  Se: 'grey selenium',
  Sn: 'white tin',
  As: 'grey arsenic',
};

const inWords = (name: string, phase: StandardState['phase']): string =>
  phase === 'g' ? `${name} gas` : `${phase === 'l' ? 'liquid' : 'solid'} ${name}`;

/**
 * The standard state of an element.
 *
 * @param element symbol
 * @param name the element's name in lower case, for the words
 */
export function standardState(element: string, name: string): StandardState {
  const isGas = diatomicGases.has(element);
  const condensed = condensedMolecules[element];
  if (isGas || condensed !== undefined) {
    const phase = condensed ?? 'g';
    return { formula: `${element}2`, phase, atoms: 2, name: inWords(name, phase) };
  }
  if (nobleGases.has(element)) {
    return { formula: element, phase: 'g', atoms: 1, name: inWords(name, 'g') };
  }
  const phase = element === 'Hg' ? 'l' : 's';
  return { formula: element, phase, atoms: 1, name: namedForms[element] ?? inWords(name, phase) };
}

/** True where atomisation is half of breaking a gas molecule: ½ D per atom. */
export function isHalfBond({ atoms, phase }: StandardState): boolean {
  return atoms === 2 && phase === 'g';
}
