/**
 * Running sums with the rounding errors kept beside them, one per index: the result is as good as
 * if summed with twice the digits.
 * Source: A. Neumaier, Z. angew. Math. Mech. 54 (1974) 39–51, with the branch-free error term of
 * D. E. Knuth, The Art of Computer Programming 2, 4.2.2, theorem B.
 */
export class AccumulatorArray {
  readonly sums: Float64Array;

  readonly lost: Float64Array;

  constructor(readonly length: number) {
    this.sums = new Float64Array(length);
    this.lost = new Float64Array(length);
  }

  /** Adds one term to the sum of an index. */
  add(index: number, term: number): void {
    const sum = this.sums[index]!;
    const next = sum + term;
    const taken = next - sum;
    this.lost[index]! += sum - (next - taken) + (term - taken);
    this.sums[index] = next;
  }

  /** The sum of an index so far. */
  value(index: number): number {
    return this.sums[index]! + this.lost[index]!;
  }

  /** All sums so far. */
  values(): Float64Array {
    return this.sums.map((sum, index) => sum + this.lost[index]!);
  }
}

/** The compensated sum of a list. */
export function sumOf(terms: Iterable<number>): number {
  const total = new AccumulatorArray(1);
  for (const term of terms) {
    total.add(0, term);
  }
  return total.value(0);
}
