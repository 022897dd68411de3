/** Reads a number someone typed, with point or comma and either minus; NaN for what is none. */
export function readValue(text: string): number {
  const plain = text.trim().replace('−', '-').replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain) ? Number(plain) : NaN;
}

/** A value with all the digits it has: `−348.575`; lengths with two decimals at least: `1.00`. */
export function valueText(value: number, unit = ''): string {
  const text = String(value);
  const isShort = unit === 'Å' && /^-?\d+(\.\d)?$/.test(text);
  return (isShort ? value.toFixed(2) : text).replace('-', '−');
}
