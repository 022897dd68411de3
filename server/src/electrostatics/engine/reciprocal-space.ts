import { Accumulator, AccumulatorArray } from './accumulator.js';
import type { PreparedCell, SplittingPlan } from './contract.js';

/** The reciprocal sum: energies by species, potentials, fields, strain derivative. */
export interface ReciprocalSums {
  /** Lower and upper triangle are the same; A ≠ B already counts both orders in [A][B], A < B. */
  readonly bySpecies: readonly (readonly Accumulator[])[];
  readonly potentials: AccumulatorArray;
  readonly fields: AccumulatorArray;
  readonly strainDerivative: readonly Accumulator[];
  readonly terms: number;
}

/** exp(2πi m x) of every site for m = −M … M: cosines and sines, site after site within an m. */
interface PhaseTable {
  readonly cosines: Float64Array;
  readonly sines: Float64Array;
}

function phaseTable(cell: PreparedCell, axis: number, largest: number): PhaseTable {
  const { count, fractional } = cell;
  const cosines = new Float64Array((2 * largest + 1) * count);
  const sines = new Float64Array((2 * largest + 1) * count);
  for (let m = 0; m <= largest; m += 1) {
    for (let i = 0; i < count; i += 1) {
      // Reduced before the cosine, so that high orders keep their digits.
      const turns = m * fractional[3 * i + axis]!;
      const angle = 2 * Math.PI * (turns - Math.round(turns));
      const [cosine, sine] = [Math.cos(angle), Math.sin(angle)];
      cosines[(largest + m) * count + i] = cosine;
      sines[(largest + m) * count + i] = sine;
      cosines[(largest - m) * count + i] = cosine;
      sines[(largest - m) * count + i] = -sine;
    }
  }
  return { cosines, sines };
}

/** Scratch for one row of waves (h, k fixed): phases and sums per site. */
interface RowScratch {
  readonly rowCos: Float64Array;
  readonly rowSin: Float64Array;
  readonly waveCos: Float64Array;
  readonly waveSin: Float64Array;
  /** Σ_l w Re(S* e), Σ_l w Im(S* e), Σ_l w l Im(S* e). */
  readonly inPhase: Float64Array;
  readonly outOfPhase: Float64Array;
  readonly outOfPhaseTimesL: Float64Array;
  readonly speciesCos: Float64Array;
  readonly speciesSin: Float64Array;
}

function rowScratch(count: number, kinds: number): RowScratch {
  return {
    rowCos: new Float64Array(count),
    rowSin: new Float64Array(count),
    waveCos: new Float64Array(count),
    waveSin: new Float64Array(count),
    inPhase: new Float64Array(count),
    outOfPhase: new Float64Array(count),
    outOfPhaseTimesL: new Float64Array(count),
    speciesCos: new Float64Array(kinds),
    speciesSin: new Float64Array(kinds),
  };
}

/** Phases of one wave and its structure factors S_A = Σ q exp(iG·r) by species. */
function structureFactors(
  cell: PreparedCell,
  row: RowScratch,
  table: PhaseTable,
  offset: number,
): void {
  const { charges, speciesStart } = cell;
  const { rowCos, rowSin, waveCos, waveSin } = row;
  const { cosines, sines } = table;
  for (let s = 0; s + 1 < speciesStart.length; s += 1) {
    let sumCos = 0;
    let sumSin = 0;
    for (let i = speciesStart[s]!; i < speciesStart[s + 1]!; i += 1) {
      const lc = cosines[offset + i]!;
      const ls = sines[offset + i]!;
      const cosine = rowCos[i]! * lc - rowSin[i]! * ls;
      const sine = rowCos[i]! * ls + rowSin[i]! * lc;
      waveCos[i] = cosine;
      waveSin[i] = sine;
      sumCos += charges[i]! * cosine;
      sumSin += charges[i]! * sine;
    }
    row.speciesCos[s] = sumCos;
    row.speciesSin[s] = sumSin;
  }
}

