import { describe, expect, it } from 'vitest';

import { defaultEnergeticModel } from '#common/schemas/energetics';
import {
  readNumber,
  restoreValue,
  setExcluded,
  signCaution,
  solveFor,
  typeValue,
} from '#client/features/formation/model/formation-choices.ts';

const none = defaultEnergeticModel.formation;

describe('choices about the account', () => {
  it('come and go without a trace', () => {
    expect(restoreValue(typeValue(none, 'lattice', -1), 'lattice')).toEqual(none);
    expect(setExcluded(setExcluded(none, 'lattice', true), 'lattice', false)).toEqual(none);
  });

  it('count a line again when it is solved for', () => {
    const chosen = solveFor(setExcluded(none, 'lattice', true), 'lattice');
    expect(chosen).toMatchObject({ excluded: [], solveFor: 'lattice' });
  });
});

describe('a number as typed', () => {
  it.each([
    ['-364', -364],
    ['−364', -364],
    ['+12.5', 12.5],
    ['1 450,7', 1450.7],
    ['.5', 0.5],
    ['1e3', 1000],
  ])('%s', (text, value) => expect(readNumber(text)).toBe(value));

  it.each(['', 'x', '1..2', '-', '3 to 4', '1,2,3'])('not %s', (text) =>
    expect(readNumber(text)).toBeNull(),
  );
});

describe('the sign of a value', () => {
  it('is cautioned about where the direction of the line settles it', () => {
    expect(signCaution('ionisation', -5)).toContain('positive');
    expect(signCaution('lattice', 700)).toContain('negative');
    expect(signCaution('affinity', 744)).toBeNull();
    expect(signCaution('affinity', -141)).toBeNull();
  });
});
