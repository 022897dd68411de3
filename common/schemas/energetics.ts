import { z } from 'zod';

/** Sizes the forms, the API and the models share. */
export const energeticsLimits = {
  pairRows: 60,
  formationLines: 60,
  exponent: { low: 2, high: 30 },
  hardnessA: { low: 0.01, high: 2 },
} as const;

const finite = z.number().finite();

/** A number someone gives as one value (low = high) or as a range. */
const rangeOf = (low: number, high: number) =>
  z
    .object({ low: finite.min(low).max(high), high: finite.min(low).max(high) })
    .refine((range) => range.low <= range.high, {
      message: 'The lower end must not be above the upper one.',
      path: ['low'],
    });
export const valueRange = z.object({ low: finite, high: finite });
export type ValueRange = z.infer<typeof valueRange>;

const exponentRange = rangeOf(energeticsLimits.exponent.low, energeticsLimits.exponent.high);
const hardnessRangeA = rangeOf(energeticsLimits.hardnessA.low, energeticsLimits.hardnessA.high);
const bulkModulusRangeGpa = rangeOf(0.01, 2_000);
const energyRangeKjPerMol = rangeOf(-100_000, 100_000);

/** Where the Born exponent comes from. */
export const exponentChoice = z.discriminatedUnion('from', [
  /** Mean of Pauling's exponents over the ions. */
  z.object({ from: z.literal('ions') }),
  z.object({ from: z.literal('typed'), exponent: exponentRange }),
  /** n = 1 + 9 K V / A with `measured.bulkModulusGpa`. */
  z.object({ from: z.literal('bulk_modulus') }),
]);
export type ExponentChoice = z.infer<typeof exponentChoice>;

/** Short-range energy of one pair of ion kinds: A exp(−r/ρ) − C r⁻⁶. */
export const pairPotential = z.object({
  /** Species keys as the cell gives them: `Mg+2`, `O-2`. */
  speciesA: z.string().min(1).max(80),
  speciesB: z.string().min(1).max(80),
  /** A in eV, ≥ 0. */
  prefactorEv: finite.min(0).max(1e9),
  /** ρ in Å. */
  hardnessA: finite.min(energeticsLimits.hardnessA.low).max(energeticsLimits.hardnessA.high),
  /** C in eV Å⁶, ≥ 0. */
  dispersionEvA6: finite.min(0).max(1e6),
});
export type PairPotential = z.infer<typeof pairPotential>;

/** What keeps the ions apart. */
export const repulsionModel = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('born_lande'), exponent: exponentChoice }),
  z.object({ kind: z.literal('born_mayer'), hardnessA: hardnessRangeA }),
  /**
   * Born–Mayer–Huggins: c_ij b exp((r_i + r_j − r)/ρ), Pauling factors c_ij, one hardness ρ; b is
   * fitted so that the cell as given is at rest under uniform scaling. ρ null: fitted to
   * `measured.bulkModulusGpa`.
   */
  z.object({
    kind: z.literal('born_mayer_huggins'),
    hardnessA: finite
      .min(energeticsLimits.hardnessA.low)
      .max(energeticsLimits.hardnessA.high)
      .nullable(),
  }),
  z.object({
    kind: z.literal('pair_table'),
    pairs: z.array(pairPotential).min(1).max(energeticsLimits.pairRows),
    cutoffA: finite.min(2).max(30),
  }),
]);
export type RepulsionModel = z.infer<typeof repulsionModel>;

/** Values somebody measured, to fit to or to compare with. */
export const measuredValues = z.object({
  /** Lattice energy as the enthalpy of gas ions → crystal, negative. */
  latticeEnergyKjPerMol: energyRangeKjPerMol.nullable(),
  bulkModulusGpa: bulkModulusRangeGpa.nullable(),
  source: z.string().trim().max(200),
});
export type MeasuredValues = z.infer<typeof measuredValues>;

/** `atomisation:Na`, `ionisation:Na:1`, `affinity:O:2`, `lattice`, `formation`. */
export const formationLineKey = z
  .string()
  .max(40)
  .regex(/^(atomisation:[A-Z][a-z]?|(ionisation|affinity):[A-Z][a-z]?:[1-9]|lattice|formation)$/);

/** What a person decided about the lines of the formation ledger. */
export const formationChoices = z.object({
  /** Values typed over those of the tables, per mole of atoms or ions, kJ mol⁻¹. */
  typedKjPerMol: z.record(formationLineKey, finite.min(-1e6).max(1e6)),
  excluded: z.array(formationLineKey).max(energeticsLimits.formationLines),
  /** The one line that closes the account; `formation` unless another is asked for. */
  solveFor: formationLineKey,
  /** Where the lattice line comes from when it is not the one solved for. */
  lattice: z.enum(['model', 'measured']),
});
export type FormationChoices = z.infer<typeof formationChoices>;

/** Everything a lattice's energetics need beyond its cell; kept with the cell in every revision. */
export const energeticModel = z.object({
  repulsion: repulsionModel,
  measured: measuredValues,
  formation: formationChoices,
});
export type EnergeticModel = z.infer<typeof energeticModel>;

export const defaultEnergeticModel: EnergeticModel = {
  repulsion: { kind: 'born_lande', exponent: { from: 'ions' } },
  measured: { latticeEnergyKjPerMol: null, bulkModulusGpa: null, source: '' },
  formation: { typedKjPerMol: {}, excluded: [], solveFor: 'formation', lattice: 'model' },
};

/** What a check found; `not_judged` says why. */
export const checkWord = z.enum(['holds', 'doubtful', 'fails', 'not_judged']);
export type CheckWord = z.infer<typeof checkWord>;

/** The worst word of the checks that could be made, and how many say what. */
export interface VerdictSummary {
  readonly word: CheckWord;
  readonly holds: number;
  readonly doubtful: number;
  readonly fails: number;
  readonly notJudged: number;
}

/** A value of the shipped tables that a workspace replaced by its own. */
export const dataValue = z.object({
  /** `mass:Na`, `ionisation:Na:1`, `affinity:O:2`, `atomisation:Na`, `radius:Na+1:6`, … */
  key: z.string().min(1).max(80),
  value: finite,
  note: z.string().trim().max(300),
});
export type DataValue = z.infer<typeof dataValue>;
