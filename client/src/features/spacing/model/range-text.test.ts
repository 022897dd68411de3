import { describe, expect, it } from 'vitest';

import { readRange, writeRange } from '#client/features/spacing/model/range-text.ts';

const limits = { name: 'the exponent', low: 2, high: 30, unit: '' };

describe('a number or a range as typed', () => {
  it.each([
    ['8', 8, 8],
    [' 8,5 ', 8.5, 8.5],
    ['7 to 9', 7, 9],
    ['9 … 7', 7, 9],
    ['7–9', 7, 9],
    ['7 - 9', 7, 9],
    ['1.2e1', 12, 12],
  ])('reads %s', (text, low, high) => {
    expect(readRange(text, limits)).toEqual({ ok: true, range: { low, high } });
  });

  it('reads negative numbers with either sign', () => {
    const energy = { name: 'the energy', low: -5000, high: 0, unit: 'kJ/mol' };
    expect(readRange('−790 to -780', energy)).toEqual({
      ok: true,
      range: { low: -790, high: -780 },
    });
  });

  it.each([
    ['eight', /Write the exponent as a number, or as a range: 7 to 9/],
    ['7 to', /as a number/],
    ['1', /Write the exponent between 2 and 30/],
    ['7 to 40', /between 2 and 30/],
  ])('says what to write instead of %s', (text, message) => {
    const read = readRange(text, limits);
    expect(read.ok ? '' : read.message).toMatch(message);
  });

  it('writes what it reads', () => {
    for (const range of [
      { low: 8, high: 8 },
      { low: 7.5, high: 9 },
    ]) {
      expect(readRange(writeRange(range), limits)).toEqual({ ok: true, range });
    }
  });
});
