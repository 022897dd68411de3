import type { FormationLine } from '#common/physics/energetics/formation-line';
import type { FormationChoices } from '#common/schemas/energetics';

/** Types a value over what tables or model give. */
export function typeValue(
  choices: FormationChoices,
  key: string,
  valueKjPerMol: number,
): FormationChoices {
  return { ...choices, typedKjPerMol: { ...choices.typedKjPerMol, [key]: valueKjPerMol } };
}

/** Goes back to what tables or model give. */
export function restoreValue(choices: FormationChoices, key: string): FormationChoices {
  const rest = Object.entries(choices.typedKjPerMol).filter(([one]) => one !== key);
  return { ...choices, typedKjPerMol: Object.fromEntries(rest) };
}

/** Leaves a line out or counts it again. */
export function setExcluded(
  choices: FormationChoices,
  key: string,
  isExcluded: boolean,
): FormationChoices {
  const others = choices.excluded.filter((one) => one !== key);
  return { ...choices, excluded: isExcluded ? [...others, key] : others };
}

/** Closes the account with another line; a line that is solved for is not left out. */
export function solveFor(choices: FormationChoices, key: string): FormationChoices {
  return { ...setExcluded(choices, key, false), solveFor: key };
}

/** A number as a person types it: true minus, spaces and a decimal comma are understood. */
export function readNumber(text: string): number | null {
  const plain = text
    .replaceAll(/[\s\u2009\u00a0]/g, '')
    .replaceAll('−', '-')
    .replace(/^\+/, '')
    .replace(/^(-?\d+),(\d+)$/, '$1.$2');
  return /^-?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain) ? Number(plain) : null;
}

const signWords: Partial<Record<FormationLine['kind'], { sign: 1 | -1; words: string }>> = {
  atomisation: { sign: 1, words: 'Taking an element apart costs energy: the value is positive.' },
  ionisation: { sign: 1, words: 'Taking an electron away costs energy: the value is positive.' },
  lattice: {
    sign: -1,
    words: 'The line runs from gas ions to the crystal: the value is negative.',
  },
};

/** A caution where a typed value has the sign that the line's direction forbids; null if it is fine. */
export function signCaution(kind: FormationLine['kind'], valueKjPerMol: number): string | null {
  const rule = signWords[kind];
  return rule !== undefined && valueKjPerMol * rule.sign < 0 ? rule.words : null;
}
