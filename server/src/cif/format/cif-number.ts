/** A CIF number: its value, the digits as written, and its standard uncertainty. */
export interface CifNumber {
  readonly value: number;
  /** The digits without the uncertainty: `5.640` of `5.640(1)`. */
  readonly digits: string;
  /** Standard uncertainty in the unit of the value: 0.001 of `5.640(1)`; null when none is given. */
  readonly uncertainty: number | null;
}

const numberPattern = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)(?:\((\d+)\))?$/;

/**
 * Reads a number with an optional standard uncertainty in units of its last digit
 * (International Tables G, 2.2.7.1.4, `Numeric`).
 * @returns null when the text is no number
 */
export function readCifNumber(text: string): CifNumber | null {
  const match = numberPattern.exec(text.trim());
  if (!match) {
    return null;
  }
  const digits = match[1]!;
  const value = Number(digits);
  if (!Number.isFinite(value)) {
    return null;
  }
  return { value, digits, uncertainty: uncertaintyOf(digits, match[2]) };
}

function uncertaintyOf(digits: string, inLastDigit: string | undefined): number | null {
  if (inLastDigit === undefined) {
    return null;
  }
  const [mantissa = '', exponent = '0'] = digits.toLowerCase().split('e');
  const decimals = mantissa.includes('.') ? mantissa.length - mantissa.indexOf('.') - 1 : 0;
  return Number(`${inLastDigit}e${Number(exponent) - decimals}`);
}
