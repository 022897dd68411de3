import { describe, expect, it } from 'vitest';

import { readShelfView, writeShelfView } from '#client/features/shelf/shelf-view.ts';
import { mergeTags, tagLimits } from '#client/features/shelf/tags.ts';

const read = (query: string) => readShelfView(new URLSearchParams(query));

describe('shelf view in the address', () => {
  it('leaves out what is as usual and reads back the rest', () => {
    expect(writeShelfView(read(''))).toBe('');
    const query = 'search=Al2O3&sort=madelung&order=asc&state=accepted&deleted=true&page=4';
    expect(writeShelfView(read(query))).toBe(query);
  });

  it('takes a value that makes no sense as not given, and keeps the others', () => {
    expect(read('page=-2&sort=colour&order=up&state=lost&search=MgO')).toMatchObject({
      page: 1,
      sort: 'updated',
      order: 'desc',
      state: undefined,
      search: 'MgO',
    });
  });
});

describe('tags', () => {
  it('adds several, none twice whatever the capitals', () => {
    expect(mergeTags(['dry'], ' Dry, reference ,, reference')).toEqual({
      tags: ['dry', 'reference'],
      problem: null,
    });
  });

  it('keeps to the limits of the contract and changes nothing beyond them', () => {
    const long = 'x'.repeat(tagLimits.length + 1);
    expect(mergeTags(['dry'], long)).toEqual({
      tags: ['dry'],
      problem: 'Keep a tag to 30 characters.',
    });
    const many = Array.from({ length: tagLimits.count }, (_, index) => `tag ${index}`);
    expect(mergeTags(many, 'one more').tags).toEqual(many);
  });
});
