import { describe, expect, it } from 'vitest';

import {
  erfc,
  erfcTable,
  intervalStride,
  intervalsPerUnit,
  polynomialAt,
  tableEnd,
} from './erfc.js';

/** x, erfc(x), exp(−x²): 50-digit values of the Python library mpmath 1.3.0, rounded to doubles. */
const reference: readonly [number, number, number][] = [
  [0.0, 1.0, 1.0],
  [1e-8, 0.9999999887162083, 0.9999999999999999],
  [0.001, 0.9988716212090307, 0.9999990000005],
  [0.1, 0.887537083981715, 0.9900498337491681],
  [0.25, 0.7236736098317631, 0.9394130628134758],
  [0.46875, 0.507386526782062, 0.8027382667004205],
  [0.46876, 0.5073774688931535, 0.8027307409841735],
  [0.5, 0.4795001221869535, 0.7788007830714049],
  [0.984375, 0.16388712994960353, 0.37946453416470854],
  [1.0, 0.15729920705028513, 0.36787944117144233],
  [1.5, 0.033894853524689274, 0.10539922456186433],
  [2.0, 0.004677734981047266, 0.01831563888873418],
  [2.5, 0.0004069520174449589, 0.0019304541362277093],
  [3.0, 2.209049699858544e-5, 0.00012340980408667956],
  [3.5, 7.430983723414128e-7, 4.785117392129009e-6],
  [4.0, 1.541725790028002e-8, 1.1253517471925912e-7],
  [4.0625, 9.178929024808192e-9, 6.798992870627021e-8],
  [4.5, 1.9661604415428876e-10, 1.6052280551856116e-9],
  [5.0, 1.537459794428035e-12, 1.3887943864964021e-11],
  [5.5, 7.357847917974398e-15, 7.287724095819692e-14],
  [6.0, 2.1519736712498913e-17, 2.3195228302435696e-16],
  [7.5, 2.776649386030569e-26, 3.7233631217505106e-25],
  [8.75, 3.597115728647072e-35, 5.614728092387935e-34],
];

/** erfc(x) and exp(−x²) as the real-space sum takes them. */
function fromTable(x: number): [number, number] {
  const interval = Math.floor(x * intervalsPerUnit);
  const t = x - (interval + 0.5) / intervalsPerUnit;
  const base = interval * intervalStride;
  return [polynomialAt(erfcTable, base, t), polynomialAt(erfcTable, base + 8, t)];
}

describe('erfc', () => {
  it.each(reference)('at %d agrees with mpmath', (x, expected) => {
    // Four units of the last place up to 4; beyond, exp(−x²) adds x² of them.
    const tolerance = 4 * Number.EPSILON * expected * Math.max(1, (x * x) / 4);
    expect(Math.abs(erfc(x) - expected)).toBeLessThanOrEqual(tolerance);
  });

  it('falls without a step where the approximations meet', () => {
    for (const seam of [0.46875, 4]) {
      const [left, right] = [erfc(seam * (1 - 1e-13)), erfc(seam * (1 + 1e-13))];
      expect(left).toBeGreaterThanOrEqual(right);
      expect(left - right).toBeLessThan(1e-12);
    }
  });
});

describe('the table of erfc and the Gaussian', () => {
  it.each(reference)('at %d agrees with mpmath', (x, expectedErfc, expectedGaussian) => {
    const [value, gaussian] = fromTable(x);
    // Absolute, since what is summed is of size 1: two units of the last place of 1.
    expect(Math.abs(value - expectedErfc)).toBeLessThanOrEqual(2 * Number.EPSILON);
    expect(Math.abs(gaussian - expectedGaussian)).toBeLessThanOrEqual(2 * Number.EPSILON);
  });

  it('agrees with the approximations all the way to its end', () => {
    let worst = 0;
    for (let x = 0; x < tableEnd; x += 0.000_731) {
      const [value, gaussian] = fromTable(x);
      worst = Math.max(worst, Math.abs(value - erfc(x)), Math.abs(gaussian - Math.exp(-x * x)));
    }
    expect(worst).toBeLessThanOrEqual(3 * Number.EPSILON);
  });
});
