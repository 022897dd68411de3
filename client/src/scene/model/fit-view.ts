import { blockCorners, drawnRadiusA, positionAt, type Block } from './block.ts';
import { createProjection } from './projection.ts';
import { fill, viewPose, zoomLimits, type SceneView } from './scene-view.ts';
import type { Vector } from './vector.ts';

/** Share of the stage that the block's outline fills. */
const outlineFill = 0.9;

/** What decides how large the block is drawn. */
export interface FitSubject {
  readonly block: Block;
  readonly ionScale: number;
  readonly bounds: { readonly centreA: Vector; readonly radiusA: number };
}

/**
 * The view in the same direction, zoomed and shifted so that every ion and every edge is on the stage
 * with a margin all round.
 * @param aspect width of the stage over its height
 */
export function fittedView(view: SceneView, subject: FitSubject, aspect: number): SceneView {
  const { block, ionScale, bounds } = subject;
  const plain = { ...view, zoom: 1, panX: 0, panY: 0 };
  // Half the height is one unit.
  const projection = createProjection(viewPose(plain, bounds, aspect), 2 * aspect, 2);
  const box = { left: Infinity, right: -Infinity, top: Infinity, bottom: -Infinity };
  const include = (place: Vector, radiusA: number): void => {
    const { x, y, depthA } = projection.toStage(place);
    const radius = projection.toPixels(radiusA, depthA);
    box.left = Math.min(box.left, x - radius);
    box.right = Math.max(box.right, x + radius);
    box.top = Math.min(box.top, y - radius);
    box.bottom = Math.max(box.bottom, y + radius);
  };
  for (let index = 0; index < block.count; index += 1) {
    include(positionAt(block, index), drawnRadiusA(block, index, ionScale));
  }
  for (const corner of blockCorners(block)) {
    include(corner, 0);
  }
  const across = (2 * aspect) / Math.max(box.right - box.left, 1e-6);
  const down = 2 / Math.max(box.bottom - box.top, 1e-6);
  const zoom = Math.max(zoomLimits.least, Math.min(2, outlineFill * Math.min(across, down)));
  const unit = (fill * Math.min(1, aspect)) / zoom;
  return {
    ...plain,
    zoom,
    panX: -((box.left + box.right) / 2 - aspect) / unit,
    panY: ((box.top + box.bottom) / 2 - 1) / unit,
  };
}
