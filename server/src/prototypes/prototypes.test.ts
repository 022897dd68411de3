import { readdirSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { Problem } from '#common/errors/problem';
import { resolveCell } from '#common/physics/resolve-cell';
import { appliedPrototype, prototypeList } from '#common/schemas/prototype';
import { symmetryOf } from '#server/symmetry/space-groups';

import { meanContactA } from './contact-distance.js';
import { readPrototypes, structuresFolder } from './prototypes.js';
import { PrototypesService } from './prototypes.service.js';

const prototypes = readPrototypes();
const service = new PrototypesService();
const ion = (element: string, charge: number) => ({ element, charge });

/** Sites in the conventional cell and its group: International Tables A and any text on structure types. */
const known: Readonly<Record<string, { group: number; sites: number; formula: string }>> = {
  'rock-salt': { group: 225, sites: 8, formula: 'NaCl' },
  'caesium-chloride': { group: 221, sites: 2, formula: 'CsCl' },
  'zinc-blende': { group: 216, sites: 8, formula: 'ZnS' },
  wurtzite: { group: 186, sites: 4, formula: 'ZnS' },
  fluorite: { group: 225, sites: 12, formula: 'CaF2' },
  antifluorite: { group: 225, sites: 12, formula: 'Li2O' },
  rutile: { group: 136, sites: 6, formula: 'TiO2' },
  perovskite: { group: 221, sites: 5, formula: 'SrTiO3' },
  spinel: { group: 227, sites: 56, formula: 'MgAl2O4' },
  corundum: { group: 167, sites: 30, formula: 'Al2O3' },
  cuprite: { group: 224, sites: 6, formula: 'Cu2O' },
  'cadmium-iodide': { group: 164, sites: 3, formula: 'CdI2' },
  'nickel-arsenide': { group: 194, sites: 4, formula: 'FeS' },
  'rhenium-trioxide': { group: 221, sites: 4, formula: 'ReO3' },
};

describe('the shipped structure types', () => {
  it('are the files of structures/, one for one', () => {
    const files = readdirSync(structuresFolder()).filter((name) => name.endsWith('.cif'));
    expect(prototypes.map(({ facts }) => `${facts.id}.cif`).sort()).toEqual(files.sort());
    expect(prototypeList.parse({ items: service.list() }).items).toHaveLength(14);
  });

  it.each(prototypes.map((prototype) => [prototype.facts.id, prototype] as const))(
    '%s has its group, its number of sites and its formula',
    (id, { resolved, summary }) => {
      expect({
        group: summary.spaceGroupNumber,
        sites: resolved.sites.length,
        formula: summary.example,
      }).toEqual(known[id]);
    },
  );

  it.each(prototypes.map((prototype) => [prototype.facts.id, prototype] as const))(
    '%s is neutral, its free coordinates are named, its exact factors are exact',
    (_id, { facts, resolved, cell }) => {
      expect(resolved.sites.reduce((sum, { chargeE }) => sum + chargeE, 0)).toBeCloseTo(0, 12);
      expect(Object.keys(resolved.parameters)).toEqual(facts.freeCoordinates.map((f) => f.name));
      expect(cell.parameters.every(({ expression }) => Number(expression) > 0)).toBe(true);
      for (const { cation, anion, exactFactor } of facts.contacts) {
        const shell = facts.roles.find(({ label }) => label === cation)!.coordination;
        const contactA = meanContactA(resolved, cation, anion, shell)!;
        if (exactFactor !== null) {
          expect(resolved.lattice.aA / contactA).toBeCloseTo(valueOf(exactFactor), 10);
        }
      }
    },
  );

  it.each(prototypes.map((prototype) => [prototype.facts.id, prototype] as const))(
    '%s has the coordination its roles say: a gap follows the first shell',
    (_id, { facts, resolved }) => {
      for (const { label, coordination } of facts.roles) {
        const own = resolved.sites.find((site) => site.label === label)!;
        const unlike = [
          ...new Set(
            resolved.sites
              .filter(({ chargeE }) => chargeE * own.chargeE < 0)
              .map((site) => site.label),
          ),
        ];
        // In the ternary types an anion counts all its cations: checked from the cations' side.
        if (unlike.length === 1) {
          const upTo = (count: number) => meanContactA(resolved, label, unlike[0]!, count)! * count;
          const lastInside = upTo(coordination) - upTo(coordination - 1);
          const firstOutside = upTo(coordination + 1) - upTo(coordination);
          expect(firstOutside / lastInside).toBeGreaterThan(1.2);
        }
      }
    },
  );
});

function valueOf(factor: string): number {
  const [top, root] = factor.split('/√');
  return Number(top) / (root === undefined ? 1 : Math.sqrt(Number(root)));
}

describe('applying a structure type', () => {
  it('guesses rock-salt MgO from radii and says how', () => {
    const applied = appliedPrototype.parse(
      service.apply('rock-salt', { ions: [ion('Mg', 2), ion('O', -2)] }),
    );
    expect(applied.guess).toContain('a = 2 (r(Mg²⁺, 6) + r(O²⁻, 6)) = 2 (0.72 + 1.40) = 4.24 Å');
    expect(applied.cell.lattice).toMatchObject({ a: '4.24', b: '4.24', c: '4.24', alpha: '90' });
    expect(
      applied.cell.sites.map(({ label, element, charge }) => [label, element, charge]),
    ).toEqual([
      ['Mg1', 'Mg', '2'],
      ['O1', 'O', '-2'],
    ]);
    expect(applied.suggestedName).toBe('MgO (rock salt)');
    expect(applied.warnings).toEqual([]);
  });

  it('keeps axial ratio and internal parameter of rutile', () => {
    const { cell, guess } = service.apply('rutile', { ions: [ion('Sn', 4), ion('O', -2)] });
    expect(Number(cell.lattice.c) / Number(cell.lattice.a)).toBeCloseTo(2.95812 / 4.59373, 4);
    expect(cell.parameters).toEqual([{ name: 'u', expression: '0.3053' }]);
    expect(cell.sites[1]).toMatchObject({ label: 'O1', x: 'u', y: 'u', z: '0' });
    expect(guess).toContain('u = 0.3053 as in TiO2');
  });

  it('keeps the measured edges for the ions of the file itself', () => {
    const { cell, guess } = service.apply('fluorite', { ions: [ion('Ca', 2), ion('F', -1)] });
    expect(cell.lattice.a).toBe('5.46295');
    expect(guess).toContain('is that of CaF2 itself');
    expect(guess).toContain('4/√3');
  });

  it('numbers two sites of one element apart', () => {
    const { cell, warnings } = service.apply('spinel', {
      ions: [ion('Fe', 2), ion('Fe', 3), ion('O', -2)],
    });
    expect(cell.sites.map(({ label }) => label)).toEqual(['Fe1', 'Fe2', 'O1']);
    expect(warnings).toEqual([]);
  });

  it('warns when the ions do not balance', () => {
    const { warnings } = service.apply('rutile', { ions: [ion('Al', 3), ion('O', -2)] });
    expect(warnings.map(({ code }) => code)).toEqual(['prototype.not_neutral']);
    expect(warnings[0]!.message).toContain('−1 e per formula unit');
  });

  it('says when there is no radius to guess from', () => {
    const applied = service.apply('rock-salt', { ions: [ion('Xe', 4), ion('O', -4)] });
    expect(applied.warnings.map(({ code }) => code)).toContain('prototype.no_radius');
    expect(applied.cell.lattice.a).toBe('5.64056');
  });

  it('gives a cell that resolves, whatever the type', () => {
    for (const { facts, summary } of prototypes) {
      const ions = summary.roles.map(({ charge }) =>
        charge < 0 ? ion('Se', charge) : ion('Mn', charge),
      );
      const { cell } = service.apply(facts.id, { ions });
      expect(resolveCell(cell, symmetryOf(cell.symmetry)).problems).toEqual([]);
    }
  });

  it.each([
    ['garnet', [ion('Mg', 2)], 'prototype.not_found'],
    ['rock-salt', [ion('Mg', 2)], 'request.invalid'],
    ['rock-salt', [ion('Mg', 2), ion('Qq', -2)], 'request.invalid'],
  ])('refuses %s with %j', (id, ions, code) => {
    const apply = () => service.apply(id, { ions });
    expect(apply).toThrow(Problem);
    expect(apply).toThrow(expect.objectContaining({ code }));
  });
});
