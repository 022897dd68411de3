import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { elements, findElement } from '#common/chemistry/elements';

/** Atomic weights of another package than the table was made from: tests/fixtures/chemistry/SOURCE.md. */
const otherMasses = readFileSync('tests/fixtures/chemistry/atomic-masses.csv', 'utf8')
  .trim()
  .split('\n')
  .slice(1)
  .map((line) => line.split(',') as [string, string]);

/** Standard atomic weights, abridged (IUPAC 2021; from memory). */
const standardMasses = {
  H: 1.008,
  Li: 6.94,
  C: 12.011,
  O: 15.999,
  F: 18.998,
  Na: 22.99,
  Mg: 24.305,
  Al: 26.982,
  S: 32.06,
  Cl: 35.45,
  Ca: 40.078,
  Ti: 47.867,
  Fe: 55.845,
  Zn: 65.38,
  Sr: 87.62,
  Cs: 132.91,
  Pb: 207.2,
  U: 238.03,
};

describe('the table of elements', () => {
  it('has 118 elements in order, no symbol or name twice', () => {
    expect(elements.map(({ atomicNumber }) => atomicNumber)).toEqual(
      Array.from({ length: 118 }, (_, k) => k + 1),
    );
    expect(new Set(elements.map(({ symbol }) => symbol)).size).toBe(118);
    expect(new Set(elements.map(({ name }) => name)).size).toBe(118);
    expect(
      elements.every(({ symbol, name }) => /^[A-Z][a-z]?$/.test(symbol) && name.length > 2),
    ).toBe(true);
  });

  it('agrees with an independent list of atomic weights', () => {
    expect(otherMasses.length).toBe(83);
    for (const [symbol, mass] of otherMasses) {
      // 4e-4: the largest revision since that list was made (germanium 72.61 → 72.630).
      const difference = Math.abs(findElement(symbol)!.massGPerMol / Number(mass) - 1);
      expect(difference, symbol).toBeLessThan(4e-4);
    }
  });

  it.each(Object.entries(standardMasses))('has the standard mass of %s', (symbol, mass) => {
    expect(Math.abs(findElement(symbol)!.massGPerMol / mass - 1)).toBeLessThan(5e-5);
  });

  it('marks the elements that have a mass number only', () => {
    const flagged = elements.filter(({ hasOnlyMassNumber }) => hasOnlyMassNumber);
    // Tc, Pm, Po … Ac without Th, Pa and U: the radioactive elements without a standard weight.
    expect(flagged.map(({ symbol }) => symbol).slice(0, 9)).toEqual(
      'Tc Pm Po At Rn Fr Ra Ac Np'.split(' '),
    );
    expect(flagged.length).toBe(34);
    expect(flagged.every(({ massGPerMol }) => Number.isInteger(massGPerMol))).toBe(true);
  });
});

describe('findElement', () => {
  it.each(['Mg', 'MG', 'mg', ' Mg '])('knows %j', (symbol) => {
    expect(findElement(symbol)?.name).toBe('Magnesium');
  });

  it('takes D and T for hydrogen of mass 2 and 3', () => {
    expect(findElement('D')).toMatchObject({ atomicNumber: 1, symbol: 'D', massGPerMol: 2.014102 });
    expect(findElement('t')).toMatchObject({ atomicNumber: 1, symbol: 'T', massGPerMol: 3.016049 });
  });

  it('knows the symbols given in 2016', () => {
    expect(['Nh', 'Mc', 'Ts', 'Og'].map((symbol) => findElement(symbol)?.atomicNumber)).toEqual([
      113, 115, 117, 118,
    ]);
  });

  it.each(['', 'Xx', 'Mg2', 'Magnesium', 'constructor', 'Uut'])('does not know %j', (symbol) => {
    expect(findElement(symbol)).toBeNull();
  });
});
