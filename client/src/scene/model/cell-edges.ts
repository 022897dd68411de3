import { drawnRadiusA, positionAt, type Block } from './block.ts';
import { addScaled, dot, placeAt, subtract, type Vector } from './vector.ts';

export interface CellEdge {
  readonly from: Vector;
  readonly to: Vector;
  /** 0, 1, 2 for an edge along a, b, c. */
  readonly axis: 0 | 1 | 2;
  /** Edges of the first cell stand out; the others of a repeated block are fainter. */
  readonly isFirstCell: boolean;
  /** On one of the twelve edges of the whole block. */
  readonly isOutline: boolean;
}

const axes = [0, 1, 2] as const;
type Corner = [number, number, number];

function edgesAlong(block: Block, axis: 0 | 1 | 2): CellEdge[] {
  const [u, v] = axes.filter((other) => other !== axis) as [0 | 1 | 2, 0 | 1 | 2];
  const edges: CellEdge[] = [];
  for (let p = 0; p <= block.repeat[u]; p += 1) {
    for (let q = 0; q <= block.repeat[v]; q += 1) {
      for (let step = 0; step < block.repeat[axis]; step += 1) {
        const from: Corner = [0, 0, 0];
        from[axis] = step;
        from[u] = p;
        from[v] = q;
        const to: Corner = [...from];
        to[axis] = step + 1;
        edges.push({
          from: placeAt(block.vectorsA, ...from),
          to: placeAt(block.vectorsA, ...to),
          axis,
          isFirstCell: step === 0 && p <= 1 && q <= 1,
          isOutline: p % block.repeat[u] === 0 && q % block.repeat[v] === 0,
        });
      }
    }
  }
  return edges;
}

/** Edges of every cell of the block, each drawn once. */
export function cellEdges(block: Block): CellEdge[] {
  return axes.flatMap((axis) => edgesAlong(block, axis));
}

/** Above this many comparisons edges stay whole: they are faint and many by then. */
const trimLimit = 4_000_000;

interface Gap {
  readonly first: number;
  readonly last: number;
}

/** Part of an edge that a ball covers, in shares of the edge; null where they don't meet. */
function gapOf(from: Vector, along: Vector, centre: Vector, radius: number): Gap | null {
  const squared = dot(along, along);
  const offset = subtract(centre, from);
  const middle = dot(offset, along) / squared;
  const missSquared = dot(offset, offset) - middle * middle * squared;
  if (missSquared >= radius * radius) {
    return null;
  }
  const half = Math.sqrt((radius * radius - missSquared) / squared);
  return middle + half <= 0 || middle - half >= 1
    ? null
    : { first: middle - half, last: middle + half };
}

function openParts(edge: CellEdge, gaps: Gap[]): CellEdge[] {
  const along = subtract(edge.to, edge.from);
  const parts: CellEdge[] = [];
  let start = 0;
  for (const { first, last } of [
    ...gaps.sort((a, b) => a.first - b.first),
    { first: 1, last: 1 },
  ]) {
    if (first > start + 1e-6) {
      const from = addScaled(edge.from, along, start);
      parts.push({ ...edge, from, to: addScaled(edge.from, along, first) });
    }
    start = Math.max(start, last);
  }
  return parts;
}

/** The parts of the edges that run outside the ions, so that no line pierces one. */
export function trimmedEdges(
  edges: readonly CellEdge[],
  block: Block,
  ionScale: number,
): readonly CellEdge[] {
  if (edges.length * block.count > trimLimit) {
    return edges;
  }
  return edges.flatMap((edge) => {
    const along = subtract(edge.to, edge.from);
    const gaps: Gap[] = [];
    for (let index = 0; index < block.count; index += 1) {
      const gap = gapOf(
        edge.from,
        along,
        positionAt(block, index),
        drawnRadiusA(block, index, ionScale),
      );
      if (gap !== null) {
        gaps.push(gap);
      }
    }
    return openParts(edge, gaps);
  });
}
