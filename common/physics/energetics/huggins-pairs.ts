import { findElement } from '#common/chemistry/elements';
import type { SizedIon } from '#common/physics/energetics/ion-sizes';
import type { PairDistance } from '#common/physics/energetics/pair-distances';
import type { PairPotential } from '#common/schemas/energetics';

/**
 * Prefactor b of the Born–Mayer–Huggins form in eV: 0.338 × 10⁻¹⁹ J, the value usual for alkali
 * halides (M. L. Huggins, J. E. Mayer (1933) J. Chem. Phys. 1, 643; from memory).
 */
export const hugginsPrefactorEv = 0.338 / 1.602176634;

/** Outer electrons of an ion: two for a helium-like core, else eight. */
function outerElectrons(element: string, chargeE: number): number {
  const electrons = (findElement(element)?.atomicNumber ?? 0) - chargeE;
  return electrons <= 2 ? 2 : 8;
}

/**
 * Pauling's factor c_ij = 1 + z_i/N_i + z_j/N_j, N the number of outer electrons: like ions of high
 * charge repel less or more than their size alone would say.
 * Source: L. Pauling (1928) Z. Kristallogr. 67, 377.
 */
function paulingFactor(one: SizedIon, other: SizedIon): number {
  const share = ({ components, chargeE }: SizedIon) =>
    chargeE / outerElectrons(components[0]!.element, components[0]!.chargeE);
  return 1 + share(one) + share(other);
}

/** Pairs of ion kinds with c_ij and σ = r_i + r_j. */
interface HugginsKind {
  readonly speciesA: string;
  readonly speciesB: string;
  readonly factor: number;
  readonly sizeSumA: number;
}

function hugginsKinds(ions: readonly SizedIon[]): HugginsKind[] {
  return ions.flatMap((one, index) =>
    ions.slice(index).map((other) => ({
      speciesA: one.speciesKey,
      speciesB: other.speciesKey,
      factor: paulingFactor(one, other),
      sizeSumA: one.radiusA! + other.radiusA!,
    })),
  );
}

/** Sums over the cell's pairs of c exp((σ − d)/ρ) d^k, k = 1 and 2: pull and stiffness per b. */
function sumsAt(
  hardnessA: number,
  kinds: ReadonlyMap<string, HugginsKind>,
  distances: readonly PairDistance[],
): { first: number; second: number } {
  let [first, second] = [0, 0];
  for (const { speciesA, speciesB, distanceA, pairsPerFormulaUnit } of distances) {
    const kind = kinds.get(`${speciesA}|${speciesB}`)!;
    const strength =
      pairsPerFormulaUnit *
      kind.factor *
      Math.exp((kind.sizeSumA - distanceA) / hardnessA) *
      (distanceA / hardnessA);
    first += strength;
    second += (strength * distanceA) / hardnessA;
  }
  return { first, second };
}

/** Hardnesses between which a fit looks, Å. */
const searched = { from: 0.06, to: 1.2, steps: 400 } as const;

/** The largest root of a continuous function on the searched hardnesses, or null. */
function findHardness(excess: (hardnessA: number) => number): number | null {
  const ratio = (searched.to / searched.from) ** (1 / searched.steps);
  let high: number = searched.to;
  let atHigh = excess(high);
  for (let k = 1; k <= searched.steps; k += 1) {
    const low = searched.to / ratio ** k;
    const atLow = excess(low);
    if (Number.isFinite(atLow) && atLow === 0) {
      return low;
    }
    if (Number.isFinite(atLow) && Number.isFinite(atHigh) && atLow > 0 !== atHigh > 0) {
      return narrow(excess, low, high, atHigh > 0);
    }
    [high, atHigh] = [low, atLow];
  }
  return null;
}

function narrow(
  excess: (hardnessA: number) => number,
  low: number,
  high: number,
  isPositiveAbove: boolean,
): number {
  let [below, above] = [low, high];
  for (let step = 0; step < 100; step += 1) {
    const middle = (below + above) / 2;
    if (excess(middle) > 0 === isPositiveAbove) {
      above = middle;
    } else {
      below = middle;
    }
  }
  return (below + above) / 2;
}

/** What the fit of the Born–Mayer–Huggins form is to meet. */
export type HugginsFit =
  /** Hardness given: the prefactor is fitted. */
  | { readonly hardnessA: number }
  /** Prefactor given: the hardness is fitted. */
  | { readonly prefactorEv: number }
  /** Both fitted: rest, and E″(1) of the net energy in eV per formula unit. */
  | { readonly curvatureEv: number };

/** The fitted form: b and ρ, and with them a potential for every pair of ion kinds. */
export interface HugginsPairs {
  readonly prefactorEv: number;
  readonly hardnessA: number;
  readonly pairs: PairPotential[];
}

function hardnessOf(
  fit: HugginsFit,
  bindingEv: number,
  sums: (hardnessA: number) => { first: number; second: number },
): number | null {
  if ('hardnessA' in fit) {
    return fit.hardnessA;
  }
  return 'prefactorEv' in fit
    ? findHardness((rho) => fit.prefactorEv * sums(rho).first - bindingEv)
    : findHardness((rho) => {
        const { first, second } = sums(rho);
        return (bindingEv * second) / first - 2 * bindingEv - fit.curvatureEv;
      });
}

/**
 * Born–Mayer–Huggins pairs c_ij b exp((r_i + r_j − r)/ρ), fitted so that the cell as given is at
 * rest under uniform scaling: b Σ n c exp((σ − d)/ρ) d/ρ = A.
 *
 * @param ions every kind with a radius and a single ion on its sites
 * @param distances pairs of the cell as given
 * @param bindingEv A = −E_el per formula unit, eV, positive
 * @returns null when no hardness between 0.06 and 1.2 Å meets the fit
 */
export function fitHugginsPairs(
  ions: readonly SizedIon[],
  distances: readonly PairDistance[],
  bindingEv: number,
  fit: HugginsFit,
): HugginsPairs | null {
  const list = hugginsKinds(ions);
  const kinds = new Map(
    list.flatMap((kind) => [
      [`${kind.speciesA}|${kind.speciesB}`, kind],
      [`${kind.speciesB}|${kind.speciesA}`, kind],
    ]),
  );
  const sums = (hardnessA: number) => sumsAt(hardnessA, kinds, distances);
  const hardnessA = hardnessOf(fit, bindingEv, sums);
  if (hardnessA === null) {
    return null;
  }
  const prefactorEv = 'prefactorEv' in fit ? fit.prefactorEv : bindingEv / sums(hardnessA).first;
  const pairs = list.map(({ speciesA, speciesB, factor, sizeSumA }) => ({
    speciesA,
    speciesB,
    prefactorEv: factor * prefactorEv * Math.exp(sizeSumA / hardnessA),
    hardnessA,
    dispersionEvA6: 0,
  }));
  return { prefactorEv, hardnessA, pairs };
}
