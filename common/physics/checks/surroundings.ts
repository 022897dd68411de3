import type { EvaluationResult, SiteResult } from '#common/schemas/evaluation';

/** Neighbours of one kind at one distance. */
export interface Shell {
  readonly speciesKey: string;
  readonly distanceA: number;
  readonly multiplicity: number;
}

function shellsOf(site: SiteResult, result: EvaluationResult, sign: 1 | -1): Shell[] {
  const charges = new Map(result.species.map(({ key, charge }) => [key, charge]));
  return site.shells
    .filter((shell) => (charges.get(shell.speciesKey) ?? 0) * site.charge * sign > 0)
    .sort((a, b) => a.distanceA - b.distanceA);
}

/** Shells of ions whose charge has the other sign, nearest first. */
export const oppositeShells = (site: SiteResult, result: EvaluationResult): Shell[] =>
  shellsOf(site, result, -1);

/** Shells of ions whose charge has the same sign, nearest first. */
export const likeShells = (site: SiteResult, result: EvaluationResult): Shell[] =>
  shellsOf(site, result, 1);

/** Neighbours this much farther than the nearest of opposite charge still count as its shell. */
export const shellWidth = 1.25;
