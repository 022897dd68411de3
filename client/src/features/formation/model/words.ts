import type {
  FormationLine,
  FormationOrigin,
  KnownValue,
} from '#common/physics/energetics/formation-line';
import type { FormationStage } from '#common/physics/energetics/formation-levels';
import { valueOn } from '#client/features/formation/model/energy-scale.ts';
import type { EnergyScale } from '#client/lib/energy-unit.ts';

/** In the row, one word or two. */
export const originWords: Record<FormationOrigin, string> = {
  table: 'table',
  workspace: 'workspace',
  typed: 'yours',
  model: 'model value',
  measured: 'measured',
  computed: 'computed',
  solved: 'solved',
  missing: 'no value',
};

const statusWords = {
  verified: 'checked against the source',
  'single-source': 'from one source',
  'computed-here': 'computed here',
  'from-memory': 'common practice, from memory',
  own: 'your own value',
} as const;

export const quantityWords = {
  enthalpy_298: 'enthalpy at 298 K',
  energy_0: 'energy at 0 K',
} as const;

export const stageWords: Record<FormationStage, string> = {
  elements: 'elements',
  gas_atoms: 'gas atoms',
  gas_cations: 'gas cations',
  gas_ions: 'gas ions',
  crystal: 'crystal',
};

/** How far a number was checked, in words; null where nothing can be said. */
export const statusOf = (status: KnownValue['status']): string | null =>
  status === null ? null : statusWords[status];

/** First letter large, a full stop at the end. */
export function sentence(text: string): string {
  const whole = text.charAt(0).toUpperCase() + text.slice(1);
  return /[.!?]$/.test(whole) ? whole : `${whole}.`;
}

export const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** What the note beside a value says: source, how far it was checked, what kind of number it is. */
export function noteOf(line: FormationLine, scale: EnergyScale): readonly string[] {
  const { origin, status, known } = line;
  const isReplaced = line.isTyped && !line.isSolved && known !== null;
  if (origin === 'missing') {
    return [sentence(line.reason ?? 'There is no value.')];
  }
  return [
    sentence(line.source),
    ...(status === null || status === 'own' ? [] : [sentence(statusWords[status])]),
    sentence(quantityWords[line.quantity]),
    ...(isReplaced
      ? [
          `In place of ${valueOn(scale, known.valueKjPerMol)} ${scale.unit}, ${originWords[known.origin]}: ${sentence(known.source)}`,
        ]
      : []),
  ];
}
