import { cellVolumeA3, reciprocalVectors } from '#common/physics/cell-metric';

import type { CellOperation, PairModelInput, PairModelResult } from './contract.js';
import { choleskyFactor, choleskySolve } from './linear-algebra.js';
import { pairModel } from './pair-model.js';
import {
  placeOperations,
  symmetricDirections,
  symmetrisedSites,
  symmetryDeviationA,
  type PlacedOperation,
  type SparseDirection,
} from './symmetry.js';

/** When a relaxation ends. */
export interface RelaxCriteria {
  readonly maxForceEvPerA: number;
  readonly maxStressEvPerA3: number;
  readonly energyChangeEvPerIon: number;
  readonly stepLimit: number;
}

export const defaultRelaxCriteria: RelaxCriteria = {
  maxForceEvPerA: 1e-7,
  maxStressEvPerA3: 1e-8,
  energyChangeEvPerIon: 1e-9,
  stepLimit: 200,
};

export interface RelaxInput extends PairModelInput {
  /** Operations to keep, the identity among them; none keeps nothing. */
  readonly operations: readonly CellOperation[];
  /** Hydrostatic pressure, eV Å⁻³; 0 if left out. */
  readonly pressureEvPerA3?: number;
  /** Move ions only. */
  readonly isCellFixed?: boolean;
  readonly criteria?: Partial<RelaxCriteria>;
  /**
   * Closer than this two ions count as fallen together; if left out, 0.35 of the shortest distance
   * of the cell as given, and at least 0.5 Å.
   */
  readonly guardDistanceA?: number;
}

export interface RelaxStep {
  readonly step: number;
  readonly energyEv: number;
  readonly maxForceEvPerA: number;
  /** Of the stress and the pressure together. */
  readonly maxStressEvPerA3: number;
  readonly volumeA3: number;
}

export interface RelaxHooks {
  /** Called after every step, the first with the cell as given. */
  readonly onStep?: (step: RelaxStep) => void;
  /** Asked before every step. */
  readonly shouldStop?: () => boolean;
}

export type RelaxEnd =
  'converged' | 'step_limit' | 'collapsed' | 'dissolved' | 'no_descent' | 'stopped';

export interface RelaxResult {
  readonly ended: RelaxEnd;
  readonly vectorsA: readonly number[];
  readonly fractional: Float64Array;
  readonly before: PairModelResult;
  readonly after: PairModelResult;
  readonly steps: readonly RelaxStep[];
  readonly criteria: RelaxCriteria;
  readonly symmetryDeviationA: number;
}

/** Longest move of an ion and largest strain in one step. */
const longestMoveA = 0.3;
const largestStrain = 0.06;

/** Part of the predicted decrease a step must bring (L. Armijo, Pacific J. Math. 16 (1966) 1). */
const sufficientPart = 1e-4;

/** Halvings of a step before the search gives up. */
const longestSearch = 30;

/** Ions of any charge are farther apart than this, and no relaxation brings them this much closer. */
const smallestGuardA = 0.5;
const guardPart = 0.35;

/** A cell this many times larger than it began has come apart. */
const dissolvedFactor = 8;

/** A cell on its way, with everything evaluated there. */
interface State {
  readonly input: PairModelInput;
  readonly result: PairModelResult;
  readonly enthalpyEv: number;
}

/** (1 + ε) r + u of every ion, and the cell with it. */
function movedBy(input: PairModelInput, move: Float64Array): PairModelInput {
  const n = 3 * input.chargesE.length;
  const [xx, yy, zz] = [1 + move[n]!, 1 + move[n + 1]!, 1 + move[n + 2]!];
  const [yz, xz, xy] = [move[n + 3]! / 2, move[n + 4]! / 2, move[n + 5]! / 2];
  const f = [xx, xy, xz, xy, yy, yz, xz, yz, zz];
  const vectorsA = Array.from({ length: 9 }, (_, k) => {
    const row = 3 * Math.floor(k / 3);
    const axis = k % 3;
    return (
      input.vectorsA[row]! * f[axis]! +
      input.vectorsA[row + 1]! * f[3 + axis]! +
      input.vectorsA[row + 2]! * f[6 + axis]!
    );
  });
  const b = reciprocalVectors(vectorsA);
  const fractional = Float64Array.from(input.fractional);
  for (let i = 0; i < n; i += 3) {
    for (let k = 0; k < 3; k += 1) {
      fractional[i + k]! +=
        (move[i]! * b[3 * k]! + move[i + 1]! * b[3 * k + 1]! + move[i + 2]! * b[3 * k + 2]!) /
        (2 * Math.PI);
    }
  }
  return { ...input, vectorsA, fractional };
}

/**
 * A minimisation as it runs: Newton steps from the analytic second derivatives in the space of
 * moves that keep the operations. Where the curvature is not positive, a multiple of the unit
 * matrix is added until it is (K. Levenberg, Quart. Appl. Math. 2 (1944) 164), which leaves a
 * direction downhill; the step is cut to a longest move and halved until the enthalpy falls enough.
 */
