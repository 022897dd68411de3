import { describe, expect, it } from 'vitest';

import { snapFraction } from './snap-fraction.js';

describe('rounded fractions', () => {
  it.each([
    ['0.3333', '1/3'],
    ['0.333', '1/3'],
    ['0.6667', '2/3'],
    ['0.66667', '2/3'],
    ['0.6666', '2/3'],
    ['-0.3333', '-1/3'],
    ['1.3333', '4/3'],
    ['-1.6667', '-5/3'],
    ['0.16667', '1/6'],
    ['0.8333', '5/6'],
    ['0.0833', '1/12'],
    ['.41667', '5/12'],
  ])('%s is %s', (digits, fraction) => {
    expect(snapFraction(digits)).toBe(fraction);
  });

  it.each([
    '0.33',
    '0.083',
    '0.3',
    '0.3334',
    '0.3300',
    '0.3053',
    '0.33330',
    '0.25',
    '0',
    '1',
    '0.1667e1',
  ])('%s is itself', (digits) => {
    expect(snapFraction(digits)).toBeNull();
  });
});
