import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { Problem } from '#common/errors/problem';

import { findValue } from './block-values.js';
import { isMissing, readCifDocument } from './cif-document.js';

const block = (text: string) => readCifDocument(text)[0]!;
const textOf = (text: string, tag: string) => findValue(block(text), tag)?.text;

function problemOf(text: string): { code: string; line: number | undefined } {
  try {
    readCifDocument(text);
  } catch (error) {
    if (error instanceof Problem) {
      return { code: error.code, line: error.details?.line };
    }
    throw error;
  }
  throw new Error('read without complaint');
}

describe('the CIF grammar', () => {
  it('reads items and loops of several blocks', () => {
    const blocks = readCifDocument(
      'data_one\n_a 1\ndata_two\n_b two\nloop_\n_c\n_d\n1 2\n3 4\n_e 5\n',
    );
    expect(blocks.map(({ name }) => name)).toEqual(['one', 'two']);
    const [loop] = blocks[1]!.loops;
    expect(loop?.tags).toEqual(['_c', '_d']);
    expect(loop?.rows.map((row) => row.map(({ text }) => text))).toEqual([
      ['1', '2'],
      ['3', '4'],
    ]);
    expect(blocks[1]!.items.get('_e')?.text).toBe('5');
  });

  it('takes any line end', () => {
    const text = 'data_x\n_a 1\n_b 2\n;no text field\n';
    for (const end of ['\n', '\r\n', '\r']) {
      expect(problemOf(text.replaceAll('\n', end))).toEqual({ code: 'cif.syntax', line: 4 });
      expect(textOf(text.slice(0, 17).replaceAll('\n', end), '_b')).toBe('2');
    }
  });

  it('closes a quote only before white space', () => {
    expect(textOf("data_x _a 'it's don't stop' _b 1", '_a')).toBe("it's don't stop");
    expect(textOf('data_x _a "say "no"w"', '_a')).toBe('say "no"w');
  });

  it('keeps text fields whole, whatever stands in them', () => {
    const text = 'data_x\n_a\n;first\n loop_ _b \' "\n;\n_c 3\n';
    expect(textOf(text, '_a')).toBe('first\n loop_ _b \' "');
    expect(textOf(text, '_c')).toBe('3');
    expect(block(text).items.get('_c')?.line).toBe(6);
  });

  it('takes a semicolon inside a line as a plain character', () => {
    expect(textOf('data_x\n_a b;c\n_d ;e\n', '_a')).toBe('b;c');
    expect(textOf('data_x\n_a b;c\n_d ;e\n', '_d')).toBe(';e');
  });

  it('knows no capitals in data names and reserved words, and passes comments over', () => {
    expect(textOf('# first\nDATA_x\n_Cell_Length_A 5 # Å\nLOOP_\n_B\n1\n', '_cell_length_a')).toBe(
      '5',
    );
    expect(textOf('data_x\n_a b#c\n', '_a')).toBe('b#c');
  });

  it('tells unknown values from quoted question marks', () => {
    const { items } = block("data_x _a ? _b . _c '?' _d 0");
    expect(['_a', '_b', '_c', '_d'].map((tag) => isMissing(items.get(tag)!))).toEqual([
      true,
      true,
      false,
      false,
    ]);
  });

  it('reads the quoting of CIF 2.0 where the file says so', () => {
    const text = `#\\#CIF_2.0\ndata_x\n_a """it's "quoted"\ntwice""" _b [1 'two' {"k": 3}] _c 4`;
    expect(textOf(text, '_a')).toBe('it\'s "quoted"\ntwice');
    expect(textOf(text, '_c')).toBe('4');
    expect(block(text).items.get('_b')?.line).toBe(4);
  });

  it('passes save frames over', () => {
    expect(textOf('data_x\nsave_frame\n_a 1\nsave_\n_b 2', '_b')).toBe('2');
  });

  it.each([
    ['_a 1', 'cif.syntax', 1],
    ['data_x\n_a\n_b 2', 'cif.syntax', 2],
    ['data_x\n_a 1 2', 'cif.syntax', 2],
    ['data_x\n_a', 'cif.syntax', 2],
    ["data_x\n_a 'open\n_b 2", 'cif.syntax', 2],
    ['data_x\n_a\n;open\n', 'cif.syntax', 3],
    ['data_x\nloop_\n1 2', 'cif.syntax', 2],
    ['data_x\nglobal_\n', 'cif.syntax', 2],
    ['data_x\nsave_f\n_a 1', 'cif.syntax', 2],
    ['data_x\n_a 1\n_A 2', 'cif.duplicate_tag', 3],
    ['data_x\n_a 1\nloop_\n_a\n1', 'cif.duplicate_tag', 4],
    ['data_x\nloop_\n_a\n_b\n1 2\n3', 'cif.loop_count', 6],
  ])('says where %j is wrong', (text, code, line) => {
    expect(problemOf(text)).toEqual({ code, line });
  });

  it('answers any text with blocks or a problem, never with another failure', () => {
    const words = fc.constantFrom(
      'data_x',
      'loop_',
      '_a',
      '_b',
      "'",
      '"',
      ';',
      '\n',
      ' ',
      '1',
      '#',
      '?',
      '[',
      '}',
      'save_',
    );
    fc.assert(
      fc.property(
        fc.array(fc.oneof(words, fc.string({ maxLength: 4 })), { maxLength: 40 }),
        (parts) => {
          try {
            return Array.isArray(readCifDocument(`#\\#CIF_2.0\ndata_x ${parts.join(' ')}`));
          } catch (error) {
            return error instanceof Problem && (error.details?.line ?? 0) > 0;
          }
        },
      ),
      { numRuns: 500 },
    );
  });
});
