import { describe, expect, it } from 'vitest';

import type { FieldProblem } from '#common/errors/problem';
import { resolveCell } from '#common/physics/resolve-cell';
import { formatOperation } from '#common/physics/symmetry-operation';
import type { CellDefinition, CellSite } from '#common/schemas/cell';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';
import { groups } from '#tests/helpers/group-closure';

const cubicSetting: SpaceGroupSetting = {
  hallNumber: 523,
  number: 225,
  symbol: 'F m -3 m',
  hallSymbol: '-F 4 2 3',
  setting: '',
  crystalSystem: 'cubic',
  hexagonalAxes: false,
  uniqueAxis: null,
  isStandard: true,
};

function site(text: string, given: Partial<CellSite> = {}): CellSite {
  const [label, element, charge, x, y, z] = text.split(' ') as [
    string,
    string,
    string,
    string,
    string,
    string,
  ];
  return { label, element, charge, x, y, z, occupancy: '1', ...given };
}

function cubicCell(
  sites: readonly CellSite[],
  given: Partial<CellDefinition> = {},
): CellDefinition {
  return {
    lattice: { a: '4.212', b: '4.212', c: '4.212', alpha: '90', beta: '90', gamma: '90' },
    symmetry: { kind: 'setting', hallNumber: 523 },
    parameters: [],
    sites: [...sites],
    ...given,
  };
}

const magnesia = [site('Mg1 Mg 2 0 0 0'), site('O1 O -2 1/2 1/2 1/2')];

function resolve(definition: CellDefinition, group: keyof typeof groups = 'Fm-3m') {
  const setting = group === 'Fm-3m' ? cubicSetting : null;
  return resolveCell(definition, { operations: groups[group], setting });
}

function problemsOf(definition: CellDefinition, group?: keyof typeof groups): FieldProblem[] {
  const { cell, problems } = resolve(definition, group);
  expect(cell === null).toBe(problems.length > 0);
  return problems;
}

const fieldsOf = (problems: readonly FieldProblem[]) =>
  problems.map(({ code, field }) => `${code} ${field}`);

describe('resolveCell', () => {
  it('gives a cell in numbers', () => {
    const { cell, problems } = resolve(cubicCell(magnesia));
    expect(problems).toEqual([]);
    expect(cell).toMatchObject({
      lattice: { aA: 4.212, bA: 4.212, cA: 4.212, alphaDeg: 90, betaDeg: 90, gammaDeg: 90 },
      operationCount: 192,
      hasPolarAxis: false,
      parameters: {},
    });
    expect(cell!.volumeA3).toBeCloseTo(4.212 ** 3, 10);
    expect(cell!.sites.length).toBe(8);
    expect(cell!.sites[0]).toEqual({
      definitionIndex: 0,
      label: 'Mg1',
      copy: 0,
      fractional: [0, 0, 0],
      chargeE: 2,
      element: 'Mg',
      components: [{ element: 'Mg', chargeE: 2, occupancy: 1 }],
      speciesKey: 'Mg+2',
    });
    expect(cell!.sites.map(({ copy }) => copy)).toEqual([0, 1, 2, 3, 0, 1, 2, 3]);
  });

  it('evaluates parameters everywhere', () => {
    const u = 0.3053;
    const rutile: CellDefinition = {
      lattice: { a: 'edge', b: 'edge', c: 'edge*r', alpha: '90', beta: '90', gamma: '90' },
      symmetry: { kind: 'operations', operations: ['x,y,z'] },
      parameters: [
        { name: 'u', expression: String(u) },
        { name: 'edge', expression: '4.594' },
        { name: 'r', expression: '2.959/edge' },
        { name: 'q', expression: '4' },
      ],
      sites: [site('Ti1 ti q 0 0 0'), site('O1 O -q/2 u u 0')],
    };
    const { cell } = resolve(rutile, 'P42/mnm');
    expect(cell!.parameters).toEqual({ u, edge: 4.594, r: 2.959 / 4.594, q: 4 });
    expect(cell!.sites.map(({ speciesKey }) => speciesKey)).toEqual(
      'Ti+4 Ti+4 O-2 O-2 O-2 O-2'.split(' '),
    );
    expect(cell!.lattice.cA).toBeCloseTo(2.959, 12);
  });

  it.each([
    ['P1', true],
    ['P2', true],
    ['Pm', true],
    ['P63mc', true],
    ['P-1', false],
    ['P222', false],
    ['P-43m', false],
    ['Fm-3m', false],
  ] as const)('knows whether %s leaves a polar axis', (group, isPolar) => {
    const gamma = group === 'P63mc' ? '120' : '90';
    const lattice = { a: '9', b: '9', c: '9', alpha: '90', beta: '90', gamma };
    const definition = cubicCell([site('Na1 Na 1 0.1 0.2 0.3')], { lattice });
    expect(resolve(definition, group).cell?.hasPolarAxis).toBe(isPolar);
  });

  it('names kinds of ions', () => {
    const sites = [
      site('A Mg 2 0.1 0 0'),
      site('B O -2 0.2 0 0'),
      site('C Xe 0 0.3 0 0'),
      site('D Ti 3.5 0.4 0 0'),
      site('E Fe 8/3 0.5 0 0'),
      site('F Li 1 0.6 0 0', { occupancy: '0.5' }),
      site('G D 1 0.7 0 0'),
    ];
    const { cell } = resolve(cubicCell(sites), 'P1');
    expect(cell!.sites.map(({ speciesKey }) => speciesKey)).toEqual(
      'Mg+2 O-2 Xe0 Ti+3.5 Fe+2.666667 Li+1:0.5 D+1'.split(' '),
    );
    expect(cell!.sites.map(({ chargeE }) => chargeE)).toEqual([2, -2, 0, 3.5, 8 / 3, 0.5, 1]);
  });
});

