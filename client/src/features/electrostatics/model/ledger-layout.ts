import type { PairLedger } from '#common/schemas/evaluation';

/** A bar of the ledger: from the axis at 0 to the left where it binds, to the right where it opposes. */
export interface LedgerBar {
  /** Ends of the bar between −1 and 1. */
  readonly from: number;
  readonly to: number;
  readonly sense: 'binds' | 'opposes' | 'none';
  /** Where the running balance stands after this row, between −1 and 1. */
  readonly running: number;
}

/** All bars of a ledger to one scale. */
export interface LedgerLayout {
  /** eV at the right end of the axis. */
  readonly scaleEv: number;
  readonly rows: readonly LedgerBar[];
  readonly self: LedgerBar | null;
  readonly beyond: LedgerBar;
}

/** A bar of a contribution on a scale; negative energies bind and point left. */
export function layOutBar(contributionEv: number, runningEv: number, scaleEv: number): LedgerBar {
  const length = scaleEv > 0 ? contributionEv / scaleEv : 0;
  const sense = contributionEv < 0 ? 'binds' : contributionEv > 0 ? 'opposes' : 'none';
  return {
    from: Math.min(0, length),
    to: Math.max(0, length),
    sense,
    running: scaleEv > 0 ? runningEv / scaleEv : 0,
  };
}

/** One scale for bars and running balance, so that neither leaves the axis. */
export function layOutLedger(ledger: PairLedger): LedgerLayout {
  const lastRunning = ledger.rows.at(-1)?.runningEv ?? 0;
  const sizes = [
    ...ledger.rows.flatMap((row) => [row.contributionEv, row.runningEv]),
    ledger.selfEv,
    lastRunning + ledger.selfEv,
    ledger.beyondEv,
    ledger.totalEv,
  ];
  const scaleEv = sizes.reduce((most, size) => Math.max(most, Math.abs(size)), 0);
  return {
    scaleEv,
    rows: ledger.rows.map((row) => layOutBar(row.contributionEv, row.runningEv, scaleEv)),
    self:
      ledger.view === 'neutralised'
        ? layOutBar(ledger.selfEv, lastRunning + ledger.selfEv, scaleEv)
        : null,
    beyond: layOutBar(ledger.beyondEv, ledger.totalEv, scaleEv),
  };
}

/** Decimals that give about five digits to the largest entry, the same for every row. */
export function ledgerDecimals(scaleEv: number): number {
  if (scaleEv <= 0) {
    return 2;
  }
  const whole = Math.floor(Math.log10(scaleEv)) + 1;
  return Math.min(4, Math.max(2, 5 - whole));
}

/** The stepped line of the running balance: x in −1…1, y in rows from 0 at the top. */
export function runningLine(layout: LedgerLayout): string {
  const bars = [...layout.rows, ...(layout.self === null ? [] : [layout.self]), layout.beyond];
  const steps = bars.map(({ running }, index) => `H${running.toFixed(5)}V${index + 1}`);
  return `M0 0${steps.join('')}`;
}
