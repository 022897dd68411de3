import { describe, expect, it } from 'vitest';

import { referenceLattices } from '#tests/fixtures/madelung/lattices';
import {
  displacedRockSalt,
  inputOf,
  randomCell,
  repeated,
  seededNumbers,
  toleranceScale,
  vectorsFrom,
} from '#tests/helpers/engine-cells';
import { COULOMB_EV_ANGSTROM as k } from '#common/units/constants';

import type { EngineInput, EngineResult } from './contract.js';
import { evaluateElectrostatics } from './index.js';

const tolerance = 1e-12;

/** Cells of many shapes, in Å and degrees: skewed by 30° and 150°, flat, long, and left-handed. */
const shapes: readonly [string, number[]][] = [
  ['cube', vectorsFrom([7, 7, 7], [90, 90, 90])],
  ['angle of 30°', vectorsFrom([9, 9, 9], [90, 90, 30])],
  ['angle of 150°', vectorsFrom([9, 9, 9], [90, 90, 150])],
  ['three angles of 35°', vectorsFrom([12, 12, 12], [35, 35, 35])],
  ['needle 1 : 20', vectorsFrom([3, 3, 60], [90, 90, 90])],
  ['plate 20 : 1', vectorsFrom([40, 40, 2], [90, 90, 120])],
  ['triclinic', vectorsFrom([6, 8, 11], [75, 104, 116])],
  ['turned every way', [6, 1, 2, -1, 7, 1.5, 2, -1, 8]],
  ['left-handed', [0, 7, 0, 8, 0, 0, 1, 2, 9]],
];

const cells = shapes.map(
  ([name, vectors], i) => [name, randomCell(vectors, 12, tolerance, 40 + i)] as const,
);

/** What rounding and the tolerance allow between two evaluations, in the unit of each number. */
function allowed(input: EngineInput, result: EngineResult) {
  const energy = 2 * k * input.toleranceRelative * toleranceScale(input, result.shortestDistanceA);
  const charge = Math.max(...input.chargesE.map(Math.abs));
  return { energy, potential: energy / charge, field: (100 * energy) / result.shortestDistanceA };
}

function expectClose(actual: ArrayLike<number>, expected: ArrayLike<number>, within: number): void {
  expect(actual).toHaveLength(expected.length);
  let worst = 0;
  for (let i = 0; i < expected.length; i += 1) {
    worst = Math.max(worst, Math.abs(actual[i]! - expected[i]!));
  }
  expect(worst).toBeLessThanOrEqual(within);
}

/** Every number of a result against another's, site for site. */
function expectSame(actual: EngineResult, expected: EngineResult, input: EngineInput): void {
  const within = allowed(input, expected);
  expectClose([actual.energyEv], [expected.energyEv], within.energy);
  expectClose(actual.potentialsV, expected.potentialsV, within.potential);
  expectClose(actual.fieldsVPerA, expected.fieldsVPerA, within.field);
  expectClose(actual.speciesMatrixEv.flat(), expected.speciesMatrixEv.flat(), 2 * within.energy);
  const stress = actual.stressBoundEvPerA3 + expected.stressBoundEvPerA3;
  expectClose(actual.stressEvPerA3, expected.stressEvPerA3, stress);
}

