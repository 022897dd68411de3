import { readFileSync, readdirSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { fractionalToCartesian } from '#common/physics/cell-metric';
import { resolveCell } from '#common/physics/resolve-cell';
import type { ResolvedCell, ResolvedSite } from '#common/physics/resolved-cell';
import type { PairPotential } from '#common/schemas/energetics';
import { completeCharges } from '#server/cif/complete-charges';
import { readStructure } from '#server/cif/read-structure';
import { symmetryOf } from '#server/symmetry/space-groups';

import { elasticOfCell } from './elastic-of-cell.js';
import type { DynamicsSubject } from './from-cell.js';
import { relaxationOfCell } from './relaxation-of-cell.js';
import { vibrationsOfCell } from './vibrations-of-cell.js';

const folder = new URL('../../../../structures/', import.meta.url);
const files = readdirSync(folder).filter((file) => file.endsWith('.cif'));

/** Distance of two sites, the nearest of their images. */
function distanceA({ vectorsA }: ResolvedCell, a: ResolvedSite, b: ResolvedSite): number {
  let nearest = Infinity;
  const whole = [-1, 0, 1];
  for (const i of whole) {
    for (const j of whole) {
      for (const k of whole) {
        const shift = [i, j, k];
        const off = b.fractional.map((x, axis) => x - a.fractional[axis]! + shift[axis]!);
        const distance = Math.hypot(...fractionalToCartesian(vectorsA, off));
        nearest = distance > 0.1 ? Math.min(nearest, distance) : nearest;
      }
    }
  }
  return nearest;
}

/** Made-up repulsion that takes up a third of the pull of nearest unlike ions. */
function madeUpPairs(cell: ResolvedCell): PairPotential[] {
  const hardnessA = 0.3;
  const first = new Map<string, ResolvedSite>();
  cell.sites.forEach((site) => first.set(site.speciesKey, first.get(site.speciesKey) ?? site));
  const kinds = [...first.values()];
  return kinds.flatMap((a, i) =>
    kinds.slice(i).flatMap((b) => {
      const product = a.chargeE * b.chargeE;
      const term = { speciesA: a.speciesKey, speciesB: b.speciesKey, dispersionEvA6: 0 };
      if (product > 0) {
        return a.chargeE < 0 ? [{ ...term, prefactorEv: 1500, hardnessA: 0.25 }] : [];
      }
      const d = Math.min(
        ...cell.sites
          .filter(({ speciesKey }) => speciesKey === b.speciesKey)
          .map((site) => distanceA(cell, a, site)),
      );
      const pull = (14.4 * Math.abs(product)) / (d * d);
      const prefactorEv = 0.3 * pull * hardnessA * Math.exp(d / hardnessA);
      return [{ ...term, prefactorEv, hardnessA }];
    }),
  );
}

function subjectOf(file: string) {
  const structure = readStructure(readFileSync(new URL(file, folder), 'utf8'));
  const { cell: definition } = completeCharges(structure, new Map());
  const symmetry = symmetryOf(definition.symmetry);
  const cell = resolveCell(definition, symmetry).cell!;
  const subject: DynamicsSubject = {
    cell,
    potentials: { pairs: madeUpPairs(cell), cutoffA: 10, derivation: 'made up' },
    operations: symmetry.operations,
  };
  return { subject, system: symmetry.setting!.crystalSystem };
}

/** Criteria listed where the stiffness has the shape of its system in the cell's own axes. */
const criteriaOf: Readonly<Record<string, number>> = {
  cubic: 3,
  tetragonal: 5,
  trigonal: 4,
  hexagonal: 3,
};

describe.each(files)('%s', (file) => {
  const { subject, system } = subjectOf(file);
  const relaxed = relaxationOfCell(subject);

  it('relaxes within its space group', () => {
    expect(relaxed.ended).toBe('converged');
    expect(relaxed.symmetryDeviationA).toBeLessThanOrEqual(1e-11);
    const { lattice } = subject.cell;
    const { after } = relaxed;
    expect(
      [after.alphaDeg, after.betaDeg, after.gammaDeg].map((x) => Number(x.toFixed(8))),
    ).toEqual([lattice.alphaDeg, lattice.betaDeg, lattice.gammaDeg]);
    expect(after.bA / after.aA).toBeCloseTo(lattice.bA / lattice.aA, 10);
  });

  it('has elastic constants of the shape of its crystal system', () => {
    const { stability, geometry } = elasticOfCell(subject, { system, isRelaxedFirst: true });
    expect(geometry).toBe('relaxed');
    expect(stability.criteria).toHaveLength(criteriaOf[system]!);
    expect(stability.criteria.every(({ holds }) => holds)).toBe(stability.isStable);
  });

  it('has three modes an ion of its primitive cell, three of them acoustic', () => {
    const { transverse, acousticResidualEvPerA2 } = vibrationsOfCell(subject, {
      massOf: () => 30,
      isRelaxedFirst: true,
    });
    const unit = '1,0,0,0,1,0,0,0,1';
    const centrings = subject.operations.filter(({ rotation }) => rotation.join() === unit);
    expect(transverse).toHaveLength((3 * subject.cell.sites.length) / centrings.length);
    expect(transverse.filter(({ isAcoustic }) => isAcoustic)).toHaveLength(3);
    expect(acousticResidualEvPerA2).toBeLessThanOrEqual(1e-11);
  });
});
