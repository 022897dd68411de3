import { noOverrides, type DataOverrides } from '#common/chemistry/sourced';
import { closeAccount, type OpenAccount } from '#common/physics/energetics/formation-closing';
import {
  particleCount,
  formationSteps,
  type FormationStep,
} from '#common/physics/energetics/formation-steps';
import type { FormationComposition } from '#common/physics/energetics/formation-composition';
import { LATTICE_HEAT_KJ_PER_MOL_OF_PARTICLES } from '#common/physics/energetics/formation-heat';
import {
  knownFormation,
  knownLattice,
  knownStep,
  missingReason,
  type LatticeEnergySource,
} from '#common/physics/energetics/formation-known';
import {
  addRanges,
  exactly,
  scaleRange,
  subtractRanges,
  type FormationLine,
  type KnownValue,
} from '#common/physics/energetics/formation-line';
import type { EnergeticModel, FormationChoices, ValueRange } from '#common/schemas/energetics';

/** The Born–Haber account of one formula unit, kJ mol⁻¹. */
export interface FormationLedger {
  readonly formula: string;
  /** Steps, lattice, its heat where it comes from a model; the formation line is not among them. */
  readonly lines: readonly FormationLine[];
  /** The sum of the lines, or what it is known to be. */
  readonly formation: FormationLine;
  /** Key of the line that closes the account. */
  readonly solveFor: string;
  /** Null when it closes; else what must be given. */
  readonly open: OpenAccount | null;
  /** Lattice enthalpy at 298.15 K, gas ions → crystal, per mole of formula units. */
  readonly latticeEnthalpyKjPerMol: ValueRange | null;
  /** The lattice energy at 0 K that belongs to it: less ½ RT for each gas particle. */
  readonly latticeEnergyKjPerMol: ValueRange | null;
  /** ½ RT × particles: the difference of the two. */
  readonly latticeHeatKjPerMol: number;
  /** True where lines are left out: the sum is then no enthalpy of formation. */
  readonly isPartial: boolean;
  /** Σ lines − formation, the middle of the ranges; rounding only. Null while open. */
  readonly residualKjPerMol: number | null;
  readonly isMixed: boolean;
}

interface Draft {
  readonly choices: FormationChoices;
  readonly solveFor: string;
  readonly excluded: ReadonlySet<string>;
}

/** The typed value where there is one, else what tables, model or measurement give. */
function valueOf(key: string, known: KnownValue | null, { choices }: Draft): KnownValue | null {
  const typed = choices.typedKjPerMol[key];
  return typed === undefined
    ? known
    : {
        valueKjPerMol: exactly(typed),
        origin: 'typed',
        source: 'typed for this lattice',
        status: 'own',
      };
}

type Described = Pick<
  FormationLine,
  'key' | 'kind' | 'element' | 'name' | 'from' | 'to' | 'coefficient' | 'remark' | 'quantity'
>;

function lineOf(
  about: Described,
  known: KnownValue | null,
  reason: string,
  draft: Draft,
): FormationLine {
  const isSolved = about.key === draft.solveFor;
  const isExcluded = !isSolved && draft.excluded.has(about.key);
  const given = isSolved ? null : valueOf(about.key, known, draft);
  const isTyped = draft.choices.typedKjPerMol[about.key] !== undefined;
  return {
    ...about,
    valueKjPerMol: given?.valueKjPerMol ?? null,
    contributionKjPerMol: isExcluded
      ? exactly(0)
      : given === null
        ? null
        : scaleRange(given.valueKjPerMol, about.coefficient),
    runningKjPerMol: null,
    origin: isSolved ? 'solved' : (given?.origin ?? 'missing'),
    source: isSolved ? 'solved from the other lines' : (given?.source ?? ''),
    status: given?.status ?? null,
    reason: given === null && !isSolved ? reason : null,
    isExcluded,
    isSolved,
    isTyped,
    known: isSolved ? valueOf(about.key, known, draft) : known,
    mayType: true,
    mayExclude: about.kind !== 'formation',
  };
}

