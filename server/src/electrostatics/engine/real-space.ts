import { buildNeighbourGrid, forEachNeighbour } from '#common/physics/neighbours';

import { Accumulator, AccumulatorArray } from './accumulator.js';
import type { PreparedCell, SplittingPlan } from './contract.js';
import { erfcWithGaussian } from './erfc.js';

/** The real-space sum: energies by species, potentials, fields, strain derivative. */
export interface RealSpaceSums {
  readonly bySpecies: readonly (readonly Accumulator[])[];
  readonly potentials: AccumulatorArray;
  readonly fields: AccumulatorArray;
  readonly strainDerivative: readonly Accumulator[];
  readonly terms: number;
}

const twoOverSqrtPi = 2 / Math.sqrt(Math.PI);

/**
 * ½ Σ_ij Σ'_n q_i q_j erfc(ηr)/r within the cut-off, with φ_i = Σ q_j erfc(ηr)/r, the field
 * −∇φ and ∂E/∂ε_ab = −½ Σ q_i q_j g(r) r_a r_b, where
 * g(r) = (erfc(ηr)/r + 2η/√π exp(−η²r²))/r².
 * Source: physics of the method in P. P. Ewald, Ann. Phys. 369 (1921) 253; strain derivatives as
 * in D. M. Heyes, Phys. Rev. B 49 (1994) 755.
 *
 * Each pair of different sites is visited once and booked for both; a site with its own images is
 * booked with half weight, since every image appears with its opposite.
 */
export function sumRealSpace(cell: PreparedCell, plan: SplittingPlan): RealSpaceSums {
  const { count, charges, species } = cell;
  const eta = plan.splittingPerA;
  const kinds = cell.speciesStart.length - 1;
  const bySpecies = Array.from({ length: kinds }, () =>
    Array.from({ length: kinds }, () => new Accumulator()),
  );
  const potentials = new AccumulatorArray(count);
  const fields = new AccumulatorArray(3 * count);
  const strainDerivative = Array.from({ length: 6 }, () => new Accumulator());
  const [xx, yy, zz, yz, xz, xy] = strainDerivative as [
    Accumulator,
    Accumulator,
    Accumulator,
    Accumulator,
    Accumulator,
    Accumulator,
  ];
  const grid = buildNeighbourGrid(cell.vectorsA, cell.fractional, plan.realCutoffA);
  let terms = 0;
  for (let i = 0; i < count; i += 1) {
    const qi = charges[i]!;
    forEachNeighbour(grid, i, plan.realCutoffA, (j, r, _image, dx, dy, dz) => {
      if (j < i) {
        return;
      }
      terms += 1;
      const x = eta * r;
      const gaussian = Math.exp(-x * x);
      const screened = erfcWithGaussian(x, gaussian) / r;
      const slope = (screened + twoOverSqrtPi * eta * gaussian) / (r * r);
      const qj = charges[j]!;
      const weight = j === i ? 0.5 : 1;
      const strength = qi * qj * weight;
      bySpecies[species[i]!]![species[j]!]!.add(strength * screened);
      potentials.add(i, qj * screened);
      fields.add(3 * i, -qj * slope * dx);
      fields.add(3 * i + 1, -qj * slope * dy);
      fields.add(3 * i + 2, -qj * slope * dz);
      if (j !== i) {
        potentials.add(j, qi * screened);
        fields.add(3 * j, qi * slope * dx);
        fields.add(3 * j + 1, qi * slope * dy);
        fields.add(3 * j + 2, qi * slope * dz);
      }
      const pull = -strength * slope;
      xx.add(pull * dx * dx);
      yy.add(pull * dy * dy);
      zz.add(pull * dz * dz);
      yz.add(pull * dy * dz);
      xz.add(pull * dx * dz);
      xy.add(pull * dx * dy);
    });
  }
  return { bySpecies, potentials, fields, strainDerivative, terms };
}
