import type { ResolvedCell } from '#common/physics/resolved-cell';

/**
 * Mean distance (Å) from the first ion of `from` to its nearest `count` ions of `to`, images
 * included. Searches two cells each way: enough for the first shell of a prototype's cell.
 * @returns null when the cell lacks either site
 */
export function meanContactA(
  cell: ResolvedCell,
  from: string,
  to: string,
  count: number,
): number | null {
  const origin = cell.sites.find(({ label }) => label === from);
  const targets = cell.sites.filter(({ label }) => label === to);
  if (!origin || targets.length === 0) {
    return null;
  }
  const distances = targets
    .flatMap((target) => imageDistances(cell.vectorsA, origin.fractional, target.fractional))
    .filter((distance) => distance > 1e-6)
    .sort((a, b) => a - b)
    .slice(0, count);
  return distances.reduce((sum, distance) => sum + distance, 0) / distances.length;
}

const shifts = [-2, -1, 0, 1, 2];

function imageDistances(
  v: readonly number[],
  from: readonly number[],
  to: readonly number[],
): number[] {
  const distances: number[] = [];
  for (const i of shifts) {
    for (const j of shifts) {
      for (const k of shifts) {
        const f = [to[0]! - from[0]! + i, to[1]! - from[1]! + j, to[2]! - from[2]! + k];
        const component = (axis: number) =>
          f[0]! * v[axis]! + f[1]! * v[3 + axis]! + f[2]! * v[6 + axis]!;
        distances.push(Math.hypot(component(0), component(1), component(2)));
      }
    }
  }
  return distances;
}
