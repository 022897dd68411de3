import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { boundRadiusA, buildBlock, positionAt } from './block.ts';
import { cellEdges } from './cell-edges.ts';
import { placeEdgeLetters } from './edge-letters.ts';
import { fittedView } from './fit-view.ts';
import { pickIon, rayBall } from './pick.ts';
import { createProjection } from './projection.ts';
import {
  alignedAxis,
  defaultSceneView,
  formatSceneView,
  isSameView,
  parseSceneView,
  turned,
  viewDown,
  viewFrame,
  viewPose,
  zoomed,
} from './scene-view.ts';
import { periclase, periclaseRadiusA } from './test-cells.ts';
import { dot, norm } from './vector.ts';
import { nearestToViewer, walk } from './walk.ts';

const block = buildBlock(periclase, [1, 1, 1], periclaseRadiusA);
const ionScale = 0.55;
const bounds = { centreA: block.centreA, radiusA: boundRadiusA(block, ionScale) };
const skewed = [5, 0, 0, -2, 4, 0, 1, 1.5, 6];

const anyView = fc.record({
  azimuthDeg: fc.double({ min: -180, max: 180, noNaN: true }),
  elevationDeg: fc.double({ min: -90, max: 90, noNaN: true }),
  zoom: fc.double({ min: 0.5, max: 5, noNaN: true }),
  panX: fc.double({ min: -1, max: 1, noNaN: true }),
  panY: fc.double({ min: -1, max: 1, noNaN: true }),
});

describe('the view', () => {
  it('has a right-handed frame of unit vectors everywhere, poles included', () => {
    fc.assert(
      fc.property(anyView, (view) => {
        const { right, up, toward } = viewFrame(view);
        for (const [one, other] of [
          [right, up],
          [up, toward],
          [toward, right],
        ] as const) {
          expect(dot(one, other)).toBeCloseTo(0, 12);
          expect(norm(one)).toBeCloseTo(1, 12);
        }
        const turnedUp = [
          right[1] * up[2] - right[2] * up[1],
          right[2] * up[0] - right[0] * up[2],
          right[0] * up[1] - right[1] * up[0],
        ];
        turnedUp.forEach((part, axis) => expect(part).toBeCloseTo(toward[axis]!, 12));
      }),
    );
  });

  it('looks down each axis of a skewed cell and knows that it does', () => {
    for (const axis of ['a', 'b', 'c'] as const) {
      expect(alignedAxis(skewed, viewDown(skewed, axis))).toBe(axis);
    }
    expect(alignedAxis(skewed, defaultSceneView)).toBe('free');
  });

  it('never turns over the poles and wraps around the axis', () => {
    expect(turned(defaultSceneView, 0, 500).elevationDeg).toBe(90);
    expect(turned({ ...defaultSceneView, azimuthDeg: 170 }, 20, 0).azimuthDeg).toBeCloseTo(-170);
  });

  it('comes back from an address, and refuses what is none', () => {
    fc.assert(
      fc.property(anyView, (view) => {
        expect(isSameView(parseSceneView(formatSceneView(view))!, view)).toBe(true);
      }),
    );
    expect(parseSceneView('1,2,3')).toBeNull();
    expect(parseSceneView('1,2,x,4,5')).toBeNull();
    expect(parseSceneView('0,0,1e9,0,0')!.zoom).toBeLessThan(100);
  });

  it('keeps the middle of the stage while zooming', () => {
    const view = { ...defaultSceneView, panX: 0.3, panY: -0.2 };
    const middle = (v: typeof view): number =>
      pickDistance(createProjection(viewPose(v, bounds, 1), 600, 600).rayThrough(300, 300), v);
    expect(middle(zoomed(view, 2))).toBeCloseTo(middle(view), 6);
  });
});

