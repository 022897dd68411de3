import { describe, expect, it } from 'vitest';

import type { PairLedger } from '#common/schemas/evaluation';
import {
  layOutLedger,
  ledgerDecimals,
  runningLine,
} from '#client/features/electrostatics/model/ledger-layout.ts';

const row = (contributionEv: number, runningEv: number) => ({
  key: `Mg+2|O-2|${contributionEv}`,
  speciesA: 'Mg+2',
  speciesB: 'O-2',
  distanceA: 2.106,
  pairsPerFormulaUnit: 6,
  pairEnergyEv: contributionEv / 6,
  contributionEv,
  runningEv,
});

const ledger: PairLedger = {
  reachA: 3,
  view: 'bare',
  rows: [row(-160, -160), row(120, -40)],
  selfEv: 0,
  beyondEv: -10,
  totalEv: -50,
};

describe('layOutLedger', () => {
  it('points left where a row binds and right where it opposes', () => {
    const [first, second] = layOutLedger(ledger).rows;
    expect(first).toMatchObject({ from: -1, to: 0, sense: 'binds' });
    expect(second).toMatchObject({ from: 0, to: 0.75, sense: 'opposes' });
  });

  it('uses one scale that also holds the running balance', () => {
    const wandering = { ...ledger, rows: [row(-60, -60), row(-60, -120)], totalEv: -130 };
    const layout = layOutLedger(wandering);
    expect(layout.scaleEv).toBe(130);
    expect(layout.beyond.running).toBe(-1);
  });

  it('ends the running line at the total', () => {
    const layout = layOutLedger(ledger);
    expect(layout.beyond.running).toBeCloseTo(-50 / 160, 12);
    expect(runningLine(layout)).toBe('M0 0H-1.00000V1H-0.25000V2H-0.31250V3');
  });

  it('has a self row in the neutralised view only', () => {
    expect(layOutLedger(ledger).self).toBeNull();
    const neutral = layOutLedger({ ...ledger, view: 'neutralised', selfEv: -20 });
    expect(neutral.self?.sense).toBe('binds');
  });

  it('draws an empty ledger without dividing by zero', () => {
    const empty = layOutLedger({ ...ledger, rows: [], beyondEv: 0, totalEv: 0 });
    expect(empty.beyond).toEqual({ from: 0, to: 0, sense: 'none', running: 0 });
  });
});

describe('ledgerDecimals', () => {
  it('gives five digits to the largest row', () => {
    expect(ledgerDecimals(293.5)).toBe(2);
    expect(ledgerDecimals(23.9)).toBe(3);
    expect(ledgerDecimals(4)).toBe(4);
    expect(ledgerDecimals(12_000)).toBe(2);
  });
});
