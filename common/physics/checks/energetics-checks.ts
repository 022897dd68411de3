import {
  limit,
  notJudged,
  wordBelow,
  type CheckResult,
  type CheckSubject,
} from '#common/physics/checks/check-result';
import { formationComposition } from '#common/physics/energetics/formation-composition';
import { formationLedger } from '#common/physics/energetics/formation-ledger';
import type { ValueRange } from '#common/schemas/energetics';
import { formatFixed, formatSigned } from '#common/units/format';

const middle = ({ low, high }: ValueRange): number => (low + high) / 2;

/** The Born exponent in use is one that ionic crystals have. */
export function checkExponent({ account }: CheckSubject): CheckResult {
  const [key, name] = ['exponent', 'Born exponent'] as const;
  const { hardness } = account;
  if (hardness?.symbol !== 'n') {
    return notJudged(key, name, account.reason ?? 'The repulsion model has no exponent.');
  }
  const { low, high } = hardness.range;
  const isUsual = low >= limit('exponentLow') && high <= limit('exponentHigh');
  return {
    ...{ key, name },
    word: isUsual ? 'holds' : 'doubtful',
    finding: `n = ${formatFixed(middle(hardness.range), 2)}, ${hardness.source}.`,
    value: middle(hardness.range),
    unit: '',
    limits: ['exponentLow', 'exponentHigh'],
    labels: [],
  };
}

/** Under a pair table of one's own the cell is at rest near where it is. */
export function checkRest({ account, model }: CheckSubject): CheckResult {
  const [key, name] = ['rest', 'Spacing at rest'] as const;
  if (account.equilibriumScale === null) {
    return notJudged(key, name, account.reason ?? 'The model is nowhere at rest.');
  }
  if (model.repulsion.kind !== 'pair_table') {
    return notJudged(
      key,
      name,
      'The repulsion is fitted to this cell, which is therefore at rest as given.',
    );
  }
  const off = Math.abs(middle(account.equilibriumScale) - 1);
  return {
    ...{ key, name },
    word: wordBelow(off, limit('restDoubtful'), limit('restFails')),
    finding: `Under the pair table the cell is at rest at ${formatFixed(middle(account.equilibriumScale), 4)} of its size.`,
    value: off,
    unit: 'of the spacing',
    limits: ['restDoubtful', 'restFails'],
    labels: [],
  };
}

/** The model's lattice energy against a measured one, else against Kapustinskii's estimate. */
export function checkLatticeEnergy({ account, model }: CheckSubject): CheckResult {
  const [key, name] = ['lattice_energy', 'Lattice energy'] as const;
  const { latticeEnergyKjPerMol: energy, kapustinskii } = account;
  if (energy === null) {
    return notJudged(key, name, account.reason ?? 'The model gives no lattice energy.');
  }
  const measured = model.measured.latticeEnergyKjPerMol;
  const reference = measured === null ? kapustinskii.energyKjPerMol : middle(measured);
  if (reference === null) {
    return notJudged(key, name, kapustinskii.reason ?? 'There is nothing to compare it with.');
  }
  const off = middle(energy) / reference - 1;
  return {
    ...{ key, name },
    word: wordBelow(Math.abs(off), limit('energyDoubtful'), limit('energyFails')),
    finding:
      `${formatFixed(middle(energy), 0)} kJ mol⁻¹, ${formatSigned(100 * off, 1)} % from ` +
      `${measured === null ? 'Kapustinskii’s estimate' : 'the measured value'} of ${formatFixed(reference, 0)} kJ mol⁻¹.`,
    value: off,
    unit: '',
    limits: ['energyDoubtful', 'energyFails'],
    labels: [],
  };
}

/** Forming the compound from its elements releases energy. */
export function checkFormation({ cell, model, account, overrides }: CheckSubject): CheckResult {
  const [key, name] = ['formation', 'Formation enthalpy'] as const;
  const composition = formationComposition(cell);
  if ('reason' in composition) {
    return notJudged(key, name, composition.reason);
  }
  const ledger = formationLedger(composition, model, account, overrides);
  const value = ledger.formation.contributionKjPerMol;
  if (ledger.open !== null || value === null) {
    return notJudged(key, name, 'The account of formation does not close: lines are missing.');
  }
  if (ledger.isPartial) {
    return notJudged(key, name, 'Lines of the account are left out, so it gives no enthalpy.');
  }
  return {
    ...{ key, name },
    word: value.high < 0 ? 'holds' : value.low > 0 ? 'fails' : 'doubtful',
    finding:
      `${formatSigned(middle(value), 0)} kJ mol⁻¹ from the elements` +
      `${value.low > 0 ? ': forming it takes energy' : ''}.`,
    value: middle(value),
    unit: 'kJ mol⁻¹',
    limits: [],
    labels: [],
  };
}
