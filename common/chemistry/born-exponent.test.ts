import { describe, expect, it } from 'vitest';

import { bornExponent, bornExponentKeys } from '#common/chemistry/born-exponent';

describe('bornExponent', () => {
  // Pauling's exponents by core, as handbooks list them.
  it.each([
    ['Li', 1, 5],
    ['H', -1, 5],
    ['Na', 1, 7],
    ['F', -1, 7],
    ['O', -2, 7],
    ['Mg', 2, 7],
    ['Cl', -1, 9],
    ['K', 1, 9],
    ['Cu', 1, 9],
    ['Zn', 2, 9],
    ['Br', -1, 10],
    ['Rb', 1, 10],
    ['Ag', 1, 10],
    ['Cd', 2, 10],
    ['I', -1, 12],
    ['Cs', 1, 12],
    ['Au', 1, 12],
    ['Hg', 2, 12],
  ])('of the closed shells of %s %i is the tabulated %i', (element, chargeE, exponent) => {
    expect(bornExponent(element, chargeE)).toMatchObject({ value: exponent, status: 'verified' });
  });

  it('has the mean 6 for lithium fluoride, as the handbook works it out', () => {
    const mean =
      ((bornExponent('Li', 1)?.value ?? NaN) + (bornExponent('F', -1)?.value ?? NaN)) / 2;
    expect(mean).toBe(6);
  });

  // Common practice, no source: an open shell takes the core within it, which lies between two
  // cores of the same exponent for the transition metals.
  it.each([
    ['Fe', 2, 9],
    ['Mn', 2, 9],
    ['Ti', 3, 9],
    ['Pb', 2, 12],
    ['Sn', 2, 10],
    ['S', 4, 7],
  ])('of the open shell of %s %i says that it is common practice', (element, chargeE, exponent) => {
    const found = bornExponent(element, chargeE);
    expect(found).toMatchObject({ value: exponent, status: 'from-memory' });
    expect(found?.source).toMatch(/common practice, no source/);
  });

  it('is none for what the table can’t say', () => {
    expect(bornExponent('H', 1)).toBeNull();
    expect(bornExponent('Ti', 3.5)).toBeNull();
    expect(bornExponent('U', 4)).toBeNull();
    expect(bornExponent('Xx', 1)).toBeNull();
  });

  it('is the workspace’s own where it has one', () => {
    const own = new Map([['born-exponent:U+4', { value: 13, note: '' }]]);
    expect(bornExponent('U', 4, own)).toMatchObject({ value: 13, status: 'own' });
  });

  it('is listed for the usual ions, each once', () => {
    expect(new Set(bornExponentKeys).size).toBe(bornExponentKeys.length);
    expect(bornExponentKeys).toEqual(
      expect.arrayContaining(['born-exponent:Na+1', 'born-exponent:O-2', 'born-exponent:Fe+3']),
    );
  });
});
