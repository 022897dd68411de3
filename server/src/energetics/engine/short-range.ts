import type { PairModelInput, PairTerm } from './contract.js';

/** Part of the cut-off up to which the short-range terms are what they are on paper. */
const taperStart = 0.9;

/** Value and radial derivatives of a pair energy at one distance. */
export interface RadialValue {
  energy: number;
  /** φ′, eV Å⁻¹. */
  first: number;
  /** φ″, eV Å⁻². */
  second: number;
}

/** The terms of all pairs of species in flat tables, species A × count + species B. */
export interface ShortRangeTable {
  readonly kinds: number;
  readonly cutoffA: number;
  readonly prefactor: Float64Array;
  readonly inverseHardness: Float64Array;
  readonly dispersion: Float64Array;
}

/** Number of species, at least as many as terms or sites name. */
function countKinds(input: PairModelInput): number {
  let largest = 0;
  for (let i = 0; i < input.speciesIndex.length; i += 1) {
    largest = Math.max(largest, input.speciesIndex[i]!);
  }
  return (
    input.pairs.reduce(
      (sum, { speciesA, speciesB }) => Math.max(sum, speciesA, speciesB),
      largest,
    ) + 1
  );
}

/** Terms of both orders of each pair. */
export function shortRangeTable(input: PairModelInput): ShortRangeTable {
  const kinds = countKinds(input);
  const table = {
    kinds,
    cutoffA: input.cutoffA,
    prefactor: new Float64Array(kinds * kinds),
    inverseHardness: new Float64Array(kinds * kinds).fill(1),
    dispersion: new Float64Array(kinds * kinds),
  };
  for (const { speciesA, speciesB, prefactorEv, hardnessA, dispersionEvA6 } of input.pairs) {
    for (const at of [speciesA * kinds + speciesB, speciesB * kinds + speciesA]) {
      table.prefactor[at] = prefactorEv;
      table.inverseHardness[at] = 1 / hardnessA;
      table.dispersion[at] = dispersionEvA6;
    }
  }
  return table;
}

/**
 * φ(r) = A exp(−r/ρ) − C r⁻⁶ and its first two derivatives, tapered: with
 * x = (r − 0.9 R)/(0.1 R) between 0 and 1, φ is multiplied by
 * S(x) = 1 − x⁴ (35 − 84 x + 70 x² − 20 x³), whose first three derivatives vanish at both ends
 * (the smoothstep polynomial of degree 7). Energy, forces and force constants are continuous.
 *
 * @param at index into the table
 * @param out receives the value; the same object serves every call
 */
export function shortRangeAt(
  table: ShortRangeTable,
  at: number,
  r: number,
  out: RadialValue,
): void {
  const decay = table.inverseHardness[at]!;
  const exponential = table.prefactor[at]! * Math.exp(-r * decay);
  const inverse = 1 / r;
  const attraction = table.dispersion[at]! * inverse ** 6;
  const energy = exponential - attraction;
  const first = -decay * exponential + 6 * attraction * inverse;
  const second = decay * decay * exponential - 42 * attraction * inverse * inverse;
  const start = taperStart * table.cutoffA;
  if (r <= start) {
    out.energy = energy;
    out.first = first;
    out.second = second;
    return;
  }
  const width = table.cutoffA - start;
  const x = (r - start) / width;
  const y = 1 - x;
  const s = 1 - x ** 4 * (35 - 84 * x + 70 * x * x - 20 * x ** 3);
  const s1 = (-140 * x ** 3 * y ** 3) / width;
  const s2 = (-420 * x * x * y * y * (1 - 2 * x)) / (width * width);
  out.energy = energy * s;
  out.first = first * s + energy * s1;
  out.second = second * s + 2 * first * s1 + energy * s2;
}

/** ∫ from R to ∞ of 4πr² φ(r) dr: 4π [A ρ exp(−R/ρ)(R² + 2Rρ + 2ρ²) − C/(3R³)]. */
function tailIntegral({ prefactorEv, hardnessA: rho, dispersionEvA6 }: PairTerm, from: number) {
  const exponential =
    prefactorEv * rho * Math.exp(-from / rho) * (from * from + 2 * from * rho + 2 * rho * rho);
  return 4 * Math.PI * (exponential - dispersionEvA6 / (3 * from ** 3));
}

/**
 * Short-range energy of a cell left out by the cut-off if ions beyond it stood at their mean
 * density: ½ Σ_AB N_A N_B/V ∫ 4πr² φ_AB dr, from the middle of the taper.
 */
export function neglectedEnergyEv(input: PairModelInput, volumeA3: number): number {
  const numbers = new Map<number, number>();
  for (let i = 0; i < input.speciesIndex.length; i += 1) {
    const species = input.speciesIndex[i]!;
    numbers.set(species, (numbers.get(species) ?? 0) + 1);
  }
  const from = ((1 + taperStart) / 2) * input.cutoffA;
  return input.pairs.reduce((sum, term) => {
    const orders = term.speciesA === term.speciesB ? 1 : 2;
    const pairs = (numbers.get(term.speciesA) ?? 0) * (numbers.get(term.speciesB) ?? 0) * orders;
    return sum + (pairs / (2 * volumeA3)) * tailIntegral(term, from);
  }, 0);
}
