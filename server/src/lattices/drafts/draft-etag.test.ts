import { describe, expect, it } from 'vitest';

import { Problem } from '#common/errors/problem';

import { draftConflict, draftEtag, matchesEtag, requireIfMatch } from './draft-etag.js';

describe('the version of a draft', () => {
  it('names the revision it goes out from and its count', () => {
    expect(draftEtag(2, 7)).toBe('"r2-v7"');
  });

  it.each([
    ['"r2-v7"', true],
    [' "r2-v7" ', true],
    ['"r1-v1", "r2-v7"', true],
    ['"r2-v70"', false],
    ['r2-v7', false],
    ['W/"r2-v7"', false],
    ['*', false],
  ])('is named by If-Match %s: %s', (ifMatch, fits) => {
    expect(matchesEtag(ifMatch, '"r2-v7"')).toBe(fits);
  });

  it.each([undefined, '', ' '])('must be named: %j', (ifMatch) => {
    expect(() => requireIfMatch(ifMatch)).toThrow(new Problem('request.if_match_missing'));
  });

  it('comes with the refusal of another', () => {
    expect(draftConflict('"r1-v0"')).toMatchObject({
      code: 'draft.conflict',
      status: 412,
      details: { currentEtag: '"r1-v0"' },
    });
  });
});
