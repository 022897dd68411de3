import type PDFDocument from 'pdfkit';

import { Typesetter, type TextStyle } from './typesetter.js';

export const inks = {
  ink: '#18211F',
  soft: '#55605C',
  line: '#DDD8CC',
  wash: '#F1EEE7',
  oppose: '#B5532A',
} as const;

export const styles = {
  title: { size: 23, weight: 'bold', colour: inks.ink },
  heading: { size: 13, weight: 'bold', colour: inks.ink },
  body: { size: 9, weight: 'regular', colour: inks.ink },
  soft: { size: 8, weight: 'regular', colour: inks.soft },
  figure: { size: 12, weight: 'bold', colour: inks.ink },
  unit: { size: 9, weight: 'regular', colour: inks.soft },
  cell: { size: 8, weight: 'regular', colour: inks.ink },
  head: { size: 7.5, weight: 'bold', colour: inks.soft },
} as const satisfies Record<string, TextStyle>;

/** A4 in points, and what is kept free around the text. */
const margins = { side: 50, top: 52, bottom: 58 } as const;

/** Distance of baselines, relative to the size. */
const leading = 1.4;

/** Where the next thing goes on a run of pages. */
export class PageFlow {
  readonly type: Typesetter;
  readonly left: number = margins.side;
  readonly width: number;
  private readonly bottom: number;
  y: number = margins.top;

  constructor(readonly doc: InstanceType<typeof PDFDocument>) {
    this.type = new Typesetter(doc);
    this.width = doc.page.width - 2 * margins.side;
    this.bottom = doc.page.height - margins.bottom;
  }

  /** Starts a page unless so much room is left; true when it did. */
  need(height: number): boolean {
    if (this.y + height <= this.bottom) {
      return false;
    }
    this.doc.addPage();
    this.y = margins.top;
    return true;
  }

  lineHeight(style: TextStyle): number {
    return style.size * leading;
  }

  /** A paragraph over the given width, broken over pages where it must. */
  paragraph(text: string, style: TextStyle, width = this.width, x = this.left): void {
    for (const line of this.type.lines(text, width, style)) {
      this.need(this.lineHeight(style));
      this.y += this.lineHeight(style);
      this.type.draw(line, x, this.y - style.size * 0.35, style);
    }
  }

  rule(colour: string = inks.line, thickness = 0.6): void {
    this.doc
      .moveTo(this.left, this.y)
      .lineTo(this.left + this.width, this.y)
      .lineWidth(thickness)
      .strokeColor(colour)
      .stroke();
  }
}
