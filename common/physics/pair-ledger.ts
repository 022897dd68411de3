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

/**
 * One site of each set of symmetry copies, with the number of copies: neighbours need to be looked
 * up once per set, since copies see the same surroundings.
 */
function representatives(cell: ResolvedCell): { site: number; multiplicity: number }[] {
  const byRow = new Map<number, { site: number; multiplicity: number }>();
  cell.sites.forEach(({ definitionIndex, copy }, site) => {
    const known = byRow.get(definitionIndex);
    if (known === undefined) {
      byRow.set(definitionIndex, { site, multiplicity: 1 });
    } else {
      known.multiplicity += 1;
      if (copy === 0) {
        known.site = site;
      }
    }
  });
  return [...byRow.values()];
}

/** Merges neighbouring distances of a sorted list into groups no wider than the grouping. */
function groupDistances(sorted: readonly PairGroup[], groupingA: number): PairGroup[] {
  const groups: PairGroup[] = [];
  let startA = -Infinity;
  for (const entry of sorted) {
    const last = groups.at(-1);
    if (last !== undefined && entry.distanceA - startA <= groupingA) {
      const pairs = last.pairsPerCell + entry.pairsPerCell;
      const weighted = last.distanceA * last.pairsPerCell + entry.distanceA * entry.pairsPerCell;
      last.distanceA = weighted / pairs;
      last.pairsPerCell = pairs;
    } else {
      groups.push({ ...entry });
      startA = entry.distanceA;
    }
  }
  return groups;
}

/** All pairs within a radius, by kind and distance; each pair is counted once. */
function collectPairs(
  cell: ResolvedCell,
  species: SpeciesOfCell,
  radiusA: number,
  groupingA: number,
): PairGroup[] {
  const grid = gridOf(cell, radiusA);
  const kinds = species.keys.length;
  const found = new Map<number, PairGroup[]>();
  for (const { site, multiplicity } of representatives(cell)) {
    const a = species.indexOfSite[site]!;
    const shells = new Map<number, PairGroup>();
    forEachNeighbour(grid, site, radiusA, (j, distanceA) => {
      const b = species.indexOfSite[j]!;
      // Rounded only to find equal distances quickly; the distances themselves are kept.
      const key = Math.round(distanceA * 1e7) * kinds + b;
      const shell = shells.get(key);
      if (shell === undefined) {
        shells.set(key, {
          a: Math.min(a, b),
          b: Math.max(a, b),
          distanceA,
          pairsPerCell: multiplicity / 2,
        });
      } else {
        shell.pairsPerCell += multiplicity / 2;
      }
    });
    for (const shell of shells.values()) {
      const kind = shell.a * kinds + shell.b;
      found.set(kind, [...(found.get(kind) ?? []), shell]);
    }
  }
  return [...found.values()].flatMap((list) =>
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
    for (const { site } of representatives(cell)) {
      const charge = cell.sites[site]!.chargeE;
      if (charge <= 0) {
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

/** The distance at or just above 3 d₀ (or three times the room of a site) that completes a shell. */
export function defaultReachA(cell: ResolvedCell): number {
  const unlike = shortestUnlike(cell);
  const startA = 3 * (unlike?.distanceA ?? Math.cbrt(cell.volumeA3 / cell.sites.length));
  const species = speciesOfCell(cell);
  for (let radiusA = 1.15 * startA; ; radiusA *= 1.3) {
    const beyond = collectPairs(cell, species, radiusA, defaultGroupingA)
      .map(({ distanceA }) => distanceA)
      .filter((distanceA) => distanceA >= startA - defaultGroupingA);
    if (beyond.length > 0) {
      return Math.min(...beyond);
    }
  }
}

/** Name of a row that annotations and addresses use: `Mg+2|O-2|2.106`. */
function rowKey(speciesA: string, speciesB: string, distanceA: number): string {
  return `${speciesA}|${speciesB}|${distanceA.toFixed(3)}`;
}

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
  const groups = collectPairs(cell, species, reachA + groupingA / 2, groupingA)
    .filter(({ a, b }) => species.chargesE[a] !== 0 && species.chargesE[b] !== 0)
    .sort((p, q) => {
      const apart = p.distanceA - q.distanceA;
      return Math.abs(apart) > groupingA ? apart : p.a - q.a || p.b - q.b || apart;
    });
  let runningEv = 0;
  const rows: PairLedgerRow[] = groups.map(({ a, b, distanceA, pairsPerCell }) => {
    const pairEnergyEv =
      (COULOMB_EV_ANGSTROM * species.chargesE[a]! * species.chargesE[b]!) / distanceA;
    const pairsPerFormulaUnit = pairsPerCell / formulaUnitsPerCell;
    const weight = isNeutralised ? Math.max(0, 1 - distanceA / reachA) : 1;
    const contributionEv = pairsPerFormulaUnit * pairEnergyEv * weight;
    runningEv += contributionEv;
    const [speciesA, speciesB] = [species.keys[a]!, species.keys[b]!];
    const key = rowKey(speciesA, speciesB, distanceA);
    return {
      key,
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
