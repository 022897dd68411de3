import { reciprocalVectors } from '#common/physics/cell-metric';
import {
  ATOMIC_MASS_KG,
  COULOMB_EV_ANGSTROM,
  ELEMENTARY_CHARGE_C,
  SPEED_OF_LIGHT_M_PER_S,
} from '#common/units/constants';

import type { CellOperation, PairModelInput, PairModelResult } from './contract.js';
import { symmetricEigensystem } from './linear-algebra.js';
import { pairModel } from './pair-model.js';
import { placeOperations, symmetricDirections, type SparseDirection } from './symmetry.js';

export interface VibrationsInput extends PairModelInput {
  /** Masses in u, one a site. */
  readonly massesU: ArrayLike<number>;
  /**
   * Operations of the cell, of which only pure translations count: in a centred cell, the modes are
   * those of its primitive cell, in which cells joined by a centring move alike.
   */
  readonly operations: readonly CellOperation[];
}

export interface GammaMode {
  /** ω², eV Å⁻² u⁻¹. */
  readonly squareEvPerA2U: number;
  /** √|ω²|/2π. */
  readonly frequencyThz: number;
  readonly wavenumberPerCm: number;
  readonly isImaginary: boolean;
  readonly isAcoustic: boolean;
  /** Modes of one frequency carry one number. */
  readonly level: number;
  /** |Σ Z_i e_i/√m_i| of a primitive cell, e u^{−1/2}. */
  readonly dipoleStrength: number;
  /** e_i/√m_i, three Cartesian components a site, the longest arrow of length 1. */
  readonly displacements: Float64Array;
}

export interface GammaVibrations {
  /** Without the macroscopic field, ascending by ω². */
  readonly transverse: readonly GammaMode[];
  /** With the field of waves along a*, b* and c*. */
  readonly longitudinal: readonly {
    readonly name: 'a*' | 'b*' | 'c*';
    readonly direction: readonly [number, number, number];
    readonly modes: readonly GammaMode[];
  }[];
  readonly acousticResidualEvPerA2: number;
  readonly maxForceEvPerA: number;
  readonly isAtRest: boolean;
  readonly model: PairModelResult;
}

/** Up to here forces count as those of ions at rest. */
const restForceEvPerA = 1e-3;

/** ω² closer to zero than this part of the largest is zero to rounding. */
const zeroPart = 1e-10;

/** Frequencies closer than this part of the largest ω² belong to one level. */
const levelPart = 1e-8;

/** √(1 eV Å⁻² u⁻¹)/2π in THz. */
const rootInThz = Math.sqrt(ELEMENTARY_CHARGE_C / (ATOMIC_MASS_KG * 1e-20)) / (2 * Math.PI * 1e12);

/** Wavenumber of 1 THz in cm⁻¹: 10¹²/(100 c). */
const perCmOfThz = 1e10 / SPEED_OF_LIGHT_M_PER_S;

/** Directions in which a mode of the primitive cell may go, and how many such cells there are. */
interface PrimitiveSpace {
  readonly directions: readonly SparseDirection[];
  readonly cells: number;
}

function primitiveSpace(input: VibrationsInput): PrimitiveSpace {
  const unit = [1, 0, 0, 0, 1, 0, 0, 0, 1];
  const pure = input.operations.filter(({ rotation }) => rotation.every((w, k) => w === unit[k]));
  const kept = pure.length > 0 ? pure : [{ rotation: unit, translation: [0, 0, 0] }];
  const placed = placeOperations(input, kept);
  return {
    directions: symmetricDirections(placed, input.chargesE.length, null),
    cells: kept.length,
  };
}

/** Components of a list of 3N numbers along each direction. */
function reduced(space: PrimitiveSpace, full: ArrayLike<number>): Float64Array {
  return Float64Array.from(space.directions, ({ at, value }) =>
    value.reduce((sum, x, k) => sum + x * full[at[k]!]!, 0),
  );
}

/** D = K_ij/√(m_i m_j) in the directions of the primitive cell. */
function dynamicalMatrix(
  space: PrimitiveSpace,
  forceConstants: Float64Array,
  massesU: ArrayLike<number>,
): Float64Array {
  const n = space.directions.length;
  const width = 3 * massesU.length;
  const matrix = new Float64Array(n * n);
  space.directions.forEach((row, p) => {
    space.directions.forEach((column, q) => {
      let sum = 0;
      for (let a = 0; a < row.at.length; a += 1) {
        const i = row.at[a]!;
        for (let b = 0; b < column.at.length; b += 1) {
          const j = column.at[b]!;
          const masses = massesU[Math.floor(i / 3)]! * massesU[Math.floor(j / 3)]!;
          const k = forceConstants[i * width + j]!;
          sum += (row.value[a]! * column.value[b]! * k) / Math.sqrt(masses);
        }
      }
      matrix[p * n + q] = sum;
    });
  });
  return matrix;
}

/** z_i = Z_i q̂/√m_i, so that the field adds (4πk_e/V) z zᵀ to D. */
function chargeVector(input: VibrationsInput, direction: readonly number[]): Float64Array {
  return Float64Array.from({ length: 3 * input.massesU.length }, (_, k) => {
    const site = Math.floor(k / 3);
    return (input.chargesE[site]! * direction[k % 3]!) / Math.sqrt(input.massesU[site]!);
  });
}

