import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { certainDigits } from '#common/units/certain-digits';
import { COULOMB_RELATIVE_UNCERTAINTY } from '#common/units/constants';
import { plainNumberText } from '#common/units/format';

describe('certainDigits', () => {
  it('ends an energy where the uncertainty of the Coulomb constant begins', () => {
    const energy = -47.7954617216;
    const bound = 4e-10 + Math.abs(energy) * COULOMB_RELATIVE_UNCERTAINTY;
    expect(certainDigits(energy, bound)).toEqual({ text: '−47.795 461 7', decimals: 7 });
  });

  it('shows a Madelung constant to its numerical bound', () => {
    expect(certainDigits(1.74756459463318, 1e-11).text).toBe('1.747 564 594 6');
  });

  it('does not print a digit that could round either way', () => {
    expect(certainDigits(1.25, 0.001).text).toBe('1.25');
    expect(certainDigits(1.245, 0.001).text).toBe('1.2');
    expect(certainDigits(0.5, 0.2).text).toBe('0');
  });

  it('writes zero without a sign', () => {
    expect(certainDigits(-1e-16, 1e-6).text).toBe('0.000 00');
  });

  it('keeps whole tens where the units are not certain', () => {
    expect(certainDigits(-12_345, 4)).toEqual({ text: '−12 300', decimals: -2 });
  });

  it('never shows more decimals than asked', () => {
    expect(certainDigits(2.106, 0, 3)).toEqual({ text: '2.106', decimals: 3 });
  });

  it('has a dash for what is no number', () => {
    expect(certainDigits(Number.NaN, 1).text).toBe('–');
  });

  it('prints a text that both ends of the interval round to', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.double({ min: 1e-12, max: 10, noNaN: true }),
        (value, bound) => {
          const { text, decimals } = certainDigits(value, bound);
          const shown = Number(plainNumberText(text));
          const half = 0.5 * 10 ** -decimals;
          const slack = 1e-9 * half + 1e-9;
          expect(Math.abs(shown - (value - bound))).toBeLessThanOrEqual(half + slack);
          expect(Math.abs(shown - (value + bound))).toBeLessThanOrEqual(half + slack);
        },
      ),
    );
  });
});
