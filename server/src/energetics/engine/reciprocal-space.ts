import { reciprocalVectors } from '#common/physics/cell-metric';
import { COULOMB_EV_ANGSTROM } from '#common/units/constants';

import { tensorPairs, type PairModelInput } from './contract.js';
import type { Splitting } from './splitting.js';
import { addUnitStrainsOf, unitStrainProducts, type Sums } from './sums.js';

/** Waves worked on at a time, so that the phases of two ions stay in the fastest cache. */
const blockSize = 128;

/** tr(E_v E_w) of the unit strains. */
const traceOfProducts = [1, 1, 1, 0.5, 0.5, 0.5];

/** The waves G of one half space within the cut-off: x, y, z and h, k, l of each. */
function listWaves(vectorsA: ArrayLike<number>, cutoffPerA: number) {
  const b = reciprocalVectors(Array.from(vectorsA));
  const largest = [0, 3, 6].map((k) => {
    const edge = Math.hypot(vectorsA[k]!, vectorsA[k + 1]!, vectorsA[k + 2]!);
    return Math.floor((cutoffPerA * edge) / (2 * Math.PI));
  });
  const vectors: number[] = [];
  const indices: number[] = [];
  const [hMax, kMax, lMax] = largest as [number, number, number];
  for (let h = 0; h <= hMax; h += 1) {
    for (let k = h === 0 ? 0 : -kMax; k <= kMax; k += 1) {
      for (let l = h === 0 && k === 0 ? 1 : -lMax; l <= lMax; l += 1) {
        const x = h * b[0]! + k * b[3]! + l * b[6]!;
        const y = h * b[1]! + k * b[4]! + l * b[7]!;
        const z = h * b[2]! + k * b[5]! + l * b[8]!;
        if (x * x + y * y + z * z <= cutoffPerA * cutoffPerA) {
          vectors.push(x, y, z);
          indices.push(h, k, l);
        }
      }
    }
  }
  return { vectors, indices };
}

/** The sum over waves as it runs, block after block. */
class ReciprocalSum {
  private readonly cosines: Float64Array;

  private readonly sines: Float64Array;

  /** Per wave of the block: structure factor, weight, then weight times GG (six). */
  private readonly factorCos = new Float64Array(blockSize);

  private readonly factorSin = new Float64Array(blockSize);

  private readonly tensors = new Float64Array(6 * blockSize);

  private readonly gradient: Float64Array;

  /** 2p t_v of the wave at hand, and G. */
  private readonly bend = new Float64Array(6);

  private readonly wave = new Float64Array(3);

  private readonly products = new Float64Array(6);

  /** Σ w|S|² p GG, six components: what multiplies −6 m_vw. */
  private readonly bentMoments = new Float64Array(6);

  private energy = 0;

  constructor(
    private readonly input: PairModelInput,
    private readonly splitting: Splitting,
    private readonly volumeA3: number,
    private readonly sums: Sums,
    private readonly withSecond: boolean,
  ) {
    this.cosines = new Float64Array(sums.count * blockSize);
    this.sines = new Float64Array(sums.count * blockSize);
    this.gradient = new Float64Array(3 * sums.count);
  }

  run(): void {
    const waves = listWaves(this.input.vectorsA, this.splitting.reciprocalCutoffPerA);
    const total = waves.vectors.length / 3;
    for (let from = 0; from < total; from += blockSize) {
      const size = Math.min(blockSize, total - from);
      this.fillPhases(waves.indices, from, size);
      for (let g = 0; g < size; g += 1) {
        this.wave[0] = waves.vectors[3 * (from + g)]!;
        this.wave[1] = waves.vectors[3 * (from + g) + 1]!;
        this.wave[2] = waves.vectors[3 * (from + g) + 2]!;
        this.addWave(g);
      }
      if (this.withSecond) {
        this.addCoupling(size);
      }
    }
    this.finish();
  }

  /** q exp(iG·r) of every ion for the waves of a block, and their sums. */
  private fillPhases(indices: readonly number[], from: number, size: number): void {
    const { cosines, sines, factorCos, factorSin } = this;
    const { fractional, chargesE } = this.input;
    factorCos.fill(0);
    factorSin.fill(0);
    for (let i = 0; i < this.sums.count; i += 1) {
      const charge = chargesE[i]!;
      const [x, y, z] = [fractional[3 * i]!, fractional[3 * i + 1]!, fractional[3 * i + 2]!];
      for (let g = 0; g < size; g += 1) {
        const at = 3 * (from + g);
        const turns = indices[at]! * x + indices[at + 1]! * y + indices[at + 2]! * z;
        const angle = 2 * Math.PI * (turns - Math.round(turns));
        const cosine = charge * Math.cos(angle);
        const sine = charge * Math.sin(angle);
        cosines[i * blockSize + g] = cosine;
        sines[i * blockSize + g] = sine;
        factorCos[g]! += cosine;
        factorSin[g]! += sine;
      }
    }
  }

  /** Energy, gradient and strain derivatives of one wave and its opposite. */
  private addWave(g: number): void {
    const { wave, bend, sums, products } = this;
    const x = wave[0]!;
    const y = wave[1]!;
    const z = wave[2]!;
    const square = x * x + y * y + z * z;
    const quarter = 1 / (4 * this.splitting.splittingPerA ** 2);
    // (2πk/V) for each of ±G.
    const weight =
      ((4 * Math.PI * COULOMB_EV_ANGSTROM) / this.volumeA3) *
      (Math.exp(-square * quarter) / square);
    const energy = weight * (this.factorCos[g]! ** 2 + this.factorSin[g]! ** 2);
    const p = 1 / square + quarter;
    for (let v = 0; v < 6; v += 1) {
      const [a, b] = tensorPairs[v]!;
      const product = wave[a]! * wave[b]!;
      products[v] = product;
      this.tensors[6 * g + v] = 2 * weight * product;
      this.bentMoments[v]! += energy * p * product;
      bend[v] = 2 * p * product - (v < 3 ? 1 : 0);
      sums.strain[v]! += energy * bend[v]!;
    }
    this.energy += energy;
    this.addToIons(g, weight);
    if (this.withSecond) {
      this.addStrainStrain(energy, square);
    }
  }