describe('fields at fault', () => {
  it.each<[string, Partial<CellSite>, string]>([
    ['an expression', { x: '1/' }, 'cell.expression sites.1.x'],
    ['an unknown name', { z: 'w' }, 'cell.expression sites.1.z'],
    ['a coordinate', { y: '1e6' }, 'cell.coordinate sites.1.y'],
    ['a charge', { charge: '10' }, 'cell.charge sites.1.charge'],
    ['a charge below', { charge: '-9.5' }, 'cell.charge sites.1.charge'],
    ['an empty charge', { charge: '' }, 'cell.expression sites.1.charge'],
    ['an occupancy of zero', { occupancy: '0' }, 'cell.occupancy sites.1.occupancy'],
    ['an occupancy above one', { occupancy: '1.01' }, 'cell.occupancy sites.1.occupancy'],
    ['an element', { element: 'Qq' }, 'cell.element sites.1.element'],
    ['no element', { element: '' }, 'cell.element sites.1.element'],
    ['no label', { label: ' ' }, 'cell.label sites.1.label'],
    ['a label twice', { label: 'Mg1 ' }, 'cell.label sites.1.label'],
  ])('name %s', (_, change, expected) => {
    const sites = [magnesia[0]!, { ...magnesia[1]!, ...change }];
    expect(fieldsOf(problemsOf(cubicCell(sites)))).toEqual([expected]);
  });

  it('are all told at once', () => {
    const definition = cubicCell([site('Mg1 Qq 12 q 0 0'), site('Mg1 O -2 0 0 0')], {
      parameters: [{ name: 'u', expression: '' }],
      lattice: { a: '0', b: '4', c: '4', alpha: '90', beta: '90', gamma: '190' },
    });
    expect(fieldsOf(problemsOf(definition))).toEqual([
      'cell.expression parameters.0.expression',
      'cell.length lattice.a',
      'cell.angle lattice.gamma',
      'cell.element sites.0.element',
      'cell.charge sites.0.charge',
      'cell.expression sites.0.x',
      'cell.label sites.1.label',
    ]);
  });

  it('say that a parameter is at fault where it is used', () => {
    const [, problem] = problemsOf(
      cubicCell([site('Mg1 Mg 2 u 0 0')], { parameters: [{ name: 'u', expression: '1/0' }] }),
    );
    expect(problem).toEqual({
      code: 'cell.expression',
      field: 'sites.0.x',
      message: 'u has no value yet: mend that parameter first.',
    });
  });

  it('ask for a site', () => {
    expect(fieldsOf(problemsOf(cubicCell([])))).toEqual(['cell.no_sites sites']);
  });
});

