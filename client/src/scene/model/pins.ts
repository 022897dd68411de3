import type { ResolvedCell } from '#common/physics/resolved-cell';

import { positionAt, type Block } from './block.ts';
import { findLitPairs, type LitPairKind } from './lit-pairs.ts';
import { addScaled, dot, placeAt, type Vector } from './vector.ts';

/** What a numbered tag hangs on. */
export interface PinSubject {
  readonly siteLabel: string | null;
  readonly pair: LitPairKind | null;
}

export interface PinAnchor {
  readonly at: Vector;
  /** Ion it sits on, so that the tag can stand at its rim; null for a point in space. */
  readonly ion: number | null;
}

/** Prefers ions that stand high and in front in the first view, where a tag hides least. */
const preferred: Vector = [0.55, 0.35, 0.9];

function bestIon(block: Block, isFit: (index: number) => boolean): number | null {
  let best: number | null = null;
  let bestHeight = -Infinity;
  for (let index = 0; index < block.count; index += 1) {
    const height = dot(positionAt(block, index), preferred);
    if (height > bestHeight + 1e-9 && isFit(index)) {
      best = index;
      bestHeight = height;
    }
  }
  return best;
}

function pairAnchor(block: Block, kind: LitPairKind): PinAnchor | null {
  const middles = findLitPairs(block, kind, null).map(({ from, to }) => {
    const start = positionAt(block, from);
    const end = positionAt(block, to);
    return addScaled(addScaled([0, 0, 0], start, 0.5), end, 0.5);
  });
  const best = middles.reduce<Vector | null>(
    (top, at) => (top === null || dot(at, preferred) > dot(top, preferred) ? at : top),
    null,
  );
  return best === null ? null : { at: best, ion: null };
}

/** Where a tag stands: on an ion with that label, on a pair, or on the block's upper corner. */
export function pinAnchor(cell: ResolvedCell, block: Block, subject: PinSubject): PinAnchor {
  if (subject.siteLabel !== null) {
    const isFit = (index: number): boolean =>
      cell.sites[block.siteIndices[index]!]?.label === subject.siteLabel;
    const ion = bestIon(block, isFit);
    if (ion !== null) {
      return { at: positionAt(block, ion), ion };
    }
  }
  const onPair = subject.pair === null ? null : pairAnchor(block, subject.pair);
  return onPair ?? { at: placeAt(block.vectorsA, 0, 0, block.repeat[2]), ion: null };
}
