import { describe, expect, it } from 'vitest';

import { seededNumbers } from '#tests/helpers/engine-cells';

import { choleskyFactor, choleskySolve, symmetricEigensystem } from './linear-algebra.js';

/** A symmetric matrix of numbers between −1 and 1, or with some rank less than n. */
function symmetricMatrix(n: number, seed: number, rank = n): Float64Array {
  const random = seededNumbers(seed);
  const matrix = new Float64Array(n * n);
  for (let r = 0; r < rank; r += 1) {
    const v = Array.from({ length: n }, () => 2 * random() - 1);
    const weight = 2 * random() - 1;
    v.forEach((x, i) => v.forEach((y, j) => (matrix[i * n + j]! += weight * x * y)));
  }
  return matrix;
}

function largest(values: Iterable<number>): number {
  return Math.max(...Array.from(values, Math.abs));
}

describe('eigensystem of a symmetric matrix', () => {
  it.each([
    [1, 1],
    [2, 2],
    [3, 3],
    [6, 6],
    [6, 2],
    [18, 18],
    [60, 60],
    [60, 40],
  ])('n = %i of rank %i: A v = λ v, vectors orthonormal, trace kept', (n, rank) => {
    const a = symmetricMatrix(n, 17 * n + rank, rank);
    const { values, vectors } = symmetricEigensystem(a, n);
    const size = Math.max(largest(a) * n, 1);
    for (let k = 0; k < n; k += 1) {
      for (let i = 0; i < n; i += 1) {
        let image = 0;
        for (let j = 0; j < n; j += 1) {
          image += a[i * n + j]! * vectors[k * n + j]!;
        }
        const off = Math.abs(image - values[k]! * vectors[k * n + i]!);
        expect(off).toBeLessThanOrEqual(32 * Number.EPSILON * size);
      }
      for (let l = 0; l <= k; l += 1) {
        let product = 0;
        for (let j = 0; j < n; j += 1) {
          product += vectors[k * n + j]! * vectors[l * n + j]!;
        }
        expect(Math.abs(product - (k === l ? 1 : 0))).toBeLessThanOrEqual(32 * n * Number.EPSILON);
      }
    }
    const trace = Array.from({ length: n }, (_, i) => a[i * n + i]!).reduce((s, x) => s + x, 0);
    expect(values.reduce((s, x) => s + x, 0)).toBeCloseTo(trace, 11);
    expect([...values]).toEqual([...values].sort((x, y) => x - y));
  });

  it('knows the second-difference matrix: λ_k = 2 − 2 cos(kπ/(n + 1))', () => {
    // Closed form of the fixed-end chain, any textbook on lattice vibrations.
    const n = 25;
    const a = new Float64Array(n * n);
    for (let i = 0; i < n; i += 1) {
      a[i * n + i] = 2;
      if (i + 1 < n) {
        a[i * n + i + 1] = -1;
        a[(i + 1) * n + i] = -1;
      }
    }
    symmetricEigensystem(a, n).values.forEach((value, k) => {
      const expected = 2 - 2 * Math.cos(((k + 1) * Math.PI) / (n + 1));
      expect(Math.abs(value - expected)).toBeLessThanOrEqual(64 * Number.EPSILON);
    });
  });

  it('takes a diagonal matrix and the zero matrix as they are', () => {
    const diagonal = Float64Array.from([3, 0, 0, 0, -1, 0, 0, 0, 2]);
    expect([...symmetricEigensystem(diagonal, 3).values]).toEqual([-1, 2, 3]);
    expect([...symmetricEigensystem(new Float64Array(16), 4).values]).toEqual([0, 0, 0, 0]);
  });

  it('refuses what is not finite', () => {
    expect(() => symmetricEigensystem(Float64Array.from([NaN, 1, 1, 2]), 2)).toThrow(RangeError);
  });
});

describe('Cholesky factor', () => {
  it('solves a positive definite system', () => {
    const n = 12;
    const root = symmetricMatrix(n, 3);
    const a = new Float64Array(n * n);
    for (let i = 0; i < n; i += 1) {
      for (let j = 0; j < n; j += 1) {
        for (let k = 0; k < n; k += 1) {
          a[i * n + j]! += root[i * n + k]! * root[j * n + k]!;
        }
      }
      a[i * n + i]! += 1;
    }
    const expected = Float64Array.from({ length: n }, (_, i) => i - 4);
    const b = new Float64Array(n);
    expected.forEach((x, j) => b.forEach((_, i) => (b[i]! += a[i * n + j]! * x)));
    const l = choleskyFactor(a, n);
    expect(l).not.toBeNull();
    choleskySolve(l!, n, b);
    expect(largest(b.map((x, i) => x - expected[i]!))).toBeLessThan(1e-11);
  });

  it('says no to a matrix with a negative or a zero eigenvalue', () => {
    expect(choleskyFactor(Float64Array.from([1, 2, 2, 1]), 2)).toBeNull();
    expect(choleskyFactor(Float64Array.from([1, 1, 1, 1]), 2)).toBeNull();
  });
});
