import type { BoundedOrReason, EvaluationResult } from '#common/schemas/evaluation';
import { COULOMB_EV_ANGSTROM } from '#common/units/constants';

/** What the four constants are made from, per formula unit. */
export interface MadelungInput {
  readonly energyEv: number;
  readonly energyBoundEv: number;
  /** d₀, Å; null when the cell has not both signs. */
  readonly shortestUnlikeA: number | null;
  readonly firstEdgeA: number;
  /** Charge and number per formula unit of each ion kind that is charged. */
  readonly ions: readonly { readonly chargeE: number; readonly perFormulaUnit: number }[];
}

function refused(reason: string): BoundedOrReason {
  return { value: null, bound: null, reason };
}

/**
 * Madelung constants in four conventions, all dimensionless (charges in units of e):
 * M(d₀) = −E d₀/k_e; M′ = M(d₀)/|z₊z₋|, two ion kinds only; M̃ = 2 M(d₀)/Σz²
 * (D. H. Templeton, J. Chem. Phys. 21 (1953) 2097); M(a) = −E a/k_e.
 */
export function madelungConstants(input: MadelungInput): EvaluationResult['madelung'] {
  const { energyEv, energyBoundEv, shortestUnlikeA, firstEdgeA, ions } = input;
  const times = (factor: number): BoundedOrReason => {
    const value = (-energyEv / COULOMB_EV_ANGSTROM) * factor;
    // The factor carries a few rounding units of its own.
    const bound =
      (energyBoundEv / COULOMB_EV_ANGSTROM) * Math.abs(factor) +
      4 * Number.EPSILON * Math.abs(value);
    return { value, bound, reason: null };
  };
  const perEdge = times(firstEdgeA);
  if (shortestUnlikeA === null) {
    const none = refused('There is no cation–anion distance: the cell has ions of one sign only.');
    return { perDistance: none, perCharge: none, reduced: none, perEdge };
  }
  const squares = ions.reduce((sum, ion) => sum + ion.perFormulaUnit * ion.chargeE ** 2, 0);
  const isBinary = ions.length === 2 && ions[0]!.chargeE * ions[1]!.chargeE < 0;
  return {
    perDistance: times(shortestUnlikeA),
    perCharge: isBinary
      ? times(shortestUnlikeA / Math.abs(ions[0]!.chargeE * ions[1]!.chargeE))
      : refused('M′ is defined for compounds of exactly one cation kind and one anion kind.'),
    reduced: times((2 * shortestUnlikeA) / squares),
    perEdge,
  };
}
