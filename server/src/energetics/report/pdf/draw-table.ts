import type { ReportTable } from '#common/schemas/report';

import { inks, styles, type PageFlow } from './page-flow.js';
import type { TextStyle } from './typesetter.js';

const gap = 10;
const padding = 2.5;
const rowStep = 10.5;

/** Widths of the columns: as wide as their texts, the widest narrowed where the page is too small. */
function columnWidths({ columns, rows, closing }: ReportTable, flow: PageFlow): number[] {
  const natural = columns.map(({ title }, k) =>
    [...rows, ...closing].reduce(
      (most, row) => Math.max(most, flow.type.width(row[k] ?? '', styles.cell)),
      flow.type.width(title, styles.head),
    ),
  );
  const room = flow.width - gap * (columns.length - 1);
  const total = natural.reduce((sum, width) => sum + width, 0);
  if (total <= room) {
    const air = (room - total) / columns.length;
    return natural.map((width) => width + air);
  }
  const fair = room / columns.length;
  const kept = natural.filter((width) => width <= fair).reduce((sum, width) => sum + width, 0);
  const wide = natural.filter((width) => width > fair).reduce((sum, width) => sum + width, 0);
  return natural.map((width) => (width <= fair ? width : (width / wide) * (room - kept)));
}

interface Columns {
  readonly table: ReportTable;
  readonly widths: readonly number[];
}

function drawRow(
  { table, widths }: Columns,
  cells: readonly string[],
  flow: PageFlow,
  style: TextStyle,
): void {
  const lines = widths.map((width, k) => flow.type.lines(cells[k] ?? '', width + 0.01, style));
  const deepest = Math.max(...lines.map(({ length }) => length));
  let x = flow.left;
  widths.forEach((width, k) => {
    const isRight = table.columns[k]!.align === 'right';
    lines[k]!.forEach((line, index) => {
      const inset = isRight ? width - flow.type.width(line, style) : 0;
      flow.type.draw(line, x + inset, flow.y + padding + style.size + index * rowStep, style);
    });
    x += width + gap;
  });
  flow.y += deepest * rowStep + 2 * padding;
}

const heightOf = ({ widths }: Columns, cells: readonly string[], flow: PageFlow): number =>
  Math.max(
    ...widths.map((width, k) => flow.type.lines(cells[k] ?? '', width + 0.01, styles.cell).length),
  ) *
    rowStep +
  2 * padding;

function drawHead(columns: Columns, flow: PageFlow): void {
  const titles = columns.table.columns.map(({ title }) => title);
  drawRow(columns, titles, flow, styles.head);
  flow.rule(inks.soft, 0.6);
}

/** A table; its heads are repeated on every page it runs on to. */
export function drawTable(table: ReportTable, flow: PageFlow): void {
  const columns: Columns = { table, widths: columnWidths(table, flow) };
  flow.need(60);
  if (table.caption !== '') {
    flow.paragraph(table.caption, styles.soft);
    flow.y += 2;
  }
  drawHead(columns, flow);
  const draw = (row: string[], style: TextStyle): void => {
    if (flow.need(heightOf(columns, row, flow))) {
      drawHead(columns, flow);
    }
    drawRow(columns, row, flow, style);
    flow.rule(inks.line, 0.4);
  };
  table.rows.forEach((row) => draw(row, styles.cell));
  table.closing.forEach((row) => draw(row, { ...styles.cell, weight: 'bold' }));
  flow.y += 8;
}
