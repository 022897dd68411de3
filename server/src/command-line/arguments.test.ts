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

  it('takes a repulsion with its number', () => {
    const repulsionOf = (...args: string[]) => readArguments(['a.cif', ...args]).repulsion;
    expect(repulsionOf()).toBeNull();
    expect(repulsionOf('--repulsion', 'born-lande')).toEqual({
      kind: 'born_lande',
      exponent: { from: 'ions' },
    });
    expect(repulsionOf('--repulsion', 'born-lande', '--exponent', '8')).toEqual({
      kind: 'born_lande',
      exponent: { from: 'typed', exponent: { low: 8, high: 8 } },
    });
    expect(repulsionOf('--repulsion', 'born-mayer', '--rho=0.321')).toEqual({
      kind: 'born_mayer',
      hardnessA: { low: 0.321, high: 0.321 },
    });
  });

  it.each([
    [[]],
    [['a.cif', '--repulsion', 'hard']],
    [['a.cif', '--exponent', '8']],
    [['a.cif', '--repulsion', 'born-lande', '--rho', '0.3']],
    [['a.cif', '--repulsion', 'born-lande', '--exponent', '']],
    [['a.cif', '--repulsion', 'born-lande', '--exponent', '90']],
    [['a.cif', '--repulsion', 'born-mayer', '--exponent', '8']],
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