class Relaxation {
  readonly steps: RelaxStep[] = [];

  readonly criteria: RelaxCriteria;

  state: State;

  readonly before: PairModelResult;

  readonly operations: readonly PlacedOperation[];

  private readonly directions: readonly SparseDirection[];

  private readonly pressure: number;

  private readonly guardA: number;

  private lastChange = 0;

  constructor(
    private readonly input: RelaxInput,
    private readonly hooks: RelaxHooks,
  ) {
    this.criteria = { ...defaultRelaxCriteria, ...input.criteria };
    this.pressure = input.pressureEvPerA3 ?? 0;
    this.operations = placeOperations(
      input,
      input.operations.length > 0 ? input.operations : [unit],
    );
    const volumeA3 = cellVolumeA3(Array.from(input.vectorsA));
    const lengthA = input.isCellFixed === true ? null : Math.cbrt(volumeA3);
    this.directions = symmetricDirections(this.operations, input.chargesE.length, lengthA);
    const fractional = symmetrisedSites(input.fractional, this.operations);
    this.state = this.evaluate({ ...input, fractional });
    this.before = this.state.result;
    this.guardA =
      input.guardDistanceA ?? Math.max(smallestGuardA, guardPart * this.before.shortestDistanceA);
  }

  run(): RelaxEnd {
    this.record();
    for (;;) {
      const { result } = this.state;
      if (result.shortestDistanceA < this.guardA) {
        return 'collapsed';
      }
      if (this.isConverged()) {
        return 'converged';
      }
      if (result.volumeA3 > dissolvedFactor * this.before.volumeA3) {
        return 'dissolved';
      }
      if (this.steps.length > this.criteria.stepLimit) {
        return 'step_limit';
      }
      if (this.hooks.shouldStop?.() === true) {
        return 'stopped';
      }
      const failure = this.takeStep();
      if (failure !== null) {
        return failure;
      }
      this.record();
    }
  }

  private evaluate(input: PairModelInput): State {
    const result = pairModel(input, true);
    return { input, result, enthalpyEv: result.energyEv + this.pressure * result.volumeA3 };
  }

  private maxForce(): number {
    return this.state.result.forcesEvPerA.reduce((most, f) => Math.max(most, Math.abs(f)), 0);
  }

  private maxStress(): number {
    return this.state.result.stressEvPerA3.reduce(
      (most, s, v) => Math.max(most, Math.abs(s + (v < 3 ? this.pressure : 0))),
      0,
    );
  }

  private isConverged(): boolean {
    const { criteria } = this;
    const isStressMet =
      this.input.isCellFixed === true || this.maxStress() <= criteria.maxStressEvPerA3;
    return (
      isStressMet &&
      this.maxForce() <= criteria.maxForceEvPerA &&
      this.lastChange <= criteria.energyChangeEvPerIon * this.input.chargesE.length
    );
  }

  private record(): void {
    const step: RelaxStep = {
      step: this.steps.length,
      energyEv: this.state.result.energyEv,
      maxForceEvPerA: this.maxForce(),
      maxStressEvPerA3: this.maxStress(),
      volumeA3: this.state.result.volumeA3,
    };
    this.steps.push(step);
    this.hooks.onStep?.(step);
  }

  /** Slope of the enthalpy along each symmetric direction. */
  private slopes({ result }: State): Float64Array {
    const count = this.input.chargesE.length;
    const full = new Float64Array(3 * count + 6);
    result.forcesEvPerA.forEach((force, k) => (full[k] = -force));
    result.stressEvPerA3.forEach((stress, v) => {
      full[3 * count + v] = result.volumeA3 * (stress + (v < 3 ? this.pressure : 0));
    });
    return Float64Array.from(this.directions, ({ at, value }) => {
      let sum = 0;
      for (let k = 0; k < at.length; k += 1) {
        sum += value[k]! * full[at[k]!]!;
      }
      return sum;
    });
  }

  /** ∂²H between two entries of the full list of displacements and strains. */
  private curvatureBetween(i: number, j: number, held: number): number {
    const { volumeA3, second } = this.state.result;
    const width = 3 * this.input.chargesE.length;
    if (i < width && j < width) {
      // A shift of the whole cell along an axis costs `held`, so that nothing is undetermined.
      return second!.forceConstantsEvPerA2[i * width + j]! + (i % 3 === j % 3 ? held : 0);
    }
    if (i < width || j < width) {
      const [ion, strain] = i < width ? [i, j - width] : [j, i - width];
      return second!.internalStrainEvPerA[6 * ion + strain]!;
    }
    const [v, w] = [i - width, j - width];
    // ∂²V/∂ε_v∂ε_w = V (tr E_v tr E_w − tr E_v E_w).
    const bend = (v < 3 && w < 3 ? 1 : 0) - (v === w ? (v < 3 ? 1 : 0.5) : 0);
    return second!.strainStrainEv[6 * v + w]! + this.pressure * volumeA3 * bend;
  }

