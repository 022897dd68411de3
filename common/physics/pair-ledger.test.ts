import { describe, expect, it } from 'vitest';

import {
  buildPairLedger,
  defaultReachA,
  shortestUnlike,
  speciesOfCell,
} from '#common/physics/pair-ledger';
import type { PairLedger } from '#common/schemas/evaluation';
import { COULOMB_EV_ANGSTROM as k } from '#common/units/constants';
import { seededNumbers } from '#tests/helpers/engine-cells';
import { cubicCell, fluoriteCell, rockSaltCell } from '#tests/helpers/resolved-cells';

const edgeA = 4.212;
const d0 = edgeA / 2;

/** Madelung constant of rock salt, OEIS A085469; MgO per formula unit, eV. */
const magnesiaEv = (-1.747564594633182 * 4 * k) / d0;

function expectClosed({ rows, selfEv, beyondEv, totalEv }: PairLedger): void {
  const sum = rows.reduce((total, { contributionEv }) => total + contributionEv, 0);
  // The closing row is a difference: as exact as the sum of the rows is.
  const size = rows.reduce((total, row) => total + Math.abs(row.contributionEv), 0);
  expect(Math.abs(sum + selfEv + beyondEv - totalEv)).toBeLessThanOrEqual(
    2 * Number.EPSILON * (size + Math.abs(totalEv)),
  );
  expect(rows.at(-1)?.runningEv).toBe(sum);
}

describe('the pair ledger of rock salt', () => {
  const ledger = buildPairLedger(rockSaltCell(edgeA), magnesiaEv, 4);

  it('reads as the series −6/1 + 12/√2 − 8/√3 + 6/2 − 24/√5 + 24/√6 + 12/√8 − 30/3', () => {
    // H. M. Evjen, Phys. Rev. 39 (1932) 675, and every textbook; like pairs, half of them of each ion.
    const series: [number, number][] = [
      [1, -6],
      [2, 12],
      [3, -8],
      [4, 6],
      [5, -24],
      [6, 24],
      [8, 12],
      [9, -30],
    ];
    const unit = (k * 4) / d0;
    const found = new Map<number, { sum: number; kinds: Record<string, number> }>();
    for (const row of ledger.rows) {
      const square = Math.round((row.distanceA / d0) ** 2);
      const entry = found.get(square) ?? { sum: 0, kinds: {} };
      entry.sum += row.contributionEv / unit;
      entry.kinds[`${row.speciesA} ${row.speciesB}`] = row.pairsPerFormulaUnit;
      found.set(square, entry);
    }
    expect([...found.keys()]).toEqual(series.map(([square]) => square));
    for (const [square, count] of series) {
      const expected = count / Math.sqrt(square);
      expect(Math.abs(found.get(square)!.sum - expected)).toBeLessThan(1e-12);
    }
    expect(found.get(1)!.kinds).toEqual({ 'Mg+2 O-2': 6 });
    expect(found.get(2)!.kinds).toEqual({ 'Mg+2 Mg+2': 6, 'O-2 O-2': 6 });
  });

  it('reaches 3 d₀, where a shell completes', () => {
    expect(Math.abs(ledger.reachA - 3 * d0)).toBeLessThan(1e-9);
  });

  it('names its rows by the ions and the distance', () => {
    expect(ledger.rows.slice(0, 4).map(({ key }) => key)).toEqual([
      'Mg+2|O-2|2.106',
      'Mg+2|Mg+2|2.978',
      'O-2|O-2|2.978',
      'Mg+2|O-2|3.648',
    ]);
  });

  it('closes exactly, running sums and all', () => {
    expectClosed(ledger);
    expect(ledger.selfEv).toBe(0);
  });

  it('counts the same in a cell eight times as large', () => {
    const cell = rockSaltCell(edgeA);
    const halves = [0, 1].flatMap((x) => [0, 1].flatMap((y) => [0, 1].map((z) => [x, y, z])));
    const big = cubicCell(
      2 * edgeA,
      halves.flatMap((shift) =>
        cell.sites.map(({ element, chargeE, definitionIndex, fractional }) => ({
          element,
          chargeE,
          row: definitionIndex,
          at: fractional.map((f, i) => (f + shift[i]!) / 2) as [number, number, number],
        })),
      ),
    );
    const rows = buildPairLedger(big, magnesiaEv, 32, { reachA: ledger.reachA }).rows;
    expect(rows.map(({ key, pairsPerFormulaUnit }) => [key, pairsPerFormulaUnit])).toEqual(
      ledger.rows.map(({ key, pairsPerFormulaUnit }) => [key, pairsPerFormulaUnit]),
    );
  });

  it('stops at the reach it is told, the shell at it included', () => {
    const keys = buildPairLedger(rockSaltCell(edgeA), magnesiaEv, 4, { reachA: 2.978 }).rows;
    expect(keys.map(({ key }) => key)).toEqual([
      'Mg+2|O-2|2.106',
      'Mg+2|Mg+2|2.978',
      'O-2|O-2|2.978',
    ]);
    expect(buildPairLedger(rockSaltCell(edgeA), magnesiaEv, 4, { reachA: 1 }).rows).toEqual([]);
  });
});

