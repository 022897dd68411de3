import { AccumulatorArray } from './accumulator.js';
import type { PreparedCell, SplittingPlan } from './contract.js';

/** The reciprocal sum: energies by species, potentials, fields, strain derivative. */
export interface ReciprocalSums {
  /** Energy of species s with t ≥ s at s·K + t, both orders of a pair counted. */
  readonly bySpecies: AccumulatorArray;
  readonly potentials: AccumulatorArray;
  readonly fields: Float64Array;
  readonly strainDerivative: AccumulatorArray;
  readonly terms: number;
}

/** Sites worked on at a time, so that their phases stay in the fastest cache. */
const blockSize = 128;

type Triple = [number, number, number];

/** exp(2πi m x) of every site for m = 0 … M: cosines and sines, site after site within an m. */
interface PhaseTable {
  readonly cosines: Float64Array;
  readonly sines: Float64Array;
}

function phaseTable(cell: PreparedCell, axis: number, largest: number): PhaseTable {
  const { count, fractional } = cell;
  const cosines = new Float64Array((largest + 1) * count);
  const sines = new Float64Array((largest + 1) * count);
  for (let m = 0; m <= largest; m += 1) {
    for (let i = 0; i < count; i += 1) {
      // Reduced before the cosine, so that high orders keep their digits.
      const turns = m * fractional[3 * i + axis]!;
      const angle = 2 * Math.PI * (turns - Math.round(turns));
      cosines[m * count + i] = Math.cos(angle);
      sines[m * count + i] = Math.sin(angle);
    }
  }
  return { cosines, sines };
}

/** Sites of one species, at most {@link blockSize} of them: from, to, species. */
function speciesBlocks(cell: PreparedCell): Int32Array {
  const blocks: number[] = [];
  for (let s = 0; s + 1 < cell.speciesStart.length; s += 1) {
    const end = cell.speciesStart[s + 1]!;
    for (let from = cell.speciesStart[s]!; from < end; from += blockSize) {
      blocks.push(from, Math.min(end, from + blockSize), s);
    }
  }
  return Int32Array.from(blocks);
}

/** One row of waves: h and k fixed, l = centre − half … centre + half, some at the ends left out. */
interface Row {
  readonly h: number;
  readonly k: number;
  readonly first: number;
  readonly last: number;
  readonly centre: number;
  readonly half: number;
  /** h a* + k b* + centre c*, Å⁻¹. */
  readonly base: Triple;
}

/**
 * The sum as it runs, row after row. The phase of a wave is B exp(±2πi m z), B that of the middle of
 * its row, so that the waves at centre + m and centre − m share their products.
 */
class ReciprocalSum implements ReciprocalSums {
  readonly bySpecies: AccumulatorArray;

  readonly potentials: AccumulatorArray;

  readonly fields: Float64Array;

  readonly strainDerivative = new AccumulatorArray(6);

  terms = 0;

  private readonly kinds: number;

  private readonly blocks: Int32Array;

  private readonly largest: Triple;

  private readonly tables: readonly [PhaseTable, PhaseTable, PhaseTable];

  /** Phase of each site in the middle of the row, and the same times the charge. */
  private readonly baseCos: Float64Array;

  private readonly baseSin: Float64Array;

  private readonly chargeCos: Float64Array;

  private readonly chargeSin: Float64Array;

  /** Per species and m: Σ q B cos, Σ q B sin, real and imaginary parts of each. */
  private readonly factors: Float64Array;

  /** Per m: real and imaginary parts of P and of Q. */
  private readonly weights: Float64Array;

  /** Structure factors by species of the wave at hand. */
  private readonly waveCos: Float64Array;

  private readonly waveSin: Float64Array;

  constructor(
    private readonly cell: PreparedCell,
    private readonly plan: SplittingPlan,
  ) {
    const { count } = cell;
    this.kinds = cell.speciesStart.length - 1;
    this.blocks = speciesBlocks(cell);
    this.bySpecies = new AccumulatorArray(this.kinds * this.kinds);
    this.potentials = new AccumulatorArray(count);
    this.fields = new Float64Array(3 * count);
    // h = G·a/2π, so |h| ≤ G_max |a|/2π in a cell of any shape.
    this.largest = [0, 3, 6].map((k) => {
      const edge = Math.hypot(cell.vectorsA[k]!, cell.vectorsA[k + 1]!, cell.vectorsA[k + 2]!);
      return Math.floor((plan.reciprocalCutoffPerA * edge) / (2 * Math.PI));
    }) as Triple;
    this.tables = [0, 1, 2].map((axis) =>
      phaseTable(cell, axis, this.largest[axis]!),
    ) as unknown as [PhaseTable, PhaseTable, PhaseTable];
    this.baseCos = new Float64Array(count);
    this.baseSin = new Float64Array(count);
    this.chargeCos = new Float64Array(count);
    this.chargeSin = new Float64Array(count);
    this.factors = new Float64Array(4 * this.kinds * (this.largest[2] + 1));
    this.weights = new Float64Array(4 * (this.largest[2] + 1));
    this.waveCos = new Float64Array(this.kinds);
    this.waveSin = new Float64Array(this.kinds);
  }

