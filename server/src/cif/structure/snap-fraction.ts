/** Fractions of the tables' special positions that decimals can only round. */
const roundedFractions: readonly [number, number][] = [
  [1, 3],
  [2, 3],
  [1, 6],
  [5, 6],
  [1, 12],
  [5, 12],
  [7, 12],
  [11, 12],
];

/** Fewer decimals than this may well mean the decimal itself. */
const fewestDecimals = 3;

/**
 * A coordinate that is a rounded (or cut) third, sixth or twelfth becomes that fraction, so that
 * copies of a special position meet exactly: `0.3333` → `1/3`, `-0.167` → `-1/6`.
 * @param digits the number as written, without uncertainty
 * @returns the fraction as an expression, or null when the digits are of none
 */
export function snapFraction(digits: string): string | null {
  const match = /^([+-]?)(\d*)\.(\d+)$/.exec(digits);
  const decimals = match?.[3]?.length ?? 0;
  if (!match || decimals < fewestDecimals) {
    return null;
  }
  const whole = Number(match[2] || '0');
  const part = Number(match[3]);
  for (const [numerator, denominator] of roundedFractions) {
    const exact = (numerator / denominator) * 10 ** decimals;
    if (part === Math.round(exact) || part === Math.floor(exact)) {
      const sign = match[1] === '-' ? '-' : '';
      return `${sign}${whole * denominator + numerator}/${denominator}`;
    }
  }
  return null;
}
