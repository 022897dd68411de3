import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { noOverrides, type DataOverrides } from '#common/chemistry/sourced';
import type { FormationComposition } from '#common/physics/energetics/formation-composition';
import { formationLedger, type FormationLedger } from '#common/physics/energetics/formation-ledger';
import { formationLevels } from '#common/physics/energetics/formation-levels';
import { middleOf } from '#common/physics/energetics/formation-line';
import {
  defaultEnergeticModel,
  type EnergeticModel,
  type FormationChoices,
} from '#common/schemas/energetics';

type Ion = readonly [element: string, chargeE: number, count: number];

const compositionOf = (formula: string, ...ions: Ion[]): FormationComposition => ({
  formula,
  ions: ions.map(([element, chargeE, count]) => ({ element, chargeE, count })),
  isMixed: false,
});

const modelOf = (
  formation: Partial<FormationChoices>,
  measured: Partial<EnergeticModel['measured']> = {},
): EnergeticModel => ({
  ...defaultEnergeticModel,
  measured: { ...defaultEnergeticModel.measured, ...measured },
  formation: { ...defaultEnergeticModel.formation, ...formation },
});

const noAccount = { latticeEnergyKjPerMol: null, reason: 'No exponent for this ion.' };

const ledgerOf = (
  composition: FormationComposition,
  formation: Partial<FormationChoices>,
  overrides: DataOverrides = noOverrides,
): FormationLedger => formationLedger(composition, modelOf(formation), noAccount, overrides);

const lineOf = (ledger: FormationLedger, key: string) => {
  const line = [...ledger.lines, ledger.formation].find((one) => one.key === key);
  if (line === undefined) {
    throw new Error(`No line ${key}`);
  }
  return line;
};
const valueOf = (ledger: FormationLedger, key: string): number => {
  const value = lineOf(ledger, key).valueKjPerMol;
  return value === null ? NaN : middleOf(value);
};

const sodiumChloride = compositionOf('NaCl', ['Na', 1, 1], ['Cl', -1, 1]);

describe('the account of sodium chloride', () => {
  // Common practice, no source: the figures every course rounds to.
  const figures = {
    'atomisation:Na': 109,
    'ionisation:Na:1': 497,
    'atomisation:Cl': 242 / 2,
    'affinity:Cl:1': -364,
    lattice: -777,
  };

  it('reads 109 + 497 + ½·242 − 364 − 777 = −414 kJ mol⁻¹', () => {
    const ledger = ledgerOf(sodiumChloride, { typedKjPerMol: figures });
    expect(ledger.open).toBeNull();
    expect(valueOf(ledger, 'formation')).toBe(-414);
    expect(ledger.lines.map(({ key }) => key)).toEqual([
      'atomisation:Na',
      'atomisation:Cl',
      'ionisation:Na:1',
      'affinity:Cl:1',
      'lattice',
    ]);
    expect(ledger.lines.map(({ runningKjPerMol }) => runningKjPerMol?.low)).toEqual([
      109, 230, 727, 363, -414,
    ]);
    expect(ledger.lines.every(({ origin, isTyped }) => origin === 'typed' && isTyped)).toBe(true);
  });

  it('says that an atom of chlorine costs half a bond of its gas', () => {
    const chlorine = lineOf(ledgerOf(sodiumChloride, {}), 'atomisation:Cl');
    expect(chlorine.from).toEqual([{ coefficient: 0.5, formula: 'Cl2', chargeE: 0, phase: 'g' }]);
    expect(chlorine.remark).toBe('½ D of Cl₂, from chlorine gas');
    expect(lineOf(ledgerOf(sodiumChloride, {}), 'atomisation:Na').remark).toBe('from solid sodium');
  });

  it('names where every number of the tables comes from', () => {
    const ledger = ledgerOf(sodiumChloride, { typedKjPerMol: { lattice: -787.2 } });
    for (const line of ledger.lines.filter(({ key }) => key !== 'lattice')) {
      expect(line.origin).toBe('table');
      expect(line.source.length).toBeGreaterThan(10);
      expect(line.status).not.toBeNull();
    }
  });
});