describe('the neutralised view', () => {
  it('lets the rest shrink as the reach grows', () => {
    const rest = [3, 6, 12, 24].map((times) => {
      const options = { reachA: times * d0 + 0.01, view: 'neutralised' } as const;
      return Math.abs(buildPairLedger(rockSaltCell(edgeA), magnesiaEv, 4, options).beyondEv);
    });
    expect(rest[3]).toBeLessThan(rest[0]! / 4);
    expect(rest[3]).toBeLessThan(0.02 * Math.abs(magnesiaEv));
  });

  it('weighs each row with 1 − d/R and has a self row', () => {
    const options = { reachA: 5, view: 'neutralised' } as const;
    const ledger = buildPairLedger(rockSaltCell(edgeA), magnesiaEv, 4, options);
    // −k Σq²/2R with Σq² = 8 per formula unit.
    expect(Math.abs(ledger.selfEv + (k * 8) / 10)).toBeLessThan(1e-12);
    for (const row of ledger.rows) {
      const expected = row.pairsPerFormulaUnit * row.pairEnergyEv * (1 - row.distanceA / 5);
      expect(Math.abs(row.contributionEv - expected)).toBeLessThan(1e-12);
    }
    expectClosed(ledger);
  });
});

describe('the pair ledger of fluorite', () => {
  it('has 8 bonds per formula unit, and F–F at half the edge and at its diagonal', () => {
    const ledger = buildPairLedger(fluoriteCell(), -30, 4);
    const counts = ledger.rows.map((row) => [row.speciesA, row.speciesB, row.pairsPerFormulaUnit]);
    expect(counts.slice(0, 4)).toEqual([
      ['Ca+2', 'F-1', 8],
      ['F-1', 'F-1', 6],
      ['Ca+2', 'Ca+2', 6],
      ['F-1', 'F-1', 12],
    ]);
    expectClosed(ledger);
  });
});