/** Adds one wave to the row's sums per site. */
function addWave(row: RowScratch, weight: number, l: number): void {
  const { waveCos, waveSin, inPhase, outOfPhase, outOfPhaseTimesL } = row;
  let cosine = 0;
  let sine = 0;
  for (let s = 0; s < row.speciesCos.length; s += 1) {
    cosine += row.speciesCos[s]!;
    sine += row.speciesSin[s]!;
  }
  cosine *= weight;
  sine *= weight;
  for (let i = 0; i < waveCos.length; i += 1) {
    const out = cosine * waveSin[i]! - sine * waveCos[i]!;
    inPhase[i]! += cosine * waveCos[i]! + sine * waveSin[i]!;
    outOfPhase[i]! += out;
    outOfPhaseTimesL[i]! += l * out;
  }
}

/** The sum over reciprocal vectors, one row (h, k) after another. */
class ReciprocalSum {
  readonly bySpecies: Accumulator[][];

  readonly potentials: AccumulatorArray;

  readonly fields: AccumulatorArray;

  readonly strainDerivative = Array.from({ length: 6 }, () => new Accumulator());

  terms = 0;

  private readonly largest: [number, number, number];

  private readonly tables: [PhaseTable, PhaseTable, PhaseTable];

  private readonly scratch: RowScratch;

  constructor(
    private readonly cell: PreparedCell,
    private readonly plan: SplittingPlan,
  ) {
    const kinds = cell.speciesStart.length - 1;
    this.bySpecies = Array.from({ length: kinds }, () =>
      Array.from({ length: kinds }, () => new Accumulator()),
    );
    this.potentials = new AccumulatorArray(cell.count);
    this.fields = new AccumulatorArray(3 * cell.count);
    this.scratch = rowScratch(cell.count, kinds);
    // h = G·a/2π, so |h| ≤ G_max |a|/2π in a cell of any shape.
    this.largest = [0, 1, 2].map((axis) => {
      const edge = Math.hypot(...cell.vectorsA.slice(3 * axis, 3 * axis + 3));
      return Math.floor((plan.reciprocalCutoffPerA * edge) / (2 * Math.PI));
    }) as [number, number, number];
    this.tables = [0, 1, 2].map((axis) => phaseTable(cell, axis, this.largest[axis]!)) as [
      PhaseTable,
      PhaseTable,
      PhaseTable,
    ];
  }

  run(): void {
    const [h, k] = this.largest;
    // Of G and −G one is enough: h > 0, or h = 0 and k > 0, or h = k = 0 and l > 0.
    for (let i = h; i >= 0; i -= 1) {
      for (let j = i === 0 ? 0 : -k; j <= k; j += 1) {
        this.addRow(i, j);
      }
    }
  }

  /** All waves with these h and k inside the cut-off. */
  private addRow(h: number, k: number): void {
    const b = this.cell.reciprocalPerA;
    const base = [0, 1, 2].map((axis) => h * b[axis]! + k * b[3 + axis]!) as [
      number,
      number,
      number,
    ];
    const along = base[0] * b[6]! + base[1] * b[7]! + base[2] * b[8]!;
    const step = b[6]! ** 2 + b[7]! ** 2 + b[8]! ** 2;
    const baseSquare = base[0] ** 2 + base[1] ** 2 + base[2] ** 2;
    const chord = along * along - step * (baseSquare - this.plan.reciprocalCutoffPerA ** 2);
    if (chord < 0) {
      return;
    }
    const halfWidth = Math.sqrt(chord) / step;
    const first = Math.max(-this.largest[2], Math.ceil(-along / step - halfWidth));
    const last = Math.min(this.largest[2], Math.floor(-along / step + halfWidth));
    const from = h === 0 && k === 0 ? Math.max(1, first) : first;
    if (from > last) {
      return;
    }
    this.startRow(h, k);
    for (let l = from; l <= last; l += 1) {
      this.addOne(l, base);
    }
    this.finishRow(base);
  }

