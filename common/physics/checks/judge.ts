import type { DataOverrides } from '#common/chemistry/sourced';
import { checkBondStrengths } from '#common/physics/checks/bond-strengths';
import { checkBondValence } from '#common/physics/checks/bond-valence';
import { checkChargeBalance } from '#common/physics/checks/charge-balance';
import {
  notJudged,
  type CheckKey,
  type CheckResult,
  type CheckSubject,
} from '#common/physics/checks/check-result';
import { checkContacts } from '#common/physics/checks/contacts';
import {
  checkExponent,
  checkFormation,
  checkLatticeEnergy,
  checkRest,
} from '#common/physics/checks/energetics-checks';
import { checkPotentials } from '#common/physics/checks/potentials';
import { checkRadiusRatio } from '#common/physics/checks/radius-ratio';
import { energeticsOf } from '#common/physics/energetics/energetics-account';
import { sizedIons } from '#common/physics/energetics/ion-sizes';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { CheckWord, EnergeticModel, VerdictSummary } from '#common/schemas/energetics';
import type { EvaluationResult } from '#common/schemas/evaluation';

/** What all checks found, and the worst of it. */
export interface Judgement {
  readonly checks: readonly CheckResult[];
  readonly verdict: VerdictSummary;
}

/** Checks of an evaluated cell, in the order they are told. */
const evaluatedChecks: readonly ((subject: CheckSubject) => CheckResult)[] = [
  checkContacts,
  checkPotentials,
  checkRadiusRatio,
  checkBondStrengths,
  checkBondValence,
  checkExponent,
  checkRest,
  checkLatticeEnergy,
  checkFormation,
];

const names: readonly (readonly [CheckKey, string])[] = [
  ['contacts', 'Closest contacts'],
  ['potentials', 'Site potentials'],
  ['radius_ratio', 'Coordination and radius ratio'],
  ['bond_strengths', 'Electrostatic valence'],
  ['bond_valence', 'Bond-valence sums'],
  ['exponent', 'Born exponent'],
  ['rest', 'Spacing at rest'],
  ['lattice_energy', 'Lattice energy'],
  ['formation', 'Formation enthalpy'],
];

/** Checks that need computations this version does not make yet. */
const laterChecks: readonly CheckResult[] = [
  notJudged(
    'elastic_stability',
    'Elastic stability',
    'This version computes no elastic constants for a page yet.',
  ),
  notJudged(
    'rivals',
    'Rival structures',
    'This version lays the ions out in no rival structures yet.',
  ),
];

const badness: readonly CheckWord[] = ['holds', 'doubtful', 'fails'];

function summarise(checks: readonly CheckResult[]): VerdictSummary {
  const count = (word: CheckWord) => checks.filter((check) => check.word === word).length;
  const worst = badness.findLast((word) => count(word) > 0);
  return {
    word: worst ?? 'not_judged',
    holds: count('holds'),
    doubtful: count('doubtful'),
    fails: count('fails'),
    notJudged: count('not_judged'),
  };
}

/**
 * Makes every check of a cell. The verdict is the worst word among those that could be judged;
 * those that couldn't stay in the list with the reason.
 *
 * @param result null when the cell was not evaluated; only what needs no energies is then judged
 */
export function judge(
  cell: ResolvedCell,
  result: EvaluationResult | null,
  model: EnergeticModel,
  overrides: DataOverrides,
): Judgement {
  const balance = checkChargeBalance(cell);
  const evaluated =
    result === null
      ? names.map(([key, name]) => notJudged(key, name, 'The cell has not been evaluated.'))
      : judgeEvaluated(cell, result, model, overrides);
  const checks = [balance, ...evaluated, ...laterChecks];
  return { checks, verdict: summarise(checks) };
}

function judgeEvaluated(
  cell: ResolvedCell,
  result: EvaluationResult,
  model: EnergeticModel,
  overrides: DataOverrides,
): CheckResult[] {
  const subject: CheckSubject = {
    ...{ cell, result, model, overrides },
    ions: sizedIons(cell, result, overrides),
    account: energeticsOf(cell, result, model, overrides),
  };
  return evaluatedChecks.map((check) => check(subject));
}