  private curvature(): Float64Array {
    const m = this.directions.length;
    const count = this.input.chargesE.length;
    const k = this.state.result.second!.forceConstantsEvPerA2;
    let trace = 0;
    for (let i = 0; i < 3 * count; i += 1) {
      trace += Math.abs(k[i * 3 * count + i]!);
    }
    const held = trace / (3 * count * count) || 1;
    const reduced = new Float64Array(m * m);
    for (let p = 0; p < m; p += 1) {
      const first = this.directions[p]!;
      for (let q = p; q < m; q += 1) {
        const other = this.directions[q]!;
        let sum = 0;
        for (let a = 0; a < first.at.length; a += 1) {
          for (let b = 0; b < other.at.length; b += 1) {
            sum +=
              first.value[a]! *
              other.value[b]! *
              this.curvatureBetween(first.at[a]!, other.at[b]!, held);
          }
        }
        reduced[p * m + q] = sum;
        reduced[q * m + p] = sum;
      }
    }
    return reduced;
  }

  /** −(H + μ)⁻¹ g with the smallest μ of a rising list that makes H + μ positive definite. */
  private newtonStep(slopes: Float64Array): Float64Array {
    const m = slopes.length;
    const curvature = this.curvature();
    let largest = 0;
    for (let p = 0; p < m; p += 1) {
      largest = Math.max(largest, Math.abs(curvature[p * m + p]!));
    }
    let shift = 0;
    for (;;) {
      const shifted = curvature.slice();
      for (let p = 0; p < m; p += 1) {
        shifted[p * m + p]! += shift;
      }
      const factor = choleskyFactor(shifted, m);
      if (factor !== null) {
        const step = slopes.map((slope) => -slope);
        choleskySolve(factor, m, step);
        return step;
      }
      shift = shift === 0 ? 1e-3 * (largest || 1) : 3 * shift;
      if (!(shift < Infinity)) {
        throw new RangeError('the second derivatives are not finite numbers');
      }
    }
  }

  /** A step in the symmetric directions as displacements and strains, cut to the longest move. */
  private moveOf(step: Float64Array): { move: Float64Array; scale: number } {
    const width = 3 * this.input.chargesE.length;
    const move = new Float64Array(width + 6);
    this.directions.forEach(({ at, value }, p) => {
      at.forEach((entry, k) => (move[entry]! += step[p]! * value[k]!));
    });
    let scale = 1;
    move.forEach((value, k) => {
      const limit = k < width ? longestMoveA : largestStrain;
      scale = Math.min(scale, limit / Math.max(Math.abs(value), limit));
    });
    return { move, scale };
  }

  /** One step; says what is wrong if there is none to take. */
  private takeStep(): RelaxEnd | null {
    const slopes = this.slopes(this.state);
    const step = this.newtonStep(slopes);
    const { move, scale } = this.moveOf(step);
    const descent = slopes.reduce((sum, slope, p) => sum + slope * step[p]!, 0);
    for (let halving = 0; halving < longestSearch; halving += 1) {
      const part = scale * 0.5 ** halving;
      const next = movedBy(
        this.state.input,
        move.map((value) => part * value),
      );
      const fractional = symmetrisedSites(next.fractional, this.operations);
      const trial = this.evaluate({ ...next, fractional });
      const isTooClose = trial.result.shortestDistanceA < this.guardA;
      if (!isTooClose && this.isLower(trial, part * descent)) {
        this.lastChange = Math.abs(trial.enthalpyEv - this.state.enthalpyEv);
        this.state = trial;
        return null;
      }
      if (isTooClose && halving >= 3) {
        return 'collapsed';
      }
    }
    return 'no_descent';
  }

  /** Enough of the predicted decrease or, where rounding hides it, smaller slopes. */
  private isLower(trial: State, predicted: number): boolean {
    const change = trial.enthalpyEv - this.state.enthalpyEv;
    const rounding = 1e-12 * (Math.abs(trial.result.coulombEv) + Math.abs(trial.enthalpyEv));
    if (-predicted > rounding) {
      return change <= sufficientPart * predicted;
    }
    const norm = (state: State) => Math.hypot(...this.slopes(state));
    return change <= rounding && norm(trial) < norm(this.state);
  }
}

const unit: CellOperation = { rotation: [1, 0, 0, 0, 1, 0, 0, 0, 1], translation: [0, 0, 0] };

/** Minimises the enthalpy of a checked input; see the door. */
export function relaxCell(input: RelaxInput, hooks: RelaxHooks): RelaxResult {
  const relaxation = new Relaxation(input, hooks);
  const ended = relaxation.run();
  const { state, operations } = relaxation;
  return {
    ended,
    vectorsA: Array.from(state.input.vectorsA),
    fractional: Float64Array.from(state.input.fractional),
    before: relaxation.before,
    after: state.result,
    steps: relaxation.steps,
    criteria: relaxation.criteria,
    symmetryDeviationA: symmetryDeviationA(
      state.input.vectorsA,
      state.input.fractional,
      operations,
    ),
  };
}
