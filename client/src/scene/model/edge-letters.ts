import { drawnRadiusA, positionAt, type Block } from './block.ts';
import type { CellEdge } from './cell-edges.ts';
import type { Projection } from './projection.ts';
import { addScaled, subtract, type Vector } from './vector.ts';

export interface EdgeLetter {
  readonly letter: 'a' | 'b' | 'c';
  readonly x: number;
  readonly y: number;
}

/** Room a letter needs around its middle, pixels. */
const roomPx = 11;
const fractions = [0.5, 0.4, 0.6, 0.32, 0.68, 0.25, 0.75];
const letters = ['a', 'b', 'c'] as const;

interface Disc {
  readonly x: number;
  readonly y: number;
  readonly radius: number;
  readonly depthA: number;
}

/** Ions as discs of the stage; of large blocks only as many as a letter could meet. */
function discsOf(block: Block, ionScale: number, projection: Projection): Disc[] {
  const discs: Disc[] = [];
  const step = Math.max(1, Math.floor(block.count / 500));
  for (let index = 0; index < block.count; index += step) {
    const { x, y, depthA } = projection.toStage(positionAt(block, index));
    const radius = projection.toPixels(drawnRadiusA(block, index, ionScale), depthA);
    discs.push({ x, y, radius, depthA });
  }
  return discs;
}

/** How far a point of the stage is from the nearest disc; negative inside one. */
function clearance(discs: readonly Disc[], x: number, y: number, depthA: number): number {
  let least = Infinity;
  for (const disc of discs) {
    const gap = Math.hypot(disc.x - x, disc.y - y) - disc.radius;
    // Ions behind the edge are less of a hindrance than ions over it.
    least = Math.min(least, disc.depthA > depthA ? gap + roomPx / 2 : gap);
  }
  return least;
}

interface Candidate {
  readonly at: Vector;
  readonly preference: number;
}

function candidates(edges: readonly CellEdge[], axis: 0 | 1 | 2): Candidate[] {
  return edges
    .filter((edge) => edge.axis === axis && edge.isOutline)
    .flatMap(({ from, to }) =>
      fractions.map((share) => ({
        at: addScaled(from, subtract(to, from), share),
        preference: -Math.abs(share - 0.5) * 6,
      })),
    );
}

/** An axis that points at the viewer shows no edge to write on; the compass still names it. */
function isEndOn(edges: readonly CellEdge[], axis: 0 | 1 | 2, projection: Projection): boolean {
  const longest = edges
    .filter((edge) => edge.axis === axis && edge.isOutline)
    .map(({ from, to }) => {
      const [start, end] = [projection.toStage(from), projection.toStage(to)];
      return Math.hypot(end.x - start.x, end.y - start.y);
    });
  return Math.max(...longest) < 5 * roomPx;
}

/**
 * A place on an edge of the block for each of a, b, c, clear of every ion on the stage where
 * there is one; otherwise the clearest there is. Lower and nearer edges are preferred.
 */
export function placeEdgeLetters(
  block: Block,
  ionScale: number,
  edges: readonly CellEdge[],
  projection: Projection,
): EdgeLetter[] {
  const discs = discsOf(block, ionScale, projection);
  const placed: EdgeLetter[] = [];
  for (const axis of [0, 1, 2] as const) {
    if (isEndOn(edges, axis, projection)) {
      continue;
    }
    let best: EdgeLetter | null = null;
    let bestScore = -Infinity;
    for (const { at, preference } of candidates(edges, axis)) {
      const { x, y, depthA } = projection.toStage(at);
      const isInside =
        x > roomPx && y > roomPx && x < projection.width - roomPx && y < projection.height - roomPx;
      const apart = placed.every((other) => Math.hypot(other.x - x, other.y - y) > 2 * roomPx);
      if (!isInside || !apart) {
        continue;
      }
      const room = Math.min(clearance(discs, x, y, depthA), roomPx) * 20;
      const score = room + preference + (y / projection.height) * 8 - depthA * 0.05;
      if (score > bestScore) {
        best = { letter: letters[axis], x, y };
        bestScore = score;
      }
    }
    if (best !== null) {
      placed.push(best);
    }
  }
  return placed;
}
