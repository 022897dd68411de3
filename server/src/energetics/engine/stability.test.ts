import { describe, expect, it } from 'vitest';

import { polycrystalAverages } from './averages.js';
import { inverseOf } from './elastic.js';
import { bornStability, type CrystalSystem } from './stability.js';

/** A symmetric matrix from its upper entries by name. */
function stiffness(entries: Readonly<Record<string, number>>): Float64Array {
  const c = new Float64Array(36);
  for (const [name, value] of Object.entries(entries)) {
    const [i, j] = [Number(name[0]) - 1, Number(name[1]) - 1];
    c[6 * i + j] = value;
    c[6 * j + i] = value;
  }
  return c;
}

const cubic = (c11: number, c12: number, c44: number) =>
  stiffness({ 11: c11, 22: c11, 33: c11, 12: c12, 13: c12, 23: c12, 44: c44, 55: c44, 66: c44 });

const hexagonal = (c11: number, c12: number, c13: number, c33: number, c44: number) =>
  stiffness({
    11: c11,
    22: c11,
    33: c33,
    12: c12,
    13: c13,
    23: c13,
    44: c44,
    55: c44,
    66: (c11 - c12) / 2,
  });

/** Sum with another matrix of named entries. */
function plus(c: Float64Array, entries: Readonly<Record<string, number>>): Float64Array {
  const other = stiffness(entries);
  return c.map((value, at) => value + other[at]!);
}

describe('averages over a polycrystal', () => {
  // Inputs from memory, results by own arithmetic to six digits: K, G_V, G_R, G_H, E, ν, A.
  it.each([
    ['NaCl', [48.7, 12.6, 12.7], [24.6333, 14.84, 14.4082, 14.6241, 36.6247, 0.2522, 0.1498]],
    ['MgO', [297, 95.8, 156], [162.8667, 133.84, 127.8397, 130.8398, 309.6104, 0.1832, 0.2347]],
    ['LiF', [112, 45.6, 63.2], [67.7333, 51.2, 46.4212, 48.8106, 118.0702, 0.2095, 0.5147]],
    ['CaF2', [164, 53, 33.7], [90, 42.42, 39.9818, 41.2009, 107.2386, 0.3014, 0.3049]],
  ] as const)('of %s as worked out by hand', (_name, [c11, c12, c44], expected) => {
    const c = cubic(c11, c12, c44);
    const found = polycrystalAverages(c, inverseOf(c)!);
    const [k, gv, gr, gh, e, nu, anisotropy] = expected;
    expect(found.bulkVoigtGpa).toBeCloseTo(k, 4);
    expect(found.bulkReussGpa).toBeCloseTo(k, 4);
    expect(found.shearVoigtGpa).toBeCloseTo(gv, 4);
    expect(found.shearReussGpa).toBeCloseTo(gr, 4);
    expect(found.shearHillGpa).toBeCloseTo(gh, 4);
    expect(found.youngHillGpa).toBeCloseTo(e, 3);
    expect(found.poissonHill).toBeCloseTo(nu, 4);
    expect(found.universalAnisotropy).toBeCloseTo(anisotropy, 4);
  });

  it('of an isotropic solid agree and show no anisotropy', () => {
    const c = cubic(100, 40, 30);
    const found = polycrystalAverages(c, inverseOf(c)!);
    expect(found.shearVoigtGpa).toBeCloseTo(30, 10);
    expect(found.shearReussGpa).toBeCloseTo(30, 10);
    expect(found.universalAnisotropy).toBeCloseTo(0, 10);
  });

  it('put Reuss below Voigt for any positive stiffness', () => {
    const c = plus(hexagonal(160, 90, 66, 181, 46), { 14: 9, 24: -9, 56: 9, 16: 3 });
    const found = polycrystalAverages(c, inverseOf(c)!);
    expect(found.bulkReussGpa).toBeLessThan(found.bulkVoigtGpa);
    expect(found.shearReussGpa).toBeLessThan(found.shearVoigtGpa);
  });
});

describe('Born stability', () => {
  const trigonal = (c14: number, c15 = 0) =>
    plus(hexagonal(86, 7, 12, 106, 58), {
      14: c14,
      24: -c14,
      56: c14,
      15: c15,
      25: -c15,
      46: -c15,
    });
  const tetragonal = (c16: number) =>
    plus(hexagonal(270, 175, 147, 480, 124), { 66: 150, 16: c16, 26: -c16 });
  const orthorhombic = (c12: number) =>
    stiffness({ 11: 90, 22: 70, 33: 110, 12: c12, 13: 20, 23: 25, 44: 20, 55: 25, 66: 30 });

  // One matrix that holds and some that break one criterion each.
  it.each<[string, CrystalSystem, Float64Array, boolean]>([
    ['cubic that holds', 'cubic', cubic(48.7, 12.6, 12.7), true],
    ['C₁₁ < C₁₂', 'cubic', cubic(20, 30, 10), false],
    ['C₁₁ + 2C₁₂ < 0', 'cubic', cubic(20, -11, 10), false],
    ['C₄₄ < 0', 'cubic', cubic(50, 10, -1), false],
    ['hexagonal that holds', 'hexagonal', hexagonal(160, 90, 66, 181, 46), true],
    ['C₁₃ too large', 'hexagonal', hexagonal(100, 20, 90, 120, 40), false],
    ['tetragonal that holds', 'tetragonal', tetragonal(40), true],
    ['C₁₆ too large', 'tetragonal', tetragonal(110), false],
    ['trigonal that holds', 'trigonal', trigonal(18), true],
    ['C₁₄ and C₁₅', 'trigonal', trigonal(18, 12), true],
    ['C₁₄ too large', 'trigonal', trigonal(50), false],
    ['C₁₄ and C₁₅ too large together', 'trigonal', trigonal(40, 30), false],
    ['orthorhombic that holds', 'orthorhombic', orthorhombic(30), true],
    ['C₁₁C₂₂ < C₁₂²', 'orthorhombic', orthorhombic(85), false],
  ])('%s: criteria and eigenvalues agree', (_name, system, c, expected) => {
    const result = bornStability(c, system);
    expect(result.isStable).toBe(expected);
    expect(result.source).toContain('Mouhat');
    expect(result.criteria.every(({ holds }) => holds)).toBe(expected);
    for (const { holds, value } of result.criteria) {
      expect(holds).toBe(value > 0);
    }
  });

  it('lists eigenvalues where the axes are not those of the criteria', () => {
    const turned = plus(cubic(50, 12, 13), { 16: 2, 26: -2 });
    const result = bornStability(turned, 'cubic');
    expect(result.criteria).toHaveLength(6);
    expect(result.criteria[0]!.statement).toBe('λ₁ > 0');
    expect(result.source).toContain('positive definite');
    expect(bornStability(cubic(50, 12, 13), 'monoclinic').criteria).toHaveLength(6);
  });
});
