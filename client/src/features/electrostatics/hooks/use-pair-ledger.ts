import { useDeferredValue, useMemo } from 'react';

import { buildPairLedger, defaultReachA } from '#common/physics/pair-ledger';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationResult, PairLedger } from '#common/schemas/evaluation';

/** How the person wants to see the ledger; null reach: the default. */
export interface LedgerChoice {
  readonly reachA: number | null;
  readonly view: PairLedger['view'];
}

/** The ledger for a choice of reach and view, recomputed here from the cell and the total. */
export function usePairLedger(
  cell: ResolvedCell | null,
  result: EvaluationResult,
  choice: LedgerChoice,
): { ledger: PairLedger; isBehind: boolean } {
  // Two plain values: an object made anew on each render would never count as caught up.
  const reachA = useDeferredValue(choice.reachA);
  const view = useDeferredValue(choice.view);
  const ledger = useMemo(() => {
    if (cell === null || (reachA === null && view === 'bare')) {
      return result.pairLedger;
    }
    return buildPairLedger(cell, result.energyEvPerFormulaUnit.value, result.formulaUnitsPerCell, {
      reachA: reachA ?? result.pairLedger.reachA,
      view,
    });
  }, [cell, result, reachA, view]);
  return { ledger, isBehind: reachA !== choice.reachA || view !== choice.view };
}

/** More pairs than this make the slider lag. */
const mostPairs = 2e6;

/** Reach within which a cell has at most {@link mostPairs} pairs. */
function affordableReachA(cell: ResolvedCell): number {
  return Math.cbrt((3 * mostPairs * cell.volumeA3) / (4 * Math.PI * cell.sites.length ** 2));
}

/** Ends of the reach slider: from the first shell to a good way past the default. */
export function reachRange(
  cell: ResolvedCell | null,
  result: EvaluationResult,
): { minA: number; maxA: number } {
  const shortest = result.shortestUnlikeDistanceA ?? result.shortestDistanceA;
  const usual = cell === null ? result.pairLedger.reachA : defaultReachA(cell);
  const wanted = Math.max(usual * 1.8, shortest * 4);
  const affordable = cell === null ? wanted : affordableReachA(cell);
  return { minA: shortest, maxA: Math.max(usual, Math.min(wanted, affordable)) };
}
