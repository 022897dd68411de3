import { Problem } from '#common/errors/problem';

import { cifProblem, tokenise, type CifToken } from './cif-tokens.js';
import { shortened } from './shortened.js';

/** One value with the line it stands on. */
export interface CifValue {
  readonly text: string;
  readonly quoted: boolean;
  readonly line: number;
}

/** A loop: its data names in lower case, and its rows in that order. */
export interface CifLoop {
  readonly tags: readonly string[];
  readonly rows: readonly (readonly CifValue[])[];
  readonly line: number;
}

/** A data block. */
export interface CifBlock {
  readonly name: string;
  readonly line: number;
  /** Single values by data name in lower case. */
  readonly items: ReadonlyMap<string, CifValue>;
  readonly loops: readonly CifLoop[];
}

/** True for `?` (unknown) and `.` (not applicable). */
export function isMissing(value: CifValue): boolean {
  return !value.quoted && (value.text === '?' || value.text === '.');
}

/**
 * Reads a CIF into its data blocks. Save frames, which only dictionaries have, are passed over.
 * @throws Problem `cif.syntax`, `cif.duplicate_tag` or `cif.loop_count`, `details.line` set
 */
export function readCifDocument(text: string): readonly CifBlock[] {
  return new DocumentReader(tokenise(text)).run();
}

class DocumentReader {
  private readonly blocks: CifBlock[] = [];
  private at = 0;
  private seen = new Map<string, number>();
  private items = new Map<string, CifValue>();
  private loops: CifLoop[] = [];

  constructor(private readonly tokens: readonly CifToken[]) {}

  run(): readonly CifBlock[] {
    let token: CifToken | undefined;
    while ((token = this.tokens[this.at]) !== undefined) {
      this.at += 1;
      if (token.kind === 'data') {
        this.openBlock(token.name, token.line);
      } else if (this.blocks.length === 0) {
        throw cifProblem(token.line, 'a CIF begins with a line “data_” and a name.');
      } else {
        this.readPart(token);
      }
    }
    return this.blocks;
  }

  private openBlock(name: string, line: number): void {
    this.seen = new Map();
    this.items = new Map();
    this.loops = [];
    this.blocks.push({ name, line, items: this.items, loops: this.loops });
  }

  private readPart(token: Exclude<CifToken, { kind: 'data' }>): void {
    switch (token.kind) {
      case 'tag':
        this.readItem(token.tag, token.line);
        return;
      case 'loop':
        this.readLoop(token.line);
        return;
      case 'save':
        this.passSaveFrame(token.line);
        return;
      case 'value':
        throw cifProblem(token.line, `the value “${shortened(token.text)}” has no data name.`);
    }
  }

  private readItem(tag: string, line: number): void {
    this.claim(tag, line);
    const value = this.tokens[this.at];
    if (value?.kind !== 'value') {
      throw cifProblem(line, `${tag} has no value; write “?” where it is not known.`);
    }
    this.items.set(tag, value);
    this.at += 1;
  }

  private claim(tag: string, line: number): void {
    const before = this.seen.get(tag);
    if (before !== undefined) {
      throw new Problem(
        'cif.duplicate_tag',
        `Line ${line}: ${tag} stands twice in this block, first on line ${before}. Keep one.`,
        { line },
      );
    }
    this.seen.set(tag, line);
  }

  private readLoop(line: number): void {
    const tags: string[] = [];
    let token = this.tokens[this.at];
    while (token?.kind === 'tag') {
      this.claim(token.tag, token.line);
      tags.push(token.tag);
      this.at += 1;
      token = this.tokens[this.at];
    }
    if (tags.length === 0) {
      throw cifProblem(line, 'a loop needs data names.');
    }
    const values: CifValue[] = [];
    while (token?.kind === 'value') {
      values.push(token);
      this.at += 1;
      token = this.tokens[this.at];
    }
    this.loops.push({ tags, rows: intoRows(tags, values), line });
  }

  private passSaveFrame(line: number): void {
    for (let token = this.tokens[this.at]; token; token = this.tokens[this.at]) {
      this.at += 1;
      if (token.kind === 'save' && token.name === '') {
        return;
      }
    }
    throw cifProblem(line, 'this save frame is never closed.');
  }
}

function intoRows(tags: readonly string[], values: readonly CifValue[]): CifValue[][] {
  const rows: CifValue[][] = [];
  for (let start = 0; start < values.length; start += tags.length) {
    rows.push(values.slice(start, start + tags.length));
  }
  const last = rows.at(-1);
  if (last && last.length < tags.length) {
    const { line } = last[0]!;
    throw new Problem(
      'cif.loop_count',
      `Line ${line}: the loop with ${tags[0]!} has ${tags.length} data names but ${values.length} ` +
        `values; its last row lacks ${tags.length - last.length}.`,
      { line },
    );
  }
  return rows;
}
