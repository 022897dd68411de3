import { buildPairLedger, defaultGroupingA } from '#common/physics/pair-ledger';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { PairLedger } from '#common/schemas/evaluation';

/** A disordered cell has a row for each pair of its own; beyond this many, distances are lumped. */
const mostLedgerRows = 4000;

const widestGroupingA = 1;

/**
 * The pair ledger of a result, at the default reach. Where it would have very many rows, distances
 * are grouped ten, a hundred … times wider.
 */
export function resultLedger(
  cell: ResolvedCell,
  energyEv: number,
  formulaUnitsPerCell: number,
): { ledger: PairLedger; groupingA: number } {
  let groupingA = defaultGroupingA;
  let ledger = buildPairLedger(cell, energyEv, formulaUnitsPerCell);
  while (ledger.rows.length > mostLedgerRows && groupingA < widestGroupingA) {
    groupingA *= 10;
    const options = { reachA: ledger.reachA, groupingA };
    ledger = buildPairLedger(cell, energyEv, formulaUnitsPerCell, options);
  }
  return { ledger, groupingA };
}
