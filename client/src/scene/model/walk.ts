import { positionAt, type Block } from './block.ts';
import { addScaled, dot, norm, subtract, type Vector } from './vector.ts';

export type WalkDirection = 'left' | 'right' | 'up' | 'down';

/** What the viewer sees as right and up, unit vectors in the cell's frame. */
export interface ScreenAxes {
  readonly right: Vector;
  readonly up: Vector;
}

/** Steps within this angle of the wanted direction count: cos 60°. */
const leastAlignment = 0.5;

function wanted({ right, up }: ScreenAxes, direction: WalkDirection): Vector {
  const origin: Vector = [0, 0, 0];
  switch (direction) {
    case 'left':
      return addScaled(origin, right, -1);
    case 'right':
      return right;
    case 'up':
      return up;
    case 'down':
      return addScaled(origin, up, -1);
  }
}

/**
 * The ion an arrow key leads to: the nearest one that lies in that direction on the screen.
 * Index of the block, or null at its rim.
 */
export function walk(
  block: Block,
  from: number,
  axes: ScreenAxes,
  direction: WalkDirection,
): number | null {
  const toward = wanted(axes, direction);
  const start = positionAt(block, from);
  let best: number | null = null;
  let bestCost = Infinity;
  for (let index = 0; index < block.count; index += 1) {
    const step = subtract(positionAt(block, index), start);
    const length = norm(step);
    const alignment = length < 1e-6 ? 0 : dot(step, toward) / length;
    // A straight step of one length beats a slanted one, a far one loses to both.
    const cost = length / alignment ** 2;
    if (alignment >= leastAlignment && cost < bestCost - 1e-9) {
      best = index;
      bestCost = cost;
    }
  }
  return best;
}

/** Where the arrow keys start when nothing is picked: the ion nearest to the viewer. */
export function nearestToViewer(
  block: Block,
  axes: ScreenAxes & { toward: Vector },
): number | null {
  let best: number | null = null;
  let bestDepth = -Infinity;
  for (let index = 0; index < block.count; index += 1) {
    const depth = dot(positionAt(block, index), axes.toward);
    if (depth > bestDepth + 1e-9) {
      best = index;
      bestDepth = depth;
    }
  }
  return best;
}
