import { buildPairLedger } from '#common/physics/pair-ledger';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationResult } from '#common/schemas/evaluation';
import type { PairPotential } from '#common/schemas/energetics';
import type { RepellingPairs } from '#common/physics/energetics/scaling-law';

/** Pairs of two ion kinds at one distance. */
export interface PairDistance {
  readonly speciesA: string;
  readonly speciesB: string;
  readonly distanceA: number;
  readonly pairsPerFormulaUnit: number;
}

/** Distances closer than this are one. */
const groupingA = 1e-6;

/** All ion pairs up to a distance, by kinds and distances, counted per formula unit. */
export function pairDistances(
  cell: ResolvedCell,
  { formulaUnitsPerCell }: Pick<EvaluationResult, 'formulaUnitsPerCell'>,
  reachA: number,
): readonly PairDistance[] {
  return buildPairLedger(cell, 0, formulaUnitsPerCell, { reachA, groupingA }).rows;
}

const unordered = (a: string, b: string): string => (a < b ? `${a}|${b}` : `${b}|${a}`);

/** Gives the pairs of a cell the potentials of their kinds; kinds without one don't repel. */
export function repellingPairs(
  distances: readonly PairDistance[],
  potentials: readonly PairPotential[],
): RepellingPairs[] {
  const byKinds = new Map(potentials.map((one) => [unordered(one.speciesA, one.speciesB), one]));
  return distances.flatMap(({ speciesA, speciesB, distanceA, pairsPerFormulaUnit }) => {
    const potential = byKinds.get(unordered(speciesA, speciesB));
    return potential === undefined
      ? []
      : [
          {
            distanceA,
            pairsPerFormulaUnit,
            prefactorEv: potential.prefactorEv,
            hardnessA: potential.hardnessA,
            dispersionEvA6: potential.dispersionEvA6,
          },
        ];
  });
}
