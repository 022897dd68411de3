import { describe, expect, it } from 'vitest';

import { formationLedger } from '#common/physics/energetics/formation-ledger';
import { formationLevels } from '#common/physics/energetics/formation-levels';
import { defaultEnergeticModel } from '#common/schemas/energetics';
import { balanceBar, balanceScale } from '#client/features/formation/model/balance.ts';
import { layOutLevels } from '#client/features/formation/model/level-layout.ts';

const composition = {
  formula: 'MgAl2O4',
  ions: [
    { element: 'Mg', chargeE: 2, count: 1 },
    { element: 'Al', chargeE: 3, count: 2 },
    { element: 'O', chargeE: -2, count: 4 },
  ],
  isMixed: false,
};
const model = {
  ...defaultEnergeticModel,
  formation: { ...defaultEnergeticModel.formation, typedKjPerMol: { 'affinity:O:2': 744 } },
};
const account = { latticeEnergyKjPerMol: { low: -19_400, high: -19_200 }, reason: null };
const ledger = formationLedger(composition, model, account);
const groups = formationLevels(ledger)!;
const numbers = new Map(ledger.lines.map(({ key }, at) => [key, at + 1]));

describe.each([358, 520, 960])('levels on %i px', (width) => {
  const layout = layOutLevels(groups, numbers, width, 360);

  it('stay on the drawing, in order, none over another', () => {
    const spans = [
      ...layout.treads.map(({ from, to }) => [from, to] as const),
      ...layout.risers.map(({ x, width: w }) => [x - w / 2, x + w / 2] as const),
    ].sort((a, b) => a[0] - b[0]);
    expect(spans[0]![0]).toBeGreaterThanOrEqual(0);
    expect(spans.at(-1)![1]).toBeLessThanOrEqual(width + 0.001);
    for (const [at, [from]] of spans.entries()) {
      expect(from).toBeGreaterThanOrEqual((spans[at - 1]?.[1] ?? 0) - 0.001);
    }
    for (const { y } of layout.treads) {
      expect(y).toBeGreaterThanOrEqual(0);
      expect(y).toBeLessThanOrEqual(360);
    }
  });

  it('climb where energy goes in and go down where it comes out', () => {
    for (const { rise, from, to } of layout.risers) {
      expect(Math.sign(from - to)).toBe(Math.sign(rise.line.contributionKjPerMol!.high));
    }
  });

  it('start on the zero line and meet the levels', () => {
    expect(layout.treads[0]?.y).toBe(layout.zeroY);
    expect(layout.risers.at(-1)?.to).toBeCloseTo(layout.treads.at(-1)!.y, 6);
  });
});

describe('bars', () => {
  it('stay within the axis and show a range beside what is certain', () => {
    const most = balanceScale(ledger);
    const lattice = ledger.lines.find(({ key }) => key === 'lattice')!;
    const bar = balanceBar(lattice, null, most);
    expect(bar.sense).toBe('binds');
    expect(bar.whole.low).toBeGreaterThanOrEqual(-1);
    expect(bar.certain.low).toBeGreaterThan(bar.whole.low);
    expect(bar.certain).toEqual({ low: -19_200 / most, high: 0 });
  });
});
