import { describe, expect, it } from 'vitest';

import { readArguments, UsageError } from './arguments.js';

describe('the command line', () => {
  it('takes files, charges and a tolerance in any order', () => {
    const read = readArguments(['a.cif', '--charges', 'Na=1,Cl=-1', 'b.cif', '--tolerance=1e-12']);
    expect(read.files).toEqual(['a.cif', 'b.cif']);
    expect(Object.fromEntries(read.charges)).toEqual({ Na: 1, Cl: -1 });
    expect(read.method.toleranceRelative).toBe(1e-12);
  });

  it('takes charges given in several options', () => {
    const read = readArguments(['a.cif', '--charges', 'Fe1=2', '--charges', 'Fe2=+3, O=-2']);
    expect(Object.fromEntries(read.charges)).toEqual({ Fe1: 2, Fe2: 3, O: -2 });
    expect(read.method.toleranceRelative).toBe(1e-10);
  });

  it.each([
    [[]],
    [['--charges', 'Na=1']],
    [['a.cif', '--speed', '9']],
    [['a.cif', '--charges', 'Na']],
    [['a.cif', '--charges', 'Na=one']],
    [['a.cif', '--charges', 'Na=12']],
    [['a.cif', '--charges', 'Na=1,Na=2']],
    [['a.cif', '--charges']],
    [['a.cif', '--tolerance', 'fine']],
    [['a.cif', '--tolerance', '']],
    [['a.cif', '--tolerance', '1e-15']],
    [['a.cif', '--tolerance', '0.1']],
  ])('refuses %j', (args) => {
    expect(() => readArguments(args)).toThrow(UsageError);
  });
});
