import { describe, expect, it } from 'vitest';

import { COULOMB_EV_ANGSTROM } from '#common/units/constants';
import { evaluateElectrostatics } from '#server/electrostatics/engine/index';
import {
  allPairs,
  fluorite,
  pairTerm,
  rockSalt,
  rutile,
  shaken,
  supercell,
} from '#tests/helpers/pair-model-cells';

import type { PairModelInput } from './contract.js';
import { evaluatePairModel } from './index.js';
import { shortRangeAt, shortRangeTable } from './short-range.js';

const cells: readonly [string, PairModelInput][] = [
  ['rock salt', shaken(rockSalt(5.6, allPairs), 0.2)],
  ['fluorite', shaken(fluorite(), 0.2)],
  ['rutile', shaken(rutile(), 0.2)],
];

function largest(values: Iterable<number>): number {
  return Math.max(...Array.from(values, Math.abs));
}

function expectClose(found: ArrayLike<number>, expected: ArrayLike<number>, relative: number) {
  expect(found.length).toBe(expected.length);
  const allowed = relative * Math.max(largest(Array.from(expected)), 1);
  const off = largest(Array.from(expected, (value, k) => value - found[k]!));
  expect(off).toBeLessThanOrEqual(allowed);
}

/** Rounding of sums of a few thousand terms of a few eV. */
const rounding = 2e-12;

describe.each(cells)('charges alone in shaken %s', (_name, cell) => {
  it('agree with the electrostatics engine, which sums in another way', () => {
    const bare = { ...cell, pairs: [] };
    const found = evaluatePairModel(bare);
    const expected = evaluateElectrostatics({
      vectorsA: Array.from(cell.vectorsA),
      fractional: Float64Array.from(cell.fractional),
      chargesE: Float64Array.from(cell.chargesE),
      speciesIndex: Int32Array.from(cell.speciesIndex),
      speciesCount: 2,
      toleranceRelative: 1e-13,
    });
    expectClose([found.energyEv], [expected.energyEv], rounding);
    expectClose(found.forcesEvPerA, expected.forcesEvPerA, rounding);
    expectClose(found.stressEvPerA3, expected.stressEvPerA3, rounding);
    expect(found.shortestDistanceA).toBeCloseTo(expected.shortestDistanceA, 12);
  });
});

describe('charges alone', () => {
  it.each([
    // OEIS A085469; E d₀/k_e of rock salt per formula unit.
    ['rock salt', rockSalt(2, []), 1, 1.747564594633182],
    // An own 45-digit sum, and 5.0388 in handbook tables; d₀ = √3/4 a.
    ['fluorite', { ...fluorite(4 / Math.sqrt(3)), pairs: [] }, 1, 5.03878487984857],
  ])('give the Madelung constant of %s', (_name, cell, distanceA, expected) => {
    const { energyEv } = evaluatePairModel(cell);
    const madelung = (-energyEv * distanceA) / COULOMB_EV_ANGSTROM;
    expect(Math.abs(madelung - expected)).toBeLessThanOrEqual(1e-13 * 10);
  });
});

