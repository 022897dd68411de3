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
  /** Distances between opposite faces of the cell. */
  readonly heightsA: readonly [number, number, number];
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
  const heightsA = faceDistancesA(vectorsA);
  const binsPerAxis = heightsA.map((height) =>
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
  return { vectorsA, positionsA, fractional: wrapped, heightsA, binsPerAxis, start, order };
}

/** Where a query looks: the central site and the radius. */
interface Query {
  readonly siteIndex: number;
  readonly radiusA: number;
  readonly xA: number;
  readonly yA: number;
  readonly zA: number;
}

/** Visits the sites of one bin, seen in one image of the cell. */
function visitBin(
  grid: NeighbourGrid,
  bin: number,
  image: readonly [number, number, number],
  query: Query,
  visit: NeighbourVisitor,
): void {
  const { vectorsA: v, positionsA, start, order } = grid;
  const [ix, iy, iz] = image;
  const sx = ix * v[0]! + iy * v[3]! + iz * v[6]! - query.xA;
  const sy = ix * v[1]! + iy * v[4]! + iz * v[7]! - query.yA;
  const sz = ix * v[2]! + iy * v[5]! + iz * v[8]! - query.zA;
  const isHome = ix === 0 && iy === 0 && iz === 0;
  const end = start[bin + 1]!;
  for (let k = start[bin]!; k < end; k += 1) {
    const j = order[k]!;
    const dx = positionsA[3 * j]! + sx;
    const dy = positionsA[3 * j + 1]! + sy;
    const dz = positionsA[3 * j + 2]! + sz;
    const square = dx * dx + dy * dy + dz * dz;
    if (square <= query.radiusA * query.radiusA && !(isHome && j === query.siteIndex)) {
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
 * @param radiusA any radius; the search is quickest near the one the grid was built for
 */
export function forEachNeighbour(
  grid: NeighbourGrid,
  siteIndex: number,
  radiusA: number,
  visit: NeighbourVisitor,
): void {
  const { positionsA, fractional, heightsA, binsPerAxis, start } = grid;
  const query: Query = {
    siteIndex,
    radiusA,
    xA: positionsA[3 * siteIndex]!,
    yA: positionsA[3 * siteIndex + 1]!,
    zA: positionsA[3 * siteIndex + 2]!,
  };
  const [nx, ny, nz] = binsPerAxis;
  // Bins whose planes come within the radius: exact, since f · height is the distance from a face.
  const range = (axis: 0 | 1 | 2) => {
    const at = fractional[3 * siteIndex + axis]!;
    const reach = (radiusA / heightsA[axis]) * (1 + 1e-12);
    return [
      Math.floor((at - reach) * binsPerAxis[axis]),
      Math.floor((at + reach) * binsPerAxis[axis]),
    ] as const;
  };
  const [[fromX, toX], [fromY, toY], [fromZ, toZ]] = [range(0), range(1), range(2)];
  for (let x = fromX; x <= toX; x += 1) {
    const ix = Math.floor(x / nx);
    for (let y = fromY; y <= toY; y += 1) {
      const iy = Math.floor(y / ny);
      const column = ((x - ix * nx) * ny + (y - iy * ny)) * nz;
      for (let z = fromZ; z <= toZ; z += 1) {
        const iz = Math.floor(z / nz);
        const bin = column + z - iz * nz;
        if (start[bin]! < start[bin + 1]!) {
          visitBin(grid, bin, [ix, iy, iz], query, visit);
        }
      }
    }
  }
}
