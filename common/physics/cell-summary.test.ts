import { describe, expect, it } from 'vitest';

import { chargeSumE, shortestContacts, summariseCell } from '#common/physics/cell-summary';
import { resolveCell } from '#common/physics/resolve-cell';
import type { CellDefinition } from '#common/schemas/cell';
import { groups } from '#tests/helpers/group-closure';

function resolve(group: keyof typeof groups, lattice: string, ...sites: readonly string[]) {
  const [a, b, c, alpha, beta, gamma] = lattice.split(' ');
  const definition: CellDefinition = {
    lattice: { a: a!, b: b!, c: c!, alpha: alpha!, beta: beta!, gamma: gamma! },
    symmetry: { kind: 'operations', operations: [] },
    parameters: [],
    sites: sites.map((text) => {
      const [label, element, charge, x, y, z] = text.split(' ');
      const at = { x: x!, y: y!, z: z! };
      return { label: label!, element: element!, charge: charge!, ...at, occupancy: '1' };
    }),
  };
  const { cell, problems } = resolveCell(definition, { operations: groups[group], setting: null });
  expect(problems).toEqual([]);
  return cell!;
}

const magnesia = resolve(
  'Fm-3m',
  '4.212 4.212 4.212 90 90 90',
  'Mg1 Mg 2 0 0 0',
  'O1 O -2 1/2 1/2 1/2',
);

describe('summariseCell', () => {
  it('says what a cell is at a glance', () => {
    const summary = summariseCell(magnesia);
    expect(summary).toMatchObject({ formula: 'MgO', formulaUnitsPerCell: 4, chargeSumE: 0 });
    expect(summary.volumeA3).toBeCloseTo(74.725, 3);
    expect(summary.contacts.map(({ labelA, labelB }) => `${labelA}–${labelB}`)).toEqual([
      'Mg1–O1',
      'Mg1–Mg1',
      'O1–O1',
    ]);
    const [unlike, like, other] = summary.contacts.map(({ distanceA }) => distanceA);
    expect(unlike).toBeCloseTo(2.106, 12);
    expect(like).toBeCloseTo(4.212 / Math.SQRT2, 12);
    expect(other).toBeCloseTo(4.212 / Math.SQRT2, 12);
  });

  // Calculated densities as handbooks print them for these edges (from memory, three digits).
  it.each([
    ['periclase', magnesia, 3.58],
    [
      'halite',
      resolve('Fm-3m', '5.6402 5.6402 5.6402 90 90 90', 'Na1 Na 1 0 0 0', 'Cl1 Cl -1 1/2 0 0'),
      2.16,
    ],
    [
      'fluorite',
      resolve('Fm-3m', '5.463 5.463 5.463 90 90 90', 'Ca1 Ca 2 0 0 0', 'F1 F -1 1/4 1/4 1/4'),
      3.18,
    ],
    [
      'corundum',
      resolve(
        'R-3c:H',
        '4.759 4.759 12.991 90 90 120',
        'Al1 Al 3 0 0 0.3522',
        'O1 O -2 0.3063 0 1/4',
      ),
      3.99,
    ],
    [
      'rutile',
      resolve('P42/mnm', '4.594 4.594 2.959 90 90 90', 'Ti1 Ti 4 0 0 0', 'O1 O -2 0.3053 0.3053 0'),
      4.25,
    ],
  ] as const)('gives the density of %s', (_, cell, density) => {
    expect(Math.abs(summariseCell(cell).densityGPerCm3 - density)).toBeLessThan(0.01);
  });

  it('finds the two bond lengths of rutile', () => {
    // Ti–O 1.949 (4×) and 1.980 Å (2×): Abrahams & Bernstein (1971), from memory; the shorter counts.
    const rutile = resolve(
      'P42/mnm',
      '4.594 4.594 2.959 90 90 90',
      'Ti1 Ti 4 0 0 0',
      'O1 O -2 0.3053 0.3053 0',
    );
    expect(shortestContacts(rutile, 1)[0]).toMatchObject({ labelA: 'Ti1', labelB: 'O1' });
    expect(shortestContacts(rutile, 1)[0]!.distanceA).toBeCloseTo(1.949, 2);
  });
});

describe('shortestContacts', () => {
  it('counts an ion and its own image in the next cell', () => {
    const lone = resolve('P1', '3 8 9 90 90 90', 'Na1 Na 1 0.1 0.2 0.3');
    expect(shortestContacts(lone)).toEqual([{ labelA: 'Na1', labelB: 'Na1', distanceA: 3 }]);
  });

  it('looks over the faces of a skewed cell', () => {
    const skewed = resolve(
      'P1',
      '5 5 5 50 60 70',
      'Na1 Na 1 0.02 0.02 0.02',
      'Cl1 Cl -1 0.98 0.98 0.5',
    );
    const { vectorsA, sites } = skewed;
    let nearest = Infinity;
    for (let n = 0; n < 343; n += 1) {
      const image = [n % 7, Math.floor(n / 7) % 7, Math.floor(n / 49)].map((i) => i - 3);
      const apart = image.map((i, k) => sites[1]!.fractional[k]! + i - sites[0]!.fractional[k]!);
      const r = [0, 1, 2].map((k) =>
        apart.reduce((sum, f, axis) => sum + f * vectorsA[3 * axis + k]!, 0),
      );
      nearest = Math.min(nearest, Math.hypot(...r));
    }
    const contact = shortestContacts(skewed, 9).find(({ labelB }) => labelB === 'Cl1');
    expect(contact?.distanceA).toBeCloseTo(nearest, 10);
  });
});

describe('chargeSumE', () => {
  it('takes the rounding of thirds for nothing', () => {
    const cell = resolve(
      'P1',
      '9 9 9 90 90 90',
      'A Fe 1/3 0 0 0',
      'B Fe 1/3 1/2 0 0',
      'C Fe 1/3 0 1/2 0',
      'D O -1 1/2 1/2 1/2',
    );
    expect(chargeSumE(cell)).toBe(0);
  });

  it('keeps a small excess', () => {
    const cell = resolve('P1', '9 9 9 90 90 90', 'A Na 1.00001 0 0 0', 'B Cl -1 1/2 0 0');
    expect(chargeSumE(cell)).toBeCloseTo(1e-5, 12);
  });
});
