import { describe, expect, it } from 'vitest';

import { noOverrides } from '#common/chemistry/sourced';
import type { CheckKey, CheckResult } from '#common/physics/checks/check-result';
import { judge } from '#common/physics/checks/judge';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import { defaultEvaluationMethod } from '#common/schemas/cell';
import { defaultEnergeticModel, type EnergeticModel } from '#common/schemas/energetics';
import { evaluateCell } from '#server/electrostatics/evaluate-cell';
import {
  cubicCell,
  fluoriteCell,
  rockSaltCell,
  type TestSite,
} from '#tests/helpers/resolved-cells';

const nameless = { spaceGroupNumber: null, spaceGroupSymbol: null };

function judged(cell: ResolvedCell, model: EnergeticModel = defaultEnergeticModel) {
  return judge(cell, evaluateCell(cell, defaultEvaluationMethod, nameless), model, noOverrides);
}

function check(key: CheckKey, cell: ResolvedCell, model?: EnergeticModel): CheckResult {
  return judged(cell, model).checks.find((one) => one.key === key)!;
}

/** Caesium chloride's structure with any two ions. */
function eightfold(aA: number, cation: string, anion: string, chargeE = 1): ResolvedCell {
  return cubicCell(aA, [
    { element: cation, chargeE, at: [0, 0, 0], row: 0 },
    { element: anion, chargeE: -chargeE, at: [0.5, 0.5, 0.5], row: 1 },
  ]);
}

/** Rock salt with any two ions. */
function sixfold(aA: number, cation: string, anion: string, chargeE = 1): ResolvedCell {
  const faces = [
    [0, 0, 0],
    [0, 0.5, 0.5],
    [0.5, 0, 0.5],
    [0.5, 0.5, 0],
  ] as const;
  return cubicCell(aA, [
    ...faces.map((at): TestSite => ({ element: cation, chargeE, at, row: 0 })),
    ...faces.map(([x, y, z]): TestSite => ({
      element: anion,
      chargeE: -chargeE,
      at: [(x + 0.5) % 1, y, z],
      row: 1,
    })),
  ]);
}

/** Zinc blende with any two ions. */
function fourfold(aA: number, cation: string, anion: string, chargeE: number): ResolvedCell {
  const sites = sixfold(aA, cation, anion, chargeE).sites.map((site): TestSite => ({
    element: site.element,
    chargeE: site.chargeE,
    at:
      site.chargeE > 0
        ? site.fractional
        : [
            (site.fractional[0] + 0.75) % 1,
            (site.fractional[1] + 0.25) % 1,
            (site.fractional[2] + 0.25) % 1,
          ],
    row: site.definitionIndex,
  }));
  return cubicCell(aA, sites);
}

const withModel = (change: Partial<EnergeticModel>): EnergeticModel => ({
  ...defaultEnergeticModel,
  ...change,
});

describe('charge balance', () => {
  it('holds in magnesia, and fails with its sum where charges don’t balance', () => {
    expect(check('charge_balance', rockSaltCell())).toMatchObject({ word: 'holds', value: 0 });
    const charged = cubicCell(4, [
      { element: 'Ca', chargeE: 2, at: [0, 0, 0] },
      { element: 'F', chargeE: -1, at: [0.5, 0.5, 0.5] },
    ]);
    const { checks, verdict } = judge(charged, null, defaultEnergeticModel, noOverrides);
    expect(checks[0]).toMatchObject({ key: 'charge_balance', word: 'fails', value: 1 });
    expect(verdict).toEqual({ word: 'fails', holds: 0, doubtful: 0, fails: 1, notJudged: 11 });
  });
});