  run(): void {
    const [h, k] = this.largest;
    // Of G and −G one is enough: h > 0, or h = 0 and k > 0, or h = k = 0 and l > 0.
    for (let i = h; i >= 0; i -= 1) {
      for (let j = i === 0 ? 0 : -k; j <= k; j += 1) {
        const row = this.rowAt(i, j);
        if (row !== null) {
          this.addRow(row);
        }
      }
    }
  }

  /** The waves with these h and k inside the cut-off: l on a chord of the sphere. */
  private rowAt(h: number, k: number): Row | null {
    const b = this.cell.reciprocalPerA;
    const at = (axis: number, l: number) => h * b[axis]! + k * b[3 + axis]! + l * b[6 + axis]!;
    const [x, y, z] = [at(0, 0), at(1, 0), at(2, 0)];
    const along = x * b[6]! + y * b[7]! + z * b[8]!;
    const step = b[6]! * b[6]! + b[7]! * b[7]! + b[8]! * b[8]!;
    const outside = x * x + y * y + z * z - this.plan.reciprocalCutoffPerA ** 2;
    const chord = along * along - step * outside;
    if (chord < 0) {
      return null;
    }
    const halfWidth = Math.sqrt(chord) / step;
    const lowest = Math.max(-this.largest[2], Math.ceil(-along / step - halfWidth));
    const last = Math.min(this.largest[2], Math.floor(-along / step + halfWidth));
    const first = h === 0 && k === 0 ? Math.max(1, lowest) : lowest;
    if (first > last) {
      return null;
    }
    const centre = Math.ceil((first + last) / 2);
    const half = Math.max(last - centre, centre - first);
    return { h, k, first, last, centre, half, base: [at(0, centre), at(1, centre), at(2, centre)] };
  }

  private addRow(row: Row): void {
    const { blocks } = this;
    this.factors.fill(0);
    for (let b = 0; b < blocks.length; b += 3) {
      this.startBlock(row, blocks[b]!, blocks[b + 1]!);
      this.addFactors(row.half, blocks[b]!, blocks[b + 1]!, blocks[b + 2]!);
    }
    for (let m = 0; m <= row.half; m += 1) {
      this.weigh(row, m);
    }
    for (let b = 0; b < blocks.length; b += 3) {
      this.addToSites(row, blocks[b]!, blocks[b + 1]!);
    }
  }

  /** B = exp(i(h a* + k b* + centre c*)·r) of the sites of a block. */
  private startBlock(row: Row, from: number, to: number): void {
    const { count, charges } = this.cell;
    const [alongA, alongB, alongC] = this.tables;
    const offsetA = row.h * count;
    const offsetB = Math.abs(row.k) * count;
    const offsetC = Math.abs(row.centre) * count;
    const signB = row.k < 0 ? -1 : 1;
    const signC = row.centre < 0 ? -1 : 1;
    for (let i = from; i < to; i += 1) {
      const ac = alongA.cosines[offsetA + i]!;
      const as = alongA.sines[offsetA + i]!;
      const bc = alongB.cosines[offsetB + i]!;
      const bs = signB * alongB.sines[offsetB + i]!;
      const cc = alongC.cosines[offsetC + i]!;
      const cs = signC * alongC.sines[offsetC + i]!;
      const rowCos = ac * bc - as * bs;
      const rowSin = ac * bs + as * bc;
      const cosine = rowCos * cc - rowSin * cs;
      const sine = rowCos * cs + rowSin * cc;
      this.baseCos[i] = cosine;
      this.baseSin[i] = sine;
      this.chargeCos[i] = charges[i]! * cosine;
      this.chargeSin[i] = charges[i]! * sine;
    }
  }

  /** U = Σ qB cos(2πmz) and W = Σ qB sin(2πmz) of a block: S at centre ± m is U ± iW. */
  private addFactors(half: number, from: number, to: number, species: number): void {
    const { chargeCos, chargeSin, factors } = this;
    const { cosines, sines } = this.tables[2];
    const { count } = this.cell;
    for (let m = 0; m <= half; m += 1) {
      const offset = m * count;
      let uCos = 0;
      let uSin = 0;
      let wCos = 0;
      let wSin = 0;
      for (let i = from; i < to; i += 1) {
        const c = cosines[offset + i]!;
        const s = sines[offset + i]!;
        const qc = chargeCos[i]!;
        const qs = chargeSin[i]!;
        uCos += qc * c;
        uSin += qs * c;
        wCos += qc * s;
        wSin += qs * s;
      }
      const at = 4 * (m * this.kinds + species);
      factors[at]! += uCos;
      factors[at + 1]! += uSin;
      factors[at + 2]! += wCos;
      factors[at + 3]! += wSin;
    }
  }

