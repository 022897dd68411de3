import type { Block } from './block.ts';
import { buildIonGrid, eachNear } from './ion-grid.ts';

/** A strut between two ions of the block, by their indices. */
export interface Bond {
  readonly from: number;
  readonly to: number;
}

/** Contact as drawn: ions of unlike sign no farther apart than this times their radii. */
const radiusSumFactor = 1.25;
/** … and within the first shell: no farther than this times the nearest unlike neighbour. */
const firstShellFactor = 1.35;
const bondLimit = 40_000;

/**
 * Struts to draw, a picture of contact and no statement on bonding: unlike signs only, within
 * 1.25 radius sums and within the first shell of at least one of the two ions.
 */
export function findBonds(block: Block): Bond[] {
  const largest = block.radiiA.reduce((most, radius) => Math.max(most, radius), 0);
  if (largest === 0) {
    return [];
  }
  const grid = buildIonGrid(block, 2 * largest * radiusSumFactor);
  const nearest = new Float64Array(block.count).fill(Infinity);
  const candidates: { from: number; to: number; distanceA: number }[] = [];
  for (let from = 0; from < block.count; from += 1) {
    eachNear(grid, from, (to, distanceA) => {
      if (block.chargesE[from]! * block.chargesE[to]! >= 0) {
        return;
      }
      nearest[from] = Math.min(nearest[from]!, distanceA);
      const sum = block.radiiA[from]! + block.radiiA[to]!;
      if (from < to && distanceA <= radiusSumFactor * sum) {
        candidates.push({ from, to, distanceA });
      }
    });
  }
  return candidates
    .filter(({ from, to, distanceA }) => {
      const shell = Math.max(nearest[from]!, nearest[to]!);
      return distanceA <= firstShellFactor * shell;
    })
    .slice(0, bondLimit);
}