describe('closest contacts', () => {
  // Radii of Shannon (1976) for six neighbours: Mg²⁺ 0.72, O²⁻ 1.40 Å.
  it.each([
    [4.212, 'holds', 0.9934],
    [3.7, 'doubtful', 0.8726],
    [3.2, 'fails', 0.7547],
    [5.6, 'doubtful', 1.3208],
  ])('of magnesia with an edge of %s Å: %s', (aA, word, value) => {
    const found = check('contacts', rockSaltCell(aA));
    expect(found.word).toBe(word);
    expect(found.value).toBeCloseTo(value, 4);
  });

  it('can’t be judged without a radius', () => {
    expect(check('contacts', rockSaltCell(4.212, 1))).toMatchObject({
      word: 'not_judged',
      finding: 'The tables have no ionic radius for Mg⁺.',
    });
  });
});

describe('ions of like charge', () => {
  it('fail the contacts when they stand nearer than cation and anion do', () => {
    const paired = cubicCell(5, [
      { element: 'Ca', chargeE: 2, at: [0, 0, 0], row: 0 },
      { element: 'F', chargeE: -1, at: [0.5, 0.5, 0.4], row: 1 },
      { element: 'F', chargeE: -1, at: [0.5, 0.5, 0.6], row: 2 },
    ]);
    expect(check('contacts', paired)).toMatchObject({ word: 'fails' });
  });
});

describe('site potentials', () => {
  it('hold in fluorite', () => {
    expect(check('potentials', fluoriteCell())).toMatchObject({ word: 'holds', labels: [] });
  });

  it('fail for a cation among cations', () => {
    const crowded = cubicCell(6, [
      { element: 'Na', chargeE: 1, at: [0, 0, 0], row: 0 },
      { element: 'K', chargeE: 1, at: [0.2, 0, 0], row: 1 },
      { element: 'Cl', chargeE: -1, at: [0.5, 0.5, 0.5], row: 2 },
      { element: 'F', chargeE: -1, at: [0.5, 0, 0.5], row: 3 },
    ]);
    const found = check('potentials', crowded);
    expect(found.word).toBe('fails');
    expect(found.labels.length).toBeGreaterThan(0);
  });

  it('are doubtful where one ion is held far less than its like', () => {
    const uneven = cubicCell(12, [
      { element: 'Na', chargeE: 1, at: [0, 0, 0], row: 0 },
      { element: 'Cl', chargeE: -1, at: [0.13, 0, 0], row: 1 },
      { element: 'Na', chargeE: 1, at: [0.5, 0.5, 0.5], row: 2 },
      { element: 'Cl', chargeE: -1, at: [0.5, 0.5, 0.95], row: 3 },
    ]);
    expect(check('potentials', uneven).word).toBe('doubtful');
  });
});

describe('coordination and radius ratio', () => {
  // Limits √2 − 1 for six and √3 − 1 for eight neighbours: geometry of spheres that just touch.
  it('holds for six neighbours around Mg²⁺ among O²⁻', () => {
    const found = check('radius_ratio', rockSaltCell());
    expect(found.word).toBe('holds');
    expect(found.value).toBeCloseTo(0.72 / 1.4, 3);
  });

  it('is doubtful one class away: Cs⁺ among six Cl⁻', () => {
    expect(check('radius_ratio', sixfold(6.9, 'Cs', 'Cl')).word).toBe('doubtful');
  });

  it('fails two classes away: Be²⁺ among eight O²⁻', () => {
    expect(check('radius_ratio', eightfold(2.4, 'Be', 'O', 2)).word).toBe('fails');
  });

  // Radii of Shannon (1976): K⁺ 1.38, F⁻ 1.33 Å.
  it('is doubtful for potassium fluoride, whose cation is the larger', () => {
    expect(check('radius_ratio', sixfold(5.347, 'K', 'F'))).toMatchObject({
      word: 'doubtful',
      finding: 'K⁺ has 6 neighbours at a radius ratio of 1.038, which asks for 8 to 12.',
    });
  });

  it('can’t be judged without a radius', () => {
    expect(check('radius_ratio', rockSaltCell(4.212, 1)).word).toBe('not_judged');
  });
});

