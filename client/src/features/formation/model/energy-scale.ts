import type { FormationLine } from '#common/physics/energetics/formation-line';
import { formatFixed, formatSigned, formatTidy } from '#common/units/format';
import type { EnergyScale } from '#client/lib/energy-unit.ts';

interface Range {
  readonly low: number;
  readonly high: number;
}

/** A range, or one number where both ends read the same: `−412.3`, `−430.1 … −398.0`. */
export function rangeOn(scale: EnergyScale, { low, high }: Range, isSigned = false): string {
  const write = isSigned ? formatSigned : formatFixed;
  const from = write(low / scale.kjPerMol, scale.decimals);
  const to = write(high / scale.kjPerMol, scale.decimals);
  return from === to ? from : `${from} … ${to}`;
}

/** One value as given: no more decimals than it has. */
export function valueOn(scale: EnergyScale, { low, high }: Range): string {
  return low === high
    ? formatTidy(low / scale.kjPerMol, scale.fineDecimals)
    : rangeOn(scale, { low, high });
}

/** A line's own value; what is computed ends where a sum does. Empty where there is none. */
export function lineValueOn(scale: EnergyScale, line: FormationLine): string {
  const { valueKjPerMol: value, origin } = line;
  if (value === null) {
    return '';
  }
  return origin === 'model' || origin === 'solved' ? rangeOn(scale, value) : valueOn(scale, value);
}
