import { findElement } from '#common/chemistry/elements';

/** What a value is of. */
export type DataKind =
  | 'mass'
  | 'atomisation'
  | 'bond-enthalpy'
  | 'ionisation'
  | 'affinity'
  | 'radius'
  | 'thermochemical-radius'
  | 'thermochemical-radius-older'
  | 'born-exponent'
  | 'bond-valence-r0'
  | 'bond-valence-b';

/** A kind's name, unit, key and the range outside of which a value can only be a slip. */
export interface DataKindFacts {
  readonly kind: DataKind;
  readonly name: string;
  /** Empty for a pure number. */
  readonly unit: string;
  readonly low: number;
  readonly high: number;
  /** A key of this kind, to show how one is written. */
  readonly example: string;
  /** What follows `kind:`, with the elements it names in groups called `e1` and `e2`. */
  readonly form: RegExp;
}

const element = (group: string) => `(?<${group}>[A-Z][a-z]?)`;
const cation = (group: string) => `${element(group)}\\+[1-9]`;
const anion = (group: string) => `${element(group)}-[1-9]`;
const ion = `(?:${element('e1')}|OH)[+-][1-9]`;
const groupIon = '[A-Z][A-Za-z0-9]{0,19}[+-][1-9]';
const stated = '(?::(?:highspin|lowspin|squareplanar|pyramidal|highspin-squareplanar))?';
const whole = (form: string) => new RegExp(`^${form}$`);

const pair = whole(`${cation('e1')}\\|${anion('e2')}`);
const energy = { unit: 'kJ/mol' };
const length = { unit: 'Å' };

/** All kinds, in the order people are shown them. The ranges are common practice, no source. */
export const dataKinds: readonly DataKindFacts[] = [
  {
    kind: 'radius',
    name: 'Ionic radius',
    ...length,
    low: -0.5,
    high: 4,
    example: 'radius:Na+1:6',
    form: whole(`${ion}:(?:[1-9]|1[0-9]|2[0-4])${stated}`),
  },
  {
    kind: 'atomisation',
    name: 'Enthalpy of atomisation',
    ...energy,
    low: 0,
    high: 2_000,
    example: 'atomisation:Na',
    form: whole(element('e1')),
  },
  {
    kind: 'ionisation',
    name: 'Ionisation energy',
    ...energy,
    low: 1,
    high: 200_000,
    example: 'ionisation:Na:1',
    form: whole(`${element('e1')}:[1-9]`),
  },
  {
    kind: 'affinity',
    name: 'Enthalpy of electron gain',
    ...energy,
    low: -1_000,
    high: 5_000,
    example: 'affinity:O:2',
    form: whole(`${element('e1')}:[1-9]`),
  },
  {
    kind: 'bond-enthalpy',
    name: 'Bond enthalpy',
    ...energy,
    low: 1,
    high: 2_000,
    example: 'bond-enthalpy:Cl2',
    form: whole(`${element('e1')}2`),
  },
  {
    kind: 'born-exponent',
    name: 'Born exponent',
    unit: '',
    low: 2,
    high: 30,
    example: 'born-exponent:Na+1',
    form: whole(`${element('e1')}[+-][1-9]`),
  },
  {
    kind: 'bond-valence-r0',
    name: 'Bond-valence R₀',
    ...length,
    low: 0.1,
    high: 5,
    example: 'bond-valence-r0:Na+1|O-2',
    form: pair,
  },
  {
    kind: 'bond-valence-b',
    name: 'Bond-valence b',
    ...length,
    low: 0.05,
    high: 2,
    example: 'bond-valence-b:Na+1|O-2',
    form: pair,
  },
  {
    kind: 'thermochemical-radius',
    name: 'Thermochemical radius',
    ...length,
    low: 0.1,
    high: 6,
    example: 'thermochemical-radius:SO4-2',
    form: whole(groupIon),
  },
  {
    kind: 'thermochemical-radius-older',
    name: 'Thermochemical radius, scale of 1956',
    ...length,
    low: 0.1,
    high: 6,
    example: 'thermochemical-radius-older:SO4-2',
    form: whole(groupIon),
  },
  {
    kind: 'mass',
    name: 'Atomic mass',
    unit: 'g/mol',
    low: 0.1,
    high: 1_000,
    example: 'mass:Na',
    form: whole(element('e1')),
  },
];

const factsByKind = new Map<string, DataKindFacts>(dataKinds.map((facts) => [facts.kind, facts]));

/** A key taken apart. */
export interface DataKey {
  readonly facts: DataKindFacts;
  /** What it is of, as written in the key: `Na+1:6`. */
  readonly subject: string;
}

/**
 * Reads the key of a value: `mass:Na`, `ionisation:Na:1`, `affinity:O:2`, `radius:Fe+2:6:highspin`,
 * `bond-valence-r0:Na+1|O-2` …
 * @returns null for what is no key, or names an element that doesn't exist
 */
export function readDataKey(key: string): DataKey | null {
  const colon = key.indexOf(':');
  const facts = factsByKind.get(key.slice(0, Math.max(colon, 0)));
  const subject = key.slice(colon + 1);
  const match = facts?.form.exec(subject);
  if (facts === undefined || match === null || match === undefined) {
    return null;
  }
  const named = Object.values(match.groups ?? {}).filter((symbol) => symbol !== undefined);
  return named.every((symbol) => findElement(symbol)?.symbol === symbol)
    ? { facts, subject }
    : null;
}

/** Whether a value of the kind may be taken at all; says so in words if not. */
export function valueFault({ name, unit, low, high }: DataKindFacts, value: number): string | null {
  if (Number.isFinite(value) && value >= low && value <= high) {
    return null;
  }
  const withUnit = (limit: number) =>
    `${limit.toLocaleString('en').replace('-', '−')}${unit && ` ${unit}`}`;
  return `${name} must lie between ${withUnit(low)} and ${withUnit(high)}.`;
}