describe('electrostatic valence', () => {
  it('holds in magnesia, fluorite and zinc blende: six of 1/3, four of 1/4, four of 1/2', () => {
    const { value } = check('bond_strengths', rockSaltCell());
    expect(value).toBeCloseTo(0, 12);
    expect(check('bond_strengths', fluoriteCell()).word).toBe('holds');
    expect(check('bond_strengths', fourfold(5.41, 'Zn', 'S', 2)).word).toBe('holds');
  });

  // Calcium titanate's ions exchanged in the perovskite cell: strengths of 2/6 and 4/12 meet at oxygen.
  const perovskite = (inner: TestSite, outer: TestSite): ResolvedCell =>
    cubicCell(3.905, [
      { ...outer, at: [0.5, 0.5, 0.5], row: 0 },
      { ...inner, at: [0, 0, 0], row: 1 },
      { element: 'O', chargeE: -2, at: [0.5, 0, 0], row: 2 },
      { element: 'O', chargeE: -2, at: [0, 0.5, 0], row: 2 },
      { element: 'O', chargeE: -2, at: [0, 0, 0.5], row: 2 },
    ]);
  const at = [0, 0, 0] as const;

  it('holds in perovskite: two of 4/6 and four of 2/12 meet at oxygen', () => {
    const titanate = perovskite(
      { element: 'Ti', chargeE: 4, at },
      { element: 'Sr', chargeE: 2, at },
    );
    expect(check('bond_strengths', titanate).value).toBeCloseTo(0, 12);
  });

  // Nitride and fluoride in one lattice: both are reached by the same bonds.
  const mixed = (one: number, other: number): ResolvedCell =>
    cubicCell(4.2, [
      { element: 'Mg', chargeE: 2, at: [0, 0, 0], row: 0 },
      { element: 'Mg', chargeE: 2, at: [0.5, 0.5, 0], row: 0 },
      { element: 'O', chargeE: -2 + one, at: [0.5, 0, 0], row: 1 },
      { element: 'O', chargeE: -2 - other, at: [0, 0.5, 0], row: 2 },
    ]);

  it('is doubtful or fails where bonds and charges of anions disagree', () => {
    expect(check('bond_strengths', mixed(0.4, 0.4)).word).toBe('doubtful');
    expect(check('bond_strengths', mixed(1, 1)).word).toBe('fails');
  });
});

describe('bond-valence sums', () => {
  it('hold in magnesia: 6 exp((1.693 − 2.106)/0.37) = 1.965 v.u. (R₀ of Brown & Altermatt 1985)', () => {
    const found = check('bond_valence', rockSaltCell());
    expect(found.word).toBe('holds');
    expect(found.value).toBeCloseTo(2 - 6 * Math.exp((1.693 - 2.106) / 0.37), 1);
  });

  it('are doubtful in a slightly stretched, and fail in a much stretched cell', () => {
    expect(check('bond_valence', rockSaltCell(4.27)).word).toBe('doubtful');
    expect(check('bond_valence', rockSaltCell(4.5)).word).toBe('fails');
  });

  it('can’t be judged without parameters', () => {
    expect(check('bond_valence', rockSaltCell(4.212, 1)).word).toBe('not_judged');
  });
});

describe('Born exponent', () => {
  const typed = (low: number, high = low) =>
    withModel({
      repulsion: { kind: 'born_lande', exponent: { from: 'typed', exponent: { low, high } } },
    });

  it('holds within 5 to 12 and is doubtful outside', () => {
    expect(check('exponent', rockSaltCell()).word).toBe('holds');
    expect(check('exponent', rockSaltCell(), typed(4, 8)).word).toBe('doubtful');
  });

  it('can’t be judged where the model has none', () => {
    const mayer = withModel({
      repulsion: { kind: 'born_mayer', hardnessA: { low: 0.345, high: 0.345 } },
    });
    expect(check('exponent', rockSaltCell(), mayer).word).toBe('not_judged');
  });
});

