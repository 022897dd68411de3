import { formatFixed } from '#common/units/format';

/** A number as far as it is certain. */
export interface CertainDigits {
  /** For the screen: true minus, thin-space groups. Whole tens, hundreds … where decimals < 0. */
  readonly text: string;
  /** Decimals shown; negative where not even the units are certain. */
  readonly decimals: number;
}

/** A double carries 15 to 17 significant decimal digits; 15 are always safe. */
const doubleDigits = 15;

/** Digits before the point of |value|, at least one. */
function integerDigits(value: number): number {
  return Math.max(1, Math.floor(Math.log10(Math.abs(value))) + 1);
}

/** The value rounded to `decimals` as text, zero without a sign. */
function roundedText(value: number, decimals: number): string {
  if (decimals >= 0) {
    const text = value.toFixed(decimals);
    return Number(text) === 0 ? text.replace('-', '') : text;
  }
  const unit = 10 ** -decimals;
  return String(Math.round(value / unit) * unit + 0);
}

/**
 * Ends a number where its certainty ends: as many decimals as leave value − bound and
 * value + bound the same once rounded, so that every digit shown holds for the true number.
 *
 * @param value the number, in any unit
 * @param bound absolute bound in the same unit, ≥ 0; zero for an exact number
 * @param maxDecimals most decimals wanted; never lengthens a number
 */
export function certainDigits(value: number, bound: number, maxDecimals = 15): CertainDigits {
  if (!Number.isFinite(value) || !Number.isFinite(bound)) {
    return { text: '–', decimals: 0 };
  }
  const size = Math.abs(value) + bound;
  const whole = size === 0 ? 1 : integerDigits(size);
  const most = Math.min(maxDecimals, Math.max(0, doubleDigits - whole));
  let decimals = most;
  while (
    decimals > -whole - 1 &&
    roundedText(value - bound, decimals) !== roundedText(value + bound, decimals)
  ) {
    decimals -= 1;
  }
  const shown = decimals < 0 ? Number(roundedText(value, decimals)) : value;
  return { text: formatFixed(shown, Math.max(0, decimals)), decimals };
}
