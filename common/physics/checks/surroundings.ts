import type { EvaluationResult, SiteResult } from '#common/schemas/evaluation';

/** Neighbours of opposite charge at one distance. */
export interface OppositeShell {
  readonly speciesKey: string;
  readonly distanceA: number;
  readonly multiplicity: number;
}

/** Shells of ions whose charge has the other sign, nearest first. */
export function oppositeShells(site: SiteResult, result: EvaluationResult): OppositeShell[] {
  const charges = new Map(result.species.map(({ key, charge }) => [key, charge]));
  return site.shells
    .filter((shell) => (charges.get(shell.speciesKey) ?? 0) * site.charge < 0)
    .sort((a, b) => a.distanceA - b.distanceA);
}

/** Neighbours this much farther than the nearest of opposite charge still count as its shell. */
export const shellWidth = 1.25;
