import {
  buildNeighbourGrid,
  forEachNeighbour,
  type NeighbourGrid,
} from '#common/physics/neighbours';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { PairLedger, PairLedgerRow } from '#common/schemas/evaluation';
import { COULOMB_EV_ANGSTROM } from '#common/units/constants';

/** How a ledger is drawn up. */
export interface PairLedgerOptions {
  /** Rows reach to this distance; the default completes the shell at or above 3 d₀. */
  readonly reachA?: number;
  readonly view?: PairLedger['view'];
  /** Distances closer than this are one row; 1e-3 Å unless set. */
  readonly groupingA?: number;
}

/** Width of a distance group unless set, Å. */
export const defaultGroupingA = 1e-3;

/** Pairs of one kind and one distance, counted per cell. */
interface PairGroup {
  readonly a: number;
  readonly b: number;
  distanceA: number;
  pairsPerCell: number;
}

/** Ion kinds of a cell: their keys in order of first appearance, and each site's kind. */
export interface SpeciesOfCell {
  readonly keys: readonly string[];
  readonly chargesE: readonly number[];
  readonly indexOfSite: Int32Array;
}

/** Numbers the ion kinds of a cell, cations first, each in order of first appearance. */
export function speciesOfCell(cell: ResolvedCell): SpeciesOfCell {
  const charges = new Map<string, number>();
  cell.sites.forEach((site) => charges.set(site.speciesKey, site.chargeE));
  const isAnion = (key: string) => charges.get(key)! < 0;
  const seen = [...charges.keys()];
  const keys = [...seen.filter((key) => !isAnion(key)), ...seen.filter(isAnion)];
  const index = new Map(keys.map((key, k) => [key, k]));
  return {
    keys,
    chargesE: keys.map((key) => charges.get(key)!),
    indexOfSite: Int32Array.from(cell.sites, (site) => index.get(site.speciesKey)!),
  };
}

function gridOf(cell: ResolvedCell, radiusA: number): NeighbourGrid {
  const fractional = new Float64Array(3 * cell.sites.length);
  cell.sites.forEach((site, i) => fractional.set(site.fractional, 3 * i));
  return buildNeighbourGrid(cell.vectorsA, fractional, radiusA);
}

/** Adds a group to one of nearly the same distance. */
function mergeInto(group: PairGroup, entry: PairGroup): void {
  const pairs = group.pairsPerCell + entry.pairsPerCell;
  const weighted = group.distanceA * group.pairsPerCell + entry.distanceA * entry.pairsPerCell;
  group.distanceA = weighted / pairs;
  group.pairsPerCell = pairs;
}

/** Decimals of Å that tell rows apart: three, more where the grouping is finer. */
function decimalsFor(groupingA: number): number {
  return Math.min(12, Math.max(3, Math.ceil(-Math.log10(groupingA) - 1e-9)));
}

/**
 * Merges neighbouring distances of a sorted list into groups no wider than the grouping, and groups
 * whose mean distances read the same, so that no two rows have one name.
 */
function groupDistances(sorted: readonly PairGroup[], groupingA: number): PairGroup[] {
  const groups: PairGroup[] = [];
  let startA = -Infinity;
  for (const entry of sorted) {
    const last = groups.at(-1);
    if (last !== undefined && entry.distanceA - startA <= groupingA) {
      mergeInto(last, entry);
    } else {
      groups.push({ ...entry });
      startA = entry.distanceA;
    }
  }
  const decimals = decimalsFor(groupingA);
  const named: PairGroup[] = [];
  for (const group of groups) {
    const last = named.at(-1);
    if (last?.distanceA.toFixed(decimals) === group.distanceA.toFixed(decimals)) {
      mergeInto(last, group);
    } else {
      named.push(group);
    }
  }
  return named;
}

/** Of a lattice translation and its opposite, one. */
function isFirstOfTwo([x, y, z]: readonly [number, number, number]): boolean {
  return x > 0 || (x === 0 && (y > 0 || (y === 0 && z > 0)));
}

/**
 * All pairs of charged sites within a radius, by kind and distance; each pair is counted once. Looks
 * at every site of the cell: copies made by operations need not see the same surroundings, for
 * nothing forces the operations a person lists to be a group.
 */
function collectPairs(
  cell: ResolvedCell,
  species: SpeciesOfCell,
  radiusA: number,
  groupingA: number,
): PairGroup[] {
  const grid = gridOf(cell, radiusA);
  const { chargesE, indexOfSite } = species;
  const kinds = chargesE.length;
  const shells = new Map<number, PairGroup>();
  for (let i = 0; i < indexOfSite.length; i += 1) {
    const own = indexOfSite[i]!;
    if (chargesE[own] === 0) {
      continue;
    }
    forEachNeighbour(grid, i, radiusA, (j, distanceA, image) => {
      const other = indexOfSite[j]!;
      if (j < i || chargesE[other] === 0 || (j === i && !isFirstOfTwo(image))) {
        return;
      }
      const a = Math.min(own, other);
      const b = Math.max(own, other);
      // Rounded only to find equal distances quickly; the distances themselves are kept.
      const key = (Math.round(distanceA * 1e6) * kinds + a) * kinds + b;
      const shell = shells.get(key);
      if (shell === undefined) {
        shells.set(key, { a, b, distanceA, pairsPerCell: 1 });
      } else {
        shell.pairsPerCell += 1;
      }
    });
  }
  const byKind = new Map<number, PairGroup[]>();
  for (const shell of shells.values()) {
    const kind = shell.a * kinds + shell.b;
    const list = byKind.get(kind);
    if (list === undefined) {
      byKind.set(kind, [shell]);
    } else {
      list.push(shell);
    }
  }
  return [...byKind.values()].flatMap((list) =>
    groupDistances(
      list.sort((p, q) => p.distanceA - q.distanceA),
      groupingA,
    ),
  );
}

