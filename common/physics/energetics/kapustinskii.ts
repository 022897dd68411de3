import type { SizedIon } from '#common/physics/energetics/ion-sizes';

/** K in kJ mol⁻¹ Å and the repulsion length in Å of Kapustinskii's full form. */
export const kapustinskiiConstants = { energyLengthKjAPerMol: 1202.5, repulsionA: 0.345 } as const;

/**
 * Kapustinskii's estimate from formula and ionic radii alone, kJ mol⁻¹, negative:
 * U = −K · Σ n z² /(r₊ + r₋) · (1 − 0.345 Å/(r₊ + r₋)).
 *
 * For two ion kinds Σ n z² is ν|z₊z₋| (A. F. Kapustinskii (1956) Q. Rev. Chem. Soc. 10, 283); for
 * more the sum of squares stands in its place, with mean radii (L. Glasser (1995) Inorg. Chem. 34,
 * 4935; from memory).
 *
 * @param chargeSquares Σ n z² per formula unit
 * @param radiusSumA r₊ + r₋, Å
 */
export function kapustinskiiKjPerMol(chargeSquares: number, radiusSumA: number): number {
  const { energyLengthKjAPerMol, repulsionA } = kapustinskiiConstants;
  return ((-energyLengthKjAPerMol * chargeSquares) / radiusSumA) * (1 - repulsionA / radiusSumA);
}

export interface KapustinskiiEstimate {
  readonly energyKjPerMol: number | null;
  readonly radiusSumA: number | null;
  /** True where more than two ion kinds ask for the generalised form. */
  readonly isGeneralised: boolean;
  readonly reason: string | null;
}

function meanRadiusA(ions: readonly SizedIon[]): number {
  const count = ions.reduce((sum, ion) => sum + ion.perFormulaUnit, 0);
  return ions.reduce((sum, ion) => sum + ion.perFormulaUnit * ion.radiusA!, 0) / count;
}

/** The estimate for the ions of a cell, with the radii of their coordination; or why there is none. */
export function kapustinskiiEstimate(ions: readonly SizedIon[]): KapustinskiiEstimate {
  const charged = ions.filter(({ chargeE }) => chargeE !== 0);
  const isGeneralised = charged.length > 2;
  const unsized = charged.find(({ radiusA }) => radiusA === null);
  const cations = charged.filter(({ chargeE }) => chargeE > 0);
  const anions = charged.filter(({ chargeE }) => chargeE < 0);
  if (unsized !== undefined || cations.length === 0 || anions.length === 0) {
    const reason =
      unsized === undefined
        ? 'It needs ions of both signs.'
        : `The tables have no ionic radius for ${unsized.speciesKey}: add one under the workspace’s data values.`;
    return { energyKjPerMol: null, radiusSumA: null, isGeneralised, reason };
  }
  const radiusSumA = meanRadiusA(cations) + meanRadiusA(anions);
  const chargeSquares = charged.reduce(
    (sum, ion) => sum + ion.perFormulaUnit * ion.chargeE ** 2,
    0,
  );
  const energyKjPerMol = kapustinskiiKjPerMol(chargeSquares, radiusSumA);
  return { energyKjPerMol, radiusSumA, isGeneralised, reason: null };
}
