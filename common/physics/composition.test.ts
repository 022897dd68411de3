import { describe, expect, it } from 'vitest';

import { composition } from '#common/physics/composition';
import { resolvedCell, type TestSite } from '#tests/helpers/resolved-cells';

const lattice = { aA: 9, bA: 9, cA: 9, alphaDeg: 90, betaDeg: 90, gammaDeg: 90 };

/** `4 Mg 2` stands for four sites of Mg²⁺, `4 Mg 2 0.75` for four filled to three quarters. */
function cellOf(...rows: readonly string[]) {
  const sites = rows.flatMap((text, row): TestSite[] => {
    const [count, element, chargeE, occupancy = '1'] = text.split(' ');
    return Array.from({ length: Number(count) }, (_, k) => ({
      element: element!,
      chargeE: Number(chargeE),
      occupancy: Number(occupancy),
      at: [k / Number(count), row / rows.length, 0] as const,
      row,
    }));
  });
  return resolvedCell(lattice, sites);
}

describe('composition', () => {
  it.each([
    [['4 Mg 2', '4 O -2'], 'MgO', 4],
    [['4 O -2', '4 Mg 2'], 'MgO', 4],
    [['4 Ca 2', '8 F -1'], 'CaF2', 4],
    [['8 Mg 2', '16 Al 3', '32 O -2'], 'MgAl2O4', 8],
    [['12 Al 3', '18 O -2'], 'Al2O3', 6],
    [['1 Sr 2', '1 Ti 4', '3 O -2'], 'SrTiO3', 1],
    [['2 Ti 4', '1 O -2', '3 O -2'], 'TiO2', 2],
    [['2 Xe 0'], 'Xe', 2],
    [['2 Na 1', '2 C 4', '3 O -2', '3 O -2', '1 Xe 0'], 'Na2C2XeO6', 1],
    [['4 D 1', '2 O -2'], 'D2O', 2],
  ] as const)('of %j is %s', (rows, formula, formulaUnitsPerCell) => {
    expect(composition(cellOf(...rows))).toMatchObject({ formula, formulaUnitsPerCell });
  });

  it.each([
    [['4 Li 1 0.5', '4 O -2'], 'Li0.5O', 4],
    [['2 Ag 1 0.33333333', '1 I -1'], 'Ag0.6667I', 1],
    [['4 Na 1 0.99999999', '4 Cl -1'], 'NaCl', 4],
  ] as const)('of partly filled %j is %s', (rows, formula, formulaUnitsPerCell) => {
    expect(composition(cellOf(...rows))).toMatchObject({ formula, formulaUnitsPerCell });
  });

  it('of a mixed crystal keeps the places as the unit', () => {
    const cell = cellOf('4 Mg 2', '4 O -2');
    const sites = cell.sites.map((site) =>
      site.element === 'O'
        ? site
        : {
            ...site,
            components: [
              { element: 'Mg', chargeE: 2, occupancy: 0.75 },
              { element: 'Fe', chargeE: 2, occupancy: 0.25 },
            ],
            speciesKey: 'Mg+2:0.75/Fe+2:0.25',
          },
    );
    expect(composition({ ...cell, sites })).toMatchObject({
      formula: 'Mg0.75Fe0.25O',
      formulaUnitsPerCell: 4,
      parts: [
        { element: 'Mg', count: 0.75 },
        { element: 'Fe', count: 0.25 },
        { element: 'O', count: 1 },
      ],
    });
  });

  // Molar masses by standard atomic weights (handbook values; from memory).
  it.each([
    [['1 Mg 2', '1 O -2'], 40.304],
    [['1 Ca 2', '2 F -1'], 78.075],
    [['1 Sr 2', '1 Ti 4', '3 O -2'], 183.49],
    [['2 Al 3', '3 O -2'], 101.96],
  ] as const)('of %j has %d g/mol', (rows, mass) => {
    expect(Math.abs(composition(cellOf(...rows)).massGPerMol / mass - 1)).toBeLessThan(1e-4);
  });
});