/** Shortest distance between ions of opposite sign, Å; null if the cell has not both. */
export function shortestUnlike(
  cell: ResolvedCell,
): { distanceA: number; siteA: number; siteB: number } | null {
  const hasBoth = [1, -1].every((sign) => cell.sites.some(({ chargeE }) => chargeE * sign > 0));
  if (!hasBoth) {
    return null;
  }
  const roomA = Math.cbrt(cell.volumeA3 / cell.sites.length);
  for (let radiusA = 1.2 * roomA; ; radiusA *= 1.6) {
    const grid = gridOf(cell, radiusA);
    let best: { distanceA: number; siteA: number; siteB: number } | null = null;
    for (let site = 0; site < cell.sites.length; site += 1) {
      if (cell.sites[site]!.chargeE <= 0) {
        continue;
      }
      forEachNeighbour(grid, site, radiusA, (j, distanceA) => {
        if (cell.sites[j]!.chargeE < 0 && (best === null || distanceA < best.distanceA)) {
          best = { distanceA, siteA: site, siteB: j };
        }
      });
    }
    if (best !== null) {
      return best;
    }
  }
}

/**
 * The reach a ledger has unless told otherwise, Å: the smallest R ≥ 3 d₀ that completes a shell, or
 * three times the room of a site where all ions have one sign.
 */
export function defaultReachA(cell: ResolvedCell): number {
  const unlike = shortestUnlike(cell);
  const startA = 3 * (unlike?.distanceA ?? Math.cbrt(cell.volumeA3 / cell.sites.length));
  const species = speciesOfCell(cell);
  if (species.chargesE.every((chargeE) => chargeE === 0)) {
    return startA;
  }
  for (let radiusA = 1.15 * startA; ; radiusA *= 1.3) {
    // 3 d₀ itself is a shell of many lattices: rounding must not push it out.
    const beyond = collectPairs(cell, species, radiusA, defaultGroupingA)
      .map(({ distanceA }) => distanceA)
      .filter((distanceA) => distanceA >= startA * (1 - 1e-9) - defaultGroupingA / 2);
    if (beyond.length > 0) {
      return beyond.reduce((least, distanceA) => Math.min(least, distanceA));
    }
  }
}

/** Name of a row that annotations and addresses use: `Mg+2|O-2|2.106`. */
function rowKey(speciesA: string, speciesB: string, distance: string): string {
  return `${speciesA}|${speciesB}|${distance}`;
}

/** Distance for sorting: rounding must not decide which of two kinds at one distance comes first. */
const sortingDistance = ({ distanceA }: PairGroup) => Math.round(distanceA * 1e6);

/**
 * The pair ledger: energy by ion-pair kinds out to a reach R, closed by what lies beyond.
 * Rows carry n·k_e q_A q_B/d per formula unit; in the neutralised view n·k_e q_A q_B (1/d − 1/R)
 * with one self term −k_e Σq²/(2R), which makes each ion's sphere neutral (Wolf et al. (1999)
 * J. Chem. Phys. 110, 8254). Rows, self term and closing row add up to the total exactly.
 *
 * @param totalEv periodic electrostatic energy per formula unit, eV
 * @param formulaUnitsPerCell Z
 */
export function buildPairLedger(
  cell: ResolvedCell,
  totalEv: number,
  formulaUnitsPerCell: number,
  options: PairLedgerOptions = {},
): PairLedger {
  const view = options.view ?? 'bare';
  const groupingA = options.groupingA ?? defaultGroupingA;
  const reachA = options.reachA ?? defaultReachA(cell);
  const species = speciesOfCell(cell);
  const isNeutralised = view === 'neutralised';
  const selfEv = isNeutralised
    ? (-COULOMB_EV_ANGSTROM * cell.sites.reduce((sum, { chargeE }) => sum + chargeE ** 2, 0)) /
      (2 * reachA * formulaUnitsPerCell)
    : 0;
  const groups = collectPairs(cell, species, reachA + groupingA / 2, groupingA).sort(
    (p, q) => sortingDistance(p) - sortingDistance(q) || p.a - q.a || p.b - q.b,
  );
  const decimals = decimalsFor(groupingA);
  let runningEv = 0;
  const rows: PairLedgerRow[] = groups.map(({ a, b, distanceA, pairsPerCell }) => {
    const pairEnergyEv =
      (COULOMB_EV_ANGSTROM * species.chargesE[a]! * species.chargesE[b]!) / distanceA;
    const pairsPerFormulaUnit = pairsPerCell / formulaUnitsPerCell;
    const weight = isNeutralised ? Math.max(0, 1 - distanceA / reachA) : 1;
    const contributionEv = pairsPerFormulaUnit * pairEnergyEv * weight;
    runningEv += contributionEv;
    const [speciesA, speciesB] = [species.keys[a]!, species.keys[b]!];
    return {
      key: rowKey(speciesA, speciesB, distanceA.toFixed(decimals)),
      speciesA,
      speciesB,
      distanceA,
      pairsPerFormulaUnit,
      pairEnergyEv,
      contributionEv,
      runningEv,
    };
  });
  return { reachA, view, rows, selfEv, beyondEv: totalEv - runningEv - selfEv, totalEv };
}
