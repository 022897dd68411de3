import type { ResolvedCell } from '#common/physics/resolved-cell';

import { formatIonId } from './ion-id.ts';
import { placeAt, type Vector } from './vector.ts';

export type Repeat = readonly [number, number, number];

/** Ions drawn at most when cells are repeated; a single cell is always drawn whole. */
const blockIonLimit = 12_000;
export const repeatLimit = 8;

/** The ions on show, as flat arrays in one order. */
export interface Block {
  readonly count: number;
  readonly ids: readonly string[];
  /** Three numbers per ion, Å. */
  readonly positionsA: Float64Array;
  readonly siteIndices: Uint32Array;
  /** Ionic radii, Å; the stage draws a fraction of them. */
  readonly radiiA: Float64Array;
  readonly chargesE: Float64Array;
  readonly speciesKeys: readonly string[];
  /** Index into `speciesKeys` per ion. */
  readonly speciesOf: Uint16Array;
  /** Middle of the block, Å. */
  readonly centreA: Vector;
  readonly repeat: Repeat;
  /** The cell's vectors as rows a, b, c. */
  readonly vectorsA: readonly number[];
}

/** A coordinate this close to a face of the cell lies on it; fractions typed as 0.3333 don't. */
const faceTolerance = 1e-5;

/** Whole-cell shifts that keep a coordinate within 0 … repeat, both faces included. */
function shifts(fraction: number, repeat: number): number[] {
  const first = fraction > 1 - faceTolerance ? -1 : 0;
  const last = fraction < faceTolerance ? repeat : repeat - 1;
  return Array.from({ length: last - first + 1 }, (_, at) => first + at);
}

/** The largest repeat not above the wanted one that keeps the block drawable. */
export function drawableRepeat(cell: ResolvedCell, wanted: Repeat): Repeat {
  const repeat = wanted.map((n) => Math.max(1, Math.min(repeatLimit, Math.round(n) || 1)));
  while (cell.sites.length * repeat[0]! * repeat[1]! * repeat[2]! > blockIonLimit) {
    const most = Math.max(...repeat);
    if (most === 1) {
      break;
    }
    repeat[repeat.indexOf(most)] = most - 1;
  }
  return [repeat[0]!, repeat[1]!, repeat[2]!];
}

interface Place {
  readonly siteIndex: number;
  readonly id: string;
  readonly at: Vector;
}

function placesOf(cell: ResolvedCell, repeat: Repeat): Place[] {
  return cell.sites.flatMap(({ fractional: [x, y, z] }, siteIndex) =>
    shifts(x, repeat[0]).flatMap((i) =>
      shifts(y, repeat[1]).flatMap((j) =>
        shifts(z, repeat[2]).map((k) => ({
          siteIndex,
          id: formatIonId({ siteIndex, cell: [i, j, k] }),
          at: placeAt(cell.vectorsA, x + i, y + j, z + k),
        })),
      ),
    ),
  );
}

/**
 * All ions of `repeat` cells, those on the far faces, edges and corners included.
 * @param radiusOf ionic radius of an ion kind, Å
 */
export function buildBlock(
  cell: ResolvedCell,
  repeat: Repeat,
  radiusOf: (speciesKey: string) => number,
): Block {
  const places = placesOf(cell, repeat);
  const speciesKeys = [...new Set(cell.sites.map(({ speciesKey }) => speciesKey))];
  const radii = speciesKeys.map(radiusOf);
  const kindOfSite = cell.sites.map(({ speciesKey }) => speciesKeys.indexOf(speciesKey));
  const speciesOf = Uint16Array.from(places, ({ siteIndex }) => kindOfSite[siteIndex]!);
  return {
    count: places.length,
    ids: places.map(({ id }) => id),
    positionsA: Float64Array.from(places.flatMap(({ at }) => at)),
    siteIndices: Uint32Array.from(places, ({ siteIndex }) => siteIndex),
    radiiA: Float64Array.from(speciesOf, (kind) => radii[kind]!),
    chargesE: Float64Array.from(places, ({ siteIndex }) => cell.sites[siteIndex]!.chargeE),
    speciesKeys,
    speciesOf,
    centreA: placeAt(cell.vectorsA, repeat[0] / 2, repeat[1] / 2, repeat[2] / 2),
    repeat,
    vectorsA: cell.vectorsA,
  };
}

/** Place of the ion at an index of the block, Å. */
export function positionAt(block: Block, index: number): Vector {
  const at = index * 3;
  return [block.positionsA[at]!, block.positionsA[at + 1]!, block.positionsA[at + 2]!];
}

/** Ions are never drawn smaller than this, Å: they stay visible and can be picked. */
const leastRadiusA = 0.12;

/** Radius an ion is drawn with, Å. */
export function drawnRadiusA(block: Block, index: number, ionScale: number): number {
  return Math.max(leastRadiusA, block.radiiA[index]! * ionScale);
}

/** The eight corners of the block, Å. */
export function blockCorners({ repeat: [na, nb, nc], vectorsA }: Block): Vector[] {
  return [0, na].flatMap((i) =>
    [0, nb].flatMap((j) => [0, nc].map((k) => placeAt(vectorsA, i, j, k))),
  );
}

/**
 * Radius around the block's middle that holds every ion (at a fraction of its radius) and
 * every cell corner, Å.
 */
export function boundRadiusA(block: Block, ionScale: number): number {
  const [cx, cy, cz] = block.centreA;
  let radius = 0;
  for (let index = 0; index < block.count; index += 1) {
    const [x, y, z] = positionAt(block, index);
    const reach = Math.hypot(x - cx, y - cy, z - cz) + drawnRadiusA(block, index, ionScale);
    radius = Math.max(radius, reach);
  }
  for (const [x, y, z] of blockCorners(block)) {
    radius = Math.max(radius, Math.hypot(x - cx, y - cy, z - cz));
  }
  return radius || 1;
}
