import { fractionalToCartesian } from '#common/physics/cell-metric';
import { buildNeighbourGrid, forEachNeighbour } from '#common/physics/neighbours';
import { defaultGroupingA } from '#common/physics/pair-ledger';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { ShellRow } from '#common/schemas/evaluation';
import { COULOMB_EV_ANGSTROM } from '#common/units/constants';

/** An ion: a site of the cell in one of its periodic images. */
export interface Ion {
  readonly siteIndex: number;
  readonly image: readonly [number, number, number];
}

interface Shell {
  readonly speciesKey: string;
  readonly chargeE: number;
  distanceSumA: number;
  multiplicity: number;
}

/** Neighbours within the radius, nearest first, of one kind and nearly one distance together. */
function collectShells(cell: ResolvedCell, siteIndex: number, radiusA: number): Shell[] {
  const fractional = new Float64Array(3 * cell.sites.length);
  cell.sites.forEach((site, i) => fractional.set(site.fractional, 3 * i));
  const grid = buildNeighbourGrid(cell.vectorsA, fractional, radiusA);
  const found: { distanceA: number; site: number }[] = [];
  forEachNeighbour(grid, siteIndex, radiusA, (site, distanceA) => found.push({ distanceA, site }));
  found.sort((a, b) => a.distanceA - b.distanceA);
  const shells: Shell[] = [];
  const open = new Map<string, { shell: Shell; startA: number }>();
  for (const { distanceA, site } of found) {
    const { speciesKey, chargeE } = cell.sites[site]!;
    const current = open.get(speciesKey);
    if (current !== undefined && distanceA - current.startA <= defaultGroupingA) {
      current.shell.distanceSumA += distanceA;
      current.shell.multiplicity += 1;
    } else {
      const shell = { speciesKey, chargeE, distanceSumA: distanceA, multiplicity: 1 };
      open.set(speciesKey, { shell, startA: distanceA });
      shells.push(shell);
    }
  }
  return shells;
}

/**
 * The shell table of one ion: neighbours by kind and distance, with the bare Coulomb energy
 * multiplicity · k_e q_i q_j / d of the ion with each shell and its running sum.
 *
 * @param siteIndex index into `cell.sites`
 * @param reachA farthest distance listed, Å
 */
export function buildShellTable(cell: ResolvedCell, siteIndex: number, reachA: number): ShellRow[] {
  const chargeE = cell.sites[siteIndex]!.chargeE;
  let runningEv = 0;
  return collectShells(cell, siteIndex, reachA + defaultGroupingA / 2).map((shell) => {
    const distanceA = shell.distanceSumA / shell.multiplicity;
    const energyEv =
      (shell.multiplicity * COULOMB_EV_ANGSTROM * chargeE * shell.chargeE) / distanceA;
    runningEv += energyEv;
    return {
      speciesKey: shell.speciesKey,
      distanceA,
      multiplicity: shell.multiplicity,
      energyEv,
      runningEv,
    };
  });
}

/**
 * Distance of two ions in Å and the bare energy k_e q_A q_B / d of the pair in eV.
 * The energy is NaN for an ion with itself.
 */
export function pairDistance(
  cell: ResolvedCell,
  ionA: Ion,
  ionB: Ion,
): { distanceA: number; energyEv: number } {
  const [siteA, siteB] = [cell.sites[ionA.siteIndex]!, cell.sites[ionB.siteIndex]!];
  const apart = [0, 1, 2].map(
    (k) => siteB.fractional[k]! + ionB.image[k]! - siteA.fractional[k]! - ionA.image[k]!,
  );
  const distanceA = Math.hypot(...fractionalToCartesian(cell.vectorsA, apart));
  return {
    distanceA,
    energyEv:
      distanceA === 0 ? NaN : (COULOMB_EV_ANGSTROM * siteA.chargeE * siteB.chargeE) / distanceA,
  };
}
