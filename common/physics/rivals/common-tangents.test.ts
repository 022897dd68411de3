import { describe, expect, it } from 'vitest';

import { commonTangents } from '#common/physics/rivals/common-tangents';
import { EV_PER_CUBIC_ANGSTROM_IN_GPA } from '#common/units/constants';

/** E = e + k/2 (V − v)² over low … high. */
function parabola(e: number, v: number, k: number, low: number, high: number, count = 61) {
  const points = Array.from({ length: count }, (_, index) => {
    const volumeA3 = low + ((high - low) * index) / (count - 1);
    return { volumeA3, energyEv: e + (k / 2) * (volumeA3 - v) ** 2 };
  });
  return { points };
}

describe('common tangents', () => {
  it('touch two equal parabolas where algebra says: p = (e₂ − e₁)/(v₁ − v₂)', () => {
    // H = e + p v − p²/(2k); with equal k the quadratic terms cancel.
    const [tangent, ...others] = commonTangents([
      parabola(-8, 45, 0.02, 30, 60),
      parabola(-7.7, 38, 0.02, 25, 55),
    ]);
    const pressure = 0.3 / 7;
    expect(others).toEqual([]);
    expect(tangent).toMatchObject({ from: 0, to: 1, touchesEnd: false });
    expect(tangent!.pressureGpa).toBeCloseTo(pressure * EV_PER_CUBIC_ANGSTROM_IN_GPA, 9);
    expect(tangent!.fromVolumeA3).toBeCloseTo(45 - pressure / 0.02, 9);
    expect(tangent!.toVolumeA3).toBeCloseTo(38 - pressure / 0.02, 9);
  });

  it('touch unequal parabolas where the quadratic of equal enthalpies has its root', () => {
    const [k1, k2] = [0.02, 0.05];
    const tangents = commonTangents([parabola(-8, 45, k1, 30, 60), parabola(-7.7, 38, k2, 25, 55)]);
    // (1/(2k₂) − 1/(2k₁)) p² + (v₁ − v₂) p + (e₁ − e₂) = 0, the root nearer zero.
    const [a, b, c] = [1 / (2 * k2) - 1 / (2 * k1), 7, -0.3];
    const pressure = (-b + Math.sqrt(b * b - 4 * a * c)) / (2 * a);
    expect(tangents).toHaveLength(1);
    expect(tangents[0]!.pressureGpa).toBeCloseTo(pressure * EV_PER_CUBIC_ANGSTROM_IN_GPA, 9);
  });

  it('leaves out a structure that is never the stable one', () => {
    const curves = [parabola(-8, 45, 0.02, 30, 60), parabola(-6, 45, 0.02, 30, 60)];
    expect(commonTangents(curves)).toEqual([]);
  });

  it('says when a curve ends before the tangent is reached', () => {
    const tangents = commonTangents([
      parabola(-8, 45, 0.02, 30, 60),
      parabola(-7.7, 38, 0.02, 37.5, 39, 4),
    ]);
    expect(tangents.some(({ touchesEnd }) => touchesEnd)).toBe(true);
  });

  it('refuses curves too short or out of order', () => {
    expect(() => commonTangents([parabola(0, 1, 1, 0, 2, 2)])).toThrow(RangeError);
    expect(() => commonTangents([parabola(0, 1, 1, 2, 0, 5)])).toThrow(RangeError);
  });
});
