import {
  cellVolumeA3,
  fractionalToCartesian,
  reciprocalVectors,
} from '#common/physics/cell-metric';

/** Called for each neighbour: its site, the image of the cell it is in, and where it lies. */
export type NeighbourVisitor = (
  siteIndex: number,
  distanceA: number,
  /** Lattice translation of the image, in cell vectors. */
  image: readonly [number, number, number],
  /** Cartesian components in Å of the vector from the central site to the neighbour. */
  dxA: number,
  dyA: number,
  dzA: number,
) => void;

/** Sites sorted into bins of the cell, ready for range queries over all periodic images. */
export interface NeighbourGrid {
  readonly vectorsA: readonly number[];
  /** Cartesian positions of the sites, three numbers each. */
  readonly positionsA: Float64Array;
  readonly fractional: Float64Array;
  readonly binsPerAxis: readonly [number, number, number];
  /** Sites of bin b are `order[start[b]] … order[start[b + 1] − 1]`. */
  readonly start: Int32Array;
  readonly order: Int32Array;
}

const binsLimit = 40;

function wrap(value: number): number {
  const wrapped = value - Math.floor(value);
  return wrapped >= 1 ? 0 : wrapped;
}

/** Distances in Å between opposite faces of the cell: h_i = 2π / |a*_i|. */
export function faceDistancesA(vectorsA: readonly number[]): [number, number, number] {
  const reciprocal = reciprocalVectors(vectorsA);
  const height = (i: number) =>
    (2 * Math.PI) / Math.hypot(reciprocal[3 * i]!, reciprocal[3 * i + 1]!, reciprocal[3 * i + 2]!);
  return [height(0), height(1), height(2)];
}

/**
 * Sorts the sites of a cell into bins about as wide as the query radius.
 *
 * @param vectorsA rows a, b, c in Å
 * @param fractional coordinates, three numbers a site; wrapped into [0, 1) here
 * @param radiusA the radius that will usually be asked for
 */
export function buildNeighbourGrid(
  vectorsA: readonly number[],
  fractional: ArrayLike<number>,
  radiusA: number,
): NeighbourGrid {
  const count = fractional.length / 3;
  const wrapped = Float64Array.from(fractional, wrap);
  const positionsA = new Float64Array(fractional.length);
  const perSite = Math.cbrt(cellVolumeA3(vectorsA) / Math.max(count, 1));
  const binsPerAxis = faceDistancesA(vectorsA).map((height) =>
    Math.max(1, Math.min(binsLimit, Math.floor(height / Math.max(radiusA / 2, perSite)))),
  ) as [number, number, number];
  const [nx, ny, nz] = binsPerAxis;
  const binOf = new Int32Array(count);
  const start = new Int32Array(nx * ny * nz + 1);
  for (let i = 0; i < count; i += 1) {
    const f = wrapped.subarray(3 * i, 3 * i + 3) as unknown as number[];
    positionsA.set(fractionalToCartesian(vectorsA, f), 3 * i);
    const bx = Math.floor(f[0]! * nx);
    const by = Math.floor(f[1]! * ny);
    const bz = Math.floor(f[2]! * nz);
    binOf[i] = (bx * ny + by) * nz + bz;
    start[binOf[i]! + 1]! += 1;
  }
  for (let b = 0; b < nx * ny * nz; b += 1) {
    start[b + 1]! += start[b]!;
  }
  const next = start.slice();
  const order = new Int32Array(count);
  for (let i = 0; i < count; i += 1) {
    order[next[binOf[i]!]!++] = i;
  }
  return { vectorsA, positionsA, fractional: wrapped, binsPerAxis, start, order };
}

/** Visits the sites of one bin, seen in one image of the cell. */
function visitBin(
  grid: NeighbourGrid,
  bin: number,
  image: readonly [number, number, number],
  centreA: readonly [number, number, number],
  radiusA: number,
  visit: NeighbourVisitor,
): void {
  const [sx, sy, sz] = fractionalToCartesian(grid.vectorsA, image);
  for (let k = grid.start[bin]!; k < grid.start[bin + 1]!; k += 1) {
    const j = grid.order[k]!;
    const dx = grid.positionsA[3 * j]! + sx - centreA[0];
    const dy = grid.positionsA[3 * j + 1]! + sy - centreA[1];
    const dz = grid.positionsA[3 * j + 2]! + sz - centreA[2];
    const square = dx * dx + dy * dy + dz * dz;
    if (square <= radiusA * radiusA) {
      visit(j, Math.sqrt(square), image, dx, dy, dz);
    }
  }
}

/**
 * Visits every site within a radius of one site, over all periodic images, the site itself in the
 * home cell left out. Exact in cells of any shape: bins are bounded by planes, so the number to
 * look through along an axis follows from the distance between faces.
 *
 * @param siteIndex the central site, taken in the home cell
 */
export function forEachNeighbour(
  grid: NeighbourGrid,
  siteIndex: number,
  radiusA: number,
  visit: NeighbourVisitor,
): void {
  const centreA = [0, 1, 2].map((axis) => grid.positionsA[3 * siteIndex + axis]!) as [
    number,
    number,
    number,
  ];
  const heights = faceDistancesA(grid.vectorsA);
  const home = grid.binsPerAxis.map((bins, axis) =>
    Math.floor(grid.fractional[3 * siteIndex + axis]! * bins),
  );
  const span = grid.binsPerAxis.map((bins, axis) => Math.ceil((radiusA * bins) / heights[axis]!));
  const [nx, ny, nz] = grid.binsPerAxis;
  const withoutSelf: NeighbourVisitor = (j, distanceA, image, dxA, dyA, dzA) => {
    if (j !== siteIndex || image[0] !== 0 || image[1] !== 0 || image[2] !== 0) {
      visit(j, distanceA, image, dxA, dyA, dzA);
    }
  };
  for (let x = home[0]! - span[0]!; x <= home[0]! + span[0]!; x += 1) {
    const ix = Math.floor(x / nx);
    for (let y = home[1]! - span[1]!; y <= home[1]! + span[1]!; y += 1) {
      const iy = Math.floor(y / ny);
      for (let z = home[2]! - span[2]!; z <= home[2]! + span[2]!; z += 1) {
        const iz = Math.floor(z / nz);
        const bin = ((x - ix * nx) * ny + (y - iy * ny)) * nz + (z - iz * nz);
        visitBin(grid, bin, [ix, iy, iz], centreA, radiusA, withoutSelf);
      }
    }
  }
}
