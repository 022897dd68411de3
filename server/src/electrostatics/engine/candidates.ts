import { fractionalToCartesian } from '#common/physics/cell-metric';

import type { Bins } from './bins.js';
import type { PreparedCell } from './contract.js';

/** Rank of a candidate that every site of the home bin may take: it lies in another bin. */
const elsewhere = 0x3fffffff;

/** Closer than this part of the cut-off, the vector between two sites is taken afresh. */
const closePart = 1 / 64;

function grown<T extends Int32Array | Float64Array>(from: T, to: T): T {
  to.set(from);
  return to;
}

/** A list of ions, one array per property. */
class IonList {
  site = new Int32Array(0);

  /** Place in the order of the home bin, or {@link elsewhere}. */
  rank = new Int32Array(0);

  x = new Float64Array(0);

  y = new Float64Array(0);

  z = new Float64Array(0);

  /** Makes room for a number of ions. */
  reserve(count: number): void {
    if (this.site.length < count) {
      const room = 2 * count + 64;
      this.site = grown(this.site, new Int32Array(room));
      this.rank = grown(this.rank, new Int32Array(room));
      this.x = grown(this.x, new Float64Array(room));
      this.y = grown(this.y, new Float64Array(room));
      this.z = grown(this.z, new Float64Array(room));
    }
  }

  set(at: number, site: number, rank: number, x: number, y: number, z: number): void {
    this.site[at] = site;
    this.rank[at] = rank;
    this.x[at] = x;
    this.y[at] = y;
    this.z[at] = z;
  }
}

/**
 * The ions that sites of one bin may meet within the cut-off, sorted by species; and for one site
 * and one species, those that it does meet. Buffers are kept from bin to bin.
 */
export class Candidates {
  /** What {@link select} found: site, vector from the central site in Å, distance squared. */
  hitSite = new Int32Array(0);

  hitX = new Float64Array(0);

  hitY = new Float64Array(0);

  hitZ = new Float64Array(0);

  hitSquare = new Float64Array(0);

  private hitAt = new Int32Array(0);

  private readonly positionsA: Float64Array;

  private readonly rankOf: Int32Array;

  /** Sorted candidates of species s are speciesStart[s] … speciesStart[s + 1] − 1. */
  private readonly speciesStart: Int32Array;

  private readonly found = new IonList();

  private readonly sorted = new IonList();

  private count = 0;

  /** Middle of the home bin. */
  private centreA: readonly [number, number, number] = [0, 0, 0];

  constructor(
    private readonly cell: PreparedCell,
    private readonly bins: Bins,
    private readonly cutoffA: number,
  ) {
    const { count, fractional, vectorsA } = cell;
    this.positionsA = new Float64Array(3 * count);
    for (let i = 0; i < count; i += 1) {
      const f = [fractional[3 * i]!, fractional[3 * i + 1]!, fractional[3 * i + 2]!];
      this.positionsA.set(fractionalToCartesian(vectorsA, f), 3 * i);
    }
    this.rankOf = new Int32Array(count);
    bins.order.forEach((site, rank) => {
      this.rankOf[site] = rank;
    });
    this.speciesStart = new Int32Array(cell.speciesStart.length);
  }

  /** Lists the candidates of a bin: its own sites and those of half of the bins around it. */
  gather(home: number): void {
    const { bins } = this;
    const { offsets, start } = bins;
    const [nx, ny, nz] = bins.perAxis;
    const hx = Math.floor(home / (ny * nz));
    const hy = Math.floor(home / nz) % ny;
    const hz = home % nz;
    const middle = [(hx + 0.5) / nx, (hy + 0.5) / ny, (hz + 0.5) / nz];
    this.centreA = fractionalToCartesian(this.cell.vectorsA, middle);
    this.count = 0;
    for (let o = 0; o < offsets.length; o += 3) {
      const x = hx + offsets[o]!;
      const y = hy + offsets[o + 1]!;
      const z = hz + offsets[o + 2]!;
      const ix = Math.floor(x / nx);
      const iy = Math.floor(y / ny);
      const iz = Math.floor(z / nz);
      const bin = ((x - ix * nx) * ny + (y - iy * ny)) * nz + (z - iz * nz);
      if (start[bin]! < start[bin + 1]!) {
        this.collect(bin, ix, iy, iz, o === 0);
      }
    }
    this.sortBySpecies();
  }

