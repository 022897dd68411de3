import {
  atomisationEnthalpyKjPerMol,
  electronAffinityKjPerMol,
  ionisationEnergyKjPerMol,
} from '#common/chemistry/element-energetics';
import type { DataOverrides, Sourced } from '#common/chemistry/sourced';
import type { FormationComposition } from '#common/physics/energetics/formation-composition';
import { formationEnthalpyKjPerMol } from '#common/physics/energetics/formation-enthalpies';
import { exactly, type KnownValue } from '#common/physics/energetics/formation-line';
import type { FormationStep } from '#common/physics/energetics/formation-steps';
import type { EnergeticModel, ValueRange } from '#common/schemas/energetics';

/** What the account needs of a lattice's energetics. */
export interface LatticeEnergySource {
  /** Gas ions → crystal at 0 K, kJ per mole of formula units, negative; null with a reason. */
  readonly latticeEnergyKjPerMol: ValueRange | null;
  readonly reason: string | null;
}

const fromTable = (value: Sourced | null): KnownValue | null =>
  value && {
    valueKjPerMol: exactly(value.value),
    origin: value.status === 'own' ? 'workspace' : 'table',
    source: value.source,
    status: value.status,
  };

/** What the tables, or the workspace in their place, say about a step. */
export function knownStep(
  { kind, element, step }: FormationStep,
  overrides: DataOverrides,
): KnownValue | null {
  switch (kind) {
    case 'atomisation':
      return fromTable(atomisationEnthalpyKjPerMol(element, overrides));
    case 'ionisation':
      return fromTable(ionisationEnergyKjPerMol(element, step, overrides));
    case 'affinity':
      return fromTable(electronAffinityKjPerMol(element, step, overrides));
  }
}

/** Why a step has no number, and what would give one. */
export function missingReason({ name, kind, step }: FormationStep): string {
  const isUnmeasurable = kind === 'affinity' && step > 1;
  return isUnmeasurable
    ? `No value for the ${name}: the free ion does not exist, so it can't be measured. Type one, or solve for it.`
    : `The tables have no value for the ${name}: type one, or solve for it.`;
}

/** The lattice line's number from where the person wants it. */
export function knownLattice(
  model: EnergeticModel,
  account: LatticeEnergySource,
): { known: KnownValue | null; reason: string } {
  if (model.formation.lattice === 'measured') {
    const { latticeEnergyKjPerMol: value, source } = model.measured;
    const known: KnownValue | null = value && {
      valueKjPerMol: value,
      origin: 'measured',
      source: source === '' ? 'measured; no source given' : source,
      status: 'own',
    };
    return { known, reason: 'No measured lattice enthalpy is given: type one, or take the model.' };
  }
  const { latticeEnergyKjPerMol: value, reason } = account;
  const known: KnownValue | null = value && {
    valueKjPerMol: value,
    origin: 'model',
    source: 'model value, at the spacing where the model is at rest',
    status: null,
  };
  return { known, reason: reason ?? 'The model gives no lattice energy for this cell.' };
}

/** The tabulated formation enthalpy of the formula. */
export function knownFormation({ formula, isMixed }: FormationComposition): KnownValue | null {
  return isMixed ? null : fromTable(formationEnthalpyKjPerMol(formula));
}
