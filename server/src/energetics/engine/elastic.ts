import { EV_PER_CUBIC_ANGSTROM_IN_GPA } from '#common/units/constants';

import { tensorPairs, type PairModelInput, type PairModelResult } from './contract.js';
import { choleskyFactor, choleskySolve, symmetricEigensystem } from './linear-algebra.js';
import { pairModel } from './pair-model.js';

export interface ElasticConstants {
  /** C of relaxed ions, 6 × 6, row-major, GPa. */
  readonly stiffnessGpa: Float64Array;
  /** C of ions held at their fractional coordinates. */
  readonly clampedStiffnessGpa: Float64Array;
  /** S = C⁻¹, GPa⁻¹; null where C is singular. */
  readonly compliancePerGpa: Float64Array | null;
  /** Eigenvalues of C in orthonormal components (shear rows and columns × √2), ascending. */
  readonly eigenvaluesGpa: Float64Array;
  readonly stressGpa: Float64Array;
  /** −tr σ/3. */
  readonly pressureGpa: number;
  readonly maxForceEvPerA: number;
  readonly isAtRest: boolean;
  /** Number of negative eigenvalues of K, translations left out. */
  readonly unstableInternalModes: number;
  readonly model: PairModelResult;
}

/** Up to here forces and stress count as those of a cell at rest. */
const restForceEvPerA = 1e-3;
const restStressGpa = 0.1;

/** Eigenvalues of K below this part of the largest are no curvature but rounding. */
const flatPart = 1e-10;

/** K with the cost of a shift of the whole cell added, so that it can be inverted. */
function heldForceConstants(k: Float64Array, count: number): Float64Array {
  const width = 3 * count;
  let trace = 0;
  for (let i = 0; i < width; i += 1) {
    trace += Math.abs(k[i * width + i]!);
  }
  const held = trace / (width * count) || 1;
  return k.map((value, at) => {
    const [i, j] = [Math.floor(at / width), at % width];
    return i % 3 === j % 3 ? value + held : value;
  });
}

/** Λᵀ K⁻¹ Λ by Cholesky's factor; null where K is not positive definite. */
function relaxationByFactor(held: Float64Array, mixed: Float64Array, width: number) {
  const factor = choleskyFactor(held, width);
  if (factor === null) {
    return null;
  }
  const columns = [0, 1, 2, 3, 4, 5].map((v) => {
    const column = Float64Array.from({ length: width }, (_, i) => mixed[6 * i + v]!);
    choleskySolve(factor, width, column);
    return column;
  });
  return Float64Array.from({ length: 36 }, (_, at) => {
    const column = columns[at % 6]!;
    return column.reduce((sum, x, i) => sum + mixed[6 * i + Math.floor(at / 6)]! * x, 0);
  });
}

/** The same by eigenvectors, flat ones left out, with the number of negative eigenvalues. */
function relaxationByModes(held: Float64Array, mixed: Float64Array, width: number) {
  const { values, vectors } = symmetricEigensystem(held, width);
  const largest = values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const relaxed = new Float64Array(36);
  let unstable = 0;
  values.forEach((value, mode) => {
    if (Math.abs(value) <= flatPart * largest) {
      return;
    }
    unstable += value < 0 ? 1 : 0;
    const along = new Float64Array(6);
    for (let i = 0; i < width; i += 1) {
      for (let v = 0; v < 6; v += 1) {
        along[v]! += vectors[mode * width + i]! * mixed[6 * i + v]!;
      }
    }
    for (let at = 0; at < 36; at += 1) {
      relaxed[at]! += (along[Math.floor(at / 6)]! * along[at % 6]!) / value;
    }
  });
  return { relaxed, unstable };
}

/** Λᵀ K⁺ Λ in eV: what the ions give back when they follow a strain. */
function internalRelaxation(model: PairModelResult): { relaxed: Float64Array; unstable: number } {
  const { forceConstantsEvPerA2, internalStrainEvPerA } = model.second!;
  const width = model.forcesEvPerA.length;
  const held = heldForceConstants(forceConstantsEvPerA2, width / 3);
  const relaxed = relaxationByFactor(held, internalStrainEvPerA, width);
  return relaxed === null
    ? relaxationByModes(held, internalStrainEvPerA, width)
    : { relaxed, unstable: 0 };
}