  /** Appends the sites of a bin, seen in one image of the cell, that the home bin can reach. */
  private collect(bin: number, ix: number, iy: number, iz: number, isHome: boolean): void {
    const { found, positionsA, bins, centreA } = this;
    const v = this.cell.vectorsA;
    const sx = ix * v[0]! + iy * v[3]! + iz * v[6]!;
    const sy = ix * v[1]! + iy * v[4]! + iz * v[7]!;
    const sz = ix * v[2]! + iy * v[5]! + iz * v[8]!;
    const reach = (this.cutoffA + bins.halfDiagonalA) * (1 + 1e-12);
    const end = bins.start[bin + 1]!;
    let count = this.count;
    found.reserve(count + end - bins.start[bin]!);
    for (let k = bins.start[bin]!; k < end; k += 1) {
      const j = bins.order[k]!;
      const x = positionsA[3 * j]! + sx;
      const y = positionsA[3 * j + 1]! + sy;
      const z = positionsA[3 * j + 2]! + sz;
      const dx = x - centreA[0];
      const dy = y - centreA[1];
      const dz = z - centreA[2];
      if (dx * dx + dy * dy + dz * dz <= reach * reach) {
        found.set(count, j, isHome ? k : elsewhere, x, y, z);
        count += 1;
      }
    }
    this.count = count;
  }

  private sortBySpecies(): void {
    const { found, sorted, speciesStart, count } = this;
    const { species } = this.cell;
    speciesStart.fill(0);
    for (let k = 0; k < count; k += 1) {
      speciesStart[species[found.site[k]!]! + 1]! += 1;
    }
    for (let s = 0; s + 1 < speciesStart.length; s += 1) {
      speciesStart[s + 1]! += speciesStart[s]!;
    }
    sorted.reserve(count);
    const next = speciesStart.slice();
    for (let k = 0; k < count; k += 1) {
      const site = found.site[k]!;
      const at = next[species[site]!]!;
      next[species[site]!] = at + 1;
      sorted.set(at, site, found.rank[k]!, found.x[k]!, found.y[k]!, found.z[k]!);
    }
    if (this.hitSite.length < count) {
      this.hitAt = new Int32Array(sorted.site.length);
      this.hitSite = new Int32Array(sorted.site.length);
      this.hitX = new Float64Array(sorted.site.length);
      this.hitY = new Float64Array(sorted.site.length);
      this.hitZ = new Float64Array(sorted.site.length);
      this.hitSquare = new Float64Array(sorted.site.length);
    }
  }

  /**
   * Finds the candidates of species t within the cut-off of site i, each pair from one side only.
   * Every candidate is written down and the count moved on if it is one: no branch to guess wrong.
   * @returns how many there are
   */
  select(i: number, t: number): number {
    const { rank, x, y, z } = this.sorted;
    const { hitAt, positionsA } = this;
    const cutoffSquare = this.cutoffA * this.cutoffA;
    const own = this.rankOf[i]!;
    const xi = positionsA[3 * i]!;
    const yi = positionsA[3 * i + 1]!;
    const zi = positionsA[3 * i + 2]!;
    const end = this.speciesStart[t + 1]!;
    let hits = 0;
    for (let k = this.speciesStart[t]!; k < end; k += 1) {
      const dx = x[k]! - xi;
      const dy = y[k]! - yi;
      const dz = z[k]! - zi;
      hitAt[hits] = k;
      hits += (dx * dx + dy * dy + dz * dz <= cutoffSquare ? 1 : 0) & (rank[k]! > own ? 1 : 0);
    }
    this.fillHits(hits, xi, yi, zi);
    return hits;
  }

  /** Sites and vectors of the candidates that {@link select} marked. */
  private fillHits(hits: number, xi: number, yi: number, zi: number): void {
    const { site, x, y, z } = this.sorted;
    const { hitAt, hitSite, hitX, hitY, hitZ, hitSquare } = this;
    for (let hit = 0; hit < hits; hit += 1) {
      const k = hitAt[hit]!;
      const dx = x[k]! - xi;
      const dy = y[k]! - yi;
      const dz = z[k]! - zi;
      hitSite[hit] = site[k]!;
      hitX[hit] = dx;
      hitY[hit] = dy;
      hitZ[hit] = dz;
      hitSquare[hit] = dx * dx + dy * dy + dz * dz;
    }
  }

  /** Below this, positions have lost digits of the distance: see {@link refine}. */
  get closeSquare(): number {
    return (closePart * this.cutoffA) ** 2;
  }

  /**
   * Takes the vector of a very close pair from the difference of the fractional coordinates, which
   * is exact where the difference of the positions is not.
   */
  refine(i: number, hit: number): void {
    const { fractional, reciprocalPerA, vectorsA } = this.cell;
    const j = this.hitSite[hit]!;
    const near = [this.hitX[hit]!, this.hitY[hit]!, this.hitZ[hit]!];
    const apart = [0, 1, 2].map((axis) => {
      const [from, to] = [fractional[3 * i + axis]!, fractional[3 * j + axis]!];
      const along = near.reduce((sum, d, k) => sum + d * reciprocalPerA[3 * axis + k]!, 0);
      const image = Math.round(along / (2 * Math.PI) - (to - from));
      return image > 0 ? image - from + to : to + image - from;
    });
    const [dx, dy, dz] = fractionalToCartesian(vectorsA, apart);
    this.hitX[hit] = dx;
    this.hitY[hit] = dy;
    this.hitZ[hit] = dz;
    this.hitSquare[hit] = dx * dx + dy * dy + dz * dz;
  }
}
