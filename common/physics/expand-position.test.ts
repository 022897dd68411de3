import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { cellVectors, fractionalToCartesian } from '#common/physics/cell-metric';
import { expandPosition } from '#common/physics/expand-position';
import { closeDistanceA, placeMetric } from '#common/physics/place-index';
import { applyOperation } from '#common/physics/symmetry-operation';
import { groups } from '#tests/helpers/group-closure';

type Triple = readonly [number, number, number];

const metricOf = (aA: number, cA: number, gammaDeg: number) =>
  placeMetric(cellVectors({ aA, bA: aA, cA, alphaDeg: 90, betaDeg: 90, gammaDeg }));

const cubic = metricOf(8, 8, 90);
const tetragonal = metricOf(4.6, 3, 90);
const hexagonal = metricOf(4.8, 13, 120);

function multiplicity(name: keyof typeof groups, at: Triple): number {
  const metric = /^(R-3c|P63)/.test(name) ? hexagonal : name === 'P42/mnm' ? tetragonal : cubic;
  return expandPosition(at, groups[name], metric).places.length;
}

describe('expandPosition', () => {
  // Multiplicities of International Tables for Crystallography Vol. A (from memory).
  it.each([
    ['P1', [0.1, 0.2, 0.3], 1],
    ['P-1', [0, 0, 0], 1],
    ['P-1', [0.5, 0.5, 0], 1],
    ['P-1', [0.1, 0.2, 0.3], 2],
    ['Fm-3m', [0, 0, 0], 4],
    ['Fm-3m', [0.5, 0.5, 0.5], 4],
    ['Fm-3m', [0.25, 0.25, 0.25], 8],
    ['Fm-3m', [0, 0.25, 0.25], 24],
    ['Fm-3m', [0.2, 0, 0], 24],
    ['Fm-3m', [0.3, 0.3, 0.3], 32],
    ['Fm-3m', [0.2, 0.25, 0.25], 48],
    ['Fm-3m', [0, 0.2, 0.2], 48],
    ['Fm-3m', [0.5, 0.2, 0.2], 48],
    ['Fm-3m', [0, 0.1, 0.2], 96],
    ['Fm-3m', [0.1, 0.1, 0.3], 96],
    ['Fm-3m', [0.1, 0.17, 0.29], 192],
    ['Fd-3m:2', [0.125, 0.125, 0.125], 8],
    ['Fd-3m:2', [0.5, 0.5, 0.5], 16],
    ['Fd-3m:2', [0.2624, 0.2624, 0.2624], 32],
    ['P42/mnm', [0, 0, 0], 2],
    ['P42/mnm', [0.3053, 0.3053, 0], 4],
    ['P42/mnm', [0.1, 0.2, 0.3], 16],
    ['R-3c:H', [0, 0, 0.3522], 12],
    ['R-3c:H', [0.3063, 0, 0.25], 18],
    ['R-3c:H', [0.1, 0.2, 0.3], 36],
    ['P63mc', [1 / 3, 2 / 3, 0.375], 2],
    ['Pm-3m', [0.5, 0.5, 0], 3],
  ] as const)('%s at %j has %i places', (name, at, expected) => {
    expect(multiplicity(name, at)).toBe(expected);
  });

  it('has groups of the right order to work with', () => {
    const orders = Object.entries(groups).map(([name, { length }]) => `${name} ${length}`);
    expect(orders).toEqual([
      'P1 1',
      'P-1 2',
      'P2 2',
      'Pm 2',
      'P222 4',
      'P42/mnm 16',
      'R-3c:H 36',
      'P63mc 12',
      'P-43m 24',
      'Pm-3m 48',
      'Fm-3m 192',
      'Fd-3m:2 192',
    ]);
  });

  it('makes a third typed as 0.3333 exact', () => {
    const { places } = expandPosition([0.3333, 0.6667, 0.375], groups.P63mc, hexagonal);
    expect(places.length).toBe(2);
    expect(places[0]![0]).toBeCloseTo(1 / 3, 12);
    expect(places[0]![1]).toBeCloseTo(2 / 3, 12);
  });

  it('leaves an exact position as typed, to the last bit', () => {
    const at: Triple = [1 / 3, 2 / 3, 0.3748];
    expect(expandPosition(at, groups.P63mc, hexagonal).places[0]).toEqual(at);
  });

  it('takes places into [0, 1), with rounding at the corner', () => {
    expect(expandPosition([1, -1, 3], groups.P1, cubic).places).toEqual([[0, 0, 0]]);
    expect(expandPosition([-0.25, 1.25, 1 - 1e-16], groups.P1, cubic).places).toEqual([
      [0.75, 0.25, 0],
    ]);
    expect(expandPosition([1 - 1e-13, -1e-13, 0], groups['Pm-3m'], cubic).places).toEqual([
      [0, 0, 0],
    ]);
  });

  it('tells how close copies come that are not on one place', () => {
    expect(expandPosition([0.004, 0, 0], groups['P-1'], cubic).crowdingA).toBeCloseTo(0.064, 9);
    expect(expandPosition([0.1, 0, 0], groups['P-1'], cubic).crowdingA).toBe(Infinity);
    expect(expandPosition([0.0001, 0, 0], groups['P-1'], cubic)).toEqual({
      places: [[0, 0, 0]],
      crowdingA: Infinity,
    });
  });
});

