import { describe, expect, it } from 'vitest';

import { evaluationHashInput } from '#common/physics/cell-hash-input';
import { resolveCell } from '#common/physics/resolve-cell';
import { defaultEvaluationMethod, type CellDefinition, type CellSite } from '#common/schemas/cell';
import { groups } from '#tests/helpers/group-closure';

const method = defaultEvaluationMethod;
const spaceGroup = { number: 225, symbol: 'F m -3 m' };

const zincBlende: CellDefinition = {
  lattice: { a: '5.41', b: '5.41', c: '5.41', alpha: '90', beta: '90', gamma: '90' },
  symmetry: { kind: 'setting', hallNumber: 1 },
  parameters: [],
  sites: [
    { label: 'Zn1', element: 'Zn', charge: '2', x: '0', y: '0', z: '0', occupancy: '1' },
    { label: 'S1', element: 'S', charge: '-2', x: '1/4', y: '1/4', z: '1/4', occupancy: '1' },
  ],
};

function hashOf(definition: CellDefinition, group: keyof typeof groups = 'P1'): string {
  const { cell } = resolveCell(definition, { operations: groups[group], setting: null });
  return evaluationHashInput(cell!, method, spaceGroup, 'engine 1');
}

const withSite = (index: number, change: Partial<CellSite>): CellDefinition => ({
  ...zincBlende,
  sites: zincBlende.sites.map((site, k) => (k === index ? { ...site, ...change } : site)),
});

describe('evaluationHashInput', () => {
  it.each<[string, CellDefinition]>([
    ['a fraction as a decimal', withSite(1, { x: '0.25', y: '.250', z: '25e-2' })],
    ['a whole turn of the cell', withSite(1, { x: '5/4', y: '-3/4' })],
    ['signs and spaces', withSite(0, { charge: ' +2 ', x: '-0' })],
    ['an element in small letters', withSite(0, { element: 'zn' })],
    [
      'a parameter',
      {
        ...withSite(1, { x: 'u', y: 'u', z: '1/2 - u' }),
        parameters: [{ name: 'u', expression: '1/4' }],
      },
    ],
    [
      'a parameter that nothing uses',
      { ...zincBlende, parameters: [{ name: 'spare', expression: '7' }] },
    ],
  ])('does not tell %s apart', (_, same) => {
    expect(hashOf(same)).toBe(hashOf(zincBlende));
  });

  it.each<[string, CellDefinition]>([
    ['a coordinate', withSite(1, { x: '0.2500001' })],
    ['a charge', withSite(1, { charge: '-1.9999999' })],
    ['an element', withSite(0, { element: 'Cd' })],
    ['a label', withSite(0, { label: 'Zn2' })],
    ['an occupancy', withSite(0, { occupancy: '0.999' })],
    ['an edge', { ...zincBlende, lattice: { ...zincBlende.lattice, c: '5.4100001' } }],
    ['an angle', { ...zincBlende, lattice: { ...zincBlende.lattice, gamma: '90.0001' } }],
    ['the order of sites', { ...zincBlende, sites: zincBlende.sites.toReversed() }],
    ['a site less', { ...zincBlende, sites: zincBlende.sites.slice(1) }],
  ])('tells %s apart', (_, other) => {
    expect(hashOf(other)).not.toBe(hashOf(zincBlende));
  });

  it('tells symmetry, method, named group and engine apart', () => {
    const { cell } = resolveCell(zincBlende, { operations: groups.P1, setting: null });
    const texts = [
      evaluationHashInput(cell!, method, spaceGroup, 'engine 1'),
      evaluationHashInput(cell!, method, spaceGroup, 'engine 2'),
      evaluationHashInput(cell!, method, null, 'engine 1'),
      evaluationHashInput(cell!, method, { number: 216, symbol: 'F -4 3 m' }, 'engine 1'),
      evaluationHashInput(cell!, { ...method, uniformBackground: true }, spaceGroup, 'engine 1'),
      evaluationHashInput(cell!, { ...method, toleranceRelative: 1e-9 }, spaceGroup, 'engine 1'),
      hashOf(zincBlende, 'P-43m'),
    ];
    expect(new Set(texts).size).toBe(texts.length);
  });

  it('is JSON with sorted keys and does not depend on their order', () => {
    const { cell } = resolveCell(zincBlende, { operations: groups.P1, setting: null });
    const turned = Object.fromEntries(Object.entries(cell!).reverse()) as unknown as typeof cell;
    const text = evaluationHashInput(turned!, method, spaceGroup, 'engine 1');
    expect(text).toBe(hashOf(zincBlende));
    const keys = Object.keys(JSON.parse(text) as object);
    expect(keys).toEqual(keys.toSorted());
    expect(text).toContain('"fractional":[0.25,0.25,0.25]');
  });
});
