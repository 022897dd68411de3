import { describe, expect, it } from 'vitest';

import { vectorsFrom } from '#tests/helpers/engine-cells';
import {
  allPairs,
  fluorite,
  inverse3,
  moved,
  pairTerm,
  rockSalt,
  rutile,
  shaken,
  symmetric,
} from '#tests/helpers/pair-model-cells';

import { tensorPairs, type PairModelInput } from './contract.js';
import { pairModel } from './pair-model.js';

const triclinic: PairModelInput = {
  vectorsA: vectorsFrom([4.4, 5.1, 6.3], [78, 104, 116]),
  fractional: [0.02, 0.07, 0.1, 0.48, 0.55, 0.06, 0.1, 0.46, 0.55, 0.6, 0.03, 0.52],
  chargesE: [1, -1, 2, -2],
  speciesIndex: [0, 1, 2, 3],
  pairs: [
    pairTerm(0, 1, 1200, 0.31, 8),
    pairTerm(2, 1, 1800, 0.3),
    pairTerm(1, 3, 2100, 0.33, 40),
    pairTerm(0, 3, 900, 0.32, 3),
    pairTerm(3, 3, 2500, 0.31, 25),
    pairTerm(2, 3, 1500, 0.3),
  ],
  cutoffA: 9,
};

const cells: readonly [string, PairModelInput][] = [
  ['shaken rock salt', shaken(rockSalt(5.6, allPairs), 0.1)],
  ['shaken fluorite', shaken(fluorite(), 0.1)],
  ['shaken rutile', shaken(rutile(), 0.1)],
  ['a triclinic cell', triclinic],
];

/** Step of the differences, in Å or strain. */
const step = 1e-3;

/** ∂f/∂x of a list of numbers by the five-point central difference, of error h⁴. */
function slopes(valuesAt: (offset: number) => readonly number[]): number[] {
  const [a, b, c, d] = [-2, -1, 1, 2].map((times) => valuesAt(times * step)) as [
    readonly number[],
    readonly number[],
    readonly number[],
    readonly number[],
  ];
  return a.map((_, k) => (a[k]! - 8 * b[k]! + 8 * c[k]! - d[k]!) / (12 * step));
}

/** The cell after a step along one of 3N displacements or, beyond them, one of six strains. */
function stepped(input: PairModelInput, direction: number, offset: number): PairModelInput {
  const width = 3 * input.chargesE.length;
  const u = new Float64Array(width);
  const strain = new Float64Array(6);
  if (direction < width) {
    u[direction] = offset;
  } else {
    strain[direction - width] = offset;
  }
  return moved(input, u, strain);
}

/**
 * ∂E/∂ε at a strain of one component, by the stress there: of F = 1 + ε, ∂E/∂F = V σ F⁻¹, of which
 * a symmetric ε feels the symmetric part.
 */
function strainSlopes(input: PairModelInput, component: number, strain: number): number[] {
  const components = new Float64Array(6);
  components[component] = strain;
  const there = moved(input, new Float64Array(3 * input.chargesE.length), components);
  const { stressEvPerA3, volumeA3 } = pairModel(there, false);
  const f = symmetric(components.map((value, v) => (v < 3 ? 1 + value : value / 2)));
  const inverse = inverse3(f);
  const sigma = symmetric(stressEvPerA3);
  const product = (a: number, b: number) =>
    [0, 1, 2].reduce((sum, k) => sum + volumeA3 * sigma[3 * a + k]! * inverse[3 * k + b]!, 0);
  return tensorPairs.map(([a, b]) => 0.5 * (product(a, b) + product(b, a)));
}

/** ∂E/∂u at fixed ε = 0 and V₀-scaled ∂E/∂ε, in one list. */
function gradient(input: PairModelInput): number[] {
  const { forcesEvPerA, stressEvPerA3, volumeA3 } = pairModel(input, false);
  return [...forcesEvPerA.map((f) => -f), ...stressEvPerA3.map((s) => s * volumeA3)];
}

function largest(values: Iterable<number>): number {
  return Math.max(...Array.from(values, Math.abs));
}

describe.each(cells)('in %s', (_name, input) => {
  const plain = pairModel(input, true);
  const second = plain.second!;
  const width = 3 * input.chargesE.length;
  const directions = Array.from({ length: width + 6 }, (_, k) => k);

  it('forces and stress are the slopes of the energy', () => {
    const found = directions.map(
      (direction) =>
        slopes((offset) => [pairModel(stepped(input, direction, offset), false).energyEv])[0]!,
    );
    const expected = gradient(input);
    const scale = largest(expected);
    expected.forEach((value, k) => {
      expect(Math.abs(found[k]! - value)).toBeLessThanOrEqual(1e-8 * scale);
    });
  });

  it('force constants and internal strain are the slopes of the forces', () => {
    const scale = largest(second.forceConstantsEvPerA2);
    for (let direction = 0; direction < width; direction += 1) {
      const found = slopes((offset) =>
        Array.from(pairModel(stepped(input, direction, offset), false).forcesEvPerA, (f) => -f),
      );
      found.forEach((value, k) => {
        const expected = second.forceConstantsEvPerA2[width * direction + k]!;
        expect(Math.abs(value - expected)).toBeLessThanOrEqual(1e-7 * scale);
      });
    }
    for (let v = 0; v < 6; v += 1) {
      const found = slopes((offset) =>
        Array.from(pairModel(stepped(input, width + v, offset), false).forcesEvPerA, (f) => -f),
      );
      const mixedScale = largest(second.internalStrainEvPerA);
      found.forEach((value, k) => {
        const expected = second.internalStrainEvPerA[6 * k + v]!;
        expect(Math.abs(value - expected)).toBeLessThanOrEqual(1e-7 * mixedScale);
      });
    }
  });

  it('the clamped strain matrix is the slope of the stress', () => {
    const scale = largest(second.strainStrainEv);
    for (let w = 0; w < 6; w += 1) {
      const found = slopes((offset) => strainSlopes(input, w, offset));
      found.forEach((value, v) => {
        const expected = second.strainStrainEv[6 * v + w]!;
        expect(Math.abs(value - expected)).toBeLessThanOrEqual(1e-7 * scale);
      });
    }
  });
});
