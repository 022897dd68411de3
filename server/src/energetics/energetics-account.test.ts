import { describe, expect, it } from 'vitest';

import { noOverrides } from '#common/chemistry/sourced';
import { energeticsOf } from '#common/physics/energetics/energetics-account';
import { pairPotentialsOf } from '#common/physics/energetics/pair-potentials';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import { defaultEvaluationMethod } from '#common/schemas/cell';
import {
  defaultEnergeticModel,
  type EnergeticModel,
  type RepulsionModel,
} from '#common/schemas/energetics';
import { evaluateCell } from '#server/electrostatics/evaluate-cell';
import { fluoriteCell, rockSaltCell } from '#tests/helpers/resolved-cells';

const withRepulsion = (repulsion: RepulsionModel): EnergeticModel => ({
  ...defaultEnergeticModel,
  repulsion,
});

function accountOf(cell: ResolvedCell, model = defaultEnergeticModel, overrides = noOverrides) {
  const name = { spaceGroupNumber: null, spaceGroupSymbol: null };
  return energeticsOf(cell, evaluateCell(cell, defaultEvaluationMethod, name), model, overrides);
}

const hugginsAt = (hardnessA: number | null) =>
  withRepulsion({ kind: 'born_mayer_huggins', hardnessA });

describe('the account of magnesia', () => {
  // Own arithmetic, n = 7 and r₀ = 2.106 Å: −3952.77 kJ mol⁻¹; reference/check-values.json.
  it('has the worked example’s lattice energy, from the cell', () => {
    const account = accountOf(rockSaltCell());
    expect(account.hardness).toMatchObject({ symbol: 'n', range: { low: 7, high: 7 } });
    expect(account.latticeEnergyKjPerMol!.low).toBeCloseTo(-3952.77, 2);
    expect(account.equilibriumSpacingA!.low).toBeCloseTo(2.106, 10);
    expect(account.kapustinskii.energyKjPerMol).toBeCloseTo(-3799.28, 2);
  });

  it('gives back the bulk modulus its exponent was fitted to', () => {
    const model: EnergeticModel = {
      ...withRepulsion({ kind: 'born_lande', exponent: { from: 'bulk_modulus' } }),
      measured: {
        ...defaultEnergeticModel.measured,
        bulkModulusGpa: { low: 158, high: 162 },
      },
    };
    const { bulkModulusGpa: found } = accountOf(rockSaltCell(), model);
    expect(found!.low).toBeCloseTo(158, 9);
    expect(found!.high).toBeCloseTo(162, 9);
  });

  it('carries ranges through', () => {
    const range = { low: 6, high: 8 };
    const typed = { kind: 'born_lande', exponent: { from: 'typed', exponent: range } } as const;
    const account = accountOf(rockSaltCell(), withRepulsion(typed));
    expect(account.laws).toHaveLength(2);
    const { low, high } = account.latticeEnergyKjPerMol!;
    expect(low).toBeLessThan(-3952.77);
    expect(high).toBeGreaterThan(-3952.77);
  });

  it('says why there is none', () => {
    expect(
      accountOf(
        rockSaltCell(),
        withRepulsion({ kind: 'born_lande', exponent: { from: 'bulk_modulus' } }),
      ).reason,
    ).toMatch(/measured bulk modulus/);
    const soft = withRepulsion({ kind: 'born_mayer', hardnessA: { low: 1.2, high: 1.2 } });
    expect(accountOf(rockSaltCell(), soft).reason).toMatch(/no less than half the spacing/);
  });

  it('takes the workspace’s own exponents', () => {
    const own = new Map([['born-exponent:Mg+2', { value: 9, note: 'ours' }]]);
    expect(accountOf(rockSaltCell(), defaultEnergeticModel, own).hardness!.range.low).toBe(8);
  });
});

describe.each([
  ['magnesia', rockSaltCell()],
  ['fluorite', fluoriteCell()],
])('the pair form for %s', (_name, cell) => {
  const name = { spaceGroupNumber: null, spaceGroupSymbol: null };
  const result = evaluateCell(cell, defaultEvaluationMethod, name);

  it.each([null, 0.3])('puts the cell at rest with a hardness of %s', (hardnessA) => {
    const account = accountOf(cell, hugginsAt(hardnessA));
    expect(account.reason).toBeNull();
    expect(account.equilibriumScale!.low).toBeCloseTo(1, 9);
  });

  it('is as stiff as the Born–Landé or Born–Mayer model it stands for', () => {
    for (const model of [
      defaultEnergeticModel,
      withRepulsion({ kind: 'born_mayer', hardnessA: { low: 0.32, high: 0.32 } }),
    ]) {
      const found = pairPotentialsOf(cell, result, model, noOverrides);
      expect(found).toHaveProperty('pairs');
      const { pairs, cutoffA } = found as Extract<typeof found, { pairs: unknown }>;
      const table = accountOf(cell, withRepulsion({ kind: 'pair_table', pairs, cutoffA }));
      expect(table.equilibriumScale!.low).toBeCloseTo(1, 6);
      expect(table.bulkModulusGpa!.low / accountOf(cell, model).bulkModulusGpa!.low).toBeCloseTo(
        1,
        5,
      );
    }
  });
});

describe('pairs whose ions have no size', () => {
  it('are refused with the ion and the way out', () => {
    const cell = rockSaltCell(4.212, 1);
    expect(accountOf(cell, hugginsAt(null)).reason).toMatch(
      /no ionic radius for Mg\+1: add one under the workspace’s data values/,
    );
  });
});
