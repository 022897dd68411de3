import { AccumulatorArray } from './accumulator.js';
import { buildBins, type Bins } from './bins.js';
import { Candidates } from './candidates.js';
import type { PreparedCell, SplittingPlan } from './contract.js';
import { erfcTable, intervalStride, intervalsPerUnit, polynomialAt } from './erfc.js';

/** The real-space sum: energies by species, potentials, fields, strain derivative. */
export interface RealSpaceSums {
  /** Energy of species s with t ≥ s at s·K + t, both orders of a pair counted. */
  readonly bySpecies: AccumulatorArray;
  readonly potentials: AccumulatorArray;
  readonly fields: Float64Array;
  readonly strainDerivative: AccumulatorArray;
  readonly terms: number;
  readonly shortestDistanceA: number;
}

const twoOverSqrtPi = 2 / Math.sqrt(Math.PI);

/**
 * The sum as it runs: bin by bin, site by site, species by species. A site's own share is summed in
 * local variables and moved to the totals once; the other ion of a pair gets its share at once.
 */
class RealSpaceSum implements RealSpaceSums {
  readonly bySpecies: AccumulatorArray;

  readonly potentials: AccumulatorArray;

  readonly fields: Float64Array;

  readonly strainDerivative = new AccumulatorArray(6);

  terms = 0;

  shortestSquare = Infinity;

  private readonly kinds: number;

  private readonly bins: Bins;

  private readonly near: Candidates;

  /** Sums of the site at hand over one species: φ, field, strain derivative. */
  private readonly own = new Float64Array(10);

  /** Of each hit: erfc(ηr)/r, and g(r). */
  private screened = new Float64Array(0);

  private slope = new Float64Array(0);

  constructor(
    private readonly cell: PreparedCell,
    private readonly plan: SplittingPlan,
  ) {
    this.kinds = cell.speciesStart.length - 1;
    this.bySpecies = new AccumulatorArray(this.kinds * this.kinds);
    this.potentials = new AccumulatorArray(cell.count);
    this.fields = new Float64Array(3 * cell.count);
    this.bins = buildBins(cell, plan.realCutoffA);
    this.near = new Candidates(cell, this.bins, plan.realCutoffA);
  }

  get shortestDistanceA(): number {
    return Math.sqrt(this.shortestSquare);
  }

  run(): void {
    const { start, order } = this.bins;
    for (let bin = 0; bin + 1 < start.length; bin += 1) {
      if (start[bin]! === start[bin + 1]!) {
        continue;
      }
      this.near.gather(bin);
      for (let position = start[bin]!; position < start[bin + 1]!; position += 1) {
        this.addSite(order[position]!);
      }
    }
  }

  /** All pairs of one site with what its bin's candidates hold, species by species. */
  private addSite(i: number): void {
    const { near, own, kinds } = this;
    const qi = this.cell.charges[i]!;
    const s = this.cell.species[i]!;
    for (let t = 0; t < kinds; t += 1) {
      const hits = near.select(i, t);
      if (hits === 0) {
        continue;
      }
      this.terms += hits;
      if (this.screened.length < hits) {
        this.screened = new Float64Array(near.hitSite.length);
        this.slope = new Float64Array(near.hitSite.length);
      }
      this.evaluateKernels(i, hits);
      this.sumOwn(hits);
      this.giveToOthers(i, hits);
      this.bySpecies.add(s < t ? s * kinds + t : t * kinds + s, qi * own[0]!);
      this.potentials.add(i, own[0]!);
      for (let axis = 0; axis < 3; axis += 1) {
        this.fields[3 * i + axis]! += own[1 + axis]!;
      }
      for (let k = 0; k < 6; k += 1) {
        this.strainDerivative.add(k, qi * own[4 + k]!);
      }
    }
  }