/** Distance at which the ray through the middle passes the block's centre. */
function pickDistance(
  ray: readonly [number, number, number],
  view: typeof defaultSceneView,
): number {
  const { eye } = viewPose(view, bounds, 1);
  const offset = bounds.centreA.map((part, axis) => part - eye[axis]!) as [number, number, number];
  return Math.sqrt(Math.max(0, dot(offset, offset) - dot(offset, ray) ** 2));
}

describe('fitting', () => {
  it.each([
    [960, 720],
    [390, 480],
    [1400, 300],
  ])('cuts no ion at %i × %i, from any side', (width, height) => {
    fc.assert(
      fc.property(anyView, (direction) => {
        const view = fittedView(direction, { block, ionScale, bounds }, width / height);
        const projection = createProjection(viewPose(view, bounds, width / height), width, height);
        for (let index = 0; index < block.count; index += 1) {
          const { x, y, depthA } = projection.toStage(positionAt(block, index));
          const radius = projection.toPixels(block.radiiA[index]! * ionScale, depthA);
          expect(x - radius).toBeGreaterThan(0);
          expect(x + radius).toBeLessThan(width);
          expect(y - radius).toBeGreaterThan(0);
          expect(y + radius).toBeLessThan(height);
        }
      }),
      { numRuns: 40 },
    );
  });
});

describe('picking', () => {
  it('meets a ball at its near side, and passes by beside or behind', () => {
    expect(rayBall([0, 0, 10], [0, 0, -1], [0, 0, 0], 2)).toBeCloseTo(8, 12);
    expect(rayBall([0, 0, 10], [0, 0, -1], [2.1, 0, 0], 2)).toBeNull();
    expect(rayBall([0, 0, 10], [0, 0, 1], [0, 0, 0], 2)).toBeNull();
  });

  it('finds the frontmost ion under its own middle on the stage', () => {
    const pose = viewPose(defaultSceneView, bounds, 4 / 3);
    const projection = createProjection(pose, 960, 720);
    const front = nearestToViewer(block, pose)!;
    const { x, y } = projection.toStage(positionAt(block, front));
    expect(pickIon(block, ionScale, pose.eye, projection.rayThrough(x, y))).toBe(front);
    expect(pickIon(block, ionScale, pose.eye, projection.rayThrough(2, 2))).toBeNull();
  });
});

describe('walking', () => {
  const frame = viewFrame(viewDown(periclase.vectorsA, 'a'));

  it('leads to the next ion in the direction of the arrow, and back', () => {
    const middle = block.ids.indexOf('5.0.0.0');
    const right = walk(block, middle, frame, 'right')!;
    expect(positionAt(block, right)[1]).toBeCloseTo(4.212, 10);
    expect(walk(block, right, frame, 'left')).toBe(middle);
    const up = walk(block, middle, frame, 'up')!;
    expect(positionAt(block, up)[2]).toBeCloseTo(4.212, 10);
  });

  it('stops at the rim', () => {
    const corner = block.ids.indexOf('0.0.1.1');
    expect(walk(block, corner, frame, 'right')).toBeNull();
    expect(walk(block, corner, frame, 'up')).toBeNull();
  });
});

describe('edge letters', () => {
  it('stand on the stage, apart from each other and clear of every ion in the first view', () => {
    const [width, height] = [960, 720];
    const view = fittedView(defaultSceneView, { block, ionScale, bounds }, width / height);
    const projection = createProjection(viewPose(view, bounds, width / height), width, height);
    const letters = placeEdgeLetters(block, ionScale, cellEdges(block), projection);
    expect(letters.map(({ letter }) => letter)).toEqual(['a', 'b', 'c']);
    for (const { x, y } of letters) {
      for (let index = 0; index < block.count; index += 1) {
        const ion = projection.toStage(positionAt(block, index));
        const radius = projection.toPixels(block.radiiA[index]! * ionScale, ion.depthA);
        expect(Math.hypot(ion.x - x, ion.y - y)).toBeGreaterThan(radius);
      }
    }
  });
});
