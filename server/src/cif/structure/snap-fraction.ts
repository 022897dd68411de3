/** Fractions of special positions that decimals can only round, and from how many decimals on. */
const roundedFractions: readonly { numerator: number; denominator: number; decimals: number }[] = [
  { numerator: 1, denominator: 3, decimals: 3 },
  { numerator: 2, denominator: 3, decimals: 3 },
  { numerator: 1, denominator: 6, decimals: 3 },
  { numerator: 5, denominator: 6, decimals: 3 },
  // Fewer decimals of a twelfth may well mean the decimal itself.
  { numerator: 1, denominator: 12, decimals: 4 },
  { numerator: 5, denominator: 12, decimals: 4 },
  { numerator: 7, denominator: 12, decimals: 4 },
  { numerator: 11, denominator: 12, decimals: 4 },
];

/**
 * A coordinate that is a rounded (or cut) third, sixth or twelfth becomes that fraction, so that
 * copies of a special position meet exactly: `0.3333` → `1/3`, `-0.167` → `-1/6`.
 * @param digits the number as written, without uncertainty
 * @returns the fraction as an expression, or null when the digits are of none
 */
export function snapFraction(digits: string): string | null {
  const match = /^([+-]?)(\d*)\.(\d+)$/.exec(digits);
  if (!match) {
    return null;
  }
  const [, sign = '', whole = '', part = ''] = match;
  const found = roundedFractions.find(({ numerator, denominator, decimals }) => {
    const exact = (numerator / denominator) * 10 ** part.length;
    const isRounded = Number(part) === Math.round(exact) || Number(part) === Math.floor(exact);
    return part.length >= decimals && isRounded;
  });
  if (!found) {
    return null;
  }
  const numerator = Number(whole || '0') * found.denominator + found.numerator;
  return `${sign === '-' ? '-' : ''}${numerator}/${found.denominator}`;
}
