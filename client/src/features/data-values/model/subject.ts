import type { DataKey } from '#common/chemistry/data-key';
import { formatCharge, superscript } from '#common/units/format';

/** What a value is of, in parts that are set differently. */
export interface Subject {
  /** Name and charge of each ion, or one formula without charge. */
  readonly formulas: readonly { readonly formula: string; readonly chargeE: number }[];
  /** In words after it: `coordination 6, high spin`. */
  readonly detail: string;
}

const places = 'first second third fourth fifth sixth seventh eighth ninth'.split(' ');
const place = (step: string): string => places[Number(step) - 1] ?? step;

const states: Partial<Record<string, string>> = {
  highspin: 'high spin',
  lowspin: 'low spin',
  squareplanar: 'square planar',
  pyramidal: 'pyramidal',
  'highspin-squareplanar': 'high spin, square planar',
};

function readFormula(text: string): Subject['formulas'][number] {
  const match = /^(.+)([+-]\d)$/.exec(text);
  return { formula: match?.[1] ?? text, chargeE: Number(match?.[2] ?? 0) };
}

/** Takes the subject of a key apart: `Na+1:6`, `O:2`, `Na+1|O-2`. */
export function subjectOf({ facts: { kind }, subject }: DataKey): Subject {
  const [name = '', second = '', state = ''] = subject.split(':');
  const formulas = name.split('|').map(readFormula);
  switch (kind) {
    case 'radius': {
      const stateWords = states[state];
      const words = [`coordination ${second}`, ...(stateWords === undefined ? [] : [stateWords])];
      return { formulas, detail: words.join(', ') };
    }
    case 'ionisation':
      return { formulas, detail: `${place(second)} electron taken` };
    case 'affinity':
      return { formulas, detail: `${place(second)} electron gained` };
    case 'mass':
    case 'atomisation':
    case 'bond-enthalpy':
    case 'born-exponent':
    case 'bond-valence-r0':
    case 'bond-valence-b':
    case 'thermochemical-radius':
    case 'thermochemical-radius-older':
      return { formulas, detail: '' };
  }
}

/** The same as plain text, for titles and names read aloud: `Na⁺, coordination 6`. */
export function subjectText(key: DataKey): string {
  const { formulas, detail } = subjectOf(key);
  const names = formulas
    .map(({ formula, chargeE }) => `${formula}${superscript(formatCharge(chargeE))}`)
    .join(' – ');
  return detail === '' ? names : `${names}, ${detail}`;
}
