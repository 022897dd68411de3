import type { Block } from './block.ts';
import { buildIonGrid, eachNear } from './ion-grid.ts';

/** Pairs of one kind at one distance, as a row of the ledger names them. */
export interface LitPairKind {
  readonly speciesA: string;
  readonly speciesB: string;
  readonly distanceA: number;
}

export interface LitPair {
  readonly from: number;
  readonly to: number;
}

const litPairLimit = 400;
/** Distances of one row agree this well; rows differ by more. */
const sameDistanceA = 2e-3;

function isKind(block: Block, kind: LitPairKind, from: number, to: number): boolean {
  const one = block.speciesKeys[block.speciesOf[from]!];
  const other = block.speciesKeys[block.speciesOf[to]!];
  return (
    (one === kind.speciesA && other === kind.speciesB) ||
    (one === kind.speciesB && other === kind.speciesA)
  );
}

/**
 * The pairs to light: those of the picked ion where one is picked and has any, otherwise all of
 * the block, up to a limit.
 */
export function findLitPairs(block: Block, kind: LitPairKind, picked: number | null): LitPair[] {
  const grid = buildIonGrid(block, Math.max(kind.distanceA + sameDistanceA, 0.5));
  const pairsOf = (from: number, isOnce: boolean): LitPair[] => {
    const pairs: LitPair[] = [];
    eachNear(grid, from, (to, distanceA) => {
      const fits = Math.abs(distanceA - kind.distanceA) <= sameDistanceA;
      if (fits && (!isOnce || from < to) && isKind(block, kind, from, to)) {
        pairs.push({ from, to });
      }
    });
    return pairs;
  };
  const own = picked === null ? [] : pairsOf(picked, false);
  if (own.length > 0) {
    return own.slice(0, litPairLimit);
  }
  const all: LitPair[] = [];
  for (let from = 0; from < block.count && all.length < litPairLimit; from += 1) {
    all.push(...pairsOf(from, true));
  }
  return all.slice(0, litPairLimit);
}