/**
 * Lattice enthalpies at 298.15 K, formation enthalpies and U_pot in kJ mol⁻¹, each closed from a
 * handbook table of formation and gas-atom enthalpies, ionisation energies and electron affinities
 * of other tables. Oxides: with +744 for the second affinity of oxygen (from memory).
 */
const salts: readonly [string, Ion, Ion, number, number, number | null][] = [
  ['LiF', ['Li', 1, 1], ['F', -1, 1], 1046.7, -616.0, 1049.2],
  ['LiCl', ['Li', 1, 1], ['Cl', -1, 1], 860.8, -408.6, 863.3],
  ['LiBr', ['Li', 1, 1], ['Br', -1, 1], 818.1, -351.2, 820.5],
  ['LiI', ['Li', 1, 1], ['I', -1, 1], 761.5, -270.4, 764.0],
  ['NaF', ['Na', 1, 1], ['F', -1, 1], 931.1, -576.6, 933.6],
  ['NaCl', ['Na', 1, 1], ['Cl', -1, 1], 787.2, -411.2, 789.7],
  ['NaBr', ['Na', 1, 1], ['Br', -1, 1], 751.8, -361.1, 754.2],
  ['NaI', ['Na', 1, 1], ['I', -1, 1], 702.7, -287.8, 705.2],
  ['KCl', ['K', 1, 1], ['Cl', -1, 1], 717.0, -436.5, 719.5],
  ['KBr', ['K', 1, 1], ['Br', -1, 1], 689.0, -393.8, 691.4],
  ['AgCl', ['Ag', 1, 1], ['Cl', -1, 1], 915.6, -127.0, 918.1],
  ['MgF2', ['Mg', 2, 1], ['F', -1, 2], 2962.2, -1124.2, 2965.9],
  ['CaF2', ['Ca', 2, 1], ['F', -1, 2], 2643.5, -1228.0, 2647.2],
  ['CdF2', ['Cd', 2, 1], ['F', -1, 2], 2813.9, -700.4, 2817.6],
  ['MgCl2', ['Mg', 2, 1], ['Cl', -1, 2], 2522.3, -641.3, 2526.0],
  ['CaCl2', ['Ca', 2, 1], ['Cl', -1, 2], 2253.9, -795.4, 2257.6],
  ['CdCl2', ['Cd', 2, 1], ['Cl', -1, 2], 2548.0, -391.5, 2551.7],
  ['CdI2', ['Cd', 2, 1], ['I', -1, 2], 2437.6, -203.3, 2441.3],
  ['AlF3', ['Al', 3, 1], ['F', -1, 3], 6233.1, -1510.4, 6238.1],
  ['MgO', ['Mg', 2, 1], ['O', -2, 1], 3789.3, -601.6, null],
  ['CaO', ['Ca', 2, 1], ['O', -2, 1], 3400.1, -634.9, null],
  ['SrO', ['Sr', 2, 1], ['O', -2, 1], 3222.3, -592.0, null],
  ['BaO', ['Ba', 2, 1], ['O', -2, 1], 3048.3, -548.0, null],
  ['ZnO', ['Zn', 2, 1], ['O', -2, 1], 3972.8, -350.5, null],
];

