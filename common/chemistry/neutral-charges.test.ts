import { describe, expect, it } from 'vitest';

import { elements, findElement } from '#common/chemistry/elements';
import { neutralCharges } from '#common/chemistry/neutral-charges';
import { commonOxidationStates, oxidationStates } from '#common/chemistry/oxidation-states';

const mostLookedAt = 100;

/** `MgAl2O4` as parts, in the order written. */
function parts(formula: string): (readonly [string, number])[] {
  return [...formula.matchAll(/([A-Z][a-z]?)([\d.]*)/g)].map(
    ([, element, count]) => [element!, count === '' ? 1 : Number(count)] as const,
  );
}

/** All neutral choices for a formula; elements that stand twice are added up. */
function choicesFor(formula: string): readonly ReadonlyMap<string, number>[] {
  const counts = new Map<string, number>();
  for (const [element, count] of parts(formula)) {
    counts.set(element, (counts.get(element) ?? 0) + count);
  }
  return neutralCharges(counts, 0, mostLookedAt);
}

describe('neutralCharges', () => {
  // Oxidation numbers as in inorganic-chemistry textbooks (common practice, no source).
  it.each([
    ['NaCl', [1, -1]],
    ['MgO', [2, -2]],
    ['ZnS', [2, -2]],
    ['CaF2', [2, -1]],
    ['Li2O', [1, -2]],
    ['TiO2', [4, -2]],
    ['Ti2O3', [3, -2]],
    ['TiO', [2, -2]],
    ['SrTiO3', [2, 4, -2]],
    ['PbTiO3', [2, 4, -2]],
    ['PbO2', [4, -2]],
    ['LaMnO3', [3, 3, -2]],
    ['CaMnO3', [2, 4, -2]],
    ['KMnO4', [1, 7, -2]],
    ['MgAl2O4', [2, 3, -2]],
    ['MnFe2O4', [2, 3, -2]],
    ['FeCr2O4', [2, 3, -2]],
    ['Al2O3', [3, -2]],
    ['Cu2O', [1, -2]],
    ['CuO', [2, -2]],
    ['CdI2', [2, -1]],
    ['ReO3', [6, -2]],
    ['FeO', [2, -2]],
    ['Fe2O3', [3, -2]],
    ['CsCl', [1, -1]],
    ['LiCoO2', [1, 3, -2]],
    ['LiFePO4', [1, 2, 5, -2]],
    ['CaCO3', [2, 4, -2]],
    ['NaNO3', [1, 5, -2]],
    ['CaSO4', [2, 6, -2]],
    ['Na2SO3', [1, 4, -2]],
    ['KClO4', [1, 7, -2]],
    ['KClO3', [1, 5, -2]],
    ['NH4Cl', [-3, 1, -1]],
    ['LiH', [1, -1]],
    ['NaBH4', [1, 3, -1]],
    ['MgO2H2', [2, -2, 1]],
    ['D2O', [1, -2]],
    ['SiC', [4, -4]],
    ['BN', [3, -3]],
    ['GaAs', [3, -3]],
    ['Mg2Si', [2, -4]],
    ['TiS2', [4, -2]],
    ['Hg2Cl2', [1, -1]],
    ['Mg0.75Fe0.25O', [2, 2, -2]],
  ])('takes the one choice for %s', (formula, expected) => {
    const choices = choicesFor(formula).map((choice) =>
      parts(formula).map(([element]) => choice.get(element)),
    );
    expect(choices).toEqual([expected]);
  });

  it.each(['FeTiO3', 'CuFeS2', 'CeVO4'])('says that %s has more than one', (formula) => {
    expect(choicesFor(formula).length).toBeGreaterThan(1);
  });

  it.each([
    // One state per element can't do these: mixed valence, or anions of two atoms.
    'Fe3O4',
    'Na2O2',
    'FeS2',
    'MnS2',
    'KO2',
    'NiAs',
    'Na',
    'O2',
    'NaCl2',
    'XeF2',
    'ArO',
  ])('has none for %s', (formula) => {
    expect(choicesFor(formula)).toEqual([]);
  });

  it('adds up elements that stand twice', () => {
    expect(choicesFor('NH4NO3')).toEqual([]);
    expect(choicesFor('HMgOHO')).toEqual([new Map(Object.entries({ H: 1, Mg: 2, O: -2 }))]);
  });

  it('is neutral whatever it finds, the cation positive', () => {
    const cations = ['Na', 'Ca', 'Fe', 'Ti', 'Mn', 'H', 'Sn'];
    const anions = ['O', 'S', 'Cl', 'N', 'F', 'P'];
    let found = 0;
    for (const cation of cations) {
      for (const anion of anions) {
        for (const count of [1, 2, 3]) {
          for (const choice of choicesFor(`${cation}${count}${anion}2`)) {
            found += 1;
            expect(choice.get(cation)! * count + choice.get(anion)! * 2).toBe(0);
            expect(choice.get(cation)).toBeGreaterThan(0);
          }
        }
      }
    }
    expect(found).toBeGreaterThan(20);
  });

  it('balances what is already known', () => {
    const choices = neutralCharges(new Map([['Mn', 2]]), -8, 10);
    expect(choices).toEqual([new Map([['Mn', 4]])]);
  });

  it('gives no more choices than asked for', () => {
    expect(neutralCharges(new Map(Object.entries({ Fe: 1, Ti: 1, O: 3 })), 0, 1).length).toBe(1);
  });

  it('gives none for more elements than it looks at', () => {
    const many = elements.slice(2, 12).map(({ symbol }) => [symbol, 1] as const);
    expect(neutralCharges(new Map(many), 0, 1)).toEqual([]);
  });
});

describe('oxidation states', () => {
  it('are whole, within ±9, listed once, of known elements', () => {
    const listed = [...elements.map(({ symbol }) => symbol), 'D', 'T'].filter(
      (symbol) => commonOxidationStates(symbol).length > 0,
    );
    expect(listed.length).toBeGreaterThan(80);
    for (const symbol of listed) {
      const { usual, occasional, rare } = oxidationStates(symbol);
      const all = [...usual, ...occasional, ...rare];
      expect(findElement(symbol)).not.toBeNull();
      expect(
        all.every((state) => Number.isInteger(state) && state !== 0 && Math.abs(state) <= 9),
      ).toBe(true);
      expect(new Set(all).size).toBe(all.length);
    }
  });

  it('are empty for noble gases and nonsense', () => {
    expect(commonOxidationStates('Ne')).toEqual([]);
    expect(commonOxidationStates('Qq')).toEqual([]);
  });
});
