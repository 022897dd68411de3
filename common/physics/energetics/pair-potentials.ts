import type { DataOverrides } from '#common/chemistry/sourced';
import { exponentInUse } from '#common/physics/energetics/born-exponent-of-cell';
import {
  fitHugginsPairs,
  hugginsPrefactorEv,
  type HugginsFit,
} from '#common/physics/energetics/huggins-pairs';
import { sizedIons, type SizedIon } from '#common/physics/energetics/ion-sizes';
import { pairDistances } from '#common/physics/energetics/pair-distances';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationResult } from '#common/schemas/evaluation';
import type { EnergeticModel, PairPotential } from '#common/schemas/energetics';

/** Short-range energies by pairs of ion kinds, and how they came about. */
export interface PairPotentials {
  readonly pairs: PairPotential[];
  readonly cutoffA: number;
  /** In words, for the screen and the report. */
  readonly derivation: string;
  /** ρ in Å where one hardness serves all pairs. */
  readonly hardnessA: number | null;
}

export interface NoPairPotentials {
  readonly reason: string;
}

/** Beyond this a repulsion of hardness 0.4 Å is below 10⁻¹⁰ of its value at contact. */
const hugginsCutoffA = 12;

/** Why the ions of a cell can't be given sizes, or null. */
function sizeFault(ions: readonly SizedIon[]): string | null {
  for (const { speciesKey, components, radiusA } of ions) {
    if (components.length !== 1 || components[0]!.occupancy < 1 - 1e-9) {
      return `${speciesKey}: shared or partly empty sites have no pair repulsion of their own. Type a pair table that names them.`;
    }
    if (radiusA === null) {
      return `The tables have no ionic radius for ${speciesKey}: add one under the workspace’s data values, or type a pair table.`;
    }
  }
  return null;
}

const middle = ({ low, high }: { low: number; high: number }): number => (low + high) / 2;

/** What the pair form must meet to stand for the chosen model, and how to say so. */
function fitFor(
  model: EnergeticModel,
  ions: readonly SizedIon[],
  result: EvaluationResult,
  bindingEv: number,
  overrides: DataOverrides,
): { fit: HugginsFit; words: string } | NoPairPotentials {
  const { repulsion } = model;
  const volumeA3 = result.volumeA3 / result.formulaUnitsPerCell;
  switch (repulsion.kind) {
    case 'born_lande': {
      const used = exponentInUse(repulsion.exponent, model, ions, bindingEv, volumeA3, overrides);
      return used.range === null
        ? { reason: used.reason ?? 'There is no Born exponent.' }
        : {
            fit: { curvatureEv: (middle(used.range) - 1) * bindingEv },
            words: `with the bulk modulus of n = ${Number(middle(used.range).toFixed(3))}`,
          };
    }
    case 'born_mayer': {
      const d0 = result.shortestUnlikeDistanceA ?? result.shortestDistanceA;
      const hardnessA = middle(repulsion.hardnessA);
      return {
        fit: { curvatureEv: (d0 / hardnessA - 2) * bindingEv },
        words: `with the bulk modulus of ρ = ${Number(hardnessA.toFixed(4))} Å between nearest ions`,
      };
    }
    case 'born_mayer_huggins':
      return repulsion.hardnessA === null
        ? { fit: { prefactorEv: hugginsPrefactorEv }, words: 'with the usual prefactor' }
        : { fit: { hardnessA: repulsion.hardnessA }, words: 'with the hardness given' };
    case 'pair_table':
      throw new Error('A pair table is not fitted.');
  }
}

/**
 * The pair form of a lattice's repulsion, for whatever moves ions one by one. A pair table serves as
 * typed; every other model is put into the Born–Mayer–Huggins form, fitted so that the cell as given
 * is at rest under uniform scaling and, for Born–Landé and Born–Mayer, as stiff as they say.
 */
export function pairPotentialsOf(
  cell: ResolvedCell,
  result: EvaluationResult,
  model: EnergeticModel,
  overrides: DataOverrides,
): PairPotentials | NoPairPotentials {
  const { repulsion } = model;
  if (repulsion.kind === 'pair_table') {
    const { pairs, cutoffA } = repulsion;
    return { pairs, cutoffA, derivation: 'The pair table as typed.', hardnessA: null };
  }
  const bindingEv = -result.energyEvPerFormulaUnit.value;
  if (!(bindingEv > 0)) {
    return { reason: 'The ions of this cell don’t bind, so no repulsion can hold them at rest.' };
  }
  const ions = sizedIons(cell, result, overrides);
  const fault = sizeFault(ions);
  if (fault !== null) {
    return { reason: fault };
  }
  const asked = fitFor(model, ions, result, bindingEv, overrides);
  if ('reason' in asked) {
    return asked;
  }
  const distances = pairDistances(cell, result, hugginsCutoffA);
  const fitted = fitHugginsPairs(ions, distances, bindingEv, asked.fit);
  if (fitted === null) {
    return {
      reason:
        'No hardness between 0.06 and 1.2 Å puts this cell at rest: its ions stand too close or too far apart for their radii. Type a hardness or a pair table.',
    };
  }
  const { pairs, hardnessA } = fitted;
  const derivation =
    `Born–Mayer–Huggins pairs ${asked.words}, fitted so that the cell as given is at rest under ` +
    `uniform scaling: ρ = ${hardnessA.toFixed(4)} Å, b = ${fitted.prefactorEv.toPrecision(4)} eV.`;
  return { pairs, cutoffA: hugginsCutoffA, derivation, hardnessA };
}
