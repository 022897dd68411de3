import { describe, expect, it } from 'vitest';

import { Problem } from '#common/errors/problem';
import type { ResolvedSite } from '#common/physics/resolved-cell';
import { applyOperation } from '#common/physics/symmetry-operation';
import { elasticResult, relaxationResult, vibrationsResult } from '#common/schemas/dynamics';
import type { PairPotential } from '#common/schemas/energetics';
import { operationsOf } from '#server/symmetry/space-groups';
import { resolvedCell } from '#tests/helpers/resolved-cells';

import { elasticOfCell } from './elastic-of-cell.js';
import type { DynamicsSubject } from './from-cell.js';
import { relaxationOfCell } from './relaxation-of-cell.js';
import { vibrationsOfCell } from './vibrations-of-cell.js';

const cubic = (aA: number) => ({
  aA,
  bA: aA,
  cA: aA,
  alphaDeg: 90,
  betaDeg: 90,
  gammaDeg: 90,
});

const faces = [
  [0, 0, 0],
  [0, 0.5, 0.5],
  [0.5, 0, 0.5],
  [0.5, 0.5, 0],
] as const;

function pair(
  speciesA: string,
  speciesB: string,
  prefactorEv: number,
  hardnessA: number,
): PairPotential {
  return { speciesA, speciesB, prefactorEv, hardnessA, dispersionEvA6: 0 };
}

/** Sodium chloride in its cubic cell of eight ions; the constants are made up. */
function sodiumChloride(aA: number, pairs: readonly PairPotential[]): DynamicsSubject {
  const sites = [
    ...faces.map((at) => ({ element: 'Na', chargeE: 1, row: 0, at })),
    ...faces.map(([x, y, z]) => ({
      element: 'Cl',
      chargeE: -1,
      row: 1,
      at: [(x + 0.5) % 1, y, z] as const,
    })),
  ];
  return {
    cell: resolvedCell(cubic(aA), sites),
    potentials: { pairs, cutoffA: 12, derivation: 'typed by hand' },
    // F m −3 m, Hall number 523.
    operations: operationsOf(523),
  };
}

const pairs = [pair('Na+1', 'Cl-1', 1200, 0.32), pair('K+1', 'Cl-1', 1900, 0.33)];
const massOf = (element: string) => ({ Na: 22.99, Cl: 35.45 })[element]!;

