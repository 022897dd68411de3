import { describe, expect, it } from 'vitest';

import {
  addParameter,
  addSite,
  duplicateSite,
  moveSite,
  removeSite,
  setLatticeParameter,
  setSite,
  setSpaceGroup,
} from '#client/features/cell-editor/model/cell-edits.ts';
import { cellOf, spaceGroupOf } from '#client/testing/lattice-factories.ts';

const labels = (cell: ReturnType<typeof cellOf>): string[] => cell.sites.map((site) => site.label);
const cubic = spaceGroupOf({ hallNumber: 517, number: 221, crystalSystem: 'cubic' });

describe('edits of a cell', () => {
  it('lets a new site take its name from its element until it is named', () => {
    const added = addSite(cellOf());
    expect(labels(added)).toEqual(['Cs1', 'Cl1', 'X1']);
    const caesium = setSite(added, 2, { element: 'Cs' });
    expect(labels(caesium)).toEqual(['Cs1', 'Cl1', 'Cs2']);
    const named = setSite(setSite(caesium, 2, { label: 'guest' }), 2, { element: 'K' });
    expect(labels(named)[2]).toBe('guest');
  });

  it('copies a row below itself under a free label', () => {
    expect(labels(duplicateSite(cellOf(), 0))).toEqual(['Cs1', 'Cs2', 'Cl1']);
  });

  it('moves rows, and keeps them where there is no further', () => {
    expect(labels(moveSite(cellOf(), 1, -1))).toEqual(['Cl1', 'Cs1']);
    expect(labels(moveSite(cellOf(), 0, -1))).toEqual(['Cs1', 'Cl1']);
    expect(labels(removeSite(cellOf(), 0))).toEqual(['Cl1']);
  });

  it('lets tied edges follow in a cubic cell, and not without symmetry', () => {
    expect(setLatticeParameter(cellOf(), 'a', '5', cubic).lattice).toMatchObject({
      a: '5',
      b: '5',
      c: '5',
      gamma: '90',
    });
    expect(setLatticeParameter(cellOf(), 'a', '5', null).lattice.b).toBe('4.12');
  });

  it('brings edges into the crystal system of a new space group', () => {
    const skewed = cellOf({ lattice: { ...cellOf().lattice, b: '6', gamma: '100' } });
    const cell = setSpaceGroup(skewed, cubic);
    expect(cell.symmetry).toEqual({ kind: 'setting', hallNumber: 517 });
    expect(cell.lattice).toMatchObject({ b: '4.12', gamma: '90' });
  });

  it('names parameters by free letters', () => {
    let cell = cellOf();
    for (let count = 0; count < 4; count += 1) {
      cell = addParameter(cell);
    }
    expect(cell.parameters.map((one) => one.name)).toEqual(['u', 'v', 'w', 'p1']);
  });
});
