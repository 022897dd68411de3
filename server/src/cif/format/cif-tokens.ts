import { Problem } from '#common/errors/problem';

/** A word of a CIF with the line it starts on, counted from 1. */
export type CifToken =
  | { readonly kind: 'data'; readonly name: string; readonly line: number }
  | { readonly kind: 'save'; readonly name: string; readonly line: number }
  | { readonly kind: 'loop'; readonly line: number }
  | { readonly kind: 'tag'; readonly tag: string; readonly line: number }
  | {
      readonly kind: 'value';
      readonly text: string;
      readonly quoted: boolean;
      readonly line: number;
    };

const isBlank = (character: string | undefined): boolean =>
  character === ' ' || character === '\t' || character === '\n' || character === undefined;

/** A failure of the grammar at a line. */
export function cifProblem(line: number, message: string): Problem {
  return new Problem('cif.syntax', `Line ${line}: ${message}`, { line });
}

/**
 * Splits a CIF into words by the grammar of CIF 1.1 (International Tables G, 2.2.7), and what
 * CIF 2.0 adds to quoting where the file says it is CIF 2.0.
 * @param text the file, line ends of any kind
 * @throws Problem `cif.syntax` with the line of an open quote, text field or bracket
 */
export function tokenise(text: string): CifToken[] {
  return new Tokeniser(text).run();
}

class Tokeniser {
  private readonly text: string;
  private readonly isVersion2: boolean;
  private readonly tokens: CifToken[] = [];
  private at = 0;
  private line = 1;

  constructor(text: string) {
    this.text = text.replace(/^\uFEFF/, '').replace(/\r\n?/g, '\n');
    this.isVersion2 = /^#\\#CIF_2\.0/.test(this.text);
  }

  run(): CifToken[] {
    while (this.at < this.text.length) {
      const character = this.text[this.at]!;
      if (isBlank(character)) {
        this.skip(character);
      } else if (character === '#') {
        this.at = this.endOfLine();
      } else if (character === ';' && this.isAtLineStart()) {
        this.readTextField();
      } else if (character === "'" || character === '"') {
        this.readQuoted(character);
      } else if (this.isVersion2 && (character === '[' || character === '{')) {
        this.readBracketed();
      } else {
        this.readWord();
      }
    }
    return this.tokens;
  }

  private skip(character: string): void {
    if (character === '\n') {
      this.line += 1;
    }
    this.at += 1;
  }

  private isAtLineStart(): boolean {
    return this.at === 0 || this.text[this.at - 1] === '\n';
  }

  private endOfLine(): number {
    const end = this.text.indexOf('\n', this.at);
    return end === -1 ? this.text.length : end;
  }

  /** Takes the text up to `end`, counting its lines, and moves behind the closing mark. */
  private takeValue(start: number, end: number, closing: number): void {
    const text = this.text.slice(start, end);
    this.tokens.push({ kind: 'value', text, quoted: true, line: this.line });
    this.line += this.text.slice(this.at, end + closing).split('\n').length - 1;
    this.at = end + closing;
  }

  private readTextField(): void {
    const end = this.text.indexOf('\n;', this.at);
    if (end === -1) {
      throw cifProblem(
        this.line,
        'this text field is never closed; end it with “;” on a new line.',
      );
    }
    this.takeValue(this.at + 1, end, 2);
  }

  private readQuoted(quote: string): void {
    const triple = quote.repeat(3);
    if (this.isVersion2 && this.text.startsWith(triple, this.at)) {
      const end = this.text.indexOf(triple, this.at + 3);
      if (end === -1) {
        throw cifProblem(this.line, `this value is never closed; end it with ${triple}.`);
      }
      this.takeValue(this.at + 3, end, 3);
      return;
    }
    const lineEnd = this.endOfLine();
    let end = this.at + 1;
    // A quote closes only before white space: 'it's don't stop' is one value.
    while (end < lineEnd && !(this.text[end] === quote && this.closesAt(end))) {
      end += 1;
    }
    if (end >= lineEnd) {
      throw cifProblem(this.line, `this value opens with ${quote} and is not closed on its line.`);
    }
    this.takeValue(this.at + 1, end, 1);
  }

  private closesAt(position: number): boolean {
    return this.isVersion2 || isBlank(this.text[position + 1]);
  }

  /** A list or table of CIF 2.0: nothing a structure needs stands in one; kept as its text. */
  private readBracketed(): void {
    let depth = 0;
    for (let end = this.at; end < this.text.length; end += 1) {
      const character = this.text[end]!;
      if (character === '[' || character === '{') {
        depth += 1;
      } else if (character === ']' || character === '}') {
        depth -= 1;
      }
      if (depth === 0) {
        this.takeValue(this.at, end + 1, 0);
        return;
      }
    }
    throw cifProblem(this.line, `this “${this.text[this.at]!}” is never closed.`);
  }

  private readWord(): void {
    let end = this.at;
    while (!isBlank(this.text[end])) {
      end += 1;
    }
    const word = this.text.slice(this.at, end);
    this.at = end;
    this.tokens.push(this.classify(word));
  }

  private classify(word: string): CifToken {
    const line = this.line;
    const lower = word.toLowerCase();
    if (word.startsWith('_')) {
      return { kind: 'tag', tag: lower, line };
    }
    if (lower.startsWith('data_')) {
      return { kind: 'data', name: word.slice('data_'.length), line };
    }
    if (lower.startsWith('save_')) {
      return { kind: 'save', name: word.slice('save_'.length), line };
    }
    if (lower === 'loop_') {
      return { kind: 'loop', line };
    }
    if (lower === 'global_' || lower === 'stop_') {
      throw cifProblem(line, `“${word}” is a reserved word that CIF does not use.`);
    }
    return { kind: 'value', text: word, quoted: false, line };
  }
}
