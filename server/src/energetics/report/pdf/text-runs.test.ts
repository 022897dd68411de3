import { describe, expect, it } from 'vitest';

import { textRuns } from './text-runs.js';

/** The first font has Latin letters, the second also č. */
const has = (font: number, codePoint: number) =>
  codePoint < 0x80 || (font === 1 && codePoint === 0x10d);
const runs = (text: string) => textRuns(text, 2, has);

describe('runs of text', () => {
  it('raises charges and powers and lowers counts', () => {
    expect(runs('Mg²⁺')).toEqual([
      { text: 'Mg', font: 0, rise: 'line' },
      { text: '2+', font: 0, rise: 'raised' },
    ]);
    expect(runs('Al₂')).toContainEqual({ text: '2', font: 0, rise: 'lowered' });
  });

  it('takes the font that has the letter', () => {
    expect(runs('ač')).toEqual([
      { text: 'a', font: 0, rise: 'line' },
      { text: 'č', font: 1, rise: 'line' },
    ]);
  });

  it('spells what no font has', () => {
    const text = (words: string) =>
      runs(words)
        .map((run) => run.text)
        .join('');
    expect(text('β-ﬁé')).toBe('beta-fie');
    expect(text('氷')).toBe('[U+6C37]');
    expect(text('a\u202e\u0000b\nc')).toBe('ab c');
  });
});
