import { describe, expect, it } from 'vitest';

import { resolveCell } from '#common/physics/resolve-cell';
import {
  pickedIons,
  pickedPair,
  touchedRows,
} from '#client/features/electrostatics/model/picked-ions.ts';
import { cellOf, ledgerOf, spaceGroupOf } from '#client/testing/lattice-factories.ts';

const group = spaceGroupOf();
const { cell } = resolveCell(cellOf(), { operations: group.operations, setting: group });
if (cell === null) {
  throw new Error('The cell of the test must resolve.');
}

describe('picked ions', () => {
  it('leaves out what the cell does not have', () => {
    const picked = pickedIons(cell, ['0.0.0.0', '9.0.0.0', 'nonsense']);
    expect(picked.map((ion) => ion.site.label)).toEqual(['Cs1']);
  });

  it('gives distance, energy and row of two of them', () => {
    const [one, other] = pickedIons(cell, ['0.0.0.0', '1.0.0.0']);
    const pair = pickedPair(cell, one!, other!, ledgerOf());
    // Half the body diagonal of a cube of 4.12 Å.
    expect(pair?.distanceA).toBeCloseTo((4.12 * Math.sqrt(3)) / 2, 10);
    expect(pair?.energyEv).toBeCloseTo(-14.399645469 / ((4.12 * Math.sqrt(3)) / 2), 6);
    expect(pair?.row?.key).toBe('Cs+1|Cl-1|3.568');
    expect(touchedRows(ledgerOf(), [one!, other!], pair)).toEqual(new Set(['Cs+1|Cl-1|3.568']));
  });

  it('has no pair of an ion with itself, and no row beyond the reach', () => {
    const [one, far] = pickedIons(cell, ['0.0.0.0', '1.3.0.0']);
    expect(pickedPair(cell, one!, one!, ledgerOf())).toBeNull();
    expect(pickedPair(cell, one!, far!, ledgerOf())?.row).toBeNull();
  });

  it('touches every row an ion’s kind takes part in', () => {
    const picked = pickedIons(cell, ['1.0.0.0']);
    expect(touchedRows(ledgerOf(), picked, null)).toEqual(new Set(['Cs+1|Cl-1|3.568']));
  });
});
