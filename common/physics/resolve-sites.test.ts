import { describe, expect, it } from 'vitest';

import { cellVectors } from '#common/physics/cell-metric';
import { resolveSites, type SiteNumbers } from '#common/physics/resolve-sites';
import { cellLimits } from '#common/schemas/cell';
import { groups } from '#tests/helpers/group-closure';

const cubic = (aA: number) =>
  cellVectors({ aA, bA: aA, cA: aA, alphaDeg: 90, betaDeg: 90, gammaDeg: 90 });

function row(
  definitionIndex: number,
  element: string,
  chargeE: number,
  fractional: readonly [number, number, number],
  occupancy = 1,
): SiteNumbers {
  const component = { element, chargeE, occupancy };
  return { definitionIndex, label: `${element}${definitionIndex}`, component, fractional };
}

describe('rows on one place', () => {
  it('become one mean-field site', () => {
    const rows = [
      row(0, 'Mg', 2, [0, 0, 0], 0.75),
      row(1, 'Fe', 3, [1, 0, 0], 0.25),
      row(2, 'O', -2, [0.5, 0.5, 0.5]),
    ];
    const { sites, problems } = resolveSites(rows, groups['Fm-3m'], cubic(4.2));
    expect(problems).toEqual([]);
    expect(sites.length).toBe(8);
    expect(sites[0]).toMatchObject({
      definitionIndex: 0,
      label: 'Mg0',
      element: 'Mg',
      chargeE: 2.25,
      speciesKey: 'Mg+2:0.75/Fe+3:0.25',
      components: [
        { element: 'Mg', chargeE: 2, occupancy: 0.75 },
        { element: 'Fe', chargeE: 3, occupancy: 0.25 },
      ],
    });
  });

  it('take the element of the largest part', () => {
    const rows = [row(0, 'Mg', 2, [0, 0, 0], 0.25), row(1, 'Fe', 2, [0, 0, 0], 0.7)];
    expect(resolveSites(rows, groups.P1, cubic(4)).sites[0]).toMatchObject({
      element: 'Fe',
      label: 'Mg0',
      definitionIndex: 0,
    });
  });

  it('are found at a symmetry copy and over a corner of the cell', () => {
    const rows = [row(0, 'Mg', 2, [0, 0, 0], 0.5), row(1, 'Fe', 2, [0.9999, 0.5001, 0.5], 0.5)];
    const { sites } = resolveSites(rows, groups['Fm-3m'], cubic(4.2));
    expect(sites.length).toBe(4);
  });

  it('may not add up to more than one', () => {
    const rows = [row(0, 'Mg', 2, [0, 0, 0], 0.75), row(1, 'Fe', 2, [0, 0, 0], 0.5)];
    expect(resolveSites(rows, groups.P1, cubic(4)).problems).toEqual([
      {
        code: 'cell.occupancy',
        field: 'sites.1.occupancy',
        message:
          'Mg0, Fe1 share one place and add up to 1.25: lower an occupancy so that the sum is at most 1.',
      },
    ]);
  });

  it('may add up to one by thirds', () => {
    const third = 1 / 3;
    const rows = ['Mg', 'Fe', 'Mn'].map((element, k) => row(k, element, 2, [0, 0, 0], third));
    const { sites, problems } = resolveSites(rows, groups.P1, cubic(4));
    expect(problems).toEqual([]);
    expect(sites[0]!.chargeE).toBeCloseTo(2, 12);
  });

  it('must have as many copies as each other', () => {
    // 0.06 Å off the centre of inversion, so twice in the cell; the other row is on it.
    const rows = [row(0, 'Mg', 2, [0, 0, 0], 0.5), row(1, 'Fe', 2, [0.0018, 0, 0], 0.5)];
    const { problems } = resolveSites(rows, groups['P-1'], cubic(4));
    expect(problems).toEqual([
      {
        code: 'cell.coincident_sites',
        field: 'sites.1.x',
        message:
          'Fe1 shares the place of Mg0 but has 2 copies in the cell, not 1: give both the same coordinates.',
      },
    ]);
  });
});

describe('ions on top of each other', () => {
  it('are named with their distance', () => {
    const rows = [row(0, 'Mg', 2, [0, 0, 0]), row(1, 'O', -2, [0.001, 0, 0])];
    expect(resolveSites(rows, groups.P1, cubic(4)).problems).toEqual([
      {
        code: 'cell.coincident_sites',
        field: 'sites.1.x',
        message:
          'O1 lies on Mg0 (0.004 Å apart): move it, remove it, or give both an occupancy below 1.',
      },
    ]);
  });

  it('are refused below 0.1 Å', () => {
    const rows = [row(0, 'Mg', 2, [0, 0, 0]), row(1, 'O', -2, [0.02, 0, 0])];
    expect(resolveSites(rows, groups.P1, cubic(4)).problems).toEqual([
      {
        code: 'cell.coincident_sites',
        field: 'sites.1.x',
        message: 'O1 lies 0.080 Å from Mg0, less than 0.1 Å: move it or remove one of the two.',
      },
    ]);
    expect(resolveSites(rows, groups.P1, cubic(5.1)).problems).toEqual([]);
  });

  it('may be copies of one row that missed its special position', () => {
    const rows = [row(0, 'Cl', -1, [0.005, 0, 0])];
    expect(resolveSites(rows, groups.Pm, cubic(5)).problems).toEqual([]);
    expect(resolveSites(rows, groups['P-1'], cubic(5)).problems[0]!.message).toBe(
      'Cl0 lies 0.050 Å from its own symmetry copy: put it on the special position between them, or move it away.',
    );
  });

  it('may be split positions that are partly filled', () => {
    const rows = [row(0, 'Ag', 1, [0.005, 0, 0], 0.5)];
    const { sites, problems } = resolveSites(rows, groups['P-1'], cubic(5));
    expect(problems).toEqual([]);
    expect(sites.length).toBe(2);
  });
});

describe('large cells', () => {
  /** Points of a low-discrepancy sequence: no two of them close. */
  const spread = (count: number) =>
    Array.from({ length: count }, (_, i) =>
      row(i, 'Na', 1, [(i * 0.8191725) % 1, (i * 0.6710436) % 1, (i * 0.5497005) % 1]),
    );

  it('hold every row', () => {
    const { sites, problems } = resolveSites(spread(2000), groups.P1, cubic(60));
    expect(problems).toEqual([]);
    expect(new Set(sites.map(({ label }) => label)).size).toBe(2000);
  });

  it('find one pair on one place among all', () => {
    const rows = spread(2000);
    const twin = { ...rows[777]!, definitionIndex: 2000, label: 'twin' };
    const { problems } = resolveSites([...rows, twin], groups.P1, cubic(60));
    expect(problems.map(({ message }) => message)).toEqual([
      'twin lies on Na777 (0.000 Å apart): move it, remove it, or give both an occupancy below 1.',
    ]);
  });

  it('are refused beyond the limit of sites', () => {
    const { sites, problems } = resolveSites(spread(120), groups['Fm-3m'], cubic(300));
    expect(sites.length).toBeLessThanOrEqual(cellLimits.expandedSites);
    expect(problems.map(({ code }) => code)).toEqual(['cell.too_many_sites']);
  });
});
