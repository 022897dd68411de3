import { describe, expect, it } from 'vitest';

import {
  ATOMIC_MASS_KG,
  COULOMB_EV_ANGSTROM,
  ELEMENTARY_CHARGE_C,
  SPEED_OF_LIGHT_M_PER_S,
} from '#common/units/constants';
import {
  allPairs,
  fittingOperations,
  fluorite,
  moved,
  pointOperations,
  rockSalt,
  rutile,
  rutileOperations,
  supercell,
  tight,
  unlikeOnly,
} from '#tests/helpers/pair-model-cells';

import type { PairModelInput } from './contract.js';
import { evaluatePairModel, relax, vibrationsAtGamma } from './index.js';
import { symmetricEigensystem } from './linear-algebra.js';

const none = { operations: [] };

function atRest(
  cell: PairModelInput,
  operations = fittingOperations(cell, pointOperations(cell.vectorsA)),
) {
  const { ended, vectorsA, fractional } = relax({ ...cell, operations, criteria: tight });
  expect(ended).toBe('converged');
  return { ...cell, vectorsA, fractional };
}

const massOf = [24.3, 16];
const withMasses = (cell: PairModelInput) => ({
  ...cell,
  massesU: Array.from(cell.speciesIndex, (s) => massOf[s]!),
  ...none,
});

const cells: readonly [string, () => PairModelInput][] = [
  ['rock salt', () => atRest(rockSalt(5.7, allPairs))],
  ['fluorite', () => atRest(fluorite())],
  ['rutile', () => atRest(rutile(), rutileOperations())],
];

/** ω² from central differences of forces, of error h⁴. */
function squaresByDifferences(cell: PairModelInput, massesU: readonly number[]): Float64Array {
  const n = 3 * massesU.length;
  const h = 1e-3;
  const d = new Float64Array(n * n);
  for (let i = 0; i < n; i += 1) {
    const forcesAt = (times: number) => {
      const u = new Float64Array(n);
      u[i] = times * h;
      return evaluatePairModel(moved(cell, u, new Float64Array(6))).forcesEvPerA;
    };
    const [a, b, c, e] = [-2, -1, 1, 2].map(forcesAt) as [
      Float64Array,
      Float64Array,
      Float64Array,
      Float64Array,
    ];
    for (let j = 0; j < n; j += 1) {
      const k = -(a[j]! - 8 * b[j]! + 8 * c[j]! - e[j]!) / (12 * h);
      d[i * n + j] = k / Math.sqrt(massesU[Math.floor(i / 3)]! * massesU[Math.floor(j / 3)]!);
    }
  }
  const even = d.map((value, at) => 0.5 * (value + d[(at % n) * n + Math.floor(at / n)]!));
  return symmetricEigensystem(even, n).values;
}

/** Frequencies in rad s⁻¹ from eV Å⁻² u⁻¹, for closed formulas. */
const perSecondSquare = ELEMENTARY_CHARGE_C / (ATOMIC_MASS_KG * 1e-20);