describe('salts from the tables', () => {
  it.each(salts)(
    '%s closes to 1 kJ mol⁻¹',
    (formula, cation, anion, lattice, formation, energy) => {
      const composition = compositionOf(formula, cation, anion);
      const oxide: Record<string, number> = anion[0] === 'O' ? { 'affinity:O:2': 744 } : {};
      const summed = ledgerOf(composition, { typedKjPerMol: { lattice: -lattice, ...oxide } });
      expect(Math.abs(valueOf(summed, 'formation') - formation)).toBeLessThan(1);
      // The other way round, with the formation enthalpy of the table.
      const solved = ledgerOf(composition, { solveFor: 'lattice', typedKjPerMol: oxide });
      expect(Math.abs(valueOf(solved, 'lattice') + lattice)).toBeLessThan(1);
      expect(lineOf(solved, 'formation').valueKjPerMol).toEqual({
        low: formation,
        high: formation,
      });
      if (energy !== null) {
        expect(Math.abs(middleOf(solved.latticeEnergyKjPerMol!) + energy)).toBeLessThan(1);
      }
    },
  );

  it('MgO moves with what one takes for the second affinity of oxygen', () => {
    const periclase = compositionOf('MgO', ['Mg', 2, 1], ['O', -2, 1]);
    const with798 = { solveFor: 'lattice', typedKjPerMol: { 'affinity:O:2': 798 } };
    // 3843.3 with +798 (same tables).
    expect(valueOf(ledgerOf(periclase, with798), 'lattice')).toBeCloseTo(-3843.3, 0);
  });

  it('Al2O3 takes every step as often as the formula says', () => {
    const alumina = compositionOf('Al2O3', ['Al', 3, 2], ['O', -2, 3]);
    const ledger = ledgerOf(alumina, {
      solveFor: 'lattice',
      typedKjPerMol: { 'affinity:O:2': 744 },
    });
    expect(ledger.lines.map(({ key, coefficient }) => [key, coefficient])).toEqual([
      ['atomisation:Al', 2],
      ['atomisation:O', 3],
      ['ionisation:Al:1', 2],
      ['ionisation:Al:2', 2],
      ['ionisation:Al:3', 2],
      ['affinity:O:1', 3],
      ['affinity:O:2', 3],
      ['lattice', 1],
    ]);
    // By hand: −1675.7 − 2·330 − 3·249.2 − 2·(577.5 + 1816.7 + 2744.8) − 3·(744 − 140.976).
    const byHand = -1675.7 - 660 - 747.6 - 10_278 - 3 * (744 - 140.976);
    expect(valueOf(ledger, 'lattice')).toBeCloseTo(byHand, 0);
  });

  it('shares the first steps between two charges of one element', () => {
    const magnetite = compositionOf('Fe3O4', ['Fe', 2, 1], ['Fe', 3, 2], ['O', -2, 4]);
    const ledger = ledgerOf(magnetite, {});
    expect(lineOf(ledger, 'atomisation:Fe').coefficient).toBe(3);
    expect(lineOf(ledger, 'ionisation:Fe:2').coefficient).toBe(3);
    expect(lineOf(ledger, 'ionisation:Fe:3').coefficient).toBe(2);
  });
});

describe('solving', () => {
  it('gives every value back that was taken out', () => {
    const value = fc.double({ min: -5_000, max: 5_000, noNaN: true });
    const names = ['atomisation:Ca', 'atomisation:F', 'ionisation:Ca:1', 'ionisation:Ca:2'];
    const keys = [...names, 'affinity:F:1', 'lattice'];
    const fluorite = compositionOf('CaF2', ['Ca', 2, 1], ['F', -1, 2]);
    fc.assert(
      fc.property(fc.tuple(value, value, value, value, value, value), (values) => {
        const typed = Object.fromEntries(keys.map((key, at) => [key, values[at]!]));
        const sum = valueOf(ledgerOf(fluorite, { typedKjPerMol: typed }), 'formation');
        for (const key of keys) {
          const rest: Record<string, number> = { ...typed, formation: sum };
          delete rest[key];
          const solved = ledgerOf(fluorite, { solveFor: key, typedKjPerMol: rest });
          expect(solved.open).toBeNull();
          expect(Math.abs(valueOf(solved, key) - typed[key]!)).toBeLessThan(1e-9);
          expect(Math.abs(solved.residualKjPerMol!)).toBeLessThan(1e-9);
        }
      }),
      { numRuns: 50 },
    );
  });

  it('keeps a value typed for the solved line for comparison only', () => {
    const ledger = ledgerOf(sodiumChloride, {
      typedKjPerMol: { lattice: -787.2, formation: -400 },
    });
    expect(valueOf(ledger, 'formation')).toBeCloseTo(-411.2, 0);
    expect(ledger.formation.known?.valueKjPerMol).toEqual({ low: -400, high: -400 });
  });

  it('falls back to the formation enthalpy when the line is no longer there', () => {
    expect(ledgerOf(sodiumChloride, { solveFor: 'ionisation:K:1' }).solveFor).toBe('formation');
  });
});