describe.each(cells)('in a cell of shape %s nothing changes', (_name, input) => {
  const plain = evaluateElectrostatics(input);

  it('and the certificate holds', () => {
    expect(plain.certificate.agrees).toBe(true);
    expect(plain.energyBoundEv).toBeLessThanOrEqual(allowed(input, plain).energy);
  });

  it.each([0.7, 0.85, 1.3, 1.6])('with %d times the splitting parameter', (splittingFactor) => {
    expectSame(evaluateElectrostatics({ ...input, splittingFactor }), plain, input);
  });

  it('when the origin moves', () => {
    const shift = [0.137, -0.61, 3.29];
    const fractional = input.fractional.map((f, i) => f + shift[i % 3]!);
    expectSame(evaluateElectrostatics({ ...input, fractional }), plain, input);
  });

  it('when the sites are listed in another order', () => {
    const count = input.chargesE.length;
    const order = Array.from({ length: count }, (_, i) => (i * 5 + 3) % count);
    expect(new Set(order).size).toBe(count);
    const shuffled = evaluateElectrostatics({
      ...input,
      fractional: Float64Array.from(
        order.flatMap((i) => [...input.fractional.subarray(3 * i, 3 * i + 3)]),
      ),
      chargesE: Float64Array.from(order, (i) => input.chargesE[i]!),
      speciesIndex: Int32Array.from(order, (i) => input.speciesIndex[i]!),
    });
    expect(Math.abs(shuffled.energyEv - plain.energyEv)).toBeLessThanOrEqual(
      allowed(input, plain).energy,
    );
    order.forEach((i, at) => {
      const apart = Math.abs(shuffled.potentialsV[at]! - plain.potentialsV[i]!);
      expect(apart).toBeLessThanOrEqual(allowed(input, plain).potential);
    });
  });

  it('but the size when the cell is repeated', () => {
    const times = [2, 1, 2] as const;
    const big = evaluateElectrostatics(repeated(input, times));
    const within = allowed(input, plain);
    expectClose([big.energyEv / 4], [plain.energyEv], within.energy);
    const count = input.chargesE.length;
    for (let image = 0; image < 4; image += 1) {
      const part = big.potentialsV.subarray(image * count, (image + 1) * count);
      expectClose(part, plain.potentialsV, within.potential);
    }
    expectClose(
      big.speciesMatrixEv.flat().map((value) => value / 4),
      plain.speciesMatrixEv.flat(),
      2 * within.energy,
    );
  });

  it('when other vectors span the same lattice', () => {
    // a′ = a, b′ = b + 2a, c′ = c − a + b; a point's coordinates follow from r = Σ x′ a′.
    const v = input.vectorsA;
    const row = (i: number) => [v[3 * i]!, v[3 * i + 1]!, v[3 * i + 2]!];
    const [a, b, c] = [row(0), row(1), row(2)];
    const vectorsA = [
      ...a,
      ...b.map((value, axis) => value + 2 * a[axis]!),
      ...c.map((value, axis) => value - a[axis]! + b[axis]!),
    ];
    const fractional = Float64Array.from(
      Array.from(input.chargesE, (_, i) => {
        const [x, y, z] = input.fractional.subarray(3 * i, 3 * i + 3);
        return [x! - 2 * (y! - z!) + z!, y! - z!, z!];
      }).flat(),
    );
    expectSame(evaluateElectrostatics({ ...input, vectorsA, fractional }), plain, input);
  });
});

describe('scaling', () => {
  const input = displacedRockSalt(1, tolerance);
  const plain = evaluateElectrostatics(input);

  it.each([1e-3, 0.1, 10, 1e3, 1e6])('lengths by %d divides the energy by as much', (factor) => {
    const vectorsA = input.vectorsA.map((value) => value * factor);
    const scaled = evaluateElectrostatics({ ...input, vectorsA });
    // Powers of ten are no powers of two: some 16 units of rounding of parts twice the energy.
    const within = 32 * Number.EPSILON * Math.abs(plain.energyEv) + allowed(input, plain).energy;
    expectClose([scaled.energyEv * factor], [plain.energyEv], within);
    expectClose(
      scaled.fieldsVPerA.map((field) => field * factor * factor),
      plain.fieldsVPerA,
      allowed(input, plain).field,
    );
    expect(scaled.certificate.agrees).toBe(true);
  });

  it('charges by f multiplies the energy by f² and potentials by f', () => {
    const chargesE = input.chargesE.map((q) => -2.5 * q);
    const scaled = evaluateElectrostatics({ ...input, chargesE });
    const within = allowed(input, plain);
    expectClose([scaled.energyEv / 6.25], [plain.energyEv], within.energy);
    expectClose(
      scaled.potentialsV,
      plain.potentialsV.map((v) => -2.5 * v),
      2.5 * within.potential,
    );
  });
});

describe('a conventional cell and its primitive cell', () => {
  it('have the same energy per ion pair', () => {
    const primitive = referenceLattices().find(({ name }) => name === 'rock_salt')!;
    const conventional = evaluateElectrostatics({
      ...displacedRockSalt(1, 1e-15, 0),
      vectorsA: [1, 0, 0, 0, 1, 0, 0, 0, 1],
    });
    // 16 units of rounding: conventional and primitive sums round differently.
    const within = 16 * Number.EPSILON * Math.abs(k * primitive.energy);
    expectClose([conventional.energyEv / 4], [k * primitive.energy], within);
  });
});

