import type { Block } from './block.ts';
import { placeAt, type Vector } from './vector.ts';

export interface CellEdge {
  readonly from: Vector;
  readonly to: Vector;
  /** 0, 1, 2 for an edge along a, b, c. */
  readonly axis: 0 | 1 | 2;
  /** Edges of the first cell stand out; the others of a repeated block are fainter. */
  readonly isFirstCell: boolean;
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
