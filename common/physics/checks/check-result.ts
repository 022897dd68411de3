import type { DataOverrides } from '#common/chemistry/sourced';
import type { EnergeticsAccount } from '#common/physics/energetics/energetics-account';
import type { SizedIon } from '#common/physics/energetics/ion-sizes';
import { checkLimits, type CheckLimitKey } from '#common/physics/checks/limits';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { CheckWord, EnergeticModel } from '#common/schemas/energetics';
import type { EvaluationResult } from '#common/schemas/evaluation';

export const checkKeys = [
  'charge_balance',
  'contacts',
  'potentials',
  'radius_ratio',
  'bond_strengths',
  'bond_valence',
  'exponent',
  'rest',
  'lattice_energy',
  'formation',
  'elastic_stability',
  'rivals',
] as const;
export type CheckKey = (typeof checkKeys)[number];

/** What one check says of a cell. */
export interface CheckResult {
  readonly key: CheckKey;
  readonly name: string;
  readonly word: CheckWord;
  /** What was found, in a sentence; why not, where it could not be judged. */
  readonly finding: string;
  /** The number that decided; null where there is none. */
  readonly value: number | null;
  readonly unit: string;
  /** Limits the number was held against. */
  readonly limits: readonly CheckLimitKey[];
  /** Labels of the sites concerned. */
  readonly labels: readonly string[];
}

/** A cell that was evaluated, with what its checks share. */
export interface CheckSubject {
  readonly cell: ResolvedCell;
  readonly result: EvaluationResult;
  readonly model: EnergeticModel;
  readonly overrides: DataOverrides;
  readonly ions: readonly SizedIon[];
  readonly account: EnergeticsAccount;
}

export const limit = (key: CheckLimitKey): number => checkLimits[key].value;

/** A check that could not be made. */
export function notJudged(key: CheckKey, name: string, why: string): CheckResult {
  return {
    ...{ key, name, finding: why },
    word: 'not_judged',
    value: null,
    unit: '',
    limits: [],
    labels: [],
  };
}

/** The word for a number that should stay below two limits. */
export const wordBelow = (value: number, doubtful: number, fails: number): CheckWord =>
  value > fails ? 'fails' : value > doubtful ? 'doubtful' : 'holds';
