import type { ValueRange } from '#common/schemas/energetics';

/** What a range may be, and how a message names it. */
export interface RangeLimits {
  readonly name: string;
  readonly low: number;
  readonly high: number;
  readonly unit: string;
}

const number = String.raw`[+−-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:e[+-]?\d+)?`;
const pattern = new RegExp(
  String.raw`^(${number})(?:\s*(?:…|\.\.\.?|to|\s[–-]\s|–)\s*(${number}))?$`,
  'i',
);

const readNumber = (text: string): number => Number(text.replace(',', '.').replace('−', '-'));

export type ReadRange =
  | { readonly ok: true; readonly range: ValueRange }
  | { readonly ok: false; readonly message: string };

/** Reads `24`, `23.5 to 24.5` or `23.5 … 24.5`. */
export function readRange(text: string, { name, low, high, unit }: RangeLimits): ReadRange {
  const match = pattern.exec(text.trim());
  if (match === null) {
    return { ok: false, message: `Write ${name} as a number, or as a range: 7 to 9.` };
  }
  const ends = [readNumber(match[1]!), readNumber(match[2] ?? match[1]!)];
  const range = { low: Math.min(...ends), high: Math.max(...ends) };
  return range.low < low || range.high > high
    ? {
        ok: false,
        message: `Write ${name} between ${low} and ${high}${unit === '' ? '' : ` ${unit}`}.`,
      }
    : { ok: true, range };
}

export const writeRange = ({ low, high }: ValueRange): string =>
  low === high ? String(low) : `${low} to ${high}`;