describe.each(cells)('in shaken %s', (_name, cell) => {
  const plain = evaluatePairModel(cell, { withSecondDerivatives: true });
  const second = plain.second!;

  it('nothing changes with the splitting of the Coulomb sums', () => {
    for (const splittingFactor of [0.8, 1.25]) {
      const other = evaluatePairModel(
        { ...cell, splittingFactor },
        { withSecondDerivatives: true },
      );
      expectClose([other.energyEv], [plain.energyEv], rounding);
      expectClose(other.forcesEvPerA, plain.forcesEvPerA, rounding);
      expectClose(other.stressEvPerA3, plain.stressEvPerA3, rounding);
      expectClose(other.second!.forceConstantsEvPerA2, second.forceConstantsEvPerA2, 10 * rounding);
      expectClose(other.second!.internalStrainEvPerA, second.internalStrainEvPerA, 10 * rounding);
      expectClose(other.second!.strainStrainEv, second.strainStrainEv, 10 * rounding);
    }
  });

  it('nothing changes with the origin or whole translations', () => {
    const fractional = Array.from(cell.fractional, (x, k) => x + [0.37, -1.21, 2.73][k % 3]!);
    fractional[4]! += 3;
    const other = evaluatePairModel({ ...cell, fractional }, { withSecondDerivatives: true });
    expectClose([other.energyEv], [plain.energyEv], rounding);
    expectClose(other.forcesEvPerA, plain.forcesEvPerA, rounding);
    expectClose(other.second!.forceConstantsEvPerA2, second.forceConstantsEvPerA2, 10 * rounding);
  });

  it('another order of the sites gives the same numbers in that order', () => {
    const count = cell.chargesE.length;
    const order = Array.from({ length: count }, (_, i) => count - 1 - i);
    const other = evaluatePairModel({
      ...cell,
      fractional: order.flatMap((i) => [0, 1, 2].map((k) => cell.fractional[3 * i + k]!)),
      chargesE: order.map((i) => cell.chargesE[i]!),
      speciesIndex: order.map((i) => cell.speciesIndex[i]!),
    });
    expectClose([other.energyEv], [plain.energyEv], rounding);
    const expected = order.flatMap((i) => [0, 1, 2].map((k) => plain.forcesEvPerA[3 * i + k]!));
    expectClose(other.forcesEvPerA, expected, rounding);
  });

  it('a supercell has so many times the energy and the same forces and stress', () => {
    const other = evaluatePairModel(supercell(cell, [2, 1, 1]), { withSecondDerivatives: true });
    const count = cell.chargesE.length;
    expectClose([other.energyEv], [2 * plain.energyEv], rounding);
    expectClose(other.forcesEvPerA.subarray(0, 3 * count), plain.forcesEvPerA, rounding);
    expectClose(other.stressEvPerA3, plain.stressEvPerA3, rounding);
    expectClose(
      other.second!.strainStrainEv,
      second.strainStrainEv.map((value) => 2 * value),
      10 * rounding,
    );
    // Force constants of a wave of infinite length are sums over the copies of an ion.
    const width = 3 * count;
    const folded = Float64Array.from({ length: width * width }, (_, at) => {
      const row = 2 * width * Math.floor(at / width) + (at % width);
      return (
        other.second!.forceConstantsEvPerA2[row]! +
        other.second!.forceConstantsEvPerA2[row + width]!
      );
    });
    expectClose(folded, second.forceConstantsEvPerA2, 10 * rounding);
  });

  it('forces add up to zero, and so do the rows of force constants and internal strain', () => {
    const width = 3 * cell.chargesE.length;
    for (let axis = 0; axis < 3; axis += 1) {
      const every = (values: ArrayLike<number>, stride: number, offset: number) =>
        Array.from(
          { length: width / 3 },
          (_, i) => values[stride * (3 * i + axis) + offset]!,
        ).reduce((sum, value) => sum + value, 0);
      expect(Math.abs(every(plain.forcesEvPerA, 1, 0))).toBeLessThanOrEqual(1e-11);
      for (let column = 0; column < width; column += 1) {
        const sum = every(second.forceConstantsEvPerA2, width, column);
        expect(Math.abs(sum)).toBeLessThanOrEqual(1e-11);
      }
      for (let v = 0; v < 6; v += 1) {
        const sum = every(second.internalStrainEvPerA, 6, v);
        expect(Math.abs(sum)).toBeLessThanOrEqual(1e-10);
      }
    }
  });

  it('the virial of the charges is minus their energy', () => {
    // E is homogeneous of degree −1 in lengths.
    const bare = evaluatePairModel({ ...cell, pairs: [] });
    const [xx, yy, zz] = bare.stressEvPerA3 as unknown as [number, number, number];
    expect(Math.abs((xx + yy + zz) * bare.volumeA3 + bare.energyEv)).toBeLessThanOrEqual(
      1e-12 * Math.abs(bare.energyEv),
    );
  });
});

