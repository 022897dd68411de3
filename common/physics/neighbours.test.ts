import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { fractionalToCartesian } from '#common/physics/cell-metric';
import { buildNeighbourGrid, faceDistancesA, forEachNeighbour } from '#common/physics/neighbours';
import { seededNumbers, vectorsFrom } from '#tests/helpers/engine-cells';

type Found = { site: number; image: string; distanceA: number }[];

const byName = (a: Found[number], b: Found[number]) =>
  a.site - b.site || a.image.localeCompare(b.image);

function searched(vectorsA: readonly number[], fractional: number[], radiusA: number): Found {
  const found: Found = [];
  const grid = buildNeighbourGrid(vectorsA, fractional, radiusA);
  forEachNeighbour(grid, 0, radiusA, (site, distanceA, image, dx, dy, dz) => {
    found.push({ site, image: image.join(), distanceA });
    expect(Math.abs(Math.hypot(dx, dy, dz) - distanceA)).toBeLessThan(1e-12 * radiusA);
  });
  return found.sort(byName);
}

/** All images far enough out looked through one by one. */
function bruteForce(vectorsA: readonly number[], fractional: number[], radiusA: number): Found {
  const reach = faceDistancesA(vectorsA).map((height) => Math.ceil(radiusA / height) + 1);
  const found: Found = [];
  for (let i = -reach[0]!; i <= reach[0]!; i += 1) {
    for (let j = -reach[1]!; j <= reach[1]!; j += 1) {
      for (let k = -reach[2]!; k <= reach[2]!; k += 1) {
        for (let site = 0; site < fractional.length / 3; site += 1) {
          const apart = [i, j, k].map(
            (image, axis) => fractional[3 * site + axis]! - fractional[axis]! + image,
          );
          const distanceA = Math.hypot(...fractionalToCartesian(vectorsA, apart));
          if (distanceA <= radiusA && distanceA > 0) {
            found.push({ site, image: [i, j, k].join(), distanceA });
          }
        }
      }
    }
  }
  return found.sort(byName);
}

const shapes: readonly [string, number[]][] = [
  ['cube', vectorsFrom([5, 5, 5], [90, 90, 90])],
  ['angle of 30°', vectorsFrom([6, 6, 6], [90, 90, 30])],
  ['angle of 150°', vectorsFrom([6, 6, 6], [90, 90, 150])],
  ['three angles of 35°', vectorsFrom([9, 9, 9], [35, 35, 35])],
  ['needle 1 : 20', vectorsFrom([2, 2, 40], [90, 90, 90])],
];

describe.each(shapes)('neighbours in a cell of shape %s', (_name, vectorsA) => {
  it.each([0.7, 2.5, 6, 11])('within %d Å are those of an exhaustive search', (radiusA) => {
    const random = seededNumbers(3);
    const fractional = Array.from({ length: 3 * 7 }, random);
    const expected = bruteForce(vectorsA, fractional, radiusA);
    const found = searched(vectorsA, fractional, radiusA);
    expect(found.map(({ site, image }) => `${site} ${image}`)).toEqual(
      expected.map(({ site, image }) => `${site} ${image}`),
    );
    found.forEach(({ distanceA }, i) => {
      expect(Math.abs(distanceA - expected[i]!.distanceA)).toBeLessThan(1e-12 * radiusA);
    });
  });
});

describe('neighbours', () => {
  it('are found in any cell, whatever radius the grid was built for', () => {
    const angle = fc.integer({ min: 40, max: 110 });
    const edge = fc.integer({ min: 2, max: 9 });
    fc.assert(
      fc.property(
        fc.tuple(edge, edge, edge),
        fc
          .tuple(angle, angle, angle)
          .filter(([a, b, c]) => a + b + c < 330 && a < b + c && b < a + c && c < a + b),
        fc.integer({ min: 1, max: 1000 }),
        (edges, angles, seed) => {
          const vectorsA = vectorsFrom(edges, angles);
          fc.pre(vectorsA.every(Number.isFinite) && Math.min(...faceDistancesA(vectorsA)) > 0.5);
          const random = seededNumbers(seed);
          const fractional = Array.from({ length: 3 * 5 }, random);
          const grid = buildNeighbourGrid(vectorsA, fractional, 1);
          let count = 0;
          // No lattice vector of whole edges is this long: rounding decides nothing.
          const radiusA = 5.0123;
          forEachNeighbour(grid, 0, radiusA, () => {
            count += 1;
          });
          expect(count).toBe(bruteForce(vectorsA, fractional, radiusA).length);
        },
      ),
      { numRuns: 60 },
    );
  });

  it('of an ion in rock salt are 6, 12, 8, 6, 24, 24, 12, 30', () => {
    // Shells of the simple cubic lattice: number of ways to write n as a sum of three squares (OEIS A005875).
    const shells = new Map<number, number>();
    const fractional = [0, 0, 0, 0, 0.5, 0.5, 0.5, 0, 0.5, 0.5, 0.5, 0];
    fractional.push(...fractional.map((f) => (f + 0.5) % 1));
    const grid = buildNeighbourGrid([2, 0, 0, 0, 2, 0, 0, 0, 2], fractional, 3);
    forEachNeighbour(grid, 0, 3.001, (_site, distanceA) => {
      const square = Math.round(distanceA ** 2);
      shells.set(square, (shells.get(square) ?? 0) + 1);
    });
    const counts = [...shells].sort(([a], [b]) => a - b);
    expect(counts).toEqual([
      [1, 6],
      [2, 12],
      [3, 8],
      [4, 6],
      [5, 24],
      [6, 24],
      [8, 12],
      [9, 30],
    ]);
  });

  it('lie at the distances between faces when the cell is a box', () => {
    expect(faceDistancesA([2, 0, 0, 0, 3, 0, 0, 0, 5])).toEqual([2, 3, 5]);
  });

  it('leave out the site itself but not its images', () => {
    const images: string[] = [];
    const grid = buildNeighbourGrid([2, 0, 0, 0, 2, 0, 0, 0, 2], [0.3, 0.3, 0.3], 2);
    forEachNeighbour(grid, 0, 2.1, (_site, _distanceA, image) => images.push(image.join()));
    expect(images.sort()).toEqual(['-1,0,0', '0,-1,0', '0,0,-1', '0,0,1', '0,1,0', '1,0,0']);
  });
});
