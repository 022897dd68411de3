import {
  equilibriumScale,
  netEv,
  netSlopeEv,
  type ScalingLaw,
} from '#common/physics/energetics/scaling-law';

/** Energies per formula unit at one spacing. */
export interface SpacingPoint {
  readonly spacingA: number;
  readonly attractionEv: number;
  readonly repulsionEv: number;
  readonly netEv: number;
  /** −dE/dr, eV Å⁻¹: positive pushes the ions apart. */
  readonly forceEvPerA: number;
}

/**
 * Energies and force at a spacing r, the shortest cation–anion distance; all distances scale with it.
 * @param givenSpacingA r of the cell as given
 */
export function spacingPoint(
  law: ScalingLaw,
  givenSpacingA: number,
  spacingA: number,
): SpacingPoint {
  const scale = spacingA / givenSpacingA;
  return {
    spacingA,
    attractionEv: law.attractionEv(scale),
    repulsionEv: law.repulsionEv(scale),
    netEv: netEv(law, scale),
    forceEvPerA: -netSlopeEv(law, scale) / givenSpacingA,
  };
}

/** Spacings worth showing: from where repulsion rules to where little is left of either. */
export function shownSpacingsA(
  laws: readonly ScalingLaw[],
  givenSpacingA: number,
): { fromA: number; toA: number } {
  const rest = laws.map((law) => equilibriumScale(law) ?? 1);
  const [least, most] = [Math.min(...rest), Math.max(...rest)];
  return { fromA: 0.72 * least * givenSpacingA, toA: 2.1 * most * givenSpacingA };
}

/** The curve at evenly spaced spacings. */
export function spacingCurve(
  law: ScalingLaw,
  givenSpacingA: number,
  { fromA, toA }: { fromA: number; toA: number },
  points = 240,
): SpacingPoint[] {
  return Array.from({ length: points }, (_, k) =>
    spacingPoint(law, givenSpacingA, fromA + ((toA - fromA) * k) / (points - 1)),
  );
}
