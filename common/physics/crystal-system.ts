import type { LatticeParameterName, LatticeParameterTexts } from '#common/schemas/cell';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';

/** What symmetry asks of one lattice parameter. */
export type LatticeConstraint =
  | { readonly kind: 'free' }
  | { readonly kind: 'equals'; readonly other: LatticeParameterName }
  | { readonly kind: 'fixed'; readonly value: number };

export type LatticeConstraints = Readonly<Record<LatticeParameterName, LatticeConstraint>>;

export const latticeParameterNames: readonly LatticeParameterName[] = [
  'a',
  'b',
  'c',
  'alpha',
  'beta',
  'gamma',
];

const free: LatticeConstraint = { kind: 'free' };
const right: LatticeConstraint = { kind: 'fixed', value: 90 };
const equals = (other: LatticeParameterName): LatticeConstraint => ({ kind: 'equals', other });

const allFree: LatticeConstraints = {
  a: free,
  b: free,
  c: free,
  alpha: free,
  beta: free,
  gamma: free,
};

function monoclinic(uniqueAxis: 'a' | 'b' | 'c' | null): LatticeConstraints {
  return {
    ...allFree,
    alpha: uniqueAxis === 'a' ? free : right,
    beta: uniqueAxis === 'a' || uniqueAxis === 'c' ? right : free,
    gamma: uniqueAxis === 'c' ? free : right,
  };
}

const hexagonalAxes: LatticeConstraints = {
  a: free,
  b: equals('a'),
  c: free,
  alpha: right,
  beta: right,
  gamma: { kind: 'fixed', value: 120 },
};

const rhombohedralAxes: LatticeConstraints = {
  a: free,
  b: equals('a'),
  c: equals('a'),
  alpha: free,
  beta: equals('alpha'),
  gamma: equals('alpha'),
};

/**
 * What the crystal system asks of the lattice parameters in this setting
 * (International Tables for Crystallography Vol. A, table 2.1.1.1).
 *
 * @param setting the space-group setting; null for bare operations, which constrain nothing here
 */
export function latticeConstraints(setting: SpaceGroupSetting | null): LatticeConstraints {
  switch (setting?.crystalSystem) {
    case undefined:
    case 'triclinic':
      return allFree;
    case 'monoclinic':
      return monoclinic(setting?.uniqueAxis ?? null);
    case 'orthorhombic':
      return { ...allFree, alpha: right, beta: right, gamma: right };
    case 'tetragonal':
      return { ...allFree, b: equals('a'), alpha: right, beta: right, gamma: right };
    case 'trigonal':
      return setting?.hexagonalAxes ? hexagonalAxes : rhombohedralAxes;
    case 'hexagonal':
      return hexagonalAxes;
    case 'cubic':
      return {
        a: free,
        b: equals('a'),
        c: equals('a'),
        alpha: right,
        beta: right,
        gamma: right,
      };
  }
}

/** The lattice parameters with every dependent text filled in: b = a, γ = 120 and so on. */
export function applyLatticeConstraints(
  texts: LatticeParameterTexts,
  setting: SpaceGroupSetting | null,
): LatticeParameterTexts {
  const constraints = latticeConstraints(setting);
  const result = { ...texts };
  for (const name of latticeParameterNames) {
    const constraint = constraints[name];
    if (constraint.kind === 'fixed') {
      result[name] = String(constraint.value);
    } else if (constraint.kind === 'equals') {
      result[name] = result[constraint.other];
    }
  }
  return result;
}
