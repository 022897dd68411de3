import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import {
  cartesianToFractional,
  cellVectors,
  cellVolumeA3,
  fractionalToCartesian,
  reciprocalVectors,
} from '#common/physics/cell-metric';
import type { LatticeParameters } from '#common/physics/resolved-cell';

/** Volume from edges and angles: International Tables for Crystallography Vol. C, 1.1.2. */
function volumeFromAngles(lattice: LatticeParameters): number {
  const [a, b, c] = [lattice.alphaDeg, lattice.betaDeg, lattice.gammaDeg].map((angle) =>
    Math.cos((angle * Math.PI) / 180),
  ) as [number, number, number];
  const inner = 1 - a * a - b * b - c * c + 2 * a * b * c;
  return lattice.aA * lattice.bA * lattice.cA * Math.sqrt(inner);
}

const edge = fc.double({ min: 0.5, max: 50, noNaN: true });
const angle = fc.double({ min: 25, max: 155, noNaN: true });

/** Lattices whose angles close a cell that is not all but flat. */
const lattices = fc
  .record({ aA: edge, bA: edge, cA: edge, alphaDeg: angle, betaDeg: angle, gammaDeg: angle })
  .filter((lattice) => {
    const shape = volumeFromAngles(lattice) / (lattice.aA * lattice.bA * lattice.cA);
    return shape > 0.05;
  });

const points = fc.tuple(
  ...([0, 1, 2].map(() => fc.double({ min: -3, max: 3, noNaN: true })) as [
    fc.Arbitrary<number>,
    fc.Arbitrary<number>,
    fc.Arbitrary<number>,
  ]),
);

const row = (vectors: readonly number[], i: number) => vectors.slice(3 * i, 3 * i + 3);
const dot = (u: readonly number[], v: readonly number[]) =>
  u.reduce((sum, value, k) => sum + value * v[k]!, 0);

describe('cell vectors', () => {
  it('have the edges and angles they were made from', () => {
    fc.assert(
      fc.property(lattices, (lattice) => {
        const vectors = cellVectors(lattice);
        const [a, b, c] = [row(vectors, 0), row(vectors, 1), row(vectors, 2)];
        const edges = [lattice.aA, lattice.bA, lattice.cA];
        [a, b, c].forEach((vector, i) => {
          // Flat cells lose digits of c's height: 20 rounding units over a shape of at least 0.05.
          expect(Math.abs(Math.hypot(...vector) / edges[i]! - 1)).toBeLessThan(1e-13);
        });
        const cosines = [
          [b, c, lattice.alphaDeg],
          [a, c, lattice.betaDeg],
          [a, b, lattice.gammaDeg],
        ] as const;
        cosines.forEach(([u, v, degrees]) => {
          const cosine = dot(u, v) / (Math.hypot(...u) * Math.hypot(...v));
          expect(Math.abs(cosine - Math.cos((degrees * Math.PI) / 180))).toBeLessThan(1e-13);
        });
      }),
    );
  });

  it('have the volume that edges and angles give', () => {
    fc.assert(
      fc.property(lattices, (lattice) => {
        const expected = volumeFromAngles(lattice);
        const volume = cellVolumeA3(cellVectors(lattice));
        expect(Math.abs(volume / expected - 1)).toBeLessThan(1e-11);
      }),
    );
  });

  it('are exact for right angles and 60° and 120°', () => {
    const cube = { aA: 3, bA: 3, cA: 3, alphaDeg: 90, betaDeg: 90, gammaDeg: 90 };
    expect(cellVectors(cube)).toEqual([3, 0, 0, 0, 3, 0, 0, 0, 3]);
    const hexagonal = cellVectors({ ...cube, aA: 2, bA: 2, gammaDeg: 120 });
    expect(hexagonal.slice(3, 6)).toEqual([-1, 2 * Math.sqrt(0.75), 0]);
    expect(cellVectors({ ...cube, aA: 2, bA: 2, gammaDeg: 60 })[3]).toBe(1);
  });

  it('are no numbers where the angles close no cell', () => {
    const lattice = { aA: 1, bA: 1, cA: 1, alphaDeg: 30, betaDeg: 30, gammaDeg: 90 };
    expect(cellVectors(lattice).some(Number.isNaN)).toBe(true);
  });
});

describe('reciprocal vectors', () => {
  it('satisfy a_i · a*_j = 2π δ_ij', () => {
    fc.assert(
      fc.property(lattices, (lattice) => {
        const vectors = cellVectors(lattice);
        const reciprocal = reciprocalVectors(vectors);
        for (let i = 0; i < 3; i += 1) {
          for (let j = 0; j < 3; j += 1) {
            const product = dot(row(vectors, i), row(reciprocal, j)) / (2 * Math.PI);
            const size = Math.hypot(...row(vectors, i)) * Math.hypot(...row(reciprocal, j));
            // Products cancel: their rounding is that of the lengths multiplied.
            expect(Math.abs(product - (i === j ? 1 : 0))).toBeLessThan(16 * Number.EPSILON * size);
          }
        }
      }),
    );
  });
});

describe('coordinates', () => {
  it('come back from Cartesian ones', () => {
    fc.assert(
      fc.property(lattices, points, (lattice, point) => {
        const vectors = cellVectors(lattice);
        const back = cartesianToFractional(vectors, fractionalToCartesian(vectors, point));
        back.forEach((value, k) => {
          expect(Math.abs(value - point[k]!)).toBeLessThan(1e-10);
        });
      }),
    );
  });

  it('of the corners are the vectors', () => {
    const vectors = [1, 2, 3, 4, 5, 7, 8, 9, 11];
    expect(fractionalToCartesian(vectors, [0, 1, 0])).toEqual([4, 5, 7]);
    expect(fractionalToCartesian(vectors, [1, 0, -1])).toEqual([-7, -7, -8]);
  });
});
