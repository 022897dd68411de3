import type { ViewPose } from './scene-view.ts';
import { addScaled, dot, normalise, subtract, type Vector } from './vector.ts';

/** A point of the stage: pixels from the upper left, and the distance in front of the eye in Å. */
interface StagePoint {
  readonly x: number;
  readonly y: number;
  readonly depthA: number;
}

/** Maps places to the stage and back, exactly as the camera of the canvas does. */
export interface Projection {
  readonly width: number;
  readonly height: number;
  /** Pixels per unit of tangent. */
  readonly focalPx: number;
  toStage(place: Vector): StagePoint;
  /** Radius in pixels of a ball seen at a depth. */
  toPixels(radiusA: number, depthA: number): number;
  /** Direction from the eye through a point of the stage, unit length. */
  rayThrough(x: number, y: number): Vector;
}

export function createProjection(pose: ViewPose, width: number, height: number): Projection {
  const focalPx = height / 2 / Math.tan((pose.openingDeg * Math.PI) / 360);
  return {
    width,
    height,
    focalPx,
    toStage(place) {
      const offset = subtract(place, pose.eye);
      const depthA = -dot(offset, pose.toward);
      const scale = focalPx / Math.max(depthA, 1e-6);
      return {
        x: width / 2 + dot(offset, pose.right) * scale,
        y: height / 2 - dot(offset, pose.up) * scale,
        depthA,
      };
    },
    toPixels(radiusA, depthA) {
      return (focalPx * radiusA) / Math.sqrt(Math.max(depthA * depthA - radiusA * radiusA, 1e-9));
    },
    rayThrough(x, y) {
      const across = addScaled([0, 0, 0], pose.right, (x - width / 2) / focalPx);
      const withUp = addScaled(across, pose.up, (height / 2 - y) / focalPx);
      return normalise(addScaled(withUp, pose.toward, -1));
    },
  };
}