describe('sodium chloride', () => {
  const subject = sodiumChloride(5.6, pairs);

  it('relaxes to a larger cube, ions on their places', () => {
    const told: number[] = [];
    const result = relaxationResult.parse(
      relaxationOfCell(subject, { onStep: ({ step }) => told.push(step) }),
    );
    expect(result.ended).toBe('converged');
    expect(told).toEqual(result.steps.map(({ step }) => step));
    expect(result.after.aA).toBeGreaterThan(5.6);
    expect(result.after.bA).toBeCloseTo(result.after.aA, 12);
    expect(result.after.gammaDeg).toBeCloseTo(90, 10);
    expect(result.after.energyEvPerFormulaUnit).toBeCloseTo(result.after.energyEvPerCell / 4, 12);
    expect(result.after.energyEvPerCell).toBeLessThan(result.before.energyEvPerCell);
    expect(result.before.volumeA3).toBeCloseTo(5.6 ** 3, 9);
    expect(result.operationCount).toBe(192);
    expect(result.symmetryDeviationA).toBeLessThanOrEqual(1e-12);
    for (const { movedA, fractionalBefore, fractionalAfter } of result.sites) {
      expect(movedA).toBeLessThanOrEqual(1e-12);
      expect(fractionalAfter).toEqual(fractionalBefore);
    }
    expect(result.model.derivation).toBe('typed by hand');
  });

  it('shrinks under pressure', () => {
    const free = relaxationOfCell(subject);
    const pressed = relaxationOfCell(subject, { pressureGpa: 10 });
    expect(pressed.pressureGpa).toBe(10);
    expect(pressed.after.volumeA3).toBeLessThan(free.after.volumeA3);
  });

  it('gives elastic constants at rest, cubic and stable', () => {
    const result = elasticResult.parse(
      elasticOfCell(subject, { system: 'cubic', isRelaxedFirst: true }),
    );
    expect([result.geometry, result.relaxationEnded]).toEqual(['relaxed', 'converged']);
    expect(result.isAtRest).toBe(true);
    expect(result.stability.isStable).toBe(true);
    expect(result.stability.criteria).toHaveLength(3);
    const [first] = result.stiffnessGpa;
    const c44 = result.stiffnessGpa[3]![3]!;
    expect(first![1]).toBeCloseTo(c44, 6);
    expect(result.averages!.zenerRatio).toBeCloseTo((2 * c44) / (first![0]! - first![1]!), 10);
    expect(result.averages!.bulkHillGpa).toBeCloseTo((first![0]! + 2 * first![1]!) / 3, 8);
  });

  it('as given is said to be under stress', () => {
    const result = elasticOfCell(subject, { system: 'cubic', isRelaxedFirst: false });
    expect([result.geometry, result.relaxationEnded]).toEqual(['as_given', null]);
    expect(result.isAtRest).toBe(false);
    expect(result.pressureGpa).toBeGreaterThan(0);
  });

  it('has the six modes of its primitive cell', () => {
    const result = vibrationsResult.parse(
      vibrationsOfCell(subject, { massOf, isRelaxedFirst: true }),
    );
    expect(result.geometry).toBe('relaxed');
    expect(result.transverse).toHaveLength(6);
    expect(result.transverse.map(({ level }) => level)).toEqual([0, 0, 0, 1, 1, 1]);
    expect(result.imaginaryCount).toBe(0);
    expect(result.longitudinal.map(({ name }) => name)).toEqual(['a*', 'b*', 'c*']);
    expect(result.longitudinal[2]!.direction).toEqual([0, 0, 1]);
    expect(result.sites.map(({ massU }) => massU)).toEqual(
      [22.99, 35.45].flatMap((mass) => [mass, mass, mass, mass]),
    );
    for (const { displacements } of result.transverse) {
      expect(displacements).toHaveLength(8);
      displacements[0]!.forEach((x, axis) => {
        expect(displacements[1]![axis]).toBeCloseTo(x, 5);
      });
    }
  });

  it('without repulsion falls together, and results say so', () => {
    const bare = sodiumChloride(5.6, []);
    expect(relaxationResult.parse(relaxationOfCell(bare)).ended).toBe('collapsed');
    const result = elasticResult.parse(
      elasticOfCell(bare, { system: 'cubic', isRelaxedFirst: true }),
    );
    expect([result.geometry, result.relaxationEnded]).toEqual(['as_given', 'collapsed']);
    expect(result.stability.isStable).toBe(false);
    expect(result.averages).toBeNull();
    const stop = relaxationOfCell(subject, { shouldStop: () => true });
    expect(stop.ended).toBe('stopped');
  });
});

describe('corundum', () => {
  // R −3 c on hexagonal axes, Hall number 460; constants made up.
  const operations = operationsOf(460);
  const orbit = (x: readonly [number, number, number]) => {
    const places: [number, number, number][] = [];
    for (const operation of operations) {
      const at = applyOperation(operation, x);
      const isNew = places.every((place) =>
        place.some((value, k) => {
          const off = value - at[k]!;
          return Math.abs(off - Math.round(off)) > 1e-6;
        }),
      );
      if (isNew) {
        places.push(at);
      }
    }
    return places;
  };
  const subject: DynamicsSubject = {
    cell: resolvedCell({ ...cubic(4.76), cA: 12.99, gammaDeg: 120 }, [
      ...orbit([0, 0, 0.352]).map((at) => ({ element: 'Al', chargeE: 3, row: 0, at })),
      ...orbit([0.306, 0, 0.25]).map((at) => ({ element: 'O', chargeE: -2, row: 1, at })),
    ]),
    potentials: {
      pairs: [pair('Al+3', 'O-2', 1500, 0.3), pair('O-2', 'O-2', 20000, 0.15)],
      cutoffA: 12,
      derivation: 'typed by hand',
    },
    operations,
  };

  it('keeps its group and has the elastic constants of a trigonal crystal', () => {
    const relaxed = relaxationResult.parse(relaxationOfCell(subject));
    expect(relaxed.ended).toBe('converged');
    expect(relaxed.sites).toHaveLength(30);
    expect(relaxed.after.gammaDeg).toBeCloseTo(120, 10);
    expect(relaxed.symmetryDeviationA).toBeLessThanOrEqual(1e-12);
    const { stiffnessGpa: c, stability } = elasticOfCell(subject, {
      system: 'trigonal',
      isRelaxedFirst: true,
    });
    // The shape of class −3m with a along x: International Tables D, table 1.1.4.9 (from memory).
    const at = (i: number, j: number) => c[i - 1]![j - 1]!;
    expect(Math.abs(at(1, 4))).toBeGreaterThan(1);
    expect(at(2, 4)).toBeCloseTo(-at(1, 4), 6);
    expect(at(5, 6)).toBeCloseTo(at(1, 4), 6);
    expect(at(6, 6)).toBeCloseTo((at(1, 1) - at(1, 2)) / 2, 6);
    expect(Math.abs(at(1, 5))).toBeLessThanOrEqual(1e-6);
    expect(stability.criteria).toHaveLength(4);
    expect(stability.isStable).toBe(true);
  });

  it('has 30 modes, of which two polar levels rise along c', () => {
    const masses = { Al: 26.98, O: 16 };
    const { transverse, longitudinal } = vibrationsOfCell(subject, {
      massOf: (element) => masses[element as 'Al' | 'O'],
      isRelaxedFirst: true,
    });
    expect(transverse).toHaveLength(30);
    // Γ = 2A₁g + 3A₂g + 5E_g + 2A₁u + 3A₂u + 5E_u, one A₂u and one E_u of them acoustic
    // (S. P. S. Porto, R. S. Krishnan, J. Chem. Phys. 47 (1967) 1009, from memory).
    const levels = new Map<number, number>();
    transverse
      .filter(({ isAcoustic }) => !isAcoustic)
      .forEach(({ level }) => levels.set(level, (levels.get(level) ?? 0) + 1));
    const sizes = [...levels.values()];
    expect(sizes.filter((size) => size === 1)).toHaveLength(2 + 3 + 2 + 2);
    expect(sizes.filter((size) => size === 2)).toHaveLength(5 + 4);
    const along = longitudinal.find(({ name }) => name === 'c*')!.modes;
    const total = (modes: typeof along) => modes.reduce((sum, m) => sum + m.frequencyThz ** 2, 0);
    expect(total(along)).toBeGreaterThan(total(transverse));
  });
});

