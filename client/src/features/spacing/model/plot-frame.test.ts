import { describe, expect, it } from 'vitest';

import { bornLandeLaw } from '#common/physics/energetics/scaling-law';
import {
  shownSpacingsA,
  spacingCurve,
  spacingPoint,
} from '#common/physics/energetics/spacing-curve';
import {
  pathOf,
  plotFrame,
  spacingAt,
  ticks,
  xOf,
  yOf,
} from '#client/features/spacing/model/plot-frame.ts';

const law = bornLandeLaw(9, 8);
const curve = spacingCurve(law, 2.8, shownSpacingsA([law], 2.8));
const frame = plotFrame(600, 320, [curve]);

describe('the frame of the spacing plot', () => {
  it('shows the whole well', () => {
    const rest = spacingPoint(law, 2.8, 2.8);
    expect(yOf(frame, rest.netEv)).toBeGreaterThan(frame.top);
    expect(yOf(frame, rest.netEv)).toBeLessThan(frame.height - frame.bottom);
    expect(yOf(frame, 0)).toBeGreaterThan(frame.top);
  });

  it('goes from a place to a spacing and back, and stops at its ends', () => {
    expect(spacingAt(frame, xOf(frame, 3.1))).toBeCloseTo(3.1, 10);
    expect(spacingAt(frame, -50)).toBe(frame.fromA);
    expect(spacingAt(frame, 9000)).toBeCloseTo(frame.toA, 10);
  });

  it('draws one step per point', () => {
    expect(pathOf(frame, curve, ({ netEv }) => netEv).match(/[ML]/g)).toHaveLength(curve.length);
  });

  it('cuts a stretch at round numbers', () => {
    expect(ticks(-13, 6, 6)).toEqual([-10, -5, 0, 5]);
    expect(ticks(1.9, 4.2, 4)).toEqual([2, 3, 4]);
  });
});

describe('a point of the curve', () => {
  it('has no force at rest, and is pushed apart when nearer', () => {
    expect(spacingPoint(law, 2.8, 2.8).forceEvPerA).toBeCloseTo(0, 12);
    expect(spacingPoint(law, 2.8, 2.6).forceEvPerA).toBeGreaterThan(0);
    expect(spacingPoint(law, 2.8, 3.2).forceEvPerA).toBeLessThan(0);
  });
});