describe('short-range terms', () => {
  const cell = { ...rockSalt(5.6, [pairTerm(0, 1, 1200, 0.5, 60)]), cutoffA: 10 };
  const table = shortRangeTable(cell);
  const at = (r: number) => {
    const out = { energy: 0, first: 0, second: 0 };
    shortRangeAt(table, 1, r, out);
    return out;
  };

  it('are A exp(−r/ρ) − C r⁻⁶ below nine tenths of the cut-off', () => {
    for (const r of [1.5, 3, 8.9]) {
      expect(at(r).energy).toBeCloseTo(1200 * Math.exp(-r / 0.5) - 60 / r ** 6, 13);
    }
  });

  it('end with energy, force and force constant continuous', () => {
    for (const seam of [9, 10]) {
      const [left, right] = [at(seam - 1e-7), at(seam + 1e-7)];
      if (seam === 9) {
        expect(Math.abs(left.second - right.second)).toBeLessThanOrEqual(1e-9);
        expect(Math.abs(left.energy - right.energy)).toBeLessThanOrEqual(1e-10);
      } else {
        expect(Math.abs(left.energy) + Math.abs(left.first)).toBeLessThanOrEqual(1e-12);
        expect(Math.abs(left.second)).toBeLessThanOrEqual(1e-10);
      }
    }
  });

  it('have the derivatives they say, in the taper too', () => {
    const h = 1e-4;
    for (const r of [2.5, 8.5, 9.2, 9.5, 9.9]) {
      const slope = (at(r + h).energy - at(r - h).energy) / (2 * h);
      const bend = (at(r + h).first - at(r - h).first) / (2 * h);
      expect(Math.abs(slope - at(r).first)).toBeLessThanOrEqual(
        1e-7 * Math.max(1, Math.abs(slope)),
      );
      expect(Math.abs(bend - at(r).second)).toBeLessThanOrEqual(1e-6 * Math.max(1, Math.abs(bend)));
    }
  });

  it('leave out about what is said beyond the cut-off', () => {
    const near = evaluatePairModel(cell);
    const far = evaluatePairModel({ ...cell, cutoffA: 24 });
    const missing = far.shortRangeEv + far.neglectedEv - near.shortRangeEv;
    expect(near.neglectedEv).toBeLessThan(0);
    expect(Math.abs(near.neglectedEv - missing)).toBeLessThanOrEqual(0.25 * Math.abs(missing));
  });

  it('add the nearest neighbours of rock salt: 6 a formula unit', () => {
    const { shortRangeEv } = evaluatePairModel({ ...rockSalt(5.6, [pairTerm(0, 1, 1200, 0.1)]) });
    expect(shortRangeEv).toBeCloseTo(6 * 1200 * Math.exp(-2.8 / 0.1), 12);
  });
});

describe('refusals', () => {
  const cell = rockSalt(5.6, allPairs);
  it.each([
    ['arrays that disagree', { ...cell, chargesE: [1, -1, 0] }, 'same sites'],
    ['no sites', { ...cell, chargesE: [], fractional: [], speciesIndex: [] }, 'same sites'],
    ['a number that is not finite', { ...cell, chargesE: [NaN, -1] }, 'finite'],
    ['a cell without volume', { ...cell, vectorsA: [1, 0, 0, 2, 0, 0, 0, 0, 1] }, 'volume'],
    ['a charged cell', { ...cell, chargesE: [1, -0.9] }, 'charged'],
    ['two terms for one pair', { ...cell, pairs: [...allPairs, pairTerm(1, 0, 1, 1)] }, 'one term'],
    ['a cut-off of zero', { ...cell, cutoffA: 0 }, 'cutoffA'],
    ['ions on one place', { ...cell, fractional: [0, 0, 0, 1, 0, 0] }, 'coincide'],
  ])('%s', (_name, input, message) => {
    expect(() => evaluatePairModel(input)).toThrow(message);
  });
});
