/** How far both Coulomb sums go, in widths of the Gaussian: exp(−s²) = 2 × 10⁻¹⁶. */
export const reach = 6;

/** Time of one real-space pair to that of one wave of one pair, roughly; see the bench. */
const pairToWaveTime = 12;

/** Splitting parameter and cut-offs of the two Coulomb sums. */
export interface Splitting {
  /** η, Å⁻¹. */
  readonly splittingPerA: number;
  readonly realCutoffA: number;
  readonly reciprocalCutoffPerA: number;
}

/**
 * Force constants take N² work in either space whatever η is: (2π/3) N² s³/(η³ V) vectors and
 * (1/3π²) N² s³ η³ V waves, in balance at η = √π (t_r/t_k)^{1/6} V^{−1/3} up to a factor near one.
 * The real sum goes at least as far as the short-range terms, for its vectors are visited anyway.
 *
 * @param factor multiplies η, cut-offs follow: the result must not change
 */
export function chooseSplitting(volumeA3: number, cutoffA: number, factor: number): Splitting {
  const balanced = Math.sqrt(Math.PI) * Math.cbrt(Math.sqrt(pairToWaveTime) / volumeA3);
  const splittingPerA = Math.min(balanced, reach / cutoffA) * factor;
  return {
    splittingPerA,
    realCutoffA: reach / splittingPerA,
    reciprocalCutoffPerA: 2 * reach * splittingPerA,
  };
}