describe('spacing at rest', () => {
  const table = (prefactorEv: number) =>
    withModel({
      repulsion: {
        kind: 'pair_table',
        cutoffA: 8,
        pairs: [
          {
            ...{ speciesA: 'Mg+2', speciesB: 'O-2', prefactorEv },
            ...{ hardnessA: 0.3, dispersionEvA6: 0 },
          },
        ],
      },
    });

  it('can’t be judged for a model that is fitted to the cell', () => {
    expect(check('rest', rockSaltCell()).word).toBe('not_judged');
  });

  it.each([
    [1260, 'holds'],
    [1500, 'doubtful'],
    [2600, 'fails'],
  ])('under a pair table of A = %s eV: %s', (prefactorEv, word) => {
    expect(check('rest', rockSaltCell(), table(prefactorEv)).word).toBe(word);
  });
});

describe('lattice energy', () => {
  const measured = (kjPerMol: number) =>
    withModel({
      measured: {
        ...defaultEnergeticModel.measured,
        latticeEnergyKjPerMol: { low: kjPerMol, high: kjPerMol },
      },
    });

  it('holds in magnesia against Kapustinskii’s −3799 kJ mol⁻¹', () => {
    expect(check('lattice_energy', rockSaltCell())).toMatchObject({ word: 'holds' });
  });

  it('is held against what was measured where that is given', () => {
    expect(check('lattice_energy', rockSaltCell(), measured(-3400)).word).toBe('doubtful');
    expect(check('lattice_energy', rockSaltCell(), measured(-2000)).word).toBe('fails');
  });

  it('can’t be judged where nothing binds', () => {
    const found = check(
      'lattice_energy',
      rockSaltCell(),
      withModel({
        repulsion: {
          kind: 'pair_table',
          cutoffA: 8,
          pairs: [
            {
              ...{ speciesA: 'Mg+2', speciesB: 'Mg+2', prefactorEv: 0 },
              ...{ hardnessA: 0.3, dispersionEvA6: 0 },
            },
          ],
        },
      }),
    );
    expect(found.word).toBe('not_judged');
  });
});

describe('formation enthalpy', () => {
  const formation = (change: Partial<EnergeticModel['formation']>) =>
    withModel({ formation: { ...defaultEnergeticModel.formation, ...change } });

  it('holds for lithium fluoride', () => {
    expect(check('formation', sixfold(4.028, 'Li', 'F')).word).toBe('holds');
  });

  it('fails where forming the compound takes energy, and is doubtful where the range spans zero', () => {
    const lattice = (value: number) => formation({ typedKjPerMol: { lattice: value } });
    expect(check('formation', sixfold(4.028, 'Li', 'F'), lattice(-400)).word).toBe('fails');
    const wide = withModel({
      measured: {
        ...defaultEnergeticModel.measured,
        latticeEnergyKjPerMol: { low: -480, high: -380 },
      },
      formation: { ...defaultEnergeticModel.formation, lattice: 'measured' },
    });
    expect(check('formation', sixfold(4.028, 'Li', 'F'), wide).word).toBe('doubtful');
  });

  it('can’t be judged while lines are left out', () => {
    const partial = formation({ excluded: ['atomisation:Li'] });
    expect(check('formation', sixfold(4.028, 'Li', 'F'), partial).word).toBe('not_judged');
  });
});

describe('what was not computed', () => {
  it('is in the list, and does not colour the verdict', () => {
    const { checks, verdict } = judged(rockSaltCell());
    const later = checks.filter(({ key }) => key === 'elastic_stability' || key === 'rivals');
    expect(later.map(({ word }) => word)).toEqual(['not_judged', 'not_judged']);
    expect(verdict).toMatchObject({ word: 'holds', fails: 0, doubtful: 0 });
    expect(checks).toHaveLength(12);
  });
});