/**
 * From ∂²E/∂ε∂ε (F = 1 + ε) to the coefficients of stress against strain in a cell under stress σ.
 * By Lagrange's strain η = ε + ½ε²: C = A − ¼(σ_ac δ_bd + σ_ad δ_bc + σ_bc δ_ad + σ_bd δ_ac); of
 * stress against strain: C + ½(σ_ac δ_bd + σ_ad δ_bc + σ_bc δ_ad + σ_bd δ_ac) − σ_ab δ_cd, the last
 * term symmetrised. At rest both corrections vanish.
 * Source: T. H. K. Barron, M. L. Klein, Proc. Phys. Soc. 85 (1965) 523; D. C. Wallace,
 * Thermodynamics of Crystals (1972), § 2 (both from memory; the tests differentiate the stress).
 */
export function stressStrainCorrection(stress: ArrayLike<number>): Float64Array {
  const at = [0, 5, 4, 5, 1, 3, 4, 3, 2];
  const sigma = (i: number, j: number) => stress[at[3 * i + j]!]!;
  const delta = (i: number, j: number) => (i === j ? 1 : 0);
  return Float64Array.from({ length: 36 }, (_, index) => {
    const [a, b] = tensorPairs[Math.floor(index / 6)]!;
    const [c, d] = tensorPairs[index % 6]!;
    const mixed =
      sigma(a, c) * delta(b, d) +
      sigma(a, d) * delta(b, c) +
      sigma(b, c) * delta(a, d) +
      sigma(b, d) * delta(a, c);
    return mixed / 4 - (sigma(a, b) * delta(c, d) + sigma(c, d) * delta(a, b)) / 2;
  });
}

/** √2 for each shear index: six components become those of a vector of Frobenius' norm. */
function mandelFactor(v: number): number {
  return v < 3 ? 1 : Math.SQRT2;
}

/** Eigenvalues of C in orthonormal components. */
export function stiffnessEigenvalues(stiffness: Float64Array): Float64Array {
  const mandel = stiffness.map(
    (value, at) => value * mandelFactor(Math.floor(at / 6)) * mandelFactor(at % 6),
  );
  return symmetricEigensystem(mandel, 6).values;
}

/** C⁻¹ by eigenvectors; null where an eigenvalue is zero to rounding. */
export function inverseOf(stiffness: Float64Array): Float64Array | null {
  const { values, vectors } = symmetricEigensystem(stiffness, 6);
  const largest = values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  if (!values.every((value) => Math.abs(value) > 1e-12 * largest)) {
    return null;
  }
  return Float64Array.from({ length: 36 }, (_, at) => {
    const [i, j] = [Math.floor(at / 6), at % 6];
    return values.reduce(
      (sum, value, k) => sum + (vectors[6 * k + i]! * vectors[6 * k + j]!) / value,
      0,
    );
  });
}

/** Elastic constants of a checked input; see the door. */
export function elasticOf(input: PairModelInput): ElasticConstants {
  const model = pairModel(input, true);
  const gpa = EV_PER_CUBIC_ANGSTROM_IN_GPA;
  const { relaxed, unstable } = internalRelaxation(model);
  const correction = stressStrainCorrection(model.stressEvPerA3);
  const clamped = model.second!.strainStrainEv.map(
    (value, at) => gpa * (value / model.volumeA3 + correction[at]!),
  );
  const stiffnessGpa = clamped.map((value, at) => {
    const mirrored = 6 * (at % 6) + Math.floor(at / 6);
    return value - (gpa * 0.5 * (relaxed[at]! + relaxed[mirrored]!)) / model.volumeA3;
  });
  const stressGpa = model.stressEvPerA3.map((value) => gpa * value);
  const maxForceEvPerA = model.forcesEvPerA.reduce((most, f) => Math.max(most, Math.abs(f)), 0);
  return {
    stiffnessGpa,
    clampedStiffnessGpa: clamped,
    compliancePerGpa: inverseOf(stiffnessGpa),
    eigenvaluesGpa: stiffnessEigenvalues(stiffnessGpa),
    stressGpa,
    pressureGpa: -(stressGpa[0]! + stressGpa[1]! + stressGpa[2]!) / 3,
    maxForceEvPerA,
    isAtRest:
      maxForceEvPerA <= restForceEvPerA && stressGpa.every((s) => Math.abs(s) <= restStressGpa),
    unstableInternalModes: unstable,
    model,
  };
}
