import { stiffnessEigenvalues } from './elastic.js';

export type CrystalSystem =
  'triclinic' | 'monoclinic' | 'orthorhombic' | 'tetragonal' | 'trigonal' | 'hexagonal' | 'cubic';

/** One criterion; it holds where the value is positive. */
export interface StabilityCriterion {
  readonly statement: string;
  readonly value: number;
  readonly unit: 'GPa' | 'GPa²' | 'GPa³';
  readonly holds: boolean;
}

export interface Stability {
  readonly system: CrystalSystem;
  /** Every eigenvalue of C is positive: necessary and sufficient whatever the system. */
  readonly isStable: boolean;
  readonly criteria: readonly StabilityCriterion[];
  readonly source: string;
}

const generalSource =
  'M. Born, K. Huang, Dynamical Theory of Crystal Lattices (1954): positive definite stiffness';
const systemSource =
  'F. Mouhat, F.-X. Coudert, Phys. Rev. B 90, 224104 (2014); forms for the crystal systems from memory';

/** Part of the largest entry below which an entry counts as zero or two as equal. */
const formWithin = 1e-5;

type Entries = (i: number, j: number) => number;

function criterion(
  statement: string,
  unit: StabilityCriterion['unit'],
  value: number,
): StabilityCriterion {
  return { statement: `${statement} > 0`, unit, value, holds: value > 0 };
}

function cubic(c: Entries): StabilityCriterion[] {
  return [
    criterion('C₁₁ − C₁₂', 'GPa', c(1, 1) - c(1, 2)),
    criterion('C₁₁ + 2C₁₂', 'GPa', c(1, 1) + 2 * c(1, 2)),
    criterion('C₄₄', 'GPa', c(4, 4)),
  ];
}

/** What tetragonal, hexagonal and trigonal cells share: an axis along z. */
function axial(c: Entries): StabilityCriterion[] {
  return [
    criterion('C₁₁ − |C₁₂|', 'GPa', c(1, 1) - Math.abs(c(1, 2))),
    criterion('C₃₃(C₁₁ + C₁₂) − 2C₁₃²', 'GPa²', c(3, 3) * (c(1, 1) + c(1, 2)) - 2 * c(1, 3) ** 2),
    criterion('C₄₄', 'GPa', c(4, 4)),
  ];
}

function tetragonal(c: Entries): StabilityCriterion[] {
  const square = c(6, 6) * (c(1, 1) - c(1, 2)) - 2 * c(1, 6) ** 2;
  return [
    ...axial(c),
    criterion('C₆₆', 'GPa', c(6, 6)),
    criterion('C₆₆(C₁₁ − C₁₂) − 2C₁₆²', 'GPa²', square),
  ];
}

function trigonal(c: Entries): StabilityCriterion[] {
  const mixed = c(1, 4) ** 2 + c(1, 5) ** 2;
  return [
    ...axial(c),
    criterion('C₄₄(C₁₁ − C₁₂) − 2(C₁₄² + C₁₅²)', 'GPa²', c(4, 4) * (c(1, 1) - c(1, 2)) - 2 * mixed),
  ];
}

function orthorhombic(c: Entries): StabilityCriterion[] {
  const determinant =
    c(1, 1) * c(2, 2) * c(3, 3) +
    2 * c(1, 2) * c(1, 3) * c(2, 3) -
    c(1, 1) * c(2, 3) ** 2 -
    c(2, 2) * c(1, 3) ** 2 -
    c(3, 3) * c(1, 2) ** 2;
  return [
    criterion('C₁₁', 'GPa', c(1, 1)),
    criterion('C₁₁C₂₂ − C₁₂²', 'GPa²', c(1, 1) * c(2, 2) - c(1, 2) ** 2),
    criterion('det C₁…₃', 'GPa³', determinant),
    criterion('C₄₄', 'GPa', c(4, 4)),
    criterion('C₅₅', 'GPa', c(5, 5)),
    criterion('C₆₆', 'GPa', c(6, 6)),
  ];
}

/** Pairs of entries a system makes equal, and entries it makes zero; upper triangle, from 1. */
const forms: Partial<Record<CrystalSystem, { equal: readonly string[]; free: readonly string[] }>> =
  {
    cubic: {
      equal: ['11=22', '11=33', '12=13', '12=23', '44=55', '44=66'],
      free: ['12', '13', '23'],
    },
    tetragonal: { equal: ['11=22', '13=23', '44=55'], free: ['12', '13', '23', '16', '26'] },
    hexagonal: { equal: ['11=22', '13=23', '44=55'], free: ['12', '13', '23'] },
    trigonal: {
      equal: ['11=22', '13=23', '44=55'],
      free: ['12', '13', '23', '14', '15', '24', '25', '46', '56'],
    },
    orthorhombic: { equal: [], free: ['12', '13', '23'] },
  };

/** Whether C has the form its system gives it in the usual axes, so that its criteria apply. */
function hasForm(c: Entries, system: CrystalSystem): boolean {
  const form = forms[system];
  if (form === undefined) {
    return false;
  }
  const pairs: [number, number][] = [];
  for (let i = 1; i <= 6; i += 1) {
    for (let j = i; j <= 6; j += 1) {
      pairs.push([i, j]);
    }
  }
  const within = formWithin * Math.max(...pairs.map(([i, j]) => Math.abs(c(i, j))));
  const entry = (name: string) => c(Number(name[0]), Number(name[1]));
  const areEqual = form.equal.every((pair) => {
    const [one, other] = pair.split('=') as [string, string];
    return Math.abs(entry(one) - entry(other)) <= within;
  });
  return (
    areEqual &&
    pairs.every(
      ([i, j]) => i === j || form.free.includes(`${i}${j}`) || Math.abs(c(i, j)) <= within,
    )
  );
}

const criteriaOf: Partial<Record<CrystalSystem, (c: Entries) => StabilityCriterion[]>> = {
  cubic,
  tetragonal,
  trigonal,
  orthorhombic,
  hexagonal: axial,
};

const subscripts = ['₁', '₂', '₃', '₄', '₅', '₆'];

/**
 * Born's criteria of mechanical stability. Positive eigenvalues of C decide; the criteria of the
 * crystal system say the same in closed form where C has that system's shape in these axes
 * (c along z, a along x), and the eigenvalues are listed otherwise.
 *
 * @param stiffnessGpa C, 6 × 6
 */
export function bornStability(stiffnessGpa: Float64Array, system: CrystalSystem): Stability {
  const eigenvalues = stiffnessEigenvalues(stiffnessGpa);
  const c: Entries = (i, j) => stiffnessGpa[6 * (i - 1) + j - 1]!;
  const isShaped = hasForm(c, system);
  const criteria = isShaped
    ? criteriaOf[system]!(c)
    : Array.from(eigenvalues, (value, k) => criterion(`λ${subscripts[k]}`, 'GPa', value));
  return {
    system,
    isStable: eigenvalues.every((value) => value > 0),
    criteria,
    source: isShaped ? systemSource : generalSource,
  };
}