  /** ∂²ln W/∂ε∂ε + (∂ln W)(∂ln W), but for −6p m_vw and tr(E_v E_w), which come at the end. */
  private addStrainStrain(energy: number, square: number): void {
    const { bend, products, sums } = this;
    const quartic = (4 * energy) / (square * square);
    for (let v = 0; v < 6; v += 1) {
      for (let w = v; w < 6; w += 1) {
        sums.strainStrain[6 * v + w]! +=
          energy * bend[v]! * bend[w]! + quartic * products[v]! * products[w]!;
      }
    }
  }

  /** −2W q Im(S* e) G, and the same times ∂ln W/∂ε; ∂G/∂ε comes at the end. */
  private addToIons(g: number, weight: number): void {
    const { wave, bend, gradient, cosines, sines } = this;
    const { mixed, count } = this.sums;
    const [re, im] = [this.factorCos[g]!, this.factorSin[g]!];
    for (let i = 0; i < count; i += 1) {
      const at = i * blockSize + g;
      const slope = -2 * weight * (re * sines[at]! - im * cosines[at]!);
      for (let a = 0; a < 3; a += 1) {
        const along = slope * wave[a]!;
        gradient[3 * i + a]! += along;
        if (this.withSecond) {
          const row = 6 * (3 * i + a);
          for (let v = 0; v < 6; v += 1) {
            mixed[row + v]! += along * bend[v]!;
          }
        }
      }
    }
  }

  /** 2W q_i q_j cos(G·(r_i − r_j)) GG of every pair, the waves of a block summed in registers. */
  private addCoupling(size: number): void {
    const { count } = this.sums;
    for (let i = 0; i < count; i += 1) {
      for (let j = i + 1; j < count; j += 1) {
        this.addPairCoupling(i, j, size);
      }
    }
  }

  private addPairCoupling(i: number, j: number, size: number): void {
    const { cosines, sines, tensors } = this;
    const { coupling, count } = this.sums;
    let xx = 0;
    let yy = 0;
    let zz = 0;
    let yz = 0;
    let xz = 0;
    let xy = 0;
    for (let g = 0, a = i * blockSize, b = j * blockSize, t = 0; g < size; g += 1, t += 6) {
      const product = cosines[a + g]! * cosines[b + g]! + sines[a + g]! * sines[b + g]!;
      xx += product * tensors[t]!;
      yy += product * tensors[t + 1]!;
      zz += product * tensors[t + 2]!;
      yz += product * tensors[t + 3]!;
      xz += product * tensors[t + 4]!;
      xy += product * tensors[t + 5]!;
    }
    const row = 3 * i * 3 * count + 3 * j;
    const next = row + 3 * count;
    const last = next + 3 * count;
    coupling[row]! += xx;
    coupling[row + 1]! += xy;
    coupling[row + 2]! += xz;
    coupling[next]! += xy;
    coupling[next + 1]! += yy;
    coupling[next + 2]! += yz;
    coupling[last]! += xz;
    coupling[last + 1]! += yz;
    coupling[last + 2]! += zz;
  }

  private finish(): void {
    const { sums, gradient, bentMoments } = this;
    sums.coulomb += this.energy;
    for (let k = 0; k < gradient.length; k += 1) {
      sums.gradient[k]! += gradient[k]!;
    }
    if (!this.withSecond) {
      return;
    }
    const products = new Float64Array(36);
    unitStrainProducts(bentMoments, products);
    for (let v = 0; v < 6; v += 1) {
      for (let w = v; w < 6; w += 1) {
        const trace = v === w ? traceOfProducts[v]! * this.energy : 0;
        sums.strainStrain[6 * v + w]! += trace - 6 * products[6 * v + w]!;
      }
    }
    addUnitStrainsOf(gradient, -1, sums.mixed);
  }
}

/**
 * Adds (2πk/V) Σ_{G≠0} exp(−G²/4η²)/G² |S(G)|² to the sums, with gradients and, where asked for,
 * second derivatives. Under r → (1 + ε) r + u a wave becomes (1 + ε)⁻¹ G, so that with
 * t_v = G E_v G, m_vw = (E_v G)·(E_w G) and p = 1/G² + 1/4η²: ∂G²/∂ε_v = −2t_v,
 * ∂²G²/∂ε_v∂ε_w = 6 m_vw, and of W = exp(−G²/4η²)/(G² V)
 * ∂ln W/∂ε_v = 2p t_v − tr E_v, ∂²ln W/∂ε_v∂ε_w = 4 t_v t_w/G⁴ − 6p m_vw + tr(E_v E_w).
 * Source: P. P. Ewald, Ann. Phys. 369 (1921) 253; M. Born and K. Huang, Dynamical Theory of Crystal
 * Lattices (1954), § 30; differentiated here.
 */
export function addReciprocalSpace(
  input: PairModelInput,
  splitting: Splitting,
  volumeA3: number,
  sums: Sums,
  withSecond: boolean,
): void {
  new ReciprocalSum(input, splitting, volumeA3, sums, withSecond).run();
}
