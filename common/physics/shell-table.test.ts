import { describe, expect, it } from 'vitest';

import { buildShellTable, pairDistance } from '#common/physics/shell-table';
import { COULOMB_EV_ANGSTROM as k } from '#common/units/constants';
import { fluoriteCell, rockSaltCell } from '#tests/helpers/resolved-cells';

describe('the shell table', () => {
  const edgeA = 4.212;
  const rows = buildShellTable(rockSaltCell(edgeA), 0, 1.55 * edgeA);

  it('of an ion in rock salt has shells of 6, 12, 8, 6, 24, 24, 12, 30', () => {
    // Ways to write n as a sum of three squares, n = 1, 2, … 9 without 7 (OEIS A005875).
    expect(rows.map(({ multiplicity }) => multiplicity)).toEqual([6, 12, 8, 6, 24, 24, 12, 30]);
    expect(rows.map(({ speciesKey }) => speciesKey).slice(0, 4)).toEqual([
      'O-2',
      'Mg+2',
      'O-2',
      'Mg+2',
    ]);
  });

  it('has energies k q q′/d times the multiplicity, and their running sum', () => {
    let running = 0;
    rows.forEach((row, i) => {
      const square = [1, 2, 3, 4, 5, 6, 8, 9][i]!;
      const distanceA = (edgeA / 2) * Math.sqrt(square);
      const charges = row.speciesKey === 'O-2' ? -4 : 4;
      const expected = (row.multiplicity * k * charges) / distanceA;
      running += expected;
      // Some ten rounding units of terms up to four times the sum.
      expect(Math.abs(row.distanceA - distanceA)).toBeLessThan(1e-13 * distanceA);
      expect(Math.abs(row.energyEv - expected)).toBeLessThan(1e-12 * Math.abs(expected));
      expect(Math.abs(row.runningEv - running)).toBeLessThan(1e-12 * 300);
    });
  });

  it('of fluorine in fluorite begins with 4 Ca and 6 F', () => {
    const shells = buildShellTable(fluoriteCell(), 4, 3);
    expect(shells.map(({ speciesKey, multiplicity }) => [speciesKey, multiplicity])).toEqual([
      ['Ca+2', 4],
      ['F-1', 6],
    ]);
  });

  it('is empty within a reach that holds nothing', () => {
    expect(buildShellTable(rockSaltCell(edgeA), 0, 1)).toEqual([]);
  });
});

describe('a pair of ions', () => {
  const cell = rockSaltCell(4.212);

  it('has a distance over cell borders and a bare energy', () => {
    const { distanceA, energyEv } = pairDistance(
      cell,
      { siteIndex: 0, image: [0, 0, 0] },
      { siteIndex: 4, image: [-1, -1, -1] },
    );
    expect(Math.abs(distanceA - 2.106 * Math.sqrt(3))).toBeLessThan(1e-14);
    expect(Math.abs(energyEv + (4 * k) / distanceA)).toBeLessThan(1e-14 * k);
  });

  it('of one ion with itself has no energy', () => {
    const ion = { siteIndex: 2, image: [1, 0, 0] } as const;
    expect(pairDistance(cell, ion, ion)).toEqual({ distanceA: 0, energyEv: NaN });
  });
});
