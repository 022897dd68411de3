import { describe, expect, it } from 'vitest';

import { COULOMB_EV_ANGSTROM as k } from '#common/units/constants';
import { referenceLattices } from '#tests/fixtures/madelung/lattices';
import { inputOf, toleranceScale } from '#tests/helpers/engine-cells';

import { evaluateElectrostatics } from './index.js';

/**
 * Thirteen lattices to 30 digits; tests/fixtures/madelung/SOURCE.md and the field `published` of
 * each say where a value comes from.
 */
const lattices = referenceLattices();

it('the fixture holds thirteen lattices, two of them charged', () => {
  expect(lattices).toHaveLength(13);
  expect(lattices.filter(({ isCharged }) => isCharged)).toHaveLength(2);
});

describe.each(lattices)('$name ($published)', (lattice) => {
  const finest = evaluateElectrostatics(inputOf(lattice, 1e-15));

  it('has the energy of the reference to 5e-15', () => {
    const error = Math.abs(finest.energyEv / k - lattice.energy);
    expect(error).toBeLessThanOrEqual(5e-15 * Math.abs(lattice.energy));
  });

  it('has the potential of every site to 5e-15', () => {
    lattice.potentials.forEach((expected, i) => {
      const error = Math.abs(finest.potentialsV[i]! / k - expected);
      expect(error).toBeLessThanOrEqual(5e-15 * Math.abs(expected));
    });
  });

  it('obeys tr(σ)V = −E, ΣF = 0 and ½Σqφ = E', () => {
    // Parts of the sums are up to eight times the energy; 40 units of rounding of the energy.
    const rounding = 40 * Number.EPSILON * Math.abs(finest.energyEv);
    const { certificate } = finest;
    expect(certificate.virialResidualEv).toBeLessThanOrEqual(4 * rounding);
    expect(certificate.potentialSumResidualEv).toBeLessThanOrEqual(rounding);
    expect(certificate.forceSumEvPerA).toBeLessThanOrEqual(
      (4 * rounding) / finest.shortestDistanceA,
    );
    expect(certificate.agrees).toBe(true);
  });

  it('has a species matrix that adds up to the energy', () => {
    const sum = finest.speciesMatrixEv.reduce(
      (total, row, a) => total + row.slice(a).reduce((rowSum, value) => rowSum + value, 0),
      0,
    );
    // Charged classes carry backgrounds that cancel only in a neutral cell, and then to rounding.
    expect(Math.abs(sum - finest.energyEv)).toBeLessThanOrEqual(finest.speciesMatrixBoundEv);
  });

  it.each([1e-4, 1e-6, 1e-8, 1e-10, 1e-12, 1e-13])(
    'at a tolerance of %d errs less than its bound, and the bound is honest but not loose',
    (toleranceRelative) => {
      const result = evaluateElectrostatics(inputOf(lattice, toleranceRelative));
      const scale =
        k * toleranceScale(inputOf(lattice, toleranceRelative), result.shortestDistanceA);
      const error = Math.abs(result.energyEv - k * lattice.energy);
      expect(error).toBeLessThanOrEqual(result.energyBoundEv);
      expect(result.certificate.energyDifferenceEv).toBeLessThanOrEqual(result.energyBoundEv);
      expect(result.energyBoundEv).toBeLessThanOrEqual(toleranceRelative * scale);
      expect(result.certificate.agrees).toBe(true);
      lattice.potentials.forEach((expected, i) => {
        const errorV = Math.abs(result.potentialsV[i]! - k * expected);
        expect(errorV).toBeLessThanOrEqual(result.potentialBoundV);
      });
      const strainError = Math.abs(
        result.stressEvPerA3[0]! +
          result.stressEvPerA3[1]! +
          result.stressEvPerA3[2]! -
          (finest.stressEvPerA3[0]! + finest.stressEvPerA3[1]! + finest.stressEvPerA3[2]!),
      );
      expect(strainError).toBeLessThanOrEqual(3 * result.stressBoundEvPerA3);
    },
  );
});

describe('Wigner crystals, one charge in a uniform background', () => {
  /**
   * E r_s per charge, r_s = (3V/4πN)^{1/3}: −0.895 929 255 682 (bcc), −0.895 873 615 195 (fcc);
   * published, as quoted in tests/fixtures/madelung/SOURCE.md.
   */
  it.each([
    ['wigner_bcc_ocp', -0.895929255682],
    ['wigner_fcc_ocp', -0.895873615195],
  ])('%s has its published energy', (name, expected) => {
    const lattice = lattices.find((candidate) => candidate.name === name)!;
    const input = inputOf(lattice, 1e-13);
    const count = lattice.charges.length;
    const [a, b, c] = [0, 3, 6].map((row) => lattice.vectors.slice(row, row + 3)) as [
      number[],
      number[],
      number[],
    ];
    const volume = Math.abs(
      a[0]! * (b[1]! * c[2]! - b[2]! * c[1]!) +
        a[1]! * (b[2]! * c[0]! - b[0]! * c[2]!) +
        a[2]! * (b[0]! * c[1]! - b[1]! * c[0]!),
    );
    const radius = Math.cbrt((3 * volume) / (4 * Math.PI * count));
    const { energyEv } = evaluateElectrostatics(input);
    expect(Math.abs(((energyEv / k) * radius) / count - expected)).toBeLessThanOrEqual(6e-13);
  });
});
