import { reciprocalVectors } from '#common/physics/cell-metric';
import { COULOMB_EV_ANGSTROM } from '#common/units/constants';

import { erfc } from '#server/electrostatics/engine/index';
import type { PairModelInput } from './contract.js';
import {
  shortRangeAt,
  shortRangeTable,
  type RadialValue,
  type ShortRangeTable,
} from './short-range.js';
import type { Splitting } from './splitting.js';
import { addUnitStrainsOf, unitStrainProducts, type Sums } from './sums.js';

const twoOverSqrtPi = 2 / Math.sqrt(Math.PI);

/**
 * The sum over vectors between ions as it runs. Of a pair energy φ(d), with A₁ = φ′/r and
 * A₂ = (φ″ − φ′/r)/r²: ∂φ/∂d = A₁ d and ∂²φ/∂d∂d = A₁ 1 + A₂ d d.
 */
class RealSpaceSum {
  private readonly table: ShortRangeTable;

  private readonly radial: RadialValue = { energy: 0, first: 0, second: 0 };

  /** Cut-off over the distance of neighbouring lattice planes, along each axis. */
  private readonly reaches: readonly [number, number, number];

  /** Σ A₁ d d, six components. */
  private readonly firstMoments = new Float64Array(6);

  /** The vector at hand, and its products d d. */
  private readonly own = new Float64Array(3);

  private readonly products = new Float64Array(6);

  private readonly gradient: Float64Array;

  private readonly cutoffSquare: number;

  private weight = 1;

  private chargeProduct = 0;

  private tableIndex = 0;

  constructor(
    private readonly input: PairModelInput,
    private readonly splitting: Splitting,
    private readonly sums: Sums,
    private readonly withSecond: boolean,
  ) {
    this.table = shortRangeTable(input);
    const b = reciprocalVectors(Array.from(input.vectorsA));
    const farA = Math.max(splitting.realCutoffA, input.cutoffA);
    this.cutoffSquare = farA * farA;
    const reachAlong = (k: number) =>
      (farA * Math.hypot(b[k]!, b[k + 1]!, b[k + 2]!)) / (2 * Math.PI);
    this.reaches = [reachAlong(0), reachAlong(3), reachAlong(6)];
    this.gradient = new Float64Array(3 * sums.count);
  }

  run(): void {
    const { count } = this.sums;
    const { chargesE, speciesIndex } = this.input;
    for (let i = 0; i < count; i += 1) {
      for (let j = i; j < count; j += 1) {
        this.weight = i === j ? 0.5 : 1;
        this.chargeProduct = COULOMB_EV_ANGSTROM * chargesE[i]! * chargesE[j]!;
        this.tableIndex = speciesIndex[i]! * this.table.kinds + speciesIndex[j]!;
        this.visitImages(i, j);
      }
    }
    this.finish();
  }

  /** All vectors within the cut-off from ion i to the images of ion j. */
  private visitImages(i: number, j: number): void {
    const { vectorsA: v, fractional } = this.input;
    const [reachA, reachB, reachC] = this.reaches;
    const fa = fractional[3 * j]! - fractional[3 * i]!;
    const fb = fractional[3 * j + 1]! - fractional[3 * i + 1]!;
    const fc = fractional[3 * j + 2]! - fractional[3 * i + 2]!;
    for (let a = fa + Math.ceil(-reachA - fa); a <= reachA; a += 1) {
      for (let b = fb + Math.ceil(-reachB - fb); b <= reachB; b += 1) {
        const x = a * v[0]! + b * v[3]!;
        const y = a * v[1]! + b * v[4]!;
        const z = a * v[2]! + b * v[5]!;
        for (let c = fc + Math.ceil(-reachC - fc); c <= reachC; c += 1) {
          const dx = x + c * v[6]!;
          const dy = y + c * v[7]!;
          const dz = z + c * v[8]!;
          const square = dx * dx + dy * dy + dz * dz;
          // An ion does not meet itself: of its own images only the nearest vector is zero.
          if (square <= this.cutoffSquare && (i !== j || square > 1e-12)) {
            this.addVector(i, j, dx, dy, dz, square);
          }
        }
      }
    }
  }

