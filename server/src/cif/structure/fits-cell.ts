import type { SpaceGroupSetting } from '#common/schemas/symmetry';

import type { ReadLattice } from './read-lattice.js';

/** Files round edges and angles; what deviates more than this has another shape. */
const relativeLimit = 2e-3;
const angleLimitDeg = 0.1;

/** True when lattice parameters have the shape a setting's crystal system asks for. */
export function fitsSetting({ values }: ReadLattice, setting: SpaceGroupSetting): boolean {
  const { a, b, c, alpha, beta, gamma } = values;
  const same = (p: number, q: number) => Math.abs(p - q) <= relativeLimit * Math.max(p, q);
  const is = (angle: number, degrees: number) => Math.abs(angle - degrees) <= angleLimitDeg;
  const right = is(alpha, 90) && is(beta, 90) && is(gamma, 90);
  switch (setting.crystalSystem) {
    case 'triclinic':
      return true;
    case 'monoclinic':
      return (
        (setting.uniqueAxis === 'a' || is(alpha, 90)) &&
        (setting.uniqueAxis === 'b' || is(beta, 90)) &&
        (setting.uniqueAxis === 'c' || is(gamma, 90))
      );
    case 'orthorhombic':
      return right;
    case 'tetragonal':
      return right && same(a, b);
    case 'trigonal':
    case 'hexagonal':
      return setting.hexagonalAxes
        ? same(a, b) && is(alpha, 90) && is(beta, 90) && is(gamma, 120)
        : same(a, b) && same(b, c) && is(beta, alpha) && is(gamma, alpha);
    case 'cubic':
      return right && same(a, b) && same(b, c);
  }
}
