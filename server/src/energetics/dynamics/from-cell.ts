import { speciesOfCell } from '#common/physics/pair-ledger';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { RelaxationEnd } from '#common/schemas/dynamics';
import type { PairPotential } from '#common/schemas/energetics';
import type { SymmetryOperation } from '#common/schemas/symmetry';

import { refuseUnfitForDynamics } from './refusals.js';
import { relax, type PairModelInput, type PairTerm } from '../engine/index.js';

/** The pair potentials of a cell and where they came from. */
export interface CellPotentials {
  readonly pairs: readonly PairPotential[];
  readonly cutoffA: number;
  /** In words: which form, which constants, how they were fitted. */
  readonly derivation: string;
}

/** Everything a computation on one cell starts from. */
export interface DynamicsSubject {
  readonly cell: ResolvedCell;
  readonly potentials: CellPotentials;
  /** All operations of the cell's symmetry, the identity among them. */
  readonly operations: readonly SymmetryOperation[];
}

/** Terms by number of species; those of species the cell doesn't hold fall away. */
function pairTerms(pairs: readonly PairPotential[], keys: readonly string[]): PairTerm[] {
  return pairs.flatMap(({ speciesA, speciesB, ...term }) => {
    const [a, b] = [keys.indexOf(speciesA), keys.indexOf(speciesB)];
    return a < 0 || b < 0 ? [] : [{ speciesA: a, speciesB: b, ...term }];
  });
}

/**
 * The cell as the pair model takes it, sites in the order of the resolved cell.
 * @throws Problem where a pair model can't be applied; see `refuseUnfitForDynamics`
 */
export function pairModelInput({ cell, potentials }: DynamicsSubject): PairModelInput {
  refuseUnfitForDynamics(cell, potentials.pairs);
  const { keys, indexOfSite } = speciesOfCell(cell);
  return {
    vectorsA: cell.vectorsA,
    fractional: Float64Array.from(cell.sites.flatMap(({ fractional }) => [...fractional])),
    chargesE: Float64Array.from(cell.sites, ({ chargeE }) => chargeE),
    speciesIndex: indexOfSite,
    pairs: pairTerms(potentials.pairs, keys),
    cutoffA: potentials.cutoffA,
  };
}

/** A cell at rest, or as given where none was asked for or there is none. */
interface CellAtRest {
  readonly input: PairModelInput;
  readonly geometry: 'as_given' | 'relaxed';
  readonly relaxationEnded: RelaxationEnd | null;
}

/**
 * The cell at the nearest minimum that keeps its symmetry; as given, with the reason, where the
 * relaxation finds none.
 *
 * @param isRelaxed false: as given
 */
export function inputAtRest(subject: DynamicsSubject, isRelaxed: boolean): CellAtRest {
  const input = pairModelInput(subject);
  if (!isRelaxed) {
    return { input, geometry: 'as_given', relaxationEnded: null };
  }
  const { ended, vectorsA, fractional } = relax({ ...input, operations: subject.operations });
  return ended === 'converged'
    ? { input: { ...input, vectorsA, fractional }, geometry: 'relaxed', relaxationEnded: ended }
    : { input, geometry: 'as_given', relaxationEnded: ended };
}

/** Numbers in rows of a given length. */
export function rowsOf(values: ArrayLike<number>, width: number): number[][] {
  return Array.from({ length: values.length / width }, (_, row) =>
    Array.from({ length: width }, (_unused, column) => values[row * width + column]!),
  );
}

/** What every result says of a site. */
export function siteNames({ cell }: DynamicsSubject) {
  return cell.sites.map(({ label, definitionIndex, speciesKey }) => ({
    label,
    definitionIndex,
    speciesKey,
  }));
}

/** What every result says of its model. */
export function modelNote({ potentials }: DynamicsSubject, neglectedEvPerCell: number) {
  return {
    derivation: potentials.derivation,
    cutoffA: potentials.cutoffA,
    neglectedEvPerCell,
  };
}
