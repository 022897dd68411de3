import { describe, expect, it } from 'vitest';

import { displacedRockSalt, randomCell, vectorsFrom } from '#tests/helpers/engine-cells';

import type { EngineInput } from './contract.js';
import { evaluateElectrostatics } from './index.js';

const cells: readonly [string, EngineInput][] = [
  ['displaced rock salt', displacedRockSalt(1, 1e-14)],
  ['a triclinic cell', randomCell(vectorsFrom([6, 8, 11], [75, 104, 116]), 8, 1e-14, 11)],
  ['a cell turned every way', randomCell([6, 1, 2, -1, 7, 1.5, 2, -1, 8], 8, 1e-14, 12)],
  [
    'a charged cell in a uniform background',
    {
      ...displacedRockSalt(1, 1e-14),
      chargesE: Float64Array.from([2, -1, 1, -2, 1, 2, -1, 1]),
      uniformBackground: true,
    },
  ],
];

/** Step of the differences, relative to 1 Å or to the strain. */
const step = 1e-3;

/** ∂E/∂x by the five-point central difference, of error h⁴. */
function derivative(energyAt: (offset: number) => number): number {
  const [a, b, c, d] = [-2, -1, 1, 2].map((times) => energyAt(times * step)) as [
    number,
    number,
    number,
    number,
  ];
  return (a - 8 * b + 8 * c - d) / (12 * step);
}

/** Truncation h⁴E⁗ and rounding ε|E|/h of such a difference, for E of atomic size over 1 Å. */
function within(energyEv: number): number {
  return 2e-9 * Math.abs(energyEv);
}

/** Rows times (1 + strain), a symmetric strain given by one of its six components. */
function strained(vectorsA: readonly number[], component: number, strain: number): number[] {
  const [i, j] = [
    [0, 0],
    [1, 1],
    [2, 2],
    [1, 2],
    [0, 2],
    [0, 1],
  ][component] as [number, number];
  return vectorsA.map((value, at) => {
    const row = Math.floor(at / 3);
    const axis = at % 3;
    if (i === j) {
      return axis === i ? value * (1 + strain) : value;
    }
    // ε_ij = ε_ji = strain/2 each, so that the derivative is that by ε_ij alone.
    const other = axis === i ? j : axis === j ? i : null;
    return other === null ? value : value + 0.5 * strain * vectorsA[3 * row + other]!;
  });
}

describe.each(cells)('in %s', (_name, input) => {
  const plain = evaluateElectrostatics(input);

  it('forces are the slopes of the energy', () => {
    const [v, count] = [input.vectorsA, input.chargesE.length];
    for (const site of [0, count - 1]) {
      for (let edge = 0; edge < 3; edge += 1) {
        const length = Math.hypot(v[3 * edge]!, v[3 * edge + 1]!, v[3 * edge + 2]!);
        const along = derivative((offsetA) => {
          const fractional = input.fractional.slice();
          fractional[3 * site + edge]! += offsetA / length;
          return evaluateElectrostatics({ ...input, fractional }).energyEv;
        });
        const expected = [0, 1, 2].reduce(
          (sum, axis) =>
            sum - (plain.forcesEvPerA[3 * site + axis]! * v[3 * edge + axis]!) / length,
          0,
        );
        expect(Math.abs(along - expected)).toBeLessThanOrEqual(within(plain.energyEv));
      }
    }
  });

  it('stress is the slope of the energy with strain', () => {
    const volume = evaluateVolume(input.vectorsA);
    for (let component = 0; component < 6; component += 1) {
      const slope = derivative(
        (strain) =>
          evaluateElectrostatics({
            ...input,
            vectorsA: strained(input.vectorsA, component, strain),
          }).energyEv,
      );
      const expected = plain.stressEvPerA3[component]! * volume;
      expect(Math.abs(slope - expected)).toBeLessThanOrEqual(within(plain.energyEv));
    }
  });

  it('a potential is the slope of the energy with a charge', () => {
    // E is quadratic in the charges: a central difference is exact but for rounding.
    const charge = (site: number, change: number) => {
      const chargesE = input.chargesE.slice();
      chargesE[site]! += change;
      return evaluateElectrostatics({ ...input, chargesE, uniformBackground: true }).energyEv;
    };
    for (const site of [0, 3]) {
      const slope = charge(site, 0.5) - charge(site, -0.5);
      expect(Math.abs(slope - plain.potentialsV[site]!)).toBeLessThanOrEqual(
        64 * Number.EPSILON * Math.abs(plain.energyEv),
      );
    }
  });
});

function evaluateVolume(v: readonly number[]): number {
  const minor = (i: number, j: number) => v[3 + i]! * v[6 + j]! - v[3 + j]! * v[6 + i]!;
  return Math.abs(v[0]! * minor(1, 2) - v[1]! * minor(0, 2) + v[2]! * minor(0, 1));
}
