import { describe, expect, it } from 'vitest';

import { AccumulatorArray, sumOf } from './accumulator.js';

describe('a compensated sum', () => {
  it('keeps what plain addition loses', () => {
    // A. Neumaier's own example: plain and once-compensated sums give 0.
    expect(sumOf([1, 1e100, 1, -1e100])).toBe(2);
    expect(1 + 1e100 + 1 - 1e100).toBe(0);
  });

  it('adds a million tenths to the last digit', () => {
    const total = new AccumulatorArray(1);
    for (let i = 0; i < 1e6; i += 1) {
      total.add(0, 0.1);
    }
    // 10⁶ × the double nearest to 0.1, which is 0.1 + 5.55 × 10⁻¹⁸.
    expect(total.value(0)).toBe(100000);
  });

  it('keeps its indices apart', () => {
    const totals = new AccumulatorArray(3);
    totals.add(0, 1);
    totals.add(2, -4);
    totals.add(2, 1);
    expect([...totals.values()]).toEqual([1, 0, -3]);
    expect(totals.value(1)).toBe(0);
  });
});
