import { reciprocalVectors } from '#common/physics/cell-metric';

/** Positions closer than this are one place: rounding of special positions, mixed rows. */
export const samePlaceA = 0.01;

/** No two whole ions can be closer than this; nearer places are a slip in a coordinate. */
export const crowdedA = 0.1;

type Triple = readonly [number, number, number];

/** What short distances between places need to know of a cell. */
export interface PlaceMetric {
  /** Rows a, b, c in Å. */
  readonly vectorsA: readonly number[];
  /** Distance between opposite faces, Å. */
  readonly spacingsA: Triple;
}

/** @param vectorsA rows a, b, c in Å */
export function placeMetric(vectorsA: readonly number[]): PlaceMetric {
  const reciprocal = reciprocalVectors(vectorsA);
  const spacing = (k: number) =>
    (2 * Math.PI) / Math.hypot(reciprocal[3 * k]!, reciprocal[3 * k + 1]!, reciprocal[3 * k + 2]!);
  return { vectorsA, spacingsA: [spacing(0), spacing(1), spacing(2)] };
}

/**
 * Distance in Å of two places over the cell's faces if it is at most {@link crowdedA}, else Infinity.
 * Exact also in skewed cells: the nearest image of so close a place differs by less than half a
 * cell along each axis (cells thinner than 0.2 Å apart).
 */
export function closeDistanceA(metric: PlaceMetric, a: Triple, b: Triple): number {
  const { vectorsA: v, spacingsA } = metric;
  let x = b[0] - a[0];
  x -= Math.round(x);
  if (Math.abs(x) * spacingsA[0] > crowdedA) {
    return Infinity;
  }
  let y = b[1] - a[1];
  y -= Math.round(y);
  if (Math.abs(y) * spacingsA[1] > crowdedA) {
    return Infinity;
  }
  let z = b[2] - a[2];
  z -= Math.round(z);
  if (Math.abs(z) * spacingsA[2] > crowdedA) {
    return Infinity;
  }
  const distanceA = Math.hypot(
    x * v[0]! + y * v[3]! + z * v[6]!,
    x * v[1]! + y * v[4]! + z * v[7]!,
    x * v[2]! + y * v[5]! + z * v[8]!,
  );
  return distanceA <= crowdedA ? distanceA : Infinity;
}

const mostBins = 64;

/** Finds what lies near a place in a periodic cell, in constant time. */
export class PlaceIndex<T> {
  private readonly entries = new Map<number, { readonly place: Triple; readonly what: T }[]>();

  private readonly bins: Triple;

  constructor(private readonly metric: PlaceMetric) {
    // Bins wider than crowdedA, so that the neighbouring bins hold all that is near.
    const count = (spacingA: number) =>
      Math.max(1, Math.min(mostBins, Math.floor(spacingA / (2 * crowdedA))));
    const [a, b, c] = metric.spacingsA;
    this.bins = [count(a), count(b), count(c)];
  }

  private keyOf(x: number, y: number, z: number): number {
    const [nx, ny, nz] = this.bins;
    return (((x + nx) % nx) * mostBins + ((y + ny) % ny)) * mostBins + ((z + nz) % nz);
  }

  private binOf(place: Triple, axis: 0 | 1 | 2): number {
    return Math.floor(place[axis] * this.bins[axis]);
  }

  add(place: Triple, what: T): void {
    const key = this.keyOf(this.binOf(place, 0), this.binOf(place, 1), this.binOf(place, 2));
    const list = this.entries.get(key);
    if (list === undefined) {
      this.entries.set(key, [{ place, what }]);
    } else {
      list.push({ place, what });
    }
  }

  /** The nearest entry within {@link crowdedA}, or null. */
  nearest(place: Triple): { readonly what: T; readonly distanceA: number } | null {
    let best: { what: T; distanceA: number } | null = null;
    const [x, y, z] = [this.binOf(place, 0), this.binOf(place, 1), this.binOf(place, 2)];
    for (let k = 0; k < 27; k += 1) {
      const key = this.keyOf(
        x + (k % 3) - 1,
        y + (Math.floor(k / 3) % 3) - 1,
        z + Math.floor(k / 9) - 1,
      );
      for (const entry of this.entries.get(key) ?? []) {
        const distanceA = closeDistanceA(this.metric, entry.place, place);
        if (distanceA < (best?.distanceA ?? Infinity)) {
          best = { what: entry.what, distanceA };
        }
      }
    }
    return best;
  }
}
