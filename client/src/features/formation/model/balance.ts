import type { FormationLedger } from '#common/physics/energetics/formation-ledger';
import { middleOf, type FormationLine } from '#common/physics/energetics/formation-line';
import type { ValueRange } from '#common/schemas/energetics';

/** A row's bar from the axis at 0: left binds, right opposes; all in −1 … 1 of the half axis. */
export interface BalanceBar {
  readonly sense: 'binds' | 'opposes' | 'none';
  /** Ends of what is certain, and of the whole with the range. */
  readonly certain: ValueRange;
  readonly whole: ValueRange;
  /** Where the running balance stands before and after this row; null once a line is open. */
  readonly before: number | null;
  readonly after: number | null;
}

const sizeOf = (range: ValueRange | null): number =>
  range === null ? 0 : Math.max(Math.abs(range.low), Math.abs(range.high));

/** kJ mol⁻¹ at the ends of the axis: bars and running balance stay within. */
export function balanceScale({ lines, formation }: FormationLedger): number {
  const ranges = [
    ...lines.flatMap((line) => [line.contributionKjPerMol, line.runningKjPerMol]),
    formation.contributionKjPerMol,
  ];
  return ranges.reduce((most, range) => Math.max(most, sizeOf(range)), 0);
}

/** The part of a range that is the same whatever the value: between the axis and its nearer end. */
function certainPart({ low, high }: ValueRange): ValueRange {
  if (low > 0) {
    return { low: 0, high: low };
  }
  return high < 0 ? { low: high, high: 0 } : { low: 0, high: 0 };
}

/** The bar of one line on a scale. */
export function balanceBar(
  line: FormationLine,
  before: ValueRange | null,
  scaleKjPerMol: number,
): BalanceBar {
  const on = (value: number): number => (scaleKjPerMol > 0 ? value / scaleKjPerMol : 0);
  const range = line.contributionKjPerMol ?? { low: 0, high: 0 };
  const scaled = { low: on(range.low), high: on(range.high) };
  const middle = middleOf(range);
  return {
    sense: middle < 0 ? 'binds' : middle > 0 ? 'opposes' : 'none',
    certain: certainPart(scaled),
    whole: { low: Math.min(0, scaled.low), high: Math.max(0, scaled.high) },
    before: before && on(middleOf(before)),
    after: line.runningKjPerMol && on(middleOf(line.runningKjPerMol)),
  };
}
