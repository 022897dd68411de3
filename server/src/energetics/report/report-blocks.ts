import type { BoundedOrReason } from '#common/schemas/evaluation';
import type { ValueRange } from '#common/schemas/energetics';
import type { ReportBlock, ReportFigure } from '#common/schemas/report';
import { certainDigits } from '#common/units/certain-digits';
import { COULOMB_RELATIVE_UNCERTAINTY } from '#common/units/constants';
import { formatBound, formatFixed } from '#common/units/format';

/** A figure that ends where its bound begins. */
export function certain(
  name: string,
  value: number,
  bound: number,
  unit: string,
  note: string,
): ReportFigure {
  const { text } = certainDigits(value, bound);
  const within = `certain to ± ${formatBound(bound)}${unit === '' ? '' : ` ${unit}`}`;
  return { name, text, unit, value, bound, note: note === '' ? within : `${note} · ${within}` };
}

/** A quantity proportional to k_e, whose own uncertainty comes on top of the numerical bound. */
export function coulombBound(value: number, bound: number): number {
  return bound + Math.abs(value) * COULOMB_RELATIVE_UNCERTAINTY;
}

/** A figure that may mean nothing for this cell. */
export function certainOrReason(
  name: string,
  { value, bound, reason }: BoundedOrReason,
  note: string,
): ReportFigure {
  return value === null || bound === null
    ? missing(name, reason ?? 'not defined')
    : certain(name, value, bound, '', note);
}

export const missing = (name: string, reason: string): ReportFigure => ({
  name,
  text: '–',
  unit: '',
  value: null,
  bound: null,
  note: reason,
});

/** A number exact as given or one that follows from the cell alone. */
export const plain = (
  name: string,
  value: number,
  decimals: number,
  unit: string,
  note = '',
): ReportFigure => ({ name, text: formatFixed(value, decimals), unit, value, bound: null, note });

/** Both ends of a range; one number where they print alike. */
export function rangeText({ low, high }: ValueRange, decimals: number): string {
  const [from, to] = [formatFixed(low, decimals), formatFixed(high, decimals)];
  return from === to ? from : `${from} to ${to}`;
}

/** A model's number, or why there is none. */
export function modelFigure(
  name: string,
  range: ValueRange | null,
  decimals: number,
  unit: string,
  note: string,
): ReportFigure {
  return range === null
    ? missing(name, note)
    : {
        name,
        text: rangeText(range, decimals),
        unit,
        value: (range.low + range.high) / 2,
        bound: null,
        note,
      };
}

export const text = (words: string): ReportBlock => ({ kind: 'text', text: words });
export const figures = (list: ReportFigure[]): ReportBlock => ({ kind: 'figures', figures: list });

/** A table from its columns: a title behind `>` is set to the right, with its cells. */
export function table(
  caption: string,
  titles: readonly string[],
  rows: string[][],
  closing: string[][] = [],
): ReportBlock {
  const columns = titles.map((title) =>
    title.startsWith('>')
      ? { title: title.slice(1), align: 'right' as const }
      : { title, align: 'left' as const },
  );
  return { kind: 'table', table: { caption, columns, rows, closing } };
}
