import { atomicMass, massKeys } from '#common/chemistry/atomic-mass';
import { bondValenceKeys, bondValenceParameters } from '#common/chemistry/bond-valence';
import { bornExponent, bornExponentKeys } from '#common/chemistry/born-exponent';
import { readDataKey, type DataKindFacts } from '#common/chemistry/data-key';
import {
  atomisationEnthalpyKjPerMol,
  bondEnthalpyKjPerMol,
  electronAffinityKjPerMol,
  energeticsKeys,
  ionisationEnergyKjPerMol,
} from '#common/chemistry/element-energetics';
import { ionicRadii, radiusKey, shippedRadius } from '#common/chemistry/ionic-radii';
import type { Sourced } from '#common/chemistry/sourced';
import {
  thermochemicalRadiusA,
  thermochemicalRadiusKeys,
} from '#common/chemistry/thermochemical-radius';

/** A value that is shipped. */
export interface CatalogueRow {
  readonly key: string;
  readonly facts: DataKindFacts;
  readonly subject: string;
  readonly shipped: Sourced;
}

/** Takes `Na+1` apart. */
function readIon(text: string): [string, number] {
  const [, name = '', charge = ''] = /^(.+)([+-]\d)$/.exec(text) ?? [];
  return [name, Number(charge)];
}

function shippedPair(pair: string, part: 'r0A' | 'bA'): Sourced | null {
  const [cation = '', anion = ''] = pair.split('|');
  return bondValenceParameters(...readIon(cation), ...readIon(anion))?.[part] ?? null;
}

function shippedStep(
  subject: string,
  look: (element: string, step: number) => Sourced | null,
): Sourced | null {
  const [element = '', step = ''] = subject.split(':');
  return look(element, Number(step));
}

/** The shipped value of a key, by the look-ups everything else uses; null where none is shipped. */
export function shippedValue(key: string): Sourced | null {
  const read = readDataKey(key);
  if (read === null) {
    return null;
  }
  const { facts, subject } = read;
  switch (facts.kind) {
    case 'mass':
      return atomicMass(subject);
    case 'atomisation':
      return atomisationEnthalpyKjPerMol(subject);
    case 'bond-enthalpy':
      return bondEnthalpyKjPerMol(subject);
    case 'ionisation':
      return shippedStep(subject, ionisationEnergyKjPerMol);
    case 'affinity':
      return shippedStep(subject, electronAffinityKjPerMol);
    case 'radius':
      return shippedRadius(key);
    case 'thermochemical-radius':
      return thermochemicalRadiusA(...readIon(subject));
    case 'thermochemical-radius-older':
      return thermochemicalRadiusA(...readIon(subject), 'older');
    case 'born-exponent':
      return bornExponent(...readIon(subject));
    case 'bond-valence-r0':
      return shippedPair(subject, 'r0A');
    case 'bond-valence-b':
      return shippedPair(subject, 'bA');
  }
}

function rowOf(key: string): CatalogueRow {
  const read = readDataKey(key);
  const shipped = shippedValue(key);
  if (read === null || shipped === null) {
    throw new Error(`The tables name a value they do not have: ${key}.`);
  }
  return { key, ...read, shipped };
}

/** Every value that is shipped, kind by kind. */
export function catalogue(): CatalogueRow[] {
  return [
    ...ionicRadii.map(radiusKey),
    ...energeticsKeys,
    ...bornExponentKeys,
    ...bondValenceKeys,
    ...thermochemicalRadiusKeys,
    ...massKeys,
  ].map(rowOf);
}