  private addVector(
    i: number,
    j: number,
    dx: number,
    dy: number,
    dz: number,
    square: number,
  ): void {
    const { sums, radial, weight } = this;
    sums.shortestSquare = Math.min(sums.shortestSquare, square);
    const r = Math.sqrt(square);
    const inverseSquare = 1 / square;
    const eta = this.splitting.splittingPerA;
    const x = eta * r;
    const screened = erfc(x) / r;
    const gaussian = twoOverSqrtPi * eta * Math.exp(-x * x);
    let first = -this.chargeProduct * (screened + gaussian) * inverseSquare;
    let second =
      this.chargeProduct *
      (3 * (screened + gaussian) * inverseSquare + 2 * eta * eta * gaussian) *
      inverseSquare;
    sums.coulomb += weight * this.chargeProduct * screened;
    if (r < this.table.cutoffA) {
      shortRangeAt(this.table, this.tableIndex, r, radial);
      sums.shortRange += weight * radial.energy;
      first += radial.first / r;
      second += (radial.second - radial.first / r) * inverseSquare;
    }
    this.addFirst(i, j, dx, dy, dz, weight * first);
    if (this.withSecond) {
      this.addSecond(i, j, dx, dy, dz, weight * first, weight * second);
    }
  }

  /** Gradient of both ions, and the moments behind ∂E/∂ε. */
  private addFirst(i: number, j: number, dx: number, dy: number, dz: number, a1: number): void {
    const { gradient, firstMoments: t } = this;
    const px = a1 * dx;
    const py = a1 * dy;
    const pz = a1 * dz;
    t[0]! += px * dx;
    t[1]! += py * dy;
    t[2]! += pz * dz;
    t[3]! += py * dz;
    t[4]! += px * dz;
    t[5]! += px * dy;
    if (i !== j) {
      gradient[3 * i]! -= px;
      gradient[3 * i + 1]! -= py;
      gradient[3 * i + 2]! -= pz;
      gradient[3 * j]! += px;
      gradient[3 * j + 1]! += py;
      gradient[3 * j + 2]! += pz;
    }
  }

  /** A₂ t_v t_w for the strain; −(A₁ 1 + A₂ d d) and ± A₂ d t_v for two different ions. */
  private addSecond(
    i: number,
    j: number,
    dx: number,
    dy: number,
    dz: number,
    a1: number,
    a2: number,
  ): void {
    const { strainStrain, coupling, mixed, count } = this.sums;
    const { own, products: t } = this;
    t[0] = dx * dx;
    t[1] = dy * dy;
    t[2] = dz * dz;
    t[3] = dy * dz;
    t[4] = dx * dz;
    t[5] = dx * dy;
    for (let v = 0; v < 6; v += 1) {
      const product = a2 * t[v]!;
      for (let w = v; w < 6; w += 1) {
        strainStrain[6 * v + w]! += product * t[w]!;
      }
    }
    if (i === j) {
      return;
    }
    own[0] = dx;
    own[1] = dy;
    own[2] = dz;
    for (let a = 0; a < 3; a += 1) {
      const product = a2 * own[a]!;
      const row = (3 * i + a) * 3 * count + 3 * j;
      for (let b = 0; b < 3; b += 1) {
        coupling[row + b]! -= product * own[b]! + (a === b ? a1 : 0);
      }
      const atI = 6 * (3 * i + a);
      const atJ = 6 * (3 * j + a);
      for (let v = 0; v < 6; v += 1) {
        mixed[atI + v]! -= product * t[v]!;
        mixed[atJ + v]! += product * t[v]!;
      }
    }
  }

  /** What follows from the moments: ∂E/∂ε, Σ A₁ (E_v d)·(E_w d), and Σ ± A₁ E_v d. */
  private finish(): void {
    const { sums, gradient, firstMoments } = this;
    for (let v = 0; v < 6; v += 1) {
      sums.strain[v]! += firstMoments[v]!;
    }
    for (let k = 0; k < gradient.length; k += 1) {
      sums.gradient[k]! += gradient[k]!;
    }
    if (this.withSecond) {
      const products = new Float64Array(36);
      unitStrainProducts(firstMoments, products);
      for (let at = 0; at < 36; at += 1) {
        sums.strainStrain[at]! += products[at]!;
      }
      addUnitStrainsOf(gradient, 1, sums.mixed);
    }
  }
}

/**
 * Adds the pair energies within the cut-offs to the sums: k q_i q_j erfc(ηr)/r and the short-range
 * terms, with gradients and, where asked for, second derivatives. A₁ and A₂ of the screened charges:
 * −(ψ + g)/r² and (3(ψ + g)/r² + 2η²g)/r² with ψ = erfc(ηr)/r, g = 2η/√π exp(−η²r²).
 * Source: P. P. Ewald, Ann. Phys. 369 (1921) 253; M. Born and K. Huang, Dynamical Theory of Crystal
 * Lattices (1954), §§ 23–30; differentiated here.
 */
export function addRealSpace(
  input: PairModelInput,
  splitting: Splitting,
  sums: Sums,
  withSecond: boolean,
): void {
  new RealSpaceSum(input, splitting, sums, withSecond).run();
}
