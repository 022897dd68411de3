import { describe, expect, it } from 'vitest';

import { hazardsOf } from '#common/chemistry/hazards';

const cellOf = (...ions: readonly (readonly [string, number])[]) => ({
  sites: ions.map(([element, chargeE], index) => ({
    ...{ definitionIndex: index, label: `${element}1`, copy: 0, chargeE, element },
    fractional: [0, 0, 0] as const,
    components: [{ element, chargeE, occupancy: 1 }],
    speciesKey: element,
  })),
});

// What the notes say is general knowledge; these tests only hold where they are given.
describe('cautions', () => {
  it('are none for magnesia and spinel', () => {
    expect(hazardsOf(cellOf(['Mg', 2], ['O', -2]))).toEqual([]);
    expect(hazardsOf(cellOf(['Mg', 2], ['Al', 3], ['O', -2]))).toEqual([]);
  });

  it.each(['Be', 'As', 'Cd', 'Hg', 'Tl', 'Pb'])('name %s', (element) => {
    expect(hazardsOf(cellOf([element, 2], ['O', -2]))).toHaveLength(1);
  });

  it('name radioactive elements together', () => {
    expect(hazardsOf(cellOf(['U', 4], ['Th', 4], ['O', -2])).join()).toMatch(
      /U, Th are radioactive: work with it is licensed/,
    );
  });

  it.each([
    [
      'lithium hydride',
      [
        ['Li', 1],
        ['H', -1],
      ],
      /hydrides react with water/,
    ],
    [
      'sodium fluoride',
      [
        ['Na', 1],
        ['F', -1],
      ],
      /Soluble fluorides/,
    ],
    [
      'potassium chromate',
      [
        ['K', 1],
        ['Cr', 6],
        ['O', -2],
      ],
      /Chromium\(VI\)/,
    ],
    [
      'zinc sulfide',
      [
        ['Zn', 2],
        ['S', -2],
      ],
      /hydrogen sulfide/,
    ],
    [
      'calcium oxide',
      [
        ['Ca', 2],
        ['O', -2],
      ],
      /caustic/,
    ],
    [
      'sodium peroxide',
      [
        ['Na', 1],
        ['O', -1],
      ],
      /Peroxides/,
    ],
    [
      'lithium nitride',
      [
        ['Li', 1],
        ['N', -3],
      ],
      /react with water/,
    ],
  ] as const)('know the class of %s', (_name, ions, words) => {
    expect(hazardsOf(cellOf(...ions)).join(' ')).toMatch(words);
  });

  it('don’t call fluorite a soluble fluoride', () => {
    expect(hazardsOf(cellOf(['Ca', 2], ['F', -1]))).toEqual([]);
  });
});
