import { describe, expect, it } from 'vitest';

import { findUnstorableText } from './unstorable-text.js';

describe('findUnstorableText', () => {
  it.each([
    ['plain'],
    ['smile 😀, α-Al₂O₃'],
    [7],
    [null],
    [{ a: ['x', { b: true }] }],
    [undefined],
  ])('finds nothing in %j', (value) => {
    expect(findUnstorableText(value)).toBeNull();
  });

  it('does not follow what is deeper than any contract', () => {
    let deep: unknown = 'a\0';
    for (let i = 0; i < 100_000; i += 1) {
      deep = [deep];
    }
    expect(findUnstorableText(deep)).toBeNull();
  });

  it.each([
    ['a\0b', ''],
    [{ name: 'a\0' }, 'name'],
    [{ cell: { sites: [{ label: 'ok' }, { label: '\ud800' }] } }, 'cell.sites.1.label'],
    [{ tags: ['\udc00'] }, 'tags.0'],
    [{ outer: { 'a\0': 1 } }, 'outer'],
  ])('finds it in %j', (value, path) => {
    expect(findUnstorableText(value)).toBe(path);
  });
});