describe('edges and angles', () => {
  const withLattice = (texts: string, group: keyof typeof groups = 'P1') => {
    const [a, b, c, alpha, beta, gamma] = texts.split(' ') as [
      string,
      string,
      string,
      string,
      string,
      string,
    ];
    const lattice = { a, b, c, alpha, beta, gamma };
    return problemsOf(cubicCell([site('Na1 Na 1 0.1 0.2 0.3')], { lattice }), group);
  };

  it.each([
    ['0 4 4 90 90 90', 'cell.length lattice.a'],
    ['4 -4 4 90 90 90', 'cell.length lattice.b'],
    ['4 4 1e12 90 90 90', 'cell.length lattice.c'],
    ['4 4 4 0 90 90', 'cell.angle lattice.alpha'],
    ['4 4 4 90 180 90', 'cell.angle lattice.beta'],
    ['4 4 4 120 120 120', 'cell.angle_sum lattice.alpha'],
    ['4 4 4 130 120 119', 'cell.angle_sum lattice.alpha'],
    ['4 4 4 40 40 90', 'cell.angle_sum lattice.alpha'],
    ['4 4 4 60 60 120', 'cell.angle_sum lattice.alpha'],
    ['4 4 4 60 60 119.99999999', 'cell.zero_volume lattice.alpha'],
  ])('%s are refused', (texts, expected) => {
    expect(fieldsOf(withLattice(texts))).toEqual([expected]);
  });

  it.each(['4 4 4 60 60 60', '4 5 6 80 100 119', '4 4 4 109.4712 109.4712 109.4712'])(
    '%s close a cell',
    (texts) => {
      expect(withLattice(texts)).toEqual([]);
    },
  );

  it('must fit the crystal system, naming what must equal what', () => {
    expect(withLattice('4 4.01 4 90 91 90', 'Fm-3m')).toEqual([
      {
        code: 'cell.system_constraint',
        field: 'lattice.b',
        message: 'F m -3 m is cubic: b must equal a. Change it, or choose another space group.',
      },
      {
        code: 'cell.system_constraint',
        field: 'lattice.beta',
        message: 'F m -3 m is cubic: β must equal 90°. Change it, or choose another space group.',
      },
    ]);
  });

  it('must fit operations given one by one', () => {
    expect(fieldsOf(withLattice('4 4 5 90 90 90', 'Pm-3m'))).toEqual([
      'cell.system_constraint symmetry',
    ]);
  });

  it('may stray by a measuring error from operations that are a tabulated setting', () => {
    const fieldsWith = (b: string) => {
      const cell = cubicCell(magnesia, {
        symmetry: { kind: 'operations', operations: groups['Fm-3m'].map(formatOperation) },
      });
      const stretched = { ...cell, lattice: { ...cell.lattice, b } };
      const symmetry = { operations: groups['Fm-3m'], setting: cubicSetting };
      return fieldsOf(resolveCell(stretched, symmetry).problems);
    };
    expect(fieldsWith('4.2124')).toEqual([]);
    expect(fieldsWith('4.23')).toEqual(['cell.system_constraint symmetry']);
  });

  it('are not blamed for operations that are incomplete', () => {
    const operations = groups['Pm-3m'].slice(0, 47);
    const { cell, problems } = resolveCell(cubicCell(magnesia), { operations, setting: null });
    expect(cell).toBeNull();
    expect(fieldsOf(problems)).toEqual(['cell.operation symmetry']);
  });
});
