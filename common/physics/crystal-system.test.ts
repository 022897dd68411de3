import { describe, expect, it } from 'vitest';

import { applyLatticeConstraints, latticeConstraints } from '#common/physics/crystal-system';
import type { LatticeParameterTexts } from '#common/schemas/cell';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';

function setting(
  crystalSystem: SpaceGroupSetting['crystalSystem'],
  given: Partial<SpaceGroupSetting> = {},
): SpaceGroupSetting {
  return {
    hallNumber: 1,
    number: 1,
    symbol: 'P 1',
    hallSymbol: 'P 1',
    setting: '',
    crystalSystem,
    hexagonalAxes: false,
    uniqueAxis: null,
    isStandard: true,
    ...given,
  };
}

const typed: LatticeParameterTexts = {
  a: '2*u',
  b: '6',
  c: '7',
  alpha: '80',
  beta: '100',
  gamma: '95',
};

/** Texts as `a b c α β γ`. */
const filled = (of: SpaceGroupSetting | null) =>
  Object.values(applyLatticeConstraints(typed, of)).join(' ');

describe('lattice constraints', () => {
  // International Tables for Crystallography Vol. A, table 2.1.1.1.
  it.each([
    ['no setting', null, '2*u 6 7 80 100 95'],
    ['triclinic', setting('triclinic'), '2*u 6 7 80 100 95'],
    ['monoclinic, axis b', setting('monoclinic', { uniqueAxis: 'b' }), '2*u 6 7 90 100 90'],
    ['monoclinic, axis a', setting('monoclinic', { uniqueAxis: 'a' }), '2*u 6 7 80 90 90'],
    ['monoclinic, axis c', setting('monoclinic', { uniqueAxis: 'c' }), '2*u 6 7 90 90 95'],
    ['orthorhombic', setting('orthorhombic'), '2*u 6 7 90 90 90'],
    ['tetragonal', setting('tetragonal'), '2*u 2*u 7 90 90 90'],
    ['hexagonal axes', setting('trigonal', { hexagonalAxes: true }), '2*u 2*u 7 90 90 120'],
    ['rhombohedral axes', setting('trigonal'), '2*u 2*u 2*u 80 80 80'],
    ['hexagonal', setting('hexagonal', { hexagonalAxes: true }), '2*u 2*u 7 90 90 120'],
    ['cubic', setting('cubic'), '2*u 2*u 2*u 90 90 90'],
  ])('fill in %s', (_, of, expected) => {
    expect(filled(of)).toBe(expected);
  });

  it('refer to free parameters only, so that one pass fills everything', () => {
    for (const system of ['tetragonal', 'trigonal', 'hexagonal', 'cubic'] as const) {
      const constraints = latticeConstraints(setting(system));
      for (const constraint of Object.values(constraints)) {
        if (constraint.kind === 'equals') {
          expect(constraints[constraint.other].kind).toBe('free');
        }
      }
    }
  });

  it('change nothing the second time', () => {
    const cubic = setting('cubic');
    const once = applyLatticeConstraints(typed, cubic);
    expect(applyLatticeConstraints(once, cubic)).toEqual(once);
  });
});
