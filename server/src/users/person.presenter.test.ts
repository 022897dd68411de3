import { describe, expect, it } from 'vitest';

import { initialsOf } from './person.presenter.js';

describe('initialsOf', () => {
  it.each([
    ['Mira Okafor', 'MO'],
    ['Ana Maria de la Cruz', 'AC'],
    ['Plato', 'P'],
    ['  åse   lindqvist ', 'ÅL'],
    ['(Ida) “Bee” Brandt', 'IB'],
    ['王 小明', '王小'],
    ['…', '?'],
  ])('%s → %s', (name, initials) => {
    expect(initialsOf(name)).toBe(initials);
  });
});
