import { chargeSumE } from '#common/physics/cell-summary';
import type { CheckResult } from '#common/physics/checks/check-result';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import { formatSigned } from '#common/units/format';

/** Charges are typed with a few decimals: a sum below this is rounding. */
const toleranceE = 1e-6;

/** A crystal is neutral; a cell that isn't has no Madelung energy. */
export function checkChargeBalance(cell: ResolvedCell): CheckResult {
  const sum = chargeSumE(cell);
  const isNeutral = Math.abs(sum) <= toleranceE;
  return {
    key: 'charge_balance',
    name: 'Charge balance',
    word: isNeutral ? 'holds' : 'fails',
    finding: isNeutral
      ? 'The charges of the cell add up to zero.'
      : `The charges of the cell add up to ${formatSigned(sum, 4)} e: change a charge, an occupancy or the sites.`,
    value: isNeutral ? 0 : sum,
    unit: 'e',
    limits: [],
    labels: [],
  };
}
