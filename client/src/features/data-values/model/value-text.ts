/** Reads a number someone typed, with point or comma and either minus; NaN for what is none. */
export function readValue(text: string): number {
  const plain = text.trim().replace('−', '-').replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain) ? Number(plain) : NaN;
}

/** A value with all the digits it has: `−348.575`. */
export const valueText = (value: number): string => String(value).replace('-', '−');
