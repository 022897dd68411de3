import {
  ionKey,
  noOverrides,
  ownOr,
  type DataOverrides,
  type Sourced,
  type SourceStatus,
} from '#common/chemistry/sourced';

/** Radii in Å of ions of several atoms as Kapustinskii's equation takes them. */
function readList(text: string, source: string, status: SourceStatus): [string, Sourced][] {
  return text.split('; ').map((entry) => {
    const [ion = '', value = ''] = entry.split(' ');
    return [ion, { value: Number(value), source, status }];
  });
}

const roobottom = 'Jenkins & Roobottom';

const radii = new Map([
  ...readList('NH4+1 1.36; HF2-1 1.72', `${roobottom}, handbook page`, 'verified'),
  ...readList(
    'OH-1 1.52; NO3-1 2.00; NO2-1 1.87; CN-1 1.87; SCN-1 2.09; ClO4-1 2.25; BF4-1 2.05; ' +
      'CO3-2 1.89; SO4-2 2.18; PO4-3 2.30; CrO4-2 2.29',
    `${roobottom}, from memory; about ±0.02 Å`,
    'from-memory',
  ),
]);

const olderRadii = new Map(
  readList(
    'NH4+1 1.43; ClO4-1 2.36; CO3-2 1.85; NO3-1 1.89; SO4-2 2.30; PO4-3 2.38; OH-1 1.40; CN-1 1.82',
    'Kapustinskii (1956), older scale, from memory',
    'from-memory',
  ),
);

/**
 * Thermochemical radius of an ion of several atoms, Å.
 * @param group formula without charge: `SO4`, `NH4`
 * @param scale `current`, or `older` for the values of 1956, which differ by up to 0.1 Å
 */
export function thermochemicalRadiusA(
  group: string,
  chargeE: number,
  scale: 'current' | 'older' = 'current',
  overrides: DataOverrides = noOverrides,
): Sourced | null {
  const ion = ionKey(group, chargeE);
  return scale === 'older'
    ? ownOr(overrides, `thermochemical-radius-older:${ion}`, olderRadii.get(ion) ?? null)
    : ownOr(overrides, `thermochemical-radius:${ion}`, radii.get(ion) ?? null);
}

/** Keys of every shipped thermochemical radius. */
export const thermochemicalRadiusKeys: readonly string[] = [
  ...[...radii.keys()].map((ion) => `thermochemical-radius:${ion}`),
  ...[...olderRadii.keys()].map((ion) => `thermochemical-radius-older:${ion}`),
];