describe('charged cells', () => {
  const base = inputOf(
    referenceLattices().find(({ name }) => name === 'wigner_bcc_ocp')!,
    1e-13,
  );

  it('are refused unless a uniform background is asked for', () => {
    expect(() => evaluateElectrostatics({ ...base, uniformBackground: false })).toThrow(RangeError);
  });

  it('do not depend on the splitting parameter either, species by species', () => {
    const input: EngineInput = {
      ...displacedRockSalt(1, tolerance),
      chargesE: Float64Array.from([2, -1, 1, -2, 1, 2, -1, 1]),
      speciesIndex: Int32Array.from([0, 1, 2, 3, 2, 0, 1, 2]),
      speciesCount: 4,
      uniformBackground: true,
    };
    const plain = evaluateElectrostatics(input);
    for (const splittingFactor of [0.7, 1.3]) {
      expectSame(evaluateElectrostatics({ ...input, splittingFactor }), plain, input);
    }
    expect(plain.certificate.agrees).toBe(true);
  });
});

describe('ions very close together', () => {
  it.each([1e-2, 1e-4, 1e-6, 1e-8])('at %d Å keep the digits of their pair', (distanceA) => {
    // A pair of opposite ions in a large cube: E → −k q²/d, the rest is a dipole's and vanishes as d².
    const lengthA = 10;
    const apart = distanceA / lengthA;
    const result = evaluateElectrostatics({
      vectorsA: [lengthA, 0, 0, 0, lengthA, 0, 0, 0, lengthA],
      fractional: Float64Array.from([0, 0, 0, apart, 0, 0]),
      chargesE: Float64Array.from([1, -1]),
      speciesIndex: Int32Array.from([0, 1]),
      speciesCount: 2,
      toleranceRelative: 1e-13,
    });
    // Dipole of length d in a cube with conducting surroundings: −2πk d²/3L³.
    const expected = -k / distanceA - (2 * Math.PI * k * distanceA ** 2) / (3 * lengthA ** 3);
    expect(Math.abs(result.energyEv - expected)).toBeLessThanOrEqual(
      8 * Number.EPSILON * Math.abs(expected) + (10 * k * distanceA ** 4) / lengthA ** 5,
    );
  });
});

describe('ions very close together over a corner of the cell', () => {
  it.each([false, true])(
    'keep the digits that their coordinates have (swapped: %s)',
    (isSwapped) => {
      const [near, far] = [3e-9, 1 - 5e-9];
      const lengthA = 10;
      // 1 − far is exact, near + that is rounded once: the distance is known to the last digit.
      const distanceA = lengthA * Math.sqrt(3) * (near + (1 - far));
      const places = isSwapped ? [far, near] : [near, far];
      const result = evaluateElectrostatics({
        vectorsA: [lengthA, 0, 0, 0, lengthA, 0, 0, 0, lengthA],
        fractional: Float64Array.from(places.flatMap((place) => [place, place, place])),
        chargesE: Float64Array.from([1, -1]),
        speciesIndex: Int32Array.from([0, 1]),
        speciesCount: 2,
        toleranceRelative: 1e-13,
      });
      const expected = -k / distanceA;
      expect(Math.abs(result.energyEv - expected)).toBeLessThanOrEqual(
        8 * Number.EPSILON * Math.abs(expected),
      );
    },
  );
});

describe('refusals', () => {
  const input = displacedRockSalt(1, tolerance);

  it('two sites on one place', () => {
    const fractional = input.fractional.slice();
    fractional.set(fractional.subarray(0, 3), 3);
    expect(() => evaluateElectrostatics({ ...input, fractional })).toThrow('coincide');
  });

  it.each<[string, Partial<EngineInput>]>([
    ['no sites', { chargesE: new Float64Array(0), fractional: new Float64Array(0) }],
    ['arrays that disagree', { fractional: new Float64Array(9) }],
    ['a flat cell', { vectorsA: [1, 0, 0, 0, 1, 0, 1, 1, 0] }],
    ['a charge that is no number', { chargesE: input.chargesE.map(() => NaN) }],
  ])('%s', (_what, wrong) => {
    expect(() => evaluateElectrostatics({ ...input, ...wrong })).toThrow(RangeError);
  });
});

describe('random numbers of the test cells', () => {
  it('are the same in every run', () => {
    const random = seededNumbers(1);
    expect([random(), random()]).toEqual([1015568748 / 2 ** 32, 1586005467 / 2 ** 32]);
  });
});
