import { bornExponent } from '#common/chemistry/born-exponent';
import type { DataOverrides } from '#common/chemistry/sourced';
import type { SizedIon } from '#common/physics/energetics/ion-sizes';
import type { EnergeticModel, ExponentChoice, ValueRange } from '#common/schemas/energetics';
import { EV_PER_CUBIC_ANGSTROM_IN_GPA } from '#common/units/constants';

/** A model parameter in use: its range and where it comes from, or why there is none. */
export interface ParameterInUse {
  readonly range: ValueRange | null;
  readonly source: string;
  readonly reason: string | null;
}

/** Fitted exponents outside this range deserve a warning; common practice, no source. */
export const usualExponents: ValueRange = { low: 5, high: 12 };

/** Mean exponent over the ion kinds of the compound, as Pauling takes it: LiF (5 + 7)/2 = 6. */
function exponentOfIons(ions: readonly SizedIon[], overrides: DataOverrides): ParameterInUse {
  const source = 'mean of Pauling’s exponents over the ion kinds';
  let sum = 0;
  let count = 0;
  for (const { speciesKey, components } of ions) {
    let weight = 0;
    let mean = 0;
    for (const { element, chargeE, occupancy } of components) {
      const exponent = bornExponent(element, chargeE, overrides);
      if (exponent === null) {
        const reason = `There is no Born exponent for ${speciesKey}: type one, or add it under the workspace’s data values.`;
        return { range: null, source, reason };
      }
      mean += exponent.value * occupancy;
      weight += occupancy;
    }
    sum += mean / weight;
    count += 1;
  }
  const value = sum / count;
  return { range: { low: value, high: value }, source, reason: null };
}

/** n = 1 + 9 K V/A for a measured bulk modulus K. */
function exponentOfBulkModulus(
  measuredGpa: ValueRange | null,
  bindingEv: number,
  volumeA3: number,
): ParameterInUse {
  const source = 'fitted to the measured bulk modulus: n = 1 + 9 K V/A';
  if (measuredGpa === null) {
    return {
      range: null,
      source,
      reason: 'Type the measured bulk modulus to fit the exponent to.',
    };
  }
  const at = (gpa: number) => 1 + (9 * (gpa / EV_PER_CUBIC_ANGSTROM_IN_GPA) * volumeA3) / bindingEv;
  return { range: { low: at(measuredGpa.low), high: at(measuredGpa.high) }, source, reason: null };
}

/**
 * The Born exponent a lattice uses.
 * @param bindingEv A = −E_el per formula unit, eV
 * @param volumeA3 volume per formula unit, Å³
 */
export function exponentInUse(
  choice: ExponentChoice,
  model: EnergeticModel,
  ions: readonly SizedIon[],
  bindingEv: number,
  volumeA3: number,
  overrides: DataOverrides,
): ParameterInUse {
  switch (choice.from) {
    case 'ions':
      return exponentOfIons(ions, overrides);
    case 'typed':
      return { range: choice.exponent, source: 'typed for this lattice', reason: null };
    case 'bulk_modulus':
      return exponentOfBulkModulus(model.measured.bulkModulusGpa, bindingEv, volumeA3);
  }
}
