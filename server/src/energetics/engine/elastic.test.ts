import { describe, expect, it } from 'vitest';

import { EV_PER_CUBIC_ANGSTROM_IN_GPA as gpa } from '#common/units/constants';
import {
  allPairs,
  fittingOperations,
  fluorite,
  moved,
  pairTerm,
  pointOperations,
  rockSalt,
  rutile,
  rutileOperations,
  supercell,
  tight,
  unlikeOnly,
} from '#tests/helpers/pair-model-cells';

import type { CellOperation, PairModelInput } from './contract.js';
import { elasticConstants, evaluatePairModel, relax } from './index.js';

function atRest(
  cell: PairModelInput,
  operations: readonly CellOperation[],
  pressureEvPerA3 = 0,
): PairModelInput {
  const { ended, vectorsA, fractional } = relax({
    ...cell,
    operations,
    pressureEvPerA3,
    criteria: tight,
  });
  expect(ended).toBe('converged');
  return { ...cell, vectorsA, fractional };
}

const cubicOperations = (cell: PairModelInput) =>
  fittingOperations(cell, pointOperations(cell.vectorsA));

/** Zinc blende: every ion feels an internal strain, so that relaxation matters. */
const zincBlende: PairModelInput = {
  ...rockSalt(5.4, [pairTerm(0, 1, 900, 0.35), pairTerm(1, 1, 1200, 0.2, 20)]),
  fractional: [0, 0, 0, 0.25, 0.25, 0.25],
};

const cells: readonly [string, () => PairModelInput][] = [
  ['rock salt', () => atRest(rockSalt(5.7, allPairs), cubicOperations(rockSalt(5.7, allPairs)))],
  ['fluorite', () => atRest(fluorite(), cubicOperations(fluorite()))],
  ['rutile', () => atRest(rutile(), rutileOperations())],
  ['zinc blende', () => atRest(zincBlende, cubicOperations(zincBlende))],
];

/** Step of strain. */
const step = 1e-3;

/** ∂f/∂x by the five-point central difference, of error h⁴. */
function slopes(valuesAt: (offset: number) => readonly number[]): number[] {
  const [a, b, c, d] = [-2, -1, 1, 2].map((times) => valuesAt(times * step)) as [
    readonly number[],
    readonly number[],
    readonly number[],
    readonly number[],
  ];
  return a.map((_, k) => (a[k]! - 8 * b[k]! + 8 * c[k]! - d[k]!) / (12 * step));
}

/** A cell strained by one component, its ions brought to rest in it. */
function strainedAtRest(cell: PairModelInput, component: number, strain: number) {
  const components = new Float64Array(6);
  components[component] = strain;
  const start = moved(cell, new Float64Array(3 * cell.chargesE.length), components);
  const { ended, after } = relax({ ...start, operations: [], isCellFixed: true, criteria: tight });
  expect(ended).toBe('converged');
  return after;
}

function largest(values: Iterable<number>): number {
  return Math.max(...Array.from(values, Math.abs));
}

function expectMatrix(found: ArrayLike<number>, expected: ArrayLike<number>, relative: number) {
  const scale = largest(Array.from(expected));
  for (let at = 0; at < 36; at += 1) {
    expect(Math.abs(found[at]! - expected[at]!)).toBeLessThanOrEqual(relative * scale);
  }
}

describe.each(cells)('elastic constants of %s at rest', (name, make) => {
  const cell = make();
  const result = elasticConstants(cell, name === 'rutile' ? 'tetragonal' : 'cubic');

  it('are the slopes of the stress with strain, ions relaxed at each', () => {
    const found = new Float64Array(36);
    for (let w = 0; w < 6; w += 1) {
      slopes((offset) =>
        Array.from(strainedAtRest(cell, w, offset).stressEvPerA3, (s) => s * gpa),
      ).forEach((value, v) => (found[6 * v + w] = value));
    }
    expectMatrix(found, result.stiffnessGpa, 1e-6);
  });

  it('have the shape of the crystal system, which is stable', () => {
    expect(result.isAtRest).toBe(true);
    expect(result.stability.isStable).toBe(true);
    expect(result.stability.criteria.length).toBe(name === 'rutile' ? 5 : 3);
    expect(result.stability.criteria.every(({ holds }) => holds)).toBe(true);
    expect(result.unstableInternalModes).toBe(0);
  });

  it('do not exceed those of clamped ions', () => {
    for (let v = 0; v < 6; v += 1) {
      const [relaxed, clamped] = [result.stiffnessGpa[7 * v]!, result.clampedStiffnessGpa[7 * v]!];
      expect(relaxed).toBeLessThanOrEqual(clamped + 1e-9);
    }
  });

  it('do not depend on the cell they are computed in', () => {
    const other = elasticConstants(supercell(cell, [1, 2, 1]), 'triclinic');
    expectMatrix(other.stiffnessGpa, result.stiffnessGpa, 1e-10);
  });

  it('times the compliance give the unit matrix', () => {
    const s = result.compliancePerGpa!;
    for (let i = 0; i < 6; i += 1) {
      for (let j = 0; j < 6; j += 1) {
        const product = [0, 1, 2, 3, 4, 5].reduce(
          (sum, k) => sum + result.stiffnessGpa[6 * i + k]! * s[6 * k + j]!,
          0,
        );
        expect(product).toBeCloseTo(i === j ? 1 : 0, 11);
      }
    }
  });
});

