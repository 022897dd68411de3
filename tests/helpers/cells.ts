import type { CellDefinition } from '#common/schemas/cell';

/** Hall number of F m -3 m. */
const faceCentredCubic = 523;

/** Rock salt by its space group: MgO unless told otherwise. */
export function rockSalt(
  given: { a?: string; cation?: string; anion?: string; charges?: [string, string] } = {},
): CellDefinition {
  const a = given.a ?? '4.212';
  const [plus, minus] = given.charges ?? ['2', '-2'];
  const cation = given.cation ?? 'Mg';
  const anion = given.anion ?? 'O';
  const full = { occupancy: '1' };
  return {
    lattice: { a, b: a, c: a, alpha: '90', beta: '90', gamma: '90' },
    symmetry: { kind: 'setting', hallNumber: faceCentredCubic },
    parameters: [],
    sites: [
      { label: `${cation}1`, element: cation, charge: plus, x: '0', y: '0', z: '0', ...full },
      { label: `${anion}1`, element: anion, charge: minus, x: '1/2', y: '1/2', z: '1/2', ...full },
    ],
  };
}

/**
 * Energy of that MgO per formula unit, eV: −4 · 1.747 564 594 633 182 (OEIS A085469) times
 * 14.399 645 469 eV Å (CODATA 2022) over 2.106 Å.
 */
export const magnesiaEnergyEv = (-4 * 1.747564594633182 * 14.399645469) / 2.106;