describe.each(cells)('modes of %s', (_name, make) => {
  const cell = make();
  const input = withMasses(cell);
  const result = vibrationsAtGamma(input);

  it('are those of differences of forces', () => {
    const found = squaresByDifferences(cell, input.massesU);
    const scale = Math.abs(found.at(-1)!);
    result.transverse.forEach(({ squareEvPerA2U }, k) => {
      expect(Math.abs(squareEvPerA2U - found[k]!)).toBeLessThanOrEqual(1e-6 * scale);
    });
  });

  it('are 3N, three of them translations of frequency zero', () => {
    expect(result.transverse).toHaveLength(3 * cell.chargesE.length);
    const acoustic = result.transverse.filter(({ isAcoustic }) => isAcoustic);
    expect(acoustic).toHaveLength(3);
    for (const { frequencyThz, displacements, dipoleStrength } of acoustic) {
      expect(frequencyThz).toBe(0);
      expect(dipoleStrength).toBeLessThan(1e-12);
      for (let k = 3; k < displacements.length; k += 1) {
        expect(displacements[k]).toBeCloseTo(displacements[k - 3]!, 10);
      }
    }
    expect(result.acousticResidualEvPerA2).toBeLessThanOrEqual(1e-12);
    expect(result.transverse.some(({ isImaginary }) => isImaginary)).toBe(false);
  });

  it('keep the centre of mass, and their longest arrow has length 1', () => {
    for (const { displacements, isAcoustic } of result.transverse) {
      const lengths = input.massesU.map((_, i) =>
        Math.hypot(...displacements.subarray(3 * i, 3 * i + 3)),
      );
      expect(Math.max(...lengths)).toBeCloseTo(1, 12);
      if (!isAcoustic) {
        for (let axis = 0; axis < 3; axis += 1) {
          const sum = input.massesU.reduce((s, m, i) => s + m * displacements[3 * i + axis]!, 0);
          expect(Math.abs(sum)).toBeLessThanOrEqual(1e-10);
        }
      }
    }
  });

  it('agree with the units they say', () => {
    for (const { squareEvPerA2U, frequencyThz, wavenumberPerCm } of result.transverse) {
      const hertz = Math.sqrt(Math.abs(squareEvPerA2U) * perSecondSquare) / (2 * Math.PI);
      expect(frequencyThz).toBeCloseTo(hertz / 1e12, 10);
      expect(wavenumberPerCm).toBeCloseTo(hertz / (100 * SPEED_OF_LIGHT_M_PER_S), 8);
    }
  });

  it('rise with the field, by the dipoles they carry: Σω² grows by 4πk Σ Z²/mV', () => {
    // The trace of (4πk/V) z zᵀ with |q̂| = 1.
    const volume = evaluatePairModel(cell).volumeA3;
    const expected =
      ((4 * Math.PI * COULOMB_EV_ANGSTROM) / volume) *
      input.massesU.reduce((sum, m, i) => sum + cell.chargesE[i]! ** 2 / m, 0);
    const total = (modes: typeof result.transverse) =>
      modes.reduce((sum, { squareEvPerA2U }) => sum + squareEvPerA2U, 0);
    for (const { modes, direction } of result.longitudinal) {
      expect(Math.hypot(...direction)).toBeCloseTo(1, 12);
      expect(total(modes) - total(result.transverse)).toBeCloseTo(expected, 10);
      // A term of rank one lifts no level past the next (H. Weyl, Math. Ann. 71 (1912) 441).
      modes.forEach(({ squareEvPerA2U }, k) => {
        const slack = 1e-10;
        expect(squareEvPerA2U).toBeGreaterThanOrEqual(result.transverse[k]!.squareEvPerA2U - slack);
      });
    }
  });

  it('are those of the primitive cell in a cell centred by translations', () => {
    const double = supercell(cell, [1, 1, 2]);
    const unit = [1, 0, 0, 0, 1, 0, 0, 0, 1];
    const operations = [0, 0.5].map((z) => ({ rotation: unit, translation: [0, 0, z] }));
    const folded = vibrationsAtGamma({ ...withMasses(double), operations });
    expect(folded.transverse).toHaveLength(result.transverse.length);
    const pairs = [
      [folded.transverse, result.transverse],
      [folded.longitudinal[0]!.modes, result.longitudinal[0]!.modes],
    ] as const;
    for (const [found, expected] of pairs) {
      found.forEach((mode, k) => {
        expect(mode.wavenumberPerCm).toBeCloseTo(expected[k]!.wavenumberPerCm, 7);
        expect(mode.level).toBe(expected[k]!.level);
      });
    }
    // Dipoles of a level add up to the same whatever vectors span it.
    const dipoles = (modes: typeof result.transverse) =>
      modes.reduce((sum, { dipoleStrength }) => sum + dipoleStrength ** 2, 0);
    expect(dipoles(folded.transverse)).toBeCloseTo(dipoles(result.transverse), 10);
    for (const { displacements } of folded.transverse) {
      const width = 3 * cell.chargesE.length;
      displacements.subarray(0, width).forEach((x, k) => {
        expect(displacements[width + k]).toBeCloseTo(x, 10);
      });
    }
  });
});

