import { EV_PER_CUBIC_ANGSTROM_IN_GPA } from '#common/units/constants';

/**
 * Energy of one formula unit when the whole cell is scaled uniformly: every distance times s,
 * s = 1 the cell as given. Energies in eV; slopes and curvatures are derivatives by s.
 */
export interface ScalingLaw {
  /** Electrostatic energy, −A/s. */
  attractionEv(scale: number): number;
  repulsionEv(scale: number): number;
  repulsionSlopeEv(scale: number): number;
  repulsionCurvatureEv(scale: number): number;
}

/** Electrostatic energy −A/s of a uniformly scaled cell: all its terms go with 1/distance. */
const coulomb = (bindingEv: number) => (scale: number) => -bindingEv / scale;

/**
 * Born–Landé: R(s) = (A/n) s⁻ⁿ, at rest at s = 1.
 * Source: M. Born, A. Landé (1918) Verh. Dtsch. Phys. Ges. 20, 210.
 * @param bindingEv A = −E_el per formula unit at s = 1, eV, positive
 * @param exponent Born exponent n > 1
 */
export function bornLandeLaw(bindingEv: number, exponent: number): ScalingLaw {
  const prefactor = bindingEv / exponent;
  return {
    attractionEv: coulomb(bindingEv),
    repulsionEv: (scale) => prefactor * scale ** -exponent,
    repulsionSlopeEv: (scale) => -prefactor * exponent * scale ** (-exponent - 1),
    repulsionCurvatureEv: (scale) =>
      prefactor * exponent * (exponent + 1) * scale ** (-exponent - 2),
  };
}

/**
 * Born–Mayer: R(s) = (Aρ/r₀) exp(−r₀(s − 1)/ρ), at rest at s = 1.
 * Source: M. Born, J. E. Mayer (1932) Z. Phys. 75, 1.
 * @param bindingEv A = −E_el per formula unit at s = 1, eV, positive
 * @param spacingA r₀, shortest cation–anion distance at s = 1, Å
 * @param hardnessA ρ, Å, below r₀
 */
export function bornMayerLaw(bindingEv: number, spacingA: number, hardnessA: number): ScalingLaw {
  const steepness = spacingA / hardnessA;
  const prefactor = bindingEv / steepness;
  const at = (scale: number) => prefactor * Math.exp(-steepness * (scale - 1));
  return {
    attractionEv: coulomb(bindingEv),
    repulsionEv: at,
    repulsionSlopeEv: (scale) => -steepness * at(scale),
    repulsionCurvatureEv: (scale) => steepness ** 2 * at(scale),
  };
}

/** Pairs of one kind at one distance, with their short-range energy A exp(−d/ρ) − C d⁻⁶. */
export interface RepellingPairs {
  readonly distanceA: number;
  readonly pairsPerFormulaUnit: number;
  readonly prefactorEv: number;
  readonly hardnessA: number;
  readonly dispersionEvA6: number;
}

/**
 * Pair by pair: R(s) = Σ n [A exp(−s d/ρ) − C (s d)⁻⁶] over a list of pairs that does not change
 * with s, so that the curve has no steps.
 */
export function pairwiseLaw(bindingEv: number, pairs: readonly RepellingPairs[]): ScalingLaw {
  const sum = (term: (pair: RepellingPairs, distanceA: number) => number) => (scale: number) =>
    pairs.reduce(
      (total, pair) => total + pair.pairsPerFormulaUnit * term(pair, pair.distanceA * scale),
      0,
    );
  const core = ({ prefactorEv, hardnessA }: RepellingPairs, r: number) =>
    prefactorEv * Math.exp(-r / hardnessA);
  return {
    attractionEv: coulomb(bindingEv),
    repulsionEv: sum((pair, r) => core(pair, r) - pair.dispersionEvA6 / r ** 6),
    repulsionSlopeEv: sum(
      (pair, r) =>
        pair.distanceA * (-core(pair, r) / pair.hardnessA + (6 * pair.dispersionEvA6) / r ** 7),
    ),
    repulsionCurvatureEv: sum(
      (pair, r) =>
        pair.distanceA ** 2 *
        (core(pair, r) / pair.hardnessA ** 2 - (42 * pair.dispersionEvA6) / r ** 8),
    ),
  };
}

export const netEv = (law: ScalingLaw, scale: number): number =>
  law.attractionEv(scale) + law.repulsionEv(scale);

/** dE/ds; the attraction's slope is A/s² = −attraction/s. */
export const netSlopeEv = (law: ScalingLaw, scale: number): number =>
  -law.attractionEv(scale) / scale + law.repulsionSlopeEv(scale);

/** d²E/ds². */
export const netCurvatureEv = (law: ScalingLaw, scale: number): number =>
  (2 * law.attractionEv(scale)) / scale ** 2 + law.repulsionCurvatureEv(scale);

/** Where the search for rest looks: cells more than twice too large or too small are refused. */
const searched = { from: 0.45, to: 2.2, steps: 350 } as const;

/** Narrows a change of sign of the slope from − to + down to rounding. */
function bisect(law: ScalingLaw, low: number, high: number): number {
  let [below, above] = [low, high];
  for (let step = 0; step < 200 && above - below > 1e-15 * above; step += 1) {
    const middle = (below + above) / 2;
    if (netSlopeEv(law, middle) < 0) {
      below = middle;
    } else {
      above = middle;
    }
  }
  return (below + above) / 2;
}

/**
 * The scale at which the cell is at rest: the minimum of the net energy nearest to s = 1; null when
 * there is none between 0.45 and 2.2.
 */
export function equilibriumScale(law: ScalingLaw): number | null {
  const scaleAt = (k: number) =>
    searched.from * (searched.to / searched.from) ** (k / searched.steps);
  let best: number | null = null;
  for (let k = 0; k < searched.steps; k += 1) {
    const [low, high] = [scaleAt(k), scaleAt(k + 1)];
    if (netSlopeEv(law, low) < 0 && netSlopeEv(law, high) >= 0) {
      const found = bisect(law, low, high);
      if (best === null || Math.abs(Math.log(found)) < Math.abs(Math.log(best))) {
        best = found;
      }
    }
  }
  return best;
}

/**
 * Bulk modulus K = V d²E/dV² in GPa at a scale where the cell is at rest: with V = V₀ s³ this is
 * E″(s)/(9 V₀ s).
 * @param volumeA3 V₀, volume per formula unit at s = 1, Å³
 */
export function bulkModulusGpa(law: ScalingLaw, scale: number, volumeA3: number): number {
  return (EV_PER_CUBIC_ANGSTROM_IN_GPA * netCurvatureEv(law, scale)) / (9 * volumeA3 * scale);
}