describe('a mixed site', () => {
  it('has the mean mass of its ions, counting empty places as nothing', () => {
    const sites = [
      { element: 'Na', chargeE: 2, occupancy: 0.5, at: [0, 0, 0] as const },
      { element: 'Cl', chargeE: -1, at: [0.5, 0.5, 0.5] as const },
    ];
    const result = vibrationsOfCell(
      {
        cell: resolvedCell(cubic(3.5), sites),
        potentials: { pairs: [], cutoffA: 8, derivation: 'none' },
        operations: operationsOf(1),
      },
      { massOf, isRelaxedFirst: false },
    );
    expect(result.sites[0]!.massU).toBeCloseTo(22.99 / 2, 12);
  });
});

describe('what a pair model can’t be applied to', () => {
  const sound = sodiumChloride(5.6, pairs);
  const withSites = (change: (site: ResolvedSite) => ResolvedSite | null): DynamicsSubject => ({
    ...sound,
    cell: {
      ...sound.cell,
      sites: sound.cell.sites.flatMap((site) => change(site) ?? []),
    },
  });

  it.each<[string, DynamicsSubject, string, string]>([
    ['no sites', withSites(() => null), 'cell.no_sites', 'sites'],
    [
      'a charged cell',
      withSites((site) => ({ ...site, chargeE: site.chargeE + 1 })),
      'cell.not_neutral',
      'sites',
    ],
    [
      'ions on one place',
      withSites((site) => ({ ...site, fractional: [0.1, 0.2, 0.3] })),
      'cell.coincident_sites',
      'sites.0.x',
    ],
    [
      'a pair given twice',
      {
        ...sound,
        potentials: { ...sound.potentials, pairs: [...pairs, pair('Cl-1', 'Na+1', 1, 1)] },
      },
      'request.invalid',
      'model.repulsion.pairs.2.speciesB',
    ],
    [
      'too large a cell',
      {
        ...sound,
        cell: { ...sound.cell, sites: new Array<ResolvedSite>(257).fill(sound.cell.sites[0]!) },
      },
      'cell.too_many_sites',
      'sites',
    ],
  ])('%s', (_name, subject, code, field) => {
    const compute = [
      () => relaxationOfCell(subject),
      () => elasticOfCell(subject, { system: 'cubic', isRelaxedFirst: false }),
      () => vibrationsOfCell(subject, { massOf, isRelaxedFirst: false }),
    ];
    for (const call of compute) {
      let problem: unknown = null;
      try {
        call();
      } catch (error) {
        problem = error;
      }
      expect(problem).toBeInstanceOf(Problem);
      expect(problem).toMatchObject({ code, details: { fields: [{ code, field }] } });
    }
  });
});
