import PDFDocument from 'pdfkit';

import type {
  LatticeReport,
  ReportBlock,
  ReportFigure,
  ReportSection,
} from '#common/schemas/report';

import { formulaText } from '../ion-text.js';
import { drawPicture } from './draw-picture.js';
import { drawTable } from './draw-table.js';
import { inks, PageFlow, styles } from './page-flow.js';

const day = (iso: string) => `${iso.slice(0, 10)} ${iso.slice(11, 16)} UTC`;

const pictureSide = 190;

function headLines(report: LatticeReport): string[] {
  return [
    `Revision ${report.revision} by ${report.author}, ${report.workspaceName}`,
    `Saved ${day(report.savedAt)}`,
    report.review,
    ...(report.contentHash === null ? [] : [`Content hash (SHA-256) ${report.contentHash}`]),
    ...(report.address === null ? [] : [report.address]),
    `Report made ${day(report.madeAt)}`,
  ];
}

/** Title, what it is and how it stands on the left; the picture on the right. */
function drawOpening(report: LatticeReport, flow: PageFlow): void {
  const top = flow.y;
  const { picture } = report;
  const width = picture === null ? flow.width : flow.width - pictureSide - 24;
  flow.paragraph('Holdfast · lattice report', styles.soft, width);
  flow.y += 6;
  flow.paragraph(report.title, styles.title, width);
  if (report.formula !== null) {
    flow.y += 2;
    flow.paragraph(formulaText(report.formula), styles.heading, width);
  }
  flow.y += 8;
  for (const line of headLines(report)) {
    const from = flow.y;
    flow.paragraph(line, styles.body, width);
    if (line === report.address) {
      flow.doc.link(flow.left, from, width, flow.y - from, report.address);
    }
  }
  if (picture !== null) {
    const depth = drawPicture(picture, flow, flow.left + width + 24, top, pictureSide);
    flow.y = Math.max(flow.y, top + depth);
  }
  flow.y += 10;
}

/** One number: name, digits with unit, and what it means. */
function figureLines({ name, text, unit, note }: ReportFigure, flow: PageFlow, width: number) {
  const value = `${text}${unit === '' || unit === '°' ? unit : ` ${unit}`}`;
  return {
    name: flow.type.lines(name, width, styles.soft),
    value: flow.type.lines(value, width, styles.figure),
    note: note === '' ? [] : flow.type.lines(note, width, styles.soft),
  };
}

function drawFigures(figures: readonly ReportFigure[], flow: PageFlow): void {
  const columns = figures.every(({ note }) => note === '') ? 3 : 2;
  const gap = 18;
  const width = (flow.width - gap * (columns - 1)) / columns;
  for (let first = 0; first < figures.length; first += columns) {
    const row = figures.slice(first, first + columns).map((one) => figureLines(one, flow, width));
    const height = Math.max(
      ...row.map(({ name, value, note }) => (name.length + note.length) * 11 + value.length * 16),
    );
    flow.need(height + 6);
    row.forEach(({ name, value, note }, k) => {
      const x = flow.left + k * (width + gap);
      let y = flow.y;
      const put = (
        lines: readonly string[],
        style: typeof styles.soft | typeof styles.figure,
        step: number,
      ) => {
        lines.forEach((line) => {
          y += step;
          flow.type.draw(line, x, y - step * 0.25, style);
        });
      };
      put(name, styles.soft, 11);
      put(value, styles.figure, 16);
      put(note, styles.soft, 11);
    });
    flow.y += height + 6;
  }
  flow.y += 4;
}

function drawCaution(words: string, flow: PageFlow): void {
  const inset = 12;
  const lines = flow.type.lines(words, flow.width - 2 * inset, styles.body);
  const height = lines.length * flow.lineHeight(styles.body) + 14;
  flow.need(height);
  flow.doc.rect(flow.left, flow.y, flow.width, height).fill(inks.wash);
  flow.doc.rect(flow.left, flow.y, 3, height).fill(inks.oppose);
  const after = flow.y + height;
  flow.y += 6;
  flow.paragraph(words, styles.body, flow.width - 2 * inset, flow.left + inset);
  flow.y = after + 8;
}

function drawBlock(block: ReportBlock, flow: PageFlow): void {
  switch (block.kind) {
    case 'text':
      flow.paragraph(block.text, styles.body);
      flow.y += 5;
      return;
    case 'figures':
      drawFigures(block.figures, flow);
      return;
    case 'table':
      drawTable(block.table, flow);
      return;
    case 'caution':
      drawCaution(block.text, flow);
  }
}

function drawSection(section: ReportSection, flow: PageFlow): void {
  flow.need(90);
  flow.y += 8;
  flow.rule(inks.ink, 0.8);
  flow.y += 4;
  flow.doc.outline.addItem(section.title);
  flow.paragraph(section.title, styles.heading);
  flow.y += 4;
  section.blocks.forEach((block) => drawBlock(block, flow));
}

function drawFeet(report: LatticeReport, flow: PageFlow): void {
  const { start, count } = flow.doc.bufferedPageRange();
  for (let index = 0; index < count; index += 1) {
    flow.doc.switchToPage(start + index);
    // Below the bottom margin text would start a page of its own.
    flow.doc.page.margins.bottom = 0;
    const y = flow.doc.page.height - 30;
    const page = `page ${index + 1} of ${count}`;
    const room = flow.width - 70;
    const [name = ''] = flow.type.lines(
      `${report.title}, revision ${report.revision}`,
      room,
      styles.soft,
    );
    flow.type.draw(name, flow.left, y, styles.soft);
    const wide = flow.type.width(page, styles.soft);
    flow.type.draw(page, flow.left + flow.width - wide, y, styles.soft);
  }
}

/**
 * The report as a PDF: A4, the product's typeface embedded, bookmarks, page numbers. The same report
 * gives the same bytes.
 */
export function reportPdf(report: LatticeReport): Promise<Buffer> {
  const doc = new PDFDocument({
    size: 'A4',
    margin: 0,
    bufferPages: true,
    pdfVersion: '1.7',
    lang: 'en',
    displayTitle: true,
    info: {
      Title: `${report.title}, revision ${report.revision}`,
      Author: report.author,
      Subject: 'Lattice report',
      Creator: 'Holdfast',
      CreationDate: new Date(report.madeAt),
      ModDate: new Date(report.madeAt),
    },
  });
  const chunks: Buffer[] = [];
  const done = new Promise<Buffer>((resolve, reject) => {
    doc.on('data', (chunk: Buffer) => chunks.push(chunk));
    doc.on('end', () => resolve(Buffer.concat(chunks)));
    doc.on('error', reject);
  });
  const flow = new PageFlow(doc);
  drawOpening(report, flow);
  report.sections.forEach((section) => drawSection(section, flow));
  drawFeet(report, flow);
  doc.end();
  return done;
}