  /** exp(i(h a* + k b*)·r) of every site, and empty sums. */
  private startRow(h: number, k: number): void {
    const { count } = this.cell;
    const [alongA, alongB] = this.tables;
    const [offsetA, offsetB] = [(this.largest[0] + h) * count, (this.largest[1] + k) * count];
    const { rowCos, rowSin, inPhase, outOfPhase, outOfPhaseTimesL } = this.scratch;
    for (let i = 0; i < count; i += 1) {
      const [ac, as] = [alongA.cosines[offsetA + i]!, alongA.sines[offsetA + i]!];
      const [bc, bs] = [alongB.cosines[offsetB + i]!, alongB.sines[offsetB + i]!];
      rowCos[i] = ac * bc - as * bs;
      rowSin[i] = ac * bs + as * bc;
    }
    inPhase.fill(0);
    outOfPhase.fill(0);
    outOfPhaseTimesL.fill(0);
  }

  private addOne(l: number, base: readonly [number, number, number]): void {
    const { cell, scratch } = this;
    const b = cell.reciprocalPerA;
    const gx = base[0] + l * b[6]!;
    const gy = base[1] + l * b[7]!;
    const gz = base[2] + l * b[8]!;
    const square = gx * gx + gy * gy + gz * gz;
    const quarter = 1 / (4 * this.plan.splittingPerA ** 2);
    const weight = Math.exp(-square * quarter) / square;
    structureFactors(cell, scratch, this.tables[2], (this.largest[2] + l) * cell.count);
    addWave(scratch, weight, l);
    const energy = this.bookSpecies(weight);
    // ∂/∂ε of exp(−G²/4η²)/G²/V: −δ_ab + 2 (1/G² + 1/4η²) G_a G_b.
    const bend = 2 * (1 / square + quarter);
    const [xx, yy, zz, yz, xz, xy] = this.strainDerivative as [
      Accumulator,
      Accumulator,
      Accumulator,
      Accumulator,
      Accumulator,
      Accumulator,
    ];
    xx.add(energy * (bend * gx * gx - 1));
    yy.add(energy * (bend * gy * gy - 1));
    zz.add(energy * (bend * gz * gz - 1));
    yz.add(energy * bend * gy * gz);
    xz.add(energy * bend * gx * gz);
    xy.add(energy * bend * gx * gy);
    this.terms += 1;
  }

  /** Books w Re(S_A S_B*) by species, both of ±G; returns the wave's whole energy. */
  private bookSpecies(weight: number): number {
    const { speciesCos, speciesSin } = this.scratch;
    // (2π/V) for each of G and −G.
    const factor = (4 * Math.PI * weight) / this.cell.volumeA3;
    let whole = 0;
    for (let s = 0; s < speciesCos.length; s += 1) {
      for (let t = s; t < speciesCos.length; t += 1) {
        const product = speciesCos[s]! * speciesCos[t]! + speciesSin[s]! * speciesSin[t]!;
        const term = factor * product * (s === t ? 1 : 2);
        this.bySpecies[s]![t]!.add(term);
        whole += term;
      }
    }
    return whole;
  }

  /** Moves the row's sums to the sites: φ = (4π/V) Σ w Re(S* e), −∇φ = (4π/V) Σ w G Im(S* e). */
  private finishRow(base: readonly [number, number, number]): void {
    const b = this.cell.reciprocalPerA;
    const factor = (8 * Math.PI) / this.cell.volumeA3;
    const { inPhase, outOfPhase, outOfPhaseTimesL } = this.scratch;
    for (let i = 0; i < this.cell.count; i += 1) {
      this.potentials.add(i, factor * inPhase[i]!);
      for (let axis = 0; axis < 3; axis += 1) {
        const gradient = base[axis]! * outOfPhase[i]! + b[6 + axis]! * outOfPhaseTimesL[i]!;
        this.fields.add(3 * i + axis, factor * gradient);
      }
    }
  }
}

/**
 * (2π/V) Σ_{G≠0} exp(−G²/4η²)/G² |S(G)|² within the cut-off, with potentials, fields and strain
 * derivatives, species by species.
 * Source: P. P. Ewald, Ann. Phys. 369 (1921) 253.
 */
export function sumReciprocalSpace(cell: PreparedCell, plan: SplittingPlan): ReciprocalSums {
  const sum = new ReciprocalSum(cell, plan);
  sum.run();
  return sum;
}
