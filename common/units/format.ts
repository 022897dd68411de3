/**
 * How numbers are written on screens and in reports: true minus, thin-space groups of three,
 * superscript powers of ten. Machine formats (JSON, CSV) do not use these.
 */

/** U+2212, as wide as the plus. */
const MINUS = '−';
/** U+2009 thin space, between groups of three digits. */
export const THIN_SPACE = '\u2009';

const superscripts: Readonly<Record<string, string>> = {
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
  '+': '⁺',
  '-': '⁻',
  '−': '⁻',
  '.': '·',
};

/** Digits and signs raised: `-10` → `⁻¹⁰`. */
export function superscript(text: string): string {
  return [...text].map((sign) => superscripts[sign] ?? sign).join('');
}

/** Groups of three on both sides of the point; up to four digits stay together. */
function groupDigits(text: string): string {
  const [whole = '', fraction] = text.split('.');
  const digits = whole.replace(/^[-−+]/, '');
  const grouped =
    digits.length > 4
      ? whole.slice(0, whole.length - digits.length) +
        digits.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE)
      : whole;
  if (fraction === undefined) {
    return grouped;
  }
  const groupedFraction =
    fraction.length > 4 ? fraction.replace(/(\d{3})(?=\d)/g, `$1${THIN_SPACE}`) : fraction;
  return `${grouped}.${groupedFraction}`;
}

/** A number with fixed decimals: `−47.795 461 7`; never `−0.00`. */
export function formatFixed(value: number, decimals: number): string {
  if (!Number.isFinite(value)) {
    return '–';
  }
  const text = value.toFixed(decimals);
  const unsigned = Number(text) === 0 ? text.replace('-', '') : text;
  return groupDigits(unsigned).replace('-', MINUS);
}

/** Like {@link formatFixed} with the plus written too: `+116.04`; zero has no sign. */
export function formatSigned(value: number, decimals: number): string {
  const text = formatFixed(value, decimals);
  return value > 0 && Number(value.toFixed(decimals)) !== 0 ? `+${text}` : text;
}

/** At most so many decimals, without trailing zeros: `2.106`, `4`, `−0.5`. */
export function formatTidy(value: number, maxDecimals: number): string {
  if (!Number.isFinite(value)) {
    return '–';
  }
  const text = value.toFixed(maxDecimals);
  const trimmed = text.includes('.') ? text.replace(/\.?0+$/, '') : text;
  const unsigned = Number(trimmed) === 0 ? '0' : trimmed;
  return groupDigits(unsigned).replace('-', MINUS);
}

/** One significant digit times a power of ten: `4 × 10⁻¹⁰`; `0` for zero. */
export function formatPower(value: number, digits = 1): string {
  if (value === 0 || !Number.isFinite(value)) {
    return value === 0 ? '0' : '–';
  }
  const [mantissa = '', exponent = '0'] = value.toExponential(digits - 1).split('e');
  const power = Number(exponent);
  const front = mantissa.replace('-', MINUS);
  return power === 0 ? front : `${front} × 10${superscript(String(power))}`;
}

/** An error bound: one significant digit, rounded up so that it stays a bound. */
export function formatBound(bound: number): string {
  if (bound <= 0 || !Number.isFinite(bound)) {
    return formatPower(bound);
  }
  const power = Math.floor(Math.log10(bound));
  const unit = 10 ** power;
  // The small allowance keeps 4e-10 from turning into 5e-10 by the last bit of the division.
  const steps = Math.ceil((bound / unit) * (1 - 1e-12));
  return formatPower(steps * unit);
}

/** Charge of an ion without the element: `2+`, `−`, `0.5+`; empty for zero. */
export function formatCharge(chargeE: number): string {
  const size = Math.abs(chargeE);
  if (size < 5e-4) {
    return '';
  }
  const sign = chargeE > 0 ? '+' : MINUS;
  const digits = formatTidy(size, 3);
  return digits === '1' ? sign : `${digits}${sign}`;
}

/** Net charge with its sign in front, for sums: `+1`, `−0.25`, `0`. */
export function formatNetCharge(chargeE: number): string {
  const text = formatTidy(chargeE, 4);
  return chargeE > 0 && text !== '0' ? `+${text}` : text;
}

/** The same text for programs and spreadsheets: plain minus, no groups. */
export function plainNumberText(text: string): string {
  return text.replaceAll(THIN_SPACE, '').replaceAll(MINUS, '-');
}