function remarkOf({ isHalfBond, standardState, element }: FormationStep): string | null {
  if (standardState === null) {
    return null;
  }
  return isHalfBond
    ? `½ D of ${element}₂, from ${standardState.name}`
    : `from ${standardState.name}`;
}

function stepLine(step: FormationStep, overrides: DataOverrides, draft: Draft): FormationLine {
  const { key, kind, element, name, from, to, coefficient } = step;
  // Energies of single atoms and ions are those at 0 K; see the note on electrons in the account.
  const quantity = kind === 'atomisation' ? 'enthalpy_298' : 'energy_0';
  const about = { key, kind, element, name, from, to, coefficient, quantity } as const;
  const known = knownStep(step, overrides);
  return lineOf({ ...about, remark: remarkOf(step) }, known, missingReason(step), draft);
}

/** Gas ions on the left of the lattice step. */
function gasIons({ ions }: FormationComposition): FormationLine['from'] {
  return ions.map(({ element, chargeE, count }) => ({
    coefficient: count,
    formula: element,
    chargeE,
    phase: 'g',
  }));
}

function crystal({ formula }: FormationComposition): FormationLine['to'] {
  return [{ coefficient: 1, formula, chargeE: 0, phase: 's' }];
}

/** A model's lattice energy as the enthalpy at 298.15 K. */
function asEnthalpy(known: KnownValue | null, heat: number): KnownValue | null {
  return known?.origin === 'model'
    ? {
        ...known,
        valueKjPerMol: addRanges(known.valueKjPerMol, exactly(heat)),
        source: `${known.source}, and ½ RT for each gas ion`,
      }
    : known;
}

function latticeLine(
  composition: FormationComposition,
  model: EnergeticModel,
  account: LatticeEnergySource,
  draft: Draft,
): FormationLine {
  const { known: given, reason } = knownLattice(model, account);
  const isFromModel = valueOf('lattice', given, draft)?.origin === 'model';
  const isModel = isFromModel && draft.solveFor !== 'lattice';
  const heat = particleCount(composition) * LATTICE_HEAT_KJ_PER_MOL_OF_PARTICLES;
  // A solved lattice line is an enthalpy: what it is compared with must be one too.
  const known = isModel ? given : asEnthalpy(given, heat);
  return lineOf(
    {
      key: 'lattice',
      kind: 'lattice',
      element: null,
      name: isModel ? 'lattice energy' : 'lattice enthalpy',
      from: gasIons(composition),
      to: crystal(composition),
      coefficient: 1,
      remark: null,
      quantity: isModel ? 'energy_0' : 'enthalpy_298',
    },
    known,
    reason,
    draft,
  );
}

/** The line that turns the model's energy into an enthalpy, or none where the lattice line is one. */
function heatLine(lattice: FormationLine, particles: number): FormationLine[] {
  if (lattice.origin !== 'model' || lattice.isExcluded) {
    return [];
  }
  const value = exactly(LATTICE_HEAT_KJ_PER_MOL_OF_PARTICLES);
  const line: FormationLine = {
    ...lattice,
    key: 'heat',
    kind: 'heat',
    name: 'heat, 0 K → 298 K',
    from: [],
    to: [],
    coefficient: particles,
    valueKjPerMol: value,
    contributionKjPerMol: scaleRange(value, particles),
    quantity: 'enthalpy_298',
    origin: 'computed',
    source: '½ RT per mole of gas ions: ΔH = U + Σ ν (2 − c/2) RT, c = 3 for monatomic ions',
    status: 'computed-here',
    remark: '½ RT for each gas ion',
    known: null,
    isTyped: false,
    mayType: false,
    mayExclude: false,
  };
  return [line];
}

