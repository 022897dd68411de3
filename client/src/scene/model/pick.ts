import { drawnRadiusA, type Block } from './block.ts';
import type { Vector } from './vector.ts';

/**
 * Distance along a ray to the first point of a ball, or null where it passes by or starts
 * beyond it. `direction` has unit length.
 */
export function rayBall(
  origin: Vector,
  direction: Vector,
  centre: Vector,
  radius: number,
): number | null {
  const ox = centre[0] - origin[0];
  const oy = centre[1] - origin[1];
  const oz = centre[2] - origin[2];
  const along = ox * direction[0] + oy * direction[1] + oz * direction[2];
  const missSquared = ox * ox + oy * oy + oz * oz - along * along;
  if (along < 0 || missSquared > radius * radius) {
    return null;
  }
  return along - Math.sqrt(radius * radius - missSquared);
}

/** Index of the first ion a ray meets; ions are drawn at `ionScale` of their radius. */
export function pickIon(
  block: Block,
  ionScale: number,
  origin: Vector,
  direction: Vector,
): number | null {
  let best: number | null = null;
  let bestDistance = Infinity;
  const p = block.positionsA;
  for (let index = 0; index < block.count; index += 1) {
    const at = index * 3;
    const centre: Vector = [p[at]!, p[at + 1]!, p[at + 2]!];
    const distance = rayBall(origin, direction, centre, drawnRadiusA(block, index, ionScale));
    if (distance !== null && distance < bestDistance) {
      best = index;
      bestDistance = distance;
    }
  }
  return best;
}
