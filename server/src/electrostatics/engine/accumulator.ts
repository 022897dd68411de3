/**
 * A running sum with the rounding errors kept beside it: the result is as good as if summed with
 * twice the digits. Source: A. Neumaier, Z. angew. Math. Mech. 54 (1974) 39–51.
 */
export class Accumulator {
  private sum = 0;

  private lost = 0;

  /** Adds one term. */
  add(term: number): void {
    const next = this.sum + term;
    this.lost +=
      Math.abs(this.sum) >= Math.abs(term) ? this.sum - next + term : term - next + this.sum;
    this.sum = next;
  }

  /** The sum of all terms so far. */
  get value(): number {
    return this.sum + this.lost;
  }
}

/** Many running sums with compensation, one per index. */
export class AccumulatorArray {
  private readonly sums: Float64Array;

  private readonly lost: Float64Array;

  constructor(readonly length: number) {
    this.sums = new Float64Array(length);
    this.lost = new Float64Array(length);
  }

  /** Adds one term to the sum of an index. */
  add(index: number, term: number): void {
    const sum = this.sums[index]!;
    const next = sum + term;
    this.lost[index]! += Math.abs(sum) >= Math.abs(term) ? sum - next + term : term - next + sum;
    this.sums[index] = next;
  }

  /** The sum of an index so far. */
  value(index: number): number {
    return this.sums[index]! + this.lost[index]!;
  }
}
