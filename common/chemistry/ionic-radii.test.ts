import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { elements, findElement } from '#common/chemistry/elements';
import { displayRadiusA, ionicRadii, ionicRadiusA } from '#common/chemistry/ionic-radii';

/** Shannon's table as data: tests/fixtures/chemistry/SOURCE.md. */
const published = readFileSync('tests/fixtures/chemistry/shannon-radii.csv', 'utf8')
  .trim()
  .split('\n')
  .slice(1)
  .map((line) => {
    const match = /^(\w+),(-?\d+),(\d+),("[^"]*"|[^,]*),([^,]+),([^,]+)$/.exec(line)!;
    const [, element, charge, coordination, state, crystal, effective] = match;
    return {
      element: element!,
      charge: Number(charge),
      coordination: Number(coordination),
      state: state!.replaceAll('"', '').replace(', ', '-'),
      radiusA: Number(effective),
      crystalRadiusA: Number(crystal),
    };
  });

const nameOf = (row: { element: string; charge: number; coordination: number; state: string }) =>
  [row.element, row.charge, row.coordination, row.state].join(' ');

describe('the table of ionic radii', () => {
  it('holds the 497 published rows, none twice', () => {
    expect(published.length).toBe(497);
    expect(ionicRadii.length).toBe(497);
    expect(new Set(ionicRadii.map(nameOf)).size).toBe(497);
    const ours = new Map(ionicRadii.map((row) => [nameOf(row), row.radiusA]));
    for (const row of published) {
      expect(ours.get(nameOf(row)), nameOf(row)).toBe(row.radiusA);
    }
  });

  it('has crystal radii 0.14 Å larger for cations, smaller for anions, in all rows but one', () => {
    const odd = published.filter(
      ({ charge, radiusA, crystalRadiusA }) =>
        Math.abs(crystalRadiusA - radiusA - Math.sign(charge) * 0.14) > 1e-9,
    );
    // The published row itself differs by 0.148 Å.
    expect(odd.map(nameOf)).toEqual(['N 5 3 ']);
  });

  it('names elements only, and hydroxide', () => {
    const symbols = new Set(ionicRadii.map(({ element }) => element));
    expect([...symbols].filter((symbol) => findElement(symbol) === null)).toEqual(['OH']);
  });
});

describe('ionicRadiusA', () => {
  // Shannon (1976), the values most textbooks print.
  it.each([
    ['Na', 1, 6, 1.02],
    ['Cl', -1, 6, 1.81],
    ['Mg', 2, 6, 0.72],
    ['O', -2, 6, 1.4],
    ['O', -2, 4, 1.38],
    ['Ca', 2, 8, 1.12],
    ['F', -1, 4, 1.31],
    ['Cs', 1, 8, 1.74],
    ['Ti', 4, 6, 0.605],
    ['Al', 3, 4, 0.39],
    ['Zn', 2, 4, 0.6],
    ['S', -2, 6, 1.84],
    ['Sr', 2, 12, 1.44],
  ])('gives %s %i in coordination %i', (element, charge, coordination, radiusA) => {
    expect(ionicRadiusA(element, charge, coordination)).toEqual({
      radiusA,
      value: radiusA,
      coordination,
      source: 'Shannon (1976) Acta Cryst. A32, 751',
      status: 'single-source',
    });
  });

  it('takes six where nothing is said, high spin where the table tells spins apart', () => {
    expect(ionicRadiusA('Fe', 2)).toMatchObject({ radiusA: 0.78, coordination: 6 });
    expect(ionicRadiusA('Fe', 2, 6, 'low')).toMatchObject({ radiusA: 0.61, coordination: 6 });
    expect(ionicRadiusA('Mg', 2, 6, 'low')).toMatchObject({ radiusA: 0.72 });
  });

  it('prefers the plain entry to a special geometry', () => {
    expect(ionicRadiusA('Ag', 1, 4)).toMatchObject({ radiusA: 1.0 });
    expect(ionicRadiusA('Ag', 3, 4)).toMatchObject({ radiusA: 0.67 });
  });

  it('says which coordination it took instead', () => {
    expect(ionicRadiusA('Cl', -1, 8)).toMatchObject({ radiusA: 1.81, coordination: 6 });
    expect(ionicRadiusA('Cs', 1, 4)).toMatchObject({ radiusA: 1.67, coordination: 6 });
    expect(ionicRadiusA('Zn', 2, 7)).toMatchObject({ radiusA: 0.74, coordination: 6 });
  });

  it.each([
    ['Na', 2],
    ['Ar', 1],
    ['Ti', 3.5],
    ['Xx', 1],
    ['Na', 0],
  ])('has nothing for %s %d', (element, charge) => {
    expect(ionicRadiusA(element, charge)).toBeNull();
  });
});

describe('displayRadiusA', () => {
  it('says when it took another charge of the element', () => {
    expect(displayRadiusA('Ti', 3.5)).toEqual({
      radiusA: 0.67,
      source: 'Shannon (1976) Acta Cryst. A32, 751, for charge 3',
    });
  });

  it('says when nothing is tabulated', () => {
    expect(displayRadiusA('Xe', 0)).toEqual({
      radiusA: 1,
      source: 'no tabulated radius: 1.0 Å drawn',
    });
  });

  it('draws a bare proton, whose radius is tabulated below zero, and says so', () => {
    expect(displayRadiusA('H', 1)).toEqual({
      radiusA: 0.2,
      source: 'Shannon (1976) Acta Cryst. A32, 751: -0.18 Å, drawn as 0.2 Å',
    });
  });

  it('always gives something that can be drawn', () => {
    for (const { symbol } of elements) {
      for (let charge = -9; charge <= 9; charge += 1) {
        expect(displayRadiusA(symbol, charge).radiusA).toBeGreaterThanOrEqual(0.2);
      }
    }
  });
});
