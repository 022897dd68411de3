import { describe, expect, it } from 'vitest';

import {
  formatBound,
  formatCharge,
  formatFixed,
  formatNetCharge,
  formatPower,
  formatSigned,
  formatTidy,
  plainNumberText,
} from '#common/units/format';

describe('numbers on the screen', () => {
  it('groups by three with a true minus', () => {
    expect(formatFixed(-47.7954617, 7)).toBe('−47.795 461 7');
    expect(formatFixed(1234.5678, 4)).toBe('1234.5678');
    expect(formatFixed(1_234_567, 0)).toBe('1 234 567');
    expect(formatFixed(-0.0001, 2)).toBe('0.00');
  });

  it('writes the plus where the sign is the point', () => {
    expect(formatSigned(116.0361, 2)).toBe('+116.04');
    expect(formatSigned(-164.1, 2)).toBe('−164.10');
    expect(formatSigned(0.001, 2)).toBe('0.00');
  });

  it('trims zeros of tidy numbers', () => {
    expect(formatTidy(2.106, 5)).toBe('2.106');
    expect(formatTidy(90, 3)).toBe('90');
    expect(formatTidy(-0.00001, 3)).toBe('0');
  });

  it('rounds a bound up to one digit', () => {
    expect(formatBound(3.2e-10)).toBe('4 × 10⁻¹⁰');
    expect(formatBound(4e-10)).toBe('4 × 10⁻¹⁰');
    expect(formatBound(9.2e-5)).toBe('1 × 10⁻⁴');
    expect(formatBound(0)).toBe('0');
  });

  it('writes powers of ten', () => {
    expect(formatPower(1e-10)).toBe('1 × 10⁻¹⁰');
    expect(formatPower(-1.25e7, 3)).toBe('−1.25 × 10⁷');
  });

  it('writes charges the way chemists do', () => {
    expect(formatCharge(2)).toBe('2+');
    expect(formatCharge(-1)).toBe('−');
    expect(formatCharge(1)).toBe('+');
    expect(formatCharge(-0.5)).toBe('0.5−');
    expect(formatCharge(0)).toBe('');
    expect(formatNetCharge(1)).toBe('+1');
    expect(formatNetCharge(-0.25)).toBe('−0.25');
    expect(formatNetCharge(1e-12)).toBe('0');
  });

  it('goes back to plain text for programs', () => {
    expect(plainNumberText(formatFixed(-47.7954617, 7))).toBe('-47.7954617');
  });
});
