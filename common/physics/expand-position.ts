import { closeDistanceA, samePlaceA, type PlaceMetric } from '#common/physics/place-index';
import { applyOperation } from '#common/physics/symmetry-operation';
import type { SymmetryOperation } from '#common/schemas/symmetry';

type Triple = readonly [number, number, number];

/** Coordinates this close to a face lie on it: 1/3 + 2/3 must be the cell's own corner. */
const faceTolerance = 1e-12;

function wrap(value: number): number {
  const wrapped = value - Math.floor(value + faceTolerance);
  return Math.abs(wrapped) < faceTolerance ? 0 : wrapped;
}

function wrapAll([x, y, z]: Triple): Triple {
  return [wrap(x), wrap(y), wrap(z)];
}

/** Copies that fell on one place. */
interface Cluster {
  readonly first: Triple;
  /** Sum of the shortest steps from the first copy to each. */
  readonly shift: [number, number, number];
  count: number;
}

const roundingOnly = 1e-9;

/** The mean of the copies, so that a rounded special position becomes exact. */
function centreOf({ first, shift, count }: Cluster): Triple {
  if (shift.every((component) => Math.abs(component) < roundingOnly)) {
    return first;
  }
  return wrapAll([
    first[0] + shift[0] / count,
    first[1] + shift[1] / count,
    first[2] + shift[2] / count,
  ]);
}

/** The places of one position, and the shortest distance between two of them if suspiciously short. */
export interface ExpandedPosition {
  readonly places: readonly Triple[];
  /** Å; Infinity where no two places are closer than two ions can be. */
  readonly crowdingA: number;
}

/**
 * The symmetry copies of one position, copies on the same place (within 0.01 Å) merged into their mean.
 *
 * @param fractional the position as typed; it comes first among the places, taken into [0, 1)
 * @param operations a whole group modulo lattice translations
 */
export function expandPosition(
  fractional: Triple,
  operations: readonly SymmetryOperation[],
  metric: PlaceMetric,
): ExpandedPosition {
  const clusters: Cluster[] = [{ first: wrapAll(fractional), shift: [0, 0, 0], count: 0 }];
  let crowdingA = Infinity;
  for (const operation of operations) {
    const copy = wrapAll(applyOperation(operation, fractional));
    let home: Cluster | null = null;
    let nearestA = Infinity;
    for (const cluster of clusters) {
      const distanceA = closeDistanceA(metric, cluster.first, copy);
      if (distanceA < samePlaceA) {
        home = cluster;
        break;
      }
      nearestA = Math.min(nearestA, distanceA);
    }
    if (home === null) {
      crowdingA = Math.min(crowdingA, nearestA);
      clusters.push({ first: copy, shift: [0, 0, 0], count: 1 });
      continue;
    }
    home.count += 1;
    for (let k = 0; k < 3; k += 1) {
      const step = copy[k]! - home.first[k]!;
      home.shift[k]! += step - Math.round(step);
    }
  }
  return { places: clusters.map(centreOf), crowdingA };
}