  /**
   * Books the waves at centre ± m and keeps what the sites need of them: with T± = w± S±*, their
   * sum over both is B·(P cos + iQ sin), P = T₊ + T₋, Q = T₊ − T₋.
   */
  private weigh(row: Row, m: number): void {
    this.weights.fill(0, 4 * m, 4 * m + 4);
    this.weighSide(row, m, 1);
    if (m > 0) {
      this.weighSide(row, m, -1);
    }
  }

  private weighSide(row: Row, m: number, sign: 1 | -1): void {
    const { factors, weights, waveCos, waveSin, kinds } = this;
    const l = row.centre + sign * m;
    if (l < row.first || l > row.last) {
      return;
    }
    let cosine = 0;
    let sine = 0;
    for (let s = 0; s < kinds; s += 1) {
      const at = 4 * (m * kinds + s);
      waveCos[s] = factors[at]! - sign * factors[at + 3]!;
      waveSin[s] = factors[at + 1]! + sign * factors[at + 2]!;
      cosine += waveCos[s]!;
      sine += waveSin[s]!;
    }
    const weight = this.bookWave(row, sign * m);
    weights[4 * m]! += weight * cosine;
    weights[4 * m + 1]! -= weight * sine;
    weights[4 * m + 2]! += sign * weight * cosine;
    weights[4 * m + 3]! -= sign * weight * sine;
  }

  /** Energy by species and strain derivative of one wave; returns w = exp(−G²/4η²)/G². */
  private bookWave(row: Row, m: number): number {
    const b = this.cell.reciprocalPerA;
    const { strainDerivative } = this;
    const gx = row.base[0] + m * b[6]!;
    const gy = row.base[1] + m * b[7]!;
    const gz = row.base[2] + m * b[8]!;
    const square = gx * gx + gy * gy + gz * gz;
    const quarter = 1 / (4 * this.plan.splittingPerA ** 2);
    const weight = Math.exp(-square * quarter) / square;
    const energy = this.bookSpecies(weight);
    // ∂/∂ε of exp(−G²/4η²)/G²/V: −δ_ab + 2 (1/G² + 1/4η²) G_a G_b.
    const bend = 2 * energy * (1 / square + quarter);
    strainDerivative.add(0, bend * gx * gx - energy);
    strainDerivative.add(1, bend * gy * gy - energy);
    strainDerivative.add(2, bend * gz * gz - energy);
    strainDerivative.add(3, bend * gy * gz);
    strainDerivative.add(4, bend * gx * gz);
    strainDerivative.add(5, bend * gx * gy);
    this.terms += 1;
    return weight;
  }

  /** Books w Re(S_A S_B*) by species, both of ±G; returns the wave's whole energy. */
  private bookSpecies(weight: number): number {
    const { waveCos, waveSin, bySpecies, kinds } = this;
    // (2π/V) for each of G and −G.
    const factor = (4 * Math.PI * weight) / this.cell.volumeA3;
    let whole = 0;
    for (let s = 0; s < kinds; s += 1) {
      for (let t = s; t < kinds; t += 1) {
        const product = waveCos[s]! * waveCos[t]! + waveSin[s]! * waveSin[t]!;
        const term = factor * product * (s === t ? 1 : 2);
        bySpecies.add(s * kinds + t, term);
        whole += term;
      }
    }
    return whole;
  }

  /**
   * Moves the row to the sites: φ = (4π/V) Σ w Re(S* e), −∇φ = (4π/V) Σ w G Im(S* e), G of a wave
   * being that of the middle of the row and m times c*.
   */
  private addToSites(row: Row, from: number, to: number): void {
    const { weights, baseCos, baseSin, potentials, fields } = this;
    const { cosines, sines } = this.tables[2];
    const { count, volumeA3, reciprocalPerA } = this.cell;
    const [gx, gy, gz] = row.base;
    const [cx, cy, cz] = [reciprocalPerA[6]!, reciprocalPerA[7]!, reciprocalPerA[8]!];
    const factor = (8 * Math.PI) / volumeA3;
    for (let i = from; i < to; i += 1) {
      // Σ of all waves over B, and Σ of m times each: real and imaginary parts.
      let sumCos = weights[0]!;
      let sumSin = weights[1]!;
      let bentCos = 0;
      let bentSin = 0;
      for (let m = 1, at = count + i, w = 4; m <= row.half; m += 1, at += count, w += 4) {
        const c = cosines[at]!;
        const s = sines[at]!;
        const pCos = weights[w]!;
        const pSin = weights[w + 1]!;
        const qCos = weights[w + 2]!;
        const qSin = weights[w + 3]!;
        sumCos += pCos * c - qSin * s;
        sumSin += pSin * c + qCos * s;
        bentCos += m * (qCos * c - pSin * s);
        bentSin += m * (qSin * c + pCos * s);
      }
      const bc = factor * baseCos[i]!;
      const bs = factor * baseSin[i]!;
      potentials.add(i, bc * sumCos - bs * sumSin);
      const along = bc * sumSin + bs * sumCos;
      const bent = bc * bentSin + bs * bentCos;
      fields[3 * i]! += gx * along + cx * bent;
      fields[3 * i + 1]! += gy * along + cy * bent;
      fields[3 * i + 2]! += gz * along + cz * bent;
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
