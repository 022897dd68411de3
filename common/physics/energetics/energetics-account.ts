import type { DataOverrides } from '#common/chemistry/sourced';
import {
  exponentInUse,
  usualExponents,
  type ParameterInUse,
} from '#common/physics/energetics/born-exponent-of-cell';
import { sizedIons, type SizedIon } from '#common/physics/energetics/ion-sizes';
import {
  kapustinskiiEstimate,
  type KapustinskiiEstimate,
} from '#common/physics/energetics/kapustinskii';
import { pairDistances, repellingPairs } from '#common/physics/energetics/pair-distances';
import { pairPotentialsOf } from '#common/physics/energetics/pair-potentials';
import {
  bornLandeLaw,
  bornMayerLaw,
  bulkModulusGpa,
  equilibriumScale,
  netEv,
  pairwiseLaw,
  type ScalingLaw,
} from '#common/physics/energetics/scaling-law';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationResult } from '#common/schemas/evaluation';
import type { EnergeticModel, ValueRange } from '#common/schemas/energetics';
import { EV_IN_KJ_PER_MOL } from '#common/units/constants';

/** The number that says how hard the ions are. */
export interface HardnessInUse {
  readonly symbol: 'n' | 'ρ';
  readonly unit: 'Å' | '';
  readonly range: ValueRange;
  readonly source: string;
}

/** What a lattice's repulsion model says of it. All energies are model values at 0 K. */
export interface EnergeticsAccount {
  /** Why there are no numbers; null when there are. */
  readonly reason: string | null;
  /** One law, or two where an input is a range: of its low and of its high end. */
  readonly laws: readonly ScalingLaw[];
  /** Null for a pair table, whose pairs each have their own. */
  readonly hardness: HardnessInUse | null;
  /** How the pair form came about, for models made of pairs. */
  readonly derivation: string | null;
  /** Scale of the cell at which it is at rest, 1 the cell as given. */
  readonly equilibriumScale: ValueRange | null;
  /** Shortest cation–anion distance in the cell as given, Å. */
  readonly spacingA: number;
  /** The same with the cell at rest, Å. */
  readonly equilibriumSpacingA: ValueRange | null;
  /** Depth of the net curve, eV per formula unit, positive. */
  readonly bondEnergyEv: ValueRange | null;
  /** Gas ions → crystal, kJ per mole of formula units, negative. */
  readonly latticeEnergyKjPerMol: ValueRange | null;
  readonly bulkModulusGpa: ValueRange | null;
  readonly kapustinskii: KapustinskiiEstimate;
  readonly warnings: readonly string[];
}

interface Laws {
  readonly laws: readonly ScalingLaw[];
  readonly hardness: HardnessInUse | null;
  readonly derivation: string | null;
  readonly warnings: readonly string[];
}

interface Refusal {
  readonly reason: string;
}

interface Subject {
  readonly cell: ResolvedCell;
  readonly result: EvaluationResult;
  readonly model: EnergeticModel;
  readonly overrides: DataOverrides;
  readonly ions: readonly SizedIon[];
  /** A = −E_el, eV per formula unit. */
  readonly bindingEv: number;
  readonly spacingA: number;
  readonly volumeA3: number;
}

/** Pairs within this distance make up the curve of a pair model, Å. */
const curveReachA = 12;

function exponentLaws(used: ParameterInUse, { bindingEv }: Subject): Laws | Refusal {
  const { range, source } = used;
  if (range === null) {
    return { reason: used.reason ?? 'There is no Born exponent.' };
  }
  if (range.low <= 1) {
    return {
      reason: `An exponent of ${Number(range.low.toFixed(3))} holds nothing apart: it must be above 1.`,
    };
  }
  const isUsual = range.low >= usualExponents.low && range.high <= usualExponents.high;
  return {
    laws: lawsOfRange(range, (exponent) => bornLandeLaw(bindingEv, exponent)),
    hardness: { symbol: 'n', unit: '', range, source },
    derivation: null,
    warnings: isUsual
      ? []
      : [
          `The exponent lies outside ${usualExponents.low}–${usualExponents.high}, where those of ionic crystals usually are: point ions may not describe this one.`,
        ],
  };
}

const lawsOfRange = (
  { low, high }: ValueRange,
  lawOf: (value: number) => ScalingLaw,
): ScalingLaw[] => (low === high ? [lawOf(low)] : [lawOf(low), lawOf(high)]);

