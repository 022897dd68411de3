import {
  atomisationRead,
  atomisationRemembered,
  bondRead,
  firstAffinityRead,
  ionisationRead,
  ionisationRemembered,
  ionisationSeenOnce,
} from '#common/chemistry/element-energetics-data';
import {
  noOverrides,
  ownOr,
  type DataOverrides,
  type Sourced,
  type SourceStatus,
} from '#common/chemistry/sourced';

type Table = ReadonlyMap<string, Sourced>;

/** Reads `name value value …; …` into rows keyed `name:1`, `name:2` …, or `name` alone. */
function readRows(
  text: string,
  source: string,
  status: SourceStatus,
  hasSteps: boolean,
): [string, Sourced][] {
  return text.split(';').flatMap((entry) => {
    const [name = '', ...values] = entry.trim().split(/\s+/);
    return values.map((value, index): [string, Sourced] => [
      hasSteps ? `${name}:${index + 1}` : name,
      { value: Number(value), source, status },
    ]);
  });
}

const thermodynamic = 'Handbook table of standard thermodynamic properties, 298.15 K';
const fromMemory = 'from memory';

const atomisation: Table = new Map([
  ...readRows(atomisationRead, thermodynamic, 'verified', false),
  ...readRows(
    atomisationRemembered,
    `CODATA key values or handbook, ${fromMemory}`,
    'from-memory',
    false,
  ),
]);

const thermochemicalNetwork = 'Active Thermochemical Tables 1.112, 298.15 K';
const bonds: Table = new Map(readRows(bondRead, thermochemicalNetwork, 'verified', false));

/** The table read prints 587 for thorium, as older ones do; the spectroscopic value is 6.3067 eV. */
const thorium: [string, Sourced] = [
  'Th:1',
  {
    value: 608.5,
    source: 'Blue Obelisk Data Repository (Debian package bodr): 6.3067 eV; older tables print 587',
    status: 'single-source',
  },
];

const ionisation: Table = new Map([
  ...readRows(ionisationRead, 'Principles of General Chemistry 1.0, appendix J', 'verified', true),
  ...readRows(ionisationSeenOnce, 'Public table of ionisation energies', 'single-source', true),
  thorium,
  ...readRows(ionisationRemembered, `Handbook, ${fromMemory}`, 'from-memory', true),
]);

/**
 * Second affinities belong to ions that do not exist free, so they are inferred, not measured, and
 * differ between tables by a hundred and more.
 */
const secondAffinities: [string, Sourced][] = [
  [
    'O:2',
    {
      value: 744,
      source: 'Not measurable: quoted from +702 to +844 kJ/mol; +744 taken, from memory',
      status: 'from-memory',
    },
  ],
  ['S:2', { value: 532, source: 'Not measurable: handbook, from memory', status: 'from-memory' }],
];

const affinity: Table = new Map([
  ...readRows(firstAffinityRead, 'Public table of electron affinities (A7)', 'verified', true),
  ...secondAffinities,
]);

/** ½ D of an element whose standard state is the diatomic gas, where no table entry stands. */
function halfBond(element: string): Sourced | null {
  const bond = element === 'H' || element === 'N' ? bonds.get(`${element}2`) : undefined;
  return bond === undefined
    ? null
    : {
        value: bond.value / 2,
        source: `½ D(${element}₂), ${bond.source}`,
        status: 'computed-here',
      };
}

/**
 * Enthalpy of making one mole of gas atoms from the element's standard state at 298.15 K, kJ mol⁻¹.
 * @returns null for elements without a value
 */
export function atomisationEnthalpyKjPerMol(
  element: string,
  overrides: DataOverrides = noOverrides,
): Sourced | null {
  return ownOr(overrides, `atomisation:${element}`, atomisation.get(element) ?? halfBond(element));
}

/**
 * Bond dissociation enthalpy of a diatomic gas at 298.15 K, kJ per mole of molecules.
 * @param molecule `H2`, `N2`, `O2`, `F2`, `Cl2`, `Br2`, `I2`
 */
export function bondEnthalpyKjPerMol(
  molecule: string,
  overrides: DataOverrides = noOverrides,
): Sourced | null {
  return ownOr(overrides, `bond-enthalpy:${molecule}`, bonds.get(molecule) ?? null);
}

/**
 * Energy of taking the `step`-th electron from a free atom (1 for the neutral one), kJ mol⁻¹, 0 K.
 */
export function ionisationEnergyKjPerMol(
  element: string,
  step: number,
  overrides: DataOverrides = noOverrides,
): Sourced | null {
  const name = `${element}:${step}`;
  return ownOr(overrides, `ionisation:${name}`, ionisation.get(name) ?? null);
}

/**
 * Enthalpy of gaining the `step`-th electron, kJ mol⁻¹, 0 K: negative where energy is released, so
 * the first affinity of chlorine reads −348.575 and the second of oxygen about +744.
 */
export function electronAffinityKjPerMol(
  element: string,
  step: number,
  overrides: DataOverrides = noOverrides,
): Sourced | null {
  const name = `${element}:${step}`;
  return ownOr(overrides, `affinity:${name}`, affinity.get(name) ?? null);
}

/** Keys of every shipped value of this file, in the order of the tables. */
export const energeticsKeys: readonly string[] = [
  ...[...atomisation.keys(), 'H', 'N'].map((name) => `atomisation:${name}`),
  ...[...bonds.keys()].map((name) => `bond-enthalpy:${name}`),
  ...[...ionisation.keys()].map((name) => `ionisation:${name}`),
  ...[...affinity.keys()].map((name) => `affinity:${name}`),
];