describe('any cell', () => {
  const random = seededNumbers(5);
  const sites = Array.from({ length: 40 }, (_, i) => ({
    element: i % 2 === 0 ? 'Na' : 'Cl',
    chargeE: i % 2 === 0 ? 1 : -1,
    at: [random(), random(), random()] as const,
    row: i % 4,
  }));
  const cell = cubicCell(9, sites);

  it('has rows with names of their own, even where distances crowd', () => {
    const ledger = buildPairLedger(cell, -1, 20, { reachA: 9 });
    expect(ledger.rows.length).toBeGreaterThan(500);
    expect(new Set(ledger.rows.map(({ key }) => key)).size).toBe(ledger.rows.length);
    expectClosed(ledger);
  });

  it('has each pair counted once, whichever sites share a row of the table', () => {
    const reachA = 9;
    const ledger = buildPairLedger(cell, -1, 1, { reachA });
    const pairs = ledger.rows.reduce((sum, row) => sum + row.pairsPerFormulaUnit, 0);
    let expected = 0;
    for (const a of sites) {
      for (const b of sites) {
        for (let image = 0; image < 125; image += 1) {
          const shift = [
            Math.floor(image / 25) - 2,
            (Math.floor(image / 5) % 5) - 2,
            (image % 5) - 2,
          ];
          const d = 9 * Math.hypot(...shift.map((s, axis) => b.at[axis]! - a.at[axis]! + s));
          expected += d > 0 && d <= reachA + 5e-4 ? 0.5 : 0;
        }
      }
    }
    expect(pairs).toBe(expected);
  });

  it('takes wider groups when told, and finer ones with longer names', () => {
    const at = (groupingA: number) => buildPairLedger(cell, -1, 20, { reachA: 6, groupingA }).rows;
    expect(at(0.1).length).toBeLessThan(at(1e-3).length);
    expect(at(1e-5).length).toBeGreaterThanOrEqual(at(1e-3).length);
    expect(at(1e-5)[0]!.key).toMatch(/\|\d\.\d{5}$/);
  });
});

describe('the shortest cation–anion distance', () => {
  it('is d₀ with the sites it lies between', () => {
    const found = shortestUnlike(rockSaltCell(edgeA))!;
    expect(Math.abs(found.distanceA - d0)).toBeLessThan(1e-12);
    expect([found.siteA < 4, found.siteB >= 4]).toEqual([true, true]);
  });

  it('is found across a large empty cell', () => {
    const cell = cubicCell(60, [
      { element: 'Na', chargeE: 1, at: [0.01, 0.5, 0.5] },
      { element: 'Cl', chargeE: -1, at: [0.97, 0.5, 0.5] },
    ]);
    expect(Math.abs(shortestUnlike(cell)!.distanceA - 2.4)).toBeLessThan(1e-12);
  });

  it('is none where all ions have one sign, and the reach follows from the room of a site', () => {
    const cell = cubicCell(3, [{ element: 'Na', chargeE: 1, at: [0, 0, 0] }]);
    expect(shortestUnlike(cell)).toBeNull();
    expect(defaultReachA(cell)).toBe(9);
  });

  it('passes over sites without a charge', () => {
    const cell = cubicCell(4, [
      { element: 'Na', chargeE: 1, at: [0, 0, 0] },
      { element: 'Xe', chargeE: 0, at: [0.25, 0, 0] },
      { element: 'Cl', chargeE: -1, at: [0.5, 0, 0] },
    ]);
    expect(shortestUnlike(cell)!.distanceA).toBe(2);
    const rows = buildPairLedger(cell, -1, 1).rows;
    expect(rows.some(({ key }) => key.includes('Xe'))).toBe(false);
  });

  it('does not hang where nothing is charged', () => {
    const cell = cubicCell(4, [{ element: 'Xe', chargeE: 0, at: [0, 0, 0] }]);
    expect(defaultReachA(cell)).toBe(12);
    expect(buildPairLedger(cell, 0, 1).rows).toEqual([]);
  });
});

describe('ion kinds', () => {
  it('are listed cations first, each as it first appears', () => {
    const cell = cubicCell(4, [
      { element: 'O', chargeE: -2, at: [0, 0, 0] },
      { element: 'Ti', chargeE: 4, at: [0.5, 0.5, 0.5] },
      { element: 'Xe', chargeE: 0, at: [0.25, 0, 0] },
      { element: 'O', chargeE: -2, at: [0.5, 0, 0] },
    ]);
    const { keys, chargesE, indexOfSite } = speciesOfCell(cell);
    expect(keys).toEqual(['Ti+4', 'Xe0', 'O-2']);
    expect(chargesE).toEqual([4, 0, -2]);
    expect([...indexOfSite]).toEqual([2, 0, 1, 2]);
  });
});
