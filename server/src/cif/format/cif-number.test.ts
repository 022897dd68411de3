import { describe, expect, it } from 'vitest';

import { readCifNumber } from './cif-number.js';

describe('CIF numbers', () => {
  // International Tables G, 2.2.7.1.4: the uncertainty stands in units of the last digit.
  it.each([
    ['5.640(1)', 5.64, '5.640', 0.001],
    ['34.5(12)', 34.5, '34.5', 1.2],
    ['-0.125', -0.125, '-0.125', null],
    ['.5', 0.5, '.5', null],
    ['5.', 5, '5.', null],
    ['+3', 3, '+3', null],
    ['3.45e2(3)', 345, '3.45e2', 3],
    ['90', 90, '90', null],
  ])('reads %s', (text, value, digits, uncertainty) => {
    const read = readCifNumber(text)!;
    expect(read.value).toBeCloseTo(value, 12);
    expect(read.digits).toBe(digits);
    if (uncertainty === null) {
      expect(read.uncertainty).toBeNull();
    } else {
      expect(read.uncertainty).toBeCloseTo(uncertainty, 12);
    }
  });

  it.each(['', '?', '.', 'x', '1.2.3', '0.5a', '1(', '(1)', '--1', '1e999', 'Infinity', '0x10'])(
    'refuses “%s”',
    (text) => {
      expect(readCifNumber(text)).toBeNull();
    },
  );
});
