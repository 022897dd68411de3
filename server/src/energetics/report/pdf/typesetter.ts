import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';

import type PDFDocument from 'pdfkit';

import { textRuns, type HasGlyph, type TextRun } from './text-runs.js';

export type Weight = 'regular' | 'bold';

export interface TextStyle {
  readonly size: number;
  readonly weight: Weight;
  readonly colour: string;
}

const files = ['latin', 'latin-ext', 'vietnamese'] as const;
const weights: Record<Weight, number> = { regular: 400, bold: 700 };
const small = 0.68;
const shift = { line: 0, raised: 0.34, lowered: -0.14 } as const;
const features: PDFKit.Mixins.OpenTypeFeatures[] = ['tnum', 'kern'];

type Document = InstanceType<typeof PDFDocument>;

function readFont(file: string, weight: number): Buffer {
  const name = `@fontsource/space-grotesk/files/space-grotesk-${file}-${weight}-normal.woff`;
  return readFileSync(createRequire(import.meta.url).resolve(name));
}

const loaded = new Map<Weight, readonly Buffer[]>();

/** The family's files of a weight, read once. */
function fontsOf(weight: Weight): readonly Buffer[] {
  const known = loaded.get(weight) ?? files.map((file) => readFont(file, weights[weight]));
  loaded.set(weight, known);
  return known;
}

/** What an embedded font knows of its file; PDFKit keeps it on the document and types none of it. */
interface CurrentFont {
  readonly _font: { readonly font: { hasGlyphForCodePoint(codePoint: number): boolean } };
}

/** Sets text with the product's typeface: several files per weight, raised and lowered signs. */
export class Typesetter {
  private readonly known = new Map<string, boolean>();
  private readonly widths = new Map<string, number>();

  constructor(private readonly doc: Document) {
    for (const weight of ['regular', 'bold'] as const) {
      fontsOf(weight).forEach((bytes, index) => doc.registerFont(`${weight}${index}`, bytes));
    }
  }

  width(text: string, style: TextStyle): number {
    return this.runs(text, style).reduce((sum, run) => sum + this.runWidth(run, style), 0);
  }

  /** One line, its baseline at y. */
  draw(text: string, x: number, y: number, style: TextStyle): void {
    let at = x;
    for (const run of this.runs(text, style)) {
      const width = this.runWidth(run, style);
      this.doc.fillColor(style.colour).text(run.text, at, y - shift[run.rise] * style.size, {
        lineBreak: false,
        baseline: 'alphabetic',
        features,
      });
      at += width;
    }
  }

  /** Breaks a text into lines no wider than `width`; words longer than a line are cut. */
  lines(text: string, width: number, style: TextStyle): string[] {
    const lines: string[] = [];
    let line = '';
    for (const word of text.split(/ +/)) {
      const longer = line === '' ? word : `${line} ${word}`;
      if (this.width(longer, style) <= width) {
        line = longer;
        continue;
      }
      if (line !== '') {
        lines.push(line);
      }
      const parts = this.cut(word, width, style);
      lines.push(...parts.slice(0, -1));
      line = parts.at(-1) ?? '';
    }
    return [...lines, line];
  }

  private cut(word: string, width: number, style: TextStyle): string[] {
    const parts = [''];
    for (const character of word) {
      const longer = `${parts.at(-1)}${character}`;
      if (parts.at(-1) !== '' && this.width(longer, style) > width) {
        parts.push(character);
      } else {
        parts[parts.length - 1] = longer;
      }
    }
    return parts;
  }

  private runs(text: string, { weight }: TextStyle): TextRun[] {
    const has: HasGlyph = (font, codePoint) => this.hasGlyph(`${weight}${font}`, codePoint);
    return textRuns(text, files.length, has);
  }

  private hasGlyph(name: string, codePoint: number): boolean {
    const key = `${name} ${codePoint}`;
    const known = this.known.get(key);
    if (known !== undefined) {
      return known;
    }
    this.doc.font(name);
    const found = (this.doc as unknown as CurrentFont)._font.font.hasGlyphForCodePoint(codePoint);
    this.known.set(key, found);
    return found;
  }

  private runWidth(run: TextRun, { size, weight }: TextStyle): number {
    const font = `${weight}${run.font}`;
    this.doc.font(font).fontSize(run.rise === 'line' ? size : size * small);
    const key = `${font} ${run.rise} ${size} ${run.text}`;
    const width = this.widths.get(key) ?? this.doc.widthOfString(run.text, { features });
    this.widths.set(key, width);
    return width;
  }
}