describe('lines left out', () => {
  const choices = { typedKjPerMol: { lattice: -787.2 }, excluded: ['affinity:Cl:1'] };

  it('count nothing, and the account says that it is partial', () => {
    const whole = ledgerOf(sodiumChloride, { ...choices, excluded: [] });
    const partial = ledgerOf(sodiumChloride, choices);
    const affinity = valueOf(whole, 'affinity:Cl:1');
    expect(valueOf(partial, 'formation')).toBeCloseTo(valueOf(whole, 'formation') - affinity, 9);
    expect([whole.isPartial, partial.isPartial]).toEqual([false, true]);
    expect(lineOf(partial, 'affinity:Cl:1').contributionKjPerMol).toEqual({ low: 0, high: 0 });
  });

  it('can be lines without a value', () => {
    const gold = compositionOf('AuF', ['Au', 1, 1], ['F', -1, 1]);
    const typed = { lattice: -1000, 'atomisation:Au': 368 };
    const open = ledgerOf(gold, { typedKjPerMol: { ...typed, formation: -75 } });
    const missing = open.lines.filter(({ origin }) => origin === 'missing').map(({ key }) => key);
    expect(missing).toEqual(['ionisation:Au:1']);
    expect(ledgerOf(gold, { typedKjPerMol: typed, excluded: missing }).open).toBeNull();
  });

  it('are not left out while they are solved for, and the sum never is', () => {
    const ledger = ledgerOf(sodiumChloride, {
      ...choices,
      excluded: ['affinity:Cl:1', 'formation'],
      solveFor: 'affinity:Cl:1',
    });
    expect(lineOf(ledger, 'affinity:Cl:1').isExcluded).toBe(false);
    expect(ledger.formation.isExcluded).toBe(false);
    expect(valueOf(ledger, 'affinity:Cl:1')).toBeCloseTo(-348.6, 0);
  });
});

describe('what is missing', () => {
  it('is named with its reason, and another line to solve for is offered', () => {
    const ledger = ledgerOf(sodiumChloride, {});
    expect(lineOf(ledger, 'lattice').reason).toBe('No exponent for this ion.');
    expect(ledger.open?.keys).toEqual(['formation', 'lattice']);
    expect(ledger.open?.message).toContain('lattice enthalpy and formation enthalpy have no value');
    // The table knows the formation enthalpy: solving for the lattice line closes at once.
    expect(ledger.open?.solveInstead).toBe('lattice');
    expect(ledger.residualKjPerMol).toBeNull();
    expect(formationLevels(ledger)).toBeNull();
  });

  it('stops the running balance where it is met', () => {
    const gold = compositionOf('AuF', ['Au', 1, 1], ['F', -1, 1]);
    const ledger = ledgerOf(gold, { typedKjPerMol: { 'atomisation:Au': 368 } });
    const running = ledger.lines.map(({ runningKjPerMol }) => runningKjPerMol !== null);
    expect(running).toEqual([true, true, false, false, false]);
    expect(ledger.open?.message).toContain('type values for');
    expect(ledger.open?.solveInstead).toBeNull();
  });

  it('says that a measured lattice enthalpy is wanted but not given', () => {
    const ledger = ledgerOf(sodiumChloride, { lattice: 'measured' });
    expect(lineOf(ledger, 'lattice').reason).toContain('No measured lattice enthalpy');
  });
});