  /** erfc(ηr)/r and g(r) of every hit, from the table: interval, then distance from its centre. */
  private evaluateKernels(i: number, hits: number): void {
    const { near, screened, slope } = this;
    const { hitSquare, closeSquare } = near;
    const eta = this.plan.splittingPerA;
    const gaussianFactor = twoOverSqrtPi * eta;
    let shortest = this.shortestSquare;
    for (let hit = 0; hit < hits; hit += 1) {
      if (hitSquare[hit]! < closeSquare) {
        near.refine(i, hit);
      }
      const square = hitSquare[hit]!;
      shortest = square < shortest ? square : shortest;
      const r = Math.sqrt(square);
      const inverse = 1 / r;
      const x = eta * r;
      const interval = (x * intervalsPerUnit) | 0;
      const t = x - (interval + 0.5) / intervalsPerUnit;
      const base = interval * intervalStride;
      const value = polynomialAt(erfcTable, base, t) * inverse;
      const gaussian = gaussianFactor * polynomialAt(erfcTable, base + 8, t);
      screened[hit] = value;
      slope[hit] = (value + gaussian) * inverse * inverse;
    }
    this.shortestSquare = shortest;
  }

  /** Field and strain derivative of the site at hand; plain sums, for they are not shown so far. */
  private sumOwn(hits: number): void {
    const { own, slope } = this;
    const { hitSite, hitX, hitY, hitZ } = this.near;
    const { charges } = this.cell;
    // One variable each: an array would cost more than the arithmetic.
    let ex = 0;
    let ey = 0;
    let ez = 0;
    let xx = 0;
    let yy = 0;
    let zz = 0;
    let yz = 0;
    let xz = 0;
    let xy = 0;
    for (let hit = 0; hit < hits; hit += 1) {
      const pull = charges[hitSite[hit]!]! * slope[hit]!;
      const dx = hitX[hit]!;
      const dy = hitY[hit]!;
      const dz = hitZ[hit]!;
      const px = pull * dx;
      const py = pull * dy;
      const pz = pull * dz;
      ex -= px;
      ey -= py;
      ez -= pz;
      xx -= px * dx;
      yy -= py * dy;
      zz -= pz * dz;
      yz -= py * dz;
      xz -= px * dz;
      xy -= px * dy;
    }
    own[1] = ex;
    own[2] = ey;
    own[3] = ez;
    own[4] = xx;
    own[5] = yy;
    own[6] = zz;
    own[7] = yz;
    own[8] = xz;
    own[9] = xy;
  }

  /** Potential of the site at hand and what the other ions get of it: they see vectors reversed. */
  private giveToOthers(i: number, hits: number): void {
    const { own, fields, screened, slope } = this;
    const { sums, lost } = this.potentials;
    const { hitSite, hitX, hitY, hitZ } = this.near;
    const { charges } = this.cell;
    const qi = charges[i]!;
    let phi = 0;
    let phiLost = 0;
    for (let hit = 0; hit < hits; hit += 1) {
      const j = hitSite[hit]!;
      // Two sums with their rounding errors kept, as in the accumulator.
      const term = charges[j]! * screened[hit]!;
      const next = phi + term;
      const taken = next - phi;
      phiLost += phi - (next - taken) + (term - taken);
      phi = next;
      const given = qi * screened[hit]!;
      const before = sums[j]!;
      const after = before + given;
      const gained = after - before;
      lost[j]! += before - (after - gained) + (given - gained);
      sums[j] = after;
      const push = qi * slope[hit]!;
      fields[3 * j]! += push * hitX[hit]!;
      fields[3 * j + 1]! += push * hitY[hit]!;
      fields[3 * j + 2]! += push * hitZ[hit]!;
    }
    own[0] = phi + phiLost;
  }
}

/**
 * ½ Σ_ij Σ'_n q_i q_j erfc(ηr)/r within the cut-off, with φ_i = Σ q_j erfc(ηr)/r, the field
 * −∇φ and ∂E/∂ε_ab = −½ Σ q_i q_j g(r) r_a r_b, where
 * g(r) = (erfc(ηr)/r + 2η/√π exp(−η²r²))/r².
 * Source: P. P. Ewald, Ann. Phys. 369 (1921) 253; strain derivatives as in D. M. Heyes,
 * Phys. Rev. B 49 (1994) 755.
 *
 * Each pair is visited once and booked for both ions; of a site's own images at T and −T only one
 * is visited, so that booking it for both ions counts the two.
 */
export function sumRealSpace(cell: PreparedCell, plan: SplittingPlan): RealSpaceSums {
  const sum = new RealSpaceSum(cell, plan);
  sum.run();
  return sum;
}
