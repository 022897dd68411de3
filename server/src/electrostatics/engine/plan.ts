import type { PreparedCell, SplittingPlan } from './contract.js';
import { erfc } from './erfc.js';

/**
 * How far below the tolerance the truncation of each sum is pushed: forces, stress and the virial
 * test feel a cut-off one to two orders more than the energy does.
 */
const headroom = 1 / 300;

/** Ratio of the time of a real-space pair to that of one site in one wave, as measured in the bench. */
const pairToWaveTime = 5;

/** Upper limit of η d₀: beyond it the parts grow large against the result and digits cancel. */
const largestSplittingTimesDistance = 2.2;

/** s with erfc(s) = target, by bisection. */
export function reachFor(target: number): number {
  let [low, high] = [0.5, 9];
  for (let step = 0; step < 60; step += 1) {
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
 * Chooses η so that both sums take about the same time, and cut-offs for the tolerance.
 * Work in real space is t_r N² s³/(V η³), in reciprocal space t_k N V s³ η³/π³ up to a common
 * factor; their sum is least at η⁶ = π³ N t_r/(V² t_k) (J. W. Perram, H. G. Petersen, S. W. de Leeuw,
 * Mol. Phys. 65 (1988) 875, for the N^{3/2} scaling).
 *
 * @param factor multiplies η, cut-offs follow: the result must not change
 */
export function planSplitting(
  cell: PreparedCell,
  toleranceRelative: number,
  factor: number,
): SplittingPlan {
  const { count, volumeA3, shortestDistanceA } = cell;
  const balanced = ((Math.PI ** 3 * count * pairToWaveTime) / volumeA3 ** 2) ** (1 / 6);
  const splittingPerA =
    Math.min(balanced, largestSplittingTimesDistance / shortestDistanceA) * factor;
  const reach = reachFor(toleranceRelative * headroom);
  return {
    splittingPerA,
    reach,
    realCutoffA: reach / splittingPerA,
    reciprocalCutoffPerA: 2 * reach * splittingPerA,
  };
}

/**
 * Bound of what both cut-offs leave out of the energy, in e²/Å. The real-space rest is at most
 * the integral over a uniform density of charges of one sign, π (Σ|q|)² erfc(s)/(V η²); the
 * reciprocal rest has mean Σq² η erfc(s)/√π, since |S(G)|² averages to Σq² over G. Both are
 * doubled for the unevenness of shells.
 */
export function energyTruncation(cell: PreparedCell, plan: SplittingPlan): number {
  const tail = erfc(plan.reach);
  const eta = plan.splittingPerA;
  const real = (Math.PI * cell.absoluteChargeSum ** 2 * tail) / (cell.volumeA3 * eta * eta);
  const reciprocal = (cell.chargeSquareSum * eta * tail) / Math.sqrt(Math.PI);
  return 2 * (real + reciprocal);
}
