import { drawnRadiusA, positionAt, type Block } from './block.ts';
import type { Bond } from './bonds.ts';
import type { CellEdge } from './cell-edges.ts';
import { parseHex, type Rgb } from './colours.ts';
import type { LitPair } from './lit-pairs.ts';
import { addScaled, norm, subtract } from './vector.ts';

/** Balls to draw, flat arrays in one order; a new object whenever anything in it changes. */
export interface SphereBatch {
  readonly count: number;
  readonly centresA: Float32Array;
  readonly radiiA: Float32Array;
  /** Index into the palette per ball. */
  readonly colours: Uint8Array;
  /** −1, 0 or 1 per ball: the raised mark it bears. */
  readonly signs: Int8Array;
}

/** Struts between balls: from the surface of one to the surface of the other. */
export interface StrutBatch {
  readonly count: number;
  /** Six numbers per strut: both ends, Å. */
  readonly endsA: Float32Array;
  readonly radiusA: number;
  /** Two palette indices per strut. */
  readonly colours: Uint8Array;
}

/** Lines of even width on the screen. */
export interface RibbonBatch {
  readonly count: number;
  readonly endsA: Float32Array;
  readonly widthPx: number;
  readonly colour: Rgb;
  readonly opacity: number;
  /** Opacity where something stands in front. */
  readonly hiddenOpacity: number;
  readonly isDotted: boolean;
  /** Drawn as if this much nearer, so that an edge shows on a strut that runs along it, Å. */
  readonly biasA: number;
}

export const strutRadiusA = 0.095;
/** Struts are this much slimmer halfway. */
export const strutTaper = 0.26;

export function sphereBatch(block: Block, ionScale: number, signMarks: boolean): SphereBatch {
  return {
    count: block.count,
    centresA: Float32Array.from(block.positionsA),
    radiiA: Float32Array.from(block.radiiA, (_, index) => drawnRadiusA(block, index, ionScale)),
    colours: Uint8Array.from(block.speciesOf, (kind) => kind % 256),
    signs: Int8Array.from(block.chargesE, (charge) => (signMarks ? Math.sign(charge) : 0)),
  };
}

/** Writes the part of the line between two balls that lies outside both; false if none does. */
function writeTrimmed(
  ends: Float32Array,
  at: number,
  block: Block,
  spheres: SphereBatch,
  pair: { from: number; to: number },
  sink: number,
): boolean {
  const start = positionAt(block, pair.from);
  const end = positionAt(block, pair.to);
  const line = subtract(end, start);
  const length = norm(line);
  const first = (spheres.radiiA[pair.from]! * sink) / length;
  const last = 1 - (spheres.radiiA[pair.to]! * sink) / length;
  if (!(last > first)) {
    return false;
  }
  ends.set(addScaled(start, line, first), at);
  ends.set(addScaled(start, line, last), at + 3);
  return true;
}

export function strutBatch(
  block: Block,
  spheres: SphereBatch,
  bonds: readonly Bond[],
  ionScale: number,
): StrutBatch {
  const endsA = new Float32Array(bonds.length * 6);
  const colours = new Uint8Array(bonds.length * 2);
  let count = 0;
  for (const bond of bonds) {
    if (writeTrimmed(endsA, count * 6, block, spheres, bond, 0.86)) {
      colours[count * 2] = spheres.colours[bond.from]!;
      colours[count * 2 + 1] = spheres.colours[bond.to]!;
      count += 1;
    }
  }
  // Small ions get slimmer struts, so that they still stand out from them.
  const radiusA = strutRadiusA * Math.min(1, 0.45 + ionScale);
  return { count, endsA, radiusA, colours };
}

interface LineStyle {
  readonly widthPx: number;
  readonly colour: string;
  readonly opacity: number;
  readonly hiddenOpacity: number;
  readonly isDotted: boolean;
  readonly biasA: number;
}

export function edgeBatch(edges: readonly CellEdge[], style: LineStyle): RibbonBatch {
  const endsA = Float32Array.from(edges.flatMap(({ from, to }) => [...from, ...to]));
  return { ...style, colour: parseHex(style.colour), count: edges.length, endsA };
}

export function litPairBatch(
  block: Block,
  spheres: SphereBatch,
  pairs: readonly LitPair[],
  style: LineStyle,
): RibbonBatch {
  const endsA = new Float32Array(pairs.length * 6);
  let count = 0;
  for (const pair of pairs) {
    if (writeTrimmed(endsA, count * 6, block, spheres, pair, 1.02)) {
      count += 1;
    }
  }
  return { ...style, colour: parseHex(style.colour), count, endsA };
}