describe('rock salt of rigid ions', () => {
  const cell = atRest(rockSalt(5.7, unlikeOnly));
  const { transverse, longitudinal } = vibrationsAtGamma(withMasses(cell));
  const volume = evaluatePairModel(cell).volumeA3;
  const mu = 1 / (1 / massOf[0]! + 1 / massOf[1]!);
  const to = transverse.at(-1)!.squareEvPerA2U;

  it('has ω_LO² − ω_TO² = 4πk Z²/(μV) in every direction', () => {
    // M. Born, K. Huang (1954), § 7, with the polarisability of rigid ions left out.
    const expected = (4 * Math.PI * COULOMB_EV_ANGSTROM) / (mu * volume);
    for (const { modes } of longitudinal) {
      const squares = modes.map(({ squareEvPerA2U }) => squareEvPerA2U);
      expect(squares[5]! - to).toBeCloseTo(expected, 11);
      expect(squares[4]).toBeCloseTo(to, 11);
      expect(squares[3]).toBeCloseTo(to, 11);
    }
  });

  it('has μ(ω_LO² + 2ω_TO²) = 6(φ″ + 2φ′/r): charges drop out', () => {
    // R. Brout, Phys. Rev. 113 (1959) 43 (from memory): the Laplacian of 1/r is zero.
    const [{ prefactorEv: a, hardnessA: rho }] = unlikeOnly as unknown as [
      (typeof unlikeOnly)[number],
    ];
    const laplacian = (r: number) => a * Math.exp(-r / rho) * (1 / rho ** 2 - 2 / (rho * r));
    const d = Math.cbrt(volume / 2);
    // Shells of unlike ions in units of d: 6 at 1, 8 at √3, 24 at √5, 30 at 3 and so on.
    const shells = [
      [6, 1],
      [8, Math.sqrt(3)],
      [24, Math.sqrt(5)],
      [30, 3],
      [24, Math.sqrt(11)],
      [24, Math.sqrt(13)],
    ] as const;
    const expected = shells.reduce((sum, [n, x]) => sum + n * laplacian(x * d), 0);
    const lo = longitudinal[0]!.modes.at(-1)!.squareEvPerA2U;
    expect(Math.abs(mu * (lo + 2 * to) - expected)).toBeLessThanOrEqual(1e-9 * expected);
  });

  it('moves ions against each other in the ratio of their masses', () => {
    const { displacements, dipoleStrength } = transverse.at(-1)!;
    for (let axis = 0; axis < 3; axis += 1) {
      const sum = massOf[0]! * displacements[axis]! + massOf[1]! * displacements[3 + axis]!;
      expect(Math.abs(sum)).toBeLessThanOrEqual(1e-12);
    }
    expect(dipoleStrength).toBeCloseTo(1 / Math.sqrt(mu), 10);
  });
});

describe('imaginary modes', () => {
  it('show where ions sit on a hump', () => {
    // A cation between two anions far apart along c.
    const cell = withMasses({
      vectorsA: [2.9, 0, 0, 0, 2.9, 0, 0, 0, 8],
      fractional: [0, 0, 0, 0, 0, 0.5],
      chargesE: [1, -1],
      speciesIndex: [0, 1],
      pairs: unlikeOnly,
      cutoffA: 12,
    });
    const { transverse } = vibrationsAtGamma(cell);
    const imaginary = transverse.filter(({ isImaginary }) => isImaginary);
    expect(imaginary.length).toBeGreaterThan(0);
    for (const { squareEvPerA2U, frequencyThz, isAcoustic, displacements } of imaginary) {
      expect(squareEvPerA2U).toBeLessThan(0);
      expect(frequencyThz).toBeGreaterThan(0);
      expect(isAcoustic).toBe(false);
      // A small move along the arrows lowers the energy.
      const u = displacements.map((x) => 0.02 * x);
      const there = evaluatePairModel(moved(cell, u, new Float64Array(6)));
      expect(there.energyEv).toBeLessThan(evaluatePairModel(cell).energyEv);
    }
  });

  it('a mass that is not positive is refused', () => {
    const cell = { ...withMasses(rockSalt(5.6, allPairs)), massesU: [23, 0] };
    expect(() => vibrationsAtGamma(cell)).toThrow('massesU');
  });
});