/** Positions on a grid of 24ths, where special positions lie, and general ones. */
const coordinate = fc.oneof(
  fc.integer({ min: -24, max: 48 }).map((n) => n / 24),
  fc.integer({ min: 0, max: 999 }).map((n) => n / 1000),
);
const position = fc.tuple(coordinate, coordinate, coordinate);

describe('orbits', () => {
  const names = ['P-1', 'P42/mnm', 'P-43m', 'Fm-3m', 'Fd-3m:2'] as const;
  // Large enough that no two general positions of the grid are mistaken for one.
  const wide = metricOf(100, 100, 90);

  it('have as many places as the group has operations, divided by a whole number', () => {
    fc.assert(
      fc.property(fc.constantFrom(...names), position, (name, at) => {
        const { places } = expandPosition(at, groups[name], wide);
        expect(groups[name].length % places.length).toBe(0);
        for (const value of places.flat()) {
          expect(value >= 0 && value < 1).toBe(true);
        }
      }),
    );
  });

  it('are the same from whichever member they start', () => {
    fc.assert(
      fc.property(fc.constantFrom(...names), position, fc.nat(), (name, at, pick) => {
        const operations = groups[name];
        const orbit = expandPosition(at, operations, wide).places;
        const start = applyOperation(operations[pick % operations.length]!, at);
        const again = expandPosition(start, operations, wide).places;
        expect(again.length).toBe(orbit.length);
        for (const place of again) {
          expect(orbit.some((other) => closeDistanceA(wide, place, other) < 1e-6)).toBe(true);
        }
      }),
    );
  });
});

describe('closeDistanceA', () => {
  it('agrees with a search over neighbouring cells, in skewed cells too', () => {
    const edge = fc.double({ min: 2, max: 9, noNaN: true });
    const angle = fc.double({ min: 50, max: 115, noNaN: true });
    const step = fc.double({ min: -0.06, max: 0.06, noNaN: true });
    const skewed = fc.record({
      aA: edge,
      bA: edge,
      cA: edge,
      alphaDeg: angle,
      betaDeg: angle,
      gammaDeg: angle,
    });
    fc.assert(
      fc.property(skewed, position, fc.tuple(step, step, step), (lattice, at, by) => {
        const vectorsA = cellVectors(lattice);
        fc.pre(vectorsA.every(Number.isFinite) && vectorsA[8]! > 0.5);
        const metric = placeMetric(vectorsA);
        const other = at.map((value, k) => value + by[k]! / 8 + 1) as unknown as Triple;
        let nearest = Infinity;
        for (let n = 0; n < 125; n += 1) {
          const image = [n % 5, Math.floor(n / 5) % 5, Math.floor(n / 25)].map((i) => i - 2);
          const apart = other.map((value, k) => value - at[k]! - 1 + image[k]!);
          nearest = Math.min(nearest, Math.hypot(...fractionalToCartesian(vectorsA, apart)));
        }
        const found = closeDistanceA(metric, at, other);
        if (nearest < 0.0999) {
          expect(found).toBeCloseTo(nearest, 9);
        } else if (nearest > 0.1001) {
          expect(found).toBe(Infinity);
        }
      }),
      { numRuns: 300 },
    );
  });
});
