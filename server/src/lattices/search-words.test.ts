import { describe, expect, it } from 'vitest';

import { searchWords } from './search-words.js';

describe('searchWords', () => {
  it.each([
    ['', []],
    ['   ', []],
    ['Periclase', ['periclase']],
    ['CaF₂', ['caf2']],
    ['F m -3 m', ['f', 'm', '-3', 'm']],
    [' trial  3 ', ['trial', '3']],
  ])('%j', (text, words) => {
    expect(searchWords(text)).toEqual(words);
  });
});