describe('the lattice line', () => {
  const account = { latticeEnergyKjPerMol: { low: -780, high: -750 }, reason: null };

  it('from the model is an energy of 0 K and brings its heat, ½ RT for each gas ion', () => {
    const ledger = formationLedger(sodiumChloride, modelOf({}), account);
    const heat = lineOf(ledger, 'heat');
    // RT = 2.479 kJ mol⁻¹ at 298.15 K; two ions: + RT.
    expect(heat.contributionKjPerMol?.low).toBeCloseTo(2.479, 3);
    expect(lineOf(ledger, 'lattice').quantity).toBe('energy_0');
    expect(middleOf(ledger.latticeEnthalpyKjPerMol!)).toBeCloseTo(-765 + 2.479, 3);
  });

  it('carries its range to the sum, and to whatever is solved', () => {
    const ledger = formationLedger(sodiumChloride, modelOf({}), account);
    const { low, high } = ledger.formation.valueKjPerMol!;
    expect(high - low).toBeCloseTo(30, 9);
    const affinity = lineOf(
      formationLedger(sodiumChloride, modelOf({ solveFor: 'affinity:Cl:1' }), account),
      'affinity:Cl:1',
    );
    expect(affinity.valueKjPerMol!.high - affinity.valueKjPerMol!.low).toBeCloseTo(30, 9);
    const fluorite = compositionOf('CaF2', ['Ca', 2, 1], ['F', -1, 2]);
    const perAtom = lineOf(
      formationLedger(fluorite, modelOf({ solveFor: 'affinity:F:1' }), account),
      'affinity:F:1',
    ).valueKjPerMol!;
    expect(perAtom.high - perAtom.low).toBeCloseTo(15, 9);
  });

  it('from measurement is an enthalpy and brings no heat', () => {
    const measured = {
      latticeEnergyKjPerMol: { low: -788, high: -786 },
      source: 'Heat of solution',
    };
    const model = modelOf({ lattice: 'measured' }, measured);
    const ledger = formationLedger(sodiumChloride, model, account);
    expect(ledger.lines.some(({ key }) => key === 'heat')).toBe(false);
    expect(lineOf(ledger, 'lattice')).toMatchObject({
      origin: 'measured',
      source: 'Heat of solution',
      quantity: 'enthalpy_298',
    });
  });

  it('solved is compared with the model as an enthalpy', () => {
    const ledger = formationLedger(sodiumChloride, modelOf({ solveFor: 'lattice' }), account);
    const { known } = lineOf(ledger, 'lattice');
    expect(known?.valueKjPerMol.low).toBeCloseTo(-780 + 2.479, 3);
  });
});

describe('a workspace’s own values', () => {
  it('replace those of the tables and say so', () => {
    const overrides: DataOverrides = new Map([
      ['affinity:Cl:1', { value: -350, note: 'Own photodetachment run' }],
    ]);
    const ledger = ledgerOf(sodiumChloride, { typedKjPerMol: { lattice: -787.2 } }, overrides);
    expect(lineOf(ledger, 'affinity:Cl:1')).toMatchObject({ origin: 'workspace', status: 'own' });
    expect(valueOf(ledger, 'affinity:Cl:1')).toBe(-350);
  });
});

describe('the levels', () => {
  it('run from the elements at zero to the crystal at the formation enthalpy', () => {
    const ledger = ledgerOf(sodiumChloride, { typedKjPerMol: { lattice: -787.2 } });
    const levels = formationLevels(ledger)!;
    expect(levels.map(({ stage }) => stage)).toEqual([
      'elements',
      'gas_atoms',
      'gas_cations',
      'gas_ions',
      'crystal',
    ]);
    expect(levels[0]?.energyKjPerMol).toEqual({ low: 0, high: 0 });
    expect(levels.at(-1)?.energyKjPerMol.low).toBeCloseTo(valueOf(ledger, 'formation'), 9);
    for (const [at, { rises }] of levels.entries()) {
      const next = levels[at + 1]?.energyKjPerMol;
      expect(rises.at(-1)?.toKjPerMol).toEqual(next);
    }
  });
});