/** Unit vectors of the three translations in mass-weighted coordinates. */
function translations(massesU: ArrayLike<number>): Float64Array[] {
  let whole = 0;
  for (let i = 0; i < massesU.length; i += 1) {
    whole += massesU[i]!;
  }
  return [0, 1, 2].map((axis) =>
    Float64Array.from({ length: 3 * massesU.length }, (_, k) =>
      k % 3 === axis ? Math.sqrt(massesU[Math.floor(k / 3)]! / whole) : 0,
    ),
  );
}

function addOuter(matrix: Float64Array, v: Float64Array, factor: number): void {
  const n = v.length;
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < n; j += 1) {
      matrix[i * n + j]! += factor * v[i]! * v[j]!;
    }
  }
}

/** e/√m with the longest arrow of length 1, and the dipole strength of the unit vector. */
function displacementsOf(input: VibrationsInput, space: PrimitiveSpace, vector: Float64Array) {
  const displacements = new Float64Array(3 * input.massesU.length);
  space.directions.forEach(({ at, value }, p) => {
    at.forEach((entry, k) => {
      const mass = input.massesU[Math.floor(entry / 3)]!;
      displacements[entry]! += (vector[p]! * value[k]!) / Math.sqrt(mass);
    });
  });
  const dipole = [0, 0, 0];
  let longest = 0;
  for (let i = 0; i < input.massesU.length; i += 1) {
    const arrow = displacements.subarray(3 * i, 3 * i + 3);
    longest = Math.max(longest, Math.hypot(arrow[0]!, arrow[1]!, arrow[2]!));
    arrow.forEach((x, axis) => (dipole[axis]! += input.chargesE[i]! * x));
  }
  return {
    displacements: displacements.map((x) => x / longest),
    // A unit vector spread over several primitive cells carries the root of their number less.
    dipoleStrength: Math.hypot(...dipole) / Math.sqrt(space.cells),
  };
}

/**
 * Modes of D. The translations are lifted above all others before the eigenvectors are taken, so
 * that no other mode mixes with them, and come back with the frequency zero they have.
 */
function modesOf(input: VibrationsInput, space: PrimitiveSpace, matrix: Float64Array): GammaMode[] {
  const n = space.directions.length;
  const lifted = matrix.slice();
  const lift = 4 * matrix.reduce((most, value) => Math.max(most, Math.abs(value)), 1e-12) * n;
  translations(input.massesU).forEach((shift) => addOuter(lifted, reduced(space, shift), lift));
  const { values, vectors } = symmetricEigensystem(lifted, n);
  const scale = values
    .subarray(0, n - 3)
    .reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const rows = Array.from({ length: n }, (_, k) => ({
    square: k < n - 3 ? values[k]! : 0,
    vector: vectors.subarray(k * n, k * n + n),
    isAcoustic: k >= n - 3,
  })).sort((one, other) => one.square - other.square);
  let level = 0;
  return rows.map(({ square, vector, isAcoustic }, k) => {
    if (k > 0 && square - rows[k - 1]!.square > levelPart * scale) {
      level += 1;
    }
    const frequencyThz = rootInThz * Math.sqrt(Math.abs(square));
    return {
      squareEvPerA2U: square,
      frequencyThz,
      wavenumberPerCm: frequencyThz * perCmOfThz,
      isImaginary: square < -zeroPart * scale,
      isAcoustic,
      level,
      ...displacementsOf(input, space, vector),
    };
  });
}

/** Largest component of Σ_j K_ij. */
function acousticResidual(k: Float64Array, width: number): number {
  let largest = 0;
  for (let row = 0; row < width; row += 1) {
    const sum = [0, 0, 0];
    for (let column = 0; column < width; column += 1) {
      sum[column % 3]! += k[row * width + column]!;
    }
    largest = Math.max(largest, ...sum.map(Math.abs));
  }
  return largest;
}

/** Vibrations of a checked input; see the door. */
export function vibrationsOf(input: VibrationsInput): GammaVibrations {
  const model = pairModel(input, true);
  const k = model.second!.forceConstantsEvPerA2;
  const space = primitiveSpace(input);
  const matrix = dynamicalMatrix(space, k, input.massesU);
  const b = reciprocalVectors(Array.from(input.vectorsA));
  const factor = (4 * Math.PI * COULOMB_EV_ANGSTROM) / model.volumeA3;
  const longitudinal = (['a*', 'b*', 'c*'] as const).map((name, row) => {
    const [x, y, z] = [b[3 * row]!, b[3 * row + 1]!, b[3 * row + 2]!];
    const length = Math.hypot(x, y, z);
    const direction = [x / length, y / length, z / length] as const;
    const withField = matrix.slice();
    addOuter(withField, reduced(space, chargeVector(input, direction)), factor);
    return { name, direction, modes: modesOf(input, space, withField) };
  });
  const maxForceEvPerA = model.forcesEvPerA.reduce((most, f) => Math.max(most, Math.abs(f)), 0);
  return {
    transverse: modesOf(input, space, matrix),
    longitudinal,
    acousticResidualEvPerA2: acousticResidual(k, 3 * input.massesU.length),
    maxForceEvPerA,
    isAtRest: maxForceEvPerA <= restForceEvPerA,
    model,
  };
}