function lawsOf(subject: Subject): Laws | Refusal {
  const { cell, result, model, overrides, ions, bindingEv, spacingA, volumeA3 } = subject;
  const { repulsion } = model;
  switch (repulsion.kind) {
    case 'born_lande':
      return exponentLaws(
        exponentInUse(repulsion.exponent, model, ions, bindingEv, volumeA3, overrides),
        subject,
      );
    case 'born_mayer': {
      const { hardnessA: range } = repulsion;
      return range.high >= spacingA / 2
        ? {
            reason: `A hardness of ${range.high} Å is no less than half the spacing of ${spacingA.toFixed(3)} Å: nothing would be at rest there.`,
          }
        : {
            laws: lawsOfRange(range, (rho) => bornMayerLaw(bindingEv, spacingA, rho)),
            hardness: { symbol: 'ρ', unit: 'Å', range, source: 'typed for this lattice' },
            derivation: null,
            warnings: [],
          };
    }
    default: {
      const found = pairPotentialsOf(cell, result, model, overrides);
      if ('reason' in found) {
        return found;
      }
      const reachA = repulsion.kind === 'pair_table' ? found.cutoffA : curveReachA;
      const pairs = repellingPairs(pairDistances(cell, result, reachA), found.pairs);
      const rho = found.hardnessA;
      return {
        laws: [pairwiseLaw(bindingEv, pairs)],
        hardness:
          rho === null
            ? null
            : {
                symbol: 'ρ',
                unit: 'Å',
                range: { low: rho, high: rho },
                source: 'one for all pairs',
              },
        derivation: found.derivation,
        warnings: [],
      };
    }
  }
}

function rangeOf(values: readonly number[]): ValueRange {
  return { low: Math.min(...values), high: Math.max(...values) };
}

const times = ({ low, high }: ValueRange, factor: number): ValueRange =>
  rangeOf([low * factor, high * factor]);

function refused(subject: Subject, reason: string): EnergeticsAccount {
  return {
    reason,
    laws: [],
    hardness: null,
    derivation: null,
    equilibriumScale: null,
    spacingA: subject.spacingA,
    equilibriumSpacingA: null,
    bondEnergyEv: null,
    latticeEnergyKjPerMol: null,
    bulkModulusGpa: null,
    kapustinskii: kapustinskiiEstimate(subject.ions),
    warnings: [],
  };
}

/**
 * Lattice energy, equilibrium spacing and bulk modulus of a cell under its repulsion model, by
 * uniform scaling about the cell as given; Kapustinskii's estimate beside them. Where an input is a
 * range, so is every number that depends on it.
 */
export function energeticsOf(
  cell: ResolvedCell,
  result: EvaluationResult,
  model: EnergeticModel,
  overrides: DataOverrides,
): EnergeticsAccount {
  const subject: Subject = {
    ...{ cell, result, model, overrides },
    ions: sizedIons(cell, result, overrides),
    bindingEv: -result.energyEvPerFormulaUnit.value,
    spacingA: result.shortestUnlikeDistanceA ?? result.shortestDistanceA,
    volumeA3: result.volumeA3 / result.formulaUnitsPerCell,
  };
  if (!(subject.bindingEv > 0)) {
    return refused(
      subject,
      'The ions of this cell don’t bind: their electrostatic energy is not negative, so no repulsion can hold them at rest.',
    );
  }
  const found = lawsOf(subject);
  if ('reason' in found) {
    return refused(subject, found.reason);
  }
  const scales = found.laws.map(equilibriumScale);
  const rest = scales.filter((scale) => scale !== null);
  if (rest.length < scales.length) {
    return refused(
      subject,
      'Under this repulsion the cell is nowhere at rest between 0.45 and 2.2 times its size: the ions fall together or fly apart. Check the pair table.',
    );
  }
  const energiesEv = found.laws.map((law, k) => netEv(law, rest[k]!));
  const scale = rangeOf(rest);
  return {
    reason: null,
    ...found,
    equilibriumScale: scale,
    spacingA: subject.spacingA,
    equilibriumSpacingA: times(scale, subject.spacingA),
    bondEnergyEv: times(rangeOf(energiesEv), -1),
    latticeEnergyKjPerMol: times(rangeOf(energiesEv), EV_IN_KJ_PER_MOL),
    bulkModulusGpa: rangeOf(
      found.laws.map((law, k) => bulkModulusGpa(law, rest[k]!, subject.volumeA3)),
    ),
    kapustinskii: kapustinskiiEstimate(subject.ions),
  };
}