function formationLine(composition: FormationComposition, draft: Draft): FormationLine {
  const elements = formationSteps(composition).filter(({ kind }) => kind === 'atomisation');
  return lineOf(
    {
      key: 'formation',
      kind: 'formation',
      element: null,
      name: 'formation enthalpy',
      from: elements.map(({ from, coefficient }) => ({
        ...from[0]!,
        coefficient: from[0]!.coefficient * coefficient,
      })),
      to: crystal(composition),
      coefficient: 1,
      remark: null,
      quantity: 'enthalpy_298',
    },
    knownFormation(composition),
    'The table has no formation enthalpy for this formula: type one.',
    draft,
  );
}

function withRunning(lines: readonly FormationLine[]): FormationLine[] {
  let running: ValueRange | null = exactly(0);
  return lines.map((line) => {
    running =
      running === null || line.contributionKjPerMol === null
        ? null
        : addRanges(running, line.contributionKjPerMol);
    return { ...line, runningKjPerMol: running };
  });
}

/** What both lattice numbers are, once the account is closed. */
function latticeNumbers(lines: readonly FormationLine[], heat: number) {
  const lattice = lines.find(({ kind }) => kind === 'lattice');
  const value = lattice?.valueKjPerMol ?? null;
  const isEnergy = lattice?.quantity === 'energy_0';
  return {
    latticeEnthalpyKjPerMol: value && (isEnergy ? addRanges(value, exactly(heat)) : value),
    latticeEnergyKjPerMol: value && (isEnergy ? value : subtractRanges(value, exactly(heat))),
    latticeHeatKjPerMol: heat,
  };
}

/**
 * The Born–Haber account: ΔH_f = Σ atomisation + Σ ionisation + Σ affinities (as enthalpy of gain) +
 * lattice enthalpy, per mole of formula units. Energy put in is positive (it opposes), energy given
 * off is negative (it binds); the lattice line runs from gas ions to crystal and is negative.
 *
 * Atomisation, lattice and formation enthalpies are those at 298.15 K. Ionisation energies and
 * affinities are the 0 K energies of the tables: in enthalpies the electrons would add 5/2 RT for
 * each that leaves and take it back for each that joins, which cancels because the compound is
 * neutral. A lattice energy from the model is one of 0 K and brings its own line of heat.
 *
 * Any one line is solved from the rest. A range of the lattice energy or of a measured value runs
 * through to the solved line.
 *
 * @param composition ions per formula unit, of {@link formationComposition}
 * @param model repulsion, measured values and the person's choices
 * @param account the model's lattice energy, kJ per mole of formula units, negative, or why there is none
 * @param overrides values of the workspace over those of the tables
 */
export function formationLedger(
  composition: FormationComposition,
  model: EnergeticModel,
  account: LatticeEnergySource,
  overrides: DataOverrides = noOverrides,
): FormationLedger {
  const choices = model.formation;
  const steps = formationSteps(composition);
  const keys = new Set([...steps.map(({ key }) => key), 'lattice', 'formation']);
  const draft: Draft = {
    choices,
    // A choice for an element that is no longer there falls back to the usual line.
    solveFor: keys.has(choices.solveFor) ? choices.solveFor : 'formation',
    excluded: new Set(choices.excluded.filter((key) => key !== 'formation')),
  };
  const particles = particleCount(composition);
  const lattice = latticeLine(composition, model, account, draft);
  const drawn = [
    ...steps.map((step) => stepLine(step, overrides, draft)),
    lattice,
    ...heatLine(lattice, particles),
  ];
  const closed = closeAccount(drawn, formationLine(composition, draft));
  const lines = withRunning(closed.lines);
  return {
    formula: composition.formula,
    lines,
    formation: closed.formation,
    solveFor: draft.solveFor,
    open: closed.open,
    ...latticeNumbers(lines, particles * LATTICE_HEAT_KJ_PER_MOL_OF_PARTICLES),
    isPartial: lines.some(({ isExcluded }) => isExcluded),
    residualKjPerMol: closed.residualKjPerMol,
    isMixed: composition.isMixed,
  };
}
