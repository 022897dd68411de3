import type { PreparedCell, SplittingPlan } from './contract.js';
import { erfc } from './erfc.js';

/**
 * How far below the tolerance the truncation of each sum is pushed: forces, stress and the virial
 * test feel a cut-off one to two orders more than the energy does.
 */
const headroom = 1 / 100;

/** Ratio of the time of a real-space pair to that of one site in one wave; see the bench. */
const pairToWaveTime = 10;

/** Upper limit of η d: beyond it the parts grow large against the result and digits cancel. */
const largestSplittingTimesDistance = 2.2;

/** Shells are uneven where the bounds below take a mean; three lattices of the tests need 2. */
const unevenness = 4;

const sqrtPi = Math.sqrt(Math.PI);

/** s with erfc(s) = target, by bisection. */
function reachFor(target: number): number {
  let [low, high] = [0.5, 8.9];
  for (let step = 0; step < 40; step += 1) {
    const middle = (low + high) / 2;
    if (erfc(middle) > target) {
      low = middle;
    } else {
      high = middle;
    }
  }
  return high;
}

/**
 * The farthest apart that the nearest two of N points in a volume can be: (√2 V/N)^{1/3}, the
 * distance in the densest packing of spheres (T. C. Hales, Ann. Math. 162 (2005) 1065).
 */
function widestSpacing(cell: PreparedCell): number {
  return Math.cbrt((Math.SQRT2 * cell.volumeA3) / cell.count);
}

/**
 * Chooses η so that both sums take about the same time, and cut-offs for the tolerance.
 * Work in real space is t_r (2π/3) N² s³/(V η³), in reciprocal space t_k (2/3π²) N V s³ η³;
 * their sum is least at η⁶ = π³ N t_r/(V² t_k) and grows as N^{3/2} (J. W. Perram, H. G. Petersen,
 * S. W. de Leeuw, Mol. Phys. 65 (1988) 875).
 *
 * @param toleranceRelative to k_e Σq²/d₀, ahead of which the cut-offs are put
 * @param factor multiplies η, cut-offs follow: the result must not change
 */
export function planSplitting(
  cell: PreparedCell,
  toleranceRelative: number,
  factor: number,
): SplittingPlan {
  const { count, volumeA3 } = cell;
  const balanced = Math.cbrt(Math.sqrt(Math.PI ** 3 * count * pairToWaveTime) / volumeA3);
  const splittingPerA =
    Math.min(balanced, largestSplittingTimesDistance / widestSpacing(cell)) * factor;
  const reach = reachFor(toleranceRelative * headroom);
  return {
    splittingPerA,
    reach,
    realCutoffA: reach / splittingPerA,
    reciprocalCutoffPerA: 2 * reach * splittingPerA,
  };
}

/** What cut-offs and rounding may leave out or add, in e²/Å, e/Å and e²/Å. */
export interface Allowances {
  readonly energy: number;
  readonly potential: number;
  readonly strainDerivative: number;
}

/**
 * Bounds of what both cut-offs leave out; s is the reach, A = Σ|q|.
 * - Real space, charges of one sign at uniform density, erfc(x) ≤ exp(−x²)/(x√π):
 *   energy ≤ π A² erfc(s)/(V η²), potential ≤ 2π A erfc(s)/(V η²).
 * - Reciprocal space, Σ_G → V/(2π)³ ∫ and |S(G)|² → its mean Σq²:
 *   energy Σq² η erfc(s)/√π, potential ≤ 2 √(Σq²) η erfc(s)/√π with all phases against us.
 * - Strain derivatives carry 2(1 + x²) more in either space.
 */
export function truncation(cell: PreparedCell, plan: SplittingPlan): Allowances {
  const tail = unevenness * erfc(plan.reach);
  const eta = plan.splittingPerA;
  const realPerCharge = (Math.PI * cell.absoluteChargeSum * tail) / (cell.volumeA3 * eta * eta);
  const reciprocal = (eta * tail) / sqrtPi;
  const energy = realPerCharge * cell.absoluteChargeSum + reciprocal * cell.chargeSquareSum;
  return {
    energy,
    potential: 2 * (realPerCharge + reciprocal * Math.sqrt(cell.chargeSquareSum)),
    strainDerivative: 2 * (1 + plan.reach ** 2) * energy,
  };
}