describe('internal relaxation', () => {
  it('matters in zinc blende for shear alone, and not at all in rock salt', () => {
    const blende = elasticConstants(atRest(zincBlende, cubicOperations(zincBlende)), 'cubic');
    expect(blende.clampedStiffnessGpa[21]! - blende.stiffnessGpa[21]!).toBeGreaterThan(1);
    expect(blende.stiffnessGpa[0]).toBeCloseTo(blende.clampedStiffnessGpa[0]!, 9);
    const salt = elasticConstants(rockSalt(5.7, allPairs), 'cubic');
    expectMatrix(salt.stiffnessGpa, salt.clampedStiffnessGpa, 1e-13);
  });

  it('counts the modes along which ions are not at a minimum', () => {
    // A cation between two anions far apart sits at the top of a hump.
    const cell: PairModelInput = {
      vectorsA: [4, 0, 0, 0, 4, 0, 0, 0, 8],
      fractional: [0, 0, 0, 0, 0, 0.5],
      chargesE: [1, -1],
      speciesIndex: [0, 1],
      pairs: unlikeOnly,
      cutoffA: 12,
    };
    expect(elasticConstants(cell, 'tetragonal').unstableInternalModes).toBeGreaterThan(0);
  });
});

describe('theorems', () => {
  it('C₁₂ = C₄₄ for central forces with every ion at a centre of symmetry, at rest', () => {
    // A.-L. Cauchy 1828; proof in M. Born, K. Huang (1954), § 11.
    const cell = atRest(rockSalt(5.7, allPairs), cubicOperations(rockSalt(5.7, allPairs)));
    const c = elasticConstants(cell, 'cubic').stiffnessGpa;
    expect(Math.abs(c[1]! - c[21]!)).toBeLessThanOrEqual(1e-8 * c[0]!);
    const fluoriteAtRest = atRest(fluorite(), cubicOperations(fluorite()));
    const other = elasticConstants(fluoriteAtRest, 'cubic').stiffnessGpa;
    // Anions of fluorite are no centres of symmetry: the relation fails there.
    expect(Math.abs(other[1]! - other[21]!)).toBeGreaterThan(0.1);
  });

  it('C₁₂ − C₄₄ = 2P under a pressure P', () => {
    // The generalised relation for stress-strain coefficients (from memory).
    const cell = atRest(rockSalt(5.7, allPairs), cubicOperations(rockSalt(5.7, allPairs)), 0.03);
    const { stiffnessGpa: c, pressureGpa, isAtRest } = elasticConstants(cell, 'cubic');
    expect(pressureGpa).toBeCloseTo(0.03 * gpa, 6);
    expect(isAtRest).toBe(false);
    expect(c[1]! - c[21]!).toBeCloseTo(2 * pressureGpa, 6);
  });

  it.each([0, 0.02])('(C₁₁ + 2C₁₂)/3 = −V dP/dV at a pressure of %s eV Å⁻³', (pressure) => {
    const cell = atRest(
      rockSalt(5.7, allPairs),
      cubicOperations(rockSalt(5.7, allPairs)),
      pressure,
    );
    const c = elasticConstants(cell, 'cubic').stiffnessGpa;
    const [slope] = slopes((x) => {
      const scaled = {
        ...cell,
        vectorsA: Array.from(cell.vectorsA, (value) => value * Math.exp(x / 3)),
      };
      return [evaluatePairModel(scaled).stressEvPerA3[0]! * gpa];
    });
    expect(Math.abs((c[0]! + 2 * c[1]!) / 3 - slope!)).toBeLessThanOrEqual(1e-7 * slope!);
  });

  it('(C₁₁ + 2C₁₂)/3 = V d²E/dV² at rest', () => {
    const cell = atRest(rockSalt(5.7, allPairs), cubicOperations(rockSalt(5.7, allPairs)));
    const c = elasticConstants(cell, 'cubic').stiffnessGpa;
    const at = (x: number) =>
      evaluatePairModel({
        ...cell,
        vectorsA: Array.from(cell.vectorsA, (value) => value * (1 + x)),
      });
    // E″ with scale s is 9 V B at rest.
    const h = 4e-3;
    const [a, b, m, d, e] = [-2, -1, 0, 1, 2].map((k) => at(k * h).energyEv) as [
      number,
      number,
      number,
      number,
      number,
    ];
    const curvature = (-a + 16 * b - 30 * m + 16 * d - e) / (12 * h * h);
    const bulk = (curvature * gpa) / (9 * at(0).volumeA3);
    expect(Math.abs((c[0]! + 2 * c[1]!) / 3 - bulk)).toBeLessThanOrEqual(1e-6 * bulk);
  });

  it('under any stress, C is the slope of the true stress, made symmetric', () => {
    // Clamped ions: strain without relaxation, rutile far from rest.
    const cell = rutile(4.4, 3.1, 0.3);
    const { clampedStiffnessGpa } = elasticConstants(cell, 'tetragonal');
    const slope = new Float64Array(36);
    for (let w = 0; w < 6; w += 1) {
      const strain = new Float64Array(6);
      slopes((offset) => {
        strain[w] = offset;
        const there = moved(cell, new Float64Array(18), strain);
        return Array.from(evaluatePairModel(there).stressEvPerA3, (s) => s * gpa);
      }).forEach((value, v) => (slope[6 * v + w] = value));
    }
    const even = slope.map(
      (value, at) => 0.5 * (value + slope[6 * (at % 6) + Math.floor(at / 6)]!),
    );
    expectMatrix(clampedStiffnessGpa, even, 1e-7);
  });
});
